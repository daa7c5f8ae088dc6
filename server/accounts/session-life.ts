/** A session ends after this long without a request, and after this long in any case (NIST SP 800-63B, AAL2). */
export const IDLE_LIFE_MS = 30 * 60 * 1000;
export const ABSOLUTE_LIFE_MS = 12 * 60 * 60 * 1000;

/** An access token outlives a revoked session by nothing, for each request looks the session up. */
export const ACCESS_LIFE_SECONDS = 10 * 60;

/** Not every request writes: the idle time is kept to this accuracy. */
export const TOUCH_AFTER_MS = 15 * 1000;

interface SessionTimes {
  readonly lastUsedAt: Date;
  readonly endsAt: Date;
  readonly revokedAt: Date | null;
}

export const isLive = (session: SessionTimes, now: Date): boolean =>
  session.revokedAt === null && session.endsAt > now && session.lastUsedAt.getTime() + IDLE_LIFE_MS > now.getTime();
