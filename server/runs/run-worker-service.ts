import { setTimeout as wait } from 'node:timers/promises';
import type { DesignDocument } from '../../shared/model/design-document';
import type { Ground } from '../database/ground';
import type { ChunkRunner } from '../engine/chunk-runner';
import type { ChunkOutcome } from '../engine/chunk-task';
import type { EngineEdition } from '../engine/prediction-task';
import type { RunChunkService, TakenChunk } from './run-chunk-service';
import type { RunJob, RunQueueRepository } from './run-queue-repository';
import type { RunRosterService } from './run-roster-service';

export interface RunWorkerParts {
  readonly ground: Pick<Ground, 'logger'>;
  readonly queue: RunQueueRepository;
  readonly chunks: RunChunkService;
  readonly roster: RunRosterService;
  readonly runner: ChunkRunner;
  /** Null where the cells come from no edition. */
  readonly editionFor: (teamId: string, design: DesignDocument) => Promise<EngineEdition | null>;
  readonly threadCount: number;
}

/** An empty queue is looked at again after this; it bounds how long a small run waits for an idle worker. */
const POLL_MS = 250;
const HEARTBEAT_MS = 3000;
/** How often a worker asks whether what it computes is still wanted, and how long a thread may take to stop by itself. */
const CANCEL_CHECK_MS = 500;
const STOP_PATIENCE_MS = 700;
const AFTER_ERROR_MS = 1000;
/** What is under way when a worker is asked to end may take so long; then it is given back. */
const FINISH_MS = 20_000;

interface Held {
  readonly runId: string;
  readonly stop: Int32Array;
  readonly ending: AbortController;
}

/** Takes chunks from the queue and computes them, one per thread, until it is asked to end. */
export class RunWorkerService {
  private readonly held = new Set<Held>();
  private readonly timers: NodeJS.Timeout[] = [];
  private readonly stopping = new AbortController();
  private loops: Promise<void>[] = [];
  private endSupervision: () => Promise<void> = async () => undefined;

  constructor(private readonly parts: RunWorkerParts) {}

  async start(): Promise<void> {
    const { queue, roster, threadCount } = this.parts;
    this.endSupervision = await queue.supervise();
    await roster.see(threadCount);
    this.every(HEARTBEAT_MS, async () => {
      await roster.see(threadCount);
      await this.endTheDead();
    });
    this.every(CANCEL_CHECK_MS, () => this.stopTheUnwanted());
    this.loops = Array.from({ length: threadCount }, () => this.takeUntilStopped());
  }

  /** Takes nothing more, finishes what it has, and gives back what takes too long. */
  async stop(): Promise<void> {
    const { roster, runner } = this.parts;
    this.stopping.abort();
    const late = setTimeout(() => this.held.forEach(({ ending }) => ending.abort()), FINISH_MS);
    await Promise.all(this.loops);
    clearTimeout(late);
    this.timers.forEach((timer) => clearInterval(timer));
    await roster.leave();
    await this.endSupervision();
    await runner.close();
  }

  /** Runs `work` again and again, never twice at a time; a failure is logged and the next turn tries anew. */
  private every(milliseconds: number, work: () => Promise<void>): void {
    let busy = false;
    this.timers.push(
      setInterval(() => {
        if (busy) return;
        busy = true;
        work()
          .catch((error: unknown) => this.parts.ground.logger.error({ err: error }, 'a worker could not reach the database'))
          .finally(() => (busy = false));
      }, milliseconds),
    );
  }

  private async takeUntilStopped(): Promise<void> {
    const { signal } = this.stopping;
    while (!signal.aborted) {
      try {
        const job = await this.parts.queue.take();
        if (job === null) await this.pause(POLL_MS);
        else await this.handle(job);
      } catch (error) {
        // The database is out of reach, or a message could not be ended: it comes again when its time is over.
        this.parts.ground.logger.error({ err: error }, 'a message of the queue could not be dealt with');
        await this.pause(AFTER_ERROR_MS);
      }
    }
  }

  private async pause(milliseconds: number): Promise<void> {
    const { signal } = this.stopping;
    await wait(milliseconds, undefined, { signal }).catch((error: unknown) => {
      if (!signal.aborted) throw error;
    });
  }

  private async handle(job: RunJob): Promise<void> {
    const { chunks, roster } = this.parts;
    if (job.data.step === 'merge') {
      await chunks.merge(job).catch((error: unknown) => chunks.fail(job, 'The parts could not be put together. Start the run again; if it fails again, report the id.', error));
      return;
    }
    const taken = await chunks.begin(job, job.data.number, roster.name);
    if (taken !== null) await this.compute(job, taken);
  }

  private async compute(job: RunJob, taken: TakenChunk): Promise<void> {
    const { chunks } = this.parts;
    const held: Held = { runId: taken.run.id, stop: new Int32Array(new SharedArrayBuffer(Int32Array.BYTES_PER_ELEMENT)), ending: new AbortController() };
    this.held.add(held);
    const overdue = setTimeout(() => held.ending.abort(), job.expireInSeconds * 1000);
    try {
      const outcome = await this.outcomeOf(taken, held);
      if (outcome.kind === 'computed') await chunks.finish(job, taken, outcome.part);
      else if (outcome.kind === 'invalid') await chunks.fail(job, outcome.faults.map(({ pointer, detail }) => `${pointer}: ${detail}`).join('; '));
      else if (outcome.kind === 'broken') await chunks.fail(job, 'The computation broke off. Start the run again; if it fails again, report the id.', outcome.error);
      else await this.letGo(job, held);
    } finally {
      clearTimeout(overdue);
      this.held.delete(held);
    }
  }

  /** Of a chunk that was stopped: what is no longer wanted is done with; what took too long comes again by itself. */
  private async letGo(job: RunJob, { stop }: Held): Promise<void> {
    const { chunks, queue, ground } = this.parts;
    if (Atomics.load(stop, 0) !== 0) await chunks.drop(job);
    else if (this.stopping.signal.aborted) await queue.giveBack(job, 'the worker was asked to end');
    else ground.logger.warn({ runId: job.data.runId, seconds: job.expireInSeconds }, 'a part took longer than its message lives');
  }

  private async outcomeOf({ run, chunk }: TakenChunk, { stop, ending }: Held): Promise<ChunkOutcome | { readonly kind: 'broken'; readonly error: unknown }> {
    const { runner, editionFor } = this.parts;
    const { kind, contentHash, design, parameters } = run;
    const edition = await editionFor(run.teamId, design);
    try {
      return await runner.run({ kind, contentHash, design, parameters, edition, chunk, stop }, ending.signal);
    } catch (error) {
      return ending.signal.aborted ? { kind: 'stopped' } : { kind: 'broken', error };
    }
  }

  /** Threads are asked first, so that they keep what they have prepared, and ended when they do not heed it. */
  private async stopTheUnwanted(): Promise<void> {
    if (this.held.size === 0) return;
    const ended = new Set(await this.parts.chunks.endedOf([...this.held].map(({ runId }) => runId)));
    for (const { runId, stop, ending } of this.held) {
      if (!ended.has(runId) || Atomics.exchange(stop, 0, 1) !== 0) continue;
      setTimeout(() => ending.abort(), STOP_PATIENCE_MS).unref();
    }
  }

  /** Runs whose chunk ended or silenced every worker that took it. */
  private async endTheDead(): Promise<void> {
    const { queue, chunks } = this.parts;
    for (let job = await queue.takeDead(); job !== null; job = await queue.takeDead()) {
      await chunks.fail(job, 'A part of the run was begun four times and never came to an end: it may need more memory or time than a worker has. Ask for less, for example fewer cells, and report the id.');
    }
  }
}
