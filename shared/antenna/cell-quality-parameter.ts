import { median } from '../math/statistics';
import { unwrapPhasesRad } from '../math/unwrap-phase';
import type { QualityFinding, QualityVerdict } from '../model/cell-family';
import { degFromRad, positiveDeg, wrapRad } from '../units/angles';
import { degreesText } from './angle-text';
import { inGHz, inWords, pointIndex, termAt } from './cell-quality-subject';
import type { JudgedTerm, PointedFinding, QualitySubject } from './cell-quality-subject';

/** A reflecting panel wants a turn; with 300 degrees the worst phase error of a cell is 30. */
export const PHASE_RANGE_WARN_DEG = 300;
export const PHASE_RANGE_FAIL_DEG = 180;
export const LARGEST_GAP_WARN_DEG = 60;
export const LARGEST_GAP_FAIL_DEG = 180;
/** A cell between its neighbours in size has a phase between theirs; drift of a careful laboratory stays below this. */
export const OUTLIER_WARN_DEG = 10;
export const OUTLIER_FAIL_DEG = 30;

/** Cells that differ in one parameter only, in its order. */
export function parameterLines({ edition }: QualitySubject, parameter: number): number[][] {
  const lines = new Map<string, number[]>();
  edition.cells.forEach(({ parametersMm }, cell) => {
    const key = parametersMm.filter((_, i) => i !== parameter).join(' ');
    lines.set(key, [...(lines.get(key) ?? []), cell]);
  });
  const value = (cell: number) => edition.cells[cell].parametersMm[parameter] ?? 0;
  return [...lines.values()].map((cells) => cells.sort((a, b) => value(a) - value(b)));
}

/** One term at one incidence: what is compared across the cells. */
interface JudgedView {
  readonly theta: number;
  readonly phi: number;
  readonly term: JudgedTerm;
}

function judgedViews({ edition, terms }: QualitySubject): JudgedView[] {
  const { thetasRad, phisRad } = edition.responses;
  return Array.from(thetasRad, (_, theta) => Array.from(phisRad, (_, phi) => terms.map((term) => ({ theta, phi, term })))).flat(2);
}

/** Wrapped phases of cells in one view; cells without a judged point are left out. */
function phasesOf(subject: QualitySubject, cells: readonly number[], view: JudgedView, frequency: number) {
  const { edition, judged } = subject;
  return cells.flatMap((cell) => {
    const point = pointIndex(edition, { cell, theta: view.theta, phi: view.phi }, frequency);
    if (judged[point] === 0) return [];
    const [re, im] = termAt(edition, point, view.term.index);
    return [{ cell, phaseRad: Math.atan2(im, re) }];
  });
}

interface PhaseReach {
  readonly rangeDeg: number;
  readonly gapDeg: number;
  readonly text: string;
}

/** What the cells reach in one view: the widest run along one parameter, and the widest hole on the circle. */
function phaseReach(subject: QualitySubject, view: JudgedView, frequency: number): PhaseReach | null {
  const allCells = subject.edition.cells.map((_, cell) => cell);
  const phases = phasesOf(subject, allCells, view, frequency);
  if (phases.length === 0) return null;
  const lines = subject.edition.description.parameters.flatMap((_, parameter) => parameterLines(subject, parameter));
  return {
    rangeDeg: Math.max(...lines.map((cells) => unwrappedRangeDeg(phasesOf(subject, cells, view, frequency).map(({ phaseRad }) => phaseRad)))),
    gapDeg: largestGapDeg(phases.map(({ phaseRad }) => degFromRad(phaseRad))),
    text: `${view.term.name}, ${inWords(subject.edition, view)}, ${phases.length} of ${allCells.length} cells`,
  };
}

/** Phase range along a parameter and largest gap of the wrapped phases, both at the design frequency, over every incidence. */
export function checkPhaseRange(subject: QualitySubject): QualityFinding[] {
  const { designIndex } = subject;
  const reaches = designIndex === null ? [] : judgedViews(subject).flatMap((view) => phaseReach(subject, view, designIndex) ?? []);
  if (designIndex === null || reaches.length === 0)
    return ['phase-range', 'largest-gap'].map((check) => ({ check, verdict: 'not-evaluated', detail: 'No cell is given at the design frequency' }));
  const at = inGHz(subject.edition.responses.frequenciesHz[designIndex]);
  const [first] = reaches;
  const least = reaches.reduce((a, b) => (b.rangeDeg < a.rangeDeg ? b : a));
  const widest = reaches.reduce((a, b) => (b.gapDeg > a.gapDeg ? b : a));
  return [
    {
      check: 'phase-range',
      verdict: least.rangeDeg < PHASE_RANGE_FAIL_DEG ? 'fail' : least.rangeDeg < PHASE_RANGE_WARN_DEG ? 'warn' : 'pass',
      detail: `Phase range ${degreesText(first.rangeDeg)} at ${at} (${first.text}); least ${degreesText(least.rangeDeg)} (${least.text})`,
      value: least.rangeDeg,
      limit: PHASE_RANGE_WARN_DEG,
    },
    {
      check: 'largest-gap',
      verdict: widest.gapDeg > LARGEST_GAP_FAIL_DEG ? 'fail' : widest.gapDeg > LARGEST_GAP_WARN_DEG ? 'warn' : 'pass',
      detail: `Largest gap between phases ${degreesText(first.gapDeg)} at ${at} (${first.text}); widest ${degreesText(widest.gapDeg)} (${widest.text})`,
      value: widest.gapDeg,
      limit: LARGEST_GAP_WARN_DEG,
    },
  ];
}

function unwrappedRangeDeg(phasesRad: readonly number[]): number {
  if (phasesRad.length === 0) return 0;
  const unwrapped = unwrapPhasesRad(phasesRad);
  return degFromRad(Math.max(...unwrapped) - Math.min(...unwrapped));
}

/** The widest stretch of the circle without a phase; a full turn for a single one. */
export function largestGapDeg(phasesDeg: readonly number[]): number {
  const sorted = phasesDeg.map(positiveDeg).sort((a, b) => a - b);
  return sorted.reduce((widest, phase, i) => Math.max(widest, (i + 1 < sorted.length ? sorted[i + 1] : sorted[0] + 360) - phase), 0);
}

/**
 * Cells whose phase lies outside that of their neighbours in size over most of the band: a file that belongs to another cell, a
 * reference plane of its own. The middle value over the band counts, since near a resonance the sizes may be too coarse to compare.
 */
export function checkOutliers(subject: QualitySubject): PointedFinding[] {
  const { edition } = subject;
  const worst = edition.cells.map((): WorstOutside => ({ deg: -1, text: '', point: 0 }));
  edition.description.parameters.forEach((_, parameter) => {
    for (const cells of parameterLines(subject, parameter)) for (const view of judgedViews(subject)) judgeLine(subject, cells, view, worst);
  });
  return edition.cells.map((cell, index): PointedFinding => {
    const { deg, text, point } = worst[index];
    if (deg < 0) return { check: 'outlier', verdict: 'not-evaluated', detail: 'The cell has no neighbours on both sides in any parameter', cellId: cell.id };
    const verdict: QualityVerdict = deg > OUTLIER_FAIL_DEG ? 'fail' : deg > OUTLIER_WARN_DEG ? 'warn' : 'pass';
    const detail = deg === 0 ? 'Its phases lie between those of the neighbours in size' : `Over the band its phase lies ${degreesText(deg)} outside those of the neighbours in size (${text})`;
    return { check: 'outlier', verdict, detail, cellId: cell.id, value: deg, limit: OUTLIER_FAIL_DEG, point, isWholeCurve: true };
  });
}

/** How far a cell lies outside its neighbours, in which view, and a point of that curve. */
interface WorstOutside {
  readonly deg: number;
  readonly text: string;
  readonly point: number;
}

function judgeLine(subject: QualitySubject, cells: readonly number[], view: JudgedView, worst: WorstOutside[]): void {
  const outsideOf = new Map<number, number[]>();
  subject.edition.responses.frequenciesHz.forEach((_, frequency) => {
    const phases = phasesOf(subject, cells, view, frequency);
    const phasesRad = phases.map(({ phaseRad }) => phaseRad);
    phases.forEach(({ cell }, i) => {
      const outsideRad = outsideNeighboursRad(phasesRad, i);
      if (outsideRad >= 0) outsideOf.set(cell, [...(outsideOf.get(cell) ?? []), outsideRad]);
    });
  });
  for (const [cell, outsideRad] of outsideOf) {
    const deg = degFromRad(median(outsideRad));
    if (deg > worst[cell].deg) worst[cell] = { deg, text: `${view.term.name}, ${inWords(subject.edition, view)}`, point: pointIndex(subject.edition, { ...view, cell }, 0) };
  }
}

/**
 * How far a phase lies outside its neighbours'. Each pair of neighbours one or two places away is asked and the kindest answer
 * counts, so that one bad cell does not make its good neighbours look bad. -1 at the ends of the line.
 */
export function outsideNeighboursRad(phasesRad: readonly number[], index: number): number {
  let kindest = Number.POSITIVE_INFINITY;
  for (const [below, above] of [[1, 1], [2, 1], [1, 2]]) {
    if (index - below < 0 || index + above >= phasesRad.length) continue;
    const toBelow = wrapRad(phasesRad[index - below] - phasesRad[index]);
    const toAbove = wrapRad(phasesRad[index + above] - phasesRad[index]);
    const isBetween = toBelow * toAbove <= 0;
    kindest = Math.min(kindest, isBetween ? 0 : Math.min(Math.abs(toBelow), Math.abs(toAbove)));
  }
  return Number.isFinite(kindest) ? kindest : -1;
}
