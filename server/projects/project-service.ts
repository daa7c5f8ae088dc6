import { randomUUID } from 'node:crypto';
import type { PanelOverview, Project as ProjectReply, RevisionHeader } from '../../shared/contracts/projects';
import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import { refuseStale, versionTag } from '../http/etag';
import type { FigureService, Headline } from '../predictions/figure-service';
import type { RevisionService } from '../revisions/revision-service';
import type { Actor, DraftService, PanelState } from './draft-service';
import type { Project } from './project-entity';
import { ProjectRepository } from './project-repository';

export interface ProjectServiceParts {
  readonly ground: Pick<Ground, 'transactions' | 'now'>;
  readonly drafts: DraftService;
  readonly revisions: RevisionService;
  readonly figures: FigureService;
  readonly audit: AuditService;
}

interface ProjectParts {
  readonly project: Project;
  readonly panels: readonly PanelState[];
  readonly latest: ReadonlyMap<string, RevisionHeader>;
}

/** Projects with an overview of their panels. */
export class ProjectService {
  private readonly projects = new ProjectRepository();

  constructor(private readonly parts: ProjectServiceParts) {}

  /** Oldest first, with the headline figures of every draft. */
  async list(teamId: string): Promise<ProjectReply[]> {
    const { ground, drafts, revisions } = this.parts;
    const found = await ground.transactions.run(async (transaction) => {
      const projects = await this.projects.list(transaction, teamId);
      const panels = await drafts.list(transaction, teamId);
      return { projects, panels, latest: await revisions.latestOfPanels(transaction, teamId, panels.map(({ id }) => id)) };
    }, 'REPEATABLE READ');
    const ofProject = (project: Project): PanelState[] => found.panels.filter((panel) => panel.project.id === project.id);
    return Promise.all(found.projects.map((project) => this.replyOf(teamId, { project, panels: ofProject(project), latest: found.latest })));
  }

  async create(actor: Actor, name: string, { invented = false }: { invented?: boolean } = {}): Promise<ProjectReply> {
    const { ground, audit } = this.parts;
    const project = await ground.transactions.run(async (transaction) => {
      const values = { id: randomUUID(), name, version: 1, invented, createdAt: ground.now(), createdBy: actor.person.id };
      const row = await this.projects.insert(transaction, actor.teamId, values);
      await audit.record(transaction, { teamId: actor.teamId, personId: actor.person.id, action: 'project.created', object: `project:${row.id}`, detail: { name } });
      return row;
    });
    return this.replyOf(actor.teamId, { project, panels: [], latest: new Map() });
  }

  /** @throws NotFound, StaleVersion */
  async rename(actor: Actor, projectId: string, { name, ifMatch }: { name: string; ifMatch: string }): Promise<ProjectReply> {
    const { ground, drafts, revisions, audit } = this.parts;
    const changed = await ground.transactions.run(async (transaction): Promise<ProjectParts> => {
      const before = await this.projects.requireLocked(transaction, actor.teamId, projectId);
      refuseStale(ifMatch, versionTag(before.version));
      const project = { ...before, name, version: before.version + 1 };
      await this.projects.update(transaction, actor.teamId, projectId, { name: project.name, version: project.version });
      const panels = await drafts.list(transaction, actor.teamId, projectId);
      const latest = await revisions.latestOfPanels(transaction, actor.teamId, panels.map(({ id }) => id));
      await audit.record(transaction, {
        teamId: actor.teamId,
        personId: actor.person.id,
        action: 'project.renamed',
        object: `project:${projectId}`,
        detail: { before: before.name, after: name },
      });
      return { project, panels, latest };
    });
    return this.replyOf(actor.teamId, changed);
  }

  private async replyOf(teamId: string, { project, panels, latest }: ProjectParts): Promise<ProjectReply> {
    const { id, name, version, invented, createdAt } = project;
    const headlines = await this.parts.figures.headlinesOf(teamId, panels);
    const overviews = panels.map((panel, i) => overviewOf(panel, latest.get(panel.id) ?? null, headlines[i]));
    return { id, name, version, invented, createdAt: createdAt.toISOString(), panels: overviews };
  }
}

function overviewOf(panel: PanelState, latestRevision: RevisionHeader | null, headline: Headline): PanelOverview {
  return {
    id: panel.id,
    projectId: panel.project.id,
    name: panel.name,
    design: panel.design,
    draftHash: panel.hash,
    ...headline,
    latestRevision,
    draftIsRevision: latestRevision?.hash === panel.hash,
    changedAt: panel.changedAt.toISOString(),
    changedBy: panel.changedBy,
  };
}
