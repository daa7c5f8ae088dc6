/** `npm start`: from a fresh clone to a running product; see README.md for what it may be told by the environment. */
import { once } from 'node:events';
import { provideBuild } from './build-output.mjs';
import { dataFolderPath } from './data-folder.mjs';
import { provideDependencies } from './dependencies.mjs';
import { provideMachine } from './machine.mjs';
import { Refusal, endProcess, runScript, waitFor } from './processes.mjs';
import { Product } from './product.mjs';

const WORKER_PAUSE_MS = 1000;
const demoAccounts = ['designer', 'lab', 'reviewer', 'fabricator', 'range', 'admin'].map((name) => `${name}@merrow.example`);

function announce(product) {
  const lines = ['', `Slantwise is ready:  ${product.address}`, ''];
  if (product.demo) lines.push('Demonstration accounts', ...demoAccounts.map((email) => `  ${email}`), `Password for each:  ${product.demoPassword}`, '');
  lines.push(`Data:  ${product.data.path}`, 'Stop:  Ctrl+C', '');
  console.log(lines.join('\n'));
}

/** Resolves with the signal that asks this process to end. */
const endSignal = () => new Promise((resolve) => ['SIGINT', 'SIGTERM', 'SIGHUP'].forEach((name) => process.on(name, () => resolve(name))));

/** A worker that ends by itself, or is killed, is followed by another: nothing it was computing is lost. */
function keepWorker(product) {
  const state = { worker: null, ending: false };
  const launch = () => {
    state.worker = product.launchWorker();
    state.worker.once('exit', () => setTimeout(() => state.ending || launch(), WORKER_PAUSE_MS));
  };
  launch();
  return async () => {
    state.ending = true;
    const { worker } = state;
    if (worker.exitCode === null && worker.signalCode === null) await endProcess(worker.pid);
  };
}

async function serve(product, asked) {
  const server = product.launchServer();
  const exited = once(server, 'exit').then(([code, signal]) => ({ code, signal }));
  const isOver = () => server.exitCode !== null || server.signalCode !== null;
  let ending = false;
  let endWorker = async () => {};
  const ready = waitFor(async () => ending || isOver() || (await product.isReady()), { seconds: 60 });
  try {
    const first = await Promise.race([exited, asked, ready]);
    if (first === null) throw new Refusal(`The server did not become ready at ${product.address} within a minute.`);
    if (first === true && !isOver()) {
      endWorker = keepWorker(product);
      announce(product);
    }
    const last = typeof first === 'string' ? first : await Promise.race([exited, asked]);
    if (typeof last !== 'string') throw new Refusal(`The server ended by itself (${last.signal ?? `exit code ${last.code}`}).`);
  } finally {
    ending = true;
    await Promise.all([endWorker(), isOver() ? null : endProcess(server.pid)]);
  }
}

await runScript(async () => {
  const asked = endSignal();
  await provideMachine('postgres');
  await provideDependencies();
  await provideBuild('server', 'client');
  const product = new Product(dataFolderPath());
  await product.claim();
  try {
    await product.prepareDatabase();
    await serve(product, asked);
  } finally {
    await product.cluster.stop();
    product.release();
  }
});
