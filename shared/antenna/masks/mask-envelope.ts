import { linearThrough } from '../../math/interpolate';
import type { Mask } from '../../model/design-document';
import type { NoFigure } from '../../model/figures';
import { SPEED_OF_LIGHT_M_PER_S } from '../../units/constants';
import { noFigure } from '../no-figure';
import { maskFormula } from './mask-formula';
import { EVERY_DIRECTION, type MaskFacts, type MaskRule, type MaskSegment } from './mask-segment';
import { publishedMask, PUBLISHED_MASKS } from './published-masks';

/*
 * A mask as the engine reads it: levels over the angle off the wanted beam, in degrees and dB because every published
 * envelope is written in them. Outside its segments a mask is undefined, and nothing is filled in there.
 */

export interface MaskEnvelope {
  /** Rising, each from `fromDeg` to below the next one's; the last one holds its end. */
  readonly segments: readonly MaskSegment[];
  readonly rule: MaskRule;
  /** Where the gain may stand `spilloverDb` above the envelope: the spillover of the main reflector, as declared. */
  readonly spilloverDeg?: readonly [number, number];
}

export function maskFacts(largestDimensionM: number, wavenumberRadPerM: number, peakGainDbi: number): MaskFacts {
  const wavesPerM = wavenumberRadPerM / (2 * Math.PI);
  return { apertureOverWavelength: largestDimensionM * wavesPerM, frequencyHz: wavesPerM * SPEED_OF_LIGHT_M_PER_S, peakGainDbi };
}

/** The envelope of a mask for one panel at one frequency, or why it has none. */
export function maskEnvelope(mask: Mask, facts: MaskFacts): MaskEnvelope | NoFigure {
  if (mask.kind === 'custom') return { segments: customSegments(mask.points), rule: EVERY_DIRECTION };
  if (mask.kind === 'formula') return formulaEnvelope(mask);
  const published = publishedMask(mask.id);
  if (!published) return noFigure('mask-unknown', unknownMaskText(mask.id));
  const segments = published.segments(facts);
  if ('reason' in segments) return segments;
  return { segments, rule: published.rule, ...(mask.spilloverDeg === undefined ? {} : { spilloverDeg: mask.spilloverDeg }) };
}

/** What is said of a name that stands in no list: the list. */
export function unknownMaskText(id: string): string {
  return `there is no published envelope "${id}"; known are ${PUBLISHED_MASKS.map((known) => known.id).join(', ')}`;
}

/** Straight lines between the points in degrees and dB; beyond the last point its level holds. */
function customSegments(points: readonly (readonly [number, number])[]): readonly MaskSegment[] {
  const angles = points.map(([angle]) => angle);
  const levels = points.map(([, level]) => level);
  return [{ fromDeg: angles[0], toDeg: 180, levelDb: (offAxisDeg) => linearThrough(angles, levels, offAxisDeg), cornersDeg: angles }];
}

/** A draft may hold a formula that cannot be read: it is not predicted, and nothing is drawn of its mask. */
function formulaEnvelope({ segments }: Extract<Mask, { kind: 'formula' }>): MaskEnvelope | NoFigure {
  const read: MaskSegment[] = [];
  for (const { fromDeg, toDeg, expression } of segments) {
    const formula = maskFormula(expression);
    if (formula.kind === 'fault') return noFigure('mask-formula', `the formula "${expression}" cannot be read: ${formula.detail}`);
    read.push({ fromDeg, toDeg, levelDb: formula.levelDb });
  }
  return { segments: read, rule: EVERY_DIRECTION };
}

/** Level at an angle off the wanted beam; null where the mask is undefined. */
export function maskLevelDb({ segments }: MaskEnvelope, offAxisDeg: number): number | null {
  for (let i = segments.length - 1; i >= 0; i--) {
    const { fromDeg, toDeg, levelDb } = segments[i];
    if (offAxisDeg < fromDeg) continue;
    return offAxisDeg <= toDeg ? levelDb(offAxisDeg) : null;
  }
  return null;
}

/** First angle at which the mask is defined. */
export function maskFirstDeg({ segments }: MaskEnvelope): number {
  return segments[0].fromDeg;
}

/** Steps of a drawn curve: close where published envelopes fall steeply, wide further out. */
const FINE_STEP_DEG = 0.05;
const COARSE_STEP_DEG = 0.5;
const FINE_UP_TO_DEG = 12;
/** A jump is drawn as two points this far apart. */
const JUMP_DEG = 1e-6;

/** The mask as points to draw, rising in angle; corners and jumps stand among them. Gaps between segments are left to the reader of `maskLevelDb`. */
export function maskPoints({ segments }: MaskEnvelope): [offAxisDeg: number, levelDb: number][] {
  return segments.flatMap((segment, i) => {
    const { fromDeg, levelDb, cornersDeg = [] } = segment;
    const last = i === segments.length - 1;
    const toDeg = last ? segment.toDeg : segment.toDeg - JUMP_DEG;
    const angles = [fromDeg, toDeg, ...cornersDeg.filter((angle) => angle > fromDeg && angle < toDeg)];
    if (cornersDeg.length === 0) angles.push(...curveAngles(fromDeg, toDeg));
    return [...new Set(angles)].sort((a, b) => a - b).map((angle): [number, number] => [angle, levelDb(angle)]);
  });
}

function curveAngles(fromDeg: number, toDeg: number): number[] {
  const angles: number[] = [];
  for (let angle = fromDeg; angle < toDeg; angle += angle < FINE_UP_TO_DEG ? FINE_STEP_DEG : COARSE_STEP_DEG) angles.push(angle);
  return angles;
}
