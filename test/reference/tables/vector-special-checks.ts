import { rowIntervals } from '../../../shared/antenna/outline';
import { discriminationDb } from '../../../shared/antenna/vector/cross-polar-figures';
import { cellRotationRad } from '../../../shared/antenna/vector/cell-rotation';
import { arrivingXY } from '../../../shared/antenna/vector/co-polar-weights';
import { exactVectorField, fieldPower, type ExactFieldQuery } from '../../../shared/antenna/vector/exact-vector-field';
import { gainBudget } from '../../../shared/antenna/vector/gain-budget';
import { localWave, newLocalWave } from '../../../shared/antenna/vector/local-wave';
import { coAndCross } from '../../../shared/antenna/vector/reradiation';
import { isotropicMatrix, METAL, rotatedCellMatrix, scattered } from '../../../shared/antenna/vector/scattering';
import { newFieldSample, vectorHornPattern, vectorHornPower } from '../../../shared/antenna/vector/vector-horn';
import { newVectorWaves, type VectorWaves } from '../../../shared/antenna/vector/vector-light';
import { vectorPattern } from '../../../shared/antenna/vector/vector-pattern';
import { vectorCapturedShare } from '../../../shared/antenna/vector/vector-spillover';
import { degFromRad, radFromDeg } from '../../../shared/units/angles';
import { powerRatioToDb } from '../../../shared/units/decibels';
import { directionOf, wavenumberRadPerM, type Direction } from '../../../shared/waves/conventions';
import { axialRatioDb, type Complex } from '../../../shared/waves/polarisation';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { exactQuery, fieldsIn, placeVector, rowByRow, siHornIn, vectorDesign } from '../vector-panels';

type Fields = Readonly<Record<string, unknown>>;
type Placed = ReturnType<typeof placeVector>;

function polar(pair: unknown): Complex {
  const [magnitude, deg] = pair as number[];
  return isotropicMatrix(magnitude, radFromDeg(deg)).s11;
}

/** Cells of two axes, each turned so that the kept sense is in phase at the beam; the tangential field is theirs to change. */
function rotatedPanel(check: PublishedCheck, placed: Placed): { leaving: VectorWaves; psiRad: number[] } {
  const { vector, light, lattice, si } = placed;
  const wavenumber = wavenumberRadPerM(si.designFrequencyHz);
  const { u, v } = si.beams[0].direction;
  const [first, second] = [polar(check.inputs['Gamma1_mag_deg']), polar(check.inputs['Gamma2_mag_deg'])];
  const leaving = newVectorWaves(lattice.count);
  const psiRad: number[] = [];
  for (let n = 0; n < lattice.count; n++) {
    const [xRe, xIm, yRe, yIm] = arrivingXY(vector.waves, { reradiation: 'aperture' }, n);
    const phase = wavenumber * (lattice.xM[n] * u + lattice.yM[n] * v - light.pathM[n]);
    const psi = cellRotationRad({ x: { re: xRe, im: xIm }, y: { re: yRe, im: yIm } }, phase, 'rhcp');
    psiRad.push(psi);
    const [x, y] = scattered(rotatedCellMatrix(first, second, psi), { re: xRe, im: xIm }, { re: yRe, im: yIm });
    const sine = Math.sqrt(1 - vector.waves.cosIncidence[n] ** 2);
    const travel = [sine * vector.waves.cosAzimuth[n], sine * vector.waves.sinAzimuth[n], -vector.waves.cosIncidence[n]] as const;
    const wave = localWave({ ...newFieldSample(), xRe: x.re, xIm: x.im, yRe: y.re, yIm: y.im }, travel, newLocalWave());
    [leaving.teRe[n], leaving.teIm[n], leaving.tmRe[n], leaving.tmIm[n]] = [wave.teRe, wave.teIm, wave.tmRe, wave.tmIm];
  }
  return { leaving, psiRad };
}

function compareRotatedPanel(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const placed = placeVector(vectorDesign({ ...inputs, cells: 'ideal' }, { reradiation: 'aperture', cellFactor: 'normal' }));
  const { vector, light, lattice, si } = placed;
  const { leaving, psiRad } = rotatedPanel(check, placed);
  const horn = siHornIn(fieldsIn(inputs, 'horn'));
  const query = { lattice, light: vector.waves, pathM: light.pathM, leaving, wavenumber: wavenumberRadPerM(si.designFrequencyHz), form: vector.form };
  const result = gainBudget({ ...query, capturedShare: vectorCapturedShare(horn, si.panel.outline).fraction, sourcePower: vectorHornPower(horn) });
  const discrimination = discriminationDb(vectorPattern(query), vector.form.beam);
  const specular = directionOf(Math.atan2(Math.hypot(horn.position.xM, horn.position.yM), horn.position.zM), Math.atan2(-horn.position.yM, -horn.position.xM));
  const field = exactVectorField({ ...exactQuery(placed, { reradiation: 'aperture', cellFactor: 'normal' }), leaving })(specular);
  const { cross } = coAndCross(field, specular, 'rhcp');
  const opposite = powerRatioToDb((4 * Math.PI * (cross.re ** 2 + cross.im ** 2)) / vectorHornPower(horn));
  const got = [result?.gainAtBeamDbi ?? NaN, discrimination, axialRatioDb(discrimination), opposite];
  const names = ['gain_at_beam_dBi', 'xpd_beam_dB', 'axial_ratio_dB', 'opposite_sense_at_specular_dBi'];
  for (const [i, name] of names.entries()) expectWithin({ quantity: name, unit: 'dB', got: got[i], expected: numberIn(expected, name), tolerance: toleranceOf(check, 'dB') });
  for (const index of [0, 7]) {
    const wanted = numberIn(expected, `psi_deg_cell${index}`);
    const psi = degFromRad(psiRad[rowByRow(index, numberIn(inputs, 'nx'), numberIn(inputs, 'ny'))]);
    // A cell turned by half a turn is itself.
    const turned = psi - 180 * Math.round((psi - wanted) / 180);
    expectWithin({ quantity: `rotation of cell ${index}`, unit: 'deg', got: turned, expected: wanted, tolerance: toleranceOf(check, 'deg') });
  }
}

function directionIn(record: Fields): Direction {
  return directionOf(radFromDeg(numberIn(record, 'theta')), radFromDeg(numberIn(record, 'phi')));
}

/** The exact field of a bare metal plate on a lattice of some period. */
function metalQuery(inputs: Fields, parts: number, cellFactor: ExactFieldQuery['cellFactor']): ExactFieldQuery {
  const finer = { nx: numberIn(inputs, 'nx') * parts, ny: numberIn(inputs, 'ny') * parts, period_mm: numberIn(inputs, 'period_mm') / parts };
  const placed = placeVector(vectorDesign({ ...inputs, ...finer, cells: 'ideal', beam: { theta: 20, phi: 0 } }, { reradiation: 'aperture' }));
  const { waves } = placed.vector;
  const { s11 } = METAL;
  const leaving = { teRe: waves.teRe.map((x) => s11.re * x), teIm: waves.teIm.map((x) => s11.re * x), tmRe: waves.tmRe.map((x) => s11.re * x), tmIm: waves.tmIm.map((x) => s11.re * x) };
  return { ...exactQuery(placed, { reradiation: 'aperture', cellFactor }), leaving };
}

/** The horn's own field past the rim of a transmitting panel, added to that of the panel, which keeps its factor j. */
function comparePastRim(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const placed = placeVector(vectorDesign({ ...inputs, cells: 'ideal' }, { reradiation: 'aperture', cellFactor: 'normal' }));
  const { si, vector } = placed;
  const horn = siHornIn(fieldsIn(inputs, 'horn'));
  const through = numberIn(inputs, 'transmission_magnitude');
  const scaled = (values: Float64Array): Float64Array => values.map((value) => through * value);
  const own = vector.stock.leaving(placed.assignment, si.designFrequencyHz);
  const leaving = { teRe: scaled(own.teRe), teIm: scaled(own.teIm), tmRe: scaled(own.tmRe), tmIm: scaled(own.tmIm) };
  const query = { ...exactQuery(placed, { reradiation: 'aperture', cellFactor: 'normal' }), leaving };
  const panelAt = exactVectorField(query);
  const tolerance = toleranceOf(check, 'dB');
  const gain = (power: number): number => (power > 0 ? powerRatioToDb((4 * Math.PI * power) / vectorHornPower(horn)) : -99);
  const { co } = coAndCross(panelAt(si.beams[0].direction), si.beams[0].direction, 'x');
  const spillover = powerRatioToDb(vectorCapturedShare(horn, si.panel.outline).fraction);
  const mirrored = mirroredGain(check, gain, through);
  expectWithin({ quantity: 'gain', unit: 'dBi', got: [gain(co.re ** 2 + co.im ** 2), mirrored], expected: [numberIn(expected, 'gain_at_beam_dBi'), numberIn(expected, 'mirrored_reflecting_panel_dBi')], tolerance });
  expectWithin({ quantity: 'spillover', unit: 'dB', got: spillover, expected: numberIn(expected, 'spillover_dB'), tolerance });
  for (const row of expected['directions'] as Fields[]) {
    const direction = directionIn(row);
    const misses = rayMisses(horn.position, direction, placed);
    expect(misses).toBe(row['ray_misses_panel']);
    const panel = panelAt(direction);
    const direct = misses ? directField(horn, direction, query.wavenumber) : { theta: { re: 0, im: 0 }, phi: { re: 0, im: 0 } };
    // j times the panel's field.
    const total = {
      theta: { re: direct.theta.re - panel.theta.im, im: direct.theta.im + panel.theta.re },
      phi: { re: direct.phi.re - panel.phi.im, im: direct.phi.im + panel.phi.re },
    };
    const got = [panel, direct, total].map((field) => gain(fieldPower(field)));
    expectWithin({ quantity: `panel, horn and both at ${String(row['theta'])}, ${String(row['phi'])}`, unit: 'dBi', got, expected: ['panel_dBi', 'direct_horn_dBi', 'total_dBi'].map((name) => numberIn(row, name)), tolerance });
  }
}

/** The same horn mirrored to the front of a reflecting panel. */
function mirroredGain(check: PublishedCheck, gain: (power: number) => number, through: number): number {
  const horn = fieldsIn(check.inputs, 'horn');
  const [x, y, z] = numbersIn(horn, 'pos_mm');
  const placed = placeVector(vectorDesign({ ...check.inputs, cells: 'ideal', horn: { ...horn, pos_mm: [x, y, -z] } }, { reradiation: 'aperture', cellFactor: 'normal' }));
  const beam = placed.si.beams[0].direction;
  const { co } = coAndCross(exactVectorField(exactQuery(placed, { reradiation: 'aperture', cellFactor: 'normal' }))(beam), beam, 'x');
  return gain(through ** 2 * (co.re ** 2 + co.im ** 2));
}

function rayMisses(from: { xM: number; yM: number; zM: number }, { u, v, w }: Direction, { si }: Placed): boolean {
  const along = -from.zM / w;
  const [x, y] = [from.xM + along * u, from.yM + along * v];
  return !rowIntervals(si.panel.outline, y).some(([left, right]) => x >= left && x <= right);
}

function directField(horn: ReturnType<typeof siHornIn>, direction: Direction, wavenumber: number): { theta: Complex; phi: Complex } {
  const { u, v, w } = direction;
  const field = vectorHornPattern(horn)(u, v, w, newFieldSample());
  const phase = wavenumber * (horn.position.xM * u + horn.position.yM * v + horn.position.zM * w);
  const [c, s] = [Math.cos(phase), Math.sin(phase)];
  const phi = Math.atan2(v, u);
  const sine = Math.hypot(u, v);
  const along = (weights: readonly number[]): Complex => {
    const re = weights[0] * field.xRe + weights[1] * field.yRe + weights[2] * field.zRe;
    const im = weights[0] * field.xIm + weights[1] * field.yIm + weights[2] * field.zIm;
    return { re: re * c - im * s, im: re * s + im * c };
  };
  return { theta: along([w * Math.cos(phi), w * Math.sin(phi), -sine]), phi: along([-Math.sin(phi), Math.cos(phi), 0]) };
}

export const vectorSpecialChecks: CheckTable = {
  'cp-03': compareRotatedPanel,
  'cp-04': compareRotatedPanel,
  'rm2-plate-01': (check) => {
    const coarse = metalQuery(check.inputs, 1, 'incident');
    const fine = metalQuery(check.inputs, 5, 'none');
    const power = vectorHornPower(siHornIn(fieldsIn(check.inputs, 'horn')));
    for (const row of check.expected['rows'] as Fields[]) {
      const direction = directionIn(row);
      const gain = (query: ExactFieldQuery): number => powerRatioToDb((4 * Math.PI * fieldPower(exactVectorField(query)(direction))) / power);
      const got = [gain(coarse), gain(fine)];
      const expected = [numberIn(row, 'rm2_incident_factor_dBi'), numberIn(row, 'rm2_fine_cells_dBi')];
      expectWithin({ quantity: `plate at ${String(row['theta'])}, ${String(row['phi'])}`, unit: 'dBi', got, expected, tolerance: toleranceOf(check, 'dB') });
      // Physical optics of electric currents is another model, which the product does not offer: it bounds the choice of the obliquity.
      expect(Math.abs(got[1] - numberIn(row, 'physical_optics_dBi'))).toBeLessThan(0.17);
    }
  },
  'tx-01': comparePastRim,
};
