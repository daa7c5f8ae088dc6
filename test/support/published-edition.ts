import { randomUUID } from 'node:crypto';
import type { EditionDetail } from '../../shared/contracts/library';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import type { Api } from './api';
import { cellFilesOf, descriptionOf, importOf, uploadForm } from './cell-files';

/** A family of the project's own cell files under a name of its own, accepted by the lab. */
export async function acceptedEdition(api: Api, folder = 'four-state-5'): Promise<EditionDetail> {
  const lab = await api.signedIn('lab');
  const request = importOf(folder, { description: { ...descriptionOf(folder), name: `Sample ${randomUUID()}` } });
  const answer = await lab.send('POST', '/api/library/families', { form: uploadForm(cellFilesOf(folder), { import: request }) });
  if (answer.status !== 201) throw new Error(`the sample edition was refused: ${answer.bytes.toString('utf8')}`);
  return answer.json as EditionDetail;
}

export async function publishedEdition(api: Api, folder = 'four-state-5'): Promise<EditionDetail> {
  const { id } = await acceptedEdition(api, folder);
  const answer = await (await api.signedIn('lab')).post(`/api/library/editions/${id}/publication`, { note: 'for tests' });
  if (answer.status !== 200) throw new Error(`the sample edition was not published: ${answer.bytes.toString('utf8')}`);
  return answer.json as EditionDetail;
}

export const onEdition = (editionId: string, design: DesignDocument = STARTING_DESIGN): DesignDocument => ({
  ...design,
  cells: { kind: 'edition', editionId, rule: 'nearest-phase', excludedCells: [] },
});
