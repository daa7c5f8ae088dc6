import type { CellEdition, FamilyDescription, QualityFinding } from '../model/cell-family';
import type { RepeatedCurve } from '../model/response-origin';
import { degFromRad } from '../units/angles';

/** The terms whose phase a panel uses, with the number of the term in S11, S21, S12, S22. */
export interface JudgedTerm {
  readonly index: 0 | 1 | 3;
  readonly name: string;
}

/** One curve over frequency: a cell at one incidence. */
export interface CurvePlace {
  readonly cell: number;
  readonly theta: number;
  readonly phi: number;
}

/** An edition made ready for the checks: what is given, what is excluded, which terms count. */
export interface QualitySubject {
  readonly edition: CellEdition;
  /** 1 where a point is given and lies in no excluded region. */
  readonly judged: Uint8Array;
  /** 1 where a point lies in an excluded region, given or not. */
  readonly excluded: Uint8Array;
  readonly terms: readonly JudgedTerm[];
  readonly hasTwoModes: boolean;
  /** Grid frequency nearest to the design frequency; null when the band does not hold it. */
  readonly designIndex: number | null;
  /** Cells measured again. */
  readonly repeats: readonly RepeatedCurve[];
}

/** A finding with the place in the table that it speaks of: a point, or any point of a curve as a whole. */
export interface PointedFinding extends QualityFinding {
  readonly point?: number;
  readonly isWholeCurve?: true;
}

/** A check looks at the whole edition; findings with a `cellId` go to that cell. */
export type QualityCheck = (subject: QualitySubject) => readonly PointedFinding[];

export const NUMBERS_PER_POINT = 8;
/** Angles and lengths come from decimals in files; this is far below any real step and above their rounding. */
const SAME = 1e-6;

export function prepareSubject(edition: CellEdition, repeats: readonly RepeatedCurve[] = []): QualitySubject {
  const excluded = excludedPoints(edition);
  const judged = edition.responses.present.map((flag, i) => (flag === 1 && excluded[i] === 0 ? 1 : 0));
  const { ports, operation } = edition.description;
  const hasTwoModes = ports === 'x-and-y' || ports === 'te-and-tm';
  return { edition, judged, excluded, repeats, hasTwoModes, terms: judgedTerms(ports, operation), designIndex: designIndex(edition) };
}

function judgedTerms(ports: FamilyDescription['ports'], operation: FamilyDescription['operation']): readonly JudgedTerm[] {
  if (ports === 'x-and-y') return [{ index: 0, name: 'S11 (x)' }, { index: 3, name: 'S22 (y)' }];
  if (ports === 'te-and-tm') return [{ index: 0, name: 'S11 (TE)' }, { index: 3, name: 'S22 (TM)' }];
  return operation === 'transmit' ? [{ index: 1, name: 'S21' }] : [{ index: 0, name: 'S11' }];
}

function designIndex({ description, responses }: CellEdition): number | null {
  const { frequenciesHz } = responses;
  const designHz = description.designFrequencyGHz * 1e9;
  const last = frequenciesHz.length - 1;
  if (last < 0 || designHz < frequenciesHz[0] * (1 - SAME) || designHz > frequenciesHz[last] * (1 + SAME)) return null;
  let nearest = 0;
  for (let i = 1; i <= last; i++) if (Math.abs(frequenciesHz[i] - designHz) < Math.abs(frequenciesHz[nearest] - designHz)) nearest = i;
  return nearest;
}

/** Number of the point [cell][theta][phi][frequency]. */
export function pointIndex({ responses }: CellEdition, place: CurvePlace, frequency: number): number {
  const { thetasRad, phisRad, frequenciesHz } = responses;
  return ((place.cell * thetasRad.length + place.theta) * phisRad.length + place.phi) * frequenciesHz.length + frequency;
}

/** Every [theta][phi] of one cell, or of all cells. */
export function curvePlaces({ responses, cells }: CellEdition, cell?: number): CurvePlace[] {
  const places: CurvePlace[] = [];
  const [first, end] = cell === undefined ? [0, cells.length] : [cell, cell + 1];
  for (let c = first; c < end; c++)
    for (let theta = 0; theta < responses.thetasRad.length; theta++)
      for (let phi = 0; phi < responses.phisRad.length; phi++) places.push({ cell: c, theta, phi });
  return places;
}

/** The real and imaginary part of one term at one point. */
export function termAt({ responses }: CellEdition, point: number, term: number): readonly [re: number, im: number] {
  const at = point * NUMBERS_PER_POINT + 2 * term;
  return [responses.values[at], responses.values[at + 1]];
}

/** A frequency for a sentence: five digits are finer than any grid of the library. */
export function inGHz(frequencyHz: number): string {
  return `${Number((frequencyHz / 1e9).toPrecision(5))} GHz`;
}

/** An incidence for a sentence. */
export function inWords({ responses }: CellEdition, place: { readonly theta: number; readonly phi: number }): string {
  const [theta, phi] = [responses.thetasRad[place.theta], responses.phisRad[place.phi]].map((rad) => Number(degFromRad(rad).toFixed(2)));
  return `θ ${theta}°, φ ${phi}°`;
}

function excludedPoints(edition: CellEdition): Uint8Array {
  const excluded = new Uint8Array(edition.responses.present.length);
  for (const region of edition.description.excludedRegions) markRegion(edition, region, excluded);
  return excluded;
}

type ExcludedRegion = FamilyDescription['excludedRegions'][number];

/** Marks the points of one region and returns their number. */
export function markRegion(edition: CellEdition, region: ExcludedRegion, mark: Uint8Array): number {
  const { thetasRad, phisRad, frequenciesHz } = edition.responses;
  let count = 0;
  for (const place of curvePlaces(edition)) {
    const parameterMm = edition.cells[place.cell].parametersMm[0] ?? 0;
    const isInside =
      isWithin(degFromRad(thetasRad[place.theta]), region.fromThetaDeg, region.toThetaDeg) &&
      isWithin(parameterMm, region.fromParameterMm, undefined) &&
      (region.phisDeg === undefined || region.phisDeg.some((phiDeg) => Math.abs(phiDeg - degFromRad(phisRad[place.phi])) < SAME));
    if (!isInside) continue;
    frequenciesHz.forEach((frequencyHz, i) => {
      if (!isWithin(frequencyHz / 1e9, region.fromGHz, region.toGHz)) return;
      mark[pointIndex(edition, place, i)] = 1;
      count += 1;
    });
  }
  return count;
}

function isWithin(value: number, from: number | undefined, to: number | undefined): boolean {
  return value >= (from ?? Number.NEGATIVE_INFINITY) - SAME && value <= (to ?? Number.POSITIVE_INFINITY) + SAME;
}
