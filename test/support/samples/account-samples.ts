import type { RouteSamples } from '../route-samples';

/** Sessions and tokens belong to one person: to a teammate they are not there. */
export const accountSamples: RouteSamples = {
  'delete /api/sessions/:id': {
    owner: 'designer',
    teammate: { account: 'admin', status: 404 },
    okStatus: 204,
    prepare: async (api) => {
      const session = (await (await api.signedIn('designer')).get('/api/session')).json as { sessionId: string };
      return { path: `/api/sessions/${session.sessionId}` };
    },
  },
  'delete /api/tokens/:id': {
    owner: 'designer',
    teammate: { account: 'admin', status: 404 },
    okStatus: 204,
    prepare: async (api) => {
      const answer = await (await api.signedIn('designer')).post('/api/tokens', { name: 'sample', scopes: ['read'], days: 1 });
      return { path: `/api/tokens/${(answer.json as { id: string }).id}` };
    },
  },
};
