import { hornSampler } from '../../../shared/antenna/horn-field';
import { hornCapturedShare } from '../../../shared/antenna/horn-spillover';
import { integrateOverOutline } from '../../../shared/antenna/outline-integral';
import type { SiHorn, SiOutline } from '../../../shared/antenna/si-design';
import { besselJ } from '../../../shared/math/bessel';
import { integrate } from '../../../shared/math/quadrature';
import { predictDesign } from '../../../shared/antenna/predict-design';
import { amplitudeRatioToDb } from '../../../shared/units/decibels';
import { degFromRad } from '../../../shared/units/angles';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { numberOf } from '../test-arrays';
import { FREQUENCY_OF_100_MM_GHZ, testDesign } from '../test-designs';

type Aperture = (x: number) => number;

/** Half-power width, first sidelobe and its place of a symmetric pattern, by fine sampling and bisection. */
function describe1d(pattern: Aperture): { width: number; sidelobeDb: number; sidelobeAt: number; nullAt: number } {
  const peak = Math.abs(pattern(0));
  let [inside, outside] = [0, 1.5];
  for (let i = 0; i < 60; i++) {
    const middle = (inside + outside) / 2;
    if (Math.abs(pattern(middle)) > peak * Math.SQRT1_2) inside = middle;
    else outside = middle;
  }
  const step = 0.0005;
  let x = inside;
  while (Math.abs(pattern(x + step)) < Math.abs(pattern(x))) x += step;
  const nullAt = x;
  while (Math.abs(pattern(x + step)) > Math.abs(pattern(x))) x += step;
  return { width: 2 * inside, sidelobeDb: amplitudeRatioToDb(Math.abs(pattern(x)) / peak), sidelobeAt: x, nullAt };
}

/** Pattern of a line of length 1 against u L / lambda. */
const linePattern = (taper: Aperture): Aperture => (s) => integrate((x) => taper(x) * Math.cos(2 * Math.PI * s * x), -0.5, 0.5, { nodes: 16, panels: 4 });
/** Pattern of a disc of diameter 1 against u D / lambda. */
const discPattern = (taper: Aperture): Aperture => (s) => integrate((r) => taper(r) * besselJ(0, Math.PI * s * r) * r, 0, 1, { nodes: 16, panels: 4 });

const lineEfficiency = (taper: Aperture): number => {
  const size = { nodes: 16, panels: 4 };
  return integrate(taper, -0.5, 0.5, size) ** 2 / integrate((x) => taper(x) ** 2, -0.5, 0.5, size);
};
const discEfficiency = (taper: Aperture): number => {
  const size = { nodes: 16, panels: 4 };
  return (2 * integrate((r) => taper(r) * r, 0, 1, size) ** 2) / integrate((r) => taper(r) ** 2 * r, 0, 1, size);
};

interface FlatAperture {
  readonly q: number;
  readonly focalRatio: number;
  readonly receiveExponent: number;
}

/** Spillover and taper of a centre-fed disc by the product's own horn and integration. */
function centreFed({ q, focalRatio, receiveExponent }: FlatAperture): { spill: number; taper: number } {
  const position = { xM: 0, yM: 0, zM: focalRatio };
  const horn: SiHorn = { kind: 'horn', position, aim: { xM: 0, yM: 0, zM: 0 }, exponentE: q, exponentH: q, polarisation: 'x' };
  const outline: SiOutline = { kind: 'ellipse', centre: { xM: 0, yM: 0 }, widthM: 1, heightM: 1 };
  const sampleAt = hornSampler(horn);
  const amplitude = (xM: number, yM: number): number => {
    const sample = sampleAt(xM, yM);
    return sample.field * Math.pow(sample.cosIncidence, receiveExponent);
  };
  const effort = { nodes: 16, partM: focalRatio / Math.sqrt(q + 1), pivot: { xM: 0, yM: 0 } };
  const sum = integrateOverOutline(outline, amplitude, effort);
  const squares = integrateOverOutline(outline, (xM, yM) => amplitude(xM, yM) ** 2, effort);
  return { spill: hornCapturedShare(horn, outline).fraction, taper: (sum * sum) / ((Math.PI / 4) * squares) };
}

function compareFeed(check: PublishedCheck): void {
  const { spill, taper } = centreFed({ q: numberIn(check.inputs, 'q'), focalRatio: numberIn(check.inputs, 'F_over_D'), receiveExponent: numberIn(check.inputs, 'qe') });
  const tolerance = toleranceOf(check, 'abs');
  expectWithin({ quantity: 'spillover', unit: '', got: spill, expected: numberIn(check.expected, 'eta_spill'), tolerance });
  expectWithin({ quantity: 'taper', unit: '', got: taper, expected: numberIn(check.expected, 'eta_taper'), tolerance });
}

/** The exponent with the largest product of spillover and taper: golden section. */
function bestExponent(focalRatio: number): { q: number; product: number } {
  const product = (q: number): number => {
    const { spill, taper } = centreFed({ q, focalRatio, receiveExponent: 0.5 });
    return spill * taper;
  };
  const ratio = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [0.5, 20];
  while (high - low > 1e-3) {
    const a = high - ratio * (high - low);
    const b = low + ratio * (high - low);
    if (product(a) > product(b)) high = b;
    else low = a;
  }
  const q = (low + high) / 2;
  return { q, product: product(q) };
}

/** Loss of gain at the beam with frozen phases at another frequency, uniform amplitude, from the placed cells. */
function compareSpatialDelay(check: PublishedCheck): void {
  const diameterMm = numberIn(check.inputs, 'D_m') * 1000;
  const focalMm = numberIn(check.inputs, 'F_m') * 1000;
  const frequencyGHz = numberIn(check.inputs, 'f0_GHz');
  const shift = numberIn(check.inputs, 'df_over_f');
  const design = testDesign({ frequencyGHz, periodMm: diameterMm / 160, columns: 160, rows: 160 });
  const round = { ...design, panel: { ...design.panel, outline: { kind: 'ellipse' as const, widthMm: diameterMm, heightMm: diameterMm } } };
  const horn = { kind: 'horn' as const, positionMm: [0, 0, focalMm] as [number, number, number], aimMm: [0, 0, 0] as [number, number, number], exponentE: 1, exponentH: 1, polarisation: 'x' as const };
  const { cells } = predictDesign({ ...round, illumination: horn }, { include: { cells: true } });
  if (cells === undefined) throw new Error('no cells in the answer');
  const wavelengthMm = 299.792458 / frequencyGHz;
  let [re, im] = [0, 0];
  let longest = 0;
  cells.targetPhaseDeg.forEach((_, n) => {
    const pathMm = Math.hypot(cells.xMm[n], cells.yMm[n], focalMm);
    longest = Math.max(longest, pathMm);
    const phaseRad = (-2 * Math.PI * pathMm * shift) / wavelengthMm;
    re += Math.cos(phaseRad);
    im += Math.sin(phaseRad);
  });
  expectWithin({ quantity: 'loss', unit: 'dB', got: amplitudeRatioToDb(Math.hypot(re, im) / cells.xMm.length), expected: numberIn(check.expected, 'gain_loss_dB'), tolerance: toleranceOf(check, 'dB') });
  const edge = (Math.hypot(focalMm, diameterMm / 2) - focalMm) / wavelengthMm;
  expectWithin({ quantity: 'path difference', unit: 'wavelengths', got: edge, expected: numberIn(check.expected, 'path_difference_lambda'), tolerance: toleranceOf(check, 'lam') });
}

export const apertureChecks: CheckTable = {
  'line-01': (check) => {
    const got = describe1d(linePattern(() => 1));
    expectWithin({ quantity: 'sidelobe', unit: 'dB', got: got.sidelobeDb, expected: numberIn(check.expected, 'sll_dB'), tolerance: toleranceOf(check, 'sll_dB') });
    expectWithin({ quantity: 'place of the sidelobe', unit: '', got: got.sidelobeAt, expected: numberIn(check.expected, 'first_sidelobe_u_times_L_over_lambda'), tolerance: 5e-4 });
    expectWithin({ quantity: 'half-power width', unit: '', got: got.width, expected: numberIn(check.expected, 'hpbw_coef'), tolerance: toleranceOf(check, 'coef') });
  },
  'line-02': (check) => {
    const rows = numbersIn(check.inputs, 'n').map((n) => {
      const taper: Aperture = (x) => Math.cos(Math.PI * x) ** n;
      return { ...describe1d(linePattern(taper)), efficiency: lineEfficiency(taper) };
    });
    expectWithin({ quantity: 'sidelobe', unit: 'dB', got: rows.map((row) => row.sidelobeDb), expected: numbersIn(check.expected, 'sll_dB'), tolerance: toleranceOf(check, 'sll_dB') });
    expectWithin({ quantity: 'half-power width', unit: '', got: rows.map((row) => row.width), expected: numbersIn(check.expected, 'hpbw_coef'), tolerance: toleranceOf(check, 'coef') });
    expectWithin({ quantity: 'efficiency', unit: '', got: rows.map((row) => row.efficiency), expected: numbersIn(check.expected, 'efficiency'), tolerance: toleranceOf(check, 'coef') });
  },
  'circ-01': (check) => {
    const got = describe1d(discPattern(() => 1));
    expectWithin({ quantity: 'sidelobe', unit: 'dB', got: got.sidelobeDb, expected: numberIn(check.expected, 'sll_dB'), tolerance: toleranceOf(check, 'sll_dB') });
    expectWithin({ quantity: 'half-power width', unit: '', got: got.width, expected: numberIn(check.expected, 'hpbw_coef'), tolerance: toleranceOf(check, 'coef') });
    expectWithin({ quantity: 'first null', unit: '', got: got.nullAt, expected: numberIn(check.expected, 'first_null_coef'), tolerance: 5e-4 });
  },
  'circ-02': (check) => {
    const rows = numbersIn(check.inputs, 'p').map((p) => {
      const taper: Aperture = (r) => (1 - r * r) ** p;
      return { ...describe1d(discPattern(taper)), efficiency: discEfficiency(taper) };
    });
    expectWithin({ quantity: 'sidelobe', unit: 'dB', got: rows.map((row) => row.sidelobeDb), expected: numbersIn(check.expected, 'sll_dB'), tolerance: toleranceOf(check, 'sll_dB') });
    expectWithin({ quantity: 'half-power width', unit: '', got: rows.map((row) => row.width), expected: numbersIn(check.expected, 'hpbw_coef'), tolerance: toleranceOf(check, 'coef') });
    expectWithin({ quantity: 'efficiency', unit: '', got: rows.map((row) => row.efficiency), expected: numbersIn(check.expected, 'efficiency'), tolerance: toleranceOf(check, 'coef') });
  },
  'feed-01': compareFeed,
  'feed-02': compareFeed,
  'feed-03': compareFeed,
  'feed-09': compareFeed,
  'feed-04': (check) => {
    const ratios = numbersIn(check.inputs, 'F_over_D');
    const best = ratios.map(bestExponent);
    const edge = best.map(({ q }, i) => amplitudeRatioToDb(Math.cos(Math.atan(0.5 / ratios[i])) ** (q + 1)));
    expectWithin({ quantity: 'best exponent', unit: '', got: best.map((row) => row.q), expected: numbersIn(check.expected, 'q_opt'), tolerance: toleranceOf(check, 'q_abs') });
    expectWithin({ quantity: 'efficiency', unit: '', got: best.map((row) => row.product), expected: numbersIn(check.expected, 'eta_max'), tolerance: toleranceOf(check, 'eta_abs') });
    expectWithin({ quantity: 'edge taper', unit: 'dB', got: edge, expected: numbersIn(check.expected, 'edge_taper_dB'), tolerance: toleranceOf(check, 'dB') });
  },
  'dspd-01': compareSpatialDelay,
  'dspd-02': compareSpatialDelay,
  'quant-01': (check) => {
    const losses = numbersIn(check.inputs, 'bits').map((bits) => meanLoss(Array.from({ length: 2 ** bits }, (_, i) => (360 * i) / 2 ** bits)));
    expectWithin({ quantity: 'mean loss', unit: 'dB', got: losses.map((row) => row.lossDb), expected: numbersIn(check.expected, 'loss_dB'), tolerance: toleranceOf(check, 'dB') });
    expectWithin({ quantity: 'rms error', unit: 'deg', got: losses.map((row) => row.rmsDeg), expected: numbersIn(check.expected, 'rms_error_deg'), tolerance: 1e-3 });
  },
  'quant-02': (check) => {
    const got = numbersIn(check.inputs, 'separation_deg').map((apart) => meanLoss([0, apart]).lossDb);
    expectWithin({ quantity: 'mean loss', unit: 'dB', got, expected: numbersIn(check.expected, 'loss_dB'), tolerance: toleranceOf(check, 'dB') });
  },
  'quant-03': (check) => {
    const rows = numbersIn(check.inputs, 'range_deg').map((range) => meanLoss(Array.from({ length: 2001 }, (_, i) => (range * i) / 2000)));
    expectWithin({ quantity: 'mean loss', unit: 'dB', got: rows.map((row) => row.lossDb), expected: numbersIn(check.expected, 'loss_dB'), tolerance: toleranceOf(check, 'dB') });
    expectWithin({ quantity: 'largest error', unit: 'deg', got: rows.map((row) => row.largestDeg), expected: numbersIn(check.expected, 'max_error_deg'), tolerance: TARGET_STEP_DEG / 2 });
  },
};

const TARGETS = 1440;
const TARGET_STEP_DEG = 360 / TARGETS;

/**
 * Loss of a table of lossless cells over evenly spread targets, as the product places them: a line whose steps are
 * 360/n degrees asks for n targets once each. The mean is taken towards the best common phase.
 */
function meanLoss(phasesDeg: readonly number[]): { lossDb: number; rmsDeg: number; largestDeg: number } {
  const design = testDesign({
    frequencyGHz: FREQUENCY_OF_100_MM_GHZ,
    periodMm: 10,
    columns: TARGETS,
    rows: 1,
    // u d / lambda = 1/TARGETS: the targets go round once over the line.
    beams: [{ thetaDeg: degFromRad(Math.asin(10 / TARGETS)), phiDeg: 0 }],
    cells: { kind: 'inline', cells: phasesDeg.map((phaseDeg) => ({ phaseDeg, magnitude: 1 })) },
  });
  const { cells, figures } = predictDesign(design, { include: { cells: true } });
  const largestDeg = Math.max(...Array.from(cells?.errorDeg ?? [NaN], Math.abs));
  return { lossDb: numberOf(figures.phaseLossDb), rmsDeg: numberOf(figures.phaseErrorRmsDeg), largestDeg };
}
