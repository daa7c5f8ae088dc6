import * as fc from 'fast-check';
import { radFromDeg, wrapDeg, wrapRad } from '../units/angles';
import { nearestPhaseTable } from './nearest-phase-table';

const table = (degrees: number[]): ((deg: number) => number) => {
  const nearest = nearestPhaseTable(Float64Array.from(degrees, radFromDeg));
  return (deg) => nearest(radFromDeg(deg));
};

describe('the nearest state in phase', () => {
  it('finds 1 degree for 359 and turns the error the short way round', () => {
    const states = [350, 1, 90, 181, 268];
    const nearest = table(states);
    const chosen = [359, 355, -4, 714, -200].map((deg) => states[nearest(deg)]);
    expect(chosen).toEqual([1, 350, 1, 350, 181]);
    expect([359, 355, -4, 714, -200].map((deg, i) => wrapDeg(chosen[i] - deg))).toEqual([2, -5, 5, -4, 21]);
  });

  it('gives ties to the smallest index, whichever side it lies on', () => {
    expect(table([0, 90])(45)).toBe(0);
    expect(table([90, 0])(45)).toBe(0);
    expect(table([0, 180])(90)).toBe(0);
    expect(table([180, 0])(-90)).toBe(0);
  });

  it('gives states of equal phase to the smallest index, across a whole turn too', () => {
    expect(table([200, 30, 30])(31)).toBe(1);
    expect(table([200, 390, 30])(31)).toBe(1);
    expect(table([100, 360, 0])(2)).toBe(1);
  });

  it('knows only one state', () => {
    expect([-100, 0, 250].map(table([77]))).toEqual([0, 0, 0]);
  });

  it('equals trying every state', () => {
    const phase = fc.integer({ min: -720, max: 720 });
    fc.assert(
      fc.property(fc.array(phase, { minLength: 1, maxLength: 40 }), phase, (states, target) => {
        const errors = states.map((state) => Math.abs(wrapDeg(state - target)));
        expect(table(states)(target)).toBe(errors.indexOf(Math.min(...errors)));
      }),
    );
  });

  it('equals trying every one of very many states, at targets anywhere', () => {
    const scattered = (n: number): number => (n * 0.6180339887498949) % 1;
    const states = Float64Array.from({ length: 300 }, (_, n) => 2 * Math.PI * scattered(n * n));
    const nearest = nearestPhaseTable(states);
    for (let n = 0; n < 3000; n++) {
      const target = 40 * (scattered(n) - 0.5);
      const errors = Array.from(states, (rad) => Math.abs(wrapRad(rad - target)));
      expect(errors[nearest(target)]).toBeLessThan(Math.min(...errors) + 1e-9);
    }
  });
});
