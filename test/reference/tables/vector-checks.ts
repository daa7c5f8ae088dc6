import { hornAxis, hornPower } from '../../../shared/antenna/horn-field';
import { elementPower } from '../../../shared/antenna/radiation-pattern';
import { exactVectorField, type ExactFieldQuery } from '../../../shared/antenna/vector/exact-vector-field';
import { localWave, newLocalWave, type LocalWave } from '../../../shared/antenna/vector/local-wave';
import { polarisationVector } from '../../../shared/antenna/vector/polarisation-vector';
import { coAndCross, reradiatedField, sphericalField } from '../../../shared/antenna/vector/reradiation';
import { isotropicMatrix, leavingWave, rotatedCellMatrix, scattered, type ScatteringMatrix } from '../../../shared/antenna/vector/scattering';
import { newFieldSample, vectorHornPattern, vectorHornPower, type FieldSample } from '../../../shared/antenna/vector/vector-horn';
import { wavePower } from '../../../shared/antenna/vector/vector-light';
import { vectorCapturedShare } from '../../../shared/antenna/vector/vector-spillover';
import type { Polarisation } from '../../../shared/model/design-document';
import { degFromRad, radFromDeg } from '../../../shared/units/angles';
import { powerRatioToDb } from '../../../shared/units/decibels';
import { directionOf, wavenumberRadPerM, type Direction } from '../../../shared/waves/conventions';
import type { Complex } from '../../../shared/waves/polarisation';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { fieldsIn, placeVector, siHornIn, vectorDesign } from '../vector-panels';

type Fields = Readonly<Record<string, unknown>>;

/** Complex numbers as the checks print them: [re, im]. */
function pairOf({ re, im }: Complex): number[] {
  return [re, im];
}

function unitTowards(from: readonly number[], to: readonly number[]): [number, number, number] {
  const [x, y, z] = to.map((value, i) => value - from[i]);
  const length = Math.hypot(x, y, z);
  return [x / length, y / length, z / length];
}

/** The horn's field at a point, times the distance and without its path phase. */
function fieldTimesDistance(inputs: Fields, pointName: string): { field: FieldSample; travel: [number, number, number] } {
  const horn = fieldsIn(inputs, 'horn');
  const travel = unitTowards(numbersIn(horn, 'pos_mm'), numbersIn(inputs, pointName));
  return { field: vectorHornPattern(siHornIn(horn))(...travel, newFieldSample()), travel };
}

function compareHornField(check: PublishedCheck): void {
  const { field } = fieldTimesDistance(check.inputs, 'point_mm');
  const horn = siHornIn(fieldsIn(check.inputs, 'horn'));
  const power = vectorHornPower(horn);
  const expected = (check.expected['E_xyz_times_R_without_path_phase'] as number[][]).flat();
  expectWithin({ quantity: 'E R', unit: '', got: [field.xRe, field.xIm, field.yRe, field.yIm, field.zRe, field.zIm], expected, tolerance: toleranceOf(check, 'abs') });
  expectWithin({ quantity: 'power', unit: '', got: power, expected: numberIn(check.expected, 'horn_power'), tolerance: toleranceOf(check, 'abs') });
  expectWithin({ quantity: 'axial gain', unit: 'dBi', got: powerRatioToDb((4 * Math.PI) / power), expected: numberIn(check.expected, 'horn_axial_gain_dBi'), tolerance: toleranceOf(check, 'dB') });
}

function matrixIn(rows: unknown): ScatteringMatrix {
  const [[s11, s12], [s21, s22]] = (rows as number[][][]).map((row) => row.map(([re, im]) => ({ re, im })));
  return { s11, s12, s21, s22 };
}

function compareCell(check: PublishedCheck): void {
  const { field, travel } = fieldTimesDistance(check.inputs, 'cell_mm');
  const wave = localWave(field, travel, newLocalWave());
  const root = Math.sqrt(wave.cosIncidence);
  const out = reradiatedField(leavingWave(matrixIn(check.inputs['S_rows_re_im']), wave), 'aperture');
  const rows: [string, number[], number[]][] = [
    ['theta_i_deg', [degFromRad(Math.acos(wave.cosIncidence))], [numberIn(check.expected, 'theta_i_deg')]],
    ['phi_i_deg', [degFromRad(Math.atan2(wave.sinAzimuth, wave.cosAzimuth))], [numberIn(check.expected, 'phi_i_deg')]],
    ['E_TE', [wave.teRe / root, wave.teIm / root], numbersIn(check.expected, 'E_TE')],
    ['E_TM_tangential', [wave.tmRe * root, wave.tmIm * root], numbersIn(check.expected, 'E_TM_tangential')],
    ['a_TE', [wave.teRe, wave.teIm], numbersIn(check.expected, 'a_TE')],
    ['a_TM', [wave.tmRe, wave.tmIm], numbersIn(check.expected, 'a_TM')],
    ['E_out_x', pairOf(out.x), numbersIn(check.expected, 'E_out_x')],
    ['E_out_y', pairOf(out.y), numbersIn(check.expected, 'E_out_y')],
  ];
  for (const [quantity, got, expected] of rows) expectWithin({ quantity, unit: '', got, expected, tolerance: toleranceOf(check, 'abs') });
}

/** One cell at the origin that sends out a wave. */
function oneCell(wave: LocalWave, [sideXMm, sideYMm]: readonly number[], frequencyGHz: number): ExactFieldQuery {
  const single = (value: number): Float64Array => Float64Array.of(value);
  return {
    lattice: { count: 1, xM: single(0), yM: single(0), cellAreaM2: (sideXMm * sideYMm) / 1e6 },
    sideXM: sideXMm / 1000,
    sideYM: sideYMm / 1000,
    light: { cosIncidence: single(wave.cosIncidence), cosAzimuth: single(wave.cosAzimuth), sinAzimuth: single(wave.sinAzimuth) },
    pathM: single(0),
    leaving: { teRe: single(wave.teRe), teIm: single(wave.teIm), tmRe: single(wave.tmRe), tmIm: single(wave.tmIm) },
    wavenumber: wavenumberRadPerM(frequencyGHz * 1e9),
    reradiation: 'aperture',
    cellFactor: 'normal',
    beam: directionOf(0, 0),
  };
}

function directionIn(record: Fields): Direction {
  return directionOf(radFromDeg(numberIn(record, 'theta')), radFromDeg(numberIn(record, 'phi')));
}

function compareFarField(check: PublishedCheck): void {
  const [[xRe, xIm], [yRe, yIm]] = check.inputs['E_tangential_xy'] as number[][];
  const wave = { ...newLocalWave(), tmRe: xRe, tmIm: xIm, teRe: yRe, teIm: yIm };
  const fieldAt = exactVectorField(oneCell(wave, numbersIn(check.inputs, 'period_mm'), numberIn(check.inputs, 'f_GHz')));
  for (const row of check.expected['far_field_times_r'] as Fields[]) {
    const direction = directionIn(row);
    const field = fieldAt(direction);
    const { co, cross } = coAndCross(field, direction, check.inputs['reference'] as Polarisation);
    const got = [field.theta, field.phi, co, cross].flatMap(pairOf);
    const expected = ['E_theta', 'E_phi', 'co', 'cross'].flatMap((name) => numbersIn(row, name));
    // Relative to the largest component, so that a zero can be compared.
    const largest = Math.max(...expected.map(Math.abs));
    expectWithin({ quantity: `far field at ${String(row['theta'])}, ${String(row['phi'])}`, unit: '', got, expected, tolerance: toleranceOf(check, 'rel') * largest });
  }
}

function polar(pair: unknown): Complex {
  const [magnitude, deg] = pair as number[];
  return isotropicMatrix(magnitude, radFromDeg(deg)).s11;
}

/** Normal incidence from z > 0, so the wave travels along -z; broadside after reflection. */
function compareRotatedCell(check: PublishedCheck): void {
  const matrix = rotatedCellMatrix(polar(check.inputs['Gamma1_mag_deg']), polar(check.inputs['Gamma2_mag_deg']), radFromDeg(numberIn(check.inputs, 'psi_deg')));
  const broadside = directionOf(0, 0);
  for (const sense of ['rhcp', 'lhcp'] as const) {
    const { re, im } = polarisationVector([0, 0, -1], sense);
    const [x, y] = scattered(matrix, { re: re[0], im: im[0] }, { re: re[1], im: im[1] });
    const { co, cross } = coAndCross(sphericalField({ x, y }, broadside, 'aperture'), broadside, sense);
    const wanted = fieldsIn(check.expected, `${sense}_in`);
    const got = [...pairOf(co), ...pairOf(cross)];
    const expected = [...numbersIn(wanted, 'same_sense'), ...numbersIn(wanted, 'opposite_sense')];
    expectWithin({ quantity: `${sense} in`, unit: '', got, expected, tolerance: toleranceOf(check, 'abs') });
  }
}

export const vectorChecks: CheckTable = {
  'rm2-axes-01': (check) => {
    const horn = siHornIn({ ...check.inputs, qE: 1, qH: 1, pol: 'x' });
    const axis = hornAxis(horn);
    const tolerance = toleranceOf(check, 'abs');
    const { re, im } = polarisationVector(axis, 'rhcp');
    expectWithin({ quantity: 'axis', unit: '', got: axis, expected: numbersIn(check.expected, 'b'), tolerance });
    expectWithin({ quantity: 'x', unit: '', got: polarisationVector(axis, 'x').re, expected: numbersIn(check.expected, 'p_x'), tolerance });
    expectWithin({ quantity: 'y', unit: '', got: polarisationVector(axis, 'y').re, expected: numbersIn(check.expected, 'p_y'), tolerance });
    const rhcp = (check.expected['p_rhcp'] as number[][]).flat();
    expectWithin({ quantity: 'rhcp', unit: '', got: [re[0], im[0], re[1], im[1], re[2], im[2]], expected: rhcp, tolerance });
  },
  'rm2-horn-01': compareHornField,
  'rm2-horn-02': compareHornField,
  'rm2-horn-03': (check) => {
    const horn = siHornIn({ pos_mm: [0, 0, 100], aim_mm: [0, 0, 0], qE: check.inputs['qE'], qH: check.inputs['qH'], pol: 'x' });
    const vector = vectorHornPower(horn);
    const coPolar = hornPower(horn);
    const gain = (power: number): number => powerRatioToDb((4 * Math.PI) / power);
    const { expected } = check;
    expectWithin({ quantity: 'power', unit: '', got: [vector, coPolar], expected: [numberIn(expected, 'vector_power'), numberIn(expected, 'copolar_power')], tolerance: toleranceOf(check, 'abs') });
    const share = powerRatioToDb((vector - coPolar) / vector);
    expectWithin({ quantity: 'cross-polar share', unit: 'dB', got: share, expected: numberIn(expected, 'horn_cross_polar_share_dB'), tolerance: toleranceOf(check, 'dB') });
    const gains = [numberIn(expected, 'axial_gain_vector_dBi'), numberIn(expected, 'axial_gain_if_scalar_power_is_used_dBi')];
    expectWithin({ quantity: 'axial gain', unit: 'dBi', got: [gain(vector), gain(coPolar)], expected: gains, tolerance: toleranceOf(check, 'dB') });
  },
  'rm2-cell-01': compareCell,
  'rm2-cell-02': compareCell,
  'rm2-far-01': compareFarField,
  'rm2-far-02': compareFarField,
  'rm2-spill-01': (check) => {
    const placed = placeVector(vectorDesign({ ...check.inputs, f0_GHz: 28, beam: { theta: 0, phi: 0 } }, {}));
    const horn = siHornIn(fieldsIn(check.inputs, 'horn'));
    const exact = powerRatioToDb(vectorCapturedShare(horn, placed.si.panel.outline).fraction);
    const summed = powerRatioToDb((placed.lattice.cellAreaM2 * wavePower(placed.vector.waves)) / vectorHornPower(horn));
    const expected = [numberIn(check.expected, 'spillover_dB'), numberIn(check.expected, 'cell_sum_dB')];
    expectWithin({ quantity: 'spillover, exact and by cells', unit: 'dB', got: [exact, summed], expected, tolerance: toleranceOf(check, 'dB') });
  },
  'rm2-id-01': (check) => {
    const incidence = radFromDeg(numberIn(check.inputs, 'theta_i'));
    const beam = directionOf(radFromDeg(numberIn(check.inputs, 'theta_o')), 0);
    // Travelling towards +x and -z; E of unit size across the plane of incidence, or in it.
    const travel: [number, number, number] = [Math.sin(incidence), 0, -Math.cos(incidence)];
    const te = localWave({ ...newFieldSample(), yRe: 1 }, travel, newLocalWave());
    const tm = localWave({ ...newFieldSample(), xRe: Math.cos(incidence), zRe: Math.sin(incidence) }, travel, newLocalWave());
    const scalar = Math.sqrt(Math.cos(incidence) * elementPower(beam.w, 0.5));
    const ratio = (wave: LocalWave): number => {
      const { theta, phi } = sphericalField(reradiatedField(leavingWave(isotropicMatrix(1, 0), wave), 'aperture'), beam, 'aperture');
      return Math.hypot(theta.re, theta.im, phi.re, phi.im) / scalar;
    };
    const got = [ratio(te), ratio(tm), ratio(te) * ratio(tm)];
    const expected = [numberIn(check.expected, 'TE_field_over_RM1'), numberIn(check.expected, 'TM_field_over_RM1'), numberIn(check.expected, 'product')];
    expectWithin({ quantity: 'TE, TM and their product', unit: '', got, expected, tolerance: toleranceOf(check, 'abs') });
  },
  'cp-01': compareRotatedCell,
  'cp-02': compareRotatedCell,
};
