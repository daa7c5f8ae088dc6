import type { BlockArray } from '../../../shared/contracts/binary-block';
import { CELL_ARRAY_NAMES, CUT_ARRAY_NAMES } from '../../../shared/contracts/predictions';
import type { PredictionHead } from '../../../shared/contracts/predictions';
import type { DesignDocument } from '../../../shared/model/design-document';
import type { LivePrediction, PredictedCells, PredictedCut, PredictedUv } from './live-prediction-data';

/** A reply of the prediction call in its binary form. */
export interface PredictionBlock {
  readonly head: PredictionHead;
  readonly arrays: Readonly<Record<string, BlockArray>>;
}

/** Sorts the arrays of a reply by what they are of. Throws when the head announces an array that did not come. */
export function unpackPrediction({ head, arrays }: PredictionBlock, of: DesignDocument): LivePrediction {
  return { head, of, cells: cellsOf(head, arrays), cuts: cutsOf(head, arrays), uv: uvOf(head, arrays) };
}

type Arrays = PredictionBlock['arrays'];

function arrayNamed(arrays: Arrays, name: string): BlockArray {
  if (!(name in arrays)) throw new Error(`the prediction lacks its array ${name}`);
  return arrays[name];
}

function cellsOf(head: PredictionHead, arrays: Arrays): PredictedCells {
  const asked = head.cellCount !== undefined;
  const entries = CELL_ARRAY_NAMES.map((name) => [name, asked ? arrayNamed(arrays, `cells.${name}`) : new Float32Array(0)] as const);
  return Object.fromEntries(entries) as PredictedCells;
}

function cutsOf(head: PredictionHead, arrays: Arrays): readonly PredictedCut[] {
  return (head.cuts ?? []).map(({ request }, place) => {
    const entries = CUT_ARRAY_NAMES.map((name) => [name, arrayNamed(arrays, `cuts.${place}.${name}`)] as const);
    const cross = arrays[`cuts.${place}.crossGainDbi`];
    return { request, ...(Object.fromEntries(entries) as Omit<PredictedCut, 'request'>), ...(cross ? { crossGainDbi: cross } : {}) };
  });
}

function uvOf(head: PredictionHead, arrays: Arrays): PredictedUv | null {
  if (!head.uv) return null;
  const cross = arrays['uv.crossGainDbi'];
  return { ...head.uv, gainDbi: singles(arrayNamed(arrays, 'uv.gainDbi')), ...(cross ? { crossGainDbi: singles(cross) } : {}) };
}

function singles(values: BlockArray): Float32Array {
  return values instanceof Float32Array ? values : Float32Array.from(values);
}
