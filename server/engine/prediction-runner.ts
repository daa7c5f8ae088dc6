import { extname, join } from 'node:path';
import { Piscina } from 'piscina';
import { createTaskAnswerer } from './answer-task';
import type { PredictionOutcome, PredictionTask } from './prediction-task';

/** Whatever computes tasks: threads, or the caller's own thread. */
export interface PredictionRunner {
  /** An aborted signal ends the work at once and rejects. */
  run(task: PredictionTask, signal: AbortSignal): Promise<PredictionOutcome>;
  close(): Promise<void>;
}

/** Threads where the compiled worker is at hand; run from TypeScript, as tests do, the caller's own thread. */
export function createPredictionRunner(threadCount: number): PredictionRunner {
  return extname(__filename) === '.ts' ? createInlineRunner() : createPooledRunner(join(__dirname, 'prediction-worker.js'), threadCount);
}

export function createInlineRunner(): PredictionRunner {
  const answerTask = createTaskAnswerer();
  return {
    run: async (task, signal) => {
      // Lets requests that arrived meanwhile be seen, as threads would.
      await new Promise((resolve) => setImmediate(resolve));
      signal.throwIfAborted();
      return answerTask(task);
    },
    close: async () => undefined,
  };
}

export function createPooledRunner(workerFile: string, threadCount: number): PredictionRunner {
  const pool = new Piscina({ filename: workerFile, name: 'runPrediction', minThreads: 1, maxThreads: threadCount, idleTimeout: 300_000 });
  return {
    run: async (task, signal) => (await pool.run(task, { signal })) as PredictionOutcome,
    close: () => pool.destroy(),
  };
}
