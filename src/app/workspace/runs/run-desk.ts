import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { filter, firstValueFrom, timeout } from 'rxjs';
import type { RunDetail, RunKind, RunProgress, RunRequest, RunSummary } from '../../../../shared/contracts/runs';
import { outcomeText } from '../../api/call-outcome';
import type { CallOutcome } from '../../api/call-outcome';
import { requestKey } from '../../api/request-key';
import { RunClient } from '../../api/run-client';
import { isSettled } from '../plot-heading';
import { WORKSPACE_STATE } from '../workspace-state';
import { isUnderWay } from './run-text';

/** A draft on its way to the server is waited for this long before a run of it is given up. */
const SAVE_PATIENCE_MS = 8000;
const ASK_AGAIN_MS = 2000;

/**
 * The runs of one kind of the open panel: starting, watching, cancelling, choosing whose result is shown. Knows no kind;
 * a sheet provides it for itself.
 */
@Injectable()
export class RunDesk {
  private readonly client = inject(RunClient);
  private readonly state = inject(WORKSPACE_STATE);
  private readonly saveState = toObservable(this.state.saveState);

  /** Newest first; null until they are read. */
  readonly history = signal<readonly RunSummary[] | null>(null);
  /** The run whose result is shown. */
  readonly shown = signal<RunDetail | null>(null);
  /** Another result to lay over the shown one. */
  readonly against = signal<RunDetail | null>(null);
  readonly trouble = signal('');
  readonly busy = signal(false);
  /** The newest run that waits or computes. */
  readonly underWay = computed(() => this.history()?.find((run) => isUnderWay(run.progress)) ?? null);
  /** The shown result is of another design than the one on the screen. */
  readonly stale = computed(() => {
    const [shown, panel] = [this.shown(), this.state.panel()];
    return shown !== null && panel !== null && (panel.draftHash !== shown.contentHash || !isSettled(this.state.saveState()));
  });
  private stopWatching: (() => void) | null = null;
  private watched: string | null = null;
  private timer: ReturnType<typeof setTimeout> | undefined;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.leave());
  }

  /** Reads the history and shows the wanted run, or else the newest result. */
  async open(panelId: string, kind: RunKind, wanted: string | null): Promise<void> {
    const outcome = await this.client.list(panelId, kind);
    this.trouble.set(outcomeText(outcome) ?? '');
    if (outcome.kind !== 'found') return;
    this.history.set(outcome.value);
    const first = wanted ?? outcome.value.find(({ progress }) => progress.state === 'done')?.id ?? null;
    if (first !== null) await this.show(first);
    this.watchNewest();
  }

  async show(runId: string): Promise<void> {
    const outcome = await this.client.read(runId);
    this.trouble.set(outcomeText(outcome) ?? '');
    if (outcome.kind === 'found') this.shown.set(outcome.value);
  }

  /** Lays another result over the shown one, or takes it away. */
  async compare(runId: string | null): Promise<void> {
    const outcome = runId === null ? null : await this.client.read(runId);
    this.trouble.set(outcome === null ? '' : (outcomeText(outcome) ?? ''));
    this.against.set(outcome?.kind === 'found' ? outcome.value : null);
  }

  /** Starts a run on the draft, once it is saved, or on a revision. The server may answer with a result that it has already. */
  async start(request: RunRequest): Promise<void> {
    const panel = this.state.panel();
    if (panel === null || this.busy()) return;
    this.busy.set(true);
    try {
      if (request.revisionId === undefined && !(await this.isSaved())) {
        this.trouble.set('The draft is not saved yet; see what the bar says, then start again.');
        return;
      }
      const outcome = await this.client.start(panel.id, request, requestKey());
      this.trouble.set(outcomeText(outcome) === null ? '' : `${outcomeText(outcome)} ${faultsOf(outcome)}`.trim());
      if (outcome.kind === 'found') this.take(outcome.value);
    } finally {
      this.busy.set(false);
    }
  }

  async cancel(runId: string): Promise<void> {
    const outcome = await this.client.cancel(runId);
    this.trouble.set(outcomeText(outcome) ?? '');
    if (outcome.kind === 'found') this.take(outcome.value);
  }

  private async isSaved(): Promise<boolean> {
    if (this.state.saveState().kind === 'view-only') return true;
    try {
      await firstValueFrom(this.saveState.pipe(filter(isSettled), timeout(SAVE_PATIENCE_MS)));
      return true;
    } catch {
      return false; // not within the time: the bar says why
    }
  }

  /** Puts a run into the history in its newest state, and shows it when it has a result. */
  private take(run: RunDetail): void {
    const { answer: _answer, ...summary } = run;
    const others = (this.history() ?? []).filter(({ id }) => id !== run.id);
    this.history.set([summary, ...others].sort((a, b) => b.createdAt.localeCompare(a.createdAt)));
    if (run.progress.state === 'done') this.shown.set(run);
    this.watchNewest();
  }

  private watchNewest(): void {
    const id = this.underWay()?.id ?? null;
    if (id === this.watched) return;
    this.leave();
    this.watched = id;
    if (id === null) return;
    this.stopWatching = this.client.watch(id, {
      told: (progress) => this.follow(id, progress),
      lost: () => (this.timer = setTimeout(() => void this.readAgain(id), ASK_AGAIN_MS)),
    });
  }

  private follow(runId: string, progress: RunProgress): void {
    this.history.update((runs) => runs?.map((run) => (run.id === runId ? { ...run, progress } : run)) ?? null);
    if (!isUnderWay(progress)) void this.readAgain(runId);
  }

  private async readAgain(runId: string): Promise<void> {
    this.leave();
    const outcome = await this.client.read(runId);
    if (outcome.kind === 'found') this.take(outcome.value);
    else if (outcome.kind === 'unreachable') this.timer = setTimeout(() => void this.readAgain(runId), ASK_AGAIN_MS);
    else this.trouble.set(outcomeText(outcome) ?? '');
  }

  private leave(): void {
    clearTimeout(this.timer);
    this.stopWatching?.();
    this.stopWatching = null;
    this.watched = null;
  }
}

/** What is wrong with which value. */
function faultsOf(outcome: CallOutcome<unknown>): string {
  if (outcome.kind !== 'refused') return '';
  return (outcome.problem.errors ?? []).map(({ pointer, detail }) => `${pointer.replace(/^#\//, '')}: ${detail}.`).join(' ');
}
