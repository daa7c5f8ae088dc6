/** Running other programs, and asking about processes and ports. Node built-ins only. */
import { spawn } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { connect, createServer } from 'node:net';
import { dirname } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';

/** A fault whose message tells the person everything; no stack is printed for it. */
export class Refusal extends Error {}

/** Runs the main function of a script; a Refusal ends it with its message alone. */
export async function runScript(main) {
  try {
    process.exitCode = (await main()) ?? 0;
  } catch (error) {
    console.error(error instanceof Refusal ? `\n${error.message}\n` : error);
    process.exitCode = 1;
  }
}

/**
 * Runs a program to its end and gives { code, output }, output being what it wrote to stdout.
 * With `show` it writes to this terminal instead; with `check` an exit code other than 0 is a Refusal that quotes everything.
 */
export function run(command, args, { show = false, check = true, input = '', onStart, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: ['pipe', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe'], ...options });
    onStart?.(child);
    let output = '';
    let everything = '';
    child.stdout?.on('data', (chunk) => ((output += chunk), (everything += chunk)));
    child.stderr?.on('data', (chunk) => (everything += chunk));
    child.stdin?.on('error', () => {}); // the program may end before it reads its input; its exit code tells
    child.stdin?.end(input);
    child.on('error', reject);
    child.on('close', (code, signal) => {
      if (check && code !== 0) reject(new Refusal(`${command} ${args.join(' ')} ended with ${signal ?? code}.\n${everything.trim()}`));
      else resolve({ code: code ?? 1, output });
    });
  });
}

export function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

/** Command line of a running process, or '' when it is gone or belongs to a system without /proc. */
export function commandLine(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ').trim();
  } catch {
    return '';
  }
}

/** Resolves true when something accepts connections at the address within a second. */
export function answers(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const socket = connect({ port, host, timeout: 1000 });
    const done = (result) => () => {
      socket.destroy();
      resolve(result);
    };
    socket.on('connect', done(true)).on('error', done(false)).on('timeout', done(false));
  });
}

/** Resolves true when this process could listen at the address. */
export function isFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const server = createServer();
    server.on('error', () => resolve(false));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}

export function freePort(host = '127.0.0.1') {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.on('error', reject);
    server.listen(0, host, () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });
}

/** Asks until the answer is truthy; gives it, or null when the time is over. */
export async function waitFor(ask, { seconds, every = 0.1 }) {
  const end = Date.now() + seconds * 1000;
  for (;;) {
    const answer = await ask();
    if (answer) return answer;
    if (Date.now() > end) return null;
    await sleep(every * 1000);
  }
}

/** Ends a process politely, then firmly. Resolves when it is gone. */
export async function endProcess(pid, seconds = 30) {
  if (!isAlive(pid)) return;
  process.kill(pid, 'SIGTERM');
  if (await waitFor(() => !isAlive(pid), { seconds })) return;
  if (isAlive(pid)) process.kill(pid, 'SIGKILL');
  await waitFor(() => !isAlive(pid), { seconds: 5 });
}

/** Lets one process at a time do the work; others wait, and pass over a lock whose owner is gone. */
export async function exclusively(lockFile, work) {
  mkdirSync(dirname(lockFile), { recursive: true });
  const take = () => {
    try {
      writeFileSync(lockFile, String(process.pid), { flag: 'wx' });
      return true;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
      const owner = ownerOf(lockFile);
      if (owner !== null && !isAlive(owner)) rmSync(lockFile, { force: true });
      return false;
    }
  };
  if (!(await waitFor(take, { seconds: 900, every: 0.2 }))) throw new Refusal(`Another process has held ${lockFile} for 15 minutes.`);
  try {
    return await work();
  } finally {
    rmSync(lockFile, { force: true });
  }
}

function ownerOf(lockFile) {
  try {
    const owner = Number(readFileSync(lockFile, 'utf8'));
    return owner > 0 ? owner : null; // empty for the instant between creating and writing
  } catch {
    return null;
  }
}
