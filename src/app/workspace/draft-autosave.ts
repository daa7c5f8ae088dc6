import type { DraftSaved, PanelDetail } from '../../../shared/contracts/projects';
import type { DesignDocument } from '../../../shared/model/design-document';
import type { SaveOutcome } from '../api/draft-client';
import { sameDesign } from './design-differences';
import type { SaveProgress } from './save-progress';

/** A pause of typing this long sends the draft. */
export const SAVE_PAUSE_MS = 600;
/** A change waits no longer than this, so that a killed browser loses at most two seconds even during a long drag. */
export const LONGEST_WAIT_MS = 1400;
const FIRST_RETRY_MS = 1000;
const LONGEST_RETRY_MS = 15_000;

export interface AutosaveLinks {
  send(design: DesignDocument, etag: string): Promise<SaveOutcome>;
  showProgress(progress: SaveProgress): void;
  /** The server holds this design now. */
  acceptSaved(saved: DraftSaved, design: DesignDocument): void;
  /** Somebody else saved meanwhile. Nothing is sent until `resume`. */
  meetConflict(current: PanelDetail): void;
  now(): number;
}

/**
 * Sends the newest design to the server: one request at a time, each with the ETag of the one before,
 * so that states arrive in order. A design that was overtaken while waiting is never sent.
 */
export class DraftAutosave {
  private waiting: DesignDocument | null = null;
  private waitingSince = 0;
  private timer: ReturnType<typeof setTimeout> | null = null;
  private sending = false;
  private flight: Promise<void> | null = null;
  private halted = false;
  private retryMs = FIRST_RETRY_MS;
  private offlineSince: number | null = null;

  constructor(
    private readonly links: AutosaveLinks,
    private etag: string,
  ) {}

  /** True while something has not reached the server. */
  get hasUnsaved(): boolean {
    return this.waiting !== null || this.sending;
  }

  /** Queues the design as it stands now. */
  queue(design: DesignDocument): void {
    if (this.waiting === null) this.waitingSince = this.links.now();
    this.waiting = design;
    if (this.halted) return;
    if (this.offlineSince === null) this.links.showProgress({ kind: 'saving' });
    const waited = this.links.now() - this.waitingSince;
    this.schedule(Math.max(0, Math.min(SAVE_PAUSE_MS, LONGEST_WAIT_MS - waited)));
  }

  /** Sends what waits at once: the page is hidden, the network is back, or a revision is about to be frozen. */
  async flush(): Promise<void> {
    await this.flight;
    this.cancelTimer();
    this.flight = this.sendWaiting();
    await this.flight;
  }

  /** Goes on from another state of the server, after a conflict was resolved. */
  resume(etag: string): void {
    this.etag = etag;
    this.halted = false;
  }

  /** Keeps the design without sending it, until `resume`. */
  hold(design: DesignDocument): void {
    this.halted = true;
    this.queue(design);
  }

  /** Stops the clock; what waits stays in the local copy. */
  stop(): void {
    this.halted = true;
    this.cancelTimer();
  }

  private schedule(delayMs: number): void {
    this.cancelTimer();
    this.timer = setTimeout(() => {
      this.timer = null;
      this.flight = this.sendWaiting();
    }, delayMs);
  }

  private cancelTimer(): void {
    if (this.timer !== null) clearTimeout(this.timer);
    this.timer = null;
  }

  private async sendWaiting(): Promise<void> {
    if (this.sending || this.halted || this.waiting === null) return;
    const design = this.waiting;
    this.waiting = null;
    this.sending = true;
    const outcome = await this.links.send(design, this.etag);
    this.sending = false;
    this.settle(outcome, design);
    if (this.waiting !== null && !this.halted && this.timer === null) this.schedule(0);
  }

  private settle(outcome: SaveOutcome, design: DesignDocument): void {
    // A lost reply looks like somebody else's change: the server already holds what was sent.
    if (outcome.kind === 'stale' && sameDesign(outcome.current.design, design)) {
      this.accept(outcome.current, design);
    } else if (outcome.kind === 'saved') {
      this.accept(outcome.saved, design);
    } else if (outcome.kind === 'stale') {
      this.haltForConflict(outcome.current, design);
    } else if (outcome.kind === 'refused') {
      // Not sent again by itself: the next change may set it right.
      this.offlineSince = null;
      this.links.showProgress({ kind: 'not-valid', detail: outcome.detail, faults: outcome.faults });
    } else {
      this.retryLater(design);
    }
  }

  private accept(saved: DraftSaved, design: DesignDocument): void {
    this.etag = saved.etag;
    this.retryMs = FIRST_RETRY_MS;
    this.offlineSince = null;
    const { etag, draftHash, changedAt, draftIsRevision } = saved;
    this.links.acceptSaved({ etag, draftHash, changedAt, draftIsRevision }, design);
    this.links.showProgress(this.waiting === null ? { kind: 'saved', at: this.links.now() } : { kind: 'saving' });
  }

  private haltForConflict(current: PanelDetail, design: DesignDocument): void {
    this.waiting ??= design;
    this.halted = true;
    this.cancelTimer();
    this.links.showProgress({ kind: 'conflict' });
    this.links.meetConflict(current);
  }

  private retryLater(design: DesignDocument): void {
    this.waiting ??= design;
    this.offlineSince ??= this.links.now();
    this.links.showProgress({ kind: 'offline', since: this.offlineSince });
    this.schedule(this.retryMs);
    this.retryMs = Math.min(LONGEST_RETRY_MS, this.retryMs * 2);
  }
}
