import { utcTimeText } from './utc-time';

describe('a time as it is shown', () => {
  it('is in UTC and says so, whatever zone it was given in', () => {
    expect(utcTimeText('2026-12-01T23:30:15.500-02:00')).toBe('2026-12-02 01:30\u00a0UTC');
    expect(utcTimeText('2026-07-01T00:05:09Z', 'second')).toBe('2026-07-01 00:05:09\u00a0UTC');
  });

  it('is the day in UTC where only the day counts', () => {
    expect(utcTimeText('2026-12-31T22:30:00-03:00', 'day')).toBe('2027-01-01');
  });
});
