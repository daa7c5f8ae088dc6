import type { Requirement } from '../model/design-document';
import type { Figure, Figures, NoFigure, Verdict } from '../model/figures';
import { isReason } from './exposure/exposure-readings';
import { isNumber, noFigure } from './no-figure';

interface Line {
  readonly line: Verdict['line'];
  readonly sense: Verdict['sense'];
  readonly limit: number;
  readonly unit: string;
  readonly value: Figure;
}

/**
 * Each line of the requirement that was given, against the prediction. What cannot be computed is never "meets", nor is
 * anything where an obstacle keeps the figures from meaning this panel.
 */
export function requirementVerdicts(requirement: Requirement, figures: Figures, obstacle?: NoFigure): Verdict[] {
  const lines: Line[] = [];
  const { minGainDbi, maxSidelobeDb, pointingToleranceDeg, minCrossPolarDiscriminationDb, mask } = requirement;
  const add = (line: Verdict['line'], sense: Verdict['sense'], limit: number | undefined, unit: string): void => {
    if (limit !== undefined) lines.push({ line, sense, limit, unit, value: obstacle ?? figureOfLine(line, figures) });
  };
  add('gain', 'at-least', minGainDbi, 'dBi');
  add('sidelobe', 'at-most', maxSidelobeDb, 'dB');
  add('pointing', 'at-most', pointingToleranceDeg, '°');
  add('mask', 'at-least', mask === undefined ? undefined : 0, 'dB');
  add('cross-polar', 'at-least', minCrossPolarDiscriminationDb, 'dB');
  add('cross-polar-mask', 'at-least', requirement.crossPolarMask === undefined ? undefined : 0, 'dB');
  add('received-power', 'at-least', requirement.link?.minReceivedDbm, 'dBm');
  add('gain-over-temperature', 'at-least', requirement.receiver?.minGainOverTemperatureDbPerK, 'dB/K');
  add('eirp-density', 'at-least', requirement.transmitter?.densityMask === undefined ? undefined : 0, 'dB');
  return lines.map(judge);
}

/**
 * The figure that a line of the requirement is held against. The gain and the pointing are those of the worst wanted
 * beam; the sidelobe is the highest anywhere in the hemisphere.
 */
export function figureOfLine(line: Verdict['line'], figures: Figures): Figure {
  const { hemisphere } = figures.sidelobeDb;
  const { maskMargin } = figures;
  switch (line) {
    case 'gain':
      return worst(figures.beams.map((beam) => beam.gainDbi), Math.min);
    case 'sidelobe':
      return 'levelDb' in hemisphere ? numberOr(hemisphere.levelDb, hemisphere) : hemisphere;
    case 'pointing':
      return worst(figures.beams.map((beam) => beam.pointingErrorDeg), Math.max);
    case 'mask':
      return 'marginDb' in maskMargin ? numberOr(maskMargin.marginDb, maskMargin) : maskMargin;
    case 'cross-polar-mask':
      return marginOf(figures.crossPolarMaskMargin);
    case 'received-power':
      return figures.link === undefined || isReason(figures.link) ? absent(figures.link) : figures.link.receivedDbm;
    case 'gain-over-temperature':
      return figures.gainOverTemperatureDbPerK ?? absent(undefined);
    case 'eirp-density':
      return marginOf(figures.eirpDensityMargin);
    case 'cross-polar':
      return figures.vector ? worst(figures.vector.crossPolarDiscriminationDb, Math.min) : noFigure('scalar-model', 'the scalar prediction has no cross-polar field');
  }
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

function marginOf(holder: Figures['eirpDensityMargin'] | Figures['crossPolarMaskMargin']): Figure {
  return holder !== undefined && 'marginDb' in holder ? numberOr(holder.marginDb, holder) : absent(holder);
}

/** Figures kept from before a line was known have no value for it. */
function absent(holder: object | undefined): NoFigure {
  const reason = holder !== undefined && 'reason' in holder ? String(holder.reason) : 'not computed with these figures';
  return noFigure('no-figure', reason);
}

/** A reason may carry a field of the same name as the figure; only a bare number is one. */
function numberOr(value: number | string, holder: object): Figure {
  return typeof value === 'number' ? value : { kind: 'no-figure', reason: 'reason' in holder ? String(holder.reason) : 'no value' };
}
