import { managerOf, type Transaction } from '../database/transaction-runner';
import { Result } from './result-entity';

export type ResultKey = Pick<Result, 'teamId' | 'contentHash' | 'kind' | 'engineVersion'>;

export class ResultRepository {
  async find(transaction: Transaction, key: ResultKey): Promise<Result | null> {
    return managerOf(transaction).getRepository(Result).findOneBy(key);
  }

  /** Whoever computed it first is right as well: equal inputs give equal results. */
  async keep(transaction: Transaction, result: Result): Promise<void> {
    await managerOf(transaction).createQueryBuilder().insert().into(Result).values(result).orIgnore().execute();
  }

  async removeOlderThan(transaction: Transaction, before: Date): Promise<void> {
    // What was computed of a revision stays with it.
    await managerOf(transaction).query(
      `DELETE FROM result WHERE created_at < $1 AND NOT EXISTS (
        SELECT FROM run WHERE run.team_id = result.team_id AND run.result_key = result.content_hash AND run.kind = result.kind AND run.revision_id IS NOT NULL)`,
      [before],
    );
  }
}
