import * as fc from 'fast-check';
import { radFromDeg } from '../units/angles';
import { nearestBranchRad, unwrapPhasesRad } from './unwrap-phase';

describe('unwrapping phase', () => {
  it('takes 1 degree after 359 degrees as 361', () => {
    const [, second] = unwrapPhasesRad([radFromDeg(359), radFromDeg(1)]);
    expect(second).toBeCloseTo(radFromDeg(361), 12);
  });

  it('recovers any slope below half a turn a step', () => {
    fc.assert(
      fc.property(fc.double({ min: -3.1, max: 3.1, noNaN: true }), (slope) => {
        const truth = Array.from({ length: 20 }, (_, i) => slope * i);
        const wrapped = truth.map((rad) => Math.atan2(Math.sin(rad), Math.cos(rad)));
        unwrapPhasesRad(wrapped).forEach((rad, i) => expect(rad).toBeCloseTo(truth[i], 9));
      }),
    );
  });

  it('steps over missing values', () => {
    const result = unwrapPhasesRad([3, NaN, -3]);
    expect(result[1]).toBeNaN();
    expect(result[2]).toBeCloseTo(2 * Math.PI - 3, 12);
  });

  it('keeps a phase that is already near', () => {
    expect(nearestBranchRad(7, 6.5)).toBe(7);
  });
});
