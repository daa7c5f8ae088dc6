import { exactFarField } from '../../../shared/antenna/exact-far-field';
import type { FarField } from '../../../shared/antenna/far-field';
import { illuminatedState } from '../../../shared/antenna/illuminated-state';
import { placeCells, type PlacedDesign } from '../../../shared/antenna/place-cells';
import type { PreparedEdition } from '../../../shared/antenna/prepare-edition';
import { deviationDrawer, NO_DEVIATIONS, type Deviations } from '../../../shared/antenna/tolerance/deviations';
import { correlatedGainRatio, meanPower, randomPhaseLossDb, reflectorPhaseRad } from '../../../shared/antenna/tolerance/phase-error-laws';
import { toleranceModel } from '../../../shared/antenna/tolerance/tolerance-model';
import { trialField } from '../../../shared/antenna/tolerance/trial-field';
import { trialGauge } from '../../../shared/antenna/tolerance/trial-gauge';
import { refinePeak, type PatternPeak } from '../../../shared/antenna/refine-peak';
import { directivityRatio, type RadiationPattern } from '../../../shared/antenna/radiation-pattern';
import { movedFeed } from '../../../shared/antenna/tolerance/moved-feed';
import { randomStream } from '../../../shared/math/seeded-random';
import { mean, quantile } from '../../../shared/math/statistics';
import { wilsonInterval } from '../../../shared/math/wilson-interval';
import type { DesignDocument } from '../../../shared/model/design-document';
import type { ContributorId, ToleranceContributor } from '../../../shared/model/tolerance-run';
import { degFromRad, radFromDeg } from '../../../shared/units/angles';
import { powerRatioToDb } from '../../../shared/units/decibels';
import { angleBetweenRad, outwardDirection } from '../../../shared/waves/conventions';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { hornAt, testDesign } from '../test-designs';
import { obliquePatches, vectorDesign } from '../vector-panels';

const MATERIAL = { expansionPpmPerK: 0, permittivityPpmPerK: 0 };

interface Bench {
  readonly placed: PlacedDesign;
  /** Its far field under deviations, summed cell by cell: a trial of these checks needs few directions. */
  readonly farFieldOf: (deviations?: Deviations) => FarField;
  /** The same as a pattern in absolute gain. */
  readonly patternOf: (deviations?: Deviations) => RadiationPattern;
}

function benchOf(design: ReturnType<typeof testDesign>, contributors: readonly ToleranceContributor[], edition?: PreparedEdition): Bench {
  const placed = placeCells(design, edition);
  const field = trialField(placed, toleranceModel({ placed, edition, contributors, material: MATERIAL }));
  const gauge = trialGauge(illuminatedState(placed), field());
  return { placed, farFieldOf: (deviations) => exactFarField(field(deviations), placed.designWavenumber), patternOf: (deviations) => gauge.patternOf(field(deviations)) };
}

const powerAtBeam = ({ placed, farFieldOf }: Bench, deviations?: Deviations): number => {
  const { u, v } = placed.si.beams[0].direction;
  return farFieldOf(deviations).powerAt(u, v);
};

const onPanel = (id: ContributorId, value: number): Deviations => ({ ...NO_DEVIATIONS, panel: new Map([[id, value]]) });

/** Independent phases and dead cells on ideal cells: the trials, draw by draw, against another program with the same generator. */
function compareIndependent(check: PublishedCheck, beam: { thetaDeg: number; phiDeg: number }): void {
  const { inputs, expected } = check;
  const [sigmaDeg, deadFraction, trials] = [numberIn(inputs, 'sigma_deg'), numberIn(inputs, 'dead_fraction'), numberIn(inputs, 'trials')];
  const contributors: ToleranceContributor[] = [
    { id: 'phase-scatter', spread: sigmaDeg, distribution: 'normal' },
    { id: 'dead-cells', spread: deadFraction, distribution: 'share' },
  ];
  const design = testDesign({
    frequencyGHz: numberIn(inputs, 'f_GHz'),
    periodMm: numberIn(inputs, 'period_mm'),
    columns: numberIn(inputs, 'nx'),
    rows: numberIn(inputs, 'ny'),
    beams: [beam],
    illumination: hornAt(numbersIn(inputs, 'feed_mm'), numberIn(inputs, 'q')),
  });
  const bench = benchOf(design, contributors);
  const [offU, offV] = numbersIn(inputs, 'offset_uv');
  const { u, v } = bench.placed.si.beams[0].direction;
  const [toU, toV] = [u + offU, v + offV];
  const undisturbed = powerAtBeam(bench);
  const errorFreeOff = bench.farFieldOf().powerAt(toU, toV);
  const draw = deviationDrawer(bench.placed.lattice, numberIn(inputs, 'seed'));
  const losses = new Float64Array(trials);
  const offs = new Float64Array(trials);
  for (let trial = 0; trial < trials; trial++) {
    const farField = bench.farFieldOf(draw(trial, contributors));
    losses[trial] = farField.powerAt(u, v) / undisturbed;
    offs[trial] = farField.powerAt(toU, toV) / undisturbed;
  }
  const amplitude = bench.placed.light.amplitude;
  const squares = amplitude.reduce((sum, a) => sum + a * a, 0);
  const errors = { phaseSigmaRad: radFromDeg(sigmaDeg), deadFraction };
  const percentiles = (values: Float64Array): number[] => [0.05, 0.5, 0.95].map((p) => powerRatioToDb(quantile(values, p)));
  const rows: [string, number | number[], unknown][] = [
    ['loss of the first trial', powerRatioToDb(losses[0]), expected['first_trial_loss_dB']],
    ['percentiles of the loss', percentiles(losses), expected['loss_dB_p5_p50_p95']],
    ['mean loss', powerRatioToDb(mean(losses)), expected['mean_loss_dB']],
    ['mean loss by the identity', powerRatioToDb(meanPower(errors, undisturbed, squares) / undisturbed), expected['expected_mean_loss_dB']],
    ['percentiles off the beam', percentiles(offs), expected['off_level_rel_beam0_dB_p5_p50_p95']],
    ['mean off the beam', powerRatioToDb(mean(offs)), expected['mean_off_dB']],
    ['mean off the beam by the identity', powerRatioToDb(meanPower(errors, errorFreeOff, squares) / undisturbed), expected['expected_mean_off_dB']],
    ['error-free level off the beam', powerRatioToDb(errorFreeOff / undisturbed), expected['error_free_off_dB']],
  ];
  for (const [quantity, got, value] of rows) expectWithin({ quantity, unit: 'dB', got, expected: value as number | number[], tolerance: toleranceOf(check, 'dB') });
}

/** The horn-fed panel of square patches that a check describes, for the scalar model. */
const patchDesign = ({ inputs }: PublishedCheck): DesignDocument => ({ ...vectorDesign(inputs, {}), prediction: { receiveExponent: 0.5, radiateExponent: 0.5 } });

const patchBench = (check: PublishedCheck, contributors: readonly ToleranceContributor[]): Bench => benchOf(patchDesign(check), contributors, obliquePatches());

const peakOf = ({ placed }: Bench, pattern: RadiationPattern): PatternPeak => refinePeak(pattern, placed.si.beams[0].direction.u, placed.si.beams[0].direction.v);

export const toleranceChecks: CheckTable = {
  'ruze-01': (check) => {
    const surface = numbersIn(check.inputs, 'eps_over_lambda').map((ratio) => randomPhaseLossDb(reflectorPhaseRad(ratio, 1)));
    const sigma = numbersIn(check.inputs, 'sigma_deg').map((deg) => randomPhaseLossDb(radFromDeg(deg)));
    expectWithin({ quantity: 'loss of a surface', unit: 'dB', got: surface, expected: numbersIn(check.expected, 'surface_loss_dB'), tolerance: toleranceOf(check, 'dB') });
    expectWithin({ quantity: 'loss of phases', unit: 'dB', got: sigma, expected: numbersIn(check.expected, 'sigma_loss_dB'), tolerance: toleranceOf(check, 'dB') });
  },
  'rnd-01': (check) => {
    const streams = check.inputs['streams'] as { seed: number; trial: number; channel: number }[];
    streams.map(randomStream).forEach((stream, i) => {
      const row = (name: string): number[] => (check.expected[name] as number[][])[i];
      const words = (check.expected['first_words_hex'] as string[][])[i];
      const hex = (half: number): string => half.toString(16).padStart(8, '0');
      expect(words.map((_, n) => stream.wordAt(n).map(hex).join(''))).toEqual(words);
      expectWithin({ quantity: 'uniforms', unit: '', got: row('uniform').map((_, n) => stream.uniformAt(n)), expected: row('uniform'), tolerance: toleranceOf(check, 'abs') });
      expectWithin({ quantity: 'normals', unit: '', got: row('normal').map((_, n) => stream.normalAt(n)), expected: row('normal'), tolerance: toleranceOf(check, 'abs') });
    });
  },
  'tol-01': (check) => compareIndependent(check, { thetaDeg: 0, phiDeg: 0 }),
  'tol-02': (check) => compareIndependent(check, { thetaDeg: 0, phiDeg: 0 }),
  'tol-03': (check) => {
    const { inputs, expected } = check;
    const spread = numberIn(inputs, 'independent_sigma_mm');
    const contributors: ToleranceContributor[] = [
      { id: 'etch-random', spread, distribution: 'normal' },
      { id: 'etch-common', spread: numberIn(inputs, 'correlated_mm'), distribution: 'normal' },
    ];
    const bench = patchBench(check, contributors);
    const undisturbed = powerAtBeam(bench);
    const changeDb = (deviations: Deviations): number => powerRatioToDb(powerAtBeam(bench, deviations) / undisturbed);
    const growthM = numberIn(inputs, 'correlated_mm') * 1e-3;
    const draw = deviationDrawer(bench.placed.lattice, numberIn(inputs, 'seed'));
    const powers = Array.from({ length: numberIn(inputs, 'trials') }, (_, trial) => powerAtBeam(bench, draw(trial, contributors.slice(0, 1))) / undisturbed);
    const rows: [string, number | number[], unknown][] = [
      ['all patches larger', changeDb(onPanel('etch-common', growthM)), expected['correlated_plus_dB']],
      ['all patches smaller', changeDb(onPanel('etch-common', -growthM)), expected['correlated_minus_dB']],
      ['first trial', powerRatioToDb(powers[0]), expected['independent_first_trial_dB']],
      ['mean power', powerRatioToDb(mean(powers)), expected['independent_mean_power_dB']],
      ['percentiles', [0.05, 0.5, 0.95].map((p) => powerRatioToDb(quantile(powers, p))), expected['independent_p5_p50_p95_dB']],
    ];
    for (const [quantity, got, value] of rows) expectWithin({ quantity, unit: 'dB', got, expected: value as number | number[], tolerance: toleranceOf(check, 'dB') });
  },
  'tol-04': (check) => {
    const placed = placeCells(vectorDesign(check.inputs, { reradiation: 'aperture', cellFactor: 'normal' }), obliquePatches());
    const [beam] = placed.si.beams;
    // The power of the horn does not change, so ratios of the co-polar power are ratios of gain.
    const patternOf = (state: PlacedDesign): RadiationPattern => ({ ...illuminatedState(state).pattern, radiatedPower: 1 });
    const topOf = (pattern: RadiationPattern): PatternPeak => refinePeak(pattern, beam.direction.u, beam.direction.v);
    const before = patternOf(placed);
    const topBefore = topOf(before);
    for (const row of check.expected['rows'] as Record<string, unknown>[]) {
      const [xM, yM, zM] = numbersIn(row, 'move_mm').map((mm) => mm * 1e-3);
      const after = patternOf(movedFeed(placed, { xM, yM, zM }, obliquePatches()));
      const topAfter = topOf(after);
      const shift = degFromRad(angleBetweenRad(outwardDirection(topAfter.u, topAfter.v), outwardDirection(topBefore.u, topBefore.v)));
      const rows: [string, number, string, string][] = [
        ['change of the gain at the beam', powerRatioToDb(directivityRatio(after, beam.direction) / directivityRatio(before, beam.direction)), 'gain_at_beam_change_dB', 'dB'],
        ['change of the peak', powerRatioToDb(topAfter.directivityRatio / topBefore.directivityRatio), 'peak_change_dB', 'dB'],
        ['shift of the beam', shift, 'beam_shift_deg', 'deg'],
      ];
      for (const [quantity, got, name, unit] of rows) expectWithin({ quantity: `${quantity}, ${JSON.stringify(row['move_mm'])}`, unit, got, expected: numberIn(row, name), tolerance: toleranceOf(check, unit) });
    }
  },
  'tol-05': (check) => {
    const bench = patchBench(check, [{ id: 'bow', spread: 0.5, distribution: 'normal' }]);
    const undisturbed = bench.patternOf();
    const bowed = bench.patternOf(onPanel('bow', numberIn(check.inputs, 'bow_mm') * 1e-3));
    const { u, v } = bench.placed.si.beams[0].direction;
    const atBeam = powerRatioToDb(bowed.farField.powerAt(u, v) / undisturbed.farField.powerAt(u, v));
    const atPeak = powerRatioToDb(peakOf(bench, bowed).directivityRatio / peakOf(bench, undisturbed).directivityRatio);
    expectWithin({ quantity: 'loss at the beam', unit: 'dB', got: atBeam, expected: numberIn(check.expected, 'loss_at_beam_dB'), tolerance: toleranceOf(check, 'dB') });
    expectWithin({ quantity: 'change of the peak', unit: 'dB', got: atPeak, expected: numberIn(check.expected, 'change_at_peak_dB'), tolerance: toleranceOf(check, 'dB') });
  },
  'tol-06': (check) => {
    const intervals = (check.inputs['k_n'] as [number, number][]).map(([met, of]) => wilsonInterval(met, of, numberIn(check.inputs, 'z')));
    expectWithin({ quantity: 'intervals', unit: '', got: intervals.flat(), expected: (check.expected['interval'] as number[][]).flat(), tolerance: toleranceOf(check, 'abs') });
  },
  'tol-07': (check) => {
    const { inputs } = check;
    const { light, lattice } = placeCells(
      testDesign({
        frequencyGHz: 10,
        periodMm: numberIn(inputs, 'period_mm'),
        columns: numberIn(inputs, 'nx'),
        rows: numberIn(inputs, 'ny'),
        illumination: hornAt(numbersIn(inputs, 'feed_mm'), numberIn(inputs, 'q')),
      }),
    );
    const sigmaRad = radFromDeg(numberIn(inputs, 'sigma_deg'));
    const got = numbersIn(inputs, 'correlation_length_mm').map((mm) => powerRatioToDb(correlatedGainRatio({ sigmaRad, correlationLengthM: mm * 1e-3 }, { ...lattice, amplitude: light.amplitude })));
    expectWithin({ quantity: 'loss of mean gain', unit: 'dB', got, expected: numbersIn(check.expected, 'mean_gain_loss_dB'), tolerance: toleranceOf(check, 'dB') });
  },
};
