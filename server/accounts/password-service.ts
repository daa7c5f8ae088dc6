import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import type { Caller } from '../http/caller';
import { InvalidInput } from '../http/problems';
import { hashOfSecret, newSecret } from '../http/single-use-secret';
import type { LetterService } from '../notices/letter-service';
import type { MembershipService } from '../teams/membership-service';
import type { PasswordHasher } from './password-hash';
import { PasswordResetRepository } from './password-reset-repository';
import type { PersonCard, PersonService } from './person-service';
import type { SessionService } from './session-service';
import type { SignInService } from './sign-in-service';

const LINK_LIFE_MS = 60 * 60 * 1000;
/** Letters to one person per link life: a stranger must not fill a mailbox. */
const MAX_LINKS = 3;
const POINTER = '#/newPassword';
const DEAD_LINK = 'This link is used, too old, or not complete. Ask for a new one.';

interface Parts {
  readonly ground: Ground;
  readonly people: PersonService;
  readonly hasher: PasswordHasher;
  readonly signIn: SignInService;
  readonly sessions: SessionService;
  readonly memberships: MembershipService;
  readonly letters: LetterService;
  readonly audit: AuditService;
}

/** Changing a password knowing the old one, and with a letter when it is lost. */
export class PasswordService {
  private readonly resets = new PasswordResetRepository();
  private readonly underWay = new Set<Promise<void>>();

  constructor(private readonly parts: Parts) {}

  /** @throws InvalidInput when the present password is wrong or the new one cannot be taken */
  async change(caller: Caller, change: { currentPassword: string; newPassword: string; endOtherSessions: boolean }): Promise<void> {
    const { ground, people, hasher, sessions } = this.parts;
    const account = await ground.transactions.read((transaction) => people.passwordHashOf(transaction, caller.person.email));
    if (!(await hasher.fits(change.currentPassword, account?.hash ?? null))) {
      throw new InvalidInput([{ pointer: '#/currentPassword', detail: 'is not your present password' }]);
    }
    const context = await ground.transactions.read((transaction) => this.wordsAbout(transaction, caller.person));
    const passwordHash = await people.hashNew(change.newPassword, { pointer: POINTER, context });
    await ground.transactions.run(async (transaction) => {
      await people.setPasswordHash(transaction, caller.person.id, passwordHash);
      if (change.endOtherSessions) await sessions.revokeAll(transaction, caller.person.id, { exceptId: caller.sessionId ?? undefined });
      await this.tellAboutChange(transaction, caller.person);
      await this.record(transaction, caller.person.id, 'password.changed');
    });
  }

  /**
   * Sends a link to the address if it has an account. The caller does not wait and learns nothing: a known address must
   * not take longer to answer than an unknown one.
   */
  request(email: string): void {
    const work = this.sendLink(email)
      .catch((error: unknown) => this.parts.ground.logger.error({ err: error }, 'password letter could not be written'))
      .finally(() => this.underWay.delete(work));
    this.underWay.add(work);
  }

  /** Resolves when every request so far has been dealt with. */
  async settled(): Promise<void> {
    await Promise.all(this.underWay);
  }

  /** Sets a new password with the token of a letter, and ends every session. @throws InvalidInput */
  async complete(token: string, newPassword: string): Promise<void> {
    const { ground, people, signIn, sessions } = this.parts;
    const person = await ground.transactions.run((transaction) => this.holderOf(transaction, token));
    const context = await ground.transactions.read((transaction) => this.wordsAbout(transaction, person));
    const passwordHash = await people.hashNew(newPassword, { pointer: POINTER, context });
    await ground.transactions.run(async (transaction) => {
      // Again, now that the slow hashing is over: two may have come with the same link.
      await this.holderOf(transaction, token);
      await this.resets.spendAll(transaction, person.id, ground.now());
      await people.setPasswordHash(transaction, person.id, passwordHash);
      await sessions.revokeAll(transaction, person.id);
      await signIn.forgetFailures(transaction, person.email);
      await this.tellAboutChange(transaction, person);
      await this.record(transaction, person.id, 'password.reset');
    });
  }

  private async holderOf(transaction: Transaction, token: string): Promise<PersonCard> {
    const reset = await this.resets.findLocked(transaction, hashOfSecret(token));
    if (reset === null || reset.usedAt !== null || reset.expiresAt <= this.parts.ground.now()) {
      throw new InvalidInput([{ pointer: '#/token', detail: DEAD_LINK }]);
    }
    return this.parts.people.require(transaction, reset.personId);
  }

  private async sendLink(email: string): Promise<void> {
    const { ground, people, letters } = this.parts;
    await ground.transactions.run(async (transaction) => {
      const person = await people.findByEmail(transaction, email);
      if (person === null) return;
      await people.lock(transaction, person.id);
      const now = ground.now();
      const recent = await this.resets.countSince(transaction, person.id, new Date(now.getTime() - LINK_LIFE_MS));
      if (recent >= MAX_LINKS) return;
      const token = newSecret();
      const expiresAt = new Date(now.getTime() + LINK_LIFE_MS);
      await this.resets.insert(transaction, { hash: hashOfSecret(token), personId: person.id, createdAt: now, expiresAt, usedAt: null });
      await letters.post(transaction, {
        to: person.email,
        subject: 'Set a new password for Slantwise',
        // Behind the #, so that neither this server's log nor anyone in between sees the token.
        text: [
          `Hello ${person.name},`,
          'someone, hopefully you, asked to set a new password for this address. The link works once, within 60 minutes:',
          `${ground.config.publicUrl}/new-password#${token}`,
          'If it was not you, nothing needs doing: your password stays as it is.',
        ].join('\n\n'),
      });
    });
  }

  private async tellAboutChange(transaction: Transaction, person: PersonCard): Promise<void> {
    await this.parts.letters.post(transaction, {
      to: person.email,
      subject: 'Your Slantwise password was changed',
      text: [
        `Hello ${person.name},`,
        `your password was changed at ${this.parts.ground.now().toISOString()}.`,
        `If it was not you, set a new one at once: ${this.parts.ground.config.publicUrl}/forgotten-password`,
      ].join('\n\n'),
    });
  }

  /** Words a guesser would try: name, address, teams. */
  private async wordsAbout(transaction: Transaction, person: PersonCard): Promise<string[]> {
    const teams = await this.parts.memberships.teamsOf(transaction, person.id);
    return [person.name, person.email, ...teams.map(({ teamName }) => teamName)];
  }

  private async record(transaction: Transaction, personId: string, action: string): Promise<void> {
    const teams = await this.parts.memberships.teamsOf(transaction, personId);
    // One order for everybody, so that two who write to several chains cannot wait for each other.
    for (const teamId of teams.map((team) => team.teamId).sort()) {
      await this.parts.audit.record(transaction, { teamId, personId, action, object: `person:${personId}` });
    }
  }
}
