/** The npm packages, installed exactly as package-lock.json says. */
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { exclusively, run } from './processes.mjs';

export const projectFolder = join(import.meta.dirname, '..');

/**
 * npm keeps a record of what it installed in node_modules/.package-lock.json; comparing it with the lock file finds
 * a changed lock, a half-finished install and a foreign one alike.
 */
function isInstalled() {
  const record = join(projectFolder, 'node_modules/.package-lock.json');
  if (!existsSync(record)) return false;
  const wanted = JSON.parse(readFileSync(join(projectFolder, 'package-lock.json'), 'utf8')).packages;
  const present = JSON.parse(readFileSync(record, 'utf8')).packages;
  const fits = ([path, { integrity, optional }]) =>
    path === '' || (present[path] === undefined ? optional === true : present[path].integrity === integrity && existsSync(join(projectFolder, path)));
  return Object.entries(wanted).every(fits) && Object.keys(present).every((path) => wanted[path] !== undefined);
}

export async function provideDependencies() {
  if (isInstalled()) return;
  await exclusively(join(projectFolder, '.cache/locks/dependencies'), async () => {
    if (isInstalled()) return; // another process did it meanwhile
    console.log('Installing the npm packages (about a minute) ...');
    await run('npm', ['ci', '--ignore-scripts', '--include=dev', '--no-audit', '--no-fund'], { cwd: projectFolder });
  });
}
