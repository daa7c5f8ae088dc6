import { extname, join } from 'node:path';
import { Piscina } from 'piscina';
import { InvalidInput } from '../http/problems';
import { runInspection, type InspectionTask } from './inspection-worker';
import type { UploadReading } from './inspect-upload';

/** A crafted file may be slow or greedy: it costs its own worker and its own upload, never the server. */
const TIME_LIMIT_MS = 30_000;
const MEMORY_LIMIT_MB = 512;

export interface InspectionRunner {
  run(task: InspectionTask): Promise<UploadReading>;
  close(): Promise<void>;
}

/**
 * Reads uploads in a worker thread of their own. Run from TypeScript, as the tests do, there is no compiled worker and
 * uploads are read on the spot.
 */
export function createInspectionRunner(): InspectionRunner {
  if (extname(__filename) === '.ts') return { run: async (task) => runInspection(task), close: async () => undefined };
  return createPooledRunner(join(__dirname, 'inspection-worker.js'));
}

function createPooledRunner(workerFile: string): InspectionRunner {
  const pool = new Piscina({
    filename: workerFile,
    name: 'runInspection',
    minThreads: 0,
    maxThreads: 1,
    idleTimeout: 60_000,
    resourceLimits: { maxOldGenerationSizeMb: MEMORY_LIMIT_MB },
  });
  return {
    run: async (task) => {
      const limit = AbortSignal.timeout(TIME_LIMIT_MS);
      try {
        return (await pool.run(task, { signal: limit })) as UploadReading;
      } catch (cause) {
        if (!limit.aborted && !isOutOfMemory(cause)) throw cause;
        const reason = limit.aborted ? `more than ${TIME_LIMIT_MS / 1000} s` : `more than ${MEMORY_LIMIT_MB} MB of memory`;
        throw new InvalidInput([{ pointer: '#/files', detail: `reading these files took ${reason}; send fewer at a time` }]);
      }
    },
    close: () => pool.destroy(),
  };
}

const isOutOfMemory = (cause: unknown): boolean =>
  typeof cause === 'object' && cause !== null && 'code' in cause && cause.code === 'ERR_WORKER_OUT_OF_MEMORY';
