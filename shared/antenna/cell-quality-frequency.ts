import type { QualityVerdict } from '../model/cell-family';
import { degFromRad, wrapRad } from '../units/angles';
import { degreesText } from './angle-text';
import { curvePlaces, inGHz, inWords, pointIndex, termAt } from './cell-quality-subject';
import type { CurvePlace, JudgedTerm, PointedFinding, QualitySubject } from './cell-quality-subject';

/**
 * How far one phase step may stand off its neighbours, at the least. Near a resonance that the grid resolves the steps
 * grow, but not by more than the steepest of their neighbours: there that is the allowance.
 */
export const PHASE_JUMP_ALLOWANCE_DEG = 20;
/** From this share of the allowance up a step is worth a look. */
const PHASE_JUMP_WARN_SHARE = 0.5;
/** The phase of a passive reflection falls across the band; ripple and noise of a clean set move its ends by less than this. */
export const RISING_PHASE_DEG = 1;
/** Below this magnitude (-26 dB) noise decides the phase. */
const WEAKEST_MAGNITUDE = 0.05;
const NEIGHBOUR_STEPS = 2;

interface PhaseStep {
  /** Index of the upper frequency of the step. */
  readonly frequency: number;
  readonly stepRad: number;
}

/** Phase steps between grid neighbours that are both given, judged and strong enough. */
function phaseSteps(subject: QualitySubject, place: CurvePlace, term: JudgedTerm): PhaseStep[] {
  const { edition, judged } = subject;
  const phases = Array.from(edition.responses.frequenciesHz, (_, i) => {
    const point = pointIndex(edition, place, i);
    const [re, im] = termAt(edition, point, term.index);
    return judged[point] === 1 && Math.hypot(re, im) >= WEAKEST_MAGNITUDE ? Math.atan2(im, re) : Number.NaN;
  });
  return phases.flatMap((phase, i) => (i > 0 && Number.isFinite(phase - phases[i - 1]) ? [{ frequency: i, stepRad: wrapRad(phase - phases[i - 1]) }] : []));
}

interface StandOff {
  readonly standOffDeg: number;
  readonly allowanceDeg: number;
}

/** How far a step lies outside the range of its neighbours, and how far it may; null without two neighbours. */
function standOffOf(steps: readonly PhaseStep[], index: number): StandOff | null {
  const near = steps.slice(Math.max(0, index - NEIGHBOUR_STEPS), index + NEIGHBOUR_STEPS + 1);
  const beside = near.filter(({ frequency }) => frequency !== steps[index].frequency && Math.abs(frequency - steps[index].frequency) <= NEIGHBOUR_STEPS);
  if (beside.length < 2) return null;
  const neighbours = beside.map(({ stepRad }) => degFromRad(stepRad));
  // At the end of a run a resonance may go on growing where nothing is given: only one side speaks, so twice as much is allowed.
  const isAtEnd = beside.every(({ frequency }) => frequency < steps[index].frequency) || beside.every(({ frequency }) => frequency > steps[index].frequency);
  const stepDeg = degFromRad(steps[index].stepRad);
  const standOffDeg = Math.max(0, Math.min(...neighbours) - stepDeg, stepDeg - Math.max(...neighbours));
  const allowanceDeg = Math.max(PHASE_JUMP_ALLOWANCE_DEG, ...neighbours.map(Math.abs));
  return { standOffDeg, allowanceDeg: isAtEnd ? 2 * allowanceDeg : allowanceDeg };
}

interface OddStep extends StandOff {
  readonly place: CurvePlace;
  readonly term: JudgedTerm;
  readonly step: PhaseStep;
}

function oddestStep(subject: QualitySubject, cell: number): OddStep | null {
  let oddest: OddStep | null = null;
  let share = -1;
  for (const place of curvePlaces(subject.edition, cell))
    for (const term of subject.terms) {
      const steps = phaseSteps(subject, place, term);
      steps.forEach((step, i) => {
        const found = standOffOf(steps, i);
        if (found === null || found.standOffDeg / found.allowanceDeg <= share) return;
        share = found.standOffDeg / found.allowanceDeg;
        oddest = { ...found, place, term, step };
      });
    }
  return oddest;
}

/** A phase step along frequency that its neighbours deny: a moved cable, two sweeps joined, a wrong sign. */
export function checkPhaseJumps(subject: QualitySubject): PointedFinding[] {
  const { edition } = subject;
  return edition.cells.flatMap((cell, index): PointedFinding[] => {
    const odd = oddestStep(subject, index);
    if (odd === null) return [];
    const { standOffDeg, allowanceDeg, place, term, step } = odd;
    const verdict = standOffDeg > allowanceDeg ? 'fail' : standOffDeg > PHASE_JUMP_WARN_SHARE * allowanceDeg ? 'warn' : 'pass';
    const where = `${inGHz(edition.responses.frequenciesHz[step.frequency])} (${term.name}, ${inWords(edition, place)})`;
    const detail = `Oddest phase step ${degreesText(degFromRad(step.stepRad))} at ${where}: ${degreesText(standOffDeg)} beyond the steps beside it, ${degreesText(allowanceDeg)} allowed`;
    return [{ check: 'phase-jump', verdict, detail, cellId: cell.id, value: standOffDeg, limit: allowanceDeg, point: pointIndex(edition, place, step.frequency) }];
  });
}

/** The phase of a passive cell falls with frequency (Foster's theorem for a lossless reflection); a rising one means the other time convention. */
export function checkPhaseSlope(subject: QualitySubject): PointedFinding[] {
  const { edition, terms } = subject;
  let curves = 0;
  let rising = 0;
  const findings = edition.cells.flatMap((cell, index): PointedFinding[] => {
    let highest = { changeDeg: Number.NEGATIVE_INFINITY, text: '', point: 0 };
    for (const place of curvePlaces(edition, index))
      for (const term of terms) {
        const steps = phaseSteps(subject, place, term);
        if (steps.length < NEIGHBOUR_STEPS) continue;
        const changeDeg = degFromRad(steps.reduce((sum, { stepRad }) => sum + stepRad, 0));
        curves += 1;
        if (changeDeg > RISING_PHASE_DEG) rising += 1;
        if (changeDeg > highest.changeDeg) highest = { changeDeg, text: `${term.name}, ${inWords(edition, place)}`, point: pointIndex(edition, place, 0) };
      }
    if (highest.text === '') return [];
    const verdict: QualityVerdict = highest.changeDeg > RISING_PHASE_DEG ? 'fail' : 'pass';
    const detail = `The phase changes by at most ${degreesText(highest.changeDeg)} across the given band (${highest.text}); it must fall`;
    return [{ check: 'phase-slope', verdict, detail, cellId: cell.id, value: highest.changeDeg, limit: RISING_PHASE_DEG, point: highest.point, isWholeCurve: true }];
  });
  return [...findings, familySlope(curves, rising, subject)];
}

function familySlope(curves: number, rising: number, { edition }: QualitySubject): PointedFinding {
  if (curves === 0) return { check: 'phase-slope', verdict: 'not-evaluated', detail: 'No curve has enough points for a slope' };
  const suspects = 2 * rising > curves ? `: the time convention ${edition.description.timeConvention} is probably the other one` : '';
  return { check: 'phase-slope', verdict: rising === 0 ? 'pass' : 'fail', detail: `The phase rises with frequency on ${rising} of ${curves} curves${suspects}`, value: rising, limit: 0 };
}
