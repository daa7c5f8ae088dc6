import { readConfig } from '../config';
import { migrateDatabase } from './migrate-database';

migrateAll().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
});

async function migrateAll(): Promise<void> {
  await migrateDatabase(readConfig(process.env).databaseUrl);
}
