import type { Figures } from '../../../shared/model/figures';
import { predictPlaced } from '../../../shared/antenna/predict-design';
import { withinHalfPower } from '../../../shared/antenna/vector/cross-polar-figures';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { numberOf } from '../test-arrays';
import { fieldsIn, obliquePatches, placeVector, rowByRow, vectorDesign } from '../vector-panels';
import { stateOf } from '../vector-states';

type Fields = Readonly<Record<string, unknown>>;
type Row = readonly [quantity: string, unit: string, got: number, expected: number, tolerance: string];

function compareRows(check: PublishedCheck, rows: readonly Row[]): void {
  for (const [quantity, unit, got, expected, tolerance] of rows) expectWithin({ quantity, unit, got, expected, tolerance: toleranceOf(check, tolerance) });
}

const BUDGET_ITEMS = [
  ['area_dBi', 'areaDbi'], ['spillover_dB', 'spilloverDb'], ['cell_loss_dB', 'cellLossDb'], ['projection_dB', 'projectionDb'],
  ['cross_polar_dB', 'crossPolarDb'], ['taper_dB', 'taperDb'], ['phase_dB', 'phaseDb'], ['cell_factor_dB', 'cellFactorDb'],
] as const;

function budgetOf({ vector }: Figures): Extract<NonNullable<Figures['vector']>['budget'], { areaDbi: number }> {
  if (!vector || !('areaDbi' in vector.budget) || typeof vector.budget.areaDbi !== 'number') throw new Error('no budget');
  return vector.budget as ReturnType<typeof budgetOf>;
}

/** A design with full-wave cells from end to end, at every frequency that the reference gives. */
function comparePatchPanel(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const placed = placeVector(vectorDesign(inputs, { reradiation: 'aperture', cellFactor: 'normal' }));
  const sizes = obliquePatches().edition.cells.map(({ parametersMm }) => parametersMm[0]);
  const at = (index: number): number => placed.assignment.cellIndex[rowByRow(index, numberIn(inputs, 'nx'), numberIn(inputs, 'ny'))];
  for (const [index, mm] of Object.entries(fieldsIn(expected, 'patch_mm_of_cell'))) {
    expectWithin({ quantity: `patch of cell ${index}`, unit: 'mm', got: sizes[at(Number(index))], expected: Number(mm), tolerance: 1e-9 });
  }
  const counts = sizes.map((_, k) => placed.assignment.cellIndex.reduce((sum, chosen) => sum + (chosen === k ? 1 : 0), 0));
  expectWithin({ quantity: 'cells of each size', unit: '', got: counts, expected: numbersIn(expected, 'cells_per_size'), tolerance: 0 });
  for (const frequencyGHz of numbersIn(inputs, 'frequencies_GHz')) compareAt(check, placed, frequencyGHz);
}

function compareAt(check: PublishedCheck, placed: ReturnType<typeof placeVector>, frequencyGHz: number): void {
  const wanted = fieldsIn(check.expected, `${frequencyGHz}_GHz`);
  const { figures } = predictPlaced(placed, { frequencyGHz, include: {} });
  const budget = budgetOf(figures);
  const items = fieldsIn(wanted, 'budget');
  const name = (what: string): string => `${what} at ${frequencyGHz} GHz`;
  const [along, across] = numbersIn(wanted, 'hpbw_deg');
  const [sllAlong, sllAcross] = numbersIn(wanted, 'sll_dB');
  const hemisphere = figures.sidelobeDb.hemisphere;
  if (!('levelDb' in hemisphere) || !figures.vector) throw new Error('no lobe beside the beam, or no vector figures');
  const { vector } = figures;
  compareRows(check, [
    [name('gain at the beam'), 'dBi', numberOf(figures.gainAtBeamDbi), numberIn(wanted, 'gain_at_beam_dBi'), 'dB'],
    [name('sum of the budget'), 'dBi', BUDGET_ITEMS.reduce((sum, [, item]) => sum + budget[item], 0), numberIn(wanted, 'gain_at_beam_dBi'), 'dB'],
    ...BUDGET_ITEMS.map(([theirs, ours]): Row => [name(theirs), 'dB', budget[ours], numberIn(items, theirs), 'dB']),
    [name('rms phase error'), 'deg', numberOf(figures.phaseErrorRmsDeg), numberIn(wanted, 'phase_error_rms_deg'), 'deg'],
    [name('gain at the peak'), 'dBi', numberOf(figures.gainDbi), numberIn(wanted, 'peak_gain_dBi'), 'dB'],
    [name('theta of the peak'), 'deg', numberOf(figures.peakThetaDeg), numberIn(wanted, 'peak_theta_deg'), 'deg'],
    [name('phi of the peak'), 'deg', numberOf(figures.peakPhiDeg), numberIn(wanted, 'peak_phi_deg'), 'deg'],
    [name('beamwidth along'), 'deg', numberOf(figures.halfPowerBeamwidthDeg.along), along, 'deg'],
    [name('beamwidth across'), 'deg', numberOf(figures.halfPowerBeamwidthDeg.across), across, 'deg'],
    [name('sidelobe along'), 'dB', numberOf(figures.sidelobeDb.along), sllAlong, 'sll_dB'],
    [name('sidelobe across'), 'dB', numberOf(figures.sidelobeDb.across), sllAcross, 'sll_dB'],
    [name('highest lobe'), 'dB', numberOf(hemisphere.levelDb), numberIn(wanted, 'hemisphere_sll_dB'), 'sll_dB'],
    [name('worst XPD'), 'dB', numberOf(vector.worstDiscriminationDb), numberIn(wanted, 'xpd_worst_3dB_dB'), 'xpd_worst_dB'],
    [name('highest cross level'), 'dB', numberOf(vector.highestCrossPolarDb), numberIn(wanted, 'cross_max_3dB_rel_peak_dB'), 'xpd_worst_dB'],
  ]);
  compareDiscrimination(check, wanted, vector);
  compareSameCells(check, placed, frequencyGHz);
}

function compareDiscrimination(check: PublishedCheck, wanted: Fields, vector: NonNullable<Figures['vector']>): void {
  const atBeam = numberOf(vector.crossPolarDiscriminationDb[0]);
  if (typeof wanted['xpd_beam_dB'] === 'number') compareRows(check, [['XPD at the beam', 'dB', atBeam, wanted['xpd_beam_dB'], 'xpd_dB']]);
  else expect(atBeam).toBeGreaterThan(100);
  if (wanted['axial_ratio_dB'] !== undefined) compareRows(check, [['axial ratio', 'dB', numberOf(vector.axialRatioDb), numberIn(wanted, 'axial_ratio_dB'), 'dB']]);
}

/** The cells as chosen, re-radiating power waves. */
function compareSameCells(check: PublishedCheck, placed: ReturnType<typeof placeVector>, frequencyGHz: number): void {
  const wanted = fieldsIn(fieldsIn(check.expected, `${frequencyGHz}_GHz`), 'power_wave_same_cells');
  const { result, pattern } = stateOf(placed, { reradiation: 'power-wave', cellFactor: 'none' }, frequencyGHz * 1e9);
  const beam = placed.si.beams[0].direction;
  compareRows(check, [
    ['gain of power waves', 'dBi', result.gainAtBeamDbi, numberIn(wanted, 'gain_at_beam_dBi'), 'dB'],
    ['worst XPD of power waves', 'dB', withinHalfPower(pattern, beam)?.worstDiscriminationDb ?? NaN, numberIn(wanted, 'xpd_worst_3dB_dB'), 'xpd_worst_dB'],
  ]);
}

export const vectorPanelChecks: CheckTable = {
  'k5-20-01': comparePatchPanel,
  'k5-20-02': comparePatchPanel,
  'k5-20-03': comparePatchPanel,
  'k5-20-04': comparePatchPanel,
  'k5-30-01': comparePatchPanel,
  'k5-30-02': comparePatchPanel,
};
