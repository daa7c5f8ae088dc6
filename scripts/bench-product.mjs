/** A product of its own for the bench, started as a person would start it, on a throw-away data folder. */
import { spawn } from 'node:child_process';
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { provideBuild } from './build-output.mjs';
import { provideMachine } from './machine.mjs';
import { Refusal, endProcess, freePort, waitFor } from './processes.mjs';

const password = 'only-for-this-bench-run';
const startScript = join(import.meta.dirname, 'start.mjs');

export class BenchProduct {
  #child;
  #folder;
  #cookies = new Map();

  /** Starts it and signs the demonstration's designer in. */
  static async start() {
    await provideMachine('postgres', 'chromium');
    await provideBuild('server', 'client');
    const product = new BenchProduct();
    const port = await freePort();
    product.address = `http://127.0.0.1:${port}`;
    product.#folder = mkdtempSync(join(tmpdir(), 'slantwise-bench-'));
    chmodSync(product.#folder, 0o711); // the database may run as another user, who must be able to pass through
    const demo = { SLANTWISE_DEMO: 'on', SLANTWISE_DEMO_PASSWORD: password };
    const env = { ...process.env, ...demo, PORT: String(port), SLANTWISE_DATA: join(product.#folder, 'data') };
    product.#child = spawn(process.execPath, [startScript], { env, stdio: ['ignore', 'ignore', 'inherit'], detached: true });
    const isReady = async () => product.#child.exitCode !== null || (await fetch(`${product.address}/api/ready`).then((reply) => reply.ok, () => false));
    if (!(await waitFor(isReady, { seconds: 240, every: 0.3 })) || product.#child.exitCode !== null) throw new Refusal('The product did not start for the bench.');
    await product.ask('POST', '/api/session', product.credentials);
    return product;
  }

  credentials = { email: 'designer@merrow.example', password };

  /** One request of the signed-in designer; gives the reply, its body read to the end. */
  async ask(method, path, body, headers = {}) {
    const cookie = [...this.#cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const forgery = this.#cookies.get('XSRF-TOKEN');
    const own = { 'content-type': 'application/json', ...(cookie === '' ? {} : { cookie }), ...(forgery === undefined ? {} : { 'x-xsrf-token': forgery }) };
    const reply = await fetch(`${this.address}${path}`, { method, headers: { ...own, ...headers }, body: body === undefined ? undefined : JSON.stringify(body) });
    for (const line of reply.headers.getSetCookie()) {
      const [pair] = line.split(';');
      this.#cookies.set(pair.slice(0, pair.indexOf('=')), decodeURIComponent(pair.slice(pair.indexOf('=') + 1)));
    }
    const bytes = Buffer.from(await reply.arrayBuffer());
    if (!reply.ok) throw new Error(`${method} ${path} was answered ${reply.status}: ${bytes.toString('utf8').slice(0, 400)}`);
    return { bytes, json: () => JSON.parse(bytes.toString('utf8')) };
  }

  /** A panel of the demonstration project by the beginning of its name. */
  async demoPanel(start) {
    const { items } = (await this.ask('GET', '/api/projects')).json();
    const panel = items.flatMap(({ panels }) => panels).find(({ name }) => name.startsWith(start));
    if (panel === undefined) throw new Error(`The demonstration project has no panel ${start}.`);
    return (await this.ask('GET', `/api/panels/${panel.id}`)).json();
  }

  async end() {
    await endProcess(this.#child.pid, 60);
    rmSync(this.#folder, { recursive: true, force: true });
  }
}
