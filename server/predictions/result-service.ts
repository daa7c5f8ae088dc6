import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { ResultRepository, type ResultKey } from './result-repository';

/** Results by what they were computed from, for features that compute something of their own. */
export class ResultService {
  private readonly results = new ResultRepository();

  constructor(private readonly ground: Pick<Ground, 'now'>) {}

  /** Null when nobody has computed it, or it was swept. */
  async find(transaction: Transaction, key: ResultKey): Promise<object | null> {
    return (await this.results.find(transaction, key))?.body ?? null;
  }

  async keep(transaction: Transaction, key: ResultKey, body: object): Promise<void> {
    await this.results.keep(transaction, { ...key, body, createdAt: this.ground.now() });
  }
}
