import type { QueryRunner } from 'typeorm';
import { createDataSource } from './data-source';

/** Migrations may take longer than any request, and so may waiting for those of another process. */
const MIGRATION_TIMEOUT_MS = 10 * 60 * 1000;
/** One connection holds the lock while the other migrates. */
const CONNECTIONS = 2;
/** Names the lock among the advisory locks of the database. */
export const MIGRATION_LOCK = 'slantwise:migrations';

/**
 * Brings the schema of a database up to date. Processes that start at once take turns: whoever comes second finds nothing left
 * to do. The lock belongs to a connection, so a process that dies in between leaves none behind.
 */
export async function migrateDatabase(url: string): Promise<void> {
  const dataSource = createDataSource({ url, poolSize: CONNECTIONS, statementTimeoutMs: MIGRATION_TIMEOUT_MS });
  await dataSource.initialize();
  const holder = dataSource.createQueryRunner();
  try {
    await lock(holder);
    await dataSource.runMigrations();
  } finally {
    // Closing the connections lets go of the lock.
    await dataSource.destroy();
  }
}

async function lock(holder: QueryRunner): Promise<void> {
  // The usual patience with locks is that of a request.
  await holder.query(`SET lock_timeout = ${MIGRATION_TIMEOUT_MS}`);
  await holder.query('SELECT pg_advisory_lock(hashtextextended($1, 0))', [MIGRATION_LOCK]);
}
