/**
 * `npm run bench`: each row against numpy and scipy in the same run, in turns, and whether it meets its goal.
 * Rows come from the files in scripts/bench; `npm run bench -- pattern` runs those whose name holds the word.
 *
 * A row is { name, goal, prepare(load) }; `load('antenna/x')` gives the compiled module shared/antenna/x.
 *   goal { ratio }            prepare gives { work, setup, call }: CPU time against the Python expression `call`
 *   goal { p95Ms, calls }     prepare gives { work(i) }: time from call to answer
 *   goal { wallMs, rssMb }    prepare gives { work }: one call, and the memory of the process after it
 */
import { readdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { Reference, interleaved, latencies, referenceVersions } from './bench-measure.mjs';
import { provideBuild, serverFolder } from './build-output.mjs';
import { provideDependencies } from './dependencies.mjs';
import { checkNode } from './machine.mjs';
import { Refusal, runScript } from './processes.mjs';

const rowFolder = join(import.meta.dirname, 'bench');
const require = createRequire(import.meta.url);
const load = (name) => require(join(serverFolder, 'shared', `${name}.js`));
const ms = (value) => `${value < 10 ? value.toFixed(3) : value.toFixed(1)} ms`;

const verdict = (isMet, text) => ({ isMet, text: `${isMet ? 'met    ' : 'NOT MET'}  ${text}` });

async function againstReference(row, reference) {
  const { work, setup, call } = row.prepare(load);
  if (reference !== null) await reference.prepare(setup, call);
  const { ownMs, referenceMs } = await interleaved(work, reference, row);
  if (referenceMs === null) return { isMet: null, text: `no reference here; ${ms(ownMs)}` };
  const ratio = ownMs / referenceMs;
  const measured = `${ratio.toFixed(2)} of ${row.against} (${ms(ownMs)} to ${ms(referenceMs)})`;
  if (row.goal.ratio === null) return { isMet: null, text: `         ${measured}` };
  return verdict(ratio <= row.goal.ratio, `${measured}; goal ${row.goal.ratio}`);
}

function answerTime(row) {
  const { work } = row.prepare(load);
  latencies(work, Math.min(5, row.goal.calls));
  const { p50Ms, p95Ms } = latencies(work, row.goal.calls);
  return verdict(p95Ms <= row.goal.p95Ms, `p50 ${ms(p50Ms)}, p95 ${ms(p95Ms)}; goal p95 ${row.goal.p95Ms} ms`);
}

function singleCall(row) {
  const { work } = row.prepare(load);
  const { p50Ms: wallMs } = latencies(work, 1);
  const rssMb = process.resourceUsage().maxRSS / 1024;
  return verdict(wallMs <= row.goal.wallMs && rssMb <= row.goal.rssMb, `${ms(wallMs)}, ${rssMb.toFixed(0)} MB at most; goal ${row.goal.wallMs} ms, ${row.goal.rssMb} MB`);
}

function measure(row, reference) {
  if ('p95Ms' in row.goal) return answerTime(row);
  return 'wallMs' in row.goal ? singleCall(row) : againstReference(row, reference);
}

async function loadRows(words) {
  const files = readdirSync(rowFolder).filter((name) => name.endsWith('.mjs')).sort();
  const all = (await Promise.all(files.map((name) => import(join(rowFolder, name))))).flatMap(({ rows }) => rows);
  const chosen = all.filter(({ name }) => words.every((word) => name.includes(word)));
  if (chosen.length === 0) throw new Refusal(`No row has a name with "${words.join(' ')}". There are:\n${all.map(({ name }) => `  ${name}`).join('\n')}`);
  // Memory is the peak of the process, so rows that are judged by it come first.
  return chosen.sort((a, b) => Number('rssMb' in b.goal) - Number('rssMb' in a.goal));
}

await runScript(async () => {
  checkNode();
  await provideDependencies();
  await provideBuild('server');
  const rows = await loadRows(process.argv.slice(2));
  const versions = referenceVersions();
  console.log(versions === null ? 'numpy and scipy are not installed: times alone, no ratios (Debian: python3-scipy).' : `Against ${versions}, one thread each.`);
  const reference = versions === null ? null : new Reference();
  let unmet = 0;
  for (const row of rows) {
    const result = await measure(row, reference);
    if (result.isMet === false) unmet += 1;
    console.log(`${row.name.padEnd(46)} ${result.text}`);
  }
  await reference?.end();
  console.log(unmet === 0 ? '\nEvery goal that was measured is met.' : `\n${unmet} of ${rows.length} rows miss their goal.`);
});
