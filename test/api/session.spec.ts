import { currentSession } from '../../shared/contracts/session';
import { Api, STRANGER, TEST_PASSWORD } from '../support/api';
import { expectInvalid, expectNotAllowed, expectNotFound, expectNotSignedIn } from '../support/problems';

describe('sessions', () => {
  let api: Api;
  beforeAll(async () => {
    api = await Api.start();
  }, 60_000);
  afterAll(() => api.close());

  it('sign-in answers who, where and until when, and sets three strict cookies', async () => {
    const answer = await api.anonymous().post('/api/session', { email: ' Designer@Merrow.example ', password: TEST_PASSWORD });
    expect(answer.status).toBe(200);
    const session = currentSession.parse(answer.json);
    expect(session.person).toMatchObject({ name: 'Designer (demo)', email: 'designer@merrow.example' });
    expect(session.team).toMatchObject({ teamName: 'Merrow Point', roles: ['designer'] });
    expect(Date.parse(session.endsAt) - Date.now()).toBeGreaterThan(11.9 * 3_600_000);
    expect(Date.parse(session.idleEndsAt) - Date.now()).toBeLessThanOrEqual(1_800_000);
    const cookies = answer.headers.getSetCookie();
    expect(cookies.map((cookie) => cookie.replace(/=[^;]*/, '').replace(/Max-Age=\d+|Expires=[^;]+; /g, ''))).toEqual([
      'slantwise-access; ; Path=/; HttpOnly; SameSite=Strict',
      'slantwise-refresh; ; Path=/api/session; HttpOnly; SameSite=Strict',
      'XSRF-TOKEN; ; Path=/; SameSite=Strict',
    ]);
    expect(answer.headers.get('cache-control')).toBe('no-store');
  });

  it('names every fault of a sign-in at once', async () => {
    const answer = await api.anonymous().post('/api/session', { email: 'nobody', remember: true });
    expectInvalid(answer, [
      { pointer: '#/email', detail: 'must be an e-mail address' },
      { pointer: '#/password', detail: 'is missing' },
      { pointer: '#/remember', detail: 'is not a known field' },
    ]);
  });

  it('gives a wrong password and an unknown address the same answer', async () => {
    const wrong = await api.anonymous().post('/api/session', { email: 'lab@merrow.example', password: 'wrong' });
    const unknown = await api.anonymous().post('/api/session', { email: 'nobody@merrow.example', password: 'wrong' });
    expectNotSignedIn(wrong, 'Address or password is wrong.');
    expectNotSignedIn(unknown, 'Address or password is wrong.');
    expect([...wrong.headers.keys()]).toEqual([...unknown.headers.keys()]);
  });

  it('shows the present session, and 401 without one', async () => {
    const client = await api.signedIn('designer');
    expect((await client.get('/api/session')).status).toBe(200);
    expectNotSignedIn(await api.anonymous().get('/api/session'));
  });

  it('gets a new id at every sign-in and ends the one the browser had', async () => {
    const client = await api.signedIn('designer');
    const before = client.cookie('slantwise-access') ?? '';
    await client.post('/api/session', { email: 'designer@merrow.example', password: TEST_PASSWORD });
    const old = api.anonymous();
    old.cookies.set('slantwise-access', { value: before, path: '/' });
    expectNotSignedIn(await old.get('/api/session'));
    expect((await client.get('/api/session')).status).toBe(200);
  });

  it('ends on the server when signed out: the old cookie is worth nothing', async () => {
    const client = await api.signedIn('designer');
    const kept = new Map(client.cookies);
    const answer = await client.delete('/api/session');
    expect(answer.status).toBe(204);
    expect(client.cookies.size).toBe(0);
    kept.forEach((cookie, name) => client.cookies.set(name, cookie));
    expectNotSignedIn(await client.get('/api/session'));
    expectNotSignedIn(await client.post('/api/session/refresh'), 'The session is over.');
  });

  it('signs out by the refresh cookie alone when the access token has run out', async () => {
    const client = await api.signedIn('designer');
    const access = client.cookies.get('slantwise-access');
    client.cookies.delete('slantwise-access');
    expect((await client.delete('/api/session')).status).toBe(204);
    if (access !== undefined) client.cookies.set('slantwise-access', access);
    expectNotSignedIn(await client.get('/api/session'));
  });

  it('rotates the refresh token and ends the session when one is used twice', async () => {
    const client = await api.signedIn('designer');
    const stolen = new Map(client.cookies);
    expect((await client.post('/api/session/refresh')).status).toBe(200);
    expect(client.cookie('slantwise-refresh')).not.toBe(stolen.get('slantwise-refresh')?.value);
    const thief = api.anonymous();
    stolen.forEach((cookie, name) => thief.cookies.set(name, cookie));
    expectNotSignedIn(await thief.post('/api/session/refresh'), 'The session is over.');
    expectNotSignedIn(await client.get('/api/session'));
    expectNotSignedIn(await client.post('/api/session/refresh'), 'The session is over.');
  });

  it('refuses a refresh with the forgery token of another session', async () => {
    const client = await api.signedIn('designer');
    const other = await api.signedIn('designer');
    const cookie = other.cookies.get('XSRF-TOKEN');
    if (cookie !== undefined) client.cookies.set('XSRF-TOKEN', cookie);
    expectNotAllowed(await client.post('/api/session/refresh'), 'The X-XSRF-TOKEN header does not belong to this session.');
    client.cookies.delete('slantwise-access');
    expectNotAllowed(await client.post('/api/session/refresh'), 'The X-XSRF-TOKEN header does not belong to this session.');
  });

  it.each([
    ['30 minutes without a request', "last_used_at = now() - interval '30 minutes 1 second'"],
    ['12 hours in any case', "created_at = now() - interval '12 hours', ends_at = now() - interval '1 second'"],
  ])('ends after %s, whatever the cookies say', async (_when, change) => {
    const client = await api.signedIn('reviewer');
    const { sessionId } = (await client.get('/api/session')).json as { sessionId: string };
    await api.query(`UPDATE session SET ${change} WHERE id = $1`, [sessionId]);
    expectNotSignedIn(await client.get('/api/session'));
    expectNotSignedIn(await client.post('/api/session/refresh'), 'The session is over.');
  });

  it('lists own sessions and revokes one, not those of others', async () => {
    const [here, there, stranger] = [await api.signedIn('range'), await api.signedIn('range'), await api.signedIn(STRANGER)];
    const { items } = (await here.get('/api/sessions')).json as { items: { id: string; current: boolean }[] };
    expect(items.map(({ current }) => current).sort()).toEqual([false, true]);
    const target = items.find(({ current }) => !current)?.id ?? '';
    expectNotFound(await stranger.delete(`/api/sessions/${target}`), 'session');
    expectInvalid(await here.delete('/api/sessions/first'), [{ pointer: 'id', detail: 'must be an id' }]);
    expect((await here.delete(`/api/sessions/${target}`)).status).toBe(204);
    expectNotSignedIn(await there.get('/api/session'));
    expectNotFound(await here.delete(`/api/sessions/${target}`), 'session');
  });

  it('ends all own sessions but this one', async () => {
    const [here, there] = [await api.signedIn('fabricator'), await api.signedIn('fabricator')];
    expect((await here.delete('/api/sessions')).status).toBe(204);
    expectNotSignedIn(await there.get('/api/session'));
    expect((await here.get('/api/session')).status).toBe(200);
  });

  it('changes to another of the own teams with a new session id and the same absolute end', async () => {
    await api.query(`INSERT INTO membership (team_id, person_id, roles, joined_at)
      SELECT team.id, person.id, '{designer}', now() FROM team, person WHERE team.name = 'Bench' AND person.email = 'lab@merrow.example'`);
    const client = await api.signedIn('lab');
    const before = currentSession.parse((await client.get('/api/session')).json);
    const bench = before.teams.find(({ teamName }) => teamName === 'Bench');
    const after = currentSession.parse((await client.put('/api/session/team', { teamId: bench?.teamId })).json);
    expect(after.team).toEqual(bench);
    expect(after.sessionId).not.toBe(before.sessionId);
    expect(after.endsAt).toBe(before.endsAt);
    expect(currentSession.parse((await client.get('/api/session')).json).team.teamName).toBe('Bench');
    expectInvalid(await client.put('/api/session/team', { teamId: 7 }), [{ pointer: '#/teamId', detail: 'must be text; got 7' }]);
  });

  it('does not enter a team the person is not in', async () => {
    const client = await api.signedIn('reviewer');
    const [team] = await api.query<{ id: string }>(`SELECT id FROM team WHERE name = 'Bench'`);
    expectNotFound(await client.put('/api/session/team', { teamId: team?.id }), 'team');
  });
});
