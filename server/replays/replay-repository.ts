import { managerOf, type Transaction } from '../database/transaction-runner';
import { Replay } from './replay-entity';

export class ReplayRepository {
  /** False when the key is taken. */
  async insertNew(transaction: Transaction, row: Replay): Promise<boolean> {
    const done = await managerOf(transaction).createQueryBuilder().insert().into(Replay).values(row).orIgnore().returning('key').execute();
    return (done.raw as unknown[]).length === 1;
  }

  async findLocked(transaction: Transaction, personId: string, key: string): Promise<Replay | null> {
    return managerOf(transaction).getRepository(Replay).findOne({ where: { personId, key }, lock: { mode: 'pessimistic_write' } });
  }

  async change(transaction: Transaction, { personId, key, ...values }: Pick<Replay, 'personId' | 'key'> & Partial<Replay>): Promise<void> {
    await managerOf(transaction).getRepository(Replay).update({ personId, key }, values);
  }

  /** Only a row without an answer: one that completed stays. */
  async removeRunning(transaction: Transaction, personId: string, key: string): Promise<void> {
    await managerOf(transaction).query('DELETE FROM replay WHERE person_id = $1 AND key = $2 AND answer IS NULL', [personId, key]);
  }

  async sweep(transaction: Transaction, before: Date): Promise<void> {
    await managerOf(transaction).query('DELETE FROM replay WHERE created_at < $1', [before]);
  }
}
