import type { Lobe } from '../model/figures';
import { degFromRad } from '../units/angles';
import { powerRatioToDb } from '../units/decibels';
import { angleBetweenRad, anglesOf, outwardDirection, type Direction } from '../waves/conventions';
import { hemispherePeaks, MOST_SAMPLES, sampleCount, sampleGrid, type SampledPeak } from './hemisphere-peaks';
import type { RadiationPattern } from './radiation-pattern';
import { refinePeak, type PatternPeak } from './refine-peak';

export interface PatternLobes {
  /** The highest maximum anywhere in the hemisphere. */
  readonly highest: PatternPeak;
  /** For each wanted beam the local maximum nearest to its direction. */
  readonly ofBeams: readonly PatternPeak[];
  /** Maxima other than those of the wanted beams, strongest first. */
  readonly others: readonly PatternPeak[];
  /** False where the panel is too many wavelengths across for the hemisphere to be searched. */
  readonly searched: boolean;
}

/** Sampled maxima that are refined beyond one for each beam; their order may change by refining, so some more than are listed. */
const REFINED = 12;

/** So many of the strongest tops must be right: the wanted lobe and the six that the figures list. */
const LISTED_TOPS = 7;
/** Power of a shoulder, at most one and a half samples from its top, relative to that top: at least about this. */
const SHOULDER_SHARE = 0.7;

/** Powers nearer than this share are equal: the accuracy of the interpolated far field. */
const EQUAL_SHARE = 1e-8;

/** Finds the lobes: the strongest sampled maxima and shoulders of the hemisphere, refined, and one climb from each wanted direction. */
export function patternLobes(pattern: RadiationPattern, beams: readonly Direction[]): PatternLobes {
  const searched = sampleCount(sampleGrid(pattern)) <= MOST_SAMPLES;
  const { peaks, shoulders } = searched ? hemispherePeaks(pattern, REFINED + 2 * beams.length) : { peaks: [], shoulders: [] };
  const { grid } = pattern.spectrum;
  // Two tops nearer than this are one lobe: a tenth of the width of the narrowest lobe.
  const apart = (0.1 * 2 * Math.PI) / (pattern.wavenumber * Math.max(grid.columnCount * grid.stepXM, grid.rowCount * grid.stepYM));
  const climbed = beams.map((beam) => refinePeak(pattern, beam.u, beam.v));
  const tops: PatternPeak[] = [];
  const addTop = (top: PatternPeak): void => {
    if (top.directivityRatio > 0 && !tops.some((other) => samePlace(other, top, apart))) tops.push(top);
  };
  climbed.forEach(addTop);
  peaks.forEach((peak) => addTop(refinePeak(pattern, peak.u, peak.v)));
  shouldersWorthAClimb(pattern, shoulders.filter(besideBeams(pattern, climbed)), tops).forEach(({ u, v }) => {
    const top = refinePeak(pattern, u, v);
    // A climb counts where it ends on a top, not where it gives up on a ridge.
    if (top.lastStep < 1e-3 * apart) addTop(top);
  });
  tops.sort((a, b) => b.directivityRatio - a.directivityRatio);
  const ofBeams = beams.map((beam, i) => nearestTop(tops, beam) ?? climbed[i]);
  const others = tops.filter((top) => !ofBeams.some((own) => samePlace(own, top, apart)));
  return { highest: highestOf(tops, ofBeams) ?? climbed[0], ofBeams, others, searched };
}

/** No other top stands nearer to that of a beam than this many lambda / side: the first null of a uniform panel is 1 away, its first lobe 1.43. */
const BEAM_REACH = 1.25;

/** The flank of a beam bends like a shoulder at many samples; they would take the place of lobes parted from it by a shallow saddle. */
function besideBeams({ wavenumber, spectrum: { grid } }: RadiationPattern, beams: readonly PatternPeak[]): (sample: SampledPeak) => boolean {
  const perU = (wavenumber * grid.columnCount * grid.stepXM) / (2 * Math.PI);
  const perV = (wavenumber * grid.rowCount * grid.stepYM) / (2 * Math.PI);
  return ({ u, v }) => beams.every((top) => Math.hypot((top.u - u) * perU, (top.v - v) * perV) > BEAM_REACH);
}

/** Those that may stand beside a top higher than the ones that will be listed. */
function shouldersWorthAClimb(pattern: RadiationPattern, shoulders: readonly SampledPeak[], tops: readonly PatternPeak[]): readonly SampledPeak[] {
  const ratios = tops.map((top) => top.directivityRatio).sort((a, b) => b - a);
  const least = (SHOULDER_SHARE * (ratios[LISTED_TOPS - 1] ?? 0) * pattern.radiatedPower) / (4 * Math.PI);
  return shoulders.filter((shoulder) => shoulder.power > least).slice(0, REFINED);
}

/** The highest top; of lobes that are equal but for rounding, as a beam and its image may be, the wanted one. */
function highestOf(tops: readonly PatternPeak[], ofBeams: readonly PatternPeak[]): PatternPeak | undefined {
  return ofBeams.find((own) => own.directivityRatio >= tops[0]?.directivityRatio * (1 - EQUAL_SHARE)) ?? tops[0];
}

function samePlace(a: PatternPeak, b: PatternPeak, apart: number): boolean {
  return Math.hypot(a.u - b.u, a.v - b.v) < apart;
}

function nearestTop(tops: readonly PatternPeak[], beam: Direction): PatternPeak | undefined {
  let nearest: PatternPeak | undefined;
  let least = Infinity;
  for (const top of tops) {
    const away = angleBetweenRad(outwardDirection(top.u, top.v), beam);
    if (away < least) [nearest, least] = [top, away];
  }
  return nearest;
}

/** Direction of a maximum in degrees. */
export function peakAnglesDeg(peak: PatternPeak): { thetaDeg: number; phiDeg: number } {
  const { thetaRad, phiRad } = anglesOf(outwardDirection(peak.u, peak.v));
  return { thetaDeg: degFromRad(thetaRad), phiDeg: degFromRad(phiRad) };
}

/** A maximum with its level relative to another. */
export function lobeRelativeTo(peak: PatternPeak, reference: PatternPeak): Lobe {
  return { levelDb: powerRatioToDb(peak.directivityRatio / reference.directivityRatio), ...peakAnglesDeg(peak) };
}
