import { centreBlockage, shadowDistanceM } from '../../../shared/antenna/feed/feed-shadow';
import { spilloverLevelDbi } from '../../../shared/antenna/feed/spillover-direction';
import { denseLevels } from '../../../shared/antenna/feed/specular-part';
import { panelLattice } from '../../../shared/antenna/panel-lattice';
import { predictDesign } from '../../../shared/antenna/predict-design';
import { siDesign } from '../../../shared/antenna/si-design';
import type { DesignDocument } from '../../../shared/model/design-document';
import { radFromDeg } from '../../../shared/units/angles';
import { amplitudeRatioToDb } from '../../../shared/units/decibels';
import { beamAt, numberOf, testPattern } from '../test-arrays';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { hornAt, testDesign } from '../test-designs';

/** A panel behind its own feed, by the vector model, with the blocked cells as null field. */
function compareBlocked(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const horn = inputs['horn'] as Record<string, unknown>;
  const beam = inputs['beam'] as Record<string, number>;
  const thetaDeg = Math.abs(beam['theta']);
  const base = testDesign({
    frequencyGHz: numberIn(inputs, 'f0_GHz'),
    periodMm: numberIn(inputs, 'period_mm'),
    columns: numberIn(inputs, 'nx'),
    rows: numberIn(inputs, 'ny'),
    beams: [{ thetaDeg, phiDeg: beam['theta'] < 0 ? beam['phi'] + 180 : beam['phi'] }],
    illumination: { ...hornAt(numbersIn(horn, 'pos_mm'), numberIn(horn, 'qE')), blockageRadiusMm: numberIn(inputs, 'feed_radius_mm') },
  });
  const design: DesignDocument = { ...base, prediction: { ...base.prediction, model: 'vector', reradiation: 'aperture', cellFactor: 'normal' } };
  const open: DesignDocument = { ...design, illumination: hornAt(numbersIn(horn, 'pos_mm'), numberIn(horn, 'qE')) };
  const { figures } = predictDesign(design, { include: {} });
  const { blockage } = figures;
  if (!blockage) throw new Error('no blockage');
  expect(blockage.cells).toBe(numberIn(expected, 'blocked_cells'));
  const tolerance = toleranceOf(check, 'dB');
  expectWithin({ quantity: 'blockage', unit: 'dB', got: numberOf(blockage.atBeamDb), expected: numberIn(expected, 'blockage_dB'), tolerance });
  expectWithin({ quantity: 'gain at the beam', unit: 'dBi', got: numberOf(figures.gainAtBeamDbi), expected: numberIn(expected, 'gain_at_beam_dBi'), tolerance });
  const sidelobes = [predictDesign(open, { include: {} }).figures, figures].map(({ sidelobeDb }) => numberOf(sidelobeDb.across));
  expectWithin({ quantity: 'sidelobe across, before and after', unit: 'dB', got: sidelobes, expected: [numberIn(expected, 'sll_across_dB_before'), numberIn(expected, 'sll_across_dB_after')], tolerance: toleranceOf(check, 'sll_dB') });
  const { illumination, beams, panel } = siDesign(design);
  if (illumination.kind !== 'horn' || illumination.blockageRadiusM === undefined) throw new Error('no disc');
  const radiusM = illumination.blockageRadiusM;
  const distances = shadowDistanceM(panelLattice(panel), { position: illumination.position, radiusM }, beams[0].direction);
  const margin = Math.min(...distances.map((distance) => Math.abs(distance - radiusM)));
  expectWithin({ quantity: 'nearest cell to the rim of the shadow', unit: 'mm', got: margin * 1000, expected: numberIn(expected, 'margin_mm'), tolerance: 1e-6 });
}

export const feedChecks: CheckTable = {
  'block-01': (check) => {
    const ratios = numbersIn(check.inputs, 'd_over_D');
    const tolerance = toleranceOf(check, 'dB');
    for (const [kind, name] of [['uniform', 'uniform_dB'], ['parabolic', 'parabolic_dB']] as const) {
      const got = ratios.map((ratio) => amplitudeRatioToDb(centreBlockage(ratio, kind)));
      expectWithin({ quantity: `blockage, ${kind}`, unit: 'dB', got, expected: numbersIn(check.expected, name), tolerance });
    }
  },
  'blk-01': compareBlocked,
  'blk-02': compareBlocked,
  'spec-01': (check) => {
    const { inputs, expected } = check;
    const cells = numberIn(inputs, 'cells_along_x');
    const step = numberIn(inputs, 'period_lambda');
    const statesDeg = numbersIn(inputs, 'states_deg');
    const thetaDeg = numberIn(inputs, 'beam_theta_deg');
    // The inline table chooses; the array factor of what it chose follows.
    const design = testDesign({ frequencyGHz: 2.99792458, periodMm: 100 * step, columns: cells, rows: 1, beams: [{ thetaDeg, phiDeg: 0 }], cells: { kind: 'inline', cells: statesDeg.map((phaseDeg) => ({ phaseDeg, magnitude: 1 })) } });
    const { cells: placed } = predictDesign(design, { include: { cells: true } });
    if (!placed) throw new Error('no cells');
    const { farField } = testPattern({ columns: cells, rows: 1, stepX: step, stepY: step, phase: (x) => radFromDeg(placed.phaseDeg[Math.round(x / step + (cells - 1) / 2)]) });
    const level = (u: number): number => 10 * Math.log10(farField.powerAt(u, 0) / cells ** 2);
    const [beam, specular] = [level(beamAt(thetaDeg, 0).u), level(0)];
    const dense = denseLevels(statesDeg.map(radFromDeg));
    const tolerance = toleranceOf(check, 'dB');
    const rows: [string, number, string][] = [
      ['beam', beam, 'beam_af_dB'],
      ['specular', specular, 'specular_af_dB'],
      ['specular less beam', specular - beam, 'specular_minus_beam_af_dB'],
      ['beam, dense', amplitudeRatioToDb(dense.beam), 'dense_beam_dB'],
      ['specular, dense', amplitudeRatioToDb(dense.specular), 'dense_specular_dB'],
    ];
    for (const [quantity, got, name] of rows) expectWithin({ quantity, unit: 'dB', got, expected: numberIn(expected, name), tolerance });
  },
  'spill-dir-01': (check) => {
    const { inputs, expected } = check;
    const horn = inputs['horn'] as Record<string, unknown>;
    const side = numberIn(inputs, 'period_mm');
    const si = siDesign(testDesign({ frequencyGHz: 28, periodMm: side, columns: numberIn(inputs, 'nx'), rows: numberIn(inputs, 'ny'), illumination: hornAt(numbersIn(horn, 'pos_mm'), numberIn(horn, 'qE')) }));
    const { illumination } = si;
    if (illumination.kind !== 'horn') throw new Error('no horn');
    for (const row of expected['rows'] as Record<string, number | string | boolean>[]) {
      const level = spilloverLevelDbi(illumination, si.panel.outline, beamAt(Number(row['theta']), Number(row['phi'])));
      if (typeof row['level_dBi'] === 'string') {
        expect(level).toMatchObject({ kind: row['blocked_by_panel'] === true ? 'blocked' : 'behind-horn' });
        continue;
      }
      expectWithin({ quantity: `level at ${String(row['theta'])}`, unit: 'dBi', got: numberOf(level), expected: Number(row['level_dBi']), tolerance: toleranceOf(check, 'dB') });
    }
  },
};
