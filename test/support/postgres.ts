import { spawn, type ChildProcess } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { Client } from 'pg';

/** A database of its own for one test file, empty. */
export interface TestDatabase {
  readonly url: string;
  drop(): Promise<void>;
}

interface Server {
  readonly url: string;
  stop(): Promise<void>;
}

/** `npm test` gives the address of a running cluster; a single jest run starts its own. */
async function provideServer(): Promise<Server> {
  const given = process.env['SLANTWISE_TEST_DATABASE_URL'];
  if (given !== undefined) return { url: given, stop: () => Promise.resolve() };
  const child: ChildProcess = spawn(process.execPath, [join(__dirname, 'private-cluster.mjs')], { stdio: ['pipe', 'pipe', 'inherit'] });
  const exited = once(child, 'exit');
  if (child.stdout === null) throw new Error('the cluster has no output to read');
  const [url] = (await Promise.race([once(createInterface(child.stdout), 'line'), exited])) as [string | number];
  if (typeof url !== 'string') throw new Error(`the test cluster did not start (exit code ${url})`);
  const stop = async (): Promise<void> => {
    child.stdin?.end();
    await exited;
  };
  return { url, stop };
}

async function execute(url: string, statement: string): Promise<void> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}

export async function createTestDatabase(): Promise<TestDatabase> {
  const server = await provideServer();
  const name = `test_${randomBytes(6).toString('hex')}`;
  await execute(server.url, `CREATE DATABASE ${name}`);
  const url = new URL(server.url);
  url.pathname = `/${name}`;
  return {
    url: url.href,
    drop: async () => {
      await execute(server.url, `DROP DATABASE ${name} WITH (FORCE)`);
      await server.stop();
    },
  };
}
