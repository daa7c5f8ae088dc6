import { curvePlaces, inGHz, inWords, pointIndex, termAt } from './cell-quality-subject';
import type { PointedFinding, QualitySubject } from './cell-quality-subject';

/** Differences of S21 and S12, as amplitude: -40 dB is within measurement, -20 dB is not. */
export const RECIPROCITY_WARN = 0.01;
export const RECIPROCITY_FAIL = 0.1;

/** A cell without magnetised or active material answers alike both ways: S21 = S12. */
export function checkReciprocity(subject: QualitySubject): PointedFinding[] {
  const { edition, judged } = subject;
  const isTwoPort = subject.hasTwoModes || edition.description.operation === 'transmit';
  if (!isTwoPort) return [{ check: 'reciprocity', verdict: 'not-evaluated', detail: 'A one-port has no second direction' }];
  return edition.cells.flatMap((cell, index) => {
    let worst = { difference: -1, text: '', point: 0 };
    let sum = 0;
    for (const place of curvePlaces(edition, index))
      edition.responses.frequenciesHz.forEach((frequencyHz, i) => {
        const point = pointIndex(edition, place, i);
        if (judged[point] === 0) return;
        const [forward, backward] = [termAt(edition, point, 1), termAt(edition, point, 2)];
        const difference = Math.hypot(forward[0] - backward[0], forward[1] - backward[1]);
        sum = Math.max(sum, Math.hypot(forward[0] + backward[0], forward[1] + backward[1]));
        if (difference > worst.difference) worst = { difference, text: `${inGHz(frequencyHz)}, ${inWords(edition, place)}`, point };
      });
    if (worst.difference < 0) return [];
    const verdict = worst.difference > RECIPROCITY_FAIL ? 'fail' : worst.difference > RECIPROCITY_WARN ? 'warn' : 'pass';
    const turned = verdict !== 'pass' && sum < RECIPROCITY_WARN ? '; they are equal with opposite sign, so one axis is turned round' : '';
    return [{ check: 'reciprocity', verdict, detail: `S21 and S12 differ by at most ${worst.difference.toExponential(1)} (${worst.text})${turned}`, cellId: cell.id, value: worst.difference, limit: RECIPROCITY_WARN, point: worst.point }];
  });
}
