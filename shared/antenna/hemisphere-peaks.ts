import { blendedPower, elementPower, type PatternBlend, type RadiationPattern } from './radiation-pattern';

/** A local maximum on the samples of the hemisphere; its power is relative, element factor included. */
export interface SampledPeak {
  readonly u: number;
  readonly v: number;
  readonly power: number;
}

/** More samples than this in the visible circle are not searched: the panel is too many wavelengths across. */
export const MOST_SAMPLES = 24_000_000;

export interface SampleGrid {
  readonly uStep: number;
  readonly vStep: number;
  /** Largest sample index along u and v inside the visible circle. */
  readonly uReach: number;
  readonly vReach: number;
}

/** Natural samples of the pattern that fall into the visible circle. */
export function sampleGrid(pattern: RadiationPattern): SampleGrid {
  const { grid, periodU, rows } = pattern.spectrum;
  const uStep = (2 * Math.PI) / (pattern.wavenumber * grid.stepXM * periodU);
  const vStep = (2 * Math.PI) / (pattern.wavenumber * grid.stepYM * rows);
  return { uStep, vStep, uReach: Math.floor(1 / uStep), vReach: Math.floor(1 / vStep) };
}

export function sampleCount({ uReach, vReach }: SampleGrid): number {
  return (2 * uReach + 1) * (2 * vReach + 1);
}

/** Power times element factor along one line of samples of constant u, v rising; -1 outside the circle. */
export function sampleLine(pattern: RadiationPattern, samples: SampleGrid, m: number, line: Float64Array): void {
  if (pattern.blend) {
    sampleBlend(pattern, pattern.blend, { samples, m }, line);
    return;
  }
  const { vReach, uStep, vStep } = samples;
  const { columns, rows, re, im } = pattern.spectrum;
  const column = (m - columns * Math.floor(m / columns)) * rows;
  const uSquared = m * uStep * (m * uStep);
  let row = -vReach - rows * Math.floor(-vReach / rows);
  for (let n = -vReach; n <= vReach; n++) {
    const wSquared = 1 - uSquared - n * vStep * (n * vStep);
    const at = column + row;
    line[n + vReach] = wSquared < 0 ? -1 : (re[at] * re[at] + im[at] * im[at]) * elementPower(Math.sqrt(wSquared), pattern.radiateExponent);
    row = row + 1 === rows ? 0 : row + 1;
  }
}

function sampleBlend({ spectrum }: RadiationPattern, blend: PatternBlend, { samples, m }: { samples: SampleGrid; m: number }, line: Float64Array): void {
  const { vReach, uStep, vStep } = samples;
  const { columns, rows } = spectrum;
  const column = (m - columns * Math.floor(m / columns)) * rows;
  const u = m * uStep;
  const own = { re: 0, im: 0 };
  const other = { re: 0, im: 0 };
  for (let n = -vReach; n <= vReach; n++) {
    const v = n * vStep;
    const wSquared = 1 - u * u - v * v;
    const at = column + n - rows * Math.floor(n / rows);
    [own.re, own.im, other.re, other.im] = [spectrum.re[at], spectrum.im[at], blend.spectrum.re[at], blend.spectrum.im[at]];
    line[n + vReach] = wSquared < 0 ? -1 : blendedPower(blend, { u, v, w: Math.sqrt(wSquared) }, own, other);
  }
}

export interface SampledTops {
  /** The highest local maxima among the samples, strongest first. */
  readonly peaks: SampledPeak[];
  /** Samples beside a lobe too shallow to have one, strongest first, none weaker than the weakest of `peaks`. */
  readonly shoulders: SampledPeak[];
}

/**
 * Where lobes of the whole hemisphere stand. The samples are two to three times as fine as the pattern needs, so every
 * lobe that stands clear has a local maximum among them. A lobe on the flank of a stronger one, parted from it by a
 * shallow saddle, may have none: it is found as a shoulder. refinePeak then finds the true tops.
 */
export function hemispherePeaks(pattern: RadiationPattern, count: number): SampledTops {
  const samples = sampleGrid(pattern);
  const { uReach, vReach, uStep, vStep } = samples;
  const length = 2 * vReach + 1;
  let before: Float64Array = new Float64Array(length).fill(-1);
  let here: Float64Array = new Float64Array(length);
  let after: Float64Array = new Float64Array(length);
  sampleLine(pattern, samples, -uReach, here);
  const found: SampledPeak[] = [];
  const bends: SampledPeak[] = [];
  let least = 0;
  for (let m = -uReach; m <= uReach; m++) {
    if (m < uReach) sampleLine(pattern, samples, m + 1, after);
    else after.fill(-1);
    for (let i = 0; i < length; i++) {
      const value = here[i];
      if (value <= least) continue;
      const lines = { before, here, after };
      const sample = { u: m * uStep, v: (i - vReach) * vStep, power: value };
      if (isLocalMaximum(value, i, lines)) least = insertPeak(found, sample, count);
      else if (isShoulder(i, lines)) bends.push(sample);
    }
    [before, here, after] = [here, after, before];
  }
  return { peaks: found, shoulders: bends.filter((bend) => bend.power > least && standsClear(bend, found, samples)).sort((a, b) => b.power - a.power) };
}

/** No neighbour of a sampled maximum: those climb to the top of that maximum. */
function standsClear(bend: SampledPeak, peaks: readonly SampledPeak[], { uStep, vStep }: SampleGrid): boolean {
  return !peaks.some((peak) => Math.abs(peak.u - bend.u) < 1.5 * uStep && Math.abs(peak.v - bend.v) < 1.5 * vStep);
}

interface Lines {
  readonly before: Float64Array;
  readonly here: Float64Array;
  readonly after: Float64Array;
}

/** Above or equal to all eight neighbours; of an equal pair the one that comes first counts. */
function isLocalMaximum(value: number, i: number, { before, here, after }: Lines): boolean {
  if (here[i - 1] >= value || here[i + 1] > value || before[i] >= value || after[i] > value) return false;
  return !(before[i - 1] >= value || before[i + 1] >= value || after[i - 1] > value || after[i + 1] > value);
}

/** A top this many samples away, by the curvature of the logarithm, is worth a climb. */
const SHOULDER_REACH = 1.5;

/** The logarithm of the power bends down in every direction, and the parabola through the neighbours has its top nearby. */
function isShoulder(i: number, { before, here, after }: Lines): boolean {
  if (!(here[i - 1] > 0 && here[i + 1] > 0 && before[i] > 0 && after[i] > 0)) return false;
  if (!(before[i - 1] > 0 && before[i + 1] > 0 && after[i - 1] > 0 && after[i + 1] > 0)) return false;
  const middle = 2 * Math.log(here[i]);
  const huu = Math.log(after[i] * before[i]) - middle;
  const hvv = Math.log(here[i + 1] * here[i - 1]) - middle;
  const huv = Math.log((after[i + 1] * before[i - 1]) / (after[i - 1] * before[i + 1])) / 4;
  const determinant = huu * hvv - huv * huv;
  if (!(huu < 0 && determinant > 0)) return false;
  const gu = Math.log(after[i] / before[i]) / 2;
  const gv = Math.log(here[i + 1] / here[i - 1]) / 2;
  return Math.max(Math.abs(huv * gv - hvv * gu), Math.abs(huv * gu - huu * gv)) < SHOULDER_REACH * determinant;
}

/** Keeps the `count` strongest in order; gives the power that the next one must exceed. */
function insertPeak(found: SampledPeak[], peak: SampledPeak, count: number): number {
  let at = found.length;
  while (at > 0 && found[at - 1].power < peak.power) at -= 1;
  found.splice(at, 0, peak);
  if (found.length > count) found.pop();
  return found.length === count ? found[count - 1].power : 0;
}
