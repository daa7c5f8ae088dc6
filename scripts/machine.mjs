/** What the machine must have before anything else: the right Node, and Debian's PostgreSQL (and Chromium for the tests). */
import { appendFileSync, existsSync, mkdirSync, readFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { Refusal, run } from './processes.mjs';

const lowestNode = [20, 19];
const postgresVersions = [15, 16, 17];

const needs = {
  postgres: {
    packages: ['postgresql-15', 'postgresql-client-15'],
    why: 'the database',
    present: () => postgresFolder() !== null && programPath('psql') !== null,
  },
  chromium: { packages: ['chromium'], why: 'the browser that the end-to-end tests drive', present: () => existsSync('/usr/bin/chromium') },
};

function programPath(name) {
  const folder = (process.env.PATH ?? '').split(delimiter).find((path) => path !== '' && existsSync(join(path, name)));
  return folder === undefined ? null : join(folder, name);
}

/** Folder with initdb and pg_ctl of the first usable version, or null. */
export function postgresFolder() {
  const folders = postgresVersions.map((version) => `/usr/lib/postgresql/${version}/bin`);
  return folders.find((folder) => ['initdb', 'pg_ctl', 'postgres'].every((name) => existsSync(join(folder, name)))) ?? null;
}

export function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major === lowestNode[0] && minor >= lowestNode[1]) return;
  throw new Refusal(`Slantwise runs on Node ${lowestNode[0]}.${lowestNode[1]} or a later 20.x; this is Node ${process.versions.node}.`);
}

/** Installs what is missing when that is possible here, and says what to install when it is not. */
export async function provideMachine(...names) {
  checkNode();
  const missing = names.map((name) => needs[name]).filter((need) => !need.present());
  if (missing.length === 0) return;
  const packages = missing.flatMap((need) => need.packages);
  const list = missing.map((need) => `  ${need.packages.join(' ')}   (${need.why})`).join('\n');
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) {
    throw new Refusal(`These packages of Debian 12 are missing:\n${list}\nInstall them, then start again:\n  sudo apt-get install --no-install-recommends ${packages.join(' ')}`);
  }
  console.log(`Installing ${packages.join(', ')} ...`);
  if (missing.includes(needs.postgres)) keepSystemClusterAway();
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  await run('apt-get', ['update', '-q'], { env });
  await run('apt-get', ['install', '-q', '-y', '--no-install-recommends', '-o', 'Dpkg::Options::=--force-confold', ...packages], { env });
  const still = missing.filter((need) => !need.present());
  if (still.length > 0) throw new Refusal(`Installed, but still not usable here:\n${still.map((need) => `  ${need.packages.join(' ')}`).join('\n')}`);
}

/** The package would otherwise make and start a cluster of its own on port 5432, which nobody here uses. */
function keepSystemClusterAway() {
  const file = '/etc/postgresql-common/createcluster.conf';
  const text = existsSync(file) ? readFileSync(file, 'utf8') : '';
  if (/^\s*create_main_cluster/m.test(text)) return;
  mkdirSync('/etc/postgresql-common', { recursive: true });
  appendFileSync(file, 'create_main_cluster = false\n');
}
