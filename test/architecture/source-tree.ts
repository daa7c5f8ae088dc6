import { readFileSync, readdirSync } from 'node:fs';
import { join, relative, sep } from 'node:path';

export const projectFolder = join(__dirname, '../..');

const notOurs = new Set(['node_modules', 'dist', 'coverage', '.git', '.angular', '.cache']);
const isOurs = (name: string): boolean => !notOurs.has(name) && !name.startsWith('.data');

export interface SourceFile {
  /** From the project's folder, with forward slashes. */
  readonly path: string;
  readonly text: string;
}

function pathsBelow(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true })
    .filter((entry) => isOurs(entry.name))
    .flatMap((entry) => (entry.isDirectory() ? pathsBelow(join(folder, entry.name)) : entry.isFile() ? [join(folder, entry.name)] : []));
}

/** Every file of the project whose name ends in one of the endings. */
export function sourceFiles(endings: RegExp): SourceFile[] {
  return pathsBelow(projectFolder)
    .filter((path) => endings.test(path))
    .map((path) => ({ path: relative(projectFolder, path).split(sep).join('/'), text: readFileSync(path, 'utf8') }));
}

export const lineCount = (text: string): number => text.trimEnd().split('\n').length;

/** The value below which the share of the sorted numbers lies, by the nearest-rank rule. */
export function percentile(values: readonly number[], share: number): number {
  if (values.length === 0) throw new Error('There are no values to rank.');
  const sorted = [...values].sort((a, b) => a - b);
  const rank = Math.max(1, Math.ceil(share * sorted.length));
  return sorted[rank - 1] as number;
}
