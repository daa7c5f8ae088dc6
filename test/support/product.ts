import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** The built product, running for browser tests. */
export interface RunningProduct {
  readonly url: string;
  /** Of every demonstration account. */
  readonly password: string;
  readonly stop: () => Promise<void>;
}

const ownPassword = 'only-for-this-test-run';
const startScript = join(__dirname, '../../scripts/start.mjs');

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return port;
}

async function isReady(url: string): Promise<boolean> {
  try {
    return (await fetch(`${url}/api/ready`)).ok;
  } catch {
    return false; // not listening yet
  }
}

async function startOwn(): Promise<RunningProduct> {
  const folder = mkdtempSync(join(tmpdir(), 'slantwise-e2e-'));
  chmodSync(folder, 0o711); // the database may run as another user, who must be able to pass through
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const env = { ...process.env, PORT: String(port), SLANTWISE_DATA: join(folder, 'data'), SLANTWISE_DEMO: 'on', SLANTWISE_DEMO_PASSWORD: ownPassword };
  const child = spawn(process.execPath, [startScript], { env, stdio: ['ignore', 'ignore', 'inherit'], detached: true });
  const exited = once(child, 'exit');
  const stop = async (): Promise<void> => {
    child.kill('SIGTERM');
    await exited;
    rmSync(folder, { recursive: true, force: true });
  };
  const end = Date.now() + 180_000;
  while (!(await isReady(url))) {
    if (child.exitCode !== null) throw new Error(`The product ended with exit code ${child.exitCode} before it was ready.`);
    if (Date.now() > end) {
      await stop();
      throw new Error('The product was not ready within three minutes.');
    }
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  return { url, password: ownPassword, stop };
}

/** The product that `npm test` has started, or one of its own when the tests are run by themselves. Give its start 200 s. */
export async function runningProduct(): Promise<RunningProduct> {
  const url = process.env['SLANTWISE_E2E_URL'];
  if (!url) return startOwn();
  return { url, password: process.env['SLANTWISE_DEMO_PASSWORD'] ?? ownPassword, stop: async () => undefined };
}
