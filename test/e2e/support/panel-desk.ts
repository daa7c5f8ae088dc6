import { randomUUID } from 'node:crypto';
import type * as z from 'zod';
import { panelDetail, project, projectList, revisionDetail, revisionList } from '../../../shared/contracts/projects';
import type { PanelDetail, Project, RevisionListItem } from '../../../shared/contracts/projects';
import { predictionReply } from '../../../shared/contracts/predictions';
import type { DesignDocument } from '../../../shared/model/design-document';
import type { Answer, ApiClient } from '../../support/api-client';

type Cells = NonNullable<z.infer<typeof predictionReply>['cells']>;

function parsed<T>(schema: z.ZodType<T>, { status, json }: Answer): T {
  if (status >= 400) throw new Error(`the server refused with ${status}: ${JSON.stringify(json)}`);
  return schema.parse(json);
}

/** What a test has the server do or asks it for, past the screens. */
export class PanelDesk {
  constructor(private readonly api: ApiClient) {}

  async projects(): Promise<readonly Project[]> {
    return parsed(projectList, await this.api.get('/api/projects')).items;
  }

  /** A panel of the demonstration project by the beginning of its name. */
  async demoPanel(start: string): Promise<Project['panels'][number]> {
    const invented = (await this.projects()).find((known) => known.invented);
    const panel = invented?.panels.find(({ name }) => name.startsWith(start));
    if (panel === undefined) throw new Error(`the demonstration project has no panel ${start}`);
    return panel;
  }

  /** A project of the test's own with one panel in it, which the demonstration never sees. */
  async ownPanel(name: string, design: DesignDocument): Promise<PanelDetail> {
    const { id } = parsed(project, await this.api.post('/api/projects', { name: `Trial of ${name}` }));
    return parsed(panelDetail, await this.api.post(`/api/projects/${id}/panels`, { name, design }));
  }

  async panel(id: string): Promise<PanelDetail> {
    return parsed(panelDetail, await this.api.get(`/api/panels/${id}`));
  }

  async saveDraft(id: string, change: (design: DesignDocument) => DesignDocument): Promise<void> {
    const { design, etag } = await this.panel(id);
    const { status, json } = await this.api.put(`/api/panels/${id}/draft`, { design: change(design) }, { ifMatch: etag });
    if (status !== 200) throw new Error(`the draft was not saved: ${status} ${JSON.stringify(json)}`);
  }

  /** Freezes the draft as it stands; gives the id of the revision. */
  async freeze(panelId: string, message: string): Promise<string> {
    const { etag } = await this.panel(panelId);
    const answer = await this.api.post(`/api/panels/${panelId}/revisions`, { message }, { ifMatch: etag, headers: { 'idempotency-key': randomUUID() } });
    return parsed(revisionDetail, answer).id;
  }

  async revisions(panelId: string): Promise<readonly RevisionListItem[]> {
    return parsed(revisionList, await this.api.get(`/api/panels/${panelId}/revisions`)).items;
  }

  /** The cells that the server computes for a design, array by array. */
  async cells(design: DesignDocument): Promise<Cells> {
    const answer = await this.api.post('/api/predictions', { design, include: ['cells'] }, { headers: { accept: 'application/json' } });
    const { cells } = parsed(predictionReply, answer);
    if (cells === undefined) throw new Error('the prediction holds no cells');
    return cells;
  }
}

/** The same design with its first beam at another elevation. */
export const withBeamTheta = (design: DesignDocument, thetaDeg: number): DesignDocument => ({
  ...design,
  requirement: { ...design.requirement, beams: design.requirement.beams.map((beam, i) => (i === 0 ? { ...beam, thetaDeg } : beam)) },
});
