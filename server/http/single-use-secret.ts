import { createHash, randomBytes } from 'node:crypto';

/** 256 random bits, in letters that survive links. */
export const newSecret = (): string => randomBytes(32).toString('base64url');

/** How secrets are kept at rest. They are random and long, so a plain hash is enough. */
export const hashOfSecret = (secret: string): string => createHash('sha256').update(secret).digest('hex');
