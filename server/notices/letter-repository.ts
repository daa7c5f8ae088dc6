import { managerOf, type Transaction } from '../database/transaction-runner';
import { OutboxLetter } from './letter-entity';

export class LetterRepository {
  async insert(transaction: Transaction, letter: OutboxLetter): Promise<void> {
    await managerOf(transaction).getRepository(OutboxLetter).insert(letter);
  }

  /** The oldest letter that is due, locked; letters that another process is sending are passed over. */
  async nextDue(transaction: Transaction, now: Date): Promise<OutboxLetter | null> {
    return managerOf(transaction)
      .createQueryBuilder(OutboxLetter, 'letter')
      .where('letter.sentAt IS NULL AND letter.nextAttemptAt <= :now', { now })
      .orderBy('letter.nextAttemptAt', 'ASC')
      .limit(1)
      .setLock('pessimistic_write')
      .setOnLocked('skip_locked')
      .getOne();
  }

  async change(transaction: Transaction, id: string, values: Partial<Omit<OutboxLetter, 'id'>>): Promise<void> {
    await managerOf(transaction).getRepository(OutboxLetter).update({ id }, values);
  }
}
