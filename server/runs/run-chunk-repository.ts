import { managerOf, type Transaction } from '../database/transaction-runner';
import { RunChunk } from './run-chunk-entity';

export type ChunkKey = Pick<RunChunk, 'runId' | 'number'>;

export interface NextChunk extends ChunkKey {
  readonly seconds: number;
}

/** Chunks of runs. Every statement names a run or a team, so none reaches beyond. */
export class RunChunkRepository {
  async insert(transaction: Transaction, chunks: readonly RunChunk[]): Promise<void> {
    // A statement takes 65 535 parameters.
    for (let from = 0; from < chunks.length; from += 1000) {
      await managerOf(transaction).createQueryBuilder().insert().into(RunChunk).values(chunks.slice(from, from + 1000) as never).execute();
    }
  }

  async countInQueue(transaction: Transaction, teamId: string): Promise<number> {
    const [{ count }] = (await managerOf(transaction).query(`SELECT count(*)::int AS count FROM run_chunk WHERE team_id = $1 AND state IN ('sent', 'running')`, [teamId])) as [{ count: number }];
    return count;
  }

  /** The next chunk of a team: of the person with the fewest in the queue, of that person's oldest run, in the order of the plan. */
  async next(transaction: Transaction, teamId: string): Promise<NextChunk | null> {
    const rows = (await managerOf(transaction).query(
      `WITH busy AS (
        SELECT run.created_by AS person, count(*) AS chunks FROM run_chunk AS chunk JOIN run ON run.id = chunk.run_id
        WHERE chunk.team_id = $1 AND chunk.state IN ('sent', 'running') GROUP BY run.created_by)
      SELECT chunk.run_id AS "runId", chunk.number, chunk.seconds FROM run_chunk AS chunk JOIN run ON run.id = chunk.run_id LEFT JOIN busy ON busy.person = run.created_by
      WHERE chunk.team_id = $1 AND chunk.state = 'waiting'
      ORDER BY coalesce(busy.chunks, 0), run.created_at, run.id, chunk.number LIMIT 1`,
      [teamId],
    )) as NextChunk[];
    return rows[0] ?? null;
  }

  async markSent(transaction: Transaction, key: ChunkKey): Promise<void> {
    await managerOf(transaction).getRepository(RunChunk).update(pick(key), { state: 'sent' });
  }

  /** Takes the chunk for a worker and gives it with its new attempt; null when it is done or its run is over. */
  async begin(transaction: Transaction, key: ChunkKey, worker: string): Promise<RunChunk | null> {
    const done = await managerOf(transaction)
      .createQueryBuilder()
      .update(RunChunk)
      .set({ state: 'running', worker, attempt: () => 'attempt + 1' })
      .where(`run_id = :runId AND number = :number AND state IN ('sent', 'running')`, pick(key))
      .execute();
    return done.affected === 1 ? managerOf(transaction).getRepository(RunChunk).findOneByOrFail(pick(key)) : null;
  }

  /** Writes a part, unless another worker has begun the chunk since or it is no longer wanted; then false. */
  async finish(transaction: Transaction, chunk: ChunkKey & Pick<RunChunk, 'attempt'>, part: Buffer): Promise<boolean> {
    const { runId, number, attempt } = chunk;
    const done = await managerOf(transaction).getRepository(RunChunk).update({ runId, number, attempt, state: 'running' }, { state: 'done', part });
    return done.affected === 1;
  }

  /** In the order of the plan. */
  async ofRun(transaction: Transaction, runId: string): Promise<RunChunk[]> {
    return managerOf(transaction).getRepository(RunChunk).find({ where: { runId }, order: { number: 'ASC' } });
  }

  async removeOfRun(transaction: Transaction, runId: string): Promise<void> {
    await managerOf(transaction).getRepository(RunChunk).delete({ runId });
  }
}

const pick = ({ runId, number }: ChunkKey): ChunkKey => ({ runId, number });
