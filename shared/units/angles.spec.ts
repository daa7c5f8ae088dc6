import * as fc from 'fast-check';
import { degFromRad, positiveDeg, radFromDeg, wrapDeg, wrapRad } from './angles';

describe('angles', () => {
  it('takes degrees to radians and back', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e4, max: 1e4, noNaN: true }), (deg) => {
        expect(degFromRad(radFromDeg(deg))).toBeCloseTo(deg, 9);
      }),
    );
  });

  it('wraps into (-180, 180], keeping 180 and turning -180', () => {
    expect([181, 180, -180, 540, -541, 0, 359].map(wrapDeg)).toEqual([-179, 180, 180, 180, 179, 0, -1]);
  });

  it('wraps radians as it wraps degrees', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e3, max: 1e3, noNaN: true }), (rad) => {
        const wrapped = wrapRad(rad);
        expect(wrapped).toBeGreaterThan(-Math.PI - 1e-12);
        expect(wrapped).toBeLessThanOrEqual(Math.PI + 1e-12);
        expect(Math.cos(wrapped)).toBeCloseTo(Math.cos(rad), 9);
      }),
    );
  });

  it('turns any angle into [0, 360), even one a rounding error below 0', () => {
    expect([-90, 360, 725, -1e-16].map(positiveDeg)).toEqual([270, 0, 5, 0]);
  });
});
