import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { panelDetail, project, projectList } from '../../../shared/contracts/projects';
import type { PanelDetail, Project } from '../../../shared/contracts/projects';
import type { DesignDocument } from '../../../shared/model/design-document';

export interface NewPanel {
  readonly name: string;
  readonly design?: DesignDocument;
  readonly copyOfPanelId?: string;
}

/** Projects and the panels in them. Rejects with HttpErrorResponse: see `failed-call.ts`. */
@Injectable({ providedIn: 'root' })
export class ProjectClient {
  private readonly http = inject(HttpClient);

  async list(): Promise<readonly Project[]> {
    return projectList.parse(await firstValueFrom(this.http.get('/api/projects'))).items;
  }

  async create(name: string): Promise<Project> {
    return project.parse(await firstValueFrom(this.http.post('/api/projects', { name })));
  }

  async rename({ id, version }: Project, name: string): Promise<Project> {
    const headers = { 'If-Match': `"v${version}"` };
    return project.parse(await firstValueFrom(this.http.patch(`/api/projects/${encodeURIComponent(id)}`, { name }, { headers })));
  }

  async addPanel(projectId: string, panel: NewPanel): Promise<PanelDetail> {
    return panelDetail.parse(await firstValueFrom(this.http.post(`/api/projects/${encodeURIComponent(projectId)}/panels`, panel)));
  }

  /** Reads the panel first: renaming it is a change of the draft that was seen. */
  async renamePanel(panelId: string, name: string): Promise<PanelDetail> {
    const address = `/api/panels/${encodeURIComponent(panelId)}`;
    const { etag } = panelDetail.parse(await firstValueFrom(this.http.get(address)));
    return panelDetail.parse(await firstValueFrom(this.http.patch(address, { name }, { headers: { 'If-Match': etag } })));
  }
}
