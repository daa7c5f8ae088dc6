import { randomUUID } from 'node:crypto';
import type { Role } from '../../shared/contracts/common';
import type { Invitation as InvitationItem, InvitationWelcome } from '../../shared/contracts/team';
import type { PersonCard, PersonService } from '../accounts/person-service';
import type { Browser, OpenedSession, SessionService } from '../accounts/session-service';
import type { SignInService } from '../accounts/sign-in-service';
import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import type { Caller } from '../http/caller';
import { Conflict, InvalidInput, NotFound } from '../http/problems';
import { hashOfSecret, newSecret } from '../http/single-use-secret';
import type { LetterService } from '../notices/letter-service';
import type { Invitation } from './invitation-entity';
import { InvitationRepository } from './invitation-repository';
import type { MembershipService } from './membership-service';
import { TeamRepository } from './team-repository';

const LIFE_MS = 7 * 24 * 3600 * 1000;

interface Parts {
  readonly ground: Ground;
  readonly people: PersonService;
  readonly sessions: SessionService;
  readonly signIn: SignInService;
  readonly memberships: MembershipService;
  readonly letters: LetterService;
  readonly audit: AuditService;
}

interface Acceptance {
  readonly token: string;
  readonly name?: string;
  readonly password: string;
}

/** The only way into a team: a letter to an address, and its link used within a week. */
export class InvitationService {
  private readonly invitations = new InvitationRepository();
  private readonly teams = new TeamRepository();

  constructor(private readonly parts: Parts) {}

  async list(caller: Caller): Promise<InvitationItem[]> {
    const { transactions, now } = this.parts.ground;
    return transactions.read(async (transaction) => {
      const open = await this.invitations.open(transaction, caller.teamId, now());
      const names = await this.parts.people.names(transaction, open.flatMap(({ invitedBy }) => invitedBy ?? []));
      return open.map((row) => invitationItem(row, names));
    });
  }

  /** @throws Conflict when the address is in the team or invited already */
  async invite(caller: Caller, wanted: { email: string; roles: readonly Role[] }): Promise<InvitationItem> {
    const { transactions } = this.parts.ground;
    return transactions.run(async (transaction) => {
      const { row } = await this.write(transaction, { ...wanted, teamId: caller.teamId, invitedBy: caller.person });
      return invitationItem(row, new Map([[caller.person.id, caller.person.name]]));
    });
  }

  /** The link for the first administrator of a team, whom nobody could invite. Made on the machine of the server. */
  async inviteFirst(teamName: string, email: string): Promise<string> {
    return this.parts.ground.transactions.run(async (transaction) => {
      const team = await this.parts.memberships.ensureTeam(transaction, teamName);
      const { link } = await this.write(transaction, { email, roles: ['administrator'], teamId: team.id, invitedBy: null });
      return link;
    });
  }

  /** @throws NotFound */
  async withdraw(caller: Caller, id: string): Promise<void> {
    await this.parts.ground.transactions.run(async (transaction) => {
      const row = await this.invitations.requireLocked(transaction, caller.teamId, id);
      if (row.acceptedAt !== null) throw new Conflict('This invitation has been accepted.');
      await this.invitations.remove(transaction, caller.teamId, id);
      await this.parts.audit.record(transaction, {
        teamId: caller.teamId,
        personId: caller.person.id,
        action: 'invitation.withdrawn',
        object: `invitation:${id}`,
        detail: { email: row.email },
      });
    });
  }

  /** @throws NotFound for a token that opens nothing, whatever the reason */
  async lookUp(token: string): Promise<InvitationWelcome> {
    return this.parts.ground.transactions.run(async (transaction) => {
      const row = await this.openByToken(transaction, token);
      const team = await this.teams.require(transaction, row.teamId);
      const person = await this.parts.people.findByEmail(transaction, row.email);
      return { teamName: team.name, email: row.email, roles: row.roles, knownPerson: person !== null };
    });
  }

  /** A new address becomes a person; a known one proves its password. Then the person is in the team, and signed in. */
  async accept(acceptance: Acceptance, browser: Browser): Promise<OpenedSession> {
    const { ground, sessions, memberships, audit } = this.parts;
    const welcome = await this.lookUp(acceptance.token);
    const create = welcome.knownPerson ? await this.provenPerson(welcome.email, acceptance) : await this.newPerson(welcome, acceptance);
    return ground.transactions.run(async (transaction) => {
      const row = await this.openByToken(transaction, acceptance.token);
      const person = await create(transaction);
      if (await memberships.isMember(transaction, row.teamId, person.id)) throw new Conflict('You are in this team already.');
      await memberships.add(transaction, { teamId: row.teamId, personId: person.id, roles: row.roles });
      await this.invitations.update(transaction, row.teamId, row.id, { acceptedAt: ground.now() });
      const opened = await sessions.open(transaction, person, { browser, teamId: row.teamId });
      await audit.record(transaction, {
        teamId: row.teamId,
        personId: person.id,
        action: 'invitation.accepted',
        object: `person:${person.id}`,
        detail: { invitationId: row.id, email: row.email, roles: row.roles },
      });
      return opened;
    });
  }

  /** Addresses with an open invitation. */
  async addresses(teamId: string): Promise<string[]> {
    const { transactions, now } = this.parts.ground;
    const open = await transactions.read((transaction) => this.invitations.open(transaction, teamId, now()));
    return open.map(({ email }) => email);
  }

  private async provenPerson(email: string, { password }: Acceptance): Promise<(transaction: Transaction) => Promise<PersonCard>> {
    const person = await this.parts.signIn.verify(email, password);
    return () => Promise.resolve(person);
  }

  private async newPerson(welcome: InvitationWelcome, { name, password }: Acceptance): Promise<(transaction: Transaction) => Promise<PersonCard>> {
    const { people } = this.parts;
    if (name === undefined) throw new InvalidInput([{ pointer: '#/name', detail: 'is needed for a new account' }]);
    const context = [name, welcome.email, welcome.teamName];
    const passwordHash = await people.hashNew(password, { pointer: '#/password', context });
    return (transaction) => people.create(transaction, { email: welcome.email, name, passwordHash });
  }

  private async openByToken(transaction: Transaction, token: string): Promise<Invitation> {
    const row = await this.invitations.findByHashLocked(transaction, hashOfSecret(token));
    if (row === null || row.acceptedAt !== null || row.expiresAt <= this.parts.ground.now()) throw new NotFound('invitation');
    return row;
  }

  private async write(
    transaction: Transaction,
    wanted: { email: string; roles: readonly Role[]; teamId: string; invitedBy: PersonCard | null },
  ): Promise<{ row: Invitation; link: string }> {
    const { ground, letters, audit } = this.parts;
    const { email, teamId, invitedBy } = wanted;
    await this.refuseKnown(transaction, teamId, email);
    const token = newSecret();
    const now = ground.now();
    const row = await this.invitations.insert(transaction, teamId, {
      id: randomUUID(),
      email,
      roles: [...new Set(wanted.roles)],
      hash: hashOfSecret(token),
      invitedBy: invitedBy?.id ?? null,
      createdAt: now,
      expiresAt: new Date(now.getTime() + LIFE_MS),
      acceptedAt: null,
    });
    const team = await this.teams.require(transaction, teamId);
    const link = `${ground.config.publicUrl}/invitation#${token}`;
    const opening = invitedBy === null ? 'You are invited' : `${invitedBy.name} invites you`;
    await letters.post(transaction, {
      to: email,
      subject: `Invitation to the team ${team.name} on Slantwise`,
      text: [`${opening} to the team ${team.name} on Slantwise.`, `This link works once, within seven days:\n${link}`].join('\n\n'),
    });
    await audit.record(transaction, {
      teamId,
      personId: invitedBy?.id ?? null,
      action: 'invitation.created',
      object: `invitation:${row.id}`,
      detail: { email, roles: row.roles },
    });
    return { row, link };
  }

  private async refuseKnown(transaction: Transaction, teamId: string, email: string): Promise<void> {
    const { ground, people, memberships } = this.parts;
    // Two administrators may invite at the same moment: the second one must see what the first wrote.
    await this.invitations.lockAddress(transaction, teamId, email);
    const person = await people.findByEmail(transaction, email);
    if (person !== null && (await memberships.isMember(transaction, teamId, person.id))) {
      throw new Conflict('This address belongs to someone in the team already.');
    }
    const open = await this.invitations.open(transaction, teamId, ground.now());
    if (open.some((row) => row.email === email)) throw new Conflict('This address is invited already. Withdraw that invitation first.');
  }
}

const invitationItem = (row: Invitation, names: ReadonlyMap<string, string>): InvitationItem => ({
  id: row.id,
  email: row.email,
  roles: row.roles,
  invitedBy: { id: row.invitedBy ?? row.id, name: row.invitedBy === null ? 'The server' : (names.get(row.invitedBy) ?? 'unknown') },
  createdAt: row.createdAt.toISOString(),
  expiresAt: row.expiresAt.toISOString(),
});
