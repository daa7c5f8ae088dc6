import { minutesLeft } from './minutes-left';

describe('time left in a session', () => {
  const now = Date.parse('2026-12-01T12:00:00Z');

  it('counts to the idle end or the absolute end, whichever is first', () => {
    expect(minutesLeft({ idleEndsAt: '2026-12-01T12:30:00Z', endsAt: '2026-12-02T00:00:00Z' }, now)).toBe(30);
    expect(minutesLeft({ idleEndsAt: '2026-12-01T12:30:00Z', endsAt: '2026-12-01T12:01:30Z' }, now)).toBe(2);
  });

  it('is never below zero and is absent without a session', () => {
    expect(minutesLeft({ idleEndsAt: '2026-12-01T11:00:00Z', endsAt: '2026-12-02T00:00:00Z' }, now)).toBe(0);
    expect(minutesLeft(null, now)).toBeNull();
  });
});
