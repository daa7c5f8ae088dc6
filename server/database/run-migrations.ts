import { readConfig } from '../config';
import { createDataSource } from './data-source';

/** Migrations may take longer than any request. */
const MIGRATION_TIMEOUT_MS = 10 * 60 * 1000;

async function run(): Promise<void> {
  const { databaseUrl } = readConfig(process.env);
  const dataSource = createDataSource({ url: databaseUrl, poolSize: 1, statementTimeoutMs: MIGRATION_TIMEOUT_MS });
  await dataSource.initialize();
  try {
    await dataSource.runMigrations();
  } finally {
    await dataSource.destroy();
  }
}

run().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
});
