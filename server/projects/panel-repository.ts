import { TeamScopedRepository } from '../database/team-scoped-repository';
import type { Transaction } from '../database/transaction-runner';
import { Panel } from './panel-entity';

export class PanelRepository extends TeamScopedRepository<Panel> {
  constructor() {
    super(Panel, 'panel');
  }

  /** Oldest first; of one project, or of all. */
  async list(transaction: Transaction, teamId: string, projectId?: string): Promise<Panel[]> {
    const query = this.rows(transaction, teamId, 'panel').orderBy('panel.createdAt').addOrderBy('panel.id');
    if (projectId !== undefined) query.andWhere('panel.projectId = :projectId', { projectId });
    return query.getMany();
  }
}
