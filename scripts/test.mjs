/**
 * `npm test`: sets up all it needs, runs every stage, and ends with the line "N passed, N failed".
 * `npm test -- shared api` runs these stages alone; words that name no stage are handed to jest as path patterns.
 */
import { spawn } from 'node:child_process';
import { chmodSync, mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { provideBuild } from './build-output.mjs';
import { openDataFolder } from './data-folder.mjs';
import { projectFolder, provideDependencies } from './dependencies.mjs';
import { provideMachine } from './machine.mjs';
import { Cluster } from './postgres.mjs';
import { Refusal, endProcess, freePort, isAlive, runScript, waitFor } from './processes.mjs';
import { stages } from './test-stages.mjs';

const folderPrefix = 'slantwise-test-';
const seconds = (since) => `${((Date.now() - since) / 1000).toFixed(1)} s`.padStart(8);

/** Everything that must end with the test run, newest first. */
const endings = [];
const running = new Set();
let asked = null;

/** The programs that run now, for the signal that may end them. */
function remember(child) {
  running.add(child);
  child.once('exit', () => running.delete(child));
}

function readArguments(words) {
  const names = stages.map((stage) => stage.name);
  const chosen = stages.filter((stage) => words.includes(stage.name));
  return { chosen: chosen.length > 0 ? chosen : stages, patterns: words.filter((word) => !names.includes(word)) };
}

async function temporaryFolder() {
  await removeAbandoned();
  const folder = mkdtempSync(join(tmpdir(), folderPrefix));
  chmodSync(folder, 0o711);
  writeFileSync(join(folder, 'owner'), String(process.pid));
  endings.push(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

/** A test run that was killed leaves its folder, and perhaps its database running in it. */
async function removeAbandoned() {
  for (const name of readdirSync(tmpdir()).filter((entry) => entry.startsWith(folderPrefix))) {
    const folder = join(tmpdir(), name);
    const owner = Number(readFileSync(join(folder, 'owner'), 'utf8'));
    if (isAlive(owner)) continue;
    for (const entry of readdirSync(folder).filter((part) => part !== 'owner')) await new Cluster(openDataFolder(join(folder, entry))).stop();
    rmSync(folder, { recursive: true, force: true });
  }
}

async function provideDatabase(context) {
  const cluster = new Cluster(openDataFolder(join(context.folder, 'tests')), { throwAway: true });
  endings.push(() => cluster.stop());
  await cluster.start();
  context.environment.SLANTWISE_TEST_DATABASE_URL = cluster.superuserUrl;
}

/** The built product, started as a person would start it, with a data folder of its own. */
async function provideProduct(context) {
  const port = await freePort();
  const address = `http://127.0.0.1:${port}`;
  const demo = { SLANTWISE_DEMO: 'on', SLANTWISE_DEMO_PASSWORD: 'only-for-this-test-run' };
  const env = { ...context.environment, ...demo, PORT: String(port), SLANTWISE_DATA: join(context.folder, 'product') };
  const product = spawn(process.execPath, [join(projectFolder, 'scripts/start.mjs')], { env, stdio: ['ignore', 'ignore', 'inherit'], detached: true });
  endings.push(() => endProcess(product.pid, 60));
  const isReady = async () => product.exitCode !== null || (await fetch(`${address}/api/ready`).then((reply) => reply.ok, () => false));
  if (!(await waitFor(isReady, { seconds: 180, every: 0.3 })) || product.exitCode !== null) throw new Refusal('The product did not start for the end-to-end tests.');
  Object.assign(context.environment, demo, { SLANTWISE_E2E_URL: address });
}

const providers = {
  server: () => provideBuild('server'),
  client: () => provideBuild('client'),
  database: provideDatabase,
  product: provideProduct,
};

async function runStage(stage, context) {
  console.log(`\n=== ${stage.name} ===`);
  const started = Date.now();
  try {
    for (const need of stage.needs ?? []) await (context.provided[need] ??= providers[need](context));
    if (asked !== null) throw new Refusal(`Ended by ${asked}.`);
    return { ...(await stage.run(context)), time: seconds(started) };
  } catch (error) {
    console.error(error instanceof Refusal ? error.message : error);
    return { passed: 0, failed: 1, note: 'could not run', time: seconds(started) };
  }
}

function report(results) {
  console.log('\nstage          passed  failed      time');
  for (const { name, passed, failed, time, note } of results) {
    console.log(`${name.padEnd(14)} ${String(passed).padStart(6)}  ${String(failed).padStart(6)}  ${time}${note ? `  (${note})` : ''}`);
  }
  const sum = (key) => results.reduce((total, result) => total + result[key], 0);
  console.log(`\n${sum('passed')} passed, ${sum('failed')} failed`);
  return sum('failed') === 0 ? 0 : 1;
}

async function main() {
  const { chosen, patterns } = readArguments(process.argv.slice(2));
  const needs = new Set(chosen.flatMap((stage) => stage.needs ?? []));
  await provideMachine(...(needs.has('database') || needs.has('product') ? ['postgres'] : []), ...(needs.has('product') ? ['chromium'] : []));
  await provideDependencies();
  const folder = needs.has('database') || needs.has('product') ? await temporaryFolder() : null;
  const context = { patterns, folder, environment: { ...process.env, NODE_ENV: 'test' }, provided: {}, onStart: remember };
  const results = [];
  for (const stage of chosen) {
    if (asked !== null) throw new Refusal(`Ended by ${asked}.`);
    results.push({ name: stage.name, ...(await runStage(stage, context)) });
  }
  return report(results);
}

for (const signal of ['SIGINT', 'SIGTERM']) {
  process.on(signal, () => {
    asked = signal;
    for (const child of running) child.kill('SIGTERM');
  });
}

await runScript(async () => {
  try {
    return await main();
  } finally {
    for (const end of endings.reverse()) await end();
  }
});
