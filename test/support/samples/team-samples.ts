import { randomUUID } from 'node:crypto';
import type { RouteSamples } from '../route-samples';

export const teamSamples: RouteSamples = {
  'patch /api/team/people/:id': {
    owner: 'admin',
    teammate: { account: 'designer', status: 403 },
    okStatus: 200,
    prepare: async (api) => {
      const [person] = await api.query<{ id: string }>(`SELECT id FROM person WHERE email = 'range@merrow.example'`);
      return { path: `/api/team/people/${person?.id}`, body: { roles: ['range'] } };
    },
  },
  'delete /api/team/invitations/:id': {
    owner: 'admin',
    teammate: { account: 'designer', status: 403 },
    okStatus: 204,
    prepare: async (api) => {
      const admin = await api.signedIn('admin');
      const answer = await admin.post('/api/team/invitations', { email: `${randomUUID()}@merrow.example`, roles: ['lab'] });
      return { path: `/api/team/invitations/${(answer.json as { id: string }).id}` };
    },
  },
};
