import type { Requirement } from '../model/design-document';
import type { Figure, Figures, Verdict } from '../model/figures';
import { isNumber, noFigure } from './no-figure';

interface Line {
  readonly line: Verdict['line'];
  readonly sense: Verdict['sense'];
  readonly limit: number;
  readonly unit: string;
  readonly value: Figure;
}

/**
 * Each line of the requirement that was given, against the prediction. The gain and the pointing are those of the worst
 * wanted beam; the sidelobe is the highest anywhere in the hemisphere. What cannot be computed is never "meets".
 */
export function requirementVerdicts(requirement: Requirement, figures: Figures): Verdict[] {
  const lines: Line[] = [];
  const { minGainDbi, maxSidelobeDb, pointingToleranceDeg, minCrossPolarDiscriminationDb, mask } = requirement;
  if (minGainDbi !== undefined) {
    lines.push({ line: 'gain', sense: 'at-least', limit: minGainDbi, unit: 'dBi', value: worst(figures.beams.map((beam) => beam.gainDbi), Math.min) });
  }
  if (maxSidelobeDb !== undefined) {
    const { hemisphere } = figures.sidelobeDb;
    lines.push({ line: 'sidelobe', sense: 'at-most', limit: maxSidelobeDb, unit: 'dB', value: 'levelDb' in hemisphere ? numberOr(hemisphere.levelDb, hemisphere) : hemisphere });
  }
  if (pointingToleranceDeg !== undefined) {
    const value = worst(figures.beams.map((beam) => beam.pointingErrorDeg), Math.max);
    lines.push({ line: 'pointing', sense: 'at-most', limit: pointingToleranceDeg, unit: 'deg', value });
  }
  if (mask !== undefined) {
    const margin = figures.maskMargin;
    lines.push({ line: 'mask', sense: 'at-least', limit: 0, unit: 'dB', value: 'marginDb' in margin ? numberOr(margin.marginDb, margin) : margin });
  }
  if (minCrossPolarDiscriminationDb !== undefined) {
    const value = noFigure('scalar-model', 'the scalar prediction has no cross-polar field');
    lines.push({ line: 'cross-polar', sense: 'at-least', limit: minCrossPolarDiscriminationDb, unit: 'dB', value });
  }
  return lines.map(judge);
}

function judge(line: Line): Verdict {
  if (!isNumber(line.value)) return { ...line, margin: line.value, verdict: 'not-evaluated', reason: line.value.reason };
  const margin = line.sense === 'at-least' ? line.value - line.limit : line.limit - line.value;
  return { ...line, margin, verdict: margin >= 0 ? 'meets' : 'falls-short' };
}

function worst(values: readonly Figure[], pick: (...numbers: number[]) => number): Figure {
  const missing = values.find((value) => !isNumber(value));
  return missing ?? pick(...values.filter(isNumber));
}

/** A reason may carry a field of the same name as the figure; only a bare number is one. */
function numberOr(value: number | string, holder: object): Figure {
  return typeof value === 'number' ? value : { kind: 'no-figure', reason: 'reason' in holder ? String(holder.reason) : 'no value' };
}
