import type { LivePrediction } from '../live-prediction-data';

/** Of the phase error over selected cells, each counted once. */
export interface SelectionStatistics {
  readonly count: number;
  readonly rmsDeg: number;
  readonly meanDeg: number;
  /** The largest error by size, with its sign, and where it is. */
  readonly largestDeg: number;
  readonly largestAt: number;
}

/** Null of an empty selection: no cells have no mean. */
export function selectionStatistics({ cells }: LivePrediction, selected: ArrayLike<number>): SelectionStatistics | null {
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
