/** The folder that holds everything one instance creates: keys, uploads, and (where its user may go there) the database. */
import { randomBytes, randomInt } from 'node:crypto';
import { chmodSync, chownSync, existsSync, mkdirSync, readFileSync, renameSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { spawnSync } from 'node:child_process';
import { projectFolder } from './dependencies.mjs';
import { Refusal } from './processes.mjs';

export const dataFolderPath = () => resolve(projectFolder, process.env.SLANTWISE_DATA || '.data');

const files = {
  superuserPassword: 'database-superuser-password',
  databasePassword: 'database-password',
  databasePort: 'database-port',
  databaseFolder: 'database-folder',
  secret: 'secret',
  demo: 'demo',
  demoPassword: 'demo-password',
};

/** Each fact is one file that only its owner can read; absent means not decided yet. */
export class DataFolder {
  constructor(path) {
    this.path = path;
  }

  get isNew() {
    return !existsSync(join(this.path, files.secret));
  }

  read(name) {
    const file = join(this.path, files[name]);
    return existsSync(file) ? readFileSync(file, 'utf8').trim() : null;
  }

  write(name, value) {
    const file = join(this.path, files[name]);
    writeFileSync(`${file}.new`, `${value}\n`, { mode: 0o600 });
    renameSync(`${file}.new`, file);
    return value;
  }

  /** The kept value, or a fresh one that is kept from now on. */
  keep(name, make) {
    return this.read(name) ?? this.write(name, make());
  }
}

/** Makes the folder when needed. As root, the database's user must be able to pass through it, though not to list it. */
export function openDataFolder(path) {
  mkdirSync(path, { recursive: true, mode: 0o700 });
  if (statSync(path).uid !== process.getuid()) throw new Refusal(`The data folder ${path} belongs to another user.`);
  chmodSync(path, process.getuid() === 0 ? 0o711 : 0o700);
  return new DataFolder(path);
}

export const randomSecret = () => randomBytes(32).toString('base64url');

/** 20 letters and digits without look-alikes, in groups: about 97 bits, and easy to type from a screen. */
export function readablePassword() {
  const letters = 'abcdefghjkmnpqrstuvwxyz23456789';
  const group = () => Array.from({ length: 5 }, () => letters[randomInt(letters.length)]).join('');
  return [group(), group(), group(), group()].join('-');
}

/** PostgreSQL refuses to run as root, so root starts it as the package's own user; anybody else starts it as himself. */
export function databaseUser() {
  if (process.getuid() !== 0) return null;
  const line = readFileSync('/etc/passwd', 'utf8').split('\n').find((entry) => entry.startsWith('postgres:'));
  if (line === undefined) throw new Refusal('There is no user "postgres" to run the database as: is the package postgresql-15 installed?');
  const [, , uid, gid] = line.split(':');
  return { uid: Number(uid), gid: Number(gid) };
}

/**
 * Folder of the database's files: inside the data folder, unless its user cannot reach that place
 * (a checkout below /root, or any folder that only root can enter); then below /var/lib, under a random name.
 */
export function databaseFolder(data, user) {
  const kept = data.read('databaseFolder');
  if (kept !== null) return kept;
  const inside = join(data.path, 'database');
  if (existsSync(inside)) return inside;
  const reachable = user === null || canEnter(data.path, user);
  const folder = reachable ? inside : join('/var/lib/slantwise', randomBytes(8).toString('hex'));
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  if (user !== null) chownSync(folder, user.uid, user.gid);
  if (reachable) return folder;
  chmodSync(dirname(folder), 0o711);
  console.error(`The user postgres may not enter ${data.path}; the database's files go to ${folder}.`);
  return data.write('databaseFolder', folder);
}

const canEnter = (folder, user) => spawnSync('/usr/bin/test', ['-x', folder], { ...user, cwd: '/' }).status === 0;
