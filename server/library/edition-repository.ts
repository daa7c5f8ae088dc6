import { TeamScopedRepository } from '../database/team-scoped-repository';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { Edition } from './edition-entity';

export class EditionRepository extends TeamScopedRepository<Edition> {
  constructor() {
    super(Edition, 'edition');
  }

  async ofFamily(transaction: Transaction, teamId: string, familyId: string): Promise<Edition[]> {
    return this.store(transaction).findBy(this.ofTeam(teamId, { familyId }));
  }

  async ofTeamAll(transaction: Transaction, teamId: string): Promise<Edition[]> {
    return this.store(transaction).findBy(this.ofTeam(teamId));
  }

  async responses(transaction: Transaction, teamId: string, id: string): Promise<Buffer | null> {
    const row = await this.rows(transaction, teamId, 'edition').select(['edition.id', 'edition.responses']).andWhere('edition.id = :id', { id }).getOne();
    return row?.responses ?? null;
  }

  /** The next number of a family. Its row must be locked, so that two publications never get the same. */
  async nextNumber(transaction: Transaction, teamId: string, familyId: string): Promise<number> {
    const row = await this.rows(transaction, teamId, 'edition')
      .select('max(edition.number)', 'highest')
      .andWhere('edition.familyId = :familyId', { familyId })
      .getRawOne<{ highest: number | null }>();
    return (row?.highest ?? 0) + 1;
  }

  /** Drops kept bytes that no edition of the team names any more. */
  async dropOrphanFiles(transaction: Transaction, teamId: string): Promise<void> {
    await managerOf(transaction).query(
      `DELETE FROM kept_file k WHERE k.team_id = $1
         AND NOT EXISTS (SELECT 1 FROM edition_file e WHERE e.team_id = k.team_id AND e.sha256 = k.sha256)`,
      [teamId],
    );
  }
}
