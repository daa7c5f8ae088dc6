import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { entities } from './entities';
import { migrations } from './migrations';

export interface DatabaseOptions {
  readonly url: string;
  readonly poolSize: number;
  readonly statementTimeoutMs: number;
}

/** Limits of a process that answers requests. */
export const apiDatabaseLimits = { poolSize: 12, statementTimeoutMs: 15_000 } as const;

/** A request waits this long for a free connection, then answers 503 instead of hanging. */
const POOL_WAIT_MS = 2000;
const IDLE_TRANSACTION_MS = 30_000;
const LOCK_WAIT_MS = 10_000;

/** The schema comes from the migrations alone: nothing here ever alters it. */
export function createDataSource({ url, poolSize, statementTimeoutMs }: DatabaseOptions): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    entities: [...entities],
    migrations: [...migrations],
    migrationsTableName: 'migration',
    // Each migration is whole or not at all.
    migrationsTransactionMode: 'each',
    synchronize: false,
    logging: false,
    uuidExtension: 'pgcrypto',
    // UUIDs are made by the application; PostgreSQL 15 needs no extension for ours.
    installExtensions: false,
    poolSize,
    connectTimeoutMS: POOL_WAIT_MS,
    applicationName: 'slantwise',
    extra: {
      statement_timeout: statementTimeoutMs,
      idle_in_transaction_session_timeout: IDLE_TRANSACTION_MS,
      lock_timeout: LOCK_WAIT_MS,
      options: '-c TimeZone=UTC',
    },
  });
}
