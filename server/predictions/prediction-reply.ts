import type { Prediction } from '../../shared/antenna/predict-design';
import { writeBinaryBlock, type BlockArray, type BlockArrays } from '../../shared/contracts/binary-block';
import { CELL_ARRAY_NAMES, CUT_ARRAY_NAMES, type CutRequest, type PredictionHead, type PredictionReply } from '../../shared/contracts/predictions';
import { ENGINE_VERSION } from '../engine/engine-version';

type Numbers = { readonly [index: number]: number; readonly length: number };

function plainArrays<Name extends string>(names: readonly Name[], holder: Readonly<Record<Name, Numbers>>): Record<Name, number[]> {
  return Object.fromEntries(names.map((name) => [name, Array.from(holder[name])])) as Record<Name, number[]>;
}

const requestOf = (request: NonNullable<Prediction['cuts']>[number]['request']): CutRequest =>
  'plane' in request ? { plane: request.plane, angleDeg: [...request.angleDeg] } : { phiDeg: request.phiDeg, thetaDeg: [...request.thetaDeg] };

/** The prediction as JSON. */
export function predictionReplyOf({ figures, verdicts, warnings, cells, cuts, uv }: Prediction): PredictionReply {
  return {
    engineVersion: ENGINE_VERSION,
    figures,
    verdicts,
    warnings,
    ...(cells === undefined ? {} : { cells: plainArrays(CELL_ARRAY_NAMES, cells) }),
    ...(cuts === undefined ? {} : { cuts: cuts.map((cut) => ({ request: requestOf(cut.request), ...plainArrays(CUT_ARRAY_NAMES, cut), ...plainCross(cut) })) }),
    ...(uv === undefined ? {} : { uv: { size: uv.size, floorDbi: uv.floorDbi, gainDbi: Array.from(uv.gainDbi), ...plainCross(uv) } }),
  };
}

/** The same numbers as a binary block. */
export function predictionBlockOf({ figures, verdicts, warnings, cells, cuts, uv }: Prediction): Uint8Array {
  const head: PredictionHead = {
    engineVersion: ENGINE_VERSION,
    figures,
    verdicts,
    warnings,
    ...(cells === undefined ? {} : { cellCount: cells.xMm.length }),
    ...(cuts === undefined ? {} : { cuts: cuts.map(({ request }) => ({ request: requestOf(request) })) }),
    ...(uv === undefined ? {} : { uv: { size: uv.size, floorDbi: uv.floorDbi } }),
  };
  return writeBinaryBlock(head, {
    ...(cells === undefined ? {} : namedArrays('cells', CELL_ARRAY_NAMES, cells)),
    ...Object.assign({}, ...(cuts ?? []).map((cut, i) => ({ ...namedArrays(`cuts.${i}`, CUT_ARRAY_NAMES, cut), ...namedCross(`cuts.${i}`, cut) }))),
    ...(uv === undefined ? {} : { 'uv.gainDbi': uv.gainDbi, ...namedCross('uv', uv) }),
  });
}

function namedArrays<Name extends string>(prefix: string, names: readonly Name[], holder: Readonly<Record<Name, BlockArray>>): BlockArrays {
  return Object.fromEntries(names.map((name) => [`${prefix}.${name}`, holder[name]]));
}

/** Only the vector model has a cross-polar field. */
function plainCross({ crossGainDbi }: { readonly crossGainDbi?: Numbers }): { crossGainDbi?: number[] } {
  return crossGainDbi === undefined ? {} : { crossGainDbi: Array.from(crossGainDbi) };
}

function namedCross(prefix: string, { crossGainDbi }: { readonly crossGainDbi?: BlockArray }): BlockArrays {
  return crossGainDbi === undefined ? {} : { [`${prefix}.crossGainDbi`]: crossGainDbi };
}
