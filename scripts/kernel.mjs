/** The vector kernel of the engine, compiled from AssemblyScript by a package of the project: see server/engine/kernel/assembly. */
import { mkdirSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { projectFolder } from './dependencies.mjs';
import { run } from './processes.mjs';

export const kernelSources = 'server/engine/kernel/assembly';
export const kernelFile = join(projectFolder, 'dist/kernel/kernel.wasm');

/** Files whose exports the module exports; the others are what these are made of. */
const entries = ['plane-transform', 'pattern-columns', 'projection-columns', 'trial-columns', 'lattice-sums'];

/** No runtime: the kernel owns no object. Shared memory of up to 2 GiB comes from outside. */
const settings = [
  ...['--enable', 'simd', '--enable', 'threads', '--importMemory', '--sharedMemory', '--initialMemory', '1', '--maximumMemory', '32768'],
  ...['--runtime', 'stub', '--noAssert', '--use', 'abort=', '--optimizeLevel', '3', '--shrinkLevel', '0', '--converge'],
  // Vectors in the signatures of functions that are all put in place, and 32-bit pointers, are meant.
  ...['--disableWarning', '112', '--disableWarning', '201'],
];

/** Compiles beside the target and moves into place, so that no reader meets half a file. */
export async function makeKernel() {
  const folder = join(projectFolder, kernelSources);
  const missing = entries.filter((name) => !readdirSync(folder).includes(`${name}.ts`));
  if (missing.length > 0) throw new Error(`The kernel lacks ${missing.join(', ')}.`);
  const fresh = `${kernelFile}.${process.pid}`;
  mkdirSync(dirname(kernelFile), { recursive: true });
  try {
    await run(join(projectFolder, 'node_modules/.bin/asc'), [...entries.map((name) => join(kernelSources, `${name}.ts`)), '--outFile', fresh, ...settings], { cwd: projectFolder });
    renameSync(fresh, kernelFile);
  } finally {
    rmSync(fresh, { force: true });
  }
}
