import type { Figure } from '../model/figures';
import { degFromRad } from '../units/angles';
import { powerRatioToDb } from '../units/decibels';

/** A pattern along one cut as a function, with the part of it to look at. */
export interface CutFunction {
  /** Power at an angle from the wanted direction. */
  power(angleRad: number): number;
  readonly fromRad: number;
  readonly toRad: number;
  /** Samples over the whole arc; several to every lobe. */
  readonly samples: number;
}

export interface CutMetrics {
  readonly halfPowerBeamwidthDeg: Figure;
  /** Highest level outside the first minima, relative to the cut's peak. */
  readonly sidelobeDb: Figure;
}

/** A lobe whose highest sample reaches this share of the highest sample of all may have the higher top: six samples to a lobe miss up to 7 %. */
const NEARLY_HIGHEST = 0.8;
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * Beamwidth at half power and sidelobe level of the lobe that stands at angle 0: climbs to its peak, goes down to half
 * power and on to the first minimum on both sides. Crossings and peaks are refined between samples on the exact pattern.
 */
export function cutMetrics(cut: CutFunction): CutMetrics {
  const step = (cut.toRad - cut.fromRad) / cut.samples;
  const angleOf = (i: number): number => cut.fromRad + i * step;
  const level = Float64Array.from({ length: cut.samples + 1 }, (_, i) => cut.power(angleOf(i)));
  const top = climb(level, Math.round(-cut.fromRad / step));
  const peak = refineMaximum(cut, angleOf(top), step).level;
  const right = halfPowerSide({ cut, level, angleOf, top, peak }, 1);
  const left = halfPowerSide({ cut, level, angleOf, top, peak }, -1);
  const missing = right.crossingRad === undefined || left.crossingRad === undefined;
  return {
    halfPowerBeamwidthDeg: missing
      ? { kind: 'not-reached', reason: 'the pattern does not fall to half power on both sides within this cut' }
      : degFromRad((right.crossingRad ?? 0) - (left.crossingRad ?? 0)),
    sidelobeDb: sidelobe({ cut, level, angleOf, top, peak }, left.minimum, right.minimum),
  };
}

interface SampledCut {
  readonly cut: CutFunction;
  readonly level: Float64Array;
  readonly top: number;
  readonly peak: number;
  angleOf(i: number): number;
}

function climb(level: Float64Array, start: number): number {
  let i = Math.min(level.length - 1, Math.max(0, start));
  for (;;) {
    const right = i + 1 < level.length ? level[i + 1] : -1;
    const left = i > 0 ? level[i - 1] : -1;
    if (right <= level[i] && left <= level[i]) return i;
    i += right >= left ? 1 : -1;
  }
}

/** Where the cut falls through half power, and the sample of the first minimum after it. */
function halfPowerSide({ cut, level, angleOf, top, peak }: SampledCut, side: 1 | -1): { crossingRad?: number; minimum?: number } {
  const last = side === 1 ? level.length - 1 : 0;
  let i = top;
  while (i !== last && level[i] > peak / 2) i += side;
  if (level[i] > peak / 2) return {};
  const crossingRad = bisect(cut, angleOf(i - side), angleOf(i), peak / 2);
  while (i !== last && level[i + side] < level[i]) i += side;
  return { crossingRad, minimum: i === last ? undefined : i };
}

function bisect(cut: CutFunction, insideRad: number, outsideRad: number, half: number): number {
  let [inside, outside] = [insideRad, outsideRad];
  for (let i = 0; i < 40 && Math.abs(outside - inside) > 1e-10; i++) {
    const middle = (inside + outside) / 2;
    if (cut.power(middle) > half) inside = middle;
    else outside = middle;
  }
  return (inside + outside) / 2;
}

function sidelobe(sampled: SampledCut, leftMinimum?: number, rightMinimum?: number): Figure {
  const { cut, level, angleOf, peak } = sampled;
  let best = -1;
  const consider = (from: number, to: number): void => {
    for (let i = from; i <= to; i++) if (best < 0 || level[i] > level[best]) best = i;
  };
  if (leftMinimum !== undefined) consider(0, leftMinimum);
  if (rightMinimum !== undefined) consider(rightMinimum, level.length - 1);
  if (best < 0) return { kind: 'no-sidelobe', reason: 'the cut has no minimum beyond the half-power points' };
  const rivals = localMaxima(level, NEARLY_HIGHEST * level[best]).filter((i) => i <= (leftMinimum ?? -1) || i >= (rightMinimum ?? level.length));
  const highest = [best, ...rivals].reduce((top, i) => Math.max(top, refineMaximum(cut, angleOf(i), angleOf(1) - angleOf(0)).level), 0);
  if (!(highest > 0)) return { kind: 'no-sidelobe', reason: 'nothing is radiated outside the main lobe of the cut' };
  return powerRatioToDb(highest / peak);
}

/** Samples at least as high as both neighbours and above a level. */
function localMaxima(level: Float64Array, above: number): number[] {
  const found: number[] = [];
  for (let i = 1; i + 1 < level.length; i++) if (level[i] > above && level[i] >= level[i - 1] && level[i] > level[i + 1]) found.push(i);
  return found;
}

/** Golden-section search for the maximum within a sample either way, kept inside the arc. */
function refineMaximum(cut: CutFunction, aroundRad: number, step: number): { angleRad: number; level: number } {
  let low = Math.max(cut.fromRad, aroundRad - step);
  let high = Math.min(cut.toRad, aroundRad + step);
  let a = high - GOLDEN * (high - low);
  let b = low + GOLDEN * (high - low);
  let levelA = cut.power(a);
  let levelB = cut.power(b);
  // The level is flat at its top: an angle right to 1e-5 of a sample gives it to 1e-10.
  while (high - low > 1e-5 * step) {
    if (levelA > levelB) {
      [high, b, levelB] = [b, a, levelA];
      a = high - GOLDEN * (high - low);
      levelA = cut.power(a);
    } else {
      [low, a, levelA] = [a, b, levelB];
      b = low + GOLDEN * (high - low);
      levelB = cut.power(b);
    }
  }
  const angleRad = (low + high) / 2;
  const around = cut.power(aroundRad);
  const level = cut.power(angleRad);
  return level >= around ? { angleRad, level } : { angleRad: aroundRad, level: around };
}
