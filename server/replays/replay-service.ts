import type { Ground } from '../database/ground';
import type { Claim, KeptAnswer, ReplayKey, ReplayStore } from '../http/idempotency';
import { ReplayRepository } from './replay-repository';

const DAY_MS = 24 * 3600 * 1000;
/** A request that has run this long belongs to a process that died: uploads may take ten minutes. */
const ABANDONED_AFTER_MS = 15 * 60 * 1000;

/** Answers by Idempotency-Key, kept in the database so that every process knows them. */
export class ReplayService implements ReplayStore {
  private readonly rows = new ReplayRepository();

  constructor(private readonly ground: Pick<Ground, 'transactions' | 'now'>) {}

  async claim({ personId, key }: ReplayKey, requestHash: string): Promise<Claim> {
    const { transactions, now } = this.ground;
    return transactions.run(async (transaction): Promise<Claim> => {
      const row = { personId, key, requestHash, createdAt: now(), answer: null };
      if (await this.rows.insertNew(transaction, row)) return { kind: 'mine' };
      const known = await this.rows.findLocked(transaction, personId, key);
      if (known === null) return { kind: 'running' };
      if (known.requestHash !== requestHash) return { kind: 'different' };
      if (known.answer !== null) return { kind: 'done', answer: known.answer as KeptAnswer };
      if (now().getTime() - known.createdAt.getTime() < ABANDONED_AFTER_MS) return { kind: 'running' };
      await this.rows.change(transaction, { personId, key, createdAt: now() });
      return { kind: 'mine' };
    });
  }

  async complete({ personId, key }: ReplayKey, answer: KeptAnswer): Promise<void> {
    await this.ground.transactions.run((transaction) => this.rows.change(transaction, { personId, key, answer: { ...answer } }));
  }

  async abandon({ personId, key }: ReplayKey): Promise<void> {
    await this.ground.transactions.run((transaction) => this.rows.removeRunning(transaction, personId, key));
  }

  async sweep(): Promise<void> {
    const before = new Date(this.ground.now().getTime() - 2 * DAY_MS);
    await this.ground.transactions.run((transaction) => this.rows.sweep(transaction, before));
  }
}
