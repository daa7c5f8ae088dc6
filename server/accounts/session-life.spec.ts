import { ABSOLUTE_LIFE_MS, IDLE_LIFE_MS, isLive } from './session-life';

describe('isLive', () => {
  const opened = new Date('2027-01-01T08:00:00Z');
  const after = (ms: number): Date => new Date(opened.getTime() + ms);
  const session = { lastUsedAt: opened, endsAt: after(ABSOLUTE_LIFE_MS), revokedAt: null };

  it('ends 30 minutes after the last use', () => {
    expect(IDLE_LIFE_MS).toBe(30 * 60_000);
    expect([isLive(session, after(IDLE_LIFE_MS - 1)), isLive(session, after(IDLE_LIFE_MS))]).toEqual([true, false]);
  });

  it('ends 12 hours after it began, however busy', () => {
    expect(ABSOLUTE_LIFE_MS).toBe(12 * 3_600_000);
    const busy = { ...session, lastUsedAt: after(ABSOLUTE_LIFE_MS - 1) };
    expect([isLive(busy, after(ABSOLUTE_LIFE_MS - 1)), isLive(busy, after(ABSOLUTE_LIFE_MS))]).toEqual([true, false]);
  });

  it('is over once revoked', () => {
    expect(isLive({ ...session, revokedAt: opened }, opened)).toBe(false);
  });
});
