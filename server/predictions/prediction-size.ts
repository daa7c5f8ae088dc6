import { cellCountUpperBound } from '../../shared/antenna/cell-count';
import { CELL_ARRAY_NAMES, CUT_ARRAY_NAMES } from '../../shared/contracts/predictions';
import { MAX_CELL_COUNT } from '../../shared/model/design-document';
import { cutSampleCount } from '../engine/prediction-cost';
import type { PredictionWish } from './prediction-service';

/** All cuts of a request together; an exact cut costs memory for five numbers per sample. */
export const MAX_CUT_SAMPLES = 200_000;

/** Numbers in the arrays of the answer, at most. */
export function arrayNumberBound({ design, cells, cuts = [], uvSize = 0 }: PredictionWish): number {
  const cellNumbers = cells === true ? Math.min(MAX_CELL_COUNT, cellCountUpperBound(design.panel)) * CELL_ARRAY_NAMES.length : 0;
  // The vector model answers the cross-polar field beside the co-polar one.
  const fields = design.prediction.model === 'vector' ? 2 : 1;
  return cellNumbers + cutSamples(cuts) * (CUT_ARRAY_NAMES.length + fields - 1) + fields * uvSize * uvSize;
}

export const cutSamples = (cuts: NonNullable<PredictionWish['cuts']>): number => cuts.reduce((sum, cut) => sum + cutSampleCount(cut), 0);
