import type { LivePrediction } from '../live-prediction-data';
import { emptyPlaces } from './empty-places';

/** The cells of largest phase error, largest first; of equal errors the brighter cell first. */
export function worstCells(prediction: LivePrediction, count: number): readonly number[] {
  const { errorDeg, amplitude } = prediction.cells;
  const isEmpty = emptyPlaces(prediction);
  const worse = (one: number, other: number): number => Math.abs(errorDeg[other]) - Math.abs(errorDeg[one]) || amplitude[other] - amplitude[one];
  // One pass that keeps a short sorted list: a panel may have a million cells.
  const worst: number[] = [];
  for (let i = 0; i < errorDeg.length; i++) {
    if (isEmpty(i) || (worst.length === count && worse(worst[count - 1], i) <= 0)) continue;
    let at = worst.length;
    while (at > 0 && worse(worst[at - 1], i) > 0) at--;
    worst.splice(at, 0, i);
    if (worst.length > count) worst.pop();
  }
  return worst;
}

/** The brightest cell that fulfils a condition, or -1. */
export function brightestCell({ cells }: LivePrediction, holds: (cell: number) => boolean): number {
  let found = -1;
  for (let i = 0; i < cells.amplitude.length; i++) {
    if (holds(i) && (found < 0 || cells.amplitude[i] > cells.amplitude[found])) found = i;
  }
  return found;
}
