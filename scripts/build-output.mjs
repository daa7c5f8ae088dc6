/** Builds client, server and the server's kernel into dist/, each only when something it is made of has changed. */
import { createHash } from 'node:crypto';
import { copyFileSync, existsSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { projectFolder } from './dependencies.mjs';
import { kernelFile, kernelSources, makeKernel } from './kernel.mjs';
import { exclusively, run } from './processes.mjs';

export const clientFolder = join(projectFolder, 'dist/client');
export const serverFolder = join(projectFolder, 'dist/server');

const parts = {
  client: {
    sources: ['src', 'shared'],
    settings: ['angular.json', 'tsconfig.base.json', 'tsconfig.client.json', 'package-lock.json'],
    product: join(clientFolder, 'index.html'),
    takes: 'up to a minute',
    make: () => program('ng', ['build', '--progress=false']),
  },
  kernel: {
    sources: [kernelSources],
    settings: ['scripts/kernel.mjs', 'package-lock.json'],
    product: kernelFile,
    takes: 'some seconds',
    make: makeKernel,
  },
  server: {
    needs: ['kernel'],
    sources: ['server', 'shared'],
    settings: ['tsconfig.base.json', 'tsconfig.server.json', 'package-lock.json'],
    product: join(serverFolder, 'server/main.js'),
    takes: 'up to half a minute',
    make: makeServer,
  },
};

const program = (name, args, options) => run(join(projectFolder, 'node_modules/.bin', name), args, { cwd: projectFolder, env: { ...process.env, NO_COLOR: '1', FORCE_COLOR: '0' }, ...options });

const sourceFiles = (folder) =>
  readdirSync(join(projectFolder, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && !entry.name.endsWith('.spec.ts'))
    .map((entry) => relative(projectFolder, join(entry.parentPath, entry.name)))
    .sort();

/** One hash over names and contents: a touched file changes nothing, a renamed one does. */
function fingerprint({ sources, settings }) {
  const hash = createHash('sha256');
  for (const file of [...sources.flatMap(sourceFiles), ...settings]) {
    hash.update(`${file}\0`).update(createHash('sha256').update(readFileSync(join(projectFolder, file))).digest());
  }
  return hash.digest('hex');
}

async function makeServer() {
  pruneServerOutput();
  // The compiler trusts its record of what it wrote; without the output the record is wrong.
  if (!existsSync(parts.server.product)) rmSync(join(serverFolder, '.tsbuildinfo'), { force: true });
  await program('tsc', ['-p', 'tsconfig.server.json', '--noEmitOnError']);
  copyServerAssets();
}

/** Output whose source is gone would still be loaded by whoever lists a folder, such as the migrations. */
function pruneServerOutput() {
  if (!existsSync(serverFolder)) return;
  for (const entry of readdirSync(serverFolder, { recursive: true, withFileTypes: true })) {
    const built = join(entry.parentPath, entry.name);
    const source = join(projectFolder, relative(serverFolder, built)).replace(/\.js(\.map)?$/, '.ts');
    if (entry.isFile() && entry.name !== '.tsbuildinfo' && !existsSync(source)) rmSync(built);
  }
}

/** What the server reads at run time besides code: word lists, letters, fonts. */
export function copyServerAssets() {
  for (const file of ['server', 'shared'].flatMap(sourceFiles).filter((name) => !name.endsWith('.ts'))) {
    const target = join(serverFolder, file);
    mkdirSync(dirname(target), { recursive: true });
    copyFileSync(join(projectFolder, file), target);
  }
}

const stampFile = (name) => join(projectFolder, 'dist', `${name}.stamp`);

function isCurrent(name) {
  const stamp = stampFile(name);
  return existsSync(stamp) && existsSync(parts[name].product) && readFileSync(stamp, 'utf8') === fingerprint(parts[name]);
}

/** Makes the next `provideBuild` build this part whatever its sources, since something else is about to write its output. */
export const forgetBuild = (name) => rmSync(stampFile(name), { force: true });

/** Builds what is out of date; says so, since a person waits for it. */
export async function provideBuild(...asked) {
  const names = [...new Set(asked.flatMap((name) => [...(parts[name].needs ?? []), name]))];
  const stale = () => names.filter((name) => !isCurrent(name));
  if (stale().length === 0) return;
  await exclusively(join(projectFolder, '.cache/locks/build'), async () => {
    for (const name of stale()) {
      console.error(`Building the ${name}, ${parts[name].takes} on two free cores ...`);
      const stamp = fingerprint(parts[name]); // taken before: a change made during the build counts as new
      forgetBuild(name);
      await parts[name].make();
      mkdirSync(dirname(stampFile(name)), { recursive: true });
      writeFileSync(stampFile(name), stamp);
    }
  });
}
