import { runOnce, type Claim, type KeptAnswer, type ReplayKey, type ReplayStore } from './idempotency';
import { Conflict, InvalidInput, Unavailable } from './problems';
import { Reply } from './reply';
import type { Policy, Route, RouteContext } from './route';

/** Keeps answers in memory, as the database does in its table. */
class MemoryReplays implements ReplayStore {
  private readonly rows = new Map<string, { hash: string; answer: KeptAnswer | null }>();

  async claim({ personId, key }: ReplayKey, hash: string): Promise<Claim> {
    const row = this.rows.get(`${personId} ${key}`);
    if (row === undefined) {
      this.rows.set(`${personId} ${key}`, { hash, answer: null });
      return { kind: 'mine' };
    }
    if (row.hash !== hash) return { kind: 'different' };
    return row.answer === null ? { kind: 'running' } : { kind: 'done', answer: row.answer };
  }

  async complete({ personId, key }: ReplayKey, answer: KeptAnswer): Promise<void> {
    const row = this.rows.get(`${personId} ${key}`);
    if (row !== undefined) row.answer = answer;
  }

  async abandon({ personId, key }: ReplayKey): Promise<void> {
    this.rows.delete(`${personId} ${key}`);
  }
}

type Context = RouteContext<Policy, unknown, unknown, unknown>;
const KEY = 'a-key-of-its-own';
const contextOf = (body: unknown, { person = 'ada', key = KEY as string | null, files = [] as Context['files'] } = {}): Context =>
  ({ caller: { person: { id: person } }, params: {}, query: {}, body, files, header: (name: string) => (name === 'idempotency-key' ? (key ?? undefined) : undefined) }) as unknown as Context;

function makingRoute(work: (made: number) => Promise<unknown> = async (made) => new Reply({ made }, { status: 201, location: `/api/things/${made}`, etag: `"${made}"` })) {
  const route = { method: 'post', path: '/api/things', runs: 0, run: async (): Promise<unknown> => work(++route.runs) };
  return route as typeof route & Route;
}

describe('runOnce', () => {
  it('runs a repeated request once and gives the first answer again, marked as such', async () => {
    const [store, route] = [new MemoryReplays(), makingRoute()];
    const first = (await runOnce(store, route, contextOf({ name: 'x' }))) as Reply<unknown>;
    const again = (await runOnce(store, route, contextOf({ name: 'x' }))) as Reply<unknown>;
    expect(route.runs).toBe(1);
    expect(again.body).toEqual(first.body);
    expect(again.options).toEqual({ status: 201, etag: '"1"', location: '/api/things/1', headers: { 'Idempotency-Replayed': 'true' } });
  });

  it('runs each time without a key, and for each person and key on their own', async () => {
    const [store, route] = [new MemoryReplays(), makingRoute()];
    for (const context of [contextOf({}, { key: null }), contextOf({}, { key: null }), contextOf({}), contextOf({}, { person: 'eve' }), contextOf({}, { key: 'another-key-1' })]) await runOnce(store, route, context);
    expect(route.runs).toBe(5);
  });

  it('refuses a key that was used for other words or other bytes', async () => {
    const [store, route] = [new MemoryReplays(), makingRoute()];
    const file = (text: string) => [{ field: 'files', originalName: 'a.s1p', bytes: Buffer.from(text) }];
    await runOnce(store, route, contextOf({ name: 'x' }, { files: file('one') }));
    for (const context of [contextOf({ name: 'y' }, { files: file('one') }), contextOf({ name: 'x' }, { files: file('two') }), contextOf({ name: 'x' })]) {
      await expect(runOnce(store, route, context)).rejects.toThrow(new Conflict('This Idempotency-Key was used for another request.'));
    }
    expect(route.runs).toBe(1);
  });

  it('refuses a second request while the first still runs', async () => {
    let finish = (): void => undefined;
    const [store, route] = [new MemoryReplays(), makingRoute(() => new Promise((resolve) => (finish = () => resolve({ done: true }))))];
    const first = runOnce(store, route, contextOf({}));
    await new Promise((resolve) => setImmediate(resolve));
    await expect(runOnce(store, route, contextOf({}))).rejects.toThrow('The first request with this Idempotency-Key is still running.');
    finish();
    expect(await first).toEqual({ done: true });
  });

  it('lets the same key try again after a failure', async () => {
    const store = new MemoryReplays();
    const route = makingRoute(async (made) => {
      if (made === 1) throw new Unavailable('Not now.');
      return { made };
    });
    await expect(runOnce(store, route, contextOf({}))).rejects.toThrow('Not now.');
    expect(await runOnce(store, route, contextOf({}))).toEqual({ made: 2 });
  });

  it.each(['short', 'with a space in it', 'x'.repeat(201), 'Schlüssel-1234'])('refuses the key %j', async (key) => {
    await expect(runOnce(new MemoryReplays(), makingRoute(), contextOf({}, { key }))).rejects.toMatchObject(
      new InvalidInput([{ pointer: 'Idempotency-Key', detail: 'must have 8 to 200 visible ASCII characters, best a random id' }]),
    );
  });
});
