import { predictDesign } from '../../../shared/antenna/predict-design';
import type { PreparedEdition } from '../../../shared/antenna/prepare-edition';
import { CELL_ARRAY_NAMES } from '../../../shared/contracts/predictions';
import type { CutRequest } from '../../../shared/contracts/predictions';
import type { DesignDocument } from '../../../shared/model/design-document';
import type { LivePrediction, PredictedCells } from './live-prediction-data';

const BEAM_CUTS: readonly CutRequest[] = [
  { plane: 'along', angleDeg: [-90, 90, 0.2] },
  { plane: 'across', angleDeg: [-90, 90, 0.2] },
];

/** A prediction as the sheets get it, worked out by the engine itself; for specs, which have no server. */
export function computedPrediction(design: DesignDocument, options: { readonly edition?: PreparedEdition; readonly cuts?: readonly CutRequest[]; readonly uvSize?: number } = {}): LivePrediction {
  const { edition, cuts = [], uvSize = 0 } = options;
  const include = { cells: true, cuts: [...BEAM_CUTS, ...cuts], ...(uvSize > 0 ? { uv: { size: uvSize } } : {}) };
  const answer = predictDesign(design, { edition, include });
  if (!answer.cells || !answer.cuts) throw new Error('the engine left out what was asked for');
  const arrays = answer.cells;
  const cells = Object.fromEntries(CELL_ARRAY_NAMES.map((name) => [name, arrays[name]])) as PredictedCells;
  return {
    head: { engineVersion: 'spec', figures: answer.figures, verdicts: answer.verdicts, warnings: answer.warnings, cellCount: arrays.xMm.length },
    cells,
    cuts: answer.cuts.map((cut) => ({ ...cut, request: requestOf(cut.request) })),
    uv: answer.uv ?? null,
    of: design,
  };
}

function requestOf(request: NonNullable<ReturnType<typeof predictDesign>['cuts']>[number]['request']): CutRequest {
  return 'plane' in request ? { plane: request.plane, angleDeg: [...request.angleDeg] } : { phiDeg: request.phiDeg, thetaDeg: [...request.thetaDeg] };
}
