import { randomUUID } from 'node:crypto';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { runTypeOf } from '../engine/run-types';
import type { ResultService } from '../predictions/result-service';
import { packPart, unpackPart } from './chunk-body';
import { RunChunkRepository } from './run-chunk-repository';
import type { RunDispatchService } from './run-dispatch-service';
import type { Run } from './run-entity';
import type { RunJob, RunQueueRepository } from './run-queue-repository';
import { RunRepository } from './run-repository';
import { resultKeyOf } from './run-result-key';

export interface RunChunkServiceParts {
  readonly ground: Pick<Ground, 'transactions' | 'now' | 'logger'>;
  readonly queue: RunQueueRepository;
  readonly dispatcher: RunDispatchService;
  readonly results: ResultService;
}

/** A chunk that a worker holds. */
export interface TakenChunk {
  readonly run: Run;
  readonly number: number;
  readonly attempt: number;
  readonly seconds: number;
  readonly chunk: unknown;
}

/**
 * Runs as workers see them. Messages come at least once: a chunk may be begun by several workers, but only the last one
 * to begin it may write its part, once, and in the transaction that takes the message from the queue.
 */
export class RunChunkService {
  private readonly runs = new RunRepository();
  private readonly chunks = new RunChunkRepository();

  constructor(private readonly parts: RunChunkServiceParts) {}

  /** Takes a chunk for a worker; null when it needs no computing any more, and its message is gone. */
  async begin(job: RunJob, number: number, worker: string): Promise<TakenChunk | null> {
    const { ground, queue } = this.parts;
    const { teamId, runId } = job.data;
    return ground.transactions.run(async (transaction) => {
      const run = await this.active(transaction, job);
      const chunk = run === null ? null : await this.chunks.begin(transaction, { runId, number }, worker);
      if (run === null || chunk === null) {
        await queue.complete(transaction, job);
        return null;
      }
      const isAgain = chunk.attempt > 1;
      if (run.state === 'queued') await this.runs.update(transaction, teamId, runId, { state: 'running', startedAt: ground.now() });
      if (isAgain) await this.runs.update(transaction, teamId, runId, { restartCount: run.restartCount + 1 });
      return { run, number, attempt: chunk.attempt, seconds: chunk.seconds, chunk: chunk.chunk };
    });
  }

  /** Writes a part. A part that comes too late, because another worker has begun the chunk since, changes nothing. */
  async finish(job: RunJob, { number, attempt, seconds }: TakenChunk, part: unknown): Promise<void> {
    const { ground, queue, dispatcher } = this.parts;
    const { teamId, runId } = job.data;
    const body = packPart(part);
    const isWritten = await ground.transactions.run(async (transaction) => {
      const run = await this.active(transaction, job);
      if (run === null || !(await this.chunks.finish(transaction, { runId, number, attempt }, body))) return false;
      const doneCount = run.doneCount + 1;
      await this.runs.update(transaction, teamId, runId, { doneCount, doneSeconds: run.doneSeconds + seconds });
      await queue.complete(transaction, job);
      if (doneCount === run.chunkCount) await dispatcher.askForMerge(transaction, teamId, runId);
      await dispatcher.fill(transaction, teamId);
      return true;
    });
    if (!isWritten) ground.logger.warn({ runId, number, attempt }, 'a part came too late and was dropped');
  }

  /** Puts the parts of a run together and ends it. Done again, it does nothing. */
  async merge(job: RunJob): Promise<void> {
    const { ground, queue, results } = this.parts;
    const { teamId, runId } = job.data;
    await ground.transactions.run(async (transaction) => {
      const run = await this.active(transaction, job);
      if (run !== null) {
        await results.keep(transaction, resultKeyOf(run), await this.merged(transaction, run));
        await this.runs.update(transaction, teamId, runId, { state: 'done', finishedAt: ground.now() });
        await this.chunks.removeOfRun(transaction, runId);
      }
      await queue.complete(transaction, job);
    });
  }

  /** Ends a run that cannot be computed. `cause` goes to the log alone, under the id that people are told. */
  async fail(job: RunJob, message: string, cause?: unknown): Promise<void> {
    const { ground, queue, dispatcher } = this.parts;
    const { teamId, runId } = job.data;
    const failureId = randomUUID();
    ground.logger.error({ err: cause, runId, failureId, message }, 'a run failed');
    await ground.transactions.run(async (transaction) => {
      if ((await this.active(transaction, job)) !== null) {
        await this.runs.update(transaction, teamId, runId, { state: 'failed', finishedAt: ground.now(), failureMessage: message, failureId });
        await this.chunks.removeOfRun(transaction, runId);
        await dispatcher.fill(transaction, teamId);
      }
      await queue.complete(transaction, job);
      await queue.completeDead(transaction, job);
    });
  }

  /** Done with a message whose run is over. */
  async drop(job: RunJob): Promise<void> {
    await this.parts.ground.transactions.run((transaction) => this.parts.queue.complete(transaction, job));
  }

  /** Which of these runs are over, so that nobody need compute for them. */
  async endedOf(runIds: readonly string[]): Promise<string[]> {
    return this.parts.ground.transactions.read((transaction) => this.runs.endedOf(transaction, runIds));
  }

  /** The run, locked; null when it is over or gone. */
  private async active(transaction: Transaction, { data: { teamId, runId } }: RunJob): Promise<Run | null> {
    const found = await this.runs.find(transaction, teamId, runId);
    if (found === null) return null;
    const run = await this.runs.requireLocked(transaction, teamId, runId);
    return run.finishedAt === null ? run : null;
  }

  private async merged(transaction: Transaction, run: Run): Promise<object> {
    const chunks = await this.chunks.ofRun(transaction, run.id);
    const parts = chunks.map(({ number, part }) => {
      if (part === null) throw new Error(`chunk ${number} of run ${run.id} has no part though all are done`);
      return unpackPart(part);
    });
    return runTypeOf(run.kind).merge({ design: run.design, parameters: run.parameters }, parts);
  }
}
