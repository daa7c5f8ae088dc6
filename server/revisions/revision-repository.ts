import { TeamScopedRepository } from '../database/team-scoped-repository';
import type { Transaction } from '../database/transaction-runner';
import { Revision } from './revision-entity';

export class RevisionRepository extends TeamScopedRepository<Revision> {
  constructor() {
    super(Revision, 'revision');
  }

  /** Newest first. */
  async ofPanel(transaction: Transaction, teamId: string, panelId: string): Promise<Revision[]> {
    return this.store(transaction).find({ where: this.ofTeam(teamId, { panelId }), order: { number: 'DESC' } });
  }

  async latest(transaction: Transaction, teamId: string, panelId: string): Promise<Revision | null> {
    return this.store(transaction).findOne({ where: this.ofTeam(teamId, { panelId }), order: { number: 'DESC' } });
  }

  /** The newest of each panel that has any. */
  async latestOfPanels(transaction: Transaction, teamId: string, panelIds: readonly string[]): Promise<Revision[]> {
    if (panelIds.length === 0) return [];
    return this.rows(transaction, teamId, 'revision')
      .distinctOn(['revision.panelId'])
      .andWhere('revision.panelId IN (:...panelIds)', { panelIds })
      .orderBy('revision.panelId')
      .addOrderBy('revision.number', 'DESC')
      .getMany();
  }

  async onEdition(transaction: Transaction, teamId: string, editionId: string): Promise<Revision[]> {
    return this.store(transaction).find({ where: this.ofTeam(teamId, { editionId }), order: { createdAt: 'ASC', number: 'ASC' } });
  }

  async countByEdition(transaction: Transaction, teamId: string): Promise<{ editionId: string; count: number }[]> {
    return this.rows(transaction, teamId, 'revision')
      .select('revision.editionId', 'editionId')
      .addSelect('count(*)::int', 'count')
      .andWhere('revision.editionId IS NOT NULL')
      .groupBy('revision.editionId')
      .getRawMany<{ editionId: string; count: number }>();
  }
}
