import { directionOf, type Direction } from '../../waves/conventions';
import type { Polarisation } from '../../model/design-document';
import type { LatticeGrid, PanelLattice } from '../panel-lattice';
import { rowShiftM } from '../panel-lattice';
import { patternPower } from '../radiation-pattern';
import { refinePeak } from '../refine-peak';
import { uvMap } from '../uv-map';
import { exactRadiatedPower, exactVectorField, type ExactFieldQuery } from './exact-vector-field';
import { coAndCross, reradiatedField } from './reradiation';
import { newVectorWaves, type VectorLight } from './vector-light';
import { bothPowers, vectorPattern, type VectorForm, type VectorPatternQuery } from './vector-pattern';

const K = 210;
const BEAM = directionOf(0.4, 0.7);

/** Cells with invented leaving waves, no two alike. */
function inventedPanel(columnCount: number, rowCount: number, stagger: LatticeGrid['stagger'] = 'none'): Omit<VectorPatternQuery, 'form'> {
  const grid: LatticeGrid = { columnCount, rowCount, firstXM: -0.05, firstYM: -0.04, stepXM: 0.014, stepYM: 0.012, stagger };
  const count = columnCount * rowCount;
  const of = (f: (n: number) => number): Float64Array => Float64Array.from({ length: count }, (_, n) => f(n));
  const row = Int32Array.from({ length: count }, (_, n) => Math.floor(n / columnCount));
  const column = Int32Array.from({ length: count }, (_, n) => n % columnCount);
  const lattice: PanelLattice = {
    grid,
    count,
    cellAreaM2: grid.stepXM * grid.stepYM,
    row,
    column,
    xM: of((n) => grid.firstXM + column[n] * grid.stepXM + rowShiftM(grid, row[n])),
    yM: of((n) => grid.firstYM + row[n] * grid.stepYM),
  };
  const light = { ...newVectorWaves(count), cosIncidence: of((n) => 0.6 + 0.3 * Math.sin(n) ** 2), cosAzimuth: of((n) => Math.cos(1.3 * n)), sinAzimuth: of((n) => Math.sin(1.3 * n)) };
  const leaving = { teRe: of((n) => Math.sin(2 * n + 1)), teIm: of((n) => Math.cos(5 * n)), tmRe: of((n) => Math.sin(n * n)), tmIm: of((n) => Math.cos(3 * n + 2)) };
  return { lattice, light: light as VectorLight, pathM: of((n) => 0.2 + 0.01 * Math.cos(7 * n)), leaving, wavenumber: K };
}

const forms = (['power-wave', 'aperture'] as const).flatMap((reradiation) => (['none', 'normal', 'beam'] as const).map((cellFactor) => ({ reradiation, cellFactor })));
const formOf = (form: Pick<VectorForm, 'reradiation' | 'cellFactor'>, polarisation: Polarisation = 'x'): VectorForm => ({ ...form, polarisation, beam: BEAM });
const exactOf = (panel: Omit<VectorPatternQuery, 'form'>, form: Pick<VectorForm, 'reradiation' | 'cellFactor'>): ExactFieldQuery => ({
  ...panel,
  ...form,
  sideXM: panel.lattice.grid.stepXM,
  sideYM: panel.lattice.grid.stepYM,
  beam: BEAM,
});
const LOOKS: readonly Direction[] = [directionOf(0, 0), directionOf(0.5, 2), directionOf(1.2, -1), directionOf(0.9, 0.3)];

describe('vectorPattern', () => {
  it.each(forms)('agrees with the plain sum over the cells for every polarisation, %p', (form) => {
    const panel = inventedPanel(9, 7);
    const fieldAt = exactVectorField(exactOf(panel, form));
    for (const polarisation of ['x', 'y', 'rhcp', 'lhcp'] as const) {
      const pattern = vectorPattern({ ...panel, form: formOf(form, polarisation) });
      for (const direction of LOOKS) {
        const { co, cross } = coAndCross(fieldAt(direction), direction, polarisation);
        const [gotCo, gotCross] = bothPowers(pattern, direction);
        expect(gotCo).toBeCloseTo(co.re ** 2 + co.im ** 2, 12);
        expect(gotCross).toBeCloseTo(cross.re ** 2 + cross.im ** 2, 12);
        expect(patternPower(pattern.cross, direction)).toBeCloseTo(gotCross, 12);
      }
    }
  });

  it.each(forms)('radiates what a quadrature of the plain sum finds, %p', (form) => {
    const panel = inventedPanel(5, 6, 'odd');
    const { radiatedPower } = vectorPattern({ ...panel, form: formOf(form) });
    expect(radiatedPower / exactRadiatedPower(exactOf(panel, form))).toBeCloseTo(1, 9);
  });

  it('has the same power in any pair of polarisations', () => {
    const panel = inventedPanel(6, 6);
    const power = (polarisation: Polarisation): number => vectorPattern({ ...panel, form: formOf({ reradiation: 'power-wave', cellFactor: 'none' }, polarisation) }).radiatedPower;
    expect(power('rhcp') / power('x')).toBeCloseTo(1, 12);
  });

  it('radiates in the aperture form what the closed form of every pair of cells gives', () => {
    const panel = inventedPanel(4, 5);
    const { radiatedPower } = vectorPattern({ ...panel, form: formOf({ reradiation: 'aperture', cellFactor: 'none' }) });
    expect(radiatedPower / pairSum(panel)).toBeCloseTo(1, 10);
  });

  it('interpolates larger panels to the same', () => {
    const panel = inventedPanel(40, 36, 'even');
    const form = formOf({ reradiation: 'aperture', cellFactor: 'normal' }, 'lhcp');
    const pattern = vectorPattern({ ...panel, form });
    const fieldAt = exactVectorField(exactOf(panel, form));
    for (const direction of LOOKS) {
      const { co } = coAndCross(fieldAt(direction), direction, 'lhcp');
      expect(bothPowers(pattern, direction)[0] / (co.re ** 2 + co.im ** 2)).toBeCloseTo(1, 5);
    }
  });

  it('climbs to a maximum of the mixed field, and maps it', () => {
    const panel = inventedPanel(12, 11);
    const { co } = vectorPattern({ ...panel, form: formOf({ reradiation: 'aperture', cellFactor: 'normal' }) });
    const peak = refinePeak(co, 0.2, 0.1);
    const around = [[1e-4, 0], [-1e-4, 0], [0, 1e-4], [0, -1e-4]].map(([du, dv]) => {
      const [u, v] = [peak.u + du, peak.v + dv];
      return (4 * Math.PI * patternPower(co, { u, v, w: Math.sqrt(1 - u * u - v * v) })) / co.radiatedPower;
    });
    expect(Math.max(...around)).toBeLessThanOrEqual(peak.directivityRatio);
    const map = uvMap(co, 5, 0);
    const middle = (4 * Math.PI * patternPower(co, { u: 0.5, v: 0, w: Math.sqrt(0.75) })) / co.radiatedPower;
    expect(map.gainDbi[2 * 5 + 3]).toBeCloseTo(10 * Math.log10(middle), 4);
  });
});

/**
 * Power of the aperture form without a cell factor, pair by pair: |E|^2 = |F|^2 - |u F_y - v F_x|^2, and the integral of
 * u_i u_j exp(j k r.u) over the hemisphere is 2 pi [j1(z)/z delta_ij - j2(z) r_i r_j/r^2] with spherical Bessel functions.
 */
function pairSum({ lattice, light, leaving, pathM }: Omit<VectorPatternQuery, 'form'>): number {
  const scale = (lattice.cellAreaM2 * K) / (2 * Math.PI);
  const fields = Array.from({ length: lattice.count }, (_, n) => {
    const wave = { cosIncidence: light.cosIncidence[n], cosAzimuth: light.cosAzimuth[n], sinAzimuth: light.sinAzimuth[n], teRe: leaving.teRe[n], teIm: leaving.teIm[n], tmRe: leaving.tmRe[n], tmIm: leaving.tmIm[n] };
    const { x, y } = reradiatedField(wave, 'aperture');
    const [c, s] = [scale * Math.cos(K * pathM[n]), -scale * Math.sin(K * pathM[n])];
    return { x: [x.re * c - x.im * s, x.re * s + x.im * c], y: [y.re * c - y.im * s, y.re * s + y.im * c] };
  });
  const product = (a: number[], b: number[]): number => a[0] * b[0] + a[1] * b[1];
  let total = 0;
  fields.forEach((a, m) =>
    fields.forEach((b, n) => {
      const [dx, dy] = [lattice.xM[m] - lattice.xM[n], lattice.yM[m] - lattice.yM[n]];
      const z = K * Math.hypot(dx, dy);
      const [zero, first, second] = sphericalBessel(z);
      const [ex, ey] = z === 0 ? [0, 0] : [(K * dx) / z, (K * dy) / z];
      const uu = first - second * ex * ex;
      const vv = first - second * ey * ey;
      const uv = -second * ex * ey;
      const kept = (product(a.x, b.x) + product(a.y, b.y)) * zero;
      const lost = product(a.y, b.y) * uu + product(a.x, b.x) * vv - (product(a.x, b.y) + product(a.y, b.x)) * uv;
      total += 2 * Math.PI * (kept - lost);
    }),
  );
  return total;
}

/** j0(z), j1(z)/z and j2(z). */
function sphericalBessel(z: number): [number, number, number] {
  if (z < 1e-3) return [1 - (z * z) / 6, 1 / 3 - (z * z) / 30, (z * z) / 15];
  const zero = Math.sin(z) / z;
  const first = Math.sin(z) / (z * z) - Math.cos(z) / z;
  return [zero, first / z, (3 * first) / z - zero];
}
