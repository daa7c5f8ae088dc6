import type { LivePrediction } from '../live-prediction-data';
import { emptyPlaces } from './empty-places';

/** Of the phase error over selected cells, each counted once. */
export interface SelectionStatistics {
  readonly count: number;
  readonly rmsDeg: number;
  readonly meanDeg: number;
  /** The largest error by size, with its sign, and where it is. */
  readonly largestDeg: number;
  readonly largestAt: number;
}

/** Null where no cell is selected: no cells have no mean. Places without a cell do not count. */
export function selectionStatistics(prediction: LivePrediction, places: ArrayLike<number>): SelectionStatistics | null {
  const { cells } = prediction;
  const isEmpty = emptyPlaces(prediction);
  const selected = Array.from(places).filter((place) => !isEmpty(place));
  if (selected.length === 0) return null;
  let [sum, squares, largestAt] = [0, 0, selected[0]];
  for (let i = 0; i < selected.length; i++) {
    const error = cells.errorDeg[selected[i]];
    sum += error;
    squares += error * error;
    if (Math.abs(error) > Math.abs(cells.errorDeg[largestAt])) largestAt = selected[i];
  }
  return {
    count: selected.length,
    rmsDeg: Math.sqrt(squares / selected.length),
    meanDeg: sum / selected.length,
    largestDeg: cells.errorDeg[largestAt],
    largestAt,
  };
}
