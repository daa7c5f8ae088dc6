import { randomBytes, scrypt, timingSafeEqual } from 'node:crypto';
import type PQueue from 'p-queue';
import { Unavailable } from '../http/problems';

/** Cost of scrypt as OWASP's password storage cheat sheet gives it (from memory): N = 2^17, r = 8, p = 1; about 0.4 s. */
export interface ScryptCost {
  readonly logN: number;
  readonly r: number;
  readonly p: number;
}
export const presentCost: ScryptCost = { logN: 17, r: 8, p: 1 };

const SALT_BYTES = 16;
const KEY_BYTES = 32;
/** Each running scrypt of the present cost takes 128 MiB. */
const CONCURRENT = 2;
/** More than this many waiting would keep the last one longer than a browser waits. */
const MAX_WAITING = 60;

function derive(password: string, salt: Buffer, { logN, r, p }: ScryptCost): Promise<Buffer> {
  const N = 2 ** logN;
  // Node's default limit of 32 MiB is below what these parameters need: 128 N r bytes.
  const maxmem = 128 * N * r + 1024 * 1024;
  return new Promise((resolve, reject) => {
    // NFKC, so that the same password typed on another keyboard gives the same bytes (NIST SP 800-63B).
    scrypt(password.normalize('NFKC'), salt, KEY_BYTES, { N, r, p, maxmem }, (error, key) => (error ? reject(error) : resolve(key)));
  });
}

const encode = (cost: ScryptCost, salt: Buffer, key: Buffer): string =>
  `$scrypt$ln=${cost.logN},r=${cost.r},p=${cost.p}$${salt.toString('base64url')}$${key.toString('base64url')}`;

const encoded = /^\$scrypt\$ln=(\d+),r=(\d+),p=(\d+)\$([\w-]+)\$([\w-]+)$/;

interface Decoded {
  readonly cost: ScryptCost;
  readonly salt: Buffer;
  readonly key: Buffer;
}

function decode(hash: string): Decoded {
  const [, logN, r, p, salt, key] = encoded.exec(hash) ?? [];
  if (salt === undefined || key === undefined) throw new Error('a stored password hash has an unknown form');
  const cost = { logN: Number(logN), r: Number(r), p: Number(p) };
  return { cost, salt: Buffer.from(salt, 'base64url'), key: Buffer.from(key, 'base64url') };
}

/** Hashes passwords, few at a time: the rest wait in line, and a line too long is refused. */
export class PasswordHasher {
  /** Same cost and shape as a real one; no password fits, for its key was never derived. */
  private readonly nobody: string;
  private queue: Promise<PQueue> | null = null;

  constructor(private readonly cost: ScryptCost = presentCost) {
    this.nobody = encode(cost, randomBytes(SALT_BYTES), randomBytes(KEY_BYTES));
  }

  async hash(password: string): Promise<string> {
    const salt = randomBytes(SALT_BYTES);
    return encode(this.cost, salt, await this.inLine(() => derive(password, salt, this.cost)));
  }

  /** @param hash null for an unknown account: takes the same time and says no */
  async fits(password: string, hash: string | null): Promise<boolean> {
    const { cost, salt, key } = decode(hash ?? this.nobody);
    const derived = await this.inLine(() => derive(password, salt, cost));
    return timingSafeEqual(derived, key) && hash !== null;
  }

  /** True when the hash was made with another cost than the present one and should be made anew. */
  isOutdated(hash: string): boolean {
    const { cost } = decode(hash);
    return cost.logN !== this.cost.logN || cost.r !== this.cost.r || cost.p !== this.cost.p;
  }

  private async inLine(work: () => Promise<Buffer>): Promise<Buffer> {
    // p-queue is an ES module and this is CommonJS: only a dynamic import works in every runtime we use.
    this.queue ??= import('p-queue').then(({ default: Queue }) => new Queue({ concurrency: CONCURRENT }));
    const queue = await this.queue;
    if (queue.size >= MAX_WAITING) throw new Unavailable('Too many people are signing in at the moment.', 10);
    return queue.add(work);
  }
}
