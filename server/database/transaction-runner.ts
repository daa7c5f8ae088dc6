import type { DataSource, EntityManager } from 'typeorm';

declare const opaque: unique symbol;

/**
 * What repositories need to take part in a transaction. Services pass it on and can do nothing else with it; only
 * repositories turn it into an entity manager.
 */
export interface Transaction {
  readonly [opaque]: true;
}

interface Running {
  readonly manager: EntityManager;
  readonly afterCommit: (() => void)[];
}

const running = new WeakMap<Transaction, Running>();

function stateOf(transaction: Transaction): Running {
  const state = running.get(transaction);
  if (state === undefined) throw new Error('This transaction is over: await everything inside it.');
  return state;
}

/** For repositories only. */
export const managerOf = (transaction: Transaction): EntityManager => stateOf(transaction).manager;

/** Runs `work` once the transaction is committed and never when it is rolled back. */
export const afterCommit = (transaction: Transaction, work: () => void): void => {
  stateOf(transaction).afterCommit.push(work);
};

/** Serialisation failure and deadlock: PostgreSQL asks to run the transaction again. */
const retryable = new Set(['40001', '40P01']);
const MAX_ATTEMPTS = 4;

function sqlStateOf(error: unknown): string | null {
  return typeof error === 'object' && error !== null && 'code' in error && typeof error.code === 'string' ? error.code : null;
}

export type Isolation = 'READ COMMITTED' | 'REPEATABLE READ' | 'SERIALIZABLE';

export class TransactionRunner {
  constructor(private readonly dataSource: DataSource) {}

  /**
   * All of `work` or nothing of it. May call `work` again after a deadlock, so it must touch nothing but the database;
   * side effects go through the outbox or `afterCommit`.
   */
  async run<T>(work: (transaction: Transaction) => Promise<T>, isolation: Isolation = 'READ COMMITTED'): Promise<T> {
    for (let attempt = 1; ; attempt += 1) {
      try {
        return await this.attempt(work, isolation);
      } catch (error) {
        if (attempt >= MAX_ATTEMPTS || !retryable.has(sqlStateOf(error) ?? '')) throw error;
      }
    }
  }

  /**
   * Reads without a transaction around them: each query sees what is committed at its moment. For single reads on the
   * path of every request; whatever decides or writes uses `run`.
   */
  async read<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
    const transaction = Object.freeze({}) as Transaction;
    running.set(transaction, { manager: this.dataSource.manager, afterCommit: [] });
    try {
      return await work(transaction);
    } finally {
      running.delete(transaction);
    }
  }

  private async attempt<T>(work: (transaction: Transaction) => Promise<T>, isolation: Isolation): Promise<T> {
    const transaction = Object.freeze({}) as Transaction;
    const waiting: (() => void)[] = [];
    try {
      const result = await this.dataSource.transaction(isolation, async (manager) => {
        running.set(transaction, { manager, afterCommit: waiting });
        return work(transaction);
      });
      running.delete(transaction);
      for (const next of waiting) next();
      return result;
    } finally {
      running.delete(transaction);
    }
  }
}
