import { Readable } from 'node:stream';
import type { RunProgress } from '../../shared/contracts/runs';
import type { Logger } from 'pino';

/** Where progress comes from. */
export interface ProgressSource {
  progressOf(teamId: string, runIds: readonly string[]): Promise<ReadonlyMap<string, RunProgress>>;
}

const POLL_MS = 400;
/** A proxy closes what says nothing for long. */
const SILENCE_MS = 15_000;

interface Watcher {
  readonly teamId: string;
  readonly runId: string;
  readonly stream: Readable;
  last: string;
  saidAt: number;
}

/**
 * Streams of server-sent events that tell how far a run has come. Any worker on any machine may move it on, so all
 * watched runs are looked up together, a few times a second, with one query for each team.
 */
export class RunEvents {
  private readonly watchers = new Set<Watcher>();
  private timer: NodeJS.Timeout | undefined;

  constructor(
    private readonly source: ProgressSource,
    private readonly logger: Logger,
  ) {}

  /** A stream that begins with the progress as it is, and ends when the run is over. */
  watch(teamId: string, runId: string, progress: RunProgress): Readable {
    const stream = new Readable({ read: () => undefined });
    const watcher: Watcher = { teamId, runId, stream, last: '', saidAt: 0 };
    this.watchers.add(watcher);
    stream.on('close', () => this.forget(watcher));
    this.tell(watcher, progress);
    if (this.watchers.size > 0 && this.timer === undefined) this.schedule();
    return stream;
  }

  close(): void {
    clearTimeout(this.timer);
    this.timer = undefined;
    for (const { stream } of this.watchers) stream.push(null);
    this.watchers.clear();
  }

  private schedule(): void {
    this.timer = setTimeout(() => {
      this.look()
        .catch((error: unknown) => this.logger.warn({ err: error }, 'progress of runs could not be read'))
        .finally(() => {
          this.timer = undefined;
          if (this.watchers.size > 0) this.schedule();
        });
    }, POLL_MS);
  }

  private async look(): Promise<void> {
    for (const teamId of new Set([...this.watchers].map((watcher) => watcher.teamId))) {
      const ofTeam = [...this.watchers].filter((watcher) => watcher.teamId === teamId);
      const progress = await this.source.progressOf(teamId, [...new Set(ofTeam.map(({ runId }) => runId))]);
      for (const watcher of ofTeam) {
        const found = progress.get(watcher.runId);
        if (found !== undefined) this.tell(watcher, found);
      }
    }
  }

  private tell(watcher: Watcher, progress: RunProgress): void {
    const text = JSON.stringify(progress);
    const now = Date.now();
    if (text !== watcher.last) watcher.stream.push(`event: progress\ndata: ${text}\n\n`);
    else if (now - watcher.saidAt > SILENCE_MS) watcher.stream.push(': still here\n\n');
    else return;
    watcher.last = text;
    watcher.saidAt = now;
    if (progress.state === 'queued' || progress.state === 'running') return;
    watcher.stream.push(null);
    this.forget(watcher);
  }

  private forget(watcher: Watcher): void {
    this.watchers.delete(watcher);
  }
}
