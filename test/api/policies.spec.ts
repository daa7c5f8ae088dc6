import type { Express } from 'express';
import { createApp } from '../../server/app';
import { isMountedRoute } from '../../server/http/mount-routes';
import { Api } from '../support/api';
import { expectNotSignedIn, expectNotAllowed } from '../support/problems';

interface Layer {
  readonly handle: Parameters<typeof isMountedRoute>[0] & { readonly stack?: readonly Layer[] };
  readonly route?: { readonly path: string; readonly stack: readonly Layer[] };
}

/** Addresses of handlers that did not come from `defineRoute`, wherever they are nested. */
function strangersIn(layers: readonly Layer[]): string[] {
  return layers.flatMap(({ route, handle }) => [
    ...(route?.stack ?? []).flatMap((layer) => (isMountedRoute(layer.handle) ? [] : [route?.path ?? ''])),
    ...strangersIn(handle.stack ?? []),
  ]);
}

const layersOf = (app: Express): readonly Layer[] => (app.router as unknown as { stack: readonly Layer[] }).stack;

describe('policies', () => {
  let api: Api;
  beforeAll(async () => {
    api = await Api.start();
  }, 60_000);
  afterAll(() => api.close());

  it('no route reaches the application but by defineRoute', () => {
    const app = createApp({ house: api.house });
    expect(strangersIn(layersOf(app))).toEqual([]);
    expect(layersOf(app).filter(({ route }) => route !== undefined).length).toBeGreaterThanOrEqual(api.routes.length);
  });

  it('finds a route that someone adds past defineRoute, at the top and nested', () => {
    const app = createApp({ house: api.house });
    app.get('/api/hidden', (_request, response) => void response.end());
    expect(strangersIn(layersOf(app))).toEqual(['/api/hidden']);
  });

  it('answers 401 to an anonymous caller on every route that is not public, before looking at anything else', async () => {
    const guarded = api.routes.filter(({ policy }) => policy.kind === 'signed-in');
    expect(guarded.length).toBeGreaterThan(10);
    for (const { method, path } of guarded) {
      const address = path.replace(/:\w+/g, 'b3f1c9a0-0000-4000-8000-000000000000');
      expectNotSignedIn(await api.anonymous().send(method.toUpperCase(), address));
    }
  });

  it('answers 403 to a person without the role on every route that needs one', async () => {
    const client = await api.signedIn('fabricator');
    const guarded = api.routes.filter(({ policy }) => policy.kind === 'signed-in' && policy.roles !== undefined && !policy.roles.includes('fabricator'));
    expect(guarded.length).toBeGreaterThan(4);
    for (const { method, path, policy } of guarded) {
      const address = path.replace(/:\w+/g, 'b3f1c9a0-0000-4000-8000-000000000000');
      const roles = policy.kind === 'signed-in' ? policy.roles?.join(' or ') : '';
      expectNotAllowed(await client.send(method.toUpperCase(), address), `This needs the role ${roles}.`);
    }
  });

  it('answers 403 to a personal token without the scope', async () => {
    const client = await api.withToken('admin', ['read']);
    expectNotAllowed(await client.patch('/api/team', { name: 'Other' }), 'The personal token lacks the scope "team".');
    expect((await client.get('/api/team')).status).toBe(200);
  });

  it('changes nothing by GET', () => {
    const writing = api.routes.filter(({ method, body, upload, versioned }) => method === 'get' && (body ?? upload ?? versioned) !== undefined);
    expect(writing.map(({ path }) => path)).toEqual([]);
  });
});
