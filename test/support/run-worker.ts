import type { ChunkRunner } from '../../server/engine/chunk-runner';
import { createInlineChunkRunner } from '../../server/engine/chunk-runner';
import type { ChunkOutcome, ChunkTask } from '../../server/engine/chunk-task';
import { RunWorkerService } from '../../server/runs/run-worker-service';
import type { RunDetail } from '../../shared/contracts/runs';
import type { Api } from './api';
import type { ApiClient } from './api-client';
import { bodyOf } from './panels';

/** A worker in this process, on the queue of the application under test. */
export async function startWorker(api: Api, runner: ChunkRunner = createInlineChunkRunner(), threadCount = 1): Promise<RunWorkerService> {
  const { ground, predictions, runQueue: queue, runChunks: chunks, runRoster: roster } = api.house;
  const worker = new RunWorkerService({ ground, queue, chunks, roster, runner, editionFor: (teamId, design) => predictions.editionFor(teamId, design), threadCount });
  await worker.start();
  return worker;
}

/** Computes like the real one, but each chunk takes as long as a test wants, and notes what was computed. */
export class PacedRunner implements ChunkRunner {
  readonly tasks: ChunkTask[] = [];
  private readonly inner = createInlineChunkRunner();

  constructor(private readonly milliseconds: number) {}

  async run(task: ChunkTask, signal: AbortSignal): Promise<ChunkOutcome> {
    this.tasks.push(task);
    const end = Date.now() + this.milliseconds;
    while (Date.now() < end) {
      if (Atomics.load(task.stop, 0) !== 0) return { kind: 'stopped' };
      signal.throwIfAborted();
      await new Promise((resolve) => setTimeout(resolve, 20));
    }
    return this.inner.run(task, signal);
  }

  close(): Promise<void> {
    return this.inner.close();
  }
}

/** The run as soon as it is as wanted. */
export async function runThat(client: ApiClient, id: string, isWanted: (run: RunDetail) => boolean, patienceMs = 20_000): Promise<RunDetail> {
  const end = Date.now() + patienceMs;
  for (;;) {
    const run = bodyOf<RunDetail>(await client.get(`/api/runs/${id}`), 200);
    if (isWanted(run)) return run;
    if (Date.now() > end) throw new Error(`the run is not as wanted: ${JSON.stringify(run.progress)}`);
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

export const isOver = ({ finishedAt }: RunDetail): boolean => finishedAt !== null;
