import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import type { PanelDetail } from '../../../shared/contracts/projects';
import { freeze, newPanel, newProject } from '../panels';
import type { RouteSample, RouteSamples, SampleCall } from '../route-samples';

const reader = { account: 'fabricator', status: 403 };
const editor = { account: 'reviewer', status: 403 };

const onProject = (okStatus: number, call: (id: string) => SampleCall): RouteSample => ({
  owner: 'designer',
  teammate: editor,
  okStatus,
  prepare: async (api) => call((await newProject(await api.signedIn('designer'))).id),
});

const onPanel = (okStatus: number, teammate: RouteSample['teammate'], call: (panel: PanelDetail) => SampleCall): RouteSample => ({
  owner: 'designer',
  teammate,
  okStatus,
  prepare: async (api) => call(await newPanel(await api.signedIn('designer'))),
});

const onRevision = (okStatus: number, teammate: RouteSample['teammate'], call: (id: string) => SampleCall): RouteSample => ({
  owner: 'designer',
  teammate,
  okStatus,
  prepare: async (api) => {
    const designer = await api.signedIn('designer');
    return call((await freeze(designer, (await newPanel(designer)).id)).id);
  },
});

export const projectSamples: RouteSamples = {
  'patch /api/projects/:id': onProject(200, (id) => ({ path: `/api/projects/${id}`, body: { name: 'Renamed' }, ifMatch: '"v1"' })),
  'post /api/projects/:id/panels': onProject(201, (id) => ({ path: `/api/projects/${id}/panels`, body: { name: 'Panel' } })),
  'get /api/panels/:id': onPanel(200, reader, ({ id }) => ({ path: `/api/panels/${id}` })),
  'patch /api/panels/:id': onPanel(200, editor, ({ id, etag }) => ({ path: `/api/panels/${id}`, body: { name: 'Renamed' }, ifMatch: etag })),
  'put /api/panels/:id/draft': onPanel(200, editor, ({ id, etag }) => ({ path: `/api/panels/${id}/draft`, body: { design: STARTING_DESIGN }, ifMatch: etag })),
  'get /api/panels/:id/revisions': onPanel(200, reader, ({ id }) => ({ path: `/api/panels/${id}/revisions` })),
  'post /api/panels/:id/revisions': onPanel(201, editor, ({ id, etag }) => ({ path: `/api/panels/${id}/revisions`, body: { message: 'first' }, ifMatch: etag })),
  'get /api/revisions/:id': onRevision(200, reader, (id) => ({ path: `/api/revisions/${id}` })),
  'post /api/revisions/:id/restoration': onRevision(201, editor, (id) => ({ path: `/api/revisions/${id}/restoration`, body: { message: 'again' } })),
};
