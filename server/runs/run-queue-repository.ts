import PgBoss from 'pg-boss';
import { managerOf, type Transaction, type TransactionRunner } from '../database/transaction-runner';

/** A message of the queue: compute this chunk, or put the parts of the run together. */
export type RunMessage =
  | { readonly step: 'chunk'; readonly teamId: string; readonly runId: string; readonly number: number }
  | { readonly step: 'merge'; readonly teamId: string; readonly runId: string };

export interface RunJob {
  readonly id: string;
  readonly data: RunMessage;
  /** After so long the message goes to another. */
  readonly expireInSeconds: number;
}

export interface SendOptions {
  /** Higher ones are taken first. */
  readonly priority: number;
  /** Whoever takes it and stays silent for so long has lost it. */
  readonly expireSeconds: number;
}

const QUEUE = 'run-chunk';
const DEAD_QUEUE = 'run-chunk-dead';
/** Taken four times in all: a chunk that ends four workers would end a fifth. */
const RETRY_LIMIT = 3;

type Database = PgBoss.Db;

/** The queue between servers and workers, in the same database: pg-boss on our own connections and transactions. */
export class RunQueueRepository {
  private readonly boss: PgBoss;

  constructor(
    private readonly transactions: TransactionRunner,
    private readonly options: { readonly maintenanceSeconds: number; readonly onError: (error: Error) => void },
  ) {
    this.boss = this.newBoss();
  }

  /**
   * Begins to look after messages whose takers fell silent, until the returned function is called. For workers; a server
   * only sends. Each time with an instance of its own: one that was stopped never looks again.
   */
  async supervise(): Promise<() => Promise<void>> {
    const keeper = this.newBoss();
    await keeper.start();
    return () => keeper.stop({ graceful: false, close: false });
  }

  /** Sent once the transaction is committed, and never if it is not. */
  async send(transaction: Transaction, message: RunMessage, { priority, expireSeconds }: SendOptions): Promise<void> {
    await this.boss.send(QUEUE, message, { db: inTransaction(transaction), priority, expireInSeconds: expireSeconds, retryLimit: RETRY_LIMIT, retryDelay: 0 });
  }

  /** The next message, taken; null when there is none. */
  async take(): Promise<RunJob | null> {
    const [job] = await this.boss.fetch<RunMessage>(QUEUE, { batchSize: 1 });
    return job ?? null;
  }

  /** The next message that nobody could bring to an end; null when there is none. */
  async takeDead(): Promise<RunJob | null> {
    const [job] = await this.boss.fetch<RunMessage>(DEAD_QUEUE, { batchSize: 1 });
    return job ?? null;
  }

  /** Done with a message, as of the commit. */
  async complete(transaction: Transaction, { id }: RunJob): Promise<void> {
    await this.boss.complete(QUEUE, id, {}, { db: inTransaction(transaction) });
  }

  async completeDead(transaction: Transaction, { id }: RunJob): Promise<void> {
    await this.boss.complete(DEAD_QUEUE, id, {}, { db: inTransaction(transaction) });
  }

  /** Gives a message back, for another to take at once. */
  async giveBack({ id }: RunJob, reason: string): Promise<void> {
    await this.transactions.run((transaction) => this.boss.fail(QUEUE, id, { reason }, { db: inTransaction(transaction) }));
  }

  private newBoss(): PgBoss {
    const { maintenanceSeconds, onError } = this.options;
    const db: Database = { executeSql: (text, values) => this.transactions.read((transaction) => execute(transaction, text, values)) };
    const boss = new PgBoss({ db, migrate: false, schedule: false, supervise: true, maintenanceIntervalSeconds: maintenanceSeconds, archiveCompletedAfterSeconds: 3600, deleteAfterDays: 2 });
    boss.on('error', onError);
    return boss;
  }
}

const inTransaction = (transaction: Transaction): Database => ({ executeSql: (text, values) => execute(transaction, text, values) });

async function execute(transaction: Transaction, text: string, values: unknown[]): Promise<{ rows: Record<string, unknown>[] }> {
  const manager = managerOf(transaction);
  if (manager.queryRunner !== undefined) return { rows: (await manager.queryRunner.query(text, values, true)).records as Record<string, unknown>[] };
  const runner = manager.dataSource.createQueryRunner();
  try {
    return { rows: ((await runner.query(text, values, true)).records ?? []) as Record<string, unknown>[] };
  } finally {
    await runner.release();
  }
}
