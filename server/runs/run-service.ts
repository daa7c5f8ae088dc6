import { randomUUID } from 'node:crypto';
import type { RunDetail, RunListQuery, RunProgress, RunRequest, RunSummary } from '../../shared/contracts/runs';
import type { AuditService } from '../audit/audit-service';
import { cutPage, readCursor } from '../database/cursor';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { hasRole, type Caller } from '../http/caller';
import { Conflict, NotAllowed, TooMany } from '../http/problems';
import type { ResultService } from '../predictions/result-service';
import type { Actor, DraftService } from '../projects/draft-service';
import { RunChunkRepository } from './run-chunk-repository';
import type { RunDispatchService } from './run-dispatch-service';
import type { Run } from './run-entity';
import type { PlannedRun, RunPlanningService } from './run-planning-service';
import { runProgress, type RunSurroundings } from './run-progress';
import { resultKeyOf } from './run-result-key';
import { RunRepository, type RunFilter } from './run-repository';
import { runDetailOf, runSummaryOf } from './run-view';

export interface RunServiceParts {
  readonly ground: Pick<Ground, 'transactions' | 'now'>;
  readonly drafts: DraftService;
  readonly planner: RunPlanningService;
  readonly dispatcher: RunDispatchService;
  readonly results: ResultService;
  readonly audit: AuditService;
}

/** Runs of a team waiting or under way, at most. */
export const MAX_ACTIVE_RUNS = 20;
const RETRY_SECONDS = 10;
const DEFAULT_PAGE = 20;
const KEPT_DAYS = 90;
const DAY_MS = 24 * 3600 * 1000;

/** Runs as people see them: starting, watching, cancelling. */
export class RunService {
  private readonly runs = new RunRepository();
  private readonly chunks = new RunChunkRepository();

  constructor(private readonly parts: RunServiceParts) {}

  /**
   * Starts a run, or joins one that computes the same already; one whose result is known is done at once.
   * @throws NotFound; InvalidInput for what cannot be computed or would take too long; TooMany
   */
  async start(actor: Actor, panelId: string, request: RunRequest): Promise<RunDetail> {
    const { ground, planner } = this.parts;
    const planned = await planner.plan(actor.teamId, panelId, request);
    const id = await ground.transactions.run(async (transaction) => {
      await this.runs.lockTeam(transaction, actor.teamId);
      const keyed = { ...planned, teamId: actor.teamId };
      const active = await this.runs.findActive(transaction, keyed);
      if (active !== null) return active.id;
      const known = await this.parts.results.find(transaction, resultKeyOf(keyed));
      return this.insert(transaction, actor, planned, known !== null);
    });
    return this.detail(actor.teamId, id);
  }

  /** Newest first. @throws NotFound for a panel that is not there */
  async list(teamId: string, { after, limit = DEFAULT_PAGE, ...filter }: RunListQuery & RunFilter): Promise<{ items: RunSummary[]; next: string | null }> {
    return this.parts.ground.transactions.run(async (transaction) => {
      if (filter.panelId !== undefined) await this.parts.drafts.require(transaction, teamId, filter.panelId);
      const rows = await this.runs.list(transaction, teamId, filter, { after: readCursor(after), limit: limit + 1 });
      const around = await this.surroundings(transaction, rows);
      return cutPage(rows, limit, { cursorOf: (row) => ({ sort: row.createdAt.toISOString(), id: row.id }), itemOf: (row) => runSummaryOf(row, around(row)) });
    }, 'REPEATABLE READ');
  }

  /** @throws NotFound */
  async detail(teamId: string, runId: string): Promise<RunDetail> {
    return this.parts.ground.transactions.read(async (transaction) => {
      const run = await this.runs.require(transaction, teamId, runId);
      const around = await this.surroundings(transaction, [run]);
      const result = run.state === 'done' ? await this.parts.results.find(transaction, resultKeyOf(run)) : null;
      return runDetailOf(run, around(run), result);
    });
  }

  /** How far these runs have come; unknown ones are absent. */
  async progressOf(teamId: string, runIds: readonly string[]): Promise<ReadonlyMap<string, RunProgress>> {
    return this.parts.ground.transactions.read(async (transaction) => {
      const rows = await this.runs.some(transaction, teamId, runIds);
      const around = await this.surroundings(transaction, rows);
      return new Map(rows.map((row) => [row.id, runProgress(row, around(row))]));
    });
  }

  /** @throws NotFound; Conflict when it is over; NotAllowed for whoever neither started it nor designs */
  async cancel(caller: Caller, runId: string): Promise<RunDetail> {
    const { ground, dispatcher, audit } = this.parts;
    const { teamId, person } = caller;
    await ground.transactions.run(async (transaction) => {
      const run = await this.runs.requireLocked(transaction, teamId, runId);
      if (run.createdBy !== person.id && !hasRole(caller, 'designer', 'administrator')) throw new NotAllowed('Only who started a run, a designer or an administrator may cancel it.');
      if (run.finishedAt !== null) throw new Conflict(`The run is over: it is ${run.state}.`);
      await this.runs.update(transaction, teamId, runId, { state: 'cancelled', finishedAt: ground.now() });
      await this.chunks.removeOfRun(transaction, runId);
      await dispatcher.fill(transaction, teamId);
      await audit.record(transaction, { teamId, personId: person.id, action: 'run.cancelled', object: `run:${runId}`, detail: { kind: run.kind, panel: run.panelId } });
    });
    return this.detail(teamId, runId);
  }

  async sweep(): Promise<void> {
    const before = new Date(this.parts.ground.now().getTime() - KEPT_DAYS * DAY_MS);
    await this.parts.ground.transactions.run((transaction) => this.runs.removeOlderThan(transaction, before));
  }

  private async insert(transaction: Transaction, { teamId, person }: Actor, planned: PlannedRun, isKnown: boolean): Promise<string> {
    const { ground, dispatcher, audit } = this.parts;
    if (!isKnown && (await this.runs.countActive(transaction, teamId)) >= MAX_ACTIVE_RUNS) {
      throw new TooMany(RETRY_SECONDS, `Your team has ${MAX_ACTIVE_RUNS} runs waiting or under way already.`);
    }
    const now = ground.now();
    const { chunks: plan, ...values } = planned;
    const chunks = isKnown ? [] : plan;
    const times = isKnown ? { startedAt: now, finishedAt: now } : { startedAt: null, finishedAt: null };
    const run = await this.runs.insert(transaction, teamId, {
      ...values,
      ...times,
      id: randomUUID(),
      state: isKnown ? 'done' : 'queued',
      createdAt: now,
      createdBy: person.id,
      createdByName: person.name,
      chunkCount: chunks.length,
      plannedSeconds: chunks.reduce((sum, { seconds }) => sum + seconds, 0),
      doneCount: 0,
      doneSeconds: 0,
      restartCount: 0,
      reused: isKnown,
      failureMessage: null,
      failureId: null,
    });
    await this.chunks.insert(transaction, chunks.map(({ chunk, seconds }, number) => ({ runId: run.id, number, teamId, chunk, seconds, state: 'waiting', attempt: 0, worker: null, part: null })));
    await dispatcher.fill(transaction, teamId);
    await audit.record(transaction, { teamId, personId: person.id, action: 'run.started', object: `run:${run.id}`, detail: { kind: run.kind, panel: run.panelId, content: run.contentHash } });
    return run.id;
  }

  private async surroundings(transaction: Transaction, rows: readonly Run[]): Promise<(row: Run) => RunSurroundings> {
    const waiting = rows.filter(({ state }) => state === 'queued').map(({ id }) => id);
    const positions = await this.runs.queuePositions(transaction, waiting);
    const threadCount = await this.parts.dispatcher.threadCount(transaction);
    const now = this.parts.ground.now();
    return ({ id }) => ({ now, threadCount, queuePosition: positions.get(id) ?? null });
  }
}
