import * as z from 'zod';
import { openApiDocument } from './open-api';
import { defineRoute, type Route } from './route';

/** `GET /api/openapi.json`, public: the document of the given routes, made once. */
export function openApiRoute(routes: readonly Route[], version: string, accessCookie: string): Route {
  const all: Route[] = [...routes];
  let document: Record<string, unknown> | null = null;
  const own = defineRoute({
    method: 'get',
    path: '/api/openapi.json',
    summary: 'This description of the API, as OpenAPI 3.1',
    policy: { kind: 'public' },
    reply: z.record(z.string(), z.unknown()),
    handler: () => (document ??= openApiDocument(all, version, accessCookie)),
  });
  all.push(own);
  return own;
}
