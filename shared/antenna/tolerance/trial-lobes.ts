import { angleBetweenRad, outwardDirection, type Direction } from '../../waves/conventions';
import { hemispherePeaks, MOST_SAMPLES, sampleCount, sampleGrid, type SampledPeak, type SampleGrid } from '../hemisphere-peaks';
import { elementPower, type RadiationPattern } from '../radiation-pattern';
import { spectrumPower } from '../aperture-spectrum';
import { refinePeak, type PatternPeak } from '../refine-peak';

/** What the requirement asks of the lobes of one panel. */
export interface TrialLobes {
  /** The tops reached from the wanted directions. */
  readonly ofBeams: readonly PatternPeak[];
  /** The highest top beside those; null where there is none or the panel is too many wavelengths across to search. */
  readonly highestOther: PatternPeak | null;
}

/** Sampled maxima looked at beyond those of the beams, and shoulders of others. */
const CANDIDATES = 6;
const SHOULDERS = 12;
/** Power of a shoulder relative to the top beside it: at least about this. */
const SHOULDER_SHARE = 0.7;
/** Estimates within this share of the best are climbed to. */
const RIVAL_SHARE = 0.85;
/** No other top stands nearer to that of a beam than about this many lambda / side. */
const BEAM_REACH = 1.25;

/**
 * The beams and the one highest lobe, at a fraction of the cost of listing lobes in order: tops are estimated by a parabola
 * through nine samples of |F|, good to a few tenths of a decibel, and only those that may be the highest are climbed to.
 */
export function trialLobes(pattern: RadiationPattern, beams: readonly Direction[]): TrialLobes {
  const ofBeams = beams.map((beam) => refinePeak(pattern, beam.u, beam.v));
  const samples = sampleGrid(pattern);
  if (sampleCount(samples) > MOST_SAMPLES) return { ofBeams, highestOther: null };
  const { peaks, shoulders } = hemispherePeaks(pattern, CANDIDATES + beams.length);
  const { grid } = pattern.spectrum;
  const sides = { u: (pattern.wavenumber * grid.columnCount * grid.stepXM) / (2 * Math.PI), v: (pattern.wavenumber * grid.rowCount * grid.stepYM) / (2 * Math.PI) };
  const beside = ({ u, v }: { u: number; v: number }, reach: number): boolean => ofBeams.every((top) => Math.hypot((top.u - u) * sides.u, (top.v - v) * sides.v) > reach);
  const estimates = peaks.filter((peak) => beside(peak, 0.5)).map((peak) => estimatedTop(pattern, samples, peak)).sort((a, b) => b.power - a.power);
  const best = estimates[0]?.power ?? 0;
  const rivals = estimates.filter(({ power }) => power >= RIVAL_SHARE * best);
  const flanks = shoulders.filter((shoulder) => shoulder.power > SHOULDER_SHARE * best && beside(shoulder, BEAM_REACH)).slice(0, SHOULDERS);
  let highestOther: PatternPeak | null = null;
  for (const start of [...rivals, ...flanks]) {
    const top = refinePeak(pattern, start.u, start.v);
    // A climb counts where it ends on a top, not where it gives up on a ridge.
    const finished = top.lastStep * Math.max(sides.u, sides.v) < 1e-3;
    if (finished && beside(top, 0.5) && top.directivityRatio > (highestOther?.directivityRatio ?? 0)) highestOther = top;
  }
  return { ofBeams, highestOther };
}

/** Angle between a wanted direction and the top reached from it. */
export function pointingErrorRad(beam: Direction, top: PatternPeak): number {
  return angleBetweenRad(beam, outwardDirection(top.u, top.v));
}

/** Top of the paraboloid through |F| at a sampled maximum and its eight neighbours. A logarithm would bend near nulls. */
function estimatedTop(pattern: RadiationPattern, { uStep, vStep }: SampleGrid, peak: SampledPeak): SampledPeak {
  const [m, n] = [Math.round(peak.u / uStep), Math.round(peak.v / vStep)];
  const sizeAt = (i: number, j: number): number => {
    const wSquared = 1 - ((m + i) * uStep) ** 2 - ((n + j) * vStep) ** 2;
    return wSquared <= 0 ? 0 : Math.sqrt(spectrumPower(pattern.spectrum, m + i, n + j) * elementPower(Math.sqrt(wSquared), pattern.radiateExponent));
  };
  const middle = sizeAt(0, 0);
  const [right, left, above, below] = [sizeAt(1, 0), sizeAt(-1, 0), sizeAt(0, 1), sizeAt(0, -1)];
  const [gu, gv] = [(right - left) / 2, (above - below) / 2];
  const [huu, hvv] = [right + left - 2 * middle, above + below - 2 * middle];
  const huv = (sizeAt(1, 1) - sizeAt(1, -1) - sizeAt(-1, 1) + sizeAt(-1, -1)) / 4;
  const determinant = huu * hvv - huv * huv;
  const du = (huv * gv - hvv * gu) / determinant;
  const dv = (huv * gu - huu * gv) / determinant;
  // At the rim, or where the samples are no hill, the sample itself stands.
  if (!(huu < 0 && determinant > 0 && Math.abs(du) <= 1 && Math.abs(dv) <= 1)) return peak;
  return { u: (m + du) * uStep, v: (n + dv) * vStep, power: (middle + (gu * du + gv * dv) / 2) ** 2 };
}
