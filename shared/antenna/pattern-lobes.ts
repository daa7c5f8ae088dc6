import type { Lobe } from '../model/figures';
import { degFromRad } from '../units/angles';
import { powerRatioToDb } from '../units/decibels';
import { angleBetweenRad, anglesOf, outwardDirection, type Direction } from '../waves/conventions';
import { hemispherePeaks, MOST_SAMPLES, sampleCount, sampleGrid } from './hemisphere-peaks';
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

/** Finds the lobes: the strongest sampled maxima of the hemisphere, refined, and one climb from each wanted direction. */
export function patternLobes(pattern: RadiationPattern, beams: readonly Direction[]): PatternLobes {
  const searched = sampleCount(sampleGrid(pattern)) <= MOST_SAMPLES;
  const sampled = searched ? hemispherePeaks(pattern, REFINED + 2 * beams.length) : [];
  const { grid } = pattern.spectrum;
  // Two tops nearer than this are one lobe: a tenth of the width of the narrowest lobe.
  const apart = (0.1 * 2 * Math.PI) / (pattern.wavenumber * Math.max(grid.columnCount * grid.stepXM, grid.rowCount * grid.stepYM));
  const climbed = beams.map((beam) => refinePeak(pattern, beam.u, beam.v));
  const tops: PatternPeak[] = [];
  const addTop = (top: PatternPeak): void => {
    if (top.directivityRatio > 0 && !tops.some((other) => samePlace(other, top, apart))) tops.push(top);
  };
  climbed.forEach(addTop);
  sampled.forEach((peak) => addTop(refinePeak(pattern, peak.u, peak.v)));
  tops.sort((a, b) => b.directivityRatio - a.directivityRatio);
  const ofBeams = beams.map((beam, i) => nearestTop(tops, beam) ?? climbed[i]);
  const others = tops.filter((top) => !ofBeams.some((own) => samePlace(own, top, apart)));
  return { highest: tops[0] ?? climbed[0], ofBeams, others, searched };
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
