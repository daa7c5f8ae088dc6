import type { EditionUse } from '../../shared/contracts/library';
import type { PersonName } from '../../shared/contracts/common';
import type { DesignDocument } from '../../shared/model/design-document';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { versionTag } from '../http/etag';
import type { DesignContent } from './design-content-service';
import type { Draft } from './draft-entity';
import { DraftRepository } from './draft-repository';
import type { Panel } from './panel-entity';
import { PanelRepository } from './panel-repository';
import type { Project } from './project-entity';
import { ProjectRepository } from './project-repository';

export type NamesOfPeople = (transaction: Transaction, ids: readonly string[]) => Promise<ReadonlyMap<string, string>>;

/** A panel with its draft, as other features see it. */
export interface PanelState {
  readonly id: string;
  readonly name: string;
  readonly createdAt: Date;
  readonly project: { readonly id: string; readonly name: string; readonly invented: boolean };
  readonly design: DesignDocument;
  readonly hash: string;
  readonly version: number;
  readonly etag: string;
  readonly changedAt: Date;
  readonly changedBy: PersonName;
}

/** Who changes something, with the team they act in. */
export interface Actor {
  readonly teamId: string;
  readonly person: PersonName;
}

/** Drafts of panels: reading, and the one way to change them. */
export class DraftService {
  private readonly projects = new ProjectRepository();
  private readonly panels = new PanelRepository();
  private readonly drafts = new DraftRepository();

  constructor(
    private readonly ground: Pick<Ground, 'now'>,
    private readonly namesOfPeople: NamesOfPeople,
  ) {}

  /** @throws NotFound */
  async require(transaction: Transaction, teamId: string, panelId: string): Promise<PanelState> {
    return this.stateOf(transaction, await this.panels.require(transaction, teamId, panelId));
  }

  /** The same with the draft locked until the transaction ends, so that neither it nor the panel's numbers change meanwhile. @throws NotFound */
  async lock(transaction: Transaction, teamId: string, panelId: string): Promise<PanelState> {
    await this.drafts.requireLocked(transaction, teamId, panelId);
    return this.require(transaction, teamId, panelId);
  }

  /** All panels of a team, oldest first. */
  async list(transaction: Transaction, teamId: string, projectId?: string): Promise<PanelState[]> {
    const panels = await this.panels.list(transaction, teamId, projectId);
    const projects = new Map((await this.projects.list(transaction, teamId)).map((project) => [project.id, project]));
    const drafts = new Map((await this.drafts.ofPanels(transaction, teamId, panels.map(({ id }) => id))).map((draft) => [draft.id, draft]));
    const names = await this.namesOfPeople(transaction, [...new Set([...drafts.values()].map(({ changedBy }) => changedBy))]);
    return panels.flatMap((panel) => {
      const draft = drafts.get(panel.id);
      const project = projects.get(panel.projectId);
      return draft === undefined || project === undefined ? [] : [panelState({ panel, project, draft, names })];
    });
  }

  /** Writes the content if the draft still has this version; false when someone was faster. */
  async replace(transaction: Transaction, actor: Actor, at: { panelId: string; version: number }, content: DesignContent): Promise<boolean> {
    const values = this.rowOf(actor, content);
    return this.drafts.replace(transaction, actor.teamId, { id: at.panelId, version: at.version }, values);
  }

  async insert(transaction: Transaction, actor: Actor, panelId: string, content: DesignContent): Promise<void> {
    await this.drafts.insert(transaction, actor.teamId, { id: panelId, version: 1, ...this.rowOf(actor, content) });
  }

  async usesOfEdition(transaction: Transaction, teamId: string, editionId: string): Promise<EditionUse[]> {
    const using = new Set((await this.drafts.onEdition(transaction, teamId, editionId)).map(({ id }) => id));
    const panels = using.size === 0 ? [] : await this.list(transaction, teamId);
    return panels
      .filter(({ id }) => using.has(id))
      .map(({ id, name, project }) => ({ projectName: project.name, panelId: id, panelName: name, revisionId: null, revisionNumber: null }));
  }

  async countUses(transaction: Transaction, teamId: string): Promise<{ editionId: string; count: number }[]> {
    return this.drafts.countByEdition(transaction, teamId);
  }

  private rowOf({ person }: Actor, { design, edition, hash }: DesignContent): Pick<Draft, 'design' | 'hash' | 'editionId' | 'changedAt' | 'changedBy'> {
    return { design, hash, editionId: edition?.id ?? null, changedAt: this.ground.now(), changedBy: person.id };
  }

  private async stateOf(transaction: Transaction, panel: Panel): Promise<PanelState> {
    const draft = await this.drafts.require(transaction, panel.teamId, panel.id);
    const project = await this.projects.require(transaction, panel.teamId, panel.projectId);
    const names = await this.namesOfPeople(transaction, [draft.changedBy]);
    return panelState({ panel, project, draft, names });
  }
}

function panelState(of: { panel: Panel; project: Project; draft: Draft; names: ReadonlyMap<string, string> }): PanelState {
  const { panel, project, draft, names } = of;
  return {
    id: panel.id,
    name: panel.name,
    createdAt: panel.createdAt,
    project: { id: project.id, name: project.name, invented: project.invented },
    design: draft.design,
    hash: draft.hash,
    version: draft.version,
    etag: versionTag(draft.version),
    changedAt: draft.changedAt,
    changedBy: { id: draft.changedBy, name: names.get(draft.changedBy) ?? 'unknown' },
  };
}
