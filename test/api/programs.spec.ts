import { execFile, spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { once } from 'node:events';
import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { Client } from 'pg';
import { ApiClient } from '../support/api-client';
import { createTestDatabase, type TestDatabase } from '../support/postgres';

const run = promisify(execFile);
const programs = join(__dirname, '../../dist/server/server');
const password = 'a password only for tests';

interface Result {
  readonly code: number;
  readonly out: string;
  readonly errors: string;
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return port;
}

describe('programs of the built server', () => {
  let database: TestDatabase;
  let environment: Record<string, string>;

  beforeAll(async () => {
    if (!existsSync(join(programs, 'main.js'))) throw new Error('The server is not built: run "npm run build" first, or let "npm test" do it.');
    database = await createTestDatabase();
    environment = {
      PATH: process.env['PATH'] ?? '',
      DATABASE_URL: database.url,
      SLANTWISE_SECRET: 'a signing key only for tests, long enough',
      SLANTWISE_DEMO: 'on',
      SLANTWISE_DEMO_PASSWORD: password,
      LOG_LEVEL: 'warn',
      PORT: String(await freePort()),
    };
  }, 60_000);
  afterAll(() => database.drop());

  /** Runs a program to its end. */
  async function program(name: string, args: readonly string[] = [], more: Record<string, string> = {}): Promise<Result> {
    try {
      const { stdout, stderr } = await run(process.execPath, [join(programs, name), ...args], { env: { ...environment, ...more } });
      return { code: 0, out: stdout, errors: stderr };
    } catch (error) {
      const { code, stdout, stderr } = error as { code: number; stdout: string; stderr: string };
      return { code, out: stdout, errors: stderr };
    }
  }

  async function query(statement: string): Promise<Record<string, unknown>[]> {
    const client = new Client({ connectionString: database.url });
    await client.connect();
    try {
      return (await client.query<Record<string, unknown>>(statement)).rows;
    } finally {
      await client.end();
    }
  }

  it.each(['main.js', 'seed.js', 'token.js', 'database/run-migrations.js'])('%s says all that is wrong with its environment and ends', async (name) => {
    const result = await program(name, ['designer@merrow.example'], { DATABASE_URL: '', PORT: 'x', SMTP_URL: 'nowhere' });
    expect(result).toMatchObject({ code: 1, out: '' });
    for (const variable of ['DATABASE_URL', 'PORT', 'SMTP_URL']) expect(result.errors).toContain(`- ${variable}`);
  });

  it('migrate an empty database, and find nothing to do the second time', async () => {
    expect(await program('database/run-migrations.js')).toEqual({ code: 0, out: '', errors: '' });
    expect(await program('database/run-migrations.js')).toEqual({ code: 0, out: '', errors: '' });
  }, 30_000);

  it('fill demo mode once: what is there stays as it is', async () => {
    expect((await program('seed.js')).code).toBe(0);
    await query(`UPDATE person SET name = 'Renamed' WHERE email = 'lab@merrow.example'`);
    const before = await query('SELECT id, name, password_hash FROM person ORDER BY id');
    expect((await program('seed.js')).code).toBe(0);
    expect(await query('SELECT id, name, password_hash FROM person ORDER BY id')).toEqual(before);
    const refused = await program('seed.js', [], { SLANTWISE_DEMO: 'off' });
    expect([refused.code, refused.errors]).toEqual([1, 'Demo data is for demo mode: set SLANTWISE_DEMO=on and SLANTWISE_DEMO_PASSWORD.\n']);
  }, 60_000);

  it('print a personal token and nothing else', async () => {
    const result = await program('token.js', ['Designer@merrow.example']);
    expect(result).toEqual({ code: 0, out: expect.stringMatching(/^slw_[\w-]{43}\n$/), errors: '' });
    expect(await program('token.js', ['nobody@merrow.example'])).toEqual({ code: 1, out: '', errors: 'Nobody with the address nobody@merrow.example works in a team here.\n' });
    expect((await program('token.js')).errors).toBe('Say whose token: token.js designer@merrow.example\n');
  }, 30_000);

  it('serve until asked to stop, and let the token in', async () => {
    const secret = (await program('token.js', ['designer@merrow.example'])).out.trim();
    const server = spawn(process.execPath, [join(programs, 'main.js')], { env: environment, stdio: ['ignore', 'pipe', 'pipe'] });
    const exited = once(server, 'exit');
    const client = new ApiClient(`http://127.0.0.1:${environment['PORT']}`, secret);
    const until = Date.now() + 20_000;
    const isReady = (): Promise<boolean> => client.get('/api/ready').then(({ status }) => status === 200, () => false);
    while (!(await isReady()) && Date.now() < until) await new Promise((resolve) => setTimeout(resolve, 100));
    expect((await client.get('/api/team')).json).toMatchObject({ name: 'Merrow Point' });
    const asked = Date.now();
    server.kill('SIGTERM');
    expect(await exited).toEqual([0, null]);
    expect(Date.now() - asked).toBeLessThan(5000);
  }, 40_000);

  it('invite the first administrator of a team where there are no demo accounts', async () => {
    const result = await program('first-team.js', ['Harbour', 'Ida@harbour.example'], { SLANTWISE_DEMO: 'off', SLANTWISE_PUBLIC_URL: 'https://slantwise.example' });
    expect(result).toEqual({ code: 0, out: expect.stringMatching(/^https:\/\/slantwise\.example\/invitation#[\w-]{43}\n$/), errors: '' });
    const rows = await query(`SELECT email, roles, invited_by FROM invitation JOIN team ON team.id = team_id WHERE team.name = 'Harbour'`);
    expect(rows).toEqual([{ email: 'ida@harbour.example', roles: ['administrator'], invited_by: null }]);
    expect((await program('first-team.js', ['Harbour'])).code).toBe(1);
  }, 30_000);

  it('follow the audit chains, and fail when one is broken', async () => {
    const whole = await program('verify-audit.js');
    expect([whole.code, whole.out.split('\n').sort()]).toEqual([0, ['', 'Bench: whole', 'Harbour: whole', 'Merrow Point: whole']]);
    await query('ALTER TABLE audit_row DISABLE TRIGGER ALL');
    await query(`UPDATE audit_row SET action = 'nothing.happened' WHERE sequence = 2 AND team_id = (SELECT id FROM team WHERE name = 'Bench')`);
    const broken = await program('verify-audit.js');
    expect(broken).toMatchObject({ code: 1, errors: 'The audit chain is broken: Bench\n' });
    expect(broken.out).toContain('Bench: broken at row 2');
  }, 30_000);
});
