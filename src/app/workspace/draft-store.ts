import { DOCUMENT, Injectable, computed, inject, signal } from '@angular/core';
import type { DraftSaved, PanelDetail, RevisionHeader } from '../../../shared/contracts/projects';
import type { DesignDocument } from '../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { DraftClient } from '../api/draft-client';
import { conflictFields, mergedDesign, sameDesign } from './design-differences';
import type { ChosenSide, ConflictField, ThreeDesigns } from './design-differences';
import { DraftAutosave } from './draft-autosave';
import { dropDraftCopy, keepDraftCopy, readDraftCopy } from './draft-copy';
import { beginHistory, recordChange, redoStep, undoStep } from './draft-history';
import type { DraftHistory } from './draft-history';
import type { SaveProgress } from './save-progress';
import type { ChangeOptions } from './workspace-state';

/** The draft on the server went on while this one changed. */
export interface DraftConflict {
  readonly current: PanelDetail;
  readonly fields: readonly ConflictField[];
}

/** The draft of the open panel: its history of steps and its way to the server. */
@Injectable()
export class DraftStore {
  private readonly client = inject(DraftClient);
  private readonly storage = inject(DOCUMENT).defaultView?.sessionStorage ?? null;

  private readonly panelNow = signal<PanelDetail | null>(null);
  private readonly history = signal<DraftHistory>(beginHistory(STARTING_DESIGN));
  private readonly progress = signal<SaveProgress>({ kind: 'saved', at: 0 });
  private readonly conflictNow = signal<DraftConflict | null>(null);
  /** The newest design that the server is known to hold: where a conflict branches off. */
  private savedDesign: DesignDocument = STARTING_DESIGN;
  private autosave: DraftAutosave | null = null;

  readonly panel = this.panelNow.asReadonly();
  readonly saveState = this.progress.asReadonly();
  readonly conflict = this.conflictNow.asReadonly();
  readonly design = computed(() => this.history().design);
  /** Names of the next steps to be undone and redone, or null. */
  readonly undoName = computed(() => this.history().done.at(-1)?.name ?? null);
  readonly redoName = computed(() => this.history().undone.at(-1)?.name ?? null);

  get hasUnsaved(): boolean {
    return this.autosave?.hasUnsaved ?? false;
  }

  /** Shows a panel. Work of this browser tab that never reached the server comes back as an undoable step. */
  open(panel: PanelDetail, canEdit: boolean): void {
    this.close();
    this.panelNow.set(panel);
    this.history.set(beginHistory(panel.design));
    this.savedDesign = panel.design;
    this.progress.set(canEdit ? { kind: 'saved', at: Date.parse(panel.changedAt) } : { kind: 'view-only' });
    if (!canEdit) return;
    this.autosave = this.autosaveOf(panel);
    this.restoreCopy(panel);
  }

  close(): void {
    this.autosave?.stop();
    this.autosave = null;
    this.conflictNow.set(null);
    this.panelNow.set(null);
  }

  change(name: string, next: (design: DesignDocument) => DesignDocument, options: ChangeOptions = {}): void {
    if (!this.autosave) return;
    const design = next(this.design());
    this.follow(recordChange(this.history(), { name, design, at: Date.now(), ...options }));
  }

  undo(): void {
    if (this.autosave) this.follow(undoStep(this.history()));
  }

  redo(): void {
    if (this.autosave) this.follow(redoStep(this.history()));
  }

  /** Sends what waits; true when the server then holds the design on the screen. */
  async flush(): Promise<boolean> {
    await this.autosave?.flush();
    return this.autosave === null || (!this.autosave.hasUnsaved && this.progress().kind === 'saved');
  }

  /** Joins the two states as chosen field by field and goes on from there. */
  resolveConflict(choices: Readonly<Record<string, ChosenSide>>): void {
    const conflict = this.conflictNow();
    if (!conflict || !this.autosave) return;
    const { current } = conflict;
    const joined = mergedDesign(this.designsAgainst(current), choices);
    this.conflictNow.set(null);
    this.panelNow.set(current);
    this.savedDesign = current.design;
    this.autosave.resume(current.etag);
    this.history.set(recordChange(this.history(), { name: `Join changes of ${current.changedBy.name}`, design: joined, at: Date.now() }));
    this.send(joined);
  }

  /** The draft was frozen as this revision, when it had this ETag. */
  acceptRevision(revision: RevisionHeader, etag: string): void {
    this.panelNow.update((panel) => panel && { ...panel, latestRevision: revision, draftIsRevision: panel.etag === etag });
  }

  private follow(history: DraftHistory): void {
    if (history === this.history()) return;
    this.history.set(history);
    this.send(history.design);
  }

  private send(design: DesignDocument): void {
    const panel = this.panelNow();
    if (!panel || !this.autosave) return;
    if (this.storage) keepDraftCopy(this.storage, panel.id, { design, base: this.savedDesign, etag: panel.etag });
    this.autosave.queue(design);
  }

  private autosaveOf(panel: PanelDetail): DraftAutosave {
    return new DraftAutosave(
      {
        send: (design, etag) => this.client.save(panel.id, design, etag),
        showProgress: (progress) => this.progress.set(progress),
        acceptSaved: (saved, design) => this.acceptSaved(saved, design),
        meetConflict: (current) => this.meetConflict(current),
        now: () => Date.now(),
      },
      panel.etag,
    );
  }

  private acceptSaved(saved: DraftSaved, design: DesignDocument): void {
    this.savedDesign = design;
    this.panelNow.update((panel) => panel && { ...panel, ...saved, design });
    const panel = this.panelNow();
    if (!panel || !this.storage) return;
    if (sameDesign(design, this.design())) dropDraftCopy(this.storage, panel.id);
    else keepDraftCopy(this.storage, panel.id, { design: this.design(), base: design, etag: saved.etag });
  }

  private meetConflict(current: PanelDetail): void {
    this.conflictNow.set({ current, fields: conflictFields(this.designsAgainst(current)) });
  }

  private designsAgainst(current: PanelDetail): ThreeDesigns {
    return { base: this.savedDesign, mine: this.design(), theirs: current.design };
  }

  private restoreCopy(panel: PanelDetail): void {
    const copy = this.storage ? readDraftCopy(this.storage, panel.id) : null;
    if (!copy || sameDesign(copy.design, panel.design)) return;
    this.history.set(recordChange(this.history(), { name: 'Restore unsaved work', design: copy.design, at: Date.now() }));
    this.savedDesign = copy.base;
    if (copy.etag === panel.etag || sameDesign(copy.base, panel.design)) {
      this.savedDesign = panel.design;
      this.send(copy.design);
      return;
    }
    this.autosave?.hold(copy.design);
    this.progress.set({ kind: 'conflict' });
    this.meetConflict(panel);
  }
}
