import { request } from 'node:http';
import { Readable } from 'node:stream';
import { sign } from 'jsonwebtoken';
import * as z from 'zod';
import { BytesReply, Reply } from '../../server/http/reply';
import { Conflict, Unavailable } from '../../server/http/problems';
import { contentTag, refuseStale, versionTag } from '../../server/http/etag';
import { defineRoute, type Route } from '../../server/http/route';
import { Api, TEST_SECRET } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { expectInvalid, expectNotAllowed, expectNotSignedIn, expectProblem, problemOf } from '../support/problems';

const member = { kind: 'signed-in', scope: 'read' } as const;
const note = z.strictObject({ text: z.string(), more: z.unknown().optional() });

/** Routes that do nothing but show what the frame does around a handler. */
let made = 0;
let goneAfterMs: number | null = null;
const probes: readonly Route[] = [
  defineRoute({
    method: 'post',
    path: '/api/probe/things',
    summary: 'Makes a thing',
    policy: member,
    body: note,
    reply: z.strictObject({ number: z.number() }),
    status: 201,
    idempotent: true,
    handler: async ({ body }) => {
      if (body.text === 'refused') throw new Conflict('Not this one.');
      await new Promise((resolve) => setTimeout(resolve, body.text === 'slow' ? 300 : 0));
      made += 1;
      return new Reply({ number: made }, { location: `/api/probe/things/${made}`, etag: versionTag(made) });
    },
  }),
  defineRoute({ method: 'post', path: '/api/probe/notes', summary: 'Echo', policy: member, body: note, reply: note, status: 201, handler: ({ body }) => body }),
  defineRoute({
    method: 'put',
    path: '/api/probe/versioned',
    summary: 'Versioned',
    policy: member,
    body: note,
    reply: note,
    versioned: true,
    handler: ({ body, ifMatch }) => {
      refuseStale(ifMatch, versionTag(7), { text: 'stored' });
      return new Reply(body, { etag: versionTag(8) });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/probe/search/:id',
    summary: 'Parameters',
    policy: member,
    params: z.strictObject({ id: z.uuid() }),
    query: z.strictObject({ limit: z.coerce.number().int().max(5).optional() }),
    reply: z.strictObject({ limit: z.number() }),
    handler: ({ query }) => ({ limit: query.limit ?? 0 }),
  }),
  defineRoute({
    method: 'get',
    path: '/api/probe/file',
    summary: 'Download',
    policy: member,
    bytes: ['text/csv'],
    handler: () => new BytesReply(Readable.from(['a,b\n', '1,2\n']), 'text/csv', { fileName: 'Über "x".csv' }),
  }),
  defineRoute({
    method: 'post',
    path: '/api/probe/upload',
    summary: 'Upload',
    policy: member,
    upload: { maxFileBytes: 100, maxFiles: 2 },
    body: z.strictObject({ label: z.string() }),
    reply: z.strictObject({ names: z.array(z.string()), tag: z.string(), label: z.string() }),
    handler: ({ files, body }) => ({ names: files.map(({ originalName }) => originalName), tag: contentTag(files[0]?.bytes ?? ''), label: body.label }),
  }),
  defineRoute({
    method: 'get',
    path: '/api/probe/events',
    summary: 'Events',
    policy: member,
    bytes: ['text/event-stream'],
    handler: ({ signal }) => {
      const started = Date.now();
      signal.addEventListener('abort', () => (goneAfterMs = Date.now() - started));
      const events = new Readable({ read: () => undefined });
      events.push('data: first\n\n');
      return new BytesReply(events, 'text/event-stream');
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/probe/breaking-off',
    summary: 'Breaks off',
    policy: member,
    bytes: ['text/csv'],
    handler: () => new BytesReply(Readable.from((async function* () {
      yield 'a,b\n';
      await new Promise((resolve) => setTimeout(resolve, 50));
      throw new Error('the source failed');
    })()), 'text/csv'),
  }),
  defineRoute({ method: 'get', path: '/api/probe/broken', summary: 'Breaks', policy: member, handler: () => Promise.reject(new Error('SELECT secret FROM /etc')) }),
  defineRoute({ method: 'get', path: '/api/probe/conflict', summary: 'Conflict', policy: member, handler: () => Promise.reject(new Conflict('Already released.')) }),
  defineRoute({ method: 'get', path: '/api/probe/away', summary: 'Away', policy: member, handler: () => Promise.reject(new Unavailable('Not now.', 9)) }),
];

describe('the frame around every route', () => {
  let api: Api;
  let client: ApiClient;
  let script: ApiClient;
  beforeAll(async () => {
    api = await Api.start({ moreRoutes: probes });
    client = await api.signedIn('designer');
    script = await api.withToken('designer', ['read']);
  }, 60_000);
  afterAll(() => api.close());

  const json = (content: string) => ({ raw: { type: 'application/json', content } });

  describe('forgery', () => {
    const words = 'The X-XSRF-TOKEN header does not belong to this session.';

    it('refuses a change without the token, and with that of another session', async () => {
      client.sendsForgeryToken = false;
      expectNotAllowed(await client.post('/api/probe/notes', { text: 'x' }), words);
      const other = (await api.signedIn('lab')).cookie('XSRF-TOKEN') ?? '';
      expectNotAllowed(await client.post('/api/probe/notes', { text: 'x' }, { headers: { 'x-xsrf-token': other } }), words);
      client.sendsForgeryToken = true;
      expect((await client.post('/api/probe/notes', { text: 'x' })).status).toBe(201);
    });

    it.each<Record<string, string>>([{ 'sec-fetch-site': 'cross-site' }, { 'sec-fetch-site': 'same-site' }, { 'sec-fetch-site': 'none' }, { origin: 'https://elsewhere.example' }, { origin: 'null' }])(
      'refuses a change from another site: %j',
      async (headers) => {
        expectNotAllowed(await client.post('/api/probe/notes', { text: 'x' }, { headers }), 'This request came from another site.');
        expectNotAllowed(await api.anonymous().post('/api/session', {}, { headers }), 'This request came from another site.');
      },
    );

    it('takes a change from our own pages', async () => {
      const own: Record<string, string>[] = [{ 'sec-fetch-site': 'same-origin' }, { origin: api.url }, { origin: api.config.publicUrl }];
      for (const headers of own) {
        expect((await client.post('/api/probe/notes', { text: 'x' }, { headers })).status).toBe(201);
      }
    });

    it('asks a personal token for neither: no browser sends one by itself', async () => {
      expect((await script.post('/api/probe/notes', { text: 'x' }, { headers: { origin: 'https://elsewhere.example' } })).status).toBe(201);
    });
  });

  describe('access tokens', () => {
    const claims = async (): Promise<Record<string, unknown>> => {
      const payload = client.cookie('slantwise-access')?.split('.')[1] ?? '';
      return JSON.parse(Buffer.from(payload, 'base64url').toString('utf8')) as Record<string, unknown>;
    };
    const statusWith = async (token: string): Promise<number> => {
      const probe = api.anonymous();
      probe.cookies.set('slantwise-access', { value: token, path: '/' });
      return (await probe.get('/api/team')).status;
    };
    const part = (value: unknown): string => Buffer.from(JSON.stringify(value)).toString('base64url');
    const secret = TEST_SECRET;

    it('takes its own algorithm, issuer, audience, kind and time, and nothing else', async () => {
      const good = await claims();
      const now = Math.floor(Date.now() / 1000);
      expect(await statusWith(sign(good, secret, { algorithm: 'HS256' }))).toBe(200);
      const crafted = {
        HS512: sign(good, secret, { algorithm: 'HS512' }),
        HS384: sign(good, secret, { algorithm: 'HS384' }),
        'another key': sign(good, `${secret}!`),
        expired: sign({ ...good, exp: now - 61 }, secret),
        'not yet valid': sign({ ...good, nbf: now + 120 }, secret),
        'another audience': sign({ ...good, aud: 'else' }, secret),
        'another issuer': sign({ ...good, iss: 'else' }, secret),
        'another kind': sign({ ...good, typ: 'refresh' }, secret),
        'another person': sign({ ...good, sub: 'b3f1c9a0-0000-4000-8000-000000000000' }, secret),
        'another session': sign({ ...good, sid: 'b3f1c9a0-0000-4000-8000-000000000000' }, secret),
        'no expiry': sign(Object.fromEntries(Object.entries(good).filter(([name]) => name !== 'exp')), secret),
        'key by address': sign(good, `${secret}?`, { header: { alg: 'HS256', jku: 'https://elsewhere.example/keys', kid: '../../dev/null' } }),
        'no signature': sign(good, secret).split('.').slice(0, 2).join('.'),
        empty: '',
      };
      for (const [what, token] of Object.entries(crafted)) expect([what, await statusWith(token)]).toEqual([what, 401]);
    });

    it.each(['none', 'None', 'nOnE', 'NONE'])('refuses the algorithm "%s"', async (alg) => {
      const body = part(await claims());
      expect(await statusWith(`${part({ alg, typ: 'JWT' })}.${body}.`)).toBe(401);
      expect(await statusWith(`${part({ alg, typ: 'JWT' })}.${body}.${sign({}, secret).split('.')[2]}`)).toBe(401);
    });
  });

  describe('bodies', () => {
    it.each(['text/plain', 'application/x-www-form-urlencoded', 'application/xml'])('refuses %s', async (type) => {
      const answer = await client.send('POST', '/api/probe/notes', { raw: { type, content: '{"text":"x"}' } });
      expectProblem(answer, problemOf('unsupported-type', 415, 'Send the body as application/json.'));
    });

    it('refuses JSON that does not parse', async () => {
      expectProblem(await client.send('POST', '/api/probe/notes', json('{"text":')), problemOf('bad-request', 400, 'The body is not readable JSON.'));
    });

    it('refuses a body above 1 MB', async () => {
      const content = JSON.stringify({ text: 'x'.repeat(1024 * 1024) });
      expectProblem(await client.send('POST', '/api/probe/notes', json(content)), problemOf('too-large', 413, 'The body is larger than this address accepts.'));
    });

    it('refuses nesting deeper than 32 levels and takes 32', async () => {
      const nested = (depth: number): string => `{"text":"x","more":${'['.repeat(depth)}${']'.repeat(depth)}}`;
      expect((await client.send('POST', '/api/probe/notes', json(nested(31)))).status).toBe(201);
      expectInvalid(await client.send('POST', '/api/probe/notes', json(nested(32))), [{ pointer: '#', detail: 'must not nest deeper than 32 levels' }]);
      expectInvalid(await client.send('POST', '/api/probe/notes', json(nested(100_000))), [{ pointer: '#', detail: 'must not nest deeper than 32 levels' }]);
    });

    it('refuses keys that reach prototypes, NUL and numbers that are not finite', async () => {
      const content = '{"text":"a\\u0000b","more":{"__proto__":{"admin":true},"constructor":1,"list":[1e400]}}';
      const answer = await client.send('POST', '/api/probe/notes', json(content));
      const { errors } = answer.json as { errors: { pointer: string; detail: string }[] };
      expect(answer.status).toBe(422);
      expect(errors.sort((left, right) => left.pointer.localeCompare(right.pointer))).toEqual([
        { pointer: '#/more/__proto__', detail: 'is not an allowed field name' },
        { pointer: '#/more/constructor', detail: 'is not an allowed field name' },
        { pointer: '#/more/list/0', detail: 'must be a finite number' },
        { pointer: '#/text', detail: 'must not contain the NUL character' },
      ]);
      expect(({} as { admin?: boolean }).admin).toBeUndefined();
    });

    it.each(['<img src=x onerror=alert(1)>', '{{7*7}}', '\u202Egnp.exe', '../../etc/passwd', '=cmd|calc', "'; DROP TABLE person; --"])('gives the text %j back as it came', async (text) => {
      expect((await client.post('/api/probe/notes', { text })).json).toEqual({ text });
    });

    it('names the faults of path and query together', async () => {
      expectInvalid(await client.get('/api/probe/search/7?limit=9&colour=red'), [
        { pointer: 'id', detail: 'must be an id' },
        { pointer: 'limit', detail: 'must be at most 5; got 9' },
        { pointer: 'colour', detail: 'is not a known field' },
      ]);
    });
  });

  describe('versions', () => {
    it('wants the version that was read, and one that is still the present one', async () => {
      const put = (ifMatch?: string) => client.put('/api/probe/versioned', { text: 'new' }, { ifMatch });
      const missing = problemOf('version-required', 428, 'Send If-Match with the ETag of the version you read.');
      for (const tag of [undefined, '*', 'W/"v7"', '"v6", "v7"', 'v7']) expectProblem(await put(tag), missing);
      const stale = await put('"v6"');
      expectProblem(stale, problemOf('stale-version', 412, 'Someone changed it since you read it. Read it again, then decide.', { current: { text: 'stored' } }));
      expect(stale.headers.get('etag')).toBe('"v7"');
      const done = await put('"v7"');
      expect([done.status, done.headers.get('etag')]).toEqual([200, '"v8"']);
    });
  });

  describe('repetitions', () => {
    const make = (text: string, key: string, sender = client) => sender.post('/api/probe/things', { text }, { headers: { 'idempotency-key': key } });

    it('gives a repetition with the same key the first answer and does nothing', async () => {
      const before = made;
      const first = await make('x', 'key-number-one');
      const again = await make('x', 'key-number-one');
      expect(made).toBe(before + 1);
      expect([again.status, again.json, again.headers.get('location'), again.headers.get('etag')]).toEqual([201, first.json, first.headers.get('location'), first.headers.get('etag')]);
      expect([first.headers.get('idempotency-replayed'), again.headers.get('idempotency-replayed')]).toEqual([null, 'true']);
    });

    it('runs once when the same request comes several times at once', async () => {
      const before = made;
      const answers = await Promise.all([1, 2, 3, 4].map(() => make('slow', 'key-all-at-once')));
      expect(made).toBe(before + 1);
      expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409]);
    });

    it('refuses a key that was used for something else, and frees one whose request was refused', async () => {
      await make('x', 'key-number-two');
      expectProblem(await make('y', 'key-number-two'), problemOf('conflict', 409, 'This Idempotency-Key was used for another request.'));
      expect([(await make('refused', 'key-number-three')).status, (await make('x', 'key-number-three')).status]).toEqual([409, 201]);
    });

    it('keeps the keys of different people apart, and wants no key', async () => {
      const before = made;
      const other = await api.signedIn('lab');
      await Promise.all([make('x', 'key-of-everyone'), make('x', 'key-of-everyone', other)]);
      await client.post('/api/probe/things', { text: 'x' });
      expect(made).toBe(before + 3);
      expectInvalid(await make('x', 'short'), [{ pointer: 'Idempotency-Key', detail: 'must have 8 to 200 visible ASCII characters, best a random id' }]);
    });
  });

  describe('files', () => {
    it('offers a download that no browser runs as a page', async () => {
      const answer = await client.get('/api/probe/file');
      expect(answer.bytes.toString('utf8')).toBe('a,b\n1,2\n');
      expect(answer.headers.get('content-disposition')).toBe(`attachment; filename="_ber _x_.csv"; filename*=UTF-8''%C3%9Cber%20%22x%22.csv`);
      expect(answer.headers.get('content-security-policy')).toBe("default-src 'none'; sandbox");
      expect(answer.headers.get('x-content-type-options')).toBe('nosniff');
    });

    it('takes files of a form within the limits of its route', async () => {
      const form = (bytes: number, count = 1): FormData => {
        const data = new FormData();
        data.set('label', 'cells');
        for (let index = 0; index < count; index += 1) data.append('files', new Blob(['x'.repeat(bytes)]), `../née ${index}.s1p`);
        return data;
      };
      const answer = await client.send('POST', '/api/probe/upload', { form: form(100) });
      // The path in front is dropped on the way in; the name stays data.
      expect(answer.json).toEqual({ names: ['née 0.s1p'], tag: contentTag('x'.repeat(100)), label: 'cells' });
      const refusal = problemOf('too-large', 413, 'The upload has too many or too large parts.');
      expectProblem(await client.send('POST', '/api/probe/upload', { form: form(101) }), refusal);
      expectProblem(await client.send('POST', '/api/probe/upload', { form: form(1, 3) }), refusal);
      expectProblem(await client.post('/api/probe/upload', {}), problemOf('unsupported-type', 415, 'Send the body as multipart/form-data.'));
    });
  });

  describe('streams', () => {
    const firstPiece = async (path: string, signal?: AbortSignal) => {
      const cookie = [...client.cookies].map(([name, { value }]) => `${name}=${value}`).join('; ');
      const answer = await fetch(`${api.url}${path}`, { headers: { cookie, 'accept-encoding': 'gzip' }, signal });
      const reader = (answer.body as ReadableStream<Uint8Array>).getReader();
      return { answer, reader, text: Buffer.from((await reader.read()).value ?? []).toString('utf8') };
    };

    it('pass events on at once, uncompressed', async () => {
      const stop = new AbortController();
      const { answer, text } = await firstPiece('/api/probe/events', stop.signal);
      expect([text, answer.headers.get('cache-control'), answer.headers.get('content-encoding')]).toEqual(['data: first\n\n', 'no-store, no-transform', null]);
      stop.abort();
      await new Promise((resolve) => setTimeout(resolve, 200));
      // The handler learns that the caller went away.
      expect(goneAfterMs).toBeGreaterThanOrEqual(0);
    });

    it('of events end when the server is asked to stop', async () => {
      const { reader } = await firstPiece('/api/probe/events');
      api.house.eventStreams.endAll();
      expect(await reader.read()).toEqual({ done: true, value: undefined });
    });

    it('that fail half-way cut the connection, so that no half file looks whole', async () => {
      await expect(client.get('/api/probe/breaking-off')).rejects.toThrow('terminated');
    });
  });

  describe('refusals', () => {
    it('tells nothing of an unexpected error but where to find it in the log', async () => {
      const answer = await client.get('/api/probe/broken');
      expectProblem(answer, problemOf('unexpected', 500, 'The server met a fault of its own. It is logged under the request id.'));
      expect((answer.json as { requestId: string }).requestId).toBe(answer.headers.get('x-request-id'));
      expect(answer.bytes.toString('utf8')).not.toMatch(/SELECT|etc|at .*\.ts/);
    });

    it('gives each cause its status', async () => {
      expectProblem(await client.get('/api/probe/conflict'), problemOf('conflict', 409, 'Already released.'));
      const away = await client.get('/api/probe/away');
      expectProblem(away, problemOf('unavailable', 503, 'Not now.'));
      expect(away.headers.get('retry-after')).toBe('9');
      expectProblem(await client.get('/api/nowhere'), problemOf('not-found', 404, 'There is no such address.'));
      const wrong = await client.patch('/api/probe/notes', {});
      expectProblem(wrong, problemOf('method-not-allowed', 405, 'Only POST works here.'));
      expect(wrong.headers.get('allow')).toBe('POST');
      expectProblem(await client.get('/api/probe/search/%E0%A4%A'), problemOf('bad-request', 400, 'The address is not readable.'));
    });

    it('answers 401 to a header it cannot read, even when a good cookie comes along', async () => {
      expectNotSignedIn(await client.get('/api/team', { headers: { authorization: 'Basic eDp5' } }));
    });
  });

  describe('headers', () => {
    it('sets the policies of a page that nobody may frame or feed scripts to', async () => {
      const { headers } = await api.anonymous().get('/api/health');
      const policy = headers.get('content-security-policy') ?? '';
      for (const rule of ["default-src 'self'", "script-src 'self'", "object-src 'none'", "base-uri 'none'", "frame-ancestors 'none'"]) expect(policy.split(';')).toContain(rule);
      expect(policy).toMatch(/style-src 'self' 'nonce-[A-Za-z0-9+/=]{24}'/);
      expect(policy).not.toMatch(/script-src[^;]*unsafe/);
      expect(headers.get('x-content-type-options')).toBe('nosniff');
      expect(headers.get('referrer-policy')).toBe('no-referrer');
      expect(headers.get('cross-origin-opener-policy')).toBe('same-origin');
      expect(headers.get('x-powered-by')).toBeNull();
      expect(headers.get('cache-control')).toBe('no-store');
      expect(headers.get('access-control-allow-origin')).toBeNull();
    });

    it('gives every answer a request id of its own, whatever the sender wishes', async () => {
      const ids = [await api.anonymous().get('/api/health'), await api.anonymous().get('/api/health', { headers: { 'x-request-id': 'mine' } })].map(({ headers }) => headers.get('x-request-id'));
      expect(new Set(ids).size).toBe(2);
      for (const id of ids) expect(id).toMatch(/^[0-9a-f-]{36}$/);
    });
  });

  it('compresses what is long', async () => {
    const encoding = await new Promise((resolve, reject) => {
      request(`${api.url}/api/openapi.json`, { headers: { 'accept-encoding': 'gzip' } }, (response) => {
        resolve(response.headers['content-encoding']);
        response.resume();
      })
        .on('error', reject)
        .end();
    });
    expect(encoding).toBe('gzip');
  });
});
