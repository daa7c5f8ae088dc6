import { radFromDeg } from '../units/angles';
import { directionOf } from '../waves/conventions';
import { gratingLobes, shortestReciprocalPerM } from './grating-lobes';
import type { SiLattice } from './si-design';

const rectangular = (periodXM: number, periodYM = periodXM): SiLattice => ({ kind: 'rectangular', periodXM, periodYM });
const triangular = (periodXM: number): SiLattice => ({ kind: 'triangular', periodXM, rowSpacingM: (periodXM * Math.sqrt(3)) / 2 });

describe('grating lobes', () => {
  it('finds the one of a 0.7 x 0.6 wavelength lattice at (40, 30) degrees', () => {
    const { count, lobes } = gratingLobes(rectangular(0.7, 0.6), directionOf(radFromDeg(40), radFromDeg(30)), 1);
    expect(count).toBe(1);
    expect(lobes).toEqual([{ thetaDeg: expect.closeTo(68.3182, 3), phiDeg: expect.closeTo(159.765, 3), orderX: -1, orderY: 0 }]);
  });

  it.each([
    [0, 1, 1.1547],
    [15, 0.794395, 0.917289],
    [30, 0.666667, 0.7698],
    [45, 0.585786, 0.676408],
    [60, 0.535898, 0.618802],
  ])('has none below lambda / (1 + sin %d deg) = %d, on an equilateral lattice below %d', (thetaDeg, square, equilateral) => {
    const worst = (lattice: SiLattice): number =>
      Math.max(...Array.from({ length: 72 }, (_, i) => gratingLobes(lattice, directionOf(radFromDeg(thetaDeg), radFromDeg(5 * i)), 1).count));
    expect(worst(rectangular(square * 0.999))).toBe(0);
    expect(worst(rectangular(square * 1.001))).toBeGreaterThan(0);
    expect(worst(triangular(equilateral * 0.999))).toBe(0);
    expect(worst(triangular(equilateral * 1.003))).toBeGreaterThan(0);
    expect(1 / shortestReciprocalPerM(triangular(equilateral))).toBeCloseTo(square, 5);
  });

  it('stands at the orders of the reciprocal lattice, where all cells are in step again', () => {
    const lattice: SiLattice = { kind: 'triangular', periodXM: 1.3, rowSpacingM: 0.9 };
    const beam = directionOf(0.5, 0.4);
    const { lobes } = gratingLobes(lattice, beam, 1);
    expect(lobes.length).toBeGreaterThan(1);
    for (const { thetaDeg, phiDeg } of lobes) {
      const lobe = directionOf(radFromDeg(thetaDeg), radFromDeg(phiDeg));
      for (const [x, y] of [[1.3, 0], [0.65, 0.9]]) {
        const turns = x * (lobe.u - beam.u) + y * (lobe.v - beam.v);
        expect(turns).toBeCloseTo(Math.round(turns), 9);
      }
    }
  });

  it('counts all lobes of a sparse lattice but lists the nearest only', () => {
    const { count, lobes } = gratingLobes(rectangular(40), directionOf(0.2, 0), 1);
    expect(count).toBeGreaterThan(4900);
    expect(lobes.length).toBeLessThanOrEqual(200);
  });
});
