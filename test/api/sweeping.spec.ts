import { randomUUID } from 'node:crypto';
import { ensureDemoAccounts } from '../../server/accounts/demo-account-service';
import { PasswordHasher } from '../../server/accounts/password-hash';
import { Api, TEST_PASSWORD } from '../support/api';

describe('what runs beside requests', () => {
  let api: Api;
  beforeAll(async () => {
    api = await Api.start();
  }, 60_000);
  afterAll(() => api.close());

  const count = async (table: string): Promise<number> => Number((await api.query<{ count: string }>(`SELECT count(*) FROM ${table}`))[0]?.count);

  it('forgets sessions a week after their end, with their refresh tokens, and keeps the others', async () => {
    const [old, recent] = [await api.signedIn('lab'), await api.signedIn('lab')];
    const { sessionId } = (await old.get('/api/session')).json as { sessionId: string };
    await api.query(`UPDATE session SET created_at = now() - interval '9 days', ends_at = now() - interval '8 days' WHERE id = $1`, [sessionId]);
    const before = [await count('session'), await count('refresh_token')];
    await api.house.sessions.sweep();
    expect([await count('session'), await count('refresh_token')]).toEqual(before.map((number) => number - 1));
    expect((await recent.get('/api/session')).status).toBe(200);
  });

  it('keeps answers by Idempotency-Key for at least a day, and forgets them after two', async () => {
    const [person] = await api.query<{ id: string }>('SELECT id FROM person LIMIT 1');
    const key = (name: string) => ({ personId: person?.id ?? '', key: name });
    const answer = { status: 201, etag: null, location: null, body: { made: 1 } };
    for (const name of ['key-of-yesterday', 'key-of-last-week']) {
      expect(await api.house.replays.claim(key(name), 'hash')).toEqual({ kind: 'mine' });
      await api.house.replays.complete(key(name), answer);
    }
    await api.query(`UPDATE replay SET created_at = now() - interval '25 hours' WHERE key = 'key-of-yesterday'`);
    await api.query(`UPDATE replay SET created_at = now() - interval '7 days' WHERE key = 'key-of-last-week'`);
    await api.house.replays.sweep();
    expect(await api.house.replays.claim(key('key-of-yesterday'), 'hash')).toEqual({ kind: 'done', answer });
    expect(await api.house.replays.claim(key('key-of-last-week'), 'hash')).toEqual({ kind: 'mine' });
  });

  it('takes over a key whose process died, after a quarter of an hour', async () => {
    const [person] = await api.query<{ id: string }>('SELECT id FROM person LIMIT 1');
    const key = { personId: person?.id ?? '', key: `key-${randomUUID()}` };
    expect(await api.house.replays.claim(key, 'hash')).toEqual({ kind: 'mine' });
    expect(await api.house.replays.claim(key, 'hash')).toEqual({ kind: 'running' });
    expect(await api.house.replays.claim(key, 'another hash')).toEqual({ kind: 'different' });
    await api.query(`UPDATE replay SET created_at = now() - interval '16 minutes' WHERE key = $1`, [key.key]);
    expect(await api.house.replays.claim(key, 'hash')).toEqual({ kind: 'mine' });
    await api.house.replays.abandon(key);
    expect(await api.house.replays.claim(key, 'another hash')).toEqual({ kind: 'mine' });
  });

  it('makes the demonstration accounts once: one role each, and a second team', async () => {
    const before = await api.query('SELECT id, password_hash FROM person ORDER BY id');
    await ensureDemoAccounts(api.house, TEST_PASSWORD);
    expect(await api.query('SELECT id, password_hash FROM person ORDER BY id')).toEqual(before);
    const rows = await api.query<{ who: string }>(`SELECT team.name || ' ' || person.email || ' ' || array_to_string(roles, '+') AS who
      FROM membership JOIN team ON team.id = team_id JOIN person ON person.id = person_id WHERE person.name LIKE '%(demo)' ORDER BY 1`);
    expect(rows.map(({ who }) => who)).toEqual([
      'Bench admin@bench.example administrator',
      'Bench other@bench.example designer',
      'Merrow Point admin@merrow.example administrator',
      'Merrow Point designer@merrow.example designer',
      'Merrow Point fabricator@merrow.example fabricator',
      'Merrow Point lab@merrow.example lab',
      'Merrow Point range@merrow.example range',
      'Merrow Point reviewer@merrow.example reviewer',
    ]);
  });

  it('renews a password hash of an older cost at the next sign-in', async () => {
    const hashOf = async (): Promise<string> => (await api.query<{ hash: string }>(`SELECT password_hash AS hash FROM person WHERE email = 'range@merrow.example'`))[0]?.hash ?? '';
    const present = (await hashOf()).split('$')[2];
    const old = await new PasswordHasher({ logN: 6, r: 8, p: 1 }).hash(TEST_PASSWORD);
    await api.query(`UPDATE person SET password_hash = $1 WHERE email = 'range@merrow.example'`, [old]);
    await api.signedIn('range');
    expect((await hashOf()).split('$')[2]).toBe(present);
    await api.signedIn('range');
  });
});
