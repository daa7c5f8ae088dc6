import { randomUUID } from 'node:crypto';
import type { Role } from '../../shared/contracts/common';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { MembershipRepository } from './membership-repository';
import type { Team } from './team-entity';
import { TeamRepository } from './team-repository';

/** A team someone works in, with what they may do there. */
export interface TeamRoles {
  readonly teamId: string;
  readonly teamName: string;
  readonly roles: Role[];
}

/** Who works where. The accounts ask here whether a session or token still stands for a member. */
export class MembershipService {
  private readonly memberships = new MembershipRepository();
  private readonly teams = new TeamRepository();

  constructor(private readonly ground: Pick<Ground, 'now'>) {}

  /** Teams of a person who is not shut out of them, the first joined first. */
  async teamsOf(transaction: Transaction, personId: string): Promise<TeamRoles[]> {
    const rows = await this.memberships.enabledOfPerson(transaction, personId);
    return rows.map(({ membership, team }) => ({ teamId: team.id, teamName: team.name, roles: membership.roles }));
  }

  /** Null when the person is not, or no longer, in the team. */
  async rolesIn(transaction: Transaction, teamId: string, personId: string): Promise<Role[] | null> {
    const membership = await this.memberships.find(transaction, teamId, personId);
    return membership === null || membership.disabledAt !== null ? null : membership.roles;
  }

  async markSeen(transaction: Transaction, teamId: string, personId: string): Promise<void> {
    await this.memberships.update(transaction, teamId, personId, { lastSeenAt: this.ground.now() });
  }

  async add(transaction: Transaction, member: { teamId: string; personId: string; roles: readonly Role[] }): Promise<void> {
    await this.memberships.insert(transaction, member.teamId, {
      id: member.personId,
      roles: [...member.roles],
      joinedAt: this.ground.now(),
      disabledAt: null,
      lastSeenAt: null,
    });
  }

  /** The person's membership whatever its state, for those who may invite someone back. */
  async isMember(transaction: Transaction, teamId: string, personId: string): Promise<boolean> {
    return (await this.memberships.find(transaction, teamId, personId)) !== null;
  }

  /** The team of this name, made where there is none: for the first start. */
  async ensureTeam(transaction: Transaction, name: string): Promise<Team> {
    const known = await this.teams.findByName(transaction, name);
    if (known !== null) return known;
    const team = { id: randomUUID(), name, createdAt: this.ground.now() };
    await this.teams.insert(transaction, team);
    return team;
  }
}
