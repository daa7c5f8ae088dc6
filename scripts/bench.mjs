/**
 * `npm run bench`: each row against numpy and scipy in the same run, in turns, and whether it meets its goal.
 * Rows come from the files in scripts/bench; `npm run bench -- pattern` runs those whose name holds the word.
 *
 * A row is { name, goal, prepare(load) }; `load('antenna/x')` gives the compiled module
 * shared/antenna/x, `load('server/x')` server/x.
 *   goal { ratio }            prepare gives { work, setup, call }: CPU time against the Python expression `call`
 *   goal { p95Ms, calls }     prepare gives { work(i) }: time from call to answer
 *   goal { wallMs, rssMb }    prepare gives { work }: one call, and the memory of the process after it
 *   goal { p95Ms }            with `sample(product)` instead of prepare: times at a product started for these rows
 */
import { readdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import { availableParallelism, loadavg } from 'node:os';
import { join } from 'node:path';
import { Reference, findReference, interleaved, latencies, percentiles } from './bench-measure.mjs';
import { BenchProduct } from './bench-product.mjs';
import { provideBuild, serverFolder } from './build-output.mjs';
import { provideDependencies } from './dependencies.mjs';
import { checkNode } from './machine.mjs';
import { Refusal, runScript } from './processes.mjs';

const rowFolder = join(import.meta.dirname, 'bench');
const require = createRequire(import.meta.url);
const load = (name) => require(join(serverFolder, name.startsWith('server/') ? '' : 'shared', `${name}.js`));
const ms = (value) => `${value < 10 ? value.toFixed(3) : value.toFixed(1)} ms`;

const verdict = (isMet, text) => ({ isMet, text: `${isMet ? 'met    ' : 'NOT MET'}  ${text}` });

const residentMb = () => process.memoryUsage.rss() / 2 ** 20;

async function againstReference(row, reference) {
  const before = residentMb();
  const { work, setup, call } = row.prepare(load);
  work();
  const memory = row.showsMemory ? `, ${Math.max(0, residentMb() - before).toFixed(0)} MB` : '';
  if (reference !== null) await reference.prepare(setup, call);
  const { ownMs, referenceMs } = await interleaved(work, reference, row);
  if (referenceMs === null) return { isMet: null, text: `no reference here; ${ms(ownMs)}${memory}` };
  const ratio = ownMs / referenceMs;
  const measured = `${ratio.toFixed(2)} of ${row.against} (${ms(ownMs)} to ${ms(referenceMs)}${memory})`;
  if (row.goal.ratio === null) return { isMet: null, text: `         ${measured}` };
  return verdict(ratio <= row.goal.ratio, `${measured}; goal ${row.goal.ratio}`);
}

const answerText = ({ leastMs, p50Ms, p95Ms }, goal) => `p50 ${ms(p50Ms)}, p95 ${ms(p95Ms)}, least ${ms(leastMs)}; goal p95 ${goal.p95Ms} ms`;

function answerTime(row) {
  const { work } = row.prepare(load);
  latencies(work, Math.min(5, row.goal.calls));
  const times = latencies(work, row.goal.calls);
  return verdict(times.p95Ms <= row.goal.p95Ms, answerText(times, row.goal));
}

/** Wall time is what counts; CPU time says how much of it other programs took. */
function singleCall(row) {
  const { work } = row.prepare(load);
  const { user, system } = process.cpuUsage();
  const { p50Ms: wallMs } = latencies(work, 1);
  const used = process.cpuUsage({ user, system });
  const rssMb = process.resourceUsage().maxRSS / 1024;
  const { wallMs: mostMs, rssMb: mostMb } = row.goal;
  const memory = mostMb === Infinity ? '' : `, ${mostMb} MB`;
  const text = `${ms(wallMs)} (CPU ${ms((used.user + used.system) / 1000)}), ${rssMb.toFixed(0)} MB at most; goal ${mostMs} ms${memory}`;
  return verdict(wallMs <= mostMs && rssMb <= mostMb, text);
}

let product = null;

async function atProduct(row) {
  product ??= await BenchProduct.start();
  const times = percentiles(await row.sample(product));
  return verdict(times.p95Ms <= row.goal.p95Ms, answerText(times, row.goal));
}

function measure(row, reference) {
  if ('sample' in row) return atProduct(row);
  if ('p95Ms' in row.goal) return answerTime(row);
  return 'wallMs' in row.goal ? singleCall(row) : againstReference(row, reference);
}

async function loadRows(words) {
  const files = readdirSync(rowFolder).filter((name) => name.endsWith('.mjs')).sort();
  const all = (await Promise.all(files.map((name) => import(join(rowFolder, name))))).flatMap(({ rows }) => rows);
  const chosen = all.filter(({ name }) => words.every((word) => name.includes(word)));
  if (chosen.length === 0) throw new Refusal(`No row has a name with "${words.join(' ')}". There are:\n${all.map(({ name }) => `  ${name}`).join('\n')}`);
  // Memory is the peak of the process, so rows that are judged by it come first; the product would disturb every other row, so its come last.
  return chosen.sort((a, b) => Number('sample' in a) - Number('sample' in b) || Number('rssMb' in b.goal) - Number('rssMb' in a.goal));
}

/** A product runs in a process group of its own, so that an ended bench must end it. */
for (const signal of ['SIGINT', 'SIGTERM']) {
  process.once(signal, () => void Promise.resolve(product?.end()).finally(() => process.exit(1)));
}

await runScript(async () => {
  checkNode();
  await provideDependencies();
  await provideBuild('server');
  const rows = await loadRows(process.argv.slice(2));
  const found = findReference();
  console.log(found === null ? 'numpy and scipy are not installed: times alone, no ratios (Debian: python3-scipy).' : `Against ${found.versions} of ${found.python}, one thread each.`);
  console.log(`Load of the machine before: ${loadavg()[0].toFixed(1)} on ${availableParallelism()} cores. Where others work, only ratios say much.`);
  const reference = found === null ? null : new Reference(found.python);
  let unmet = 0;
  try {
    for (const row of rows) {
      const result = await measure(row, reference);
      if (result.isMet === false) unmet += 1;
      console.log(`${row.name.padEnd(54)} ${result.text}`);
    }
  } finally {
    await reference?.end();
    await product?.end();
  }
  console.log(unmet === 0 ? '\nEvery goal that was measured is met.' : `\n${unmet} of ${rows.length} rows miss their goal.`);
});
