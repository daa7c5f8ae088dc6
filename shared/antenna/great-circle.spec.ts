import * as fc from 'fast-check';
import { radFromDeg } from '../units/angles';
import { anglesOf, directionOf } from '../waves/conventions';
import { greatCircle, visibleArcRad } from './great-circle';

const theta = fc.double({ min: 0, max: 1.5, noNaN: true });
const phi = fc.double({ min: -3, max: 3, noNaN: true });

describe('great circles through the beam', () => {
  it('start at the beam and stay on the unit sphere', () => {
    fc.assert(
      fc.property(theta, phi, fc.double({ min: -3, max: 3, noNaN: true }), (thetaRad, phiRad, angle) => {
        for (const plane of ['along', 'across'] as const) {
          const at = greatCircle(directionOf(thetaRad, phiRad), plane);
          const { u, v, w } = at(angle);
          expect(Math.hypot(u, v, w)).toBeCloseTo(1, 12);
          const start = at(0);
          const beam = directionOf(thetaRad, phiRad);
          expect([start.u - beam.u, start.v - beam.v, start.w - beam.w].every((gap) => gap === 0)).toBe(true);
        }
      }),
    );
  });

  it('change theta alone along, and leave the plane of z at right angles across', () => {
    const beam = directionOf(radFromDeg(20), radFromDeg(35));
    const along = anglesOf(greatCircle(beam, 'along')(radFromDeg(7)));
    expect([along.thetaRad, along.phiRad]).toEqual([expect.closeTo(radFromDeg(27), 12), expect.closeTo(radFromDeg(35), 12)]);
    const across = greatCircle(beam, 'across')(1e-4);
    expect(across.w).toBeCloseTo(beam.w, 7);
    expect(anglesOf(across).phiRad).toBeGreaterThan(radFromDeg(35));
  });

  it('hold z along at broadside too', () => {
    expect(greatCircle({ u: 0, v: 0, w: 1 }, 'along')(0.3)).toEqual({ u: expect.closeTo(Math.sin(0.3), 12), v: 0, w: expect.closeTo(Math.cos(0.3), 12) });
  });

  it('end at the horizon on both sides', () => {
    const beam = directionOf(radFromDeg(20), 1);
    for (const plane of ['along', 'across'] as const) {
      for (const end of visibleArcRad(beam, plane)) expect(greatCircle(beam, plane)(end).w).toBeCloseTo(0, 12);
    }
  });
});
