import { randomUUID } from 'node:crypto';
import { Column, Entity, PrimaryColumn, type DataSource } from 'typeorm';
import { createDataSource } from '../../server/database/data-source';
import { TeamScopedRepository } from '../../server/database/team-scoped-repository';
import { afterCommit, managerOf, TransactionRunner, type Transaction } from '../../server/database/transaction-runner';
import { createTestDatabase, type TestDatabase } from '../support/postgres';

@Entity({ name: 'thing' })
class Thing {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('text')
  name!: string;
}

class ThingRepository extends TeamScopedRepository<Thing> {
  constructor() {
    super(Thing, 'thing');
  }

  async names(transaction: Transaction, teamId: string): Promise<string[]> {
    const rows = await this.rows(transaction, teamId, 'row').orderBy('row.name').getMany();
    return rows.map(({ name }) => name);
  }
}

describe('transactions', () => {
  let database: TestDatabase;
  let dataSource: DataSource;
  let runner: TransactionRunner;
  const things = new ThingRepository();
  const [ours, theirs] = [randomUUID(), randomUUID()];

  beforeAll(async () => {
    database = await createTestDatabase();
    dataSource = createDataSource({ url: database.url, poolSize: 4, statementTimeoutMs: 5000 });
    dataSource.setOptions({ entities: [Thing] });
    await dataSource.initialize();
    await dataSource.query('CREATE TABLE thing (id uuid PRIMARY KEY, team_id uuid NOT NULL, name text NOT NULL)');
  }, 60_000);
  beforeEach(async () => {
    runner = new TransactionRunner(dataSource);
    await dataSource.query('TRUNCATE thing');
  });
  afterAll(async () => {
    await dataSource.destroy();
    await database.drop();
  });

  const add = (teamId: string, name: string, id = randomUUID()): Promise<Thing> => runner.run((transaction) => things.insert(transaction, teamId, { id, name }));
  const namesOf = (teamId: string): Promise<string[]> => runner.read((transaction) => things.names(transaction, teamId));

  it('keep all of the work or nothing', async () => {
    const work = runner.run(async (transaction) => {
      await things.insert(transaction, ours, { id: randomUUID(), name: 'first' });
      throw new Error('stop');
    });
    await expect(work).rejects.toThrow('stop');
    expect(await namesOf(ours)).toEqual([]);
  });

  it('run what waits for the commit after it, and never after a rollback', async () => {
    const seen: string[][] = [];
    const look = (): void => void namesOf(ours).then((names) => seen.push(names));
    await runner.run(async (transaction) => {
      afterCommit(transaction, look);
      await things.insert(transaction, ours, { id: randomUUID(), name: 'kept' });
    });
    await expect(
      runner.run(async (transaction) => {
        afterCommit(transaction, look);
        throw new Error('stop');
      }),
    ).rejects.toThrow('stop');
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(seen).toEqual([['kept']]);
  });

  it('run again after a deadlock, until both are through', async () => {
    const [a, b] = [(await add(ours, 'a')).id, (await add(ours, 'b')).id];
    let attempts = 0;
    const lockBoth = (first: string, second: string): Promise<void> =>
      runner.run(async (transaction) => {
        attempts += 1;
        await things.requireLocked(transaction, ours, first);
        await new Promise((resolve) => setTimeout(resolve, 100));
        await things.update(transaction, ours, second, { name: 'done' });
      });
    await Promise.all([lockBoth(a, b), lockBoth(b, a)]);
    expect(attempts).toBe(3);
    expect(await namesOf(ours)).toEqual(['done', 'done']);
  });

  it('run again when serialisation fails', async () => {
    await add(ours, 'one');
    const addAfterCounting = (): Promise<unknown> =>
      runner.run(async (transaction) => {
        const count = (await things.names(transaction, ours)).length;
        await new Promise((resolve) => setTimeout(resolve, 50));
        return things.insert(transaction, ours, { id: randomUUID(), name: `after ${count}` });
      }, 'SERIALIZABLE');
    await Promise.all([addAfterCounting(), addAfterCounting()]);
    expect(await namesOf(ours)).toEqual(['after 1', 'after 2', 'one']);
  });

  it('refuse to be used once they are over', async () => {
    let escaped: Transaction | null = null;
    await runner.run(async (transaction) => {
      escaped = transaction;
    });
    expect(() => managerOf(escaped as unknown as Transaction)).toThrow('This transaction is over');
  });

  describe('rows of a team', () => {
    it('are there for the team alone, by id and in lists', async () => {
      const { id } = await add(theirs, 'theirs');
      await add(ours, 'ours');
      await runner.run(async (transaction) => {
        expect(await things.find(transaction, ours, id)).toBeNull();
        await expect(things.require(transaction, ours, id)).rejects.toMatchObject({ kind: 'not-found', message: 'There is no such thing.' });
        await expect(things.requireLocked(transaction, ours, id)).rejects.toMatchObject({ kind: 'not-found' });
        expect(await things.require(transaction, theirs, id)).toMatchObject({ name: 'theirs' });
      });
      expect([await namesOf(ours), await namesOf(theirs)]).toEqual([['ours'], ['theirs']]);
    });

    it('are changed and removed by the team alone', async () => {
      const { id } = await add(theirs, 'theirs');
      await expect(runner.run((transaction) => things.update(transaction, ours, id, { name: 'taken' }))).rejects.toMatchObject({ kind: 'not-found' });
      await expect(runner.run((transaction) => things.remove(transaction, ours, id))).rejects.toMatchObject({ kind: 'not-found' });
      expect(await namesOf(theirs)).toEqual(['theirs']);
      await runner.run((transaction) => things.remove(transaction, theirs, id));
      expect(await namesOf(theirs)).toEqual([]);
    });

    it('belong to the team that inserts them, whatever the values say', async () => {
      const values = { id: randomUUID(), name: 'smuggled', teamId: theirs };
      await runner.run((transaction) => things.insert(transaction, ours, values));
      expect([await namesOf(ours), await namesOf(theirs)]).toEqual([['smuggled'], []]);
    });
  });
});
