import { idParams, type Role } from '../../shared/contracts/common';
import * as contract from '../../shared/contracts/projects';
import { versionTag } from '../http/etag';
import { Reply } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import type { PanelService } from './panel-service';
import type { ProjectService } from './project-service';

interface Parts {
  readonly projects: ProjectService;
  readonly panels: PanelService;
}

/** A fabricator sees released revisions only, and so no drafts. */
const readers: readonly Role[] = ['designer', 'lab', 'reviewer', 'range', 'administrator'];
const read = { kind: 'signed-in', roles: readers, scope: 'read' } as const;
const edit = { kind: 'signed-in', roles: ['designer'] as readonly Role[], scope: 'design' } as const;

const withTag = (panel: contract.PanelDetail, status?: number): Reply<contract.PanelDetail> =>
  new Reply(panel, { etag: panel.etag, ...(status === undefined ? {} : { status, location: `/api/panels/${panel.id}` }) });

function projectOnlyRoutes({ projects }: Parts): Route[] {
  return [
    defineRoute({
      method: 'get',
      path: '/api/projects',
      summary: 'Projects with their panels and the headline figures of each draft',
      policy: read,
      reply: contract.projectList,
      handler: async ({ caller }) => ({ items: await projects.list(caller.teamId) }),
    }),
    defineRoute({
      method: 'post',
      path: '/api/projects',
      summary: 'Start a project',
      policy: edit,
      body: contract.newProject,
      reply: contract.project,
      status: 201,
      idempotent: true,
      handler: async ({ caller, body }) => {
        const project = await projects.create(caller, body.name);
        return new Reply(project, { status: 201, etag: versionTag(project.version), location: `/api/projects/${project.id}` });
      },
    }),
    defineRoute({
      method: 'patch',
      path: '/api/projects/:id',
      summary: 'Rename a project',
      policy: edit,
      params: idParams,
      body: contract.projectChange,
      reply: contract.project,
      versioned: true,
      handler: async ({ caller, params, body, ifMatch }) => {
        const project = await projects.rename(caller, params.id, { ...body, ifMatch });
        return new Reply(project, { etag: versionTag(project.version) });
      },
    }),
  ];
}

function panelRoutes({ panels }: Parts): Route[] {
  return [
    defineRoute({
      method: 'post',
      path: '/api/projects/:id/panels',
      summary: 'Add a panel: from the starting design, a given design, or the draft of another panel',
      policy: edit,
      params: idParams,
      body: contract.newPanel,
      reply: contract.panelDetail,
      status: 201,
      idempotent: true,
      handler: async ({ caller, params, body }) => withTag(await panels.create(caller, params.id, body), 201),
    }),
    defineRoute({
      method: 'get',
      path: '/api/panels/:id',
      summary: 'A panel with its draft',
      policy: read,
      params: idParams,
      reply: contract.panelDetail,
      handler: async ({ caller, params }) => withTag(await panels.detail(caller.teamId, params.id)),
    }),
    defineRoute({
      method: 'patch',
      path: '/api/panels/:id',
      summary: 'Rename a panel',
      policy: edit,
      params: idParams,
      body: contract.panelChange,
      reply: contract.panelDetail,
      versioned: true,
      handler: async ({ caller, params, body, ifMatch }) => withTag(await panels.rename(caller, params.id, { ...body, ifMatch })),
    }),
    defineRoute({
      method: 'put',
      path: '/api/panels/:id/draft',
      summary: 'Save the draft of a panel; when someone was faster, `current` holds the panel as it is now',
      policy: edit,
      params: idParams,
      body: contract.draftChange,
      reply: contract.draftSaved,
      versioned: true,
      handler: async ({ caller, params, body, ifMatch }) => {
        const saved = await panels.saveDraft(caller, params.id, { ...body, ifMatch });
        return new Reply(saved, { etag: saved.etag });
      },
    }),
  ];
}

export const projectRoutes = (parts: Parts): readonly Route[] => [...projectOnlyRoutes(parts), ...panelRoutes(parts)];
