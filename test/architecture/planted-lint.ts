import { spawnSync } from 'node:child_process';
import { join } from 'node:path';

export interface Plant {
  readonly path: string;
  readonly text: string;
}

/** Messages ESLint gives for each plant: the walls alone in the tree `root`, or the whole configuration in this project when null. */
export function lintPlants(root: string | null, plants: readonly Plant[]): string[][] {
  const run = spawnSync(process.execPath, [join(__dirname, 'lint-process.mjs')], {
    input: JSON.stringify({ root, plants }),
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  if (run.status !== 0) throw new Error(`The linting process ended with ${run.status}: ${run.stderr}`);
  return JSON.parse(run.stdout) as string[][];
}
