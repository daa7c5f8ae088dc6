import { randomUUID } from 'node:crypto';
import jwt from 'jsonwebtoken';
import type { CurrentSession, OwnSession } from '../../shared/contracts/session';
import { isHttps } from '../config';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { ACCESS_AUDIENCE, TOKEN_ALGORITHM, TOKEN_ISSUER } from '../http/access-token';
import type { Caller } from '../http/caller';
import { NotFound, NotSignedIn } from '../http/problems';
import type { CookieChange } from '../http/reply';
import { clearedCookies, forgeryToken, sessionCookies, type SessionSecrets } from '../http/session-cookies';
import { hashOfSecret, newSecret } from '../http/single-use-secret';
import type { LetterService } from '../notices/letter-service';
import type { MembershipService, TeamRoles } from '../teams/membership-service';
import { ABSOLUTE_LIFE_MS, ACCESS_LIFE_SECONDS, IDLE_LIFE_MS, isLive, TOUCH_AFTER_MS } from './session-life';
import type { Person } from './person-entity';
import type { Session } from './session-entity';
import { SessionRepository } from './session-repository';

/** Where a sign-in comes from, for the list of one's own sessions. */
export interface Browser {
  readonly address: string;
  readonly userAgent: string;
}

export interface OpenedSession {
  readonly session: CurrentSession;
  readonly cookies: readonly CookieChange[];
}

interface Parts {
  readonly ground: Ground;
  readonly memberships: MembershipService;
  readonly letters: LetterService;
}

/** Sessions of signed-in browsers: opened, refreshed, listed, ended. */
export class SessionService {
  private readonly sessions = new SessionRepository();

  constructor(private readonly parts: Parts) {}

  /**
   * A new session with a new id, in the chosen team or the one the person joined first.
   * @throws NotSignedIn when no team lets the person in
   */
  async open(
    transaction: Transaction,
    person: Pick<Person, 'id' | 'name' | 'email'>,
    options: { browser: Browser; teamId?: string; endsAt?: Date },
  ): Promise<OpenedSession> {
    const teams = await this.parts.memberships.teamsOf(transaction, person.id);
    const team = options.teamId === undefined ? teams[0] : teams.find(({ teamId }) => teamId === options.teamId);
    if (team === undefined) throw new NotSignedIn('Address or password is wrong.');
    const now = this.parts.ground.now();
    const session: Session = {
      id: randomUUID(),
      personId: person.id,
      teamId: team.teamId,
      createdAt: now,
      lastUsedAt: now,
      endsAt: options.endsAt ?? new Date(now.getTime() + ABSOLUTE_LIFE_MS),
      revokedAt: null,
      address: options.browser.address,
      browser: options.browser.userAgent.slice(0, 200),
    };
    await this.sessions.insert(transaction, session);
    await this.parts.memberships.markSeen(transaction, team.teamId, person.id);
    return { session: this.described({ session, person, teams }), cookies: await this.secretsFor(transaction, session) };
  }

  /** Opens a session after a sign-in, and ends the one the browser had before. */
  async openFor(person: Pick<Person, 'id' | 'name' | 'email'>, options: { browser: Browser; replaces: Caller | null }): Promise<OpenedSession> {
    const { transactions, now } = this.parts.ground;
    const { replaces, browser } = options;
    return transactions.run(async (transaction) => {
      if (replaces !== null && replaces.sessionId !== null) {
        await this.sessions.revoke(transaction, replaces.person.id, now(), { id: replaces.sessionId });
      }
      return this.open(transaction, person, { browser });
    });
  }

  /** The caller behind an access token, as things are now; null when the session is over or the member shut out. */
  async callerOf(sessionId: string, personId: string): Promise<Caller | null> {
    const { transactions, now } = this.parts.ground;
    return transactions.read(async (transaction) => {
      const found = await this.sessions.findWithPerson(transaction, sessionId);
      if (found === null || found.person.id !== personId || !isLive(found.session, now())) return null;
      const { session, person } = found;
      const roles = await this.parts.memberships.rolesIn(transaction, session.teamId, personId);
      if (roles === null) return null;
      await this.touch(transaction, session);
      const { id, name, email } = person;
      return { person: { id, name, email }, teamId: session.teamId, roles, sessionId, tokenScopes: null };
    });
  }

  async current(sessionId: string): Promise<CurrentSession> {
    return this.parts.ground.transactions.read((transaction) => this.describe(transaction, sessionId));
  }

  /**
   * Exchanges a refresh token for the next one. Its second use means that two hold it, so the session ends.
   * @throws NotSignedIn
   */
  async refresh(refreshToken: string): Promise<OpenedSession> {
    const { transactions, logger, now } = this.parts.ground;
    // The refusal is thrown after the commit: rolling back would undo the revocation.
    const outcome = await transactions.run(async (transaction) => {
      const hash = hashOfSecret(refreshToken);
      const token = await this.sessions.findRefreshLocked(transaction, hash);
      if (token === null) return null;
      const session = await this.sessions.find(transaction, token.sessionId);
      if (session === null) return null;
      if (token.usedAt !== null) {
        await this.sessions.revoke(transaction, session.personId, now(), { id: session.id });
        logger.warn({ sessionId: session.id, personId: session.personId }, 'refresh token used twice: session ended');
        return null;
      }
      const roles = await this.parts.memberships.rolesIn(transaction, session.teamId, session.personId);
      if (!isLive(session, now()) || roles === null) return null;
      await this.sessions.markRefreshUsed(transaction, hash, now());
      await this.sessions.touch(transaction, session.id, now());
      const cookies = await this.secretsFor(transaction, session);
      return { session: await this.describe(transaction, session.id), cookies };
    });
    if (outcome === null) throw new NotSignedIn('The session is over.');
    return outcome;
  }

  /** Another team means other rights, so the session gets a new id; its absolute end stays. @throws NotFound */
  async chooseTeam(caller: Caller, teamId: string, browser: Browser): Promise<OpenedSession> {
    const { transactions, now } = this.parts.ground;
    return transactions.run(async (transaction) => {
      const old = caller.sessionId === null ? null : await this.sessions.find(transaction, caller.sessionId);
      const roles = await this.parts.memberships.rolesIn(transaction, teamId, caller.person.id);
      if (roles === null || old === null) throw new NotFound('team');
      await this.sessions.revoke(transaction, caller.person.id, now(), { id: old.id });
      return this.open(transaction, caller.person, { browser, teamId, endsAt: old.endsAt });
    });
  }

  /** One's own, the last used first. */
  async list(caller: Caller): Promise<OwnSession[]> {
    const { transactions, now } = this.parts.ground;
    const idleSince = new Date(now().getTime() - IDLE_LIFE_MS);
    const sessions = await transactions.read((transaction) => this.sessions.live(transaction, caller.person.id, { now: now(), idleSince }));
    return sessions.map((session) => ({
      id: session.id,
      current: session.id === caller.sessionId,
      createdAt: session.createdAt.toISOString(),
      lastUsedAt: session.lastUsedAt.toISOString(),
      address: session.address,
      browser: session.browser,
    }));
  }

  /** Ends one of one's own. @throws NotFound */
  async revokeOwn(caller: Caller, id: string): Promise<void> {
    const { transactions, now } = this.parts.ground;
    const count = await transactions.run((transaction) => this.sessions.revoke(transaction, caller.person.id, now(), { id }));
    if (count === 0) throw new NotFound('session');
  }

  async revokeOthers(caller: Caller): Promise<void> {
    const { transactions } = this.parts.ground;
    await transactions.run((transaction) => this.revokeAll(transaction, caller.person.id, { exceptId: caller.sessionId ?? undefined }));
  }

  /** Ends all of a person's, or those in one team, or all but one. */
  async revokeAll(transaction: Transaction, personId: string, which: { teamId?: string; exceptId?: string } = {}): Promise<number> {
    return this.sessions.revoke(transaction, personId, this.parts.ground.now(), which);
  }

  /** Ends the session that a caller or a refresh token stands for, if any. */
  async signOut(caller: Caller | null, refreshToken: string | undefined): Promise<void> {
    const { transactions, now } = this.parts.ground;
    await transactions.run(async (transaction) => {
      const token = refreshToken === undefined ? null : await this.sessions.findRefreshLocked(transaction, hashOfSecret(refreshToken));
      for (const id of new Set([caller?.sessionId, token?.sessionId])) {
        const session = id === null || id === undefined ? null : await this.sessions.find(transaction, id);
        if (session !== null) await this.sessions.revoke(transaction, session.personId, now(), { id: session.id });
      }
    });
  }

  get clearedCookies(): readonly CookieChange[] {
    return clearedCookies(isHttps(this.parts.ground.config));
  }

  /** Forgets sessions that ended more than a week ago. */
  async sweep(): Promise<void> {
    const { transactions, now } = this.parts.ground;
    const before = new Date(now().getTime() - 7 * 24 * 3600 * 1000);
    await transactions.run((transaction) => this.sessions.sweep(transaction, before));
  }

  private async touch(transaction: Transaction, session: Session): Promise<void> {
    const now = this.parts.ground.now();
    if (now.getTime() - session.lastUsedAt.getTime() < TOUCH_AFTER_MS) return;
    await this.sessions.touch(transaction, session.id, now);
    await this.parts.memberships.markSeen(transaction, session.teamId, session.personId);
  }

  private async describe(transaction: Transaction, sessionId: string): Promise<CurrentSession> {
    const found = await this.sessions.findWithPerson(transaction, sessionId);
    if (found === null) throw new NotSignedIn();
    return this.described({ ...found, teams: await this.parts.memberships.teamsOf(transaction, found.person.id) });
  }

  private described({ session, person, teams }: { session: Session; person: Pick<Person, 'id' | 'name' | 'email'>; teams: TeamRoles[] }): CurrentSession {
    const team = teams.find(({ teamId }) => teamId === session.teamId);
    if (team === undefined) throw new NotSignedIn();
    const idleEndsAt = new Date(Math.min(this.parts.ground.now().getTime() + IDLE_LIFE_MS, session.endsAt.getTime()));
    return {
      person: { id: person.id, name: person.name, email: person.email },
      team,
      teams,
      sessionId: session.id,
      idleEndsAt: idleEndsAt.toISOString(),
      endsAt: session.endsAt.toISOString(),
      demoMode: this.parts.ground.config.demoMode,
      letterBox: this.parts.letters.usesLetterBox,
    };
  }

  private async secretsFor(transaction: Transaction, session: Session): Promise<readonly CookieChange[]> {
    const { config, now } = this.parts.ground;
    // The session id in front lets the forgery check know the session without looking the token up.
    const refreshToken = `${session.id}.${newSecret()}`;
    await this.sessions.insertRefresh(transaction, { hash: hashOfSecret(refreshToken), sessionId: session.id, createdAt: now(), usedAt: null });
    const issuedAt = Math.floor(now().getTime() / 1000);
    const claims = { sub: session.personId, sid: session.id, typ: 'access', iat: issuedAt, nbf: issuedAt, exp: issuedAt + ACCESS_LIFE_SECONDS };
    const secrets: SessionSecrets = {
      accessToken: jwt.sign(claims, config.secret, { algorithm: TOKEN_ALGORITHM, issuer: TOKEN_ISSUER, audience: ACCESS_AUDIENCE }),
      refreshToken,
      forgeryToken: forgeryToken(config.secret, session.id),
    };
    const secondsLeft = Math.max(1, Math.floor((session.endsAt.getTime() - now().getTime()) / 1000));
    return sessionCookies(secrets, isHttps(config), secondsLeft);
  }
}
