import { DestroyRef, Injectable, computed, effect, inject, signal, untracked } from '@angular/core';
import type { Signal } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { filter, map } from 'rxjs';
import type { Problem } from '../../../shared/contracts/common';
import type { CutRequest } from '../../../shared/contracts/predictions';
import type { RevisionDetail } from '../../../shared/contracts/projects';
import type { DesignDocument } from '../../../shared/model/design-document';
import { DraftClient } from '../api/draft-client';
import { LibraryClient } from '../api/library-client';
import { PredictionClient } from '../api/prediction-client';
import { DraftStore } from './draft-store';
import { livePredictions } from './live-prediction';
import type { LiveOutcome, PredictionAsk } from './live-prediction';
import type { LivePrediction } from './live-prediction-data';
import type { ChangeOptions, EditionInUse, WorkspaceState } from './workspace-state';

export type Opening = { readonly kind: 'opening' } | { readonly kind: 'open' } | { readonly kind: 'not-there'; readonly problem: Problem } | { readonly kind: 'unreachable' };

/** The open panel: its draft, what is predicted of it, of its parent, and the edition it stands on. */
@Injectable()
export class WorkspaceStore implements WorkspaceState {
  private readonly drafts = inject(DraftStore);
  private readonly draftClient = inject(DraftClient);
  private readonly predictionClient = inject(PredictionClient);
  private readonly libraryClient = inject(LibraryClient);

  /** Compared by content: a sheet names its cuts anew with every step of the beam, and each change here is a prediction. */
  private readonly cutsAsked = signal<readonly CutRequest[]>([], { equal: (a, b) => JSON.stringify(a) === JSON.stringify(b) });
  private readonly uvSizeAsked = signal(0);
  private readonly harmonicAsked = signal<number | null>(null);
  private readonly predictionNow = signal<LivePrediction | null>(null);
  private readonly failureNow = signal<{ readonly problem: Problem; readonly of: DesignDocument } | null>(null);
  private readonly parentNow = signal<LivePrediction | null>(null);
  private readonly parentRevision = signal<RevisionDetail | null>(null);
  private readonly editionNow = signal<EditionInUse | null>(null);
  private readonly editionFailureNow = signal<string | null>(null);
  private readonly viewOnlyNow = signal<string | null>(null);
  private readonly openingNow = signal<Opening>({ kind: 'opening' });

  readonly panel = this.drafts.panel;
  readonly design = this.drafts.design;
  readonly saveState = this.drafts.saveState;
  readonly opening = this.openingNow.asReadonly();
  readonly prediction = this.predictionNow.asReadonly();
  readonly parentPrediction = this.parentNow.asReadonly();
  readonly edition = this.editionNow.asReadonly();
  /** Why the edition that the design names cannot be shown. */
  readonly editionFailure = this.editionFailureNow.asReadonly();
  readonly viewOnlyReason = this.viewOnlyNow.asReadonly();
  readonly canEdit = computed(() => this.viewOnlyReason() === null && this.panel() !== null);
  readonly stale = computed(() => this.prediction() !== null && this.prediction()?.of !== this.design());
  readonly failure: Signal<Problem | null> = computed(() => {
    const failure = this.failureNow();
    return failure && failure.of === this.design() ? failure.problem : null;
  });

  constructor() {
    this.followDraft();
    this.followParent();
    effect(() => void this.readParent(this.panel()?.latestRevision?.id ?? null));
    const editionId = computed(() => {
      const { cells } = this.design();
      return this.panel() && cells.kind === 'edition' ? cells.editionId : null;
    });
    effect(() => void this.readEdition(editionId()));
    inject(DestroyRef).onDestroy(() => void this.leave());
  }

  /** Reads a panel and shows it; with a reason nothing can be changed. */
  async open(panelId: string, viewOnlyReason: string | null): Promise<void> {
    await this.leave();
    this.openingNow.set({ kind: 'opening' });
    const outcome = await this.draftClient.read(panelId);
    if (outcome.kind === 'refused') this.openingNow.set({ kind: 'not-there', problem: outcome.problem });
    else if (outcome.kind === 'unreachable') this.openingNow.set(outcome);
    else {
      this.viewOnlyNow.set(viewOnlyReason);
      this.drafts.open(outcome.panel, viewOnlyReason === null);
      this.openingNow.set({ kind: 'open' });
    }
  }

  change(name: string, next: (design: DesignDocument) => DesignDocument, options?: ChangeOptions): void {
    this.drafts.change(name, next, options);
  }

  undo(): void {
    this.drafts.undo();
  }

  redo(): void {
    this.drafts.redo();
  }

  requestCuts(cuts: readonly CutRequest[]): void {
    this.cutsAsked.set(cuts);
  }

  requestHarmonic(order: number | null): void {
    this.harmonicAsked.set(order);
  }

  requestUv(size: number): void {
    this.uvSizeAsked.set(size);
  }

  /** Sends what waits and forgets the panel. */
  private async leave(): Promise<void> {
    if (!untracked(this.panel)) return;
    await this.drafts.flush();
    this.drafts.close();
    this.predictionNow.set(null);
    this.failureNow.set(null);
    this.parentNow.set(null);
    this.editionNow.set(null);
  }

  private followDraft(): void {
    const ask = computed((): PredictionAsk | null =>
      this.panel() ? { design: this.design(), cuts: this.cutsAsked(), uvSize: this.uvSizeAsked(), harmonic: this.harmonicAsked() } : null,
    );
    this.outcomesOf(ask, 'draft').subscribe((outcome) => {
      if (outcome.kind === 'failed') this.failureNow.set(outcome);
      else {
        this.failureNow.set(null);
        this.predictionNow.set(outcome.prediction);
      }
    });
  }

  private followParent(): void {
    const ask = computed((): PredictionAsk | null => {
      const revision = this.parentRevision();
      return revision ? { design: revision.design, cuts: this.cutsAsked(), uvSize: this.uvSizeAsked() } : null;
    });
    this.outcomesOf(ask, 'parent').subscribe((outcome) => this.parentNow.set(outcome.kind === 'predicted' ? outcome.prediction : null));
  }

  private outcomesOf(ask: Signal<PredictionAsk | null>, part: 'draft' | 'parent') {
    const asks = toObservable(ask).pipe(filter((value) => value !== null));
    return livePredictions(asks, (request) => this.predictionClient.predict(request, `${part}-${this.panel()?.id ?? 'none'}`)).pipe(
      map((outcome): LiveOutcome => outcome),
      takeUntilDestroyed(),
    );
  }

  private async readParent(revisionId: string | null): Promise<void> {
    if (untracked(this.parentRevision)?.id === revisionId) return;
    this.parentRevision.set(null);
    this.parentNow.set(null);
    if (revisionId === null) return;
    const outcome = await this.draftClient.readRevision(revisionId);
    // Another panel may have been opened meanwhile.
    if (outcome.kind === 'found' && untracked(this.panel)?.latestRevision?.id === revisionId) this.parentRevision.set(outcome.revision);
  }

  private async readEdition(editionId: string | null): Promise<void> {
    this.editionFailureNow.set(null);
    if (untracked(this.edition)?.id === editionId) return;
    this.editionNow.set(null);
    if (editionId === null) return;
    const found = await this.libraryClient.edition(editionId);
    const { cells } = untracked(this.design);
    if (cells.kind !== 'edition' || cells.editionId !== editionId) return;
    if (found.kind === 'found') this.editionNow.set(found.edition);
    else this.editionFailureNow.set(found.reason);
  }
}
