import { TeamScopedRepository } from '../database/team-scoped-repository';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { Membership } from './membership-entity';
import { Team } from './team-entity';

export interface MembershipOfTeam {
  readonly membership: Membership;
  readonly team: Team;
}

export class MembershipRepository extends TeamScopedRepository<Membership> {
  constructor() {
    super(Membership, 'person');
  }

  /** Every team a person works in and is not shut out of, the first joined first. */
  async enabledOfPerson(transaction: Transaction, personId: string): Promise<MembershipOfTeam[]> {
    const rows = await managerOf(transaction)
      .createQueryBuilder(Membership, 'membership')
      .innerJoinAndMapOne('membership.team', Team, 'team', 'team.id = membership.teamId')
      .where('membership.id = :personId AND membership.disabledAt IS NULL', { personId })
      .orderBy('membership.joinedAt', 'ASC')
      .addOrderBy('membership.teamId', 'ASC')
      .getMany();
    return (rows as (Membership & { team: Team })[]).map((row) => ({ membership: row, team: row.team }));
  }

  async listed(transaction: Transaction, teamId: string): Promise<Membership[]> {
    return this.rows(transaction, teamId, 'row').orderBy('row.joinedAt', 'ASC').addOrderBy('row.id', 'ASC').getMany();
  }

  /** Locks all of the team's members, in one order, for a decision about who is the last of something. */
  async listedLocked(transaction: Transaction, teamId: string): Promise<Membership[]> {
    return this.rows(transaction, teamId, 'row').orderBy('row.id', 'ASC').setLock('pessimistic_write').getMany();
  }

  async countEnabled(transaction: Transaction, teamId: string): Promise<number> {
    return this.rows(transaction, teamId, 'row').andWhere('row.disabledAt IS NULL').getCount();
  }
}
