import fc from 'fast-check';
import { radFromDeg } from '../units/angles';
import { comparisonFloorDbi, cutDifferenceDb, mapDifferenceDb, type LevelOverU } from './compare-cuts';
import type { DesignDocument } from '../model/design-document';
import { planeWaveDesign } from './example-design';
import { predictDesign } from './predict-design';

function cutAt(thetaDeg: number, changes: Partial<DesignDocument> = {}): LevelOverU {
  const requirement = { ...planeWaveDesign().requirement, beams: [{ thetaDeg, phiDeg: 0 }] };
  const design = planeWaveDesign({ requirement, prediction: { receiveExponent: 0, radiateExponent: 0 }, ...changes });
  const { cuts } = predictDesign(design, { include: { cuts: [{ phiDeg: 0, thetaDeg: [-90, 90, 0.1] }] } });
  if (cuts === undefined) throw new Error('no cut came');
  return { u: cuts[0].angleDeg.map((angle) => Math.sin(radFromDeg(angle))), levelDbi: cuts[0].gainDbi };
}

const peak = ({ levelDbi }: LevelOverU): number => levelDbi.reduce((most, level) => Math.max(most, level), -Infinity);
const sine = (deg: number): number => Math.sin(radFromDeg(deg));
const sizes = (differenceDb: Float64Array): number[] => Array.from(differenceDb).filter((value) => !Number.isNaN(value)).map(Math.abs).sort((a, b) => a - b);
const line = (levels: readonly number[]): LevelOverU => ({ u: Float64Array.from(levels, (_, i) => i), levelDbi: Float64Array.from(levels) });

describe('cutDifferenceDb', () => {
  it('turns its sign when the sides are swapped', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.double({ min: -60, max: 40, noNaN: true }), fc.double({ min: -60, max: 40, noNaN: true })), { minLength: 2, maxLength: 40 }), (pairs) => {
        const [before, after] = [line(pairs.map(([level]) => level)), line(pairs.map(([, level]) => level))];
        const [there, back] = [cutDifferenceDb(before, after, 0, -20), cutDifferenceDb(after, before, 0, -20)];
        expect(Array.from(back, (value) => 0 - value + 0)).toEqual(Array.from(there, (value) => value + 0));
      }),
    );
  });

  it('interpolates the earlier side linearly at the shifted places', () => {
    const before = line([0, 10, 20]);
    expect(Array.from(cutDifferenceDb(before, line([0, 0, 0, 0]), 0.5, -50))).toEqual([NaN, -5, -15, NaN]);
    expect(Array.from(cutDifferenceDb(before, line([0, 0, 0]), -1, -50))).toEqual([-10, -20, NaN]);
  });

  it('finds a steered beam unchanged in form once it is moved back', () => {
    const [before, after] = [cutAt(18), cutAt(20)];
    const floorDbi = comparisonFloorDbi(peak(before), peak(after));
    // Isotropic elements: in direction cosines the patterns are alike, but for the directivity, which the rim of the
    // hemisphere changes, and the linear interpolation over 0.1 degrees beside nulls.
    const moved = sizes(cutDifferenceDb(before, after, sine(20) - sine(18), floorDbi));
    expect(moved.length).toBeGreaterThan(1500);
    expect(moved[Math.floor(moved.length * 0.9)]).toBeLessThan(0.3);
    const unmoved = sizes(cutDifferenceDb(before, after, 0, floorDbi));
    expect(unmoved[Math.floor(unmoved.length * 0.9)]).toBeGreaterThan(5);
  });

  it('leaves gaps where either lies below the floor, or where the earlier side has no direction', () => {
    const [before, after] = [cutAt(10), cutAt(50)];
    const floorDbi = comparisonFloorDbi(peak(before), peak(after));
    expect(floorDbi).toBe(Math.round(Math.max(peak(before), peak(after)) - 50));
    const difference = cutDifferenceDb(before, after, sine(50) - sine(10), floorDbi);
    // The beam moves by 0.592 in u, so what was left of u = -1 has no direction.
    const first = difference.findIndex((value) => !Number.isNaN(value));
    expect(after.u[first]).toBeCloseTo(-1 + 0.592, 2);
    difference.forEach((value, i) => {
      if (after.levelDbi[i] < floorDbi) expect(value).toBeNaN();
    });
  });
});

describe('mapDifferenceDb', () => {
  it('is odd in its sides and 0 where either lies below the floor', () => {
    const [before, after] = [Float32Array.of(10, -200, 5, -30), Float32Array.of(12, 3, -200, -31)];
    expect(Array.from(mapDifferenceDb(before, after, -20))).toEqual([2, 0, 0, 0]);
    expect(Array.from(mapDifferenceDb(after, before, -20))).toEqual([-2, 0, 0, 0]);
  });

  it('refuses maps of different sizes', () => {
    expect(() => mapDifferenceDb(new Float32Array(4), new Float32Array(9), 0)).toThrow('maps of one size are compared; got 4 and 9 points');
  });
});
