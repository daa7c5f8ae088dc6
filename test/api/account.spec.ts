import type { PersonalToken, TokenCreated } from '../../shared/contracts/session';
import { Api, STRANGER, TEST_PASSWORD } from '../support/api';
import { ApiClient } from '../support/api-client';
import { expectInvalid, expectNotAllowed, expectNotFound, expectNotSignedIn } from '../support/problems';

const NEW_PASSWORD = 'seven grey herons wade slowly';

describe('own account', () => {
  let api: Api;
  beforeAll(async () => {
    api = await Api.start();
  }, 60_000);
  afterAll(() => api.close());

  const signInStatus = async (email: string, password: string): Promise<number> => (await api.anonymous().post('/api/session', { email, password })).status;
  const resetToken = async (email: string): Promise<string> => /new-password#([\w-]+)/.exec((await api.lettersTo(email))[0]?.text ?? '')?.[1] ?? '';

  it('changes the own name', async () => {
    const client = await api.signedIn('range');
    expect((await client.put('/api/account', { name: 'Ravi' })).json).toMatchObject({ person: { name: 'Ravi' } });
    expectInvalid(await client.put('/api/account', { name: ' ', email: 'x@y.example' }), [
      { pointer: '#/name', detail: 'must have at least 1 characters' },
      { pointer: '#/email', detail: 'is not a known field' },
    ]);
  });

  it('changes the password knowing the present one, ends other sessions on wish, and tells by letter', async () => {
    const [here, there] = [await api.signedIn('lab'), await api.signedIn('lab')];
    const change = { currentPassword: TEST_PASSWORD, newPassword: NEW_PASSWORD, endOtherSessions: true };
    expectInvalid(await here.put('/api/account/password', { ...change, currentPassword: 'wrong' }), [
      { pointer: '#/currentPassword', detail: 'is not your present password' },
    ]);
    expect((await here.put('/api/account/password', change)).status).toBe(204);
    expect((await here.get('/api/session')).status).toBe(200);
    expectNotSignedIn(await there.get('/api/session'));
    expect(await signInStatus('lab@merrow.example', TEST_PASSWORD)).toBe(401);
    expect(await signInStatus('lab@merrow.example', NEW_PASSWORD)).toBe(200);
    expect((await api.lettersTo('lab@merrow.example'))[0]).toMatchObject({ subject: 'Your Slantwise password was changed' });
  });

  it('says why a new password cannot be taken', async () => {
    const client = await api.signedIn('reviewer');
    const change = (newPassword: string) => client.put('/api/account/password', { currentPassword: TEST_PASSWORD, newPassword, endOtherSessions: false });
    expectInvalid(await change('too short'), [{ pointer: '#/newPassword', detail: 'must have at least 15 characters' }]);
    expectInvalid(await change('merrowpointslantwise'), [
      {
        pointer: '#/newPassword',
        detail: 'is made of passwords, names or key sequences that are tried first; add words that have nothing to do with you or this product',
      },
    ]);
  });

  it('takes every character of a long password into account', async () => {
    const client = await api.signedIn('fabricator');
    const long = `${'Kühle Wellen tragen 🌊 Boote weit hinaus; '.repeat(3)}und zurück`;
    const change = { currentPassword: TEST_PASSWORD, newPassword: long, endOtherSessions: false };
    expect((await client.put('/api/account/password', change)).status).toBe(204);
    expect(await signInStatus('fabricator@merrow.example', long.slice(0, -1))).toBe(401);
    expect(await signInStatus('fabricator@merrow.example', long)).toBe(200);
  });

  it('answers a reset request alike for known and unknown addresses, and writes to the known one alone', async () => {
    const known = await api.anonymous().post('/api/password-resets', { email: 'designer@merrow.example' });
    const unknown = await api.anonymous().post('/api/password-resets', { email: 'nobody@merrow.example' });
    expect([known.status, unknown.status]).toEqual([202, 202]);
    expect(known.bytes).toEqual(unknown.bytes);
    expect([...known.headers.keys()]).toEqual([...unknown.headers.keys()]);
    expect(await api.lettersTo('nobody@merrow.example')).toEqual([]);
    expect(await resetToken('designer@merrow.example')).toMatch(/^[\w-]{43}$/);
    expectInvalid(await api.anonymous().post('/api/password-resets', { email: 'no address' }), [{ pointer: '#/email', detail: 'must be an e-mail address' }]);
  });

  it('resets a password once with the token of the letter, and ends every session', async () => {
    const before = await api.signedIn('designer');
    await api.anonymous().post('/api/password-resets', { email: 'designer@merrow.example' });
    const token = await resetToken('designer@merrow.example');
    expect(JSON.stringify(await api.query('SELECT * FROM password_reset'))).not.toContain(token);
    const complete = (newPassword: string) => api.anonymous().post('/api/password-resets/completion', { token, newPassword });
    expectInvalid(await complete('aaaaaaaaaaaaaaaaaaa'), [{ pointer: '#/newPassword', detail: 'uses fewer than five different characters' }]);
    expect((await complete(NEW_PASSWORD)).status).toBe(204);
    expectNotSignedIn(await before.get('/api/session'));
    expect(await signInStatus('designer@merrow.example', NEW_PASSWORD)).toBe(200);
    const used = [{ pointer: '#/token', detail: 'This link is used, too old, or not complete. Ask for a new one.' }];
    expectInvalid(await complete(`${NEW_PASSWORD} again`), used);
    const back = await api.house.hasher.hash(TEST_PASSWORD);
    await api.query(`UPDATE person SET password_hash = $1 WHERE email = 'designer@merrow.example'`, [back]);
  });

  it('does not take a reset token after 60 minutes', async () => {
    await api.anonymous().post('/api/password-resets', { email: 'admin@merrow.example' });
    const token = await resetToken('admin@merrow.example');
    const [row] = await api.query(`SELECT (expires_at - created_at)::text AS life FROM password_reset ORDER BY created_at DESC LIMIT 1`);
    expect(row).toEqual({ life: '01:00:00' });
    await api.query(`UPDATE password_reset SET expires_at = now()`);
    expectInvalid(await api.anonymous().post('/api/password-resets/completion', { token, newPassword: NEW_PASSWORD }), [
      { pointer: '#/token', detail: 'This link is used, too old, or not complete. Ask for a new one.' },
    ]);
  });

  it('writes no more than three reset letters an hour to one address', async () => {
    for (let count = 0; count < 6; count += 1) await api.anonymous().post('/api/password-resets', { email: STRANGER });
    expect(await api.lettersTo(STRANGER)).toHaveLength(3);
  });

  it('makes a personal token, shows its secret once and keeps a hash', async () => {
    const client = await api.signedIn('designer');
    const made = await client.post('/api/tokens', { name: 'Night run', scopes: ['read', 'predict'], days: 30 });
    expect(made.status).toBe(201);
    const { secret, ...card } = made.json as TokenCreated;
    expect(secret).toMatch(/^slw_[\w-]{43}$/);
    expect((await new ApiClient(api.url, secret).get('/api/team')).status).toBe(200);
    const { items } = (await client.get('/api/tokens')).json as { items: PersonalToken[] };
    expect(items[0]).toEqual({ ...card, lastUsedAt: expect.any(String) });
    expect(JSON.stringify(await api.query('SELECT * FROM personal_token'))).not.toContain(secret);
  });

  it('gives a token no scope that the roles of its owner do not allow', async () => {
    const client = await api.signedIn('designer');
    expectInvalid(await client.post('/api/tokens', { name: 'Too much', scopes: ['read', 'team', 'library'], days: 400 }), [
      { pointer: '#/days', detail: 'must be at most 366; got 400' },
    ]);
    expectInvalid(await client.post('/api/tokens', { name: 'Too much', scopes: ['read', 'team', 'library'], days: 4 }), [
      { pointer: '#/scopes/1', detail: '"team" needs another role than yours' },
      { pointer: '#/scopes/2', detail: '"library" needs another role than yours' },
    ]);
  });

  it('refuses a token that is revoked, expired or made up', async () => {
    const client = await api.signedIn('designer');
    const make = async (): Promise<TokenCreated> => (await client.post('/api/tokens', { name: 'x', scopes: ['read'], days: 1 })).json as TokenCreated;
    const [revoked, expired] = [await make(), await make()];
    expectNotFound(await (await api.signedIn(STRANGER)).delete(`/api/tokens/${revoked.id}`), 'token');
    expect((await client.delete(`/api/tokens/${revoked.id}`)).status).toBe(204);
    expectNotFound(await client.delete(`/api/tokens/${revoked.id}`), 'token');
    await api.query(`UPDATE personal_token SET expires_at = now() WHERE id = $1`, [expired.id]);
    for (const secret of [revoked.secret, expired.secret, 'slw_made-up', 'something']) {
      expectNotSignedIn(await new ApiClient(api.url, secret).get('/api/team'));
    }
  });

  it('does not let a token do what needs a person: tokens, passwords, sessions', async () => {
    const script = await api.withToken('designer', ['read', 'predict', 'design']);
    const words = 'A personal token cannot do this; sign in with your password.';
    expectNotAllowed(await script.post('/api/tokens', { name: 'more', scopes: ['read'], days: 1 }), words);
    expectNotAllowed(await script.put('/api/account/password', {}), words);
    expectNotAllowed(await script.get('/api/sessions'), words);
  });
});
