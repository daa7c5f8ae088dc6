import * as fc from 'fast-check';
import { radFromDeg } from '../units/angles';
import { gridModelWarnings, gridReflection, groundedSlabReflection, zeroPhaseFrequency } from './grid-model';
import type { PatchGrid } from './grid-model';

function grid([periodMm, gapMm, thicknessMm, relativePermittivity]: readonly [number, number, number, number], lossTangent = 0): PatchGrid {
  return { periodM: periodMm / 1e3, gapM: gapMm / 1e3, thicknessM: thicknessMm / 1e3, relativePermittivity, lossTangent };
}

function zeroPhaseGHz(patchGrid: PatchGrid): number {
  const found = zeroPhaseFrequency(patchGrid, 0, 'te');
  if (found.kind === 'not-reached') throw new Error(`none up to ${found.upToHz} Hz`);
  return found.frequencyHz / 1e9;
}

const phaseDeg = ({ re, im }: { readonly re: number; readonly im: number }) => (Math.atan2(im, re) * 180) / Math.PI;
const insideRange = grid([2, 0.2, 1, 10.2]);

describe('gridReflection', () => {
  // Period, gap, thickness in mm, permittivity; zero-phase frequency in GHz from an independent script of the same formula,
  // printed with two decimals.
  it.each<readonly [readonly [number, number, number, number], number]>([
    [[2, 0.2, 1, 10.2], 11.65],
    [[5, 0.5, 1.6, 4.4], 8.81],
    [[4, 0.4, 1.524, 3.55], 10.89],
    [[6, 0.5, 1.575, 2.2], 10.3],
    [[12.49, 2.49, 1.524, 3.55], 8.04],
    [[5.35, 1, 0.508, 2.2], 25.1],
    [[15, 6.8, 1.575, 2.2], 13.71],
    [[15, 6, 1.575, 2.2], 12.46],
    [[15, 5, 1.575, 2.2], 11.08],
  ])('puts the zero phase of %j at %d GHz', (lengths, expectedGHz) => {
    const decimals = String(expectedGHz).split('.')[1]?.length ?? 0;
    expect(Math.abs(zeroPhaseGHz(grid(lengths)) - expectedGHz)).toBeLessThan(decimals === 1 ? 0.051 : 0.0051);
  });

  // Zero-phase frequency of an independent full-wave method of moments, itself good to about 0.5 %.
  it.each<readonly [readonly [number, number, number, number], number]>([
    [[2, 0.2, 1, 10.2], 11.7],
    [[5, 0.5, 1.6, 4.4], 8.74],
    [[4, 0.4, 1.524, 3.55], 10.89],
    [[6, 0.5, 1.575, 2.2], 10.15],
  ])('comes within 1.6 %% of a full-wave computation for %j', (lengths, fullWaveGHz) => {
    expect(Math.abs(zeroPhaseGHz(grid(lengths)) / fullWaveGHz - 1)).toBeLessThan(0.016);
  });

  it.each<readonly [readonly [number, number, number, number], number]>([
    [[12.49, 2.49, 1.524, 3.55], 6.68],
    [[5.35, 1, 0.508, 2.2], 19.7],
  ])('is 20 to 28 %% high for the half-wave cell %j, and warns of it', (lengths, fullWaveGHz) => {
    const excess = zeroPhaseGHz(grid(lengths)) / fullWaveGHz - 1;
    expect(excess).toBeGreaterThan(0.2);
    expect(excess).toBeLessThan(0.28);
    expect(gridModelWarnings(grid(lengths), fullWaveGHz * 1e9).length).toBeGreaterThan(0);
  });

  it('reflects like metal, -1, at low frequency', () => {
    const low = gridReflection(insideRange, { frequencyHz: 1e6, thetaRad: 0, polarisation: 'te' });
    expect(low.re).toBeCloseTo(-1, 5);
  });

  it('gives TE and TM alike at normal incidence', () => {
    const at = { frequencyHz: 10e9, thetaRad: 0 };
    const [te, tm] = [gridReflection(insideRange, { ...at, polarisation: 'te' }), gridReflection(insideRange, { ...at, polarisation: 'tm' })];
    expect(te.re).toBeCloseTo(tm.re, 14);
    expect(te.im).toBeCloseTo(tm.im, 14);
  });

  it('keeps the magnitude 1 without loss and below 1 with it', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e9, max: 18e9, noNaN: true }), fc.double({ min: 0, max: 80, noNaN: true }), fc.constantFrom<'te' | 'tm'>('te', 'tm'), (frequencyHz, thetaDeg, polarisation) => {
        const incidence = { frequencyHz, thetaRad: radFromDeg(thetaDeg), polarisation };
        const lossless = gridReflection(insideRange, incidence);
        const lossy = gridReflection({ ...insideRange, lossTangent: 0.02 }, incidence);
        expect(Math.hypot(lossless.re, lossless.im)).toBeCloseTo(1, 10);
        expect(Math.hypot(lossy.re, lossy.im)).toBeLessThan(1);
      }),
      { seed: 91 },
    );
  });

  it('lags more at a higher frequency, as exp(+jwt) demands', () => {
    const phases = [9, 10, 11, 12, 13].map((GHz) => phaseDeg(gridReflection(insideRange, { frequencyHz: GHz * 1e9, thetaRad: 0, polarisation: 'te' })));
    phases.slice(1).forEach((phase, i) => expect(phase).toBeLessThan(phases[i]));
  });

  it('shifts the resonance of a 45 degree TM wave by the shorter slab only', () => {
    // At the zero phase of TM the grid is unchanged and the slab is lowered by 1 - sin^2/eps_r: the sum of susceptances vanishes.
    const tm = zeroPhaseFrequency(insideRange, radFromDeg(45), 'tm');
    if (tm.kind === 'not-reached') throw new Error('not reached');
    expect(phaseDeg(gridReflection(insideRange, { frequencyHz: tm.frequencyHz, thetaRad: radFromDeg(45), polarisation: 'tm' }))).toBeCloseTo(0, 6);
    expect(tm.frequencyHz / 1e9).toBeGreaterThan(zeroPhaseGHz(insideRange));
  });
});

describe('groundedSlabReflection', () => {
  const slab = { thicknessM: 1.575e-3, relativePermittivity: 2.2, lossTangent: 0 };

  it('turns back a quarter-wave slab in phase', () => {
    const frequencyHz = 299_792_458 / (4 * 1.575e-3 * Math.sqrt(2.2));
    const reflection = groundedSlabReflection(slab, { frequencyHz, thetaRad: 0, polarisation: 'te' });
    expect([reflection.re, reflection.im]).toEqual([expect.closeTo(1, 9), expect.closeTo(0, 9)]);
  });

  it('turns back a half-wave slab as bare metal does', () => {
    const frequencyHz = 299_792_458 / (2 * 1.575e-3 * Math.sqrt(2.2));
    const reflection = groundedSlabReflection(slab, { frequencyHz, thetaRad: 0, polarisation: 'te' });
    expect([reflection.re, reflection.im]).toEqual([expect.closeTo(-1, 9), expect.closeTo(0, 9)]);
  });

  it('gives the line formula 180 - 2 atan(tan(beta h) / sqrt(eps_r)) degrees at normal incidence', () => {
    const k0h = (2 * Math.PI * 10e9 * 1.575e-3) / 299_792_458;
    const expectedDeg = 180 - (2 * Math.atan(Math.tan(k0h * Math.sqrt(2.2)) / Math.sqrt(2.2)) * 180) / Math.PI;
    expect(phaseDeg(groundedSlabReflection(slab, { frequencyHz: 10e9, thetaRad: 0, polarisation: 'tm' }))).toBeCloseTo(expectedDeg, 10);
  });

  it('is what a grid of vanishing patches tends to', () => {
    const at = { frequencyHz: 10e9, thetaRad: 0.5, polarisation: 'tm' } as const;
    const grid = gridReflection({ ...slab, periodM: 2e-3, gapM: 2e-3 - 1e-9 }, at);
    expect(grid.re).toBeCloseTo(groundedSlabReflection(slab, at).re, 9);
  });
});

describe('gridModelWarnings', () => {
  it('has none within its range', () => {
    expect(gridModelWarnings(insideRange, 10e9)).toEqual([]);
  });

  it('names the lengths that are outside', () => {
    expect(gridModelWarnings(grid([15, 8, 1.575, 2.2]), 10e9)).toEqual([
      'The cell is too large for the grid model: period times root of effective permittivity 18.97 mm, at most a quarter wave 7.495 mm',
      'The slab is too thin for the grid model: 1.575 mm, at least a third of the period 5 mm',
      'The gaps are too wide for the grid model: 8 mm, at most half the period 7.5 mm',
    ]);
  });
});

describe('what cannot be', () => {
  const incidence = { frequencyHz: 10e9, thetaRad: 0, polarisation: 'te' } as const;

  it.each([
    [{ ...insideRange, gapM: 0.003 }, incidence, 'The gap must be smaller than the period 0.002 m; got 0.003 m'],
    [{ ...insideRange, thicknessM: 0 }, incidence, 'The thickness must be greater than 0 m; got 0 m'],
    [{ ...insideRange, relativePermittivity: 0.5 }, incidence, 'The relative permittivity must be at least 1; got 0.5'],
    [{ ...insideRange, lossTangent: -1 }, incidence, 'The loss tangent must be at least 0; got -1'],
    [insideRange, { ...incidence, frequencyHz: Number.NaN }, 'The frequency must be greater than 0 Hz; got NaN Hz'],
    [insideRange, { ...incidence, thetaRad: 1.6 }, 'The angle of incidence must be below 90 degrees; got 1.6 rad'],
  ])('is refused by name and value (%#)', (patchGrid, at, message) => {
    expect(() => gridReflection(patchGrid, at)).toThrow(message);
  });
});
