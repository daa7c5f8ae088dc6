/** One instance of the product: its data folder, its database, its server process. */
import { spawn } from 'node:child_process';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { clientFolder, serverFolder } from './build-output.mjs';
import { openDataFolder, randomSecret, readablePassword } from './data-folder.mjs';
import { projectFolder } from './dependencies.mjs';
import { Cluster } from './postgres.mjs';
import { Refusal, answers, commandLine, endProcess, isAlive, isFree, run } from './processes.mjs';

const entry = (name) => join(serverFolder, 'server', name);
const mainFile = entry('main.js');
const workerFile = entry('worker.js');

export class Product {
  /** Opens the data folder and settles what a new one is to be: demo mode, passwords, keys. */
  constructor(dataPath, { throwAway = false } = {}) {
    this.data = openDataFolder(dataPath);
    this.isNew = this.data.isNew;
    this.data.keep('secret', randomSecret);
    const wish = process.env.SLANTWISE_DEMO;
    if (wish && !['on', 'off'].includes(wish)) throw new Refusal('SLANTWISE_DEMO must be "on" or "off".');
    // What a new folder was made as is remembered, so that the next start needs no word of it.
    const kept = this.data.keep('demo', () => wish || (this.isNew ? 'on' : 'off'));
    this.demo = (wish || kept) === 'on';
    this.demoPassword = this.demo ? this.#demoPassword() : null;
    this.cluster = new Cluster(this.data, { throwAway });
    this.port = Number(process.env.PORT || 4600);
    this.host = process.env.HOST || '127.0.0.1';
  }

  /** The accounts are made once, so the password of the first start stays the one that counts. */
  #demoPassword() {
    const given = process.env.SLANTWISE_DEMO_PASSWORD;
    if (given && given.length < 15) throw new Refusal('SLANTWISE_DEMO_PASSWORD must have at least 15 characters.');
    return this.data.keep('demoPassword', () => given || readablePassword());
  }

  get address() {
    return `http://${['0.0.0.0', '::'].includes(this.host) ? '127.0.0.1' : this.host}:${this.port}`;
  }

  /** What the server's programs read from their environment. */
  get environment() {
    return {
      LOG_LEVEL: 'warn',
      ...process.env,
      PORT: String(this.port),
      HOST: this.host,
      DATABASE_URL: this.cluster.url,
      SLANTWISE_DATA: this.data.path,
      SLANTWISE_SECRET: process.env.SLANTWISE_SECRET || this.data.read('secret'),
      SLANTWISE_CLIENT: clientFolder,
      SLANTWISE_DEMO: this.demo ? 'on' : 'off',
      SLANTWISE_DEMO_PASSWORD: this.demoPassword ?? '',
    };
  }

  #instanceFile() {
    return join(this.data.path, 'instance.json');
  }

  /** Refuses when another start runs on this data folder; ends a server whose start was killed. */
  async claim() {
    const earlier = existsSync(this.#instanceFile()) ? JSON.parse(readFileSync(this.#instanceFile(), 'utf8')) : null;
    if (earlier !== null && isAlive(earlier.pid) && commandLine(earlier.pid) === earlier.command) {
      throw new Refusal(`The data folder ${this.data.path} is in use by the instance at ${earlier.address} (process ${earlier.pid}).`);
    }
    if (earlier?.serverPid && commandLine(earlier.serverPid).includes(mainFile)) await endProcess(earlier.serverPid);
    if (earlier?.workerPid && commandLine(earlier.workerPid).includes(workerFile)) await endProcess(earlier.workerPid);
    if (!(await isFree(this.port, this.host))) {
      const answering = (await answers(this.port)) ? 'Something else answers there already.' : 'It may not be used by this user.';
      throw new Refusal(`Port ${this.port} is not free. ${answering} Choose another, for example:\n  PORT=${this.port + 1} npm start`);
    }
    this.#record({});
  }

  #record(pids) {
    this.pids = { ...this.pids, ...pids };
    const record = { pid: process.pid, command: commandLine(process.pid), ...this.pids, address: this.address };
    writeFileSync(this.#instanceFile(), JSON.stringify(record), { mode: 0o600 });
  }

  release() {
    rmSync(this.#instanceFile(), { force: true });
  }

  async prepareDatabase() {
    await this.cluster.start();
    await this.runEntry('database/run-migrations.js');
    if (this.demo) await this.runEntry('seed.js');
  }

  runEntry(name, args = []) {
    return run(process.execPath, ['--enable-source-maps', entry(name), ...args], { cwd: projectFolder, env: this.environment });
  }

  /** Starts the server in a process group of its own, so that Ctrl+C reaches it only through us and it ends in order. */
  launchServer(nodeOptions = []) {
    const server = this.#launch(mainFile, nodeOptions);
    this.#record({ serverPid: server.pid });
    return server;
  }

  /** Starts a worker, which computes runs; more of them may run anywhere that reaches the database. */
  launchWorker(nodeOptions = []) {
    const worker = this.#launch(workerFile, nodeOptions);
    this.#record({ workerPid: worker.pid });
    return worker;
  }

  #launch(file, nodeOptions) {
    return spawn(process.execPath, ['--enable-source-maps', ...nodeOptions, file], {
      cwd: projectFolder,
      env: this.environment,
      stdio: ['ignore', 'inherit', 'inherit'],
      detached: true,
    });
  }

  async isReady() {
    try {
      return (await fetch(`${this.address}/api/ready`, { signal: AbortSignal.timeout(2000) })).ok;
    } catch {
      return false; // not listening yet
    }
  }
}
