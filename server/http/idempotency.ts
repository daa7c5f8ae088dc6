import { createHash } from 'node:crypto';
import { Conflict, InvalidInput } from './problems';
import { Reply } from './reply';
import type { Policy, Route, RouteContext } from './route';

/** What was answered the first time. */
export interface KeptAnswer {
  readonly status: number;
  readonly etag: string | null;
  readonly location: string | null;
  readonly body: unknown;
}

/** One request of one person, known by the key its sender chose. */
export interface ReplayKey {
  readonly personId: string;
  readonly key: string;
}

export type Claim =
  | { readonly kind: 'mine' }
  | { readonly kind: 'done'; readonly answer: KeptAnswer }
  | { readonly kind: 'running' }
  /** The key was used for a request that says something else. */
  | { readonly kind: 'different' };

/** Keeps answers by key for at least a day. */
export interface ReplayStore {
  claim(key: ReplayKey, requestHash: string): Promise<Claim>;
  complete(key: ReplayKey, answer: KeptAnswer): Promise<void>;
  /** After a refusal or a failure: the same key may try again. */
  abandon(key: ReplayKey): Promise<void>;
}

type Context = RouteContext<Policy, unknown, unknown, unknown>;

function hashOfRequest(route: Route, { params, query, body, files }: Context): string {
  const hash = createHash('sha256').update(JSON.stringify([route.method, route.path, params, query, body]));
  for (const { field, originalName, bytes } of files) hash.update(JSON.stringify([field, originalName, bytes.length])).update(bytes);
  return hash.digest('hex');
}

function keyOf(header: string): string {
  if (!/^[\x21-\x7e]{8,200}$/.test(header)) {
    throw new InvalidInput([{ pointer: 'Idempotency-Key', detail: 'must have 8 to 200 visible ASCII characters, best a random id' }]);
  }
  return header;
}

const keptFrom = (route: Route, result: unknown): KeptAnswer => {
  const usual = route.status ?? 200;
  if (!(result instanceof Reply)) return { status: usual, etag: null, location: null, body: result };
  const { status, etag, location } = result.options;
  return { status: status ?? usual, etag: etag ?? null, location: location ?? null, body: result.body };
};

const replayed = ({ status, etag, location, body }: KeptAnswer): Reply<unknown> =>
  new Reply(body, { status, etag: etag ?? undefined, location: location ?? undefined, headers: { 'Idempotency-Replayed': 'true' } });

/** Runs a route once per Idempotency-Key of a person; a repetition gets the first answer. Without the header it just runs. */
export async function runOnce(store: ReplayStore, route: Route, context: Context): Promise<unknown> {
  const header = context.header('idempotency-key');
  if (header === undefined || context.caller === null) return route.run(context);
  const key: ReplayKey = { personId: context.caller.person.id, key: keyOf(header) };
  const claim = await store.claim(key, hashOfRequest(route, context));
  if (claim.kind === 'done') return replayed(claim.answer);
  if (claim.kind === 'running') throw new Conflict('The first request with this Idempotency-Key is still running.');
  if (claim.kind === 'different') throw new Conflict('This Idempotency-Key was used for another request.');
  const result = await route.run(context).catch(async (error: unknown) => {
    await store.abandon(key);
    throw error;
  });
  await store.complete(key, keptFrom(route, result));
  return result;
}
