import { TeamScopedRepository } from '../database/team-scoped-repository';
import type { Transaction } from '../database/transaction-runner';
import { Project } from './project-entity';

export class ProjectRepository extends TeamScopedRepository<Project> {
  constructor() {
    super(Project, 'project');
  }

  /** Oldest first. */
  async list(transaction: Transaction, teamId: string): Promise<Project[]> {
    return this.rows(transaction, teamId, 'project').orderBy('project.createdAt').addOrderBy('project.id').getMany();
  }
}
