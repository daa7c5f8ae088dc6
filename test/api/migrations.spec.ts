import { Client } from 'pg';
import { createDataSource } from '../../server/database/data-source';
import { MIGRATION_LOCK, migrateDatabase } from '../../server/database/migrate-database';
import { migrations } from '../../server/database/migrations';
import { isSchemaReady } from '../../server/database/schema-state';
import { createTestDatabase, type TestDatabase } from '../support/postgres';

jest.setTimeout(60_000);

describe('migrations of processes that start at once', () => {
  let database: TestDatabase;
  beforeEach(async () => {
    database = await createTestDatabase();
  });
  afterEach(() => database.drop());

  async function rows(statement: string): Promise<Record<string, unknown>[]> {
    const client = new Client({ connectionString: database.url });
    await client.connect();
    try {
      return (await client.query<Record<string, unknown>>(statement)).rows;
    } finally {
      await client.end();
    }
  }

  it('are done once, whoever of them comes first', async () => {
    await Promise.all([migrateDatabase(database.url), migrateDatabase(database.url), migrateDatabase(database.url)]);
    const done = await rows('SELECT name FROM migration ORDER BY id');
    expect(done.map(({ name }) => name)).toEqual(migrations.map((migration) => migration.name));
    const dataSource = createDataSource({ url: database.url, poolSize: 1, statementTimeoutMs: 5000 });
    await dataSource.initialize();
    expect(await isSchemaReady(dataSource)).toBe(true);
    await dataSource.destroy();
    expect(await rows(`SELECT 1 FROM pg_locks WHERE locktype = 'advisory'`)).toEqual([]);
  });

  it('wait for the one that holds the lock, and go on when it dies', async () => {
    const other = new Client({ connectionString: database.url });
    await other.connect();
    await other.query('SELECT pg_advisory_lock(hashtextextended($1, 0))', [MIGRATION_LOCK]);
    const waiting = migrateDatabase(database.url);
    while ((await rows(`SELECT 1 FROM pg_locks WHERE locktype = 'advisory' AND NOT granted`)).length === 0) await new Promise((resolve) => setTimeout(resolve, 50));
    expect(await rows(`SELECT to_regclass('migration')::text AS name`)).toEqual([{ name: null }]);
    await other.end();
    await waiting;
    expect(await rows('SELECT count(*)::int AS count FROM migration')).toEqual([{ count: migrations.length }]);
  });

  it('say what went wrong, and leave the lock to the next', async () => {
    await rows('CREATE TABLE person (something text)');
    await expect(migrateDatabase(database.url)).rejects.toThrow('relation "person" already exists');
    await rows('DROP TABLE person');
    await migrateDatabase(database.url);
    expect(await rows('SELECT count(*)::int AS count FROM migration')).toEqual([{ count: migrations.length }]);
  });
});
