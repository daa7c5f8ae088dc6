import type { LivePrediction } from '../live-prediction-data';

/** Tells the positions that carry no cell because none of the edition may stand there. Ideal phases have no cells, and none is missing. */
export function emptyPlaces({ cells, of }: LivePrediction): (place: number) => boolean {
  if (of.cells.kind !== 'edition') return () => false;
  return (place) => cells.cellIndex[place] < 0;
}

export function countEmpty(prediction: LivePrediction): number {
  const isEmpty = emptyPlaces(prediction);
  let count = 0;
  for (let i = 0; i < prediction.cells.cellIndex.length; i++) if (isEmpty(i)) count++;
  return count;
}

/** The values of the places that carry a cell; NaN at the others. */
export function withoutEmpty(prediction: LivePrediction, values: ArrayLike<number>): ArrayLike<number> {
  if (countEmpty(prediction) === 0) return values;
  const isEmpty = emptyPlaces(prediction);
  return Float64Array.from(values, (value, i) => (isEmpty(i) ? Number.NaN : value));
}
