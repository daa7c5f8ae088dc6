import type { RunProgress, RunSummary } from '../../../../shared/contracts/runs';

/** It waits or computes. */
export const isUnderWay = ({ state }: Pick<RunProgress, 'state'>): boolean => state === 'queued' || state === 'running';

/** "about 12 s left", "about 3 min left"; empty where nothing is known. */
export function timeLeftText({ secondsLeft, state }: Pick<RunProgress, 'secondsLeft' | 'state'>): string {
  if (secondsLeft === null || state !== 'running') return '';
  return `about ${durationText(secondsLeft)} left`;
}

/** Seconds up to a minute and a half, then minutes. */
export function durationText(seconds: number): string {
  if (seconds < 10) return `${Math.max(0, Math.round(seconds * 10) / 10)} s`;
  return seconds < 90 ? `${Math.round(seconds)} s` : `${Math.round(seconds / 60)} min`;
}

/** "place 3 in the queue"; empty once it has begun. */
export function queueText({ queuePosition }: Pick<RunProgress, 'queuePosition'>): string {
  return queuePosition === null ? '' : queuePosition === 1 ? 'next in the queue' : `place ${queuePosition} in the queue`;
}

/** Of what the run is. */
export function sourceText({ source }: Pick<RunSummary, 'source'>): string {
  return source.kind === 'revision' ? `revision ${source.number}` : `draft, save ${source.version}`;
}

/** How long it took; the way so far of one that is not over has its own words. */
export function tookText({ startedAt, finishedAt, reused, progress }: Pick<RunSummary, 'startedAt' | 'finishedAt' | 'reused' | 'progress'>): string {
  if (reused) return 'known already';
  if (startedAt === null || finishedAt === null) return progress.state === 'queued' ? 'waiting' : progress.state === 'running' ? `${Math.round(progress.fraction * 100)} %` : '–';
  return durationText((Date.parse(finishedAt) - Date.parse(startedAt)) / 1000);
}
