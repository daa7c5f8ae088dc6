import { createHash } from 'node:crypto';
import { canonicalJson } from '../../shared/model/canonical-json';

/** Hash before the first row of a team. */
export const CHAIN_START = '0'.repeat(64);

export interface ChainedRow {
  readonly teamId: string;
  readonly sequence: number;
  readonly at: Date;
  readonly personId: string | null;
  readonly action: string;
  readonly object: string;
  readonly detail: Record<string, unknown>;
  readonly previousHash: string;
}

/** SHA-256 over everything the row says and the hash of the row before. */
export function hashOfRow(row: ChainedRow): string {
  const { teamId, sequence, personId, action, object, detail, previousHash } = row;
  const said = canonicalJson({ teamId, sequence, at: row.at.toISOString(), personId, action, object, detail, previousHash });
  return createHash('sha256').update(said).digest('hex');
}

/** How far a chain has been followed: start with `chainStart`. */
export interface ChainEnd {
  readonly sequence: number;
  readonly hash: string;
}
export const chainStart: ChainEnd = { sequence: 0, hash: CHAIN_START };

/**
 * Follows the chain over further rows, in order.
 * @returns the new end, or the sequence number of the first row that does not follow from those before it
 */
export function followChain(end: ChainEnd, rows: Iterable<ChainedRow & { readonly hash: string }>): ChainEnd | { readonly brokenAt: number } {
  let { sequence, hash } = end;
  for (const row of rows) {
    if (row.sequence !== sequence + 1 || row.previousHash !== hash || hashOfRow(row) !== row.hash) return { brokenAt: sequence + 1 };
    sequence = row.sequence;
    hash = row.hash;
  }
  return { sequence, hash };
}
