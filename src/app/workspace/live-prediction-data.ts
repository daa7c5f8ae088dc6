import type { BlockArray } from '../../../shared/contracts/binary-block';
import type { CELL_ARRAY_NAMES, CutRequest, PredictionHead } from '../../../shared/contracts/predictions';
import type { DesignDocument } from '../../../shared/model/design-document';

export type CellArrayName = (typeof CELL_ARRAY_NAMES)[number];

/** One value per cell, in the order of the design document. */
export type PredictedCells = Readonly<Record<CellArrayName, BlockArray>>;

export interface PredictedCut {
  readonly request: CutRequest;
  readonly angleDeg: BlockArray;
  readonly thetaDeg: BlockArray;
  readonly phiDeg: BlockArray;
  readonly directivityDbi: BlockArray;
  readonly gainDbi: BlockArray;
  /** Of the cross-polar field; the vector model alone has one. */
  readonly crossGainDbi?: BlockArray;
}

/** Row by row from v = -1 to 1, within a row from u = -1 to 1. */
export interface PredictedUv {
  readonly size: number;
  readonly floorDbi: number;
  readonly gainDbi: Float32Array;
  readonly crossGainDbi?: Float32Array;
}

/** What one answer of the prediction call holds, and the design it is of. */
export interface LivePrediction {
  readonly head: PredictionHead;
  readonly cells: PredictedCells;
  readonly cuts: readonly PredictedCut[];
  readonly uv: PredictedUv | null;
  readonly of: DesignDocument;
}
