import type { PanelDetail, Project, RevisionDetail } from '../../shared/contracts/projects';
import type { DesignDocument } from '../../shared/model/design-document';
import type { Answer, ApiClient } from './api-client';

/** What was asked for, or an error that shows the refusal. */
export function bodyOf<T>(answer: Answer, status: number): T {
  if (answer.status !== status) throw new Error(`expected ${status}, got ${answer.status}: ${answer.bytes.toString('utf8')}`);
  return answer.json as T;
}

export async function newProject(client: ApiClient, name = 'Trials'): Promise<Project> {
  return bodyOf<Project>(await client.post('/api/projects', { name }), 201);
}

export async function newPanel(client: ApiClient, design?: DesignDocument): Promise<PanelDetail> {
  const project = await newProject(client);
  return bodyOf<PanelDetail>(await client.post(`/api/projects/${project.id}/panels`, { name: 'Panel', ...(design === undefined ? {} : { design }) }), 201);
}

export async function freeze(client: ApiClient, panelId: string, message = 'as drawn'): Promise<RevisionDetail> {
  const { etag } = bodyOf<PanelDetail>(await client.get(`/api/panels/${panelId}`), 200);
  return bodyOf<RevisionDetail>(await client.post(`/api/panels/${panelId}/revisions`, { message }, { ifMatch: etag }), 201);
}

/** Saves a design over the draft as it stands. */
export async function draw(client: ApiClient, panelId: string, design: DesignDocument): Promise<void> {
  const { etag } = bodyOf<PanelDetail>(await client.get(`/api/panels/${panelId}`), 200);
  bodyOf(await client.put(`/api/panels/${panelId}/draft`, { design }, { ifMatch: etag }), 200);
}
