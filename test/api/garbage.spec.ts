import fc from 'fast-check';
import { problem } from '../../shared/contracts/common';
import { Api, STRANGER } from '../support/api';
import type { Answer, ApiClient } from '../support/api-client';

const RUNS_PER_ROUTE = 25;
const NOBODY = 'b3f1c9a0-0000-4000-8000-000000000000';

/** Values people and programs send by mistake or on purpose. */
const nasty = fc.oneof(
  fc.jsonValue(),
  fc.constantFrom('', '\u0000', '\u202E', "'; DROP TABLE person; --", '../../x', 'x'.repeat(10_000), '💥', NOBODY),
  fc.constantFrom(-0, 1e308, -1e308, 2 ** 53, 0.1),
);

/** A body that may look right: names of the schema with nasty values, and others. */
const bodyLike = (names: readonly string[]) => fc.oneof(nasty, fc.dictionary(fc.constantFrom('more', ...names), nasty, { maxKeys: names.length + 1 }));

function namesOf(schema: unknown): string[] {
  const shape = (schema as { shape?: Record<string, unknown> } | undefined)?.shape;
  return shape === undefined ? [] : Object.keys(shape);
}

describe('garbage', () => {
  let api: Api;
  let client: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    client = await api.signedIn(STRANGER);
  }, 60_000);
  afterAll(() => api.close());

  /** Nothing a caller sends is a fault of the server's, and every refusal says why in the one form. */
  function expectAnswered(answer: Answer, what: string): void {
    if (answer.status >= 500) throw new Error(`${what} answered ${answer.status}: ${answer.bytes.toString('utf8')}`);
    if (answer.status < 400) return;
    expect(answer.headers.get('content-type')).toBe('application/problem+json; charset=utf-8');
    expect(problem.parse(answer.json).status).toBe(answer.status);
    expect(answer.bytes.toString('utf8')).not.toMatch(/\bat .+\.(ts|js):\d+|QueryFailed|SELECT |INSERT |node_modules/);
  }

  it('in a body is refused in words, whatever it is', async () => {
    const taking = api.routes.filter(({ body, upload, path }) => body !== undefined && upload === undefined && !path.startsWith('/api/session'));
    expect(taking.length).toBeGreaterThan(8);
    for (const { method, path, body } of taking) {
      const address = path.replace(/:\w+/g, NOBODY);
      await fc.assert(
        fc.asyncProperty(bodyLike(namesOf(body)), async (value) => {
          const raw = { type: 'application/json', content: JSON.stringify(value) ?? 'null' };
          expectAnswered(await client.send(method.toUpperCase(), address, { raw, ifMatch: '"v1"' }), `${method} ${path} ${raw.content.slice(0, 200)}`);
        }),
        { numRuns: RUNS_PER_ROUTE, seed: 20_270_101 },
      );
    }
  }, 120_000);

  it('in a path or a query is refused in words, whatever it is', async () => {
    const reading = api.routes.filter(({ method, path }) => method === 'get' && path !== '/api/openapi.json');
    for (const { path, query } of reading) {
      await fc.assert(
        fc.asyncProperty(fc.string({ maxLength: 40 }), fc.dictionary(fc.constantFrom('more', ...namesOf(query)), fc.string({ maxLength: 40 }), { maxKeys: 3 }), async (id, parameters) => {
          const address = `${path.replace(/:\w+/g, encodeURIComponent(id.replace(/^\.+$/, 'dots')) || 'x')}?${new URLSearchParams(parameters).toString()}`;
          expectAnswered(await client.get(address), `get ${address}`);
        }),
        { numRuns: RUNS_PER_ROUTE, seed: 20_270_102 },
      );
    }
  }, 120_000);

  it('in place of JSON is refused in words', async () => {
    for (const content of ['', '{', '[1,', 'nul', '"\\ud800"', '{"a":1}{"b":2}', '\ufeff{}', '{"a":'.repeat(50_000)]) {
      expectAnswered(await client.send('PATCH', '/api/team', { raw: { type: 'application/json', content } }), content.slice(0, 40));
    }
    const invalidUtf8 = Buffer.from([0x7b, 0x22, 0xff, 0xfe, 0x22, 0x3a, 0x31, 0x7d]);
    expectAnswered(await client.send('PATCH', '/api/team', { raw: { type: 'application/json', content: invalidUtf8 } }), 'invalid UTF-8');
    expectAnswered(await client.send('PATCH', '/api/team', { raw: { type: 'application/json; charset=klingon', content: '{}' } }), 'unknown charset');
    const broken = await client.send('PATCH', '/api/team', { raw: { type: 'application/json', content: 'not gzip' }, headers: { 'content-encoding': 'gzip' } });
    expectAnswered(broken, 'broken gzip');
  });
});
