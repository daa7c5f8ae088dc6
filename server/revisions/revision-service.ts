import { randomUUID } from 'node:crypto';
import type { EditionUse } from '../../shared/contracts/library';
import type { RevisionDetail, RevisionHeader, RevisionListItem } from '../../shared/contracts/projects';
import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { refuseStale } from '../http/etag';
import type { FigureService } from '../predictions/figure-service';
import type { DesignContent, DesignContentService } from '../projects/design-content-service';
import type { Actor, DraftService, PanelState } from '../projects/draft-service';
import { ContentRepository } from './content-repository';
import { frozenContent } from './frozen-content';
import type { Revision } from './revision-entity';
import { RevisionRepository } from './revision-repository';
import { revisionHeaderOf } from './revision-view';

export interface RevisionServiceParts {
  readonly ground: Pick<Ground, 'transactions' | 'now'>;
  readonly drafts: DraftService;
  readonly contents: DesignContentService;
  readonly figures: FigureService;
  readonly audit: AuditService;
}

/** A revision with what it froze. */
export interface FrozenRevision {
  readonly header: RevisionHeader;
  readonly panelName: string;
  readonly projectName: string;
  readonly content: DesignContent;
}

interface Freezing {
  readonly panel: PanelState;
  readonly content: DesignContent;
  readonly message: string;
  readonly restoredFromNumber: number | null;
}

/** Revisions: history that only grows. */
export class RevisionService {
  private readonly revisions = new RevisionRepository();
  private readonly contents = new ContentRepository();

  constructor(private readonly parts: RevisionServiceParts) {}

  /** Newest first, with the headline figures of each. @throws NotFound */
  async list(teamId: string, panelId: string): Promise<RevisionListItem[]> {
    const { ground, drafts, figures } = this.parts;
    const found = await ground.transactions.run(async (transaction) => {
      await drafts.require(transaction, teamId, panelId);
      const rows = await this.revisions.ofPanel(transaction, teamId, panelId);
      const frozen: { row: Revision; content: DesignContent }[] = [];
      for (const row of rows) frozen.push({ row, content: await this.contentOf(transaction, row) });
      return frozen;
    }, 'REPEATABLE READ');
    const headlines = await figures.headlinesOf(teamId, found.map(({ content }) => content));
    return found.map(({ row }, i) => ({ ...revisionHeaderOf(row), ...headlines[i] }));
  }

  /** @throws NotFound */
  async detail(teamId: string, revisionId: string): Promise<RevisionDetail> {
    return this.detailOf(teamId, await this.frozen(teamId, revisionId));
  }

  /** @throws NotFound */
  async frozen(teamId: string, revisionId: string): Promise<FrozenRevision> {
    return this.parts.ground.transactions.read(async (transaction) => {
      const row = await this.revisions.require(transaction, teamId, revisionId);
      const { panelName, projectName } = row;
      return { header: revisionHeaderOf(row), panelName, projectName, content: await this.contentOf(transaction, row) };
    });
  }

  /** Freezes the draft that the caller read. @throws NotFound, StaleVersion, InvalidInput when it cannot be predicted */
  async freeze(actor: Actor, panelId: string, { message, ifMatch }: { message: string; ifMatch: string }): Promise<RevisionDetail> {
    const { ground, drafts, contents, figures } = this.parts;
    const read = await ground.transactions.read((transaction) => drafts.require(transaction, actor.teamId, panelId));
    refuseStale(ifMatch, read.etag);
    const content = await contents.contentOf(actor.teamId, read.design);
    // Also the check that it can be predicted at all, before anything is written.
    await figures.figuresOf(actor.teamId, content);
    const row = await ground.transactions.run(async (transaction) => {
      const panel = await drafts.lock(transaction, actor.teamId, panelId);
      refuseStale(ifMatch, panel.etag);
      return this.append(transaction, actor, { panel, content, message, restoredFromNumber: null });
    });
    return this.detail(actor.teamId, row.id);
  }

  /** Makes a new revision with the content of an old one; the draft follows. @throws NotFound */
  async restore(actor: Actor, revisionId: string, message: string): Promise<RevisionDetail> {
    const { ground, drafts } = this.parts;
    const row = await ground.transactions.run(async (transaction) => {
      const old = await this.revisions.require(transaction, actor.teamId, revisionId);
      const content = await this.contentOf(transaction, old);
      const panel = await drafts.lock(transaction, actor.teamId, old.panelId);
      // The draft is locked, so its version is the current one.
      const replaced = await drafts.replace(transaction, actor, { panelId: panel.id, version: panel.version }, content);
      if (!replaced) throw new Error(`the locked draft of panel ${panel.id} changed its version`);
      return this.append(transaction, actor, { panel, content, message, restoredFromNumber: old.number });
    });
    return this.detail(actor.teamId, row.id);
  }

  async latestOfPanels(transaction: Transaction, teamId: string, panelIds: readonly string[]): Promise<ReadonlyMap<string, RevisionHeader>> {
    const rows = await this.revisions.latestOfPanels(transaction, teamId, panelIds);
    return new Map(rows.map((row) => [row.panelId, revisionHeaderOf(row)]));
  }

  /** Drafts and revisions that stand on an edition. */
  async usesOfEdition(teamId: string, editionId: string): Promise<EditionUse[]> {
    return this.parts.ground.transactions.read(async (transaction) => {
      const drafts = await this.parts.drafts.usesOfEdition(transaction, teamId, editionId);
      const rows = await this.revisions.onEdition(transaction, teamId, editionId);
      const frozen = rows.map(({ id, number, panelId, panelName, projectName }) => ({ projectName, panelId, panelName, revisionId: id, revisionNumber: number }));
      return [...frozen, ...drafts];
    });
  }

  /** How many drafts and revisions stand on each edition of the team. */
  async countUses(teamId: string): Promise<ReadonlyMap<string, number>> {
    return this.parts.ground.transactions.read(async (transaction) => {
      const counts = new Map<string, number>();
      const rows = [...(await this.parts.drafts.countUses(transaction, teamId)), ...(await this.revisions.countByEdition(transaction, teamId))];
      for (const { editionId, count } of rows) counts.set(editionId, (counts.get(editionId) ?? 0) + count);
      return counts;
    });
  }

  /** The panel's draft is locked, so numbers have no gaps and never repeat. */
  private async append(transaction: Transaction, actor: Actor, { panel, content, message, restoredFromNumber }: Freezing): Promise<Revision> {
    const { ground, audit } = this.parts;
    const parent = await this.revisions.latest(transaction, actor.teamId, panel.id);
    const row = await this.revisions.insert(transaction, actor.teamId, {
      id: randomUUID(),
      panelId: panel.id,
      number: (parent?.number ?? 0) + 1,
      hash: content.hash,
      parentId: parent?.id ?? null,
      parentNumber: parent?.number ?? null,
      restoredFromNumber,
      editionId: content.edition?.id ?? null,
      panelName: panel.name,
      projectName: panel.project.name,
      authorId: actor.person.id,
      authorName: actor.person.name,
      message,
      createdAt: ground.now(),
    });
    await this.contents.keep(transaction, { teamId: actor.teamId, revisionId: row.id }, content.parts);
    await audit.record(transaction, {
      teamId: actor.teamId,
      personId: actor.person.id,
      action: restoredFromNumber === null ? 'revision.frozen' : 'revision.restored',
      object: `revision:${row.id}`,
      detail: { panel: panel.id, number: row.number, hash: row.hash, message, ...(restoredFromNumber === null ? {} : { restoredFrom: restoredFromNumber }) },
    });
    return row;
  }

  private async contentOf(transaction: Transaction, { id, teamId, hash }: Revision): Promise<DesignContent> {
    return frozenContent(await this.contents.ofRevision(transaction, teamId, id), hash);
  }

  private async detailOf(teamId: string, { header, panelName, projectName, content }: FrozenRevision): Promise<RevisionDetail> {
    const { figures, verdicts, warnings } = await this.parts.figures.figuresOf(teamId, content);
    const edition = content.edition === null ? null : { id: content.edition.id, familyName: content.edition.familyName, number: content.edition.number };
    return { ...header, panelName, projectName, design: content.design, figures, verdicts, warnings, edition };
  }
}
