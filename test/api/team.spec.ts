import { randomUUID } from 'node:crypto';
import { currentSession } from '../../shared/contracts/session';
import type { AuditRow, Invitation, Member } from '../../shared/contracts/team';
import { Api, STRANGER, TEST_PASSWORD } from '../support/api';
import type { Answer, ApiClient } from '../support/api-client';
import { expectInvalid, expectNotAllowed, expectNotFound, expectNotSignedIn, expectProblem, problemOf } from '../support/problems';

describe('team', () => {
  let api: Api;
  let admin: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    admin = await api.signedIn('admin');
  }, 60_000);
  afterAll(() => api.close());

  const idOf = async (email: string): Promise<string> => (await api.query<{ id: string }>('SELECT id FROM person WHERE email = $1', [email]))[0]?.id ?? '';
  const newestAudit = async (): Promise<AuditRow> => ((await admin.get('/api/audit?limit=1')).json as { items: AuditRow[] }).items[0] as AuditRow;
  const tokenIn = async (address: string): Promise<string> => /#([\w-]+)/.exec((await api.lettersTo(address))[0]?.text ?? '')?.[1] ?? '';

  it('shows its name and how many work in it, to any member', async () => {
    const client = await api.signedIn('range');
    expect((await client.get('/api/team')).json).toMatchObject({ name: 'Merrow Point', peopleCount: 6 });
    const { items } = (await client.get('/api/team/people')).json as { items: Member[] };
    expect(items.map(({ email }) => email)).not.toContain(STRANGER);
    expect(items).toHaveLength(6);
  });

  it('is renamed by an administrator, which the audit keeps with both names', async () => {
    expect((await admin.patch('/api/team', { name: '  Merrow  ' })).json).toMatchObject({ name: 'Merrow' });
    expect(await newestAudit()).toMatchObject({ action: 'team.renamed', detail: { before: 'Merrow Point', after: 'Merrow' }, person: { name: 'Administrator (demo)' } });
    expectInvalid(await admin.patch('/api/team', { name: '', id: randomUUID() }), [
      { pointer: '#/name', detail: 'must have at least 1 characters' },
      { pointer: '#/id', detail: 'is not a known field' },
    ]);
    await admin.patch('/api/team', { name: 'Merrow Point' });
  });

  it('changes roles, which act on the next request of that person', async () => {
    const person = await idOf('range@merrow.example');
    const client = await api.signedIn('range');
    expect((await client.get('/api/audit')).status).toBe(403);
    const answer = await admin.patch(`/api/team/people/${person}`, { roles: ['range', 'administrator'] });
    expect(answer.json).toMatchObject({ roles: ['range', 'administrator'], disabled: false });
    expect((await client.get('/api/audit')).status).toBe(200);
    await admin.patch(`/api/team/people/${person}`, { roles: ['range'] });
    expect((await client.get('/api/audit')).status).toBe(403);
    expect(await newestAudit()).toMatchObject({ action: 'member.changed', detail: { after: { roles: ['range'], disabled: false } } });
  });

  it('keeps one administrator, whether roles are dropped or the account disabled', async () => {
    const own = await idOf('admin@merrow.example');
    const refusal = problemOf('conflict', 409, 'A team needs one administrator who is not disabled.');
    expectProblem(await admin.patch(`/api/team/people/${own}`, { roles: ['designer'] }), refusal);
    expectProblem(await admin.patch(`/api/team/people/${own}`, { disabled: true }), refusal);
  });

  it('keeps one administrator when two drop each other at the same moment', async () => {
    const [own, other] = [await idOf('admin@merrow.example'), await idOf('lab@merrow.example')];
    await admin.patch(`/api/team/people/${other}`, { roles: ['lab', 'administrator'] });
    const second = await api.signedIn('lab');
    const answers = await Promise.all([admin.patch(`/api/team/people/${other}`, { roles: ['lab'] }), second.patch(`/api/team/people/${own}`, { roles: [] })]);
    const { items } = (await (await api.signedIn('range')).get('/api/team/people')).json as { items: Member[] };
    expect(items.filter(({ roles }) => roles.includes('administrator'))).toHaveLength(1);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    await api.query(`UPDATE membership SET roles = '{administrator}' WHERE person_id = $1`, [own]);
    await api.query(`UPDATE membership SET roles = '{lab}' WHERE person_id = $1`, [other]);
  });

  it('disabling a person ends their sessions and tokens at once, and enabling lets them sign in anew', async () => {
    const person = await idOf('fabricator@merrow.example');
    const [browser, script] = [await api.signedIn('fabricator'), await api.withToken('fabricator', ['read'])];
    expect((await admin.patch(`/api/team/people/${person}`, { disabled: true })).json).toMatchObject({ disabled: true });
    expectNotSignedIn(await browser.get('/api/team'));
    expectNotSignedIn(await browser.post('/api/session/refresh'), 'The session is over.');
    expectNotSignedIn(await script.get('/api/team'));
    const again = await api.anonymous().post('/api/session', { email: 'fabricator@merrow.example', password: TEST_PASSWORD });
    expectNotSignedIn(again, 'Address or password is wrong.');
    await admin.patch(`/api/team/people/${person}`, { disabled: false });
    expectNotSignedIn(await browser.get('/api/team'));
    expect((await (await api.signedIn('fabricator')).get('/api/team')).status).toBe(200);
  });

  it('names every fault of a change of rights, and knows no field but rights', async () => {
    const person = await idOf('lab@merrow.example');
    expectInvalid(await admin.patch(`/api/team/people/${person}`, { roles: ['owner'], disabled: 'no', email: 'x@y.example', teamId: person }), [
      { pointer: '#/roles/0', detail: 'must be one of designer, lab, reviewer, fabricator, range, administrator; got "owner"' },
      { pointer: '#/disabled', detail: 'must be true or false; got "no"' },
      { pointer: '#/email', detail: 'is not a known field' },
      { pointer: '#/teamId', detail: 'is not a known field' },
    ]);
  });

  it('does not know people of other teams', async () => {
    expectNotFound(await admin.patch(`/api/team/people/${await idOf(STRANGER)}`, { disabled: true }), 'person');
  });

  it('invites an address: the letter opens the welcome, and accepting makes the person and signs in', async () => {
    const made = await admin.post('/api/team/invitations', { email: 'Ada@new.example', roles: ['designer', 'lab'] });
    expect(made.status).toBe(201);
    expect(made.headers.get('location')).toBe(`/api/team/invitations/${(made.json as Invitation).id}`);
    const token = await tokenIn('ada@new.example');
    const guest = api.anonymous();
    expect((await guest.post('/api/invitations/lookup', { token })).json).toEqual({
      teamName: 'Merrow Point',
      email: 'ada@new.example',
      roles: ['designer', 'lab'],
      knownPerson: false,
    });
    expectInvalid(await guest.post('/api/invitations/acceptance', { token, password: 'four quiet river stones' }), [
      { pointer: '#/name', detail: 'is needed for a new account' },
    ]);
    const joined = await guest.post('/api/invitations/acceptance', { token, name: 'Ada', password: 'four quiet river stones' });
    expect(currentSession.parse(joined.json)).toMatchObject({ person: { name: 'Ada' }, team: { roles: ['designer', 'lab'] } });
    expect((await guest.get('/api/team')).status).toBe(200);
    expect(await newestAudit()).toMatchObject({ action: 'invitation.accepted', person: { name: 'Ada' } });
    expectNotFound(await api.anonymous().post('/api/invitations/acceptance', { token, name: 'Eve', password: 'four quiet river stones' }), 'invitation');
  });

  it('lets a known person join with the password they have', async () => {
    await admin.post('/api/team/invitations', { email: 'other@bench.example', roles: ['reviewer'] });
    const token = await tokenIn('other@bench.example');
    const guest = api.anonymous();
    expect((await guest.post('/api/invitations/lookup', { token })).json).toMatchObject({ knownPerson: true });
    expectNotSignedIn(await guest.post('/api/invitations/acceptance', { token, password: 'not the password' }), 'Address or password is wrong.');
    const joined = currentSession.parse((await guest.post('/api/invitations/acceptance', { token, password: TEST_PASSWORD })).json);
    expect(joined.teams.map(({ teamName }) => teamName)).toEqual(['Bench', 'Merrow Point']);
    expect(joined.team).toMatchObject({ teamName: 'Merrow Point', roles: ['reviewer'] });
  });

  it('refuses to invite someone twice, or someone who is there', async () => {
    await admin.post('/api/team/invitations', { email: 'twice@new.example', roles: ['lab'] });
    expectProblem(
      await admin.post('/api/team/invitations', { email: 'twice@new.example', roles: ['lab'] }),
      problemOf('conflict', 409, 'This address is invited already. Withdraw that invitation first.'),
    );
    expectProblem(
      await admin.post('/api/team/invitations', { email: 'lab@merrow.example', roles: ['lab'] }),
      problemOf('conflict', 409, 'This address belongs to someone in the team already.'),
    );
    expectInvalid(await admin.post('/api/team/invitations', { email: 'a@b.example', roles: ['owner'] }), [
      { pointer: '#/roles/0', detail: 'must be one of designer, lab, reviewer, fabricator, range, administrator; got "owner"' },
    ]);
  });

  it('invites once however many administrators invite one address at the same moment', async () => {
    const second = await api.signedIn('admin');
    const invite = (client: ApiClient): Promise<Answer> => client.post('/api/team/invitations', { email: 'racing@new.example', roles: ['lab'] });
    const answers = await Promise.all([invite(admin), invite(second), invite(admin), invite(second)]);
    const refused = answers.filter(({ status }) => status !== 201);
    expect(refused).toHaveLength(3);
    for (const answer of refused) expectProblem(answer, problemOf('conflict', 409, 'This address is invited already. Withdraw that invitation first.'));
    const { items } = (await admin.get('/api/team/invitations')).json as { items: Invitation[] };
    expect(items.filter(({ email }) => email === 'racing@new.example')).toHaveLength(1);
  });

  it('takes a second invitation of the same address for what it is', async () => {
    await admin.post('/api/team/invitations', { email: 'pair@new.example', roles: ['lab'] });
    const token = await tokenIn('pair@new.example');
    // Nobody can invite twice; a copy stands for a row that an older server may have left.
    await api.query(`INSERT INTO invitation SELECT gen_random_uuid(), team_id, email, roles, encode(sha256('the-other-token-of-the-pair'), 'hex'),
      invited_by, created_at, expires_at, accepted_at FROM invitation WHERE email = 'pair@new.example'`);
    const password = 'four quiet river stones';
    expect((await api.anonymous().post('/api/invitations/acceptance', { token, name: 'Pia', password })).status).toBe(200);
    expectProblem(
      await api.anonymous().post('/api/invitations/acceptance', { token: 'the-other-token-of-the-pair', password }),
      problemOf('conflict', 409, 'You are in this team already.'),
    );
  });

  it('withdraws an invitation, whose link then opens nothing', async () => {
    const made = (await admin.post('/api/team/invitations', { email: 'gone@new.example', roles: ['lab'] })).json as Invitation;
    const token = await tokenIn('gone@new.example');
    expectNotFound(await (await api.signedIn(STRANGER)).delete(`/api/team/invitations/${made.id}`), 'invitation');
    expect((await admin.delete(`/api/team/invitations/${made.id}`)).status).toBe(204);
    const { items } = (await admin.get('/api/team/invitations')).json as { items: Invitation[] };
    expect(items.map(({ email }) => email)).not.toContain('gone@new.example');
    expectNotFound(await api.anonymous().post('/api/invitations/lookup', { token }), 'invitation');
  });

  it('lets an invitation expire after seven days, and keeps only a hash of its token', async () => {
    await admin.post('/api/team/invitations', { email: 'late@new.example', roles: ['lab'] });
    const token = await tokenIn('late@new.example');
    const [row] = await api.query(`SELECT hash, (expires_at - created_at)::text AS life FROM invitation WHERE email = 'late@new.example'`);
    expect(row).toEqual({ hash: expect.stringMatching(/^[0-9a-f]{64}$/), life: '7 days' });
    expect(JSON.stringify(await api.query('SELECT * FROM invitation'))).not.toContain(token);
    await api.query(`UPDATE invitation SET expires_at = now() WHERE email = 'late@new.example'`);
    expectNotFound(await api.anonymous().post('/api/invitations/lookup', { token }), 'invitation');
    expectInvalid(await api.anonymous().post('/api/invitations/lookup', { token: 'short' }), [{ pointer: '#/token', detail: 'must have at least 20 characters' }]);
  });

  it('shows the letter box to administrators, with letters to their own team alone', async () => {
    const bench = await api.signedIn(STRANGER);
    await bench.post('/api/team/invitations', { email: 'bench-only@new.example', roles: ['lab'] });
    const lettersFor = async (client: ApiClient): Promise<string[]> =>
      ((await client.get('/api/development/letters')).json as { items: { to: string }[] }).items.map(({ to }) => to);
    expect(await lettersFor(bench)).toContain('bench-only@new.example');
    expect(await lettersFor(admin)).not.toContain('bench-only@new.example');
    expect(await lettersFor(admin)).toContain('twice@new.example');
    expectNotAllowed(await (await api.signedIn('designer')).get('/api/development/letters'), 'This needs the role administrator.');
  });
});
