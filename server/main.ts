import { once } from 'node:events';
import { createServer } from 'node:http';
import { createApp } from './app';
import { drain } from './http/drain';
import { openHouse, runProgram } from './opened-house';

const HEADERS_TIMEOUT_MS = 10_000;
/** As long as the longest limit of a route: each route's own, a minute as a rule, comes first (`http/time-limit.ts`). */
const REQUEST_TIMEOUT_MS = 600_000;
const DRAIN_MS = 30_000;
void runProgram(async () => {
  const { house, config, close } = await openHouse(process.env);
  const { logger } = house.ground;
  const server = createServer({ headersTimeout: HEADERS_TIMEOUT_MS, requestTimeout: REQUEST_TIMEOUT_MS, connectionsCheckingInterval: 2000 }, createApp({ house }));
  const asked = Promise.race(['SIGTERM', 'SIGINT'].map((signal) => once(process, signal).then(() => signal)));
  await house.start();
  server.listen(config.port, config.host);
  await once(server, 'listening');
  logger.info({ host: config.host, port: config.port }, 'listening');
  const signal = await asked;
  logger.info({ signal }, 'stopping');
  house.drain();
  await drain(server, DRAIN_MS);
  await close();
  logger.info('stopped');
});
