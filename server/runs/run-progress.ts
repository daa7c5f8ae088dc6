import type { RunProgress, RunState } from '../../shared/contracts/runs';

/** A stored run, as far as its progress goes. */
export interface ProgressRow {
  readonly state: RunState;
  readonly chunkCount: number;
  readonly doneCount: number;
  readonly plannedSeconds: number;
  readonly doneSeconds: number;
  readonly startedAt: Date | null;
  readonly restartCount: number;
}

/** What stands around a run and changes by itself. */
export interface RunSurroundings {
  readonly now: Date;
  /** Null when the run is not waiting. */
  readonly queuePosition: number | null;
  /** Threads of all workers that are there. */
  readonly threadCount: number;
}

/** How far a run has come, in numbers and words. */
export function runProgress(run: ProgressRow, around: RunSurroundings): RunProgress {
  const fraction = fractionOf(run);
  return {
    state: run.state,
    stage: stageOf(run, around.threadCount),
    fraction,
    secondsLeft: secondsLeft(run, fraction, around.now),
    queuePosition: run.state === 'queued' ? around.queuePosition : null,
    restarts: run.restartCount,
  };
}

function fractionOf({ state, plannedSeconds, doneSeconds }: ProgressRow): number {
  if (state === 'done') return 1;
  return plannedSeconds > 0 ? Math.min(1, doneSeconds / plannedSeconds) : 0;
}

function stageOf({ state, chunkCount, doneCount, restartCount }: ProgressRow, threadCount: number): string {
  const again = restartCount === 0 ? '' : `; restarted (attempt ${restartCount + 1})`;
  switch (state) {
    case 'queued':
      return threadCount === 0 ? 'waiting: no worker is running' : 'waiting for its turn';
    case 'running':
      if (threadCount === 0) return 'stopped: no worker is running';
      return doneCount === chunkCount ? 'putting the parts together' : `computing: ${doneCount} of ${chunkCount} parts done${again}`;
    case 'done':
      return 'done';
    case 'failed':
      return 'failed';
    case 'cancelled':
      return 'cancelled';
  }
}

/** By the pace so far, of all workers together. */
function secondsLeft({ state, startedAt }: ProgressRow, fraction: number, now: Date): number | null {
  if (state === 'done') return 0;
  if (state !== 'running' || startedAt === null || fraction === 0) return null;
  const elapsedSeconds = Math.max(0, now.getTime() - startedAt.getTime()) / 1000;
  return Math.round((elapsedSeconds * (1 - fraction)) / fraction);
}
