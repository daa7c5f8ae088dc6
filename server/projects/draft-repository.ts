import { In } from 'typeorm';
import { TeamScopedRepository } from '../database/team-scoped-repository';
import type { Transaction } from '../database/transaction-runner';
import { Draft } from './draft-entity';

export class DraftRepository extends TeamScopedRepository<Draft> {
  constructor() {
    super(Draft, 'panel');
  }

  async ofPanels(transaction: Transaction, teamId: string, panelIds: readonly string[]): Promise<Draft[]> {
    if (panelIds.length === 0) return [];
    return this.store(transaction).findBy(this.ofTeam(teamId, { id: In([...panelIds]) }));
  }

  async onEdition(transaction: Transaction, teamId: string, editionId: string): Promise<Draft[]> {
    return this.store(transaction).findBy(this.ofTeam(teamId, { editionId }));
  }

  async countByEdition(transaction: Transaction, teamId: string): Promise<{ editionId: string; count: number }[]> {
    const rows = await this.rows(transaction, teamId, 'draft')
      .select('draft.editionId', 'editionId')
      .addSelect('count(*)::int', 'count')
      .andWhere('draft.editionId IS NOT NULL')
      .groupBy('draft.editionId')
      .getRawMany<{ editionId: string; count: number }>();
    return rows;
  }

  /** Changes the draft only if it still has this version, in one statement; false when it has another. */
  async replace(transaction: Transaction, teamId: string, at: { id: string; version: number }, values: Omit<Draft, 'id' | 'teamId' | 'version'>): Promise<boolean> {
    const done = await this.store(transaction).update(this.ofTeam(teamId, at), { ...values, version: at.version + 1 } as never);
    return done.affected === 1;
  }
}
