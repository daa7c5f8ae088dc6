import { computed, signal } from '@angular/core';
import type { Problem } from '../../../../shared/contracts/common';
import type { PanelDetail } from '../../../../shared/contracts/projects';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { beginHistory, recordChange, redoStep, undoStep } from '../draft-history';
import type { LivePrediction } from '../live-prediction-data';
import type { SaveProgress } from '../save-progress';
import type { ChangeOptions, EditionInUse, WorkspaceState } from '../workspace-state';

/** A workspace without a server, for specs of sheets and fields: the design changes, the rest is set by the spec. */
export class FakeWorkspace implements WorkspaceState {
  readonly history = signal(beginHistory(STARTING_DESIGN));
  readonly panel = signal<PanelDetail | null>(null);
  readonly prediction = signal<LivePrediction | null>(null);
  readonly parentPrediction = signal<LivePrediction | null>(null);
  readonly edition = signal<EditionInUse | null>(null);
  readonly editionFailure = signal<string | null>(null);
  readonly failure = signal<Problem | null>(null);
  readonly viewOnlyReason = signal<string | null>(null);
  readonly saveState = signal<SaveProgress>({ kind: 'saved', at: 0 });
  readonly design = computed(() => this.history().design);
  readonly stale = computed(() => this.prediction() !== null && this.prediction()?.of !== this.design());
  readonly canEdit = computed(() => this.viewOnlyReason() === null);
  readonly stepNames = computed(() => this.history().done.map(({ name }) => name));

  constructor(design: DesignDocument = STARTING_DESIGN) {
    this.history.set(beginHistory(design));
  }

  change(name: string, next: (design: DesignDocument) => DesignDocument, options: ChangeOptions = {}): void {
    this.history.update((history) => recordChange(history, { name, design: next(history.design), at: Date.now(), ...options }));
  }

  undo(): void {
    this.history.update(undoStep);
  }

  redo(): void {
    this.history.update(redoStep);
  }

  requestCuts(): void {
    // Nothing is predicted here.
  }

  requestUv(): void {
    // Nothing is predicted here.
  }
}
