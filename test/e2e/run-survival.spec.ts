import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import type { RunDetail } from '../../shared/contracts/runs';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { Api, TEST_SECRET } from '../support/api';
import { ApiClient } from '../support/api-client';
import { bodyOf, newPanel } from '../support/panels';
import { isOver, runThat } from '../support/run-worker';

const built = (name: string): string => join(__dirname, '../../dist/server/server', name);
/** A worker that falls silent loses its chunk after this. */
const EXPIRY_SECONDS = 3;
const SLOW_MACHINE_MS = 120_000;
/** Some hundred cells at 401 frequencies: nine chunks of some tenths of a second. */
const PANEL: DesignDocument = { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 60, heightMm: 60 } } };
const LONG_BAND = { kind: 'band', parameters: { bandGHz: [27, 29], frequencyCount: 401 } };

/** Servers and workers as processes of their own, from the built product, on the database of the application in this one. */
class Processes {
  private readonly running: ChildProcess[] = [];

  constructor(private readonly api: Api) {}

  worker(): ChildProcess {
    return this.launch('worker.js', {});
  }

  async server(): Promise<{ process: ChildProcess; url: string }> {
    const port = await freePort();
    const url = `http://127.0.0.1:${port}`;
    const process = this.launch('main.js', { PORT: String(port), SLANTWISE_SECRET: TEST_SECRET });
    const isReady = (): Promise<boolean> => fetch(`${url}/api/ready`).then(({ ok }) => ok, () => false);
    while (!(await isReady())) {
      if (process.exitCode !== null) throw new Error(`the server ended with exit code ${process.exitCode}`);
      await wait(100);
    }
    return { process, url };
  }

  /** As the machine would end it: at once, without a last word. */
  async kill(child: ChildProcess): Promise<void> {
    const gone = once(child, 'exit');
    child.kill('SIGKILL');
    await gone;
  }

  async endAll(): Promise<void> {
    for (const child of this.running) if (child.exitCode === null && child.signalCode === null) await this.kill(child);
  }

  private launch(file: string, more: Record<string, string>): ChildProcess {
    // Nothing but the address of the database; a worker needs no more.
    const env = { PATH: process.env['PATH'] ?? '', DATABASE_URL: this.api.config.databaseUrl, LOG_LEVEL: 'fatal', WORKERS: '1', SLANTWISE_RUN_EXPIRY: String(EXPIRY_SECONDS), ...more };
    const child = spawn(process.execPath, [built(file)], { env, stdio: ['ignore', 'ignore', 'inherit'] });
    this.running.push(child);
    return child;
  }
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return port;
}

describe('a run', () => {
  let api: Api;
  let processes: Processes;
  let designer: ApiClient;
  beforeAll(async () => {
    api = await Api.start({ environment: { SLANTWISE_RUN_EXPIRY: String(EXPIRY_SECONDS) } });
    processes = new Processes(api);
    designer = await api.signedIn('designer');
  }, SLOW_MACHINE_MS);
  afterAll(async () => {
    await processes.endAll();
    await api.close();
  });

  const begun = ({ progress }: RunDetail): boolean => progress.fraction > 0;
  const start = async (client: ApiClient): Promise<RunDetail> => {
    const panel = await newPanel(designer, PANEL);
    return bodyOf<RunDetail>(await client.post(`/api/panels/${panel.id}/runs`, LONG_BAND), 202);
  };

  it('outlives kill -9 of its worker and of its server, and gives the bits that an undisturbed one gives', async () => {
    const { process: server, url } = await processes.server();
    const browser = new ApiClient(url);
    bodyOf(await browser.post('/api/session', { email: 'designer@merrow.example', password: api.config.demoPassword }), 200);
    const first = processes.worker();
    const { id } = await start(browser);
    await runThat(designer, id, begun, SLOW_MACHINE_MS);
    await Promise.all([processes.kill(first), processes.kill(server)]);
    const second = processes.worker();
    const done = await runThat(designer, id, isOver, SLOW_MACHINE_MS);
    expect(done).toMatchObject({ progress: { state: 'done', fraction: 1 }, failure: null });
    expect(await api.query(`SELECT count(*)::int AS results FROM result WHERE kind = 'band'`)).toEqual([{ results: 1 }]);
    expect(await api.query('SELECT count(*)::int AS chunks FROM run_chunk')).toEqual([{ chunks: 0 }]);
    expect(await api.query(`SELECT count(*)::int AS rows FROM audit_row WHERE action = 'run.started'`)).toEqual([{ rows: 1 }]);
    await api.query('DELETE FROM result');
    const undisturbed = await runThat(designer, (await start(designer)).id, isOver, SLOW_MACHINE_MS);
    expect(undisturbed.reused).toBe(false);
    expect(JSON.stringify(done.answer.result)).toBe(JSON.stringify(undisturbed.answer.result));
    await processes.kill(second);
  }, 2 * SLOW_MACHINE_MS);

  it('is handed on whole when its worker is asked to end', async () => {
    await api.query('DELETE FROM result');
    const first = processes.worker();
    const { id } = await start(designer);
    await runThat(designer, id, begun, SLOW_MACHINE_MS);
    const ended = once(first, 'exit');
    first.kill('SIGTERM');
    expect((await ended)[0]).toBe(0);
    expect(await api.query(`SELECT count(*)::int AS held FROM run_chunk WHERE state = 'running'`)).toEqual([{ held: 0 }]);
    const second = processes.worker();
    expect((await runThat(designer, id, isOver, SLOW_MACHINE_MS)).progress).toMatchObject({ state: 'done', restarts: 0 });
    await processes.kill(second);
  }, 2 * SLOW_MACHINE_MS);
});
