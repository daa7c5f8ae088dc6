import { about } from '../../shared/contracts/session';
import { version } from '../../server/version';
import { Api } from '../support/api';
import { expectProblem, problemOf } from '../support/problems';
import packageJson from '../../package.json';

describe('health', () => {
  let api: Api;
  beforeAll(async () => {
    api = await Api.start();
  }, 60_000);
  afterAll(() => api.close());

  it('tells the sign-in page what it needs, demo accounts included', async () => {
    const answer = about.parse((await api.anonymous().get('/api/about')).json);
    expect(answer).toMatchObject({ name: 'Slantwise', version: packageJson.version, demoMode: true, letterBox: true });
    expect(answer.demoAccounts.map(({ email, role }) => `${role} ${email.split('@')[0]}`).sort()).toEqual(
      ['administrator admin', 'designer designer', 'fabricator fabricator', 'lab lab', 'range range', 'reviewer reviewer'],
    );
    expect(version).toBe(packageJson.version);
  });

  it('describes every route, and only those, in OpenAPI 3.1', async () => {
    const document = (await api.anonymous().get('/api/openapi.json')).json as { openapi: string; paths: Record<string, Record<string, Record<string, unknown>>> };
    expect(document.openapi).toMatch(/^3\.1\./);
    const described = Object.entries(document.paths).flatMap(([path, operations]) => Object.keys(operations).map((method) => `${method} ${path}`));
    expect(described.sort()).toEqual(api.routes.map(({ method, path }) => `${method} ${path.replace(/:(\w+)/g, '{$1}')}`).sort());
    const ids = Object.values(document.paths).flatMap((operations) => Object.values(operations).map(({ operationId }) => operationId));
    expect(new Set(ids).size).toBe(ids.length);
    const patch = document.paths['/api/team']?.['patch'];
    expect(patch?.['security']).toEqual([{ session: [] }, { personalToken: ['team'] }]);
    expect(Object.keys(patch?.['responses'] ?? {})).toEqual(['200', '401', '403', '413', '415', '422', '429']);
  });

  it('says not ready from the moment it is asked to stop', async () => {
    api.house.drain();
    expectProblem(await api.anonymous().get('/api/ready'), problemOf('unavailable', 503, 'The database is not ready.'));
  });

  it('answers 503 within two seconds and a half when every connection is taken', async () => {
    const runners = Array.from({ length: 12 }, () => api.dataSource.createQueryRunner());
    try {
      await Promise.all(runners.map((runner) => runner.connect()));
      const started = performance.now();
      const answer = await api.anonymous().post('/api/invitations/lookup', { token: 'x'.repeat(40) });
      expectProblem(answer, problemOf('unavailable', 503, 'Too much is going on at the moment.'));
      expect(performance.now() - started).toBeLessThan(2500);
      expect(answer.headers.get('retry-after')).toBe('2');
    } finally {
      await Promise.all(runners.map((runner) => runner.release()));
    }
  });
});
