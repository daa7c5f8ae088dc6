import type { Role } from '../../shared/contracts/common';
import type { Member, Team as TeamCard } from '../../shared/contracts/team';
import type { PersonCard, PersonService } from '../accounts/person-service';
import type { SessionService } from '../accounts/session-service';
import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import type { Caller } from '../http/caller';
import { Conflict, NotFound } from '../http/problems';
import type { Membership } from './membership-entity';
import { MembershipRepository } from './membership-repository';
import { TeamRepository } from './team-repository';

interface Parts {
  readonly ground: Pick<Ground, 'transactions' | 'now'>;
  readonly people: PersonService;
  readonly sessions: SessionService;
  readonly audit: AuditService;
}

/** The team of a session: its name, its people, their roles. */
export class TeamService {
  private readonly teams = new TeamRepository();
  private readonly memberships = new MembershipRepository();

  constructor(private readonly parts: Parts) {}

  async describe(caller: Caller): Promise<TeamCard> {
    return this.parts.ground.transactions.read((transaction) => this.card(transaction, caller.teamId));
  }

  async rename(caller: Caller, name: string): Promise<TeamCard> {
    return this.parts.ground.transactions.run(async (transaction) => {
      const { name: before } = await this.teams.require(transaction, caller.teamId);
      await this.teams.rename(transaction, caller.teamId, name);
      await this.record(transaction, caller, { action: 'team.renamed', object: `team:${caller.teamId}`, detail: { before, after: name } });
      return this.card(transaction, caller.teamId);
    });
  }

  /** Everybody of the team, disabled ones too, the first joined first. */
  async people(caller: Caller): Promise<Member[]> {
    return this.parts.ground.transactions.read(async (transaction) => {
      const memberships = await this.memberships.listed(transaction, caller.teamId);
      const cards = await this.parts.people.cards(transaction, memberships.map(({ id }) => id));
      return memberships.flatMap((membership) => {
        const person = cards.get(membership.id);
        return person === undefined ? [] : [memberOf(membership, person)];
      });
    });
  }

  /** Every team of this installation: for programs on the server's machine, never for a request. */
  async everyTeam(): Promise<{ id: string; name: string }[]> {
    return this.parts.ground.transactions.read((transaction) => this.teams.all(transaction));
  }

  /** Addresses of the team's people, for what only its administrators may see. */
  async addresses(teamId: string): Promise<string[]> {
    return this.parts.ground.transactions.read(async (transaction) => {
      const memberships = await this.memberships.listed(transaction, teamId);
      const cards = await this.parts.people.cards(transaction, memberships.map(({ id }) => id));
      return [...cards.values()].map(({ email }) => email);
    });
  }

  /**
   * Roles act on the next request; being disabled ends the person's sessions in this team at once.
   * @throws NotFound, and Conflict when no enabled administrator would be left
   */
  async changeMember(caller: Caller, personId: string, change: { roles?: readonly Role[]; disabled?: boolean }): Promise<Member> {
    const { ground, people, sessions } = this.parts;
    return ground.transactions.run(async (transaction) => {
      const all = await this.memberships.listedLocked(transaction, caller.teamId);
      const before = all.find(({ id }) => id === personId);
      if (before === undefined) throw new NotFound('person');
      const after = changedMembership(before, change, ground.now());
      const others = all.filter(({ id }) => id !== personId);
      if (![...others, after].some(isActiveAdministrator)) throw new Conflict('A team needs one administrator who is not disabled.');
      await this.memberships.update(transaction, caller.teamId, personId, { roles: after.roles, disabledAt: after.disabledAt });
      if (after.disabledAt !== null) await sessions.revokeAll(transaction, personId, { teamId: caller.teamId });
      await this.record(transaction, caller, {
        action: 'member.changed',
        object: `person:${personId}`,
        detail: { before: rightsOf(before), after: rightsOf(after) },
      });
      return memberOf(after, await people.require(transaction, personId));
    });
  }

  private async card(transaction: Transaction, teamId: string): Promise<TeamCard> {
    const team = await this.teams.require(transaction, teamId);
    const peopleCount = await this.memberships.countEnabled(transaction, teamId);
    return { id: team.id, name: team.name, peopleCount, createdAt: team.createdAt.toISOString() };
  }

  private async record(transaction: Transaction, caller: Caller, entry: { action: string; object: string; detail: Record<string, unknown> }): Promise<void> {
    await this.parts.audit.record(transaction, { ...entry, teamId: caller.teamId, personId: caller.person.id });
  }
}

const isActiveAdministrator = ({ roles, disabledAt }: Membership): boolean => disabledAt === null && roles.includes('administrator');

const rightsOf = ({ roles, disabledAt }: Membership): { roles: Role[]; disabled: boolean } => ({ roles, disabled: disabledAt !== null });

function changedMembership(before: Membership, change: { roles?: readonly Role[]; disabled?: boolean }, now: Date): Membership {
  const roles = change.roles === undefined ? before.roles : [...new Set(change.roles)];
  const disabled = change.disabled ?? before.disabledAt !== null;
  return { ...before, roles, disabledAt: disabled ? (before.disabledAt ?? now) : null };
}

const memberOf = (membership: Membership, person: PersonCard): Member => ({
  id: person.id,
  name: person.name,
  email: person.email,
  roles: membership.roles,
  disabled: membership.disabledAt !== null,
  lastSeenAt: membership.lastSeenAt?.toISOString() ?? null,
  joinedAt: membership.joinedAt.toISOString(),
});
