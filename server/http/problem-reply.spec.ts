import { once } from 'node:events';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import express from 'express';
import { pino } from 'pino';
import { problemReply, statusOf } from './problem-reply';
import * as problems from './problems';

/** What the answer to an error looks like from outside, and what the log says meanwhile. */
async function answerTo(error: unknown): Promise<{ status: number; body: Record<string, unknown>; headers: Headers; log: string }> {
  let log = '';
  const app = express();
  app.get('/api/thing', () => {
    throw error;
  });
  app.use(problemReply(pino({ level: 'trace' }, { write: (line: string) => (log += line) })));
  const server = createServer(app).listen(0, '127.0.0.1');
  await once(server, 'listening');
  try {
    const answer = await fetch(`http://127.0.0.1:${(server.address() as AddressInfo).port}/api/thing?secret=1`, { headers: { connection: 'close' } });
    return { status: answer.status, headers: answer.headers, body: (await answer.json()) as Record<string, unknown>, log };
  } finally {
    server.close();
  }
}

const withCode = (code: string, wrapped = false): Error => Object.assign(new Error('driver says secret things'), wrapped ? { driverError: { code } } : { code });

describe('problemReply', () => {
  const causes: readonly [problems.Problem, number][] = [
    [new problems.BadRequest('x'), 400],
    [new problems.NotSignedIn(), 401],
    [new problems.NotAllowed('x'), 403],
    [new problems.NotFound('panel'), 404],
    [new problems.MethodNotAllowed(['GET']), 405],
    [new problems.NotAcceptable('x'), 406],
    [new problems.Conflict('x'), 409],
    [new problems.StaleVersion('"v2"'), 412],
    [new problems.TooLarge('x'), 413],
    [new problems.UnsupportedType(['text/csv']), 415],
    [new problems.InvalidInput([{ pointer: '#', detail: 'x' }]), 422],
    [new problems.VersionRequired(), 428],
    [new problems.TooMany(30), 429],
    [new problems.Unavailable('x'), 503],
  ];

  it('has a status of its own for every cause', () => {
    expect(causes.map(([problem]) => statusOf(problem))).toEqual(causes.map(([, status]) => status));
    expect(new Set(causes.map(([{ kind }]) => kind)).size).toBe(causes.length);
  });

  it.each(causes)('answers %s in the one form', async (problem, status) => {
    const { body, headers } = await answerTo(problem);
    expect(body).toMatchObject({ type: `/problems/${problem.kind}`, status, detail: problem.message, instance: '/api/thing' });
    expect(headers.get('content-type')).toBe('application/problem+json; charset=utf-8');
    expect(headers.get('cache-control')).toBe('no-store');
  });

  it('adds what a program needs to go on', async () => {
    expect((await answerTo(new problems.StaleVersion('"v2"'))).headers.get('etag')).toBe('"v2"');
    expect((await answerTo(new problems.TooMany(30))).headers.get('retry-after')).toBe('30');
    expect((await answerTo(new problems.MethodNotAllowed(['GET', 'PUT']))).headers.get('allow')).toBe('GET, PUT');
  });

  it.each(['57P01', '57P03', '08006', '53300', 'ECONNREFUSED', 'ECONNRESET'])('says 503 when the database is away (%s)', async (code) => {
    for (const wrapped of [false, true]) {
      const { status, body } = await answerTo(withCode(code, wrapped));
      expect([status, body['detail']]).toEqual([503, 'The database is not available at the moment.']);
    }
  });

  it('says 503 when a statement ran into its limit', async () => {
    expect((await answerTo(withCode('57014'))).body).toMatchObject({ status: 503, detail: 'The database took too long.' });
  });

  it.each([new Error('secret'), withCode('23505'), 'a text', { status: 200 }])('says 500 and nothing more to %p', async (error) => {
    const { status, body, log } = await answerTo(error);
    expect(status).toBe(500);
    expect(JSON.stringify(body)).not.toMatch(/secret|a text|23505/);
    expect(log).toContain('unexpected error');
  });

  it('writes denied access into the log, without the query', async () => {
    const { log } = await answerTo(new problems.NotAllowed('Not yours to release.'));
    expect(JSON.parse(log)).toMatchObject({ msg: 'access denied', path: '/api/thing', reason: 'Not yours to release.' });
  });
});
