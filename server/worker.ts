import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { createChunkRunner } from './engine/chunk-runner';
import { createInlineRunner } from './engine/prediction-runner';
import { openHouse, runProgram } from './opened-house';
import { RunWorkerService } from './runs/run-worker-service';

/** Computes runs: as many of these as one likes, on any machine that reaches the database. It needs nothing but that address. */
void runProgram(async () => {
  // A worker signs nothing, so it needs no key that anybody else knows.
  const env = { SLANTWISE_SECRET: randomBytes(32).toString('hex'), ...process.env };
  const { house, config, close } = await openHouse(env, { predictionRunner: createInlineRunner() });
  const { ground, predictions, runQueue: queue, runChunks: chunks, runRoster: roster } = house;
  const { logger } = ground;
  const asked = Promise.race(['SIGTERM', 'SIGINT'].map((signal) => once(process, signal).then(() => signal)));
  const threadCount = config.workerCount;
  const worker = new RunWorkerService({
    ground,
    queue,
    chunks,
    roster,
    runner: createChunkRunner(threadCount),
    editionFor: (teamId, design) => predictions.editionFor(teamId, design),
    threadCount,
  });
  await worker.start();
  logger.info({ worker: roster.name, threads: threadCount }, 'working');
  const signal = await asked;
  logger.info({ signal }, 'stopping');
  await worker.stop();
  await close();
  logger.info('stopped');
});
