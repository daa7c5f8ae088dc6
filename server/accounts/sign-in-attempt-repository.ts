import { managerOf, type Transaction } from '../database/transaction-runner';
import { SignInAttempt } from './sign-in-attempt-entity';

export class SignInAttemptRepository {
  /** The row of an address, made where missing and locked, so that parallel guesses are counted one after another. */
  async lock(transaction: Transaction, addressHash: string, now: Date): Promise<SignInAttempt> {
    const store = managerOf(transaction).getRepository(SignInAttempt);
    await store.createQueryBuilder().insert().values({ addressHash, failures: 0, nextAt: now }).orIgnore().execute();
    return store.findOneOrFail({ where: { addressHash }, lock: { mode: 'pessimistic_write' } });
  }

  async change(transaction: Transaction, { addressHash, failures, nextAt }: SignInAttempt): Promise<void> {
    await managerOf(transaction).getRepository(SignInAttempt).update({ addressHash }, { failures, nextAt });
  }

  async forget(transaction: Transaction, addressHash: string): Promise<void> {
    await managerOf(transaction).getRepository(SignInAttempt).delete({ addressHash });
  }
}
