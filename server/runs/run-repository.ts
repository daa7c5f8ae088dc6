import { LessThan, Not, In, IsNull, type FindOptionsWhere } from 'typeorm';
import type { RunKind, RunState } from '../../shared/contracts/runs';
import type { Cursor } from '../database/cursor';
import { TeamScopedRepository } from '../database/team-scoped-repository';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { Run } from './run-entity';

const ACTIVE: readonly RunState[] = ['queued', 'running'];

export interface RunFilter {
  readonly panelId?: string;
  readonly kind?: RunKind;
  readonly revisionId?: string;
}

export class RunRepository extends TeamScopedRepository<Run> {
  constructor() {
    super(Run, 'run');
  }

  /** Newest first, from behind the cursor. */
  async list(transaction: Transaction, teamId: string, filter: RunFilter, page: { after: Cursor | null; limit: number }): Promise<Run[]> {
    const query = this.rows(transaction, teamId, 'run').orderBy('run.createdAt', 'DESC').addOrderBy('run.id', 'DESC').limit(page.limit);
    for (const [name, value] of Object.entries(filter)) {
      if (value !== undefined) query.andWhere(`run.${name} = :${name}`, { [name]: value as string });
    }
    if (page.after !== null) query.andWhere('(run.createdAt, run.id) < (:sort, :id)', { ...page.after });
    return query.getMany();
  }

  async some(transaction: Transaction, teamId: string, ids: readonly string[]): Promise<Run[]> {
    return this.store(transaction).findBy(this.ofTeam(teamId, { id: In([...ids]) }));
  }

  async countActive(transaction: Transaction, teamId: string): Promise<number> {
    return this.store(transaction).countBy(this.ofTeam(teamId, { state: In([...ACTIVE]) }));
  }

  /** The run that computes the same already, of the draft or of this very revision. */
  async findActive(transaction: Transaction, { teamId, resultKey, engineVersion, revisionId }: Pick<Run, 'teamId' | 'resultKey' | 'engineVersion' | 'revisionId'>): Promise<Run | null> {
    return this.store(transaction).findOneBy(this.ofTeam(teamId, { resultKey, engineVersion, revisionId: revisionId ?? IsNull(), state: In([...ACTIVE]) }));
  }

  /** One thing at a time decides about the queue of a team, until the transaction ends. */
  async lockTeam(transaction: Transaction, teamId: string): Promise<void> {
    await managerOf(transaction).query('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [`runs:${teamId}`]);
  }

  /**
   * Places in the common queue: the oldest waiting run of every team comes before any team's second. Only places are
   * told of other teams' runs, nothing else.
   */
  async queuePositions(transaction: Transaction, ids: readonly string[]): Promise<ReadonlyMap<string, number>> {
    if (ids.length === 0) return new Map();
    const rows = (await managerOf(transaction).query(
      `SELECT id, place::int FROM (
        SELECT id, row_number() OVER (ORDER BY turn, created_at, id) AS place FROM (
          SELECT id, created_at, row_number() OVER (PARTITION BY team_id ORDER BY created_at, id) AS turn FROM run WHERE state = 'queued') AS waiting) AS placed
      WHERE id = ANY($1)`,
      [ids],
    )) as { id: string; place: number }[];
    return new Map(rows.map(({ id, place }) => [id, place]));
  }

  /** Of these runs those that are no longer computed, whatever their team: for a worker that computes for all. */
  async endedOf(transaction: Transaction, ids: readonly string[]): Promise<string[]> {
    const rows = await managerOf(transaction).getRepository(Run).find({ select: { id: true }, where: { id: In([...ids]), state: Not(In([...ACTIVE])) } });
    return rows.map(({ id }) => id);
  }

  /** Drops what is long over, except what was computed of a revision. */
  async removeOlderThan(transaction: Transaction, before: Date): Promise<void> {
    const old: FindOptionsWhere<Run> = { createdAt: LessThan(before), revisionId: IsNull(), state: Not(In([...ACTIVE])) };
    await managerOf(transaction).getRepository(Run).delete(old);
  }
}
