import { freeze, newPanel } from '../panels';
import type { RouteSample, RouteSamples } from '../route-samples';

const reading = (path: (revisionId: string) => string): RouteSample => ({
  owner: 'designer',
  teammate: { account: 'fabricator', status: 403 },
  okStatus: 200,
  prepare: async (api) => {
    const designer = await api.signedIn('designer');
    const panel = await newPanel(designer);
    return { path: path((await freeze(designer, panel.id)).id) };
  },
});

export const exportSamples: RouteSamples = {
  'get /api/revisions/:id/export': reading((id) => `/api/revisions/${id}/export`),
  'get /api/revisions/:id/export/preview': reading((id) => `/api/revisions/${id}/export/preview`),
};
