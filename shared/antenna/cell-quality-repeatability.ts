import { degFromRad, wrapRad } from '../units/angles';
import { amplitudeRatioToDb } from '../units/decibels';
import type { RepeatedCurve } from '../model/response-origin';
import { degreesText } from './angle-text';
import { inGHz, inWords, NUMBERS_PER_POINT, pointIndex, termAt } from './cell-quality-subject';
import type { PointedFinding, QualitySubject } from './cell-quality-subject';

/** RMS of the difference against full reflection: taking a cell out and putting it back moves a phase by a degree or two. */
export const REPEATABILITY_WARN = 0.03;
/** Six degrees: more than that between two measurements, and neither tells what the cell does. */
export const REPEATABILITY_FAIL = 0.1;
/** One frequency off by three times as much is a slip even where the whole agrees. */
const MOST_OVER_RMS = 3;
/** Frequencies of one sweep written twice agree to their digits. */
const SAME_FREQUENCY = 1e-9;

/** Whether cells that were measured twice gave the same. Says nothing of families that were not measured. */
export function checkRepeatability(subject: QualitySubject): PointedFinding[] {
  const { edition, repeats } = subject;
  if (repeats.length > 0) return repeats.map((repeat) => compareRepeat(subject, repeat));
  if (edition.description.provenance !== 'measured') return [];
  return [{ check: 'repeatability', verdict: 'not-evaluated', detail: 'No cell was measured twice' }];
}

interface Deviation {
  readonly amplitude: number;
  readonly phaseRad: number;
  /** Index in the repeated curve. */
  readonly index: number;
}

function compareRepeat(subject: QualitySubject, repeat: RepeatedCurve): PointedFinding {
  const { edition } = subject;
  const cellId = edition.cells[repeat.cell].id;
  const where = `${repeat.file} measures ${cellId} at ${inWords(edition, repeat)} again`;
  const deviations = deviationsOf(subject, repeat);
  if (deviations.length === 0) return { check: 'repeatability', verdict: 'not-evaluated', detail: `${where}, but at no frequency of the first measurement`, cellId, file: repeat.file };
  const rms = Math.sqrt(deviations.reduce((sum, { amplitude }) => sum + amplitude * amplitude, 0) / deviations.length);
  const phaseRms = Math.sqrt(deviations.reduce((sum, { phaseRad }) => sum + phaseRad * phaseRad, 0) / deviations.length);
  const most = deviations.reduce((worst, deviation) => (deviation.amplitude > worst.amplitude ? deviation : worst));
  const exceeds = (limit: number): boolean => rms > limit || most.amplitude > MOST_OVER_RMS * limit;
  const inDb = (amplitude: number): string => `${amplitudeRatioToDb(Math.max(amplitude, Number.MIN_VALUE)).toFixed(1)} dB`;
  const detail =
    `${where}: the two differ by ${inDb(rms)} RMS (phase ${degreesText(degFromRad(phaseRms))}) over ${deviations.length} responses, ` +
    `at most ${inDb(most.amplitude)} (phase ${degreesText(degFromRad(Math.abs(most.phaseRad)))}) at ${inGHz(repeat.frequenciesHz[most.index])}`;
  const line = repeat.lines[most.index];
  return {
    check: 'repeatability',
    verdict: exceeds(REPEATABILITY_FAIL) ? 'fail' : exceeds(REPEATABILITY_WARN) ? 'warn' : 'pass',
    detail,
    cellId,
    file: repeat.file,
    ...(line > 0 ? { line } : {}),
    value: amplitudeRatioToDb(Math.max(rms, Number.MIN_VALUE)),
    limit: amplitudeRatioToDb(REPEATABILITY_WARN),
  };
}

/** Differences of every judged term at every frequency that both measurements have. */
function deviationsOf({ edition, judged, terms }: QualitySubject, repeat: RepeatedCurve): Deviation[] {
  const { frequenciesHz } = edition.responses;
  return Array.from(repeat.frequenciesHz, (frequencyHz, index) => ({ index, frequency: frequenciesHz.findIndex((hz) => Math.abs(hz - frequencyHz) <= SAME_FREQUENCY * hz) })).flatMap(({ index, frequency }) => {
    const point = frequency < 0 ? -1 : pointIndex(edition, repeat, frequency);
    if (point < 0 || judged[point] === 0) return [];
    return terms.map((term): Deviation => {
      const first = termAt(edition, point, term.index);
      const at = NUMBERS_PER_POINT * index + 2 * term.index;
      const second = [repeat.values[at], repeat.values[at + 1]];
      return { index, amplitude: Math.hypot(second[0] - first[0], second[1] - first[1]), phaseRad: wrapRad(Math.atan2(second[1], second[0]) - Math.atan2(first[1], first[0])) };
    });
  });
}
