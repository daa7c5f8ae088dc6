import type { SessionEnds } from './session-store';

export interface MinutesLeft {
  readonly minutes: number;
  /** "idle" ends can be put off by any call, the last one cannot. */
  readonly end: 'idle' | 'last';
}

/** Whole minutes until the session ends, and by which of its two ends; null without a session. */
export function minutesLeft(ends: SessionEnds | null, nowMs: number): MinutesLeft | null {
  if (ends === null) return null;
  const end = ends.lastMs <= ends.idleMs ? 'last' : 'idle';
  return { minutes: Math.max(0, Math.ceil((Math.min(ends.idleMs, ends.lastMs) - nowMs) / 60_000)), end };
}
