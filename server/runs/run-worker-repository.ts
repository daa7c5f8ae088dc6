import { LessThan, MoreThan } from 'typeorm';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { RunWorkerRow } from './run-worker-entity';

/** Worker processes of the house; they belong to no team. */
export class RunWorkerRepository {
  async see(transaction: Transaction, row: RunWorkerRow): Promise<void> {
    await managerOf(transaction).getRepository(RunWorkerRow).upsert(row, ['id']);
  }

  async remove(transaction: Transaction, id: string): Promise<void> {
    await managerOf(transaction).getRepository(RunWorkerRow).delete({ id });
  }

  async removeUnseenSince(transaction: Transaction, time: Date): Promise<void> {
    await managerOf(transaction).getRepository(RunWorkerRow).delete({ seenAt: LessThan(time) });
  }

  async threadsSeenSince(transaction: Transaction, time: Date): Promise<number> {
    return (await managerOf(transaction).getRepository(RunWorkerRow).sum('threads', { seenAt: MoreThan(time) })) ?? 0;
  }
}
