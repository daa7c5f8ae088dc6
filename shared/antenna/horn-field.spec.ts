import { integrate } from '../math/quadrature';
import { radFromDeg } from '../units/angles';
import { powerRatioToDb } from '../units/decibels';
import { hornAxis, hornPower, hornSampler } from './horn-field';
import type { SiHorn } from './si-design';

const horn = (changes: Partial<SiHorn> = {}): SiHorn => ({
  kind: 'horn',
  position: { xM: 0, yM: 0, zM: 0.2 },
  aim: { xM: 0, yM: 0, zM: 0 },
  exponentE: 6.5,
  exponentH: 6.5,
  polarisation: 'x',
  ...changes,
});

/** Power through the plane z = 0 of a horn that looks straight at it, by brute-force quadrature over the half space. */
function powerThroughPlane(source: SiHorn): number {
  const sampleAt = hornSampler(source);
  const height = source.position.zM;
  return integrate(
    (phi) =>
      integrate(
        (theta) => {
          const rho = height * Math.tan(theta);
          const { field, distanceM } = sampleAt(rho * Math.cos(phi), rho * Math.sin(phi));
          return (field * distanceM) ** 2 * Math.sin(theta);
        },
        0,
        Math.PI / 2,
        { nodes: 40, panels: 4 },
      ),
    0,
    2 * Math.PI,
    { nodes: 16, panels: 4 },
  );
}

describe('the scalar horn', () => {
  it.each([
    [1, 7.78151],
    [6.5, 14.4716],
    [12, 16.9897],
  ])('has, for q = %d, the gain %d dBi of 2 (2q + 1)', (q, gainDbi) => {
    expect(powerRatioToDb((4 * Math.PI) / hornPower(horn({ exponentE: q, exponentH: q })))).toBeCloseTo(gainDbi, 4);
  });

  it.each(['x', 'rhcp'] as const)('has the power of its own blended pattern for unequal exponents, polarisation %s', (polarisation) => {
    const source = horn({ exponentE: 7, exponentH: 5, polarisation });
    expect(hornPower(source) / powerThroughPlane(source)).toBeCloseTo(1, 6);
  });

  it('puts cos^qE into the E plane and cos^qH into the H plane', () => {
    const offset = 0.2 * Math.tan(radFromDeg(30));
    const at = hornSampler(horn({ exponentE: 7, exponentH: 3 }));
    const along = at(offset, 0).field * at(offset, 0).distanceM;
    const across = at(0, offset).field * at(0, offset).distanceM;
    expect(along).toBeCloseTo(Math.cos(radFromDeg(30)) ** 7, 12);
    expect(across).toBeCloseTo(Math.cos(radFromDeg(30)) ** 3, 12);
    const turned = hornSampler(horn({ exponentE: 7, exponentH: 3, polarisation: 'y' }));
    expect(turned(0, offset).field * turned(0, offset).distanceM).toBeCloseTo(along, 12);
  });

  it('blends by cos^2 and sin^2 of the azimuth about the axis', () => {
    const at = hornSampler(horn({ exponentE: 7, exponentH: 3 }));
    const rho = 0.2 * Math.tan(radFromDeg(30));
    const sample = at(rho * Math.cos(radFromDeg(60)), rho * Math.sin(radFromDeg(60)));
    const cosine = Math.cos(radFromDeg(30));
    expect(sample.field * sample.distanceM).toBeCloseTo(0.25 * cosine ** 7 + 0.75 * cosine ** 3, 12);
  });

  it('is dark behind itself and falls as 1/R', () => {
    const away = hornSampler(horn({ aim: { xM: 0, yM: 0, zM: 1 } }));
    expect(away(0, 0).field).toBe(0);
    expect(hornSampler(horn())(0, 0).field).toBeCloseTo(5, 12);
  });

  it('gives distance, incidence and the azimuth of travel', () => {
    const { distanceM, cosIncidence, azimuthRad } = hornSampler(horn({ position: { xM: -0.3, yM: 0, zM: 0.4 } }))(0, 0);
    expect([distanceM, cosIncidence, azimuthRad]).toEqual([expect.closeTo(0.5, 12), expect.closeTo(0.8, 12), 0]);
  });

  it('still has a pattern when it looks along its own polarisation', () => {
    const source = horn({ position: { xM: -1, yM: 0, zM: 0.2 }, aim: { xM: 1, yM: 0, zM: 0.2 }, exponentE: 2, exponentH: 1 });
    expect(hornAxis(source)).toEqual([1, 0, 0]);
    expect(Number.isFinite(hornSampler(source)(0, 0).field)).toBe(true);
  });
});
