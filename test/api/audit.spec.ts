import type { AuditRow } from '../../shared/contracts/team';
import { Api, STRANGER } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { expectInvalid, expectNotAllowed } from '../support/problems';

interface Page {
  readonly items: AuditRow[];
  readonly next: string | null;
  readonly chainIntact: boolean;
}

describe('audit', () => {
  let api: Api;
  let admin: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    admin = await api.signedIn('admin');
  }, 60_000);
  afterAll(() => api.close());

  const page = async (query = ''): Promise<Page> => (await admin.get(`/api/audit${query}`)).json as Page;

  it('tells every change once, newest first, with who, what and a hash', async () => {
    await admin.patch('/api/team', { name: 'Merrow Point' });
    const { items, chainIntact } = await page();
    expect(chainIntact).toBe(true);
    expect(items.map(({ sequence }) => sequence)).toEqual(items.map((_row, index) => items.length - index));
    expect(items[0]).toMatchObject({ action: 'team.renamed', person: { name: 'Administrator (demo)' }, hash: expect.stringMatching(/^[0-9a-f]{64}$/) });
    expect(items.at(-1)).toMatchObject({ sequence: 1, action: 'demo.account.created', person: null });
  });

  it('goes through all rows in pages that neither skip nor repeat while rows are added', async () => {
    const seen: number[] = [];
    let next: string | null = '';
    while (next !== null) {
      const part: Page = await page(`?limit=2${next === '' ? '' : `&after=${next}`}`);
      seen.push(...part.items.map(({ sequence }) => sequence));
      next = part.next;
      await admin.patch('/api/team', { name: `Merrow Point ${seen.length}` });
    }
    expect(seen).toEqual(seen.map((_sequence, index) => (seen[0] ?? 0) - index));
    expect(seen.at(-1)).toBe(1);
    expectInvalid(await admin.get('/api/audit?after=x&limit=2'), [{ pointer: 'after', detail: 'is not the "next" of a page of this list' }]);
    expectInvalid(await admin.get('/api/audit?limit=201'), [{ pointer: 'limit', detail: 'must be at most 200; got 201' }]);
  });

  it('is for administrators, each for the own team', async () => {
    expectNotAllowed(await (await api.signedIn('designer')).get('/api/audit'), 'This needs the role administrator.');
    const other = (await (await api.signedIn(STRANGER)).get('/api/audit')).json as Page;
    expect(JSON.stringify(other)).not.toContain('merrow.example');
    expect(other.chainIntact).toBe(true);
  });

  it('writes nothing when the change it tells of does not happen', async () => {
    const before = (await page()).items.length;
    const [own] = await api.query<{ id: string }>(`SELECT id FROM person WHERE email = 'admin@merrow.example'`);
    expect((await admin.patch(`/api/team/people/${own?.id}`, { roles: [] })).status).toBe(409);
    expect((await page('?limit=200')).items.length).toBe((await page('?limit=200')).items[0]?.sequence);
    expect((await page()).items.length).toBe(before);
  });

  it('keeps its numbers without gaps when many write at once', async () => {
    const from = (await page()).items[0]?.sequence ?? 0;
    await Promise.all(Array.from({ length: 12 }, (_unused, count) => admin.patch('/api/team', { name: `Name ${count}` })));
    const { items, chainIntact } = await page('?limit=200');
    expect(items[0]?.sequence).toBe(from + 12);
    expect(chainIntact).toBe(true);
  });

  it.each(['UPDATE audit_row SET action = action', 'DELETE FROM audit_row', 'TRUNCATE audit_row'])('the database itself refuses %s', async (statement) => {
    await expect(api.query(statement)).rejects.toThrow('rows of audit_row are never changed or removed');
  });

  it.each([
    ['a changed detail', `UPDATE audit_row SET detail = '{"after":"else"}' WHERE sequence = 8`, 8],
    ['another time', `UPDATE audit_row SET at = at + interval '1 millisecond' WHERE sequence = 3`, 3],
    ['a removed row', `DELETE FROM audit_row WHERE sequence = 5`, 5],
  ])('notices %s that someone forced past the triggers', async (_what, statement, brokenAt) => {
    const [team] = await api.query<{ team_id: string }>(`SELECT DISTINCT team_id FROM audit_row WHERE action = 'team.renamed'`);
    const teamId = team?.team_id ?? '';
    expect(await api.house.audit.verify(teamId)).toBeNull();
    await api.query('ALTER TABLE audit_row DISABLE TRIGGER ALL');
    await api.query('CREATE TABLE kept AS SELECT * FROM audit_row');
    try {
      await api.query(`${statement} AND team_id = '${teamId}'`);
      expect(await api.house.audit.verify(teamId)).toBe(brokenAt);
      expect((await page()).chainIntact).toBe(false);
    } finally {
      await api.query('DELETE FROM audit_row');
      await api.query('INSERT INTO audit_row SELECT * FROM kept');
      await api.query('DROP TABLE kept');
      await api.query('ALTER TABLE audit_row ENABLE TRIGGER ALL');
    }
    expect((await page()).chainIntact).toBe(true);
  });
});
