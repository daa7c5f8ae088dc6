/** How bench.mjs measures: CPU time of this process, and of a Python process that works the reference, in turns. */
import { spawn, spawnSync } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { createInterface } from 'node:readline';

const oneThread = { OMP_NUM_THREADS: '1', OPENBLAS_NUM_THREADS: '1', MKL_NUM_THREADS: '1' };

/** Variables that pin an old kernel of the matrix library would slow the reference and flatter us. */
function referenceEnvironment() {
  const pinning = ['OPENBLAS_CORETYPE', 'OPENBLAS_L2_SIZE'];
  return { ...Object.fromEntries(Object.entries(process.env).filter(([name]) => !pinning.includes(name))), ...oneThread };
}

/** Debian's Python where it has scipy, else the one on the path. */
const pythons = ['/usr/bin/python3', 'python3'];

/** { python, versions } of the first Python that has numpy and scipy, or null. */
export function findReference() {
  const code = 'import numpy, scipy; print(f"numpy {numpy.__version__}, scipy {scipy.__version__}")';
  for (const python of pythons) {
    const { status, stdout } = spawnSync(python, ['-c', code], { encoding: 'utf8', env: referenceEnvironment() });
    if (status === 0) return { python, versions: stdout.trim() };
  }
  return null;
}

/** The reference, alive for the whole run so that its memory is as warm as ours. */
export class Reference {
  #child;
  #lines;

  constructor(python) {
    this.#child = spawn(python, [join(import.meta.dirname, 'bench-reference.py')], { stdio: ['pipe', 'pipe', 'inherit'], env: referenceEnvironment() });
    this.#lines = createInterface({ input: this.#child.stdout })[Symbol.asyncIterator]();
  }

  async #ask(request) {
    this.#child.stdin.write(`${JSON.stringify(request)}\n`);
    const { value, done } = await this.#lines.next();
    if (done) throw new Error('The reference ended: see its message above.');
    return JSON.parse(value);
  }

  prepare = (setup, call) => this.#ask({ setup, call });
  cpuMs = async (repeat) => (await this.#ask({ repeat })).cpuMs;

  async end() {
    this.#child.stdin.end();
    await once(this.#child, 'exit');
  }
}

export function ownCpuMs(work, repeat) {
  const before = process.cpuUsage();
  for (let i = 0; i < repeat; i++) work();
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000 / repeat;
}

/** Repeats that make one measurement last about 30 ms, enough for the clock of CPU time. */
const repeatsFor = (ms) => Math.max(1, Math.min(2000, Math.round(30 / Math.max(ms, 0.01))));

/** Smallest CPU time of ours and of the reference over interleaved rounds; the reference may be null. */
export async function interleaved(work, reference, { rounds = 12 } = {}) {
  for (let i = 0; i < 3; i++) work();
  const ownRepeat = repeatsFor(ownCpuMs(work, 1));
  const referenceRepeat = reference === null ? 0 : repeatsFor(await reference.cpuMs(1));
  const best = { ownMs: Infinity, referenceMs: reference === null ? null : Infinity };
  for (let round = 0; round < rounds; round++) {
    best.ownMs = Math.min(best.ownMs, ownCpuMs(work, ownRepeat));
    if (reference !== null) best.referenceMs = Math.min(best.referenceMs, await reference.cpuMs(referenceRepeat));
  }
  return best;
}

/** Time from call to answer, as a person waits for it: percentiles over `count` calls, each a little different. */
export function latencies(work, count) {
  const times = [];
  for (let i = 0; i < count; i++) {
    const started = performance.now();
    work(i);
    times.push(performance.now() - started);
  }
  return percentiles(times);
}

export function percentiles(times) {
  times.sort((a, b) => a - b);
  const at = (share) => times[Math.min(times.length - 1, Math.ceil(share * times.length) - 1)];
  return { leastMs: times[0], p50Ms: at(0.5), p95Ms: at(0.95) };
}
