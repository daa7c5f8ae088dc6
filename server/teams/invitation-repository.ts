import { TeamScopedRepository } from '../database/team-scoped-repository';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { Invitation } from './invitation-entity';

export class InvitationRepository extends TeamScopedRepository<Invitation> {
  constructor() {
    super(Invitation, 'invitation');
  }

  /** Makes whoever invites one address to one team wait for each other until their transactions end. */
  async lockAddress(transaction: Transaction, teamId: string, email: string): Promise<void> {
    await managerOf(transaction).query('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [`invitation:${teamId}:${email}`]);
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
