import { randomUUID } from 'node:crypto';
import type { Scope } from '../../shared/contracts/common';
import type { PersonalToken as TokenItem, TokenCreated } from '../../shared/contracts/session';
import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import type { Caller } from '../http/caller';
import { InvalidInput, NotFound } from '../http/problems';
import { hashOfSecret, newSecret } from '../http/single-use-secret';
import type { MembershipService } from '../teams/membership-service';
import type { PersonalToken } from './personal-token-entity';
import { PersonalTokenRepository } from './personal-token-repository';
import { scopesOfRoles } from './token-scopes';

/** Marks our secrets, so that scanners of repositories find a leaked one. */
const PREFIX = 'slw_';
const DAY_MS = 24 * 3600 * 1000;
/** `lastUsedAt` is kept to this accuracy, so that not every request writes. */
const TOUCH_AFTER_MS = 60_000;
const MAX_TOKENS = 50;

interface Parts {
  readonly ground: Pick<Ground, 'transactions' | 'now'>;
  readonly memberships: MembershipService;
  readonly audit: AuditService;
}

type Owner = Pick<Caller, 'person' | 'teamId' | 'roles'>;

/** Personal tokens: keys for scripts, for one person in one team. */
export class TokenService {
  private readonly tokens = new PersonalTokenRepository();

  constructor(private readonly parts: Parts) {}

  /** The caller behind a token, as things are now; null for an unknown, expired or orphaned one. */
  async callerOf(secret: string): Promise<Caller | null> {
    if (!secret.startsWith(PREFIX)) return null;
    const { transactions, now } = this.parts.ground;
    return transactions.read(async (transaction) => {
      const found = await this.tokens.findByHash(transaction, hashOfSecret(secret));
      if (found === null || found.token.expiresAt <= now()) return null;
      const { token, person } = found;
      const roles = await this.parts.memberships.rolesIn(transaction, token.teamId, person.id);
      if (roles === null) return null;
      if (token.lastUsedAt === null || now().getTime() - token.lastUsedAt.getTime() > TOUCH_AFTER_MS) {
        await this.tokens.touch(transaction, token.id, now());
      }
      const { id, name, email } = person;
      return { person: { id, name, email }, teamId: token.teamId, roles, sessionId: null, tokenScopes: token.scopes };
    });
  }

  async list(owner: Owner): Promise<TokenItem[]> {
    const { transactions, now } = this.parts.ground;
    const rows = await transactions.read((transaction) => this.tokens.listed(transaction, ownerKey(owner), now()));
    return rows.map(tokenItem);
  }

  /** @throws InvalidInput for scopes that the person's roles do not allow */
  async create(owner: Owner, wanted: { name: string; scopes: readonly Scope[]; days: number }): Promise<TokenCreated> {
    const allowed = scopesOfRoles(owner.roles);
    const faults = wanted.scopes.flatMap((scope, index) =>
      allowed.includes(scope) ? [] : [{ pointer: `#/scopes/${index}`, detail: `"${scope}" needs another role than yours` }],
    );
    if (faults.length > 0) throw new InvalidInput(faults);
    const secret = `${PREFIX}${newSecret()}`;
    const { transactions, now } = this.parts.ground;
    const token: PersonalToken = {
      id: randomUUID(),
      personId: owner.person.id,
      teamId: owner.teamId,
      name: wanted.name,
      scopes: [...new Set(wanted.scopes)],
      hash: hashOfSecret(secret),
      createdAt: now(),
      expiresAt: new Date(now().getTime() + wanted.days * DAY_MS),
      lastUsedAt: null,
    };
    await transactions.run(async (transaction) => {
      const present = await this.tokens.listed(transaction, ownerKey(owner), now());
      if (present.length >= MAX_TOKENS) throw new InvalidInput([{ pointer: '#', detail: `no more than ${MAX_TOKENS} tokens; revoke one first` }]);
      await this.tokens.insert(transaction, token);
      await this.parts.audit.record(transaction, {
        teamId: owner.teamId,
        personId: owner.person.id,
        action: 'token.created',
        object: `token:${token.id}`,
        detail: { name: token.name, scopes: token.scopes, expiresAt: token.expiresAt.toISOString() },
      });
    });
    return { ...tokenItem(token), secret };
  }

  /** @throws NotFound */
  async revoke(owner: Owner, id: string): Promise<void> {
    await this.parts.ground.transactions.run(async (transaction) => {
      if (!(await this.tokens.remove(transaction, ownerKey(owner), id))) throw new NotFound('token');
      const entry = { teamId: owner.teamId, personId: owner.person.id, action: 'token.revoked', object: `token:${id}` };
      await this.parts.audit.record(transaction, entry);
    });
  }
}

const ownerKey = (owner: Owner): { personId: string; teamId: string } => ({ personId: owner.person.id, teamId: owner.teamId });

const tokenItem = (token: PersonalToken): TokenItem => ({
  id: token.id,
  name: token.name,
  scopes: token.scopes,
  createdAt: token.createdAt.toISOString(),
  expiresAt: token.expiresAt.toISOString(),
  lastUsedAt: token.lastUsedAt?.toISOString() ?? null,
});
