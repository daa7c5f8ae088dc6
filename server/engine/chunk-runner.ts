import { extname, join } from 'node:path';
import { Piscina } from 'piscina';
import { createChunkAnswerer } from './answer-chunk';
import type { ChunkOutcome, ChunkTask } from './chunk-task';

/** Whatever computes chunks: threads, or the caller's own thread. */
export interface ChunkRunner {
  /** An aborted signal ends the work at once and rejects. */
  run(task: ChunkTask, signal: AbortSignal): Promise<ChunkOutcome>;
  close(): Promise<void>;
}

/** Threads where the compiled worker is at hand; run from TypeScript, as tests do, the caller's own thread. */
export function createChunkRunner(threadCount: number): ChunkRunner {
  return extname(__filename) === '.ts' ? createInlineChunkRunner() : createPooledChunkRunner(join(__dirname, 'chunk-worker.js'), threadCount);
}

export function createInlineChunkRunner(): ChunkRunner {
  const answerChunk = createChunkAnswerer();
  return {
    run: async (task, signal) => {
      // Lets a cancellation that arrived meanwhile be seen, as threads would.
      await new Promise((resolve) => setImmediate(resolve));
      signal.throwIfAborted();
      return answerChunk(task);
    },
    close: async () => undefined,
  };
}

function createPooledChunkRunner(workerFile: string, threadCount: number): ChunkRunner {
  const pool = new Piscina({ filename: workerFile, name: 'runChunk', minThreads: 0, maxThreads: threadCount, idleTimeout: 300_000 });
  return {
    run: async (task, signal) => (await pool.run(task, { signal })) as ChunkOutcome,
    close: () => pool.destroy(),
  };
}
