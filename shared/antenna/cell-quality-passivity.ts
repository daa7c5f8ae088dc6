import { amplitudeRatioToDb } from '../units/decibels';
import { curvePlaces, inGHz, inWords, NUMBERS_PER_POINT, pointIndex } from './cell-quality-subject';
import type { PointedFinding, QualitySubject } from './cell-quality-subject';

/** A calibration drifts by about a tenth of a decibel; more than that above 1 is a fault. */
export const PASSIVITY_LIMIT_DB = 0.1;
/** Above 1 by less than the digits that files print. */
const PRINTED_DIGITS_DB = 1e-5;

/** A cell without a source cannot return more power than comes in: no singular value of S exceeds 1. */
export function checkPassivity(subject: QualitySubject): PointedFinding[] {
  const { edition, judged } = subject;
  return edition.cells.flatMap((cell, index) => {
    let worst = { singular: -1, text: '', point: 0 };
    let above = 0;
    let points = 0;
    for (const place of curvePlaces(edition, index))
      edition.responses.frequenciesHz.forEach((frequencyHz, i) => {
        const point = pointIndex(edition, place, i);
        if (judged[point] === 0) return;
        points += 1;
        const singular = largestSingularValue(edition.responses.values, point * NUMBERS_PER_POINT);
        if (amplitudeRatioToDb(singular) > PRINTED_DIGITS_DB) above += 1;
        if (singular > worst.singular) worst = { singular, text: `${inGHz(frequencyHz)}, ${inWords(edition, place)}`, point };
      });
    if (points === 0) return [];
    const db = amplitudeRatioToDb(worst.singular);
    const verdict = db > PASSIVITY_LIMIT_DB ? 'fail' : db > PRINTED_DIGITS_DB ? 'warn' : 'pass';
    const detail = `Largest singular value of S ${worst.singular.toFixed(4)} (${db.toFixed(2)} dB) at ${worst.text}; above 1 at ${above} of ${points} points`;
    return [{ check: 'passivity', verdict, detail, cellId: cell.id, value: db, limit: PASSIVITY_LIMIT_DB, point: worst.point }];
  });
}

/**
 * The larger singular value of [[S11, S12], [S21, S22]] from re, im pairs in the order S11, S21, S12, S22 starting at `at`:
 * sigma^2 = (T + sqrt(T^2 - 4 |det|^2)) / 2 with T the sum of squares (G. H. Golub, C. F. Van Loan, Matrix Computations; from memory).
 */
export function largestSingularValue(values: Float64Array, at: number): number {
  let sum = 0;
  for (let i = 0; i < NUMBERS_PER_POINT; i++) sum += values[at + i] ** 2;
  const [aRe, aIm, cRe, cIm, bRe, bIm, dRe, dIm] = values.subarray(at, at + NUMBERS_PER_POINT);
  const determinantRe = aRe * dRe - aIm * dIm - (bRe * cRe - bIm * cIm);
  const determinantIm = aRe * dIm + aIm * dRe - (bRe * cIm + bIm * cRe);
  const root = Math.sqrt(Math.max(0, sum * sum - 4 * (determinantRe ** 2 + determinantIm ** 2)));
  return Math.sqrt((sum + root) / 2);
}
