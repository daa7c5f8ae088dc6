import { entities } from '../../server/database/entities';
import { migrations } from '../../server/database/migrations';
import { Api } from '../support/api';
import { expectProblem, problemOf } from '../support/problems';

/** Foreign keys and checks stand in the migrations alone; the entities do not repeat them. */
const isConstraintOfMigration = (statement: string, known: ReadonlySet<string>): boolean => {
  const name = /^ALTER TABLE "\w+" DROP CONSTRAINT "(\w+)"$/.exec(statement)?.[1];
  return name !== undefined && known.has(name);
};

describe('schema', () => {
  let api: Api;
  beforeAll(async () => {
    api = await Api.start();
  }, 60_000);
  afterAll(() => api.close());

  it('entities equal what the migrations make: columns, types, keys, indexes', async () => {
    const rows = await api.query<{ conname: string }>(`SELECT conname FROM pg_constraint WHERE contype IN ('f', 'c')`);
    const { upQueries } = await api.dataSource.driver.createSchemaBuilder().log();
    const known = new Set(rows.map(({ conname }) => conname));
    expect(upQueries.map(({ query }) => query).filter((query) => !isConstraintOfMigration(query, known))).toEqual([]);
    expect(api.dataSource.entityMetadatas).toHaveLength(entities.length);
  });

  it('sees a column that only the database has', async () => {
    await api.query('ALTER TABLE team ADD COLUMN extra text');
    const { upQueries } = await api.dataSource.driver.createSchemaBuilder().log();
    expect(upQueries.map(({ query }) => query)).toContain('ALTER TABLE "team" DROP COLUMN "extra"');
    await api.query('ALTER TABLE team DROP COLUMN extra');
  });

  it('migrations are listed oldest first, and go down to nothing and up again', async () => {
    const times = migrations.map(({ name }) => Number(name.slice(-13)));
    expect(times).toEqual([...times].sort((left, right) => left - right));
    for (const _migration of migrations) await api.dataSource.undoLastMigration();
    const left = await api.query<{ tablename: string }>(`SELECT tablename FROM pg_tables WHERE schemaname = 'public'`);
    expect(left.map(({ tablename }) => tablename)).toEqual(['migration']);
    expectProblem(await api.anonymous().get('/api/ready'), problemOf('unavailable', 503, 'The database is not ready.'));
    expect((await api.anonymous().get('/api/health')).status).toBe(200);
    await api.dataSource.runMigrations();
    expect((await api.anonymous().get('/api/ready')).json).toEqual({ status: 'ok' });
  });

  it('holds time zones, time limits and no superfluous wait', async () => {
    const [row] = await api.query(`SELECT current_setting('TimeZone') AS zone, current_setting('statement_timeout') AS statement,
      current_setting('idle_in_transaction_session_timeout') AS idle, current_setting('lock_timeout') AS lock`);
    expect(row).toEqual({ zone: 'UTC', statement: '15s', idle: '30s', lock: '10s' });
    const columns = await api.query(`SELECT table_name, column_name FROM information_schema.columns
      WHERE table_schema = 'public' AND data_type = 'timestamp without time zone'`);
    expect(columns).toEqual([]);
  });
});
