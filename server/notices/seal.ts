import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto';

const CIPHER = 'aes-256-gcm';
const NONCE_BYTES = 12;
const TAG_BYTES = 16;

const keyFrom = (secret: string): Uint8Array => new Uint8Array(hkdfSync('sha256', secret, '', 'letters', 32));

/** Encrypts text with a key of its own, derived from the server's secret: nonce, tag, cipher text. */
export function seal(secret: string, text: string): Buffer {
  const nonce = randomBytes(NONCE_BYTES);
  const cipher = createCipheriv(CIPHER, keyFrom(secret), nonce);
  const body = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()]);
  return Buffer.concat([nonce, cipher.getAuthTag(), body]);
}

/** Undoes `seal`. @throws when the secret is another or the bytes were changed */
export function unseal(secret: string, sealed: Buffer): string {
  const decipher = createDecipheriv(CIPHER, keyFrom(secret), sealed.subarray(0, NONCE_BYTES));
  decipher.setAuthTag(sealed.subarray(NONCE_BYTES, NONCE_BYTES + TAG_BYTES));
  return Buffer.concat([decipher.update(sealed.subarray(NONCE_BYTES + TAG_BYTES)), decipher.final()]).toString('utf8');
}
