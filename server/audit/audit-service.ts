import type { AuditRow as AuditItem } from '../../shared/contracts/team';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { InvalidInput } from '../http/problems';
import { CHAIN_START, chainStart, followChain, hashOfRow, type ChainedRow } from './audit-chain';
import { AuditRepository } from './audit-repository';
import type { AuditRow } from './audit-row-entity';

/** Finds names for people, whom another feature keeps. */
export type NamesOfPeople = (transaction: Transaction, ids: readonly string[]) => Promise<ReadonlyMap<string, string>>;

export interface AuditEntry {
  readonly teamId: string;
  /** Null when the system acts. */
  readonly personId: string | null;
  /** Dotted verb: `member.changed`. */
  readonly action: string;
  /** `person:<id>`, `revision:<id>`. */
  readonly object: string;
  readonly detail?: Record<string, unknown>;
}

interface AuditPage {
  readonly items: AuditItem[];
  readonly next: string | null;
  readonly chainIntact: boolean;
}

/** Rows verified per query, so that a long chain is never in memory as a whole. */
const VERIFY_STEP = 2000;

export class AuditService {
  private readonly rows = new AuditRepository();

  constructor(
    private readonly ground: Pick<Ground, 'transactions' | 'now'>,
    private readonly namesOfPeople: NamesOfPeople,
  ) {}

  /** Appends one row, in the transaction of the change it tells of. Call it last: it holds the team's chain until commit. */
  async record(transaction: Transaction, entry: AuditEntry): Promise<void> {
    await this.rows.lockChain(transaction, entry.teamId);
    const last = await this.rows.last(transaction, entry.teamId);
    const row: ChainedRow = {
      teamId: entry.teamId,
      sequence: (last?.sequence ?? 0) + 1,
      at: this.ground.now(),
      personId: entry.personId,
      action: entry.action,
      object: entry.object,
      // The database gives back what JSON can say, so that is what the hash must cover.
      detail: JSON.parse(JSON.stringify(entry.detail ?? {})) as Record<string, unknown>,
      previousHash: last?.hash ?? CHAIN_START,
    };
    await this.rows.append(transaction, { ...row, hash: hashOfRow(row) });
  }

  /** Newest first; `after` is the sequence number that ended the page before. */
  async page(teamId: string, after: string | undefined, limit: number): Promise<AuditPage> {
    if (after !== undefined && !/^\d{1,9}$/.test(after)) {
      throw new InvalidInput([{ pointer: 'after', detail: 'is not the "next" of a page of this list' }]);
    }
    return this.ground.transactions.run(async (transaction) => {
      const before = after === undefined ? null : Number(after);
      const rows = await this.rows.before(transaction, teamId, before, limit + 1);
      const shown = rows.slice(0, limit);
      const ids = shown.flatMap((row) => (row.personId === null ? [] : [row.personId]));
      const names = await this.namesOfPeople(transaction, [...new Set(ids)]);
      const last = shown.at(-1);
      return {
        items: shown.map((row) => auditItem(row, names)),
        next: rows.length > limit && last !== undefined ? String(last.sequence) : null,
        chainIntact: (await this.firstBroken(transaction, teamId)) === null,
      };
    }, 'REPEATABLE READ');
  }

  /** The sequence number at which a team's chain breaks, or null. */
  async verify(teamId: string): Promise<number | null> {
    return this.ground.transactions.run((transaction) => this.firstBroken(transaction, teamId), 'REPEATABLE READ');
  }

  private async firstBroken(transaction: Transaction, teamId: string): Promise<number | null> {
    let end = chainStart;
    for (;;) {
      const rows = await this.rows.following(transaction, teamId, end.sequence, VERIFY_STEP);
      const followed = followChain(end, rows);
      if ('brokenAt' in followed) return followed.brokenAt;
      if (rows.length < VERIFY_STEP) return null;
      end = followed;
    }
  }
}

function auditItem(row: AuditRow, names: ReadonlyMap<string, string>): AuditItem {
  const name = row.personId === null ? undefined : names.get(row.personId);
  return {
    sequence: row.sequence,
    at: row.at.toISOString(),
    person: row.personId === null ? null : { id: row.personId, name: name ?? 'unknown' },
    action: row.action,
    object: row.object,
    detail: row.detail,
    hash: row.hash,
  };
}
