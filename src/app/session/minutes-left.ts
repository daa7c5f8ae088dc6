import type { CurrentSession } from '../../../shared/contracts/session';

/** Whole minutes until the session ends, whichever end comes first; null without a session. */
export function minutesLeft(session: Pick<CurrentSession, 'idleEndsAt' | 'endsAt'> | null, now: number): number | null {
  if (session === null) return null;
  const end = Math.min(Date.parse(session.idleEndsAt), Date.parse(session.endsAt));
  return Math.max(0, Math.ceil((end - now) / 60_000));
}
