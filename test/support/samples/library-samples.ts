import { randomUUID } from 'node:crypto';
import type { EditionDetail } from '../../../shared/contracts/library';
import type { Api } from '../api';
import { cellFilesOf, descriptionOf, importOf, uploadForm } from '../cell-files';
import type { RouteSample, RouteSamples, SampleCall } from '../route-samples';

const FOLDER = 'four-state-5';

async function acceptedEdition(api: Api): Promise<EditionDetail> {
  const lab = await api.signedIn('lab');
  const request = importOf(FOLDER, { description: { ...descriptionOf(FOLDER), name: `Sample ${randomUUID()}` } });
  const answer = await lab.send('POST', '/api/library/families', { form: uploadForm(cellFilesOf(FOLDER), { import: request }) });
  if (answer.status !== 201) throw new Error(`the sample edition was refused: ${answer.bytes.toString('utf8')}`);
  return answer.json as EditionDetail;
}

const reading = (path: (edition: EditionDetail) => string): RouteSample => ({
  owner: 'designer',
  teammate: { account: 'fabricator', status: 403 },
  okStatus: 200,
  prepare: async (api) => ({ path: path(await acceptedEdition(api)) }),
});

const editing = (okStatus: number, call: (edition: EditionDetail) => SampleCall): RouteSample => ({
  owner: 'lab',
  teammate: { account: 'designer', status: 403 },
  okStatus,
  prepare: async (api) => call(await acceptedEdition(api)),
});

export const librarySamples: RouteSamples = {
  'get /api/library/families/:id': reading(({ familyId }) => `/api/library/families/${familyId}`),
  'get /api/library/editions/:id': reading(({ id }) => `/api/library/editions/${id}`),
  'get /api/library/editions/:id/responses': reading(({ id }) => `/api/library/editions/${id}/responses`),
  'get /api/library/editions/:id/uses': reading(({ id }) => `/api/library/editions/${id}/uses`),
  'get /api/library/editions/:id/files': reading(({ id }) => `/api/library/editions/${id}/files`),
  'get /api/library/files/:sha256': reading(({ cells }) => `/api/library/files/${cells[0]?.fileHashes[0]}`),
  'post /api/library/families/:id/editions': editing(201, ({ familyId, description }) => ({
    path: `/api/library/families/${familyId}/editions`,
    form: uploadForm(cellFilesOf(FOLDER), { import: importOf(FOLDER, { description }) }),
  })),
  'post /api/library/editions/:id/publication': editing(200, ({ id }) => ({ path: `/api/library/editions/${id}/publication`, body: { note: 'sample' } })),
  'delete /api/library/editions/:id': editing(204, ({ id }) => ({ path: `/api/library/editions/${id}` })),
};
