import { Api, TEST_PASSWORD } from '../support/api';
import type { Answer } from '../support/api-client';
import { expectNotSignedIn, expectProblem, problemOf } from '../support/problems';

const attempt = (api: Api, email: string, password: string): Promise<Answer> => api.anonymous().post('/api/session', { email, password });

describe('guessing passwords', () => {
  describe('by account', () => {
    let api: Api;
    beforeAll(async () => {
      api = await Api.start();
    }, 60_000);
    afterAll(() => api.close());

    it.each(['lab@merrow.example', 'nobody@merrow.example'])('makes %s wait after ten failures, even with the right password', async (email) => {
      for (let count = 0; count < 10; count += 1) expectNotSignedIn(await attempt(api, email, `guess ${count}`), 'Address or password is wrong.');
      const refused = await attempt(api, email, TEST_PASSWORD);
      expectProblem(refused, problemOf('too-many', 429, expect.stringMatching(/^Too many attempts for this address\. Try again in [12] s\.$/) as unknown as string));
      expect(Number(refused.headers.get('retry-after'))).toBeLessThanOrEqual(2);
    });

    it('lets the right password in once the wait is over, and forgets the failures', async () => {
      await api.query(`UPDATE sign_in_attempt SET next_at = now()`);
      expect((await attempt(api, 'lab@merrow.example', TEST_PASSWORD)).status).toBe(200);
      expectNotSignedIn(await attempt(api, 'lab@merrow.example', 'guess'), 'Address or password is wrong.');
    });

    it('counts guesses that come all at once', async () => {
      const answers = await Promise.all(Array.from({ length: 30 }, (_unused, count) => attempt(api, 'range@merrow.example', `guess ${count}`)));
      expect(answers.filter(({ status }) => status === 401)).toHaveLength(10);
      expect(answers.filter(({ status }) => status === 429)).toHaveLength(20);
    });

    it('keeps no list of the addresses that were tried', async () => {
      expect(JSON.stringify(await api.query('SELECT * FROM sign_in_attempt'))).not.toContain('merrow');
    });

    it('opens again with a letter, so that a stranger locks nobody out', async () => {
      for (let count = 0; count < 10; count += 1) await attempt(api, 'designer@merrow.example', `guess ${count}`);
      expect((await attempt(api, 'designer@merrow.example', TEST_PASSWORD)).status).toBe(429);
      await api.anonymous().post('/api/password-resets', { email: 'designer@merrow.example' });
      const token = /#([\w-]+)/.exec((await api.lettersTo('designer@merrow.example'))[0]?.text ?? '')?.[1];
      const newPassword = 'nine copper kettles sing';
      expect((await api.anonymous().post('/api/password-resets/completion', { token, newPassword })).status).toBe(204);
      expect((await attempt(api, 'designer@merrow.example', newPassword)).status).toBe(200);
    });
  });

  describe('by address of the sender', () => {
    let api: Api;
    const one = { windowSeconds: 60, count: 1000 };
    const few = { windowSeconds: 60, count: 5, failuresOnly: true } as const;
    beforeAll(async () => {
      api = await Api.start({ rateLimits: { general: one, 'sign-in': few, letter: { windowSeconds: 60, count: 2 }, upload: one, compute: one, export: one } });
    }, 60_000);
    afterAll(() => api.close());

    it('counts failures over all accounts and not the successes', async () => {
      for (let count = 0; count < 8; count += 1) expect((await attempt(api, 'lab@merrow.example', TEST_PASSWORD)).status).toBe(200);
      for (let count = 0; count < 5; count += 1) expect((await attempt(api, `nobody${count}@merrow.example`, 'guess')).status).toBe(401);
      const refused = await attempt(api, 'designer@merrow.example', TEST_PASSWORD);
      expectProblem(refused, problemOf('too-many', 429, 'Too many requests. Try again in 60 s.'));
      expect(refused.headers.get('retry-after')).toBe('60');
    });

    it('limits how many letters one sender can cause', async () => {
      const ask = () => api.anonymous().post('/api/password-resets', { email: 'lab@merrow.example' });
      expect([(await ask()).status, (await ask()).status, (await ask()).status]).toEqual([202, 202, 429]);
    });
  });

  describe('by the clock', () => {
    let api: Api;
    beforeAll(async () => {
      api = await Api.start({ realHashing: true });
    }, 60_000);
    afterAll(() => api.close());

    it('takes as long for an unknown address as for a wrong password', async () => {
      const seconds: Record<'known' | 'unknown', number[]> = { known: [], unknown: [] };
      await attempt(api, 'warm-up@merrow.example', 'guess');
      // Alternating, and the fastest of each: other work on the machine only ever adds time.
      for (let count = 0; count < 9; count += 1) {
        for (const kind of ['known', 'unknown'] as const) {
          const started = performance.now();
          await attempt(api, kind === 'known' ? 'lab@merrow.example' : 'nobody@merrow.example', 'guess');
          seconds[kind].push((performance.now() - started) / 1000);
        }
      }
      const ratio = Math.min(...seconds.unknown) / Math.min(...seconds.known);
      expect(Math.min(...seconds.known)).toBeGreaterThan(0.1);
      // A busy machine moves it by a tenth; an address answered without the work of a hash would bring it below 0.1.
      expect(ratio).toBeGreaterThan(0.7);
      expect(ratio).toBeLessThan(1.4);
    }, 60_000);
  });
});
