import { cellChoices } from '../../../../shared/antenna/cell-choices';
import type { CellChoice } from '../../../../shared/antenna/cell-choices';
import type { PreparedEdition } from '../../../../shared/antenna/prepare-edition';
import { siDesign } from '../../../../shared/antenna/si-design';
import { vectorArrival, vectorStock } from '../../../../shared/antenna/vector/vector-stock';
import { radFromDeg } from '../../../../shared/units/angles';
import type { LivePrediction } from '../live-prediction-data';

/** The three best cells for one position of a prediction, by the rule of its design; none while the edition is not at hand. */
export function bestCells({ cells, of }: LivePrediction, position: number, edition: PreparedEdition | null): readonly CellChoice[] {
  if (of.cells.kind === 'edition' && !edition) return [];
  const one = (value: number): Float64Array => Float64Array.of(value);
  const light = {
    amplitude: one(cells.amplitude[position]),
    // The choice does not ask for the path: the target holds it already.
    pathM: one(0),
    incidenceRad: one(radFromDeg(cells.incidenceDeg[position])),
    azimuthRad: one(radFromDeg(cells.incidenceAzimuthDeg[position])),
  };
  const si = siDesign(of);
  const arrival = vectorArrival(si, { count: 1, xM: one(cells.xMm[position] / 1000), yM: one(cells.yMm[position] / 1000) });
  const vector = arrival && { stock: vectorStock(of.cells, { light, designFrequencyHz: si.designFrequencyHz, si, edition: edition ?? undefined, ...arrival }) };
  return cellChoices({ design: of, si, light, targetRad: one(radFromDeg(cells.targetPhaseDeg[position])), vector }, 0, edition ?? undefined);
}
