import { illuminatedState } from '../../../shared/antenna/illuminated-state';
import { hornPower } from '../../../shared/antenna/horn-field';
import { placeCells } from '../../../shared/antenna/place-cells';
import { predictDesign } from '../../../shared/antenna/predict-design';
import { withinHalfPower } from '../../../shared/antenna/vector/cross-polar-figures';
import { exactRadiatedPower, exactVectorField } from '../../../shared/antenna/vector/exact-vector-field';
import { matrixStock } from '../../../shared/antenna/vector/matrix-stock';
import { coAndCross, type Reradiation } from '../../../shared/antenna/vector/reradiation';
import { vectorHornPower } from '../../../shared/antenna/vector/vector-horn';
import { wavePower } from '../../../shared/antenna/vector/vector-light';
import { coPolarWeigher } from '../../../shared/antenna/vector/co-polar-weights';
import type { CellAssignment } from '../../../shared/antenna/cell-stock';
import { powerRatioToDb } from '../../../shared/units/decibels';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { numberOf } from '../test-arrays';
import { exactQuery, fieldsIn, obliquePatches, placeVector, vectorDesign, type VectorOptions } from '../vector-panels';
import { stateOf } from '../vector-states';

type Fields = Readonly<Record<string, unknown>>;

/** Gain of the scalar model as an absolute field over the power of the horn, not by way of its directivity. */
function absoluteScalarGainDbi(inputs: Fields): { gainDbi: number; directivityDbi: number } {
  const { prediction, ...rest } = vectorDesign(inputs, {});
  const design = { ...rest, prediction: { receiveExponent: prediction.receiveExponent, radiateExponent: prediction.radiateExponent } };
  const placed = placeCells(design);
  const { pattern, wavelengthM } = illuminatedState(placed);
  if (placed.si.illumination.kind !== 'horn') throw new Error('no horn');
  const directivityDbi = numberOf(predictDesign(design, { include: {} }).figures.directivityAtBeamDbi);
  const radiated = pattern.radiatedPower * (placed.lattice.cellAreaM2 / wavelengthM) ** 2;
  return { directivityDbi, gainDbi: directivityDbi + powerRatioToDb(radiated / hornPower(placed.si.illumination)) };
}

function vectorGainDbi(inputs: Fields, options: VectorOptions): number {
  return stateOf(placeVector(vectorDesign(inputs, options))).result.gainAtBeamDbi;
}

function compareForms(check: PublishedCheck): void {
  const designs = fieldsIn(check.inputs, 'designs');
  const within = (quantity: string, got: number, expected: number, tolerance: string): void =>
    expectWithin({ quantity, unit: 'dB', got, expected, tolerance: toleranceOf(check, tolerance) });
  for (const [name, design] of Object.entries(designs)) {
    for (const [word, reradiation] of [['aperture', 'aperture'], ['power', 'power-wave']] as const) {
      const wanted = fieldsIn(fieldsIn(check.expected, name), word);
      const placed = placeVector(vectorDesign(design as Fields, { reradiation, cellFactor: 'none' }));
      const state = stateOf(placed);
      const at = `${name}, ${word}`;
      within(`gain, ${at}`, state.result.gainAtBeamDbi, numberIn(wanted, 'gain_at_beam_dBi'), 'dB');
      within(`projection, ${at}`, state.result.budget.projectionDb, numberIn(wanted, 'projection_dB'), 'dB');
      within(`radiated over leaving, ${at}`, numberOf(state.radiatedOverLeavingDb), numberIn(wanted, 'radiated_over_leaving_dB'), 'dB');
      const worst = withinHalfPower(state.pattern, placed.si.beams[0].direction)?.worstDiscriminationDb ?? NaN;
      within(`worst XPD, ${at}`, worst, numberIn(wanted, 'xpd_worst_3dB_dB'), 'xpd_dB');
      const atBeam = state.discriminationDb;
      if (typeof wanted['xpd_beam_dB'] === 'number') within(`XPD at the beam, ${at}`, atBeam, wanted['xpd_beam_dB'], 'xpd_dB');
      else expect(atBeam).toBeGreaterThan(100);
    }
  }
}

/** By plain sums over the cells. */
function exactPair(placed: ReturnType<typeof placeVector>, { horn, leaving }: { horn: number; leaving: number }): number[] {
  const query = exactQuery(placed, { reradiation: 'aperture', cellFactor: 'incident' });
  const beam = placed.si.beams[0].direction;
  const { co } = coAndCross(exactVectorField(query)(beam), beam, 'x');
  return [powerRatioToDb((4 * Math.PI * (co.re * co.re + co.im * co.im)) / horn), powerRatioToDb(exactRadiatedPower(query) / leaving)];
}

function transformedPair(placed: ReturnType<typeof placeVector>, cellFactor: 'normal' | 'none' | 'beam'): number[] {
  const state = stateOf(placed, { cellFactor });
  return [state.result.gainAtBeamDbi, numberOf(state.radiatedOverLeavingDb)];
}

function compareFactors(check: PublishedCheck): void {
  const placed = placeVector(vectorDesign(check.inputs, { reradiation: 'aperture', cellFactor: 'normal' }));
  const { lattice, vector, si } = placed;
  if (si.illumination.kind !== 'horn') throw new Error('no horn');
  const leaving = lattice.cellAreaM2 * wavePower(vector.stock.leaving(placed.assignment, si.designFrequencyHz));
  const captured = lattice.cellAreaM2 * wavePower(vector.waves);
  const horn = vectorHornPower(si.illumination);
  const tolerance = toleranceOf(check, 'dB');
  for (const cellFactor of ['normal', 'none', 'beam', 'incident'] as const) {
    const wanted = fieldsIn(check.expected, cellFactor);
    const got = cellFactor === 'incident' ? exactPair(placed, { horn, leaving }) : transformedPair(placed, cellFactor);
    const expected = [numberIn(wanted, 'gain_at_beam_dBi'), numberIn(wanted, 'radiated_over_leaving_dB')];
    expectWithin({ quantity: `gain and radiated over leaving, ${cellFactor}`, unit: 'dB', got, expected, tolerance });
  }
  const shares = [powerRatioToDb(leaving / captured), powerRatioToDb(captured / horn)];
  expectWithin({ quantity: 'leaving over captured, captured over horn', unit: 'dB', got: shares, expected: [numberIn(check.expected, 'leaving_over_captured_dB'), numberIn(check.expected, 'captured_over_horn_dB')], tolerance });
}

/** The same panel with its cells chosen otherwise. */
function compareChoices(check: PublishedCheck): void {
  const placed = placeVector(vectorDesign(check.inputs, { reradiation: 'aperture', cellFactor: 'normal' }));
  const { light, si, targetRad, vector, design } = placed;
  const site = { light, designFrequencyHz: si.designFrequencyHz, si, edition: obliquePatches(), waves: vector.waves, form: vector.form, weigher: coPolarWeigher(vector.waves, vector.form) };
  const linear = matrixStock(design.cells, site, 'linear');
  const normal = matrixStock(design.cells, { ...site, light: { ...light, incidenceRad: new Float64Array(light.incidenceRad.length) } });
  const used = (assignment: CellAssignment, stock = vector.stock): ReturnType<typeof stateOf>['result'] => stateOf({ ...placed, assignment, vector: { ...vector, stock } }).result;
  const differing = ({ cellIndex }: CellAssignment): number => cellIndex.reduce((sum, k, n) => sum + (k === placed.assignment.cellIndex[n] ? 0 : 1), 0);
  const [byLinear, byNormal] = [linear.assign(targetRad), normal.assign(targetRad)];
  const expected = (name: string, figure: string): number => numberIn(fieldsIn(check.expected, name), figure);
  const cells = [differing(byNormal), differing(byLinear)];
  const wantedCells = [expected('normal_incidence_choice', 'cells_differing'), expected('linear_theta_choice_true_poly_response', 'cells_differing')];
  expectWithin({ quantity: 'cells that differ', unit: '', got: cells, expected: wantedCells, tolerance: toleranceOf(check, 'cells') });
  const [own, atNormal] = [used(placed.assignment), used(byNormal)];
  const gains = [own, atNormal, used(byLinear), used(byLinear, linear)].map((result) => result.gainAtBeamDbi);
  const names = ['local_incidence', 'normal_incidence_choice', 'linear_theta_choice_true_poly_response', 'linear_theta_choice_and_response'];
  expectWithin({ quantity: 'gains', unit: 'dBi', got: gains, expected: names.map((name) => expected(name, 'gain_at_beam_dBi')), tolerance: toleranceOf(check, 'dB') });
  const errors = [own.phaseErrorRmsDeg, atNormal.phaseErrorRmsDeg];
  expectWithin({ quantity: 'rms phase error', unit: 'deg', got: errors, expected: names.slice(0, 2).map((name) => expected(name, 'phase_error_rms_deg')), tolerance: toleranceOf(check, 'deg') });
}

/** A horn at a distance along the direction (theta, 180), narrower the farther it stands, aimed at the centre. */
function distantHorn(inputs: Fields, heightMm: number): Fields {
  const theta = (numberIn(inputs, 'beam_theta_deg') * Math.PI) / 180;
  const q = numberIn(inputs, 'q0') * (heightMm / numbersIn(inputs, 'heights_mm')[0]) ** 2;
  const position = [-heightMm * Math.sin(theta), 0, heightMm * Math.cos(theta)];
  return { ...inputs, cells: 'ideal', beam: { theta: numberIn(inputs, 'beam_theta_deg'), phi: 0 }, horn: { pos_mm: position, aim_mm: [0, 0, 0], qE: q, qH: q, pol: 'x' } };
}

export const vectorFormChecks: CheckTable = {
  'k5-20-05': compareFactors,
  'k5-20-06': (check) => {
    const placed = placeVector(vectorDesign(check.inputs, { reradiation: 'aperture', cellFactor: 'normal' }));
    const state = stateOf(placed);
    const got = [numberOf(state.gainOffsetDb), numberOf(state.gainOffsetDb) - numberOf(state.radiatedOverLeavingDb), numberOf(state.radiatedOverLeavingDb)];
    const expected = ['radiated_over_horn_dB', 'leaving_over_horn_dB', 'radiated_over_leaving_dB'].map((name) => numberIn(check.expected, name));
    expectWithin({ quantity: 'radiated and leaving over horn, radiated over leaving', unit: 'dB', got, expected, tolerance: toleranceOf(check, 'dB') });
  },
  'k5-20-07': (check) => {
    const { inputs, expected } = check;
    const scalar = absoluteScalarGainDbi(inputs);
    const spilloverDb = stateOf(placeVector(vectorDesign(inputs, {}))).result.budget.spilloverDb;
    const rows: [string, number][] = [
      ['rm1_directivity_at_beam_dBi', scalar.directivityDbi],
      ['spillover_dB', spilloverDb],
      ['rm1_gain_dBi', scalar.directivityDbi + spilloverDb],
      ['rm1_absolute_gain_dBi', scalar.gainDbi],
      ['rm2_gain_without_cell_factor_dBi', vectorGainDbi(inputs, { reradiation: 'aperture', cellFactor: 'none' })],
      ['rm2_gain_normal_cell_factor_dBi', vectorGainDbi(inputs, { reradiation: 'aperture', cellFactor: 'normal' })],
      ['rm2p_gain_dBi', vectorGainDbi(inputs, { reradiation: 'power-wave', cellFactor: 'none' })],
    ];
    for (const [name, got] of rows) expectWithin({ quantity: name, unit: 'dB', got, expected: numberIn(expected, name), tolerance: toleranceOf(check, 'dB') });
  },
  'k5-20-08': compareForms,
  'k5-30-03': compareChoices,
  'rm2-lim-01': (check) => {
    for (const row of check.expected['rows'] as Fields[]) {
      const inputs = distantHorn(check.inputs, numberIn(row, 'height_mm'));
      const scalar = absoluteScalarGainDbi(inputs).gainDbi;
      const difference = (reradiation: Reradiation): number => vectorGainDbi(inputs, { reradiation, cellFactor: 'none' }) - scalar;
      const got = [difference('aperture'), difference('power-wave')];
      const expected = [numberIn(row, 'RM2_minus_RM1_dB'), numberIn(row, 'RM2P_minus_RM1_dB')];
      expectWithin({ quantity: `against the scalar model at ${numberIn(row, 'height_mm')} mm`, unit: 'dB', got, expected, tolerance: toleranceOf(check, 'dB') });
    }
  },
};
