import { createHash } from 'node:crypto';
import { StaleVersion, VersionRequired } from './problems';

/** Strong entity tag of a row that counts its versions. */
export const versionTag = (version: number): string => `"v${version}"`;

/** Strong entity tag of content: equal bytes, equal tag. */
export const contentTag = (content: string | Uint8Array): string =>
  `"${createHash('sha256').update(content).digest('base64url')}"`;

/**
 * The one strong tag a change names. A weak tag, a list or `*` names no single version and counts as none
 * (RFC 9110, 13.1.1 wants strong comparison; overwriting whatever is there is what we guard against).
 * @throws VersionRequired
 */
export function requireIfMatch(header: string | undefined): string {
  const tag = header?.trim() ?? '';
  if (!/^"[^"]+"$/.test(tag)) throw new VersionRequired();
  return tag;
}

/** Call it in the transaction that writes, with the row locked. @throws StaleVersion */
export function refuseStale(ifMatch: string, current: string, body?: unknown): void {
  if (ifMatch !== current) throw new StaleVersion(current, body);
}
