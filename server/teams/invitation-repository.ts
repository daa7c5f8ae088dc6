import { TeamScopedRepository } from '../database/team-scoped-repository';
import type { Transaction } from '../database/transaction-runner';
import { Invitation } from './invitation-entity';

export class InvitationRepository extends TeamScopedRepository<Invitation> {
  constructor() {
    super(Invitation, 'invitation');
  }

  /** Neither accepted nor expired, the newest first. */
  async open(transaction: Transaction, teamId: string, now: Date): Promise<Invitation[]> {
    return this.rows(transaction, teamId, 'row')
      .andWhere('row.acceptedAt IS NULL AND row.expiresAt > :now', { now })
      .orderBy('row.createdAt', 'DESC')
      .addOrderBy('row.id', 'ASC')
      .getMany();
  }

  /** Whoever holds the token may read it, from whichever team. Locked until the transaction ends. */
  async findByHashLocked(transaction: Transaction, hash: string): Promise<Invitation | null> {
    return this.store(transaction).findOne({ where: { hash }, lock: { mode: 'pessimistic_write' } });
  }
}
