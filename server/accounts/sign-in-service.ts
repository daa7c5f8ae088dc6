import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { NotSignedIn, TooMany } from '../http/problems';
import { hashOfSecret } from '../http/single-use-secret';
import type { PasswordHasher } from './password-hash';
import type { PersonCard, PersonService } from './person-service';
import { delayAfterFailuresS } from './sign-in-delay';
import { SignInAttemptRepository } from './sign-in-attempt-repository';

interface Parts {
  readonly ground: Pick<Ground, 'transactions' | 'now' | 'logger'>;
  readonly people: PersonService;
  readonly hasher: PasswordHasher;
}

/** Checks passwords. An unknown address and a wrong password get the same words, status, delay and time. */
export class SignInService {
  private readonly attempts = new SignInAttemptRepository();

  constructor(private readonly parts: Parts) {}

  /** @throws NotSignedIn, TooMany */
  async verify(email: string, password: string): Promise<PersonCard> {
    const { ground, people, hasher } = this.parts;
    await this.countAttempt(email);
    const account = await ground.transactions.read((transaction) => people.passwordHashOf(transaction, email));
    const fits = await hasher.fits(password, account?.hash ?? null);
    if (account === null || !fits) {
      ground.logger.info({ addressHash: hashOfSecret(email).slice(0, 12) }, 'sign-in refused');
      throw new NotSignedIn('Address or password is wrong.');
    }
    // Made before the transaction: it takes long and would hold a connection meanwhile.
    const renewed = hasher.isOutdated(account.hash) ? await hasher.hash(password) : null;
    ground.logger.info({ personId: account.personId }, 'sign-in accepted');
    return ground.transactions.run(async (transaction) => {
      if (renewed !== null) await people.setPasswordHash(transaction, account.personId, renewed);
      await this.forgetFailures(transaction, email);
      return people.require(transaction, account.personId);
    });
  }

  /** After a proof of another kind, such as a letter that reached its address. */
  async forgetFailures(transaction: Transaction, email: string): Promise<void> {
    await this.attempts.forget(transaction, hashOfSecret(email));
  }

  /** Counts before checking, so that guesses sent all at once are not all free; a success forgets the count. */
  private async countAttempt(email: string): Promise<void> {
    const { transactions, now, logger } = this.parts.ground;
    const waitMs = await transactions.run(async (transaction) => {
      const attempt = await this.attempts.lock(transaction, hashOfSecret(email), now());
      const left = attempt.nextAt.getTime() - now().getTime();
      if (left > 0) return left;
      const failures = attempt.failures + 1;
      const nextAt = new Date(now().getTime() + delayAfterFailuresS(failures) * 1000);
      await this.attempts.change(transaction, { ...attempt, failures, nextAt });
      return 0;
    });
    if (waitMs > 0) {
      logger.warn({ addressHash: hashOfSecret(email).slice(0, 12) }, 'sign-in delayed');
      throw new TooMany(Math.ceil(waitMs / 1000), 'Too many attempts for this address.');
    }
  }
}
