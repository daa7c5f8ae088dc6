import { once } from 'node:events';
import { request, type IncomingMessage } from 'node:http';
import { Readable } from 'node:stream';
import { setTimeout as wait } from 'node:timers/promises';
import * as z from 'zod';
import { allRoutes } from '../../server/app';
import { BytesReply } from '../../server/http/reply';
import { defineRoute, type Route } from '../../server/http/route';
import { Api } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { expectProblem, problemOf } from '../support/problems';

const LIMIT_SECONDS = 0.4;
const member = { kind: 'signed-in', scope: 'read' } as const;
const note = z.strictObject({ text: z.string() });
/** What handlers saw of the end of their time. */
const ended: string[] = [];

async function untilEnd(signal: AbortSignal, how: string): Promise<void> {
  await once(signal, 'abort');
  ended.push(how);
}

const probes: readonly Route[] = [
  defineRoute({ method: 'post', path: '/api/probe/quick', summary: 'Echo', policy: member, timeLimitSeconds: LIMIT_SECONDS, body: note, reply: note, handler: ({ body }) => body }),
  defineRoute({
    method: 'get',
    path: '/api/probe/slow',
    summary: 'Answers too late',
    policy: member,
    timeLimitSeconds: LIMIT_SECONDS,
    reply: note,
    handler: async ({ signal }) => {
      await untilEnd(signal, 'late');
      return { text: 'too late' };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/probe/failing',
    summary: 'Fails too late',
    policy: member,
    timeLimitSeconds: LIMIT_SECONDS,
    reply: note,
    handler: async ({ signal }) => {
      await untilEnd(signal, 'failed');
      throw new Error('given up');
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/probe/long',
    summary: 'A download longer than its limit',
    policy: member,
    timeLimitSeconds: LIMIT_SECONDS,
    bytes: ['text/csv'],
    handler: () => new BytesReply(Readable.from((async function* () {
      yield 'a\n';
      await wait(2500 * LIMIT_SECONDS);
      yield 'b\n';
    })()), 'text/csv'),
  }),
];

describe('the time limit of a request', () => {
  let api: Api;
  let client: ApiClient;
  beforeAll(async () => {
    api = await Api.start({ moreRoutes: probes });
    client = await api.signedIn('designer');
  }, 60_000);
  afterAll(() => api.close());

  it('is told when it is over, and so is the handler; its late answer is dropped', async () => {
    const detail = `This took longer than ${LIMIT_SECONDS} s and was given up.`;
    const answer = await client.get('/api/probe/slow');
    expectProblem(answer, problemOf('unavailable', 503, detail));
    expect(answer.headers.get('retry-after')).toBe('5');
    expectProblem(await client.get('/api/probe/failing'), problemOf('unavailable', 503, detail));
    expect(ended).toEqual(['late', 'failed']);
    expect((await client.post('/api/probe/quick', { text: 'still here' })).status).toBe(200);
  });

  it('ends a body that does not come', async () => {
    const { secret } = (await client.post('/api/tokens', { name: 'slow', scopes: ['read'], days: 1 })).json as { secret: string };
    const slow = request(`${api.url}/api/probe/quick`, { method: 'POST', headers: { authorization: `Bearer ${secret}`, 'content-type': 'application/json', 'content-length': '1000' } });
    slow.on('error', () => undefined);
    slow.write('{"text":');
    const [answer] = (await once(slow, 'response')) as [IncomingMessage];
    const chunks = await answer.toArray();
    expect(JSON.parse(Buffer.concat(chunks as Buffer[]).toString('utf8'))).toEqual(problemOf('too-slow', 408, `The request did not arrive within ${LIMIT_SECONDS} s.`));
    expect([answer.statusCode, answer.headers.connection]).toEqual([408, 'close']);
    slow.destroy();
  });

  it('leaves an answer alone that has begun', async () => {
    const answer = await client.get('/api/probe/long');
    expect([answer.status, answer.bytes.toString('utf8')]).toEqual([200, 'a\nb\n']);
  });

  it('is a minute unless a route says that it takes longer: uploads, exports and what waits for the engine', () => {
    const longer = allRoutes(api.house).filter(({ timeLimitSeconds }) => timeLimitSeconds !== undefined);
    expect(Object.fromEntries(longer.map(({ method, path, timeLimitSeconds }) => [`${method} ${path}`, timeLimitSeconds]))).toEqual({
      'post /api/predictions': 180,
      'get /api/comparisons': 180,
      'get /api/revisions/:id/export': 300,
      'get /api/revisions/:id/export/preview': 300,
      'post /api/library/inspections': 600,
      'post /api/library/families': 600,
      'post /api/library/families/:id/editions': 600,
    });
  });
});
