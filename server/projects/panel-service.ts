import { randomUUID } from 'node:crypto';
import type { DraftSaved, PanelDetail, RevisionHeader } from '../../shared/contracts/projects';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { versionTag } from '../http/etag';
import { InvalidInput, StaleVersion } from '../http/problems';
import type { RevisionService } from '../revisions/revision-service';
import type { DesignContentService } from './design-content-service';
import { DraftRepository } from './draft-repository';
import type { Actor, DraftService, PanelState } from './draft-service';
import { PanelRepository } from './panel-repository';
import { ProjectRepository } from './project-repository';

export interface PanelServiceParts {
  readonly ground: Pick<Ground, 'transactions' | 'now'>;
  readonly drafts: DraftService;
  readonly contents: DesignContentService;
  readonly revisions: RevisionService;
  readonly audit: AuditService;
}

export interface NewPanelValues {
  readonly name: string;
  readonly design?: DesignDocument;
  readonly copyOfPanelId?: string;
}

/** Panels and the saving of their drafts. */
export class PanelService {
  private readonly projects = new ProjectRepository();
  private readonly panels = new PanelRepository();
  private readonly draftRows = new DraftRepository();

  constructor(private readonly parts: PanelServiceParts) {}

  /** @throws NotFound */
  async detail(teamId: string, panelId: string): Promise<PanelDetail> {
    return this.parts.ground.transactions.run((transaction) => this.detailIn(transaction, teamId, panelId), 'REPEATABLE READ');
  }

  /** @throws NotFound for the project or the panel to copy; InvalidInput for an unknown edition */
  async create(actor: Actor, projectId: string, values: NewPanelValues): Promise<PanelDetail> {
    if (values.design !== undefined && values.copyOfPanelId !== undefined) {
      throw new InvalidInput([{ pointer: '#/copyOfPanelId', detail: 'cannot go with "design": give one of them or none' }]);
    }
    const { ground, drafts, contents, audit } = this.parts;
    const content = await contents.contentOf(actor.teamId, await this.firstDesign(actor.teamId, values));
    return ground.transactions.run(async (transaction) => {
      const project = await this.projects.require(transaction, actor.teamId, projectId);
      const panel = { id: randomUUID(), projectId: project.id, name: values.name, createdAt: ground.now() };
      await this.panels.insert(transaction, actor.teamId, panel);
      await drafts.insert(transaction, actor, panel.id, content);
      await audit.record(transaction, {
        teamId: actor.teamId,
        personId: actor.person.id,
        action: 'panel.created',
        object: `panel:${panel.id}`,
        detail: { project: project.id, name: panel.name, after: content.hash, ...(values.copyOfPanelId === undefined ? {} : { copyOf: values.copyOfPanelId }) },
      });
      return this.detailIn(transaction, actor.teamId, panel.id);
    });
  }

  /** @throws NotFound, StaleVersion */
  async rename(actor: Actor, panelId: string, change: { name: string; ifMatch: string }): Promise<PanelDetail> {
    const { ground, drafts, audit } = this.parts;
    return ground.transactions.run(async (transaction) => {
      const before = await drafts.lock(transaction, actor.teamId, panelId);
      if (before.etag !== change.ifMatch) throw await this.stale(transaction, actor.teamId, panelId);
      await this.panels.update(transaction, actor.teamId, panelId, { name: change.name });
      await this.draftRows.update(transaction, actor.teamId, panelId, { version: before.version + 1, changedAt: ground.now(), changedBy: actor.person.id });
      await audit.record(transaction, {
        teamId: actor.teamId,
        personId: actor.person.id,
        action: 'panel.renamed',
        object: `panel:${panelId}`,
        detail: { before: before.name, after: change.name },
      });
      return this.detailIn(transaction, actor.teamId, panelId);
    });
  }

  /** Replaces the design of the draft that the caller read. @throws NotFound, StaleVersion with the panel as it is now, InvalidInput */
  async saveDraft(actor: Actor, panelId: string, change: { design: DesignDocument; ifMatch: string }): Promise<DraftSaved> {
    const { ground, drafts, contents, revisions, audit } = this.parts;
    await ground.transactions.read((transaction) => this.panels.require(transaction, actor.teamId, panelId));
    const content = await contents.contentOf(actor.teamId, change.design);
    return ground.transactions.run(async (transaction) => {
      const before = await drafts.require(transaction, actor.teamId, panelId);
      const isCurrent = before.etag === change.ifMatch && (await drafts.replace(transaction, actor, { panelId, version: before.version }, content));
      if (!isCurrent) throw await this.stale(transaction, actor.teamId, panelId);
      await audit.record(transaction, {
        teamId: actor.teamId,
        personId: actor.person.id,
        action: 'draft.saved',
        object: `panel:${panelId}`,
        detail: { version: before.version + 1, before: before.hash, after: content.hash },
      });
      const saved = await drafts.require(transaction, actor.teamId, panelId);
      const latest = await revisions.latestOfPanels(transaction, actor.teamId, [panelId]);
      return {
        etag: versionTag(saved.version),
        draftHash: saved.hash,
        changedAt: saved.changedAt.toISOString(),
        draftIsRevision: latest.get(panelId)?.hash === saved.hash,
      };
    });
  }

  private async firstDesign(teamId: string, { design, copyOfPanelId }: NewPanelValues): Promise<DesignDocument> {
    if (copyOfPanelId === undefined) return design ?? STARTING_DESIGN;
    const { ground, drafts } = this.parts;
    return (await ground.transactions.read((transaction) => drafts.require(transaction, teamId, copyOfPanelId))).design;
  }

  private async detailIn(transaction: Transaction, teamId: string, panelId: string): Promise<PanelDetail> {
    const state = await this.parts.drafts.require(transaction, teamId, panelId);
    const latest = await this.parts.revisions.latestOfPanels(transaction, teamId, [panelId]);
    return panelDetailOf(state, latest.get(panelId) ?? null);
  }

  private async stale(transaction: Transaction, teamId: string, panelId: string): Promise<StaleVersion> {
    const current = await this.detailIn(transaction, teamId, panelId);
    return new StaleVersion(current.etag, current);
  }
}

function panelDetailOf(state: PanelState, latestRevision: RevisionHeader | null): PanelDetail {
  return {
    id: state.id,
    project: { ...state.project },
    name: state.name,
    design: state.design,
    draftHash: state.hash,
    etag: state.etag,
    changedAt: state.changedAt.toISOString(),
    changedBy: state.changedBy,
    latestRevision,
    draftIsRevision: latestRevision?.hash === state.hash,
  };
}
