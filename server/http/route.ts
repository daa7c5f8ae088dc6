import type * as z from 'zod';
import type { Role, Scope } from '../../shared/contracts/common';
import type { Caller } from './caller';
import type { BytesReply, Reply } from './reply';

/*
 * How to add a route
 *
 * 1. Put the request and reply schemas into shared/contracts.
 * 2. In `<feature>/<feature>-routes.ts`:
 *
 *      export const projectRoutes = ({ projects }: { projects: ProjectService }): readonly Route[] => [
 *        defineRoute({
 *          method: 'patch', path: '/api/projects/:id', summary: 'Rename a project',
 *          policy: { kind: 'signed-in', roles: ['designer'], scope: 'design' },
 *          params: idParams, body: projectChange, reply: project, versioned: true,
 *          handler: async ({ caller, params, body, ifMatch }) => {
 *            const changed = await projects.change(caller, params.id, { ...body, ifMatch });
 *            return new Reply(changed, { etag: versionTag(changed.version) });
 *          },
 *        }),
 *      ];
 *
 * 3. Add one line to server/features.ts, and to server/house.ts the service: its constructor takes what it needs of
 *    `Ground` (server/database/ground.ts) and other services. Routes and services never import the house itself.
 *
 * What comes before the handler, in this order: rate limit, sign-in (401), role and scope (403), forgery check (403),
 * If-Match (428), type and size of the body (415, 413), all within the time limit (408, 503), schemas of params, query and body with every fault named (422).
 * Schemas must be strict objects: unknown fields are refused. The handler returns the plain value, a Reply (status,
 * ETag, Location), a BytesReply (bytes, stream, download), or nothing (204). To refuse, throw from `problems.ts`.
 */

export type Policy =
  /** Anyone. `forgery: 'token'` still wants the forgery token, for what acts on a session cookie without needing one. */
  | { readonly kind: 'public'; readonly forgery?: 'token' }
  /**
   * A session, or a personal token with the scope. One of `roles` is needed where given. `sessionOnly` refuses tokens,
   * for what only a person at a screen should do (passwords, tokens, approvals).
   */
  | { readonly kind: 'signed-in'; readonly roles?: readonly Role[]; readonly scope: Scope; readonly sessionOnly?: true };

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
export type RateClass = 'general' | 'sign-in' | 'letter' | 'upload' | 'compute' | 'export';

/** Multipart form: the files come as bytes in memory, text fields as `body` through its schema. */
export interface UploadRule {
  readonly maxFileBytes: number;
  readonly maxFiles: number;
}

export interface UploadedFile {
  readonly field: string;
  /** As the sender named it: data only, never a path. */
  readonly originalName: string;
  readonly bytes: Buffer;
}

export interface RouteContext<Pol extends Policy, Params, Query, Body> {
  readonly caller: Pol extends { readonly kind: 'public' } ? Caller | null : Caller;
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly files: readonly UploadedFile[];
  /** The entity tag the caller read, of a `versioned` route; empty string elsewhere. */
  readonly ifMatch: string;
  readonly cookies: Readonly<Record<string, string>>;
  readonly header: (name: string) => string | undefined;
  /** True when the caller asks for this media type by name, and not only by a wildcard. */
  readonly wants: (mediaType: string) => boolean;
  readonly address: string;
  readonly requestId: string;
  /** Fires when the caller goes away before the answer is complete. */
  readonly signal: AbortSignal;
}

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;
type Answer<R> = R extends z.ZodType ? z.output<R> | Reply<z.output<R>> | BytesReply : Reply<undefined> | BytesReply | void;
type Schema = z.ZodType | undefined;

interface RouteFrame<Pol extends Policy, P extends Schema, Q extends Schema, B extends Schema, R extends Schema> {
  readonly method: Method;
  /** Express path under /api, with `:name` parameters. */
  readonly path: `/api/${string}`;
  readonly summary: string;
  readonly policy: Pol;
  readonly params?: P;
  readonly query?: Q;
  readonly body?: B;
  readonly reply?: R;
  /** Status of a success; 200 with `reply`, 204 without, unless said. */
  readonly status?: number;
  /** Media types a BytesReply may have, for the OpenAPI document. */
  readonly bytes?: readonly string[];
  /** The object has a strong ETag and the change must name it in If-Match. */
  readonly versioned?: true;
  /** Repeated with the same Idempotency-Key it gives the first answer and does nothing; for JSON answers. */
  readonly idempotent?: true;
  readonly upload?: UploadRule;
  /** Largest JSON body; 1 MB unless said. */
  readonly maxBodyBytes?: number;
  readonly rate?: RateClass;
  /** Longest time from the headers of the request to the head of the answer; a minute unless said. */
  readonly timeLimitSeconds?: number;
}

export interface RouteSpec<Pol extends Policy, P extends Schema, Q extends Schema, B extends Schema, R extends Schema>
  extends RouteFrame<Pol, P, Q, B, R> {
  readonly handler: (context: RouteContext<Pol, Parsed<P>, Parsed<Q>, Parsed<B>>) => Promise<Answer<R>> | Answer<R>;
}

/** A route with its types forgotten, as the table, the mounting and the OpenAPI document see it. */
export interface Route extends RouteFrame<Policy, Schema, Schema, Schema, Schema> {
  run(context: RouteContext<Policy, unknown, unknown, unknown>): Promise<unknown>;
}

/** The only way to make a route: a policy is part of the type, so none can be forgotten. */
export function defineRoute<
  const Pol extends Policy,
  P extends Schema = undefined,
  Q extends Schema = undefined,
  B extends Schema = undefined,
  R extends Schema = undefined,
>(spec: RouteSpec<Pol, P, Q, B, R>): Route {
  const { handler, ...frame } = spec;
  // The mounting parses with these very schemas and checks this very policy, so the context has the spec's types.
  type Own = RouteContext<Pol, Parsed<P>, Parsed<Q>, Parsed<B>>;
  return { ...frame, run: async (context) => handler(context as unknown as Own) };
}
