import { boardPeakShare, searchBoard } from '../../../shared/antenna/synthesis/diffuse-board';
import { checkerboardLobe, diffuseBound, highestScatter } from '../../../shared/antenna/synthesis/diffuse-figures';
import { sectorBounds } from '../../../shared/antenna/synthesis/projection-bounds';
import { runProjections, type ProjectionProblem, type ProjectionRun } from '../../../shared/antenna/synthesis/projection-run';
import { fourierEngine } from '../../../shared/math/active-fourier-engine';
import { placeCells } from '../../../shared/antenna/place-cells';
import { illuminatedState } from '../../../shared/antenna/illuminated-state';
import { focusFigures } from '../../../shared/antenna/synthesis/focus-figures';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { numberOf, testPattern } from '../test-arrays';
import { hornAt, testDesign } from '../test-designs';

/** The real maximum on the axis of a focused panel, from the document to the figure. */
function compareFocus(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const height = inputs['feed_height_mm'];
  const design = testDesign({
    frequencyGHz: numberIn(inputs, 'f_GHz'),
    periodMm: numberIn(inputs, 'period_mm'),
    columns: numberIn(inputs, 'nx'),
    rows: numberIn(inputs, 'ny'),
    ...(typeof height === 'number' ? { illumination: hornAt([0, 0, height], numberIn(inputs, 'q')) } : {}),
    synthesis: { kind: 'focus', pointMm: [0, 0, numberIn(inputs, 'focus_z_mm')] },
    radiateExponent: numberIn(inputs, 'radiate_exponent'),
  });
  const found = focusFigures(illuminatedState(placeCells(design)), { xM: 0, yM: 0, zM: numberIn(inputs, 'focus_z_mm') / 1000 });
  if ('kind' in found) throw new Error(found.reason);
  const tolerance = toleranceOf(check, 'mm');
  expectWithin({ quantity: 'maximum on the axis', unit: 'mm', got: found.maximumMm, expected: numberIn(expected, 'z_max_mm'), tolerance });
  expectWithin({ quantity: 'rise over the focus', unit: 'dB', got: found.riseDb, expected: numberIn(expected, 'level_max_rel_zf_dB'), tolerance: toleranceOf(check, 'dB') });
  const half = [numberOf(found.halfPowerMm.from), numberOf(found.halfPowerMm.to)];
  expectWithin({ quantity: 'half power', unit: 'mm', got: half, expected: numbersIn(expected, 'half_power_z_mm'), tolerance });
}

/** Amplitudes and quadratic phases of a line, cell n at n - (N - 1) / 2. */
function lineOf(count: number, amplitudeAt: (x: number) => number, quadraticRad: number): { amplitude: Float64Array; startPhaseRad: Float64Array } {
  const x = Float64Array.from({ length: count }, (_, n) => n - (count - 1) / 2);
  return { amplitude: x.map(amplitudeAt), startPhaseRad: x.map((at) => quadraticRad * at * at) };
}

/** Runs to the last iteration listed, watching every one up to 50, and compares the listed costs; gives the run. */
function compareCosts(check: PublishedCheck, problem: ProjectionProblem): ProjectionRun {
  const listed = numbersIn(check.inputs, 'iterations');
  const every = Array.from({ length: 51 }, (_, i) => i);
  const iterations = Math.max(...listed);
  const run = runProjections(problem, { iterations, watched: [...every, ...listed, iterations - 100], toTheEnd: true });
  const power = problem.amplitude.reduce((sum, a) => sum + a * a, 0);
  numbersIn(check.expected, 'cost').forEach((expected, i) => {
    const got = (run.costs.find(({ iteration }) => iteration === listed[i])?.share ?? NaN) * power;
    expectWithin({ quantity: `cost before iteration ${listed[i]}`, unit: '', got, expected, tolerance: toleranceOf(check, 'rel') * expected });
  });
  const rises = run.costs.slice(1).map(({ share }, i) => share - run.costs[i].share);
  expect(Math.max(0, ...rises)).toBeLessThanOrEqual(numberIn(check.expected, 'largest_increase') + 1e-15);
  return run;
}

export const synthesisChecks: CheckTable = {
  'ap-01': (check) => {
    const { inputs } = check;
    const count = numberIn(inputs, 'N');
    const columns = numberIn(inputs, 'transform');
    const shape = (x: number): number => Math.cos((Math.PI * x) / numberIn(inputs, 'c'));
    const truth = lineOf(count, shape, numberIn(inputs, 'true_quadratic_rad'));
    const cells = { re: truth.amplitude.map((a, n) => a * Math.cos(truth.startPhaseRad[n])), im: truth.amplitude.map((a, n) => a * Math.sin(truth.startPhaseRad[n])) };
    const { re, im } = fourierEngine().spectrum({ columnCount: count, rowCount: 1, columns, rows: 1, ...cells, originColumn: 0, originRow: 0 });
    const size = re.map((value, i) => Math.hypot(value, im[i]));
    const ripple = 10 ** (numberIn(inputs, 'ripple_dB') / 20);
    const most = Math.max(...size);
    const bounds = { upper: size.map((value) => value * ripple), lower: size.map((value) => (value <= most / 10 ? 0 : value / ripple)) };
    const run = compareCosts(check, { columnCount: count, rowCount: 1, columns, rows: 1, ...lineOf(count, shape, numberIn(inputs, 'start_quadratic_rad')), ...bounds });
    // Amplitudes stay by construction: what comes out is phases alone. Parseval for them:
    const back = fourierEngine().spectrum({ columnCount: count, rowCount: 1, columns, rows: 1, re: run.phaseRad.map((p, n) => truth.amplitude[n] * Math.cos(p)), im: run.phaseRad.map((p, n) => truth.amplitude[n] * Math.sin(p)), originColumn: 0, originRow: 0 });
    const power = truth.amplitude.reduce((sum, a) => sum + a * a, 0);
    expectWithin({ quantity: 'Parseval', unit: '', got: back.re.reduce((sum, value, i) => sum + value * value + back.im[i] ** 2, 0) / columns, expected: power, tolerance: 1e-10 * power });
    expect([check.expected['amplitude_unchanged'], check.expected['parseval_holds'], run.outcome === 'stalled']).toEqual([true, true, false]);
  },
  'ap-02': (check) => {
    const { inputs, expected } = check;
    const count = numberIn(inputs, 'N');
    const columns = numberIn(inputs, 'transform');
    const line = lineOf(count, (x) => Math.cos((Math.PI * x) / (count + 2)), numberIn(inputs, 'start_quadratic_rad'));
    const power = line.amplitude.reduce((sum, a) => sum + a * a, 0);
    const azimuth = Math.asin(0.3);
    const goal = { kind: 'sectors', sectors: [{ azimuthRad: [-azimuth, azimuth], elevationRad: [-0.1, 0.1] }], rippleDb: 1, transitionRad: Math.asin(0.42) - azimuth, outsideDb: -35 } as const;
    const grid = { columns, rows: 1, uStep: 1 / (columns * numberIn(inputs, 'period_lambda')), vStep: 1, radiateExponent: 0, copies: 1 } as const;
    const run = compareCosts(check, { columnCount: count, rowCount: 1, columns, rows: 1, ...line, ...sectorBounds(goal, grid, power) });
    const shareAt = (iteration: number): number => run.costs.find((cost) => cost.iteration === iteration)?.share ?? NaN;
    expectWithin({ quantity: 'cost over that a hundred iterations before', unit: '', got: shareAt(600) / shareAt(500), expected: numberIn(expected, 'cost_ratio_last_100'), tolerance: toleranceOf(check, 'rel') });
    expectWithin({ quantity: 'worst excess', unit: 'dB', got: run.worstExcessDb, expected: numberIn(expected, 'worst_upper_excess_dB'), tolerance: 1e-3 });
    expectWithin({ quantity: 'worst shortfall', unit: 'dB', got: run.worstShortfallDb, expected: numberIn(expected, 'worst_lower_shortfall_dB'), tolerance: 1e-3 });
    expect([run.outcome, expected['reached']]).toEqual(['stalled', false]);
  },
  'diff-01': (check) => {
    const { inputs, expected } = check;
    const perBlock = numberIn(inputs, 'cells_per_block');
    const side = numberIn(inputs, 'blocks') * perBlock;
    const step = numberIn(inputs, 'period_lambda');
    const sign = (column: number, row: number): number => ((Math.floor(column / perBlock) + Math.floor(row / perBlock)) % 2 === 0 ? 1 : -1);
    const { spectrum, farField } = testPattern({ columns: side, rows: side, stepX: step, stepY: step, weight: sign });
    const { u, v, power } = highestScatter(spectrum, 1, (a, b) => farField.powerAt(a, b));
    const tolerance = toleranceOf(check, 'abs');
    expectWithin({ quantity: 'u of the lobe', unit: '', got: Math.abs(u), expected: numberIn(expected, 'lobe_u_abs'), tolerance });
    expectWithin({ quantity: 'v of the lobe', unit: '', got: Math.abs(v), expected: numberIn(expected, 'lobe_v_abs'), tolerance });
    expectWithin({ quantity: 'level of the lobe', unit: 'dB', got: 10 * Math.log10(power / side ** 4), expected: numberIn(expected, 'lobe_level_rel_plate_dB'), tolerance: toleranceOf(check, 'dB') });
    expect([farField.powerAt(0, 0) / side ** 4 < 1e-20, expected['broadside_zero']]).toEqual([true, true]);
    const endless = checkerboardLobe(perBlock, step, 1);
    expectWithin({ quantity: 'lobe of an endless board', unit: '', got: endless.cosine, expected: numberIn(expected, 'infinite_lobe_u'), tolerance });
    expectWithin({ quantity: 'its level', unit: 'dB', got: endless.levelDb, expected: numberIn(expected, 'infinite_level_dB'), tolerance: toleranceOf(check, 'dB') });
  },
  'diff-02': (check) => {
    const { inputs, expected } = check;
    const side = numberIn(inputs, 'size');
    const question = { columns: side, rows: side, states: 2, blockColumns: 1, blockRows: 1, seed: 0 };
    const samples = numberIn(inputs, 'transform');
    const found = searchBoard(question, samples);
    const tolerance = toleranceOf(check, 'dB');
    const level = (share: number): number => 10 * Math.log10(share);
    expectWithin({ quantity: 'lowest peak', unit: 'dB', got: level(found.peakShare), expected: numberIn(expected, 'best_peak_dB'), tolerance });
    expect([found.method, found.equals]).toEqual(['exhaustive', numberIn(expected, 'boards_reaching_it')]);
    const listed = (expected['one_best_board'] as number[][]).flat().map((sign) => (sign < 0 ? 1 : 0));
    expectWithin({ quantity: 'peak of the listed board', unit: 'dB', got: level(boardPeakShare(question, listed, samples)), expected: numberIn(expected, 'best_peak_dB'), tolerance });
    expectWithin({ quantity: 'the same on a finer grid', unit: 'dB', got: level(boardPeakShare(question, listed, 1024)), expected: numberIn(expected, 'same_board_on_1024_transform_dB'), tolerance });
    const bound = diffuseBound({ kind: 'rectangular', periodXM: 1, periodYM: 1 }, { count: side * side, cellAreaM2: 1, wavelengthM: 1 });
    expectWithin({ quantity: 'bound', unit: 'dB', got: bound.boundDb, expected: numberIn(expected, 'parseval_bound_dB'), tolerance });
  },
  'foc-01': compareFocus,
  'foc-02': compareFocus,
};
