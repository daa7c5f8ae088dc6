import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { RunChunkRepository } from './run-chunk-repository';
import type { RunQueueRepository } from './run-queue-repository';
import { RunRepository } from './run-repository';
import { RunWorkerRepository } from './run-worker-repository';

/** A worker that has not been seen for so long is taken for gone. */
export const WORKER_SILENCE_MS = 15_000;
/** Chunks of a team in the queue beyond one for every thread: enough that no thread waits for the next, too few to make others wait. */
const SPARE_CHUNKS = 2;
/** Estimates are upper ones on an idle core; a busy machine may take several times as long. */
const EXPIRY_PER_ESTIMATE = 10;

/**
 * Decides what goes into the common queue. A team has at most a chunk for every thread and two more there, and each goes
 * behind the chunks of teams that have fewer: the first chunk of a team that had none is the next to be taken.
 */
export class RunDispatchService {
  private readonly runs = new RunRepository();
  private readonly chunks = new RunChunkRepository();
  private readonly workers = new RunWorkerRepository();

  constructor(
    private readonly ground: Pick<Ground, 'config' | 'now'>,
    private readonly queue: RunQueueRepository,
  ) {}

  /** Threads of all workers that are there. */
  async threadCount(transaction: Transaction): Promise<number> {
    return this.workers.threadsSeenSince(transaction, new Date(this.ground.now().getTime() - WORKER_SILENCE_MS));
  }

  /** Fills the team's share of the queue up, in the transaction of what made room. */
  async fill(transaction: Transaction, teamId: string): Promise<void> {
    await this.runs.lockTeam(transaction, teamId);
    const share = (await this.threadCount(transaction)) + SPARE_CHUNKS;
    for (let inQueue = await this.chunks.countInQueue(transaction, teamId); inQueue < share; inQueue++) {
      const next = await this.chunks.next(transaction, teamId);
      if (next === null) return;
      await this.chunks.markSent(transaction, next);
      const message = { step: 'chunk', teamId, runId: next.runId, number: next.number } as const;
      await this.queue.send(transaction, message, { priority: -inQueue, expireSeconds: this.expirySeconds(next.seconds) });
    }
  }

  /** Asks for the parts of a run to be put together, before anything else is computed. */
  async askForMerge(transaction: Transaction, teamId: string, runId: string): Promise<void> {
    await this.queue.send(transaction, { step: 'merge', teamId, runId }, { priority: 1, expireSeconds: this.expirySeconds(0) });
  }

  private expirySeconds(estimate: number): number {
    return Math.ceil(Math.max(this.ground.config.runExpirySeconds, EXPIRY_PER_ESTIMATE * estimate));
  }
}
