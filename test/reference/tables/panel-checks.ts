import { predictDesign } from '../../../shared/antenna/predict-design';
import { dbToPowerRatio } from '../../../shared/units/decibels';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { hornAt, testDesign } from '../test-designs';
import { numberOf } from '../test-arrays';

/** A horn-fed panel from end to end, by the reference model of one program against the product. */
function comparePanel(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const beam = inputs['beam'] as Record<string, unknown>;
  const bits = inputs['bits'];
  const design = testDesign({
    frequencyGHz: numberIn(inputs, 'f0_GHz'),
    periodMm: numberIn(inputs, 'period_mm'),
    columns: numberIn(inputs, 'nx'),
    rows: numberIn(inputs, 'ny'),
    beams: [{ thetaDeg: numberIn(beam, 'theta_deg'), phiDeg: numberIn(beam, 'phi_deg') }],
    illumination: hornAt(numbersIn(inputs, 'feed_mm'), numberIn(inputs, 'q')),
    cells: { kind: 'ideal', levels: typeof bits === 'number' ? 2 ** bits : null },
    receiveExponent: numberIn(inputs, 'qe_in'),
    radiateExponent: numberIn(inputs, 'm_out') / 2,
  });
  const { figures } = predictDesign(design, { include: {} });
  const lobe = expected['highest_lobe_outside_radius'] as Record<string, unknown>;
  const hemisphere = figures.sidelobeDb.hemisphere;
  if (!('levelDb' in hemisphere)) throw new Error('no lobe beside the beam');
  const rows: [string, string, number, number, string][] = [
    ['cells', '', figures.cellCount, numberIn(expected, 'n_elements'), 'eff'],
    ['directivity at the peak', 'dBi', numberOf(figures.directivityDbi), numberIn(expected, 'D_dBi_peak'), 'D_dB'],
    ['directivity at the beam', 'dBi', numberOf(figures.directivityAtBeamDbi), numberIn(expected, 'D_dBi_at_design_direction'), 'D_dB'],
    ['theta of the peak', 'deg', numberOf(figures.peakThetaDeg), numberIn(expected, 'peak_theta_deg'), 'peak_deg'],
    ['beamwidth along', 'deg', numberOf(figures.halfPowerBeamwidthDeg.along), numberIn(expected, 'hpbw_el_deg'), 'hpbw_deg'],
    ['beamwidth across', 'deg', numberOf(figures.halfPowerBeamwidthDeg.across), numberIn(expected, 'hpbw_ax_deg'), 'hpbw_deg'],
    ['sidelobe along', 'dB', numberOf(figures.sidelobeDb.along), numberIn(expected, 'sll_el_dB'), 'sll_dB'],
    ['sidelobe across', 'dB', numberOf(figures.sidelobeDb.across), numberIn(expected, 'sll_ax_dB'), 'sll_dB'],
    ['highest lobe of the hemisphere', 'dB', numberOf(hemisphere.levelDb), numberIn(lobe, 'level_dB'), 'sll_dB'],
    ['taper', '', dbToPowerRatio(numberOf(figures.taperDb)), numberIn(expected, 'taper_eff_elements'), 'eff'],
    ['phase loss', 'dB', numberOf(figures.phaseLossDb), numberIn(expected, 'phase_loss_dB'), 'phase_loss_dB'],
  ];
  for (const [quantity, unit, got, value, tolerance] of rows) {
    expectWithin({ quantity, unit, got, expected: value, tolerance: toleranceOf(check, tolerance) });
  }
  // The reference sums over cells, the product integrates the true outline: both to the tolerance the check allows for that.
  expectWithin({ quantity: 'spillover', unit: '', got: dbToPowerRatio(numberOf(figures.spilloverDb)), expected: numberIn(expected, 'spill_eff_cellsum'), tolerance: 1e-3 });
}

export const panelChecks: CheckTable = {
  'panel-01': comparePanel,
  'panel-02': comparePanel,
  'panel-03': comparePanel,
  'panel-04': comparePanel,
  'panel-05': comparePanel,
  'feed-08': (check) => {
    const side = numberIn(check.inputs, 'side_mm');
    const design = testDesign({
      frequencyGHz: 10,
      periodMm: side / 150,
      columns: 150,
      rows: 150,
      illumination: hornAt(numbersIn(check.inputs, 'feed_mm'), numberIn(check.inputs, 'q')),
      receiveExponent: numberIn(check.inputs, 'qe'),
    });
    const { figures } = predictDesign(design, { include: {} });
    const tolerance = toleranceOf(check, 'abs');
    expectWithin({ quantity: 'spillover', unit: '', got: dbToPowerRatio(numberOf(figures.spilloverDb)), expected: numberIn(check.expected, 'eta_spill'), tolerance });
    expectWithin({ quantity: 'taper', unit: '', got: dbToPowerRatio(numberOf(figures.taperDb)), expected: numberIn(check.expected, 'eta_taper'), tolerance });
  },
};
