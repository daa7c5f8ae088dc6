import { MoreThan } from 'typeorm';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { PasswordReset } from './password-reset-entity';

export class PasswordResetRepository {
  async insert(transaction: Transaction, reset: PasswordReset): Promise<void> {
    await managerOf(transaction).getRepository(PasswordReset).insert(reset);
  }

  async findLocked(transaction: Transaction, hash: string): Promise<PasswordReset | null> {
    return managerOf(transaction).getRepository(PasswordReset).findOne({ where: { hash }, lock: { mode: 'pessimistic_write' } });
  }

  async countSince(transaction: Transaction, personId: string, since: Date): Promise<number> {
    return managerOf(transaction).getRepository(PasswordReset).countBy({ personId, createdAt: MoreThan(since) });
  }

  /** One use spends every open link of the person. */
  async spendAll(transaction: Transaction, personId: string, at: Date): Promise<void> {
    await managerOf(transaction)
      .createQueryBuilder()
      .update(PasswordReset)
      .set({ usedAt: at })
      .where('person_id = :personId AND used_at IS NULL', { personId })
      .execute();
  }
}
