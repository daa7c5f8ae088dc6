import { predictDesign } from '../../../shared/antenna/predict-design';
import { bestLeakage, leakedShare, planeProduct, planeTaperEfficiency } from '../../../shared/antenna/guided-wave/leaked-power';
import { ruleAverages, type ResonantRule } from '../../../shared/antenna/guided-wave/resonant-cell';
import { dbToPowerRatio } from '../../../shared/units/decibels';
import { radFromDeg } from '../../../shared/units/angles';
import type { DesignDocument } from '../../../shared/model/design-document';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { numberOf } from '../test-arrays';
import { FREQUENCY_OF_100_MM_GHZ, testDesign } from '../test-designs';

type Row = Record<string, number>;

/** A line of resonant cells on a plane guided wave, from the document to the figures. */
function compareLine(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const periodMm = 100 * numberIn(inputs, 'period_lambda');
  const cells = numberIn(inputs, 'cells');
  const beam = { thetaDeg: numberIn(inputs, 'beam_theta_deg'), phiDeg: 0 };
  // The check counts x from the feed end, the product from the centre: half a length further on, k L u / 2 of common phase.
  const referencePhaseDeg = (-180 * cells * numberIn(inputs, 'period_lambda') * Math.sin(radFromDeg(beam.thetaDeg))) % 360;
  for (const [rule, row] of Object.entries(expected['rules'] as Record<ResonantRule, Row>)) {
    const design: DesignDocument = {
      ...testDesign({ frequencyGHz: FREQUENCY_OF_100_MM_GHZ, periodMm, columns: cells, rows: 1, beams: [beam], referencePhaseDeg, radiateExponent: 0 }),
      illumination: {
        kind: 'guided-wave',
        launch: { kind: 'plane', directionDeg: 0 },
        effectiveIndex: numberIn(inputs, 'effective_index'),
        leakageNpPerM: numberIn(inputs, 'alpha_L') / ((cells * periodMm) / 1000),
        polarisation: 'x',
      },
      cells: { kind: 'resonant', rule: rule as ResonantRule, states: null },
    };
    const { figures } = predictDesign(design, { include: {} });
    const guided = figures.guidedWave;
    if (guided === undefined) throw new Error('no guided wave');
    const peakU = Math.sin(radFromDeg(numberOf(figures.beams[0].foundThetaDeg))) * Math.cos(radFromDeg(numberOf(figures.beams[0].foundPhiDeg)));
    const orders = guided.unmodulatedLobes.map(({ thetaDeg, phiDeg }) => Math.sin(radFromDeg(thetaDeg)) * Math.cos(radFromDeg(phiDeg)));
    compareGuided(check, figures, row);
    expectWithin({ quantity: 'u of the peak', unit: '', got: peakU, expected: row['peak_u'], tolerance: toleranceOf(check, 'abs') });
    expectWithin({ quantity: 'sidelobe', unit: 'dB', got: numberOf(figures.sidelobeDb.along), expected: row['sll_dB'], tolerance: toleranceOf(check, 'sll_dB') });
    expectWithin({ quantity: 'unmodulated orders', unit: '', got: orders, expected: numbersIn(expected, 'unmodulated_orders_u'), tolerance: toleranceOf(check, 'abs') });
  }
}

function compareGuided(check: PublishedCheck, figures: ReturnType<typeof predictDesign>['figures'], row: Row): void {
  if (figures.guidedWave === undefined) throw new Error('no guided wave');
  const { beamRelativeDb, modulationEfficiency, leakedShare: leaked } = figures.guidedWave;
  expectWithin({ quantity: 'beam against free phases', unit: 'dB', got: numberOf(beamRelativeDb), expected: row['beam_rel_unconstrained_dB'], tolerance: toleranceOf(check, 'dB') });
  const tolerance = toleranceOf(check, 'abs');
  expectWithin({ quantity: 'modulation efficiency', unit: '', got: modulationEfficiency, expected: row['modulation_efficiency'], tolerance });
  expectWithin({ quantity: 'taper', unit: '', got: dbToPowerRatio(numberOf(figures.taperDb)), expected: row['taper_efficiency'], tolerance });
  expectWithin({ quantity: 'leaked share', unit: '', got: leaked, expected: row['leaked_fraction'], tolerance });
}

export const guidedWaveChecks: CheckTable = {
  'gw-01': (check) => {
    const tolerance = toleranceOf(check, 'abs');
    const compare = (quantity: string, rule: ResonantRule, states: number | null, row: Row): void => {
      const { meanInPhase, modulationEfficiency } = ruleAverages(rule, states);
      const got = [meanInPhase, modulationEfficiency];
      expectWithin({ quantity, unit: '', got, expected: [row['mean_in_phase'], row['modulation_efficiency']], tolerance });
    };
    for (const rule of check.inputs['rules'] as ResonantRule[]) compare(rule, rule, null, check.expected[rule] as Row);
    const byStates = check.expected['states'] as Record<string, Row>;
    for (const states of numbersIn(check.inputs, 'K')) compare(`${states} states`, 'projection', states, byStates[states]);
  },
  'gw-02': (check) => {
    const { expected } = check;
    const lengths = numbersIn(check.inputs, 'alpha_L');
    const tolerance = toleranceOf(check, 'abs');
    const compare = (quantity: string, got: number | number[], name: string): void => {
      const wanted = expected[name];
      expectWithin({ quantity, unit: '', got, expected: typeof wanted === 'number' ? wanted : numbersIn(expected, name), tolerance });
    };
    compare('taper', lengths.map(planeTaperEfficiency), 'taper_efficiency');
    compare('leaked share', lengths.map((np) => leakedShare(np, 1)), 'leaked_fraction');
    compare('product', lengths.map(planeProduct), 'product');
    compare('best leakage', bestLeakage().leakageLengthNp, 'optimum_alpha_L');
    compare('best product', bestLeakage().product, 'optimum_product');
  },
  'gw-03': compareLine,
  'gw-04': compareLine,
  'gw-05': (check) => {
    const { inputs, expected } = check;
    const periodMm = numberIn(inputs, 'period_mm');
    const [innerMm, outerMm] = numbersIn(inputs, 'rho_mm');
    const [thetaDeg, phiDeg] = numbersIn(inputs, 'beam_deg');
    const side = numberIn(inputs, 'lattice');
    const base = testDesign({ frequencyGHz: numberIn(inputs, 'f_GHz'), periodMm, columns: side, rows: side, beams: [{ thetaDeg, phiDeg }] });
    for (const rule of inputs['rules'] as ResonantRule[]) {
      const design: DesignDocument = {
        ...base,
        panel: {
          ...base.panel,
          outline: { kind: 'ellipse', widthMm: 2 * outerMm, heightMm: 2 * outerMm },
          keepOuts: [{ kind: 'ellipse', widthMm: 2 * innerMm, heightMm: 2 * innerMm, centreMm: [0, 0] }],
        },
        illumination: {
          kind: 'guided-wave',
          launch: { kind: 'radial', centreMm: [0, 0], radiusMm: innerMm },
          effectiveIndex: numberIn(inputs, 'effective_index'),
          leakageNpPerM: numberIn(inputs, 'alpha_per_m'),
          polarisation: 'x',
        },
        cells: { kind: 'resonant', rule, states: null },
      };
      const { figures } = predictDesign(design, { include: {} });
      const row = expected[rule] as Row;
      expect(figures.cellCount).toBe(row['cells']);
      compareGuided(check, figures, row);
    }
  },
};
