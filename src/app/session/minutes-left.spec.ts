import { minutesLeft } from './minutes-left';

const NOON = Date.parse('2026-12-01T12:00:00.000Z');
const afterNoon = (minutes: number): number => NOON + minutes * 60_000;

describe('minutes left of a session', () => {
  it('count to the earlier of the idle and the last end, and say which it is', () => {
    expect(minutesLeft({ idleMs: afterNoon(30), lastMs: afterNoon(300) }, NOON)).toEqual({ minutes: 30, end: 'idle' });
    expect(minutesLeft({ idleMs: afterNoon(30), lastMs: afterNoon(10) }, NOON)).toEqual({ minutes: 10, end: 'last' });
  });

  it('round up, so that "2 min" is shown until one minute is left', () => {
    expect(minutesLeft({ idleMs: afterNoon(1.1), lastMs: afterNoon(300) }, NOON)?.minutes).toBe(2);
  });

  it('never fall below nothing, and are absent without a session', () => {
    expect(minutesLeft({ idleMs: afterNoon(-5), lastMs: afterNoon(300) }, NOON)?.minutes).toBe(0);
    expect(minutesLeft(null, NOON)).toBeNull();
  });
});
