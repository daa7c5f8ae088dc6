import { cellStock } from '../cell-stock';
import { coPolarResponse, incidenceWeigher, type PolarResponse } from '../cell-response';
import { illuminateCells, type CellIllumination } from '../illumination';
import type { PlacedDesign } from '../place-cells';
import type { PreparedEdition } from '../prepare-edition';
import type { SiPosition } from '../si-design';
import { vectorArrival, vectorStock } from '../vector/vector-stock';

/** Responses of the placed cells under another light. */
export interface RelitCells {
  readonly phaseRad: Float64Array;
  readonly magnitude: Float64Array;
}

/** What the cells that stand on a panel do at the incidence of another light, at the design frequency. */
export function relitCells({ assignment, si }: PlacedDesign, light: CellIllumination, edition?: PreparedEdition): RelitCells {
  const phaseRad = assignment.phaseRad.slice();
  const magnitude = assignment.magnitude.slice();
  // Ideal cells and those of an inline table do the same at every incidence.
  if (edition === undefined) return { phaseRad, magnitude };
  const at = edition.atFrequency(si.designFrequencyHz);
  const weigh = incidenceWeigher(edition, si.illumination.polarisation);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  for (let n = 0; n < phaseRad.length; n++) {
    if (assignment.cellIndex[n] < 0) continue;
    coPolarResponse(at, assignment.cellIndex[n], weigh(light.incidenceRad[n], light.azimuthRad[n]), response);
    phaseRad[n] = response.phaseRad;
    magnitude[n] = response.magnitude;
  }
  return { phaseRad, magnitude };
}

/**
 * The same panel under a horn that stands elsewhere: its aim and all cells stay, path, amplitude and incidence are computed
 * anew, by the model of the design. As slow as placing the panel; trials use `feedShift`. In the vector model the responses
 * beside the cells are still those of the scalar mixture, the field is not. Throws where the panel has no horn.
 */
export function movedFeed(placed: PlacedDesign, move: SiPosition, edition?: PreparedEdition): PlacedDesign {
  const { si, lattice, design, assignment } = placed;
  const horn = si.illumination;
  if (horn.kind !== 'horn') throw new RangeError(`A horn is to be moved, and the panel is lit by a ${horn.kind}`);
  const position = { xM: horn.position.xM + move.xM, yM: horn.position.yM + move.yM, zM: horn.position.zM + move.zM };
  const moved = { ...si, illumination: { ...horn, position } };
  const arrival = vectorArrival(moved, lattice);
  const scalarLight = illuminateCells(moved.illumination, lattice, si.receiveExponent);
  const light = arrival ? { ...scalarLight, amplitude: arrival.amplitude } : scalarLight;
  const site = { light, designFrequencyHz: si.designFrequencyHz, si: moved, edition };
  const vector = arrival && { ...arrival, stock: vectorStock(design.cells, { ...site, ...arrival }) };
  const responses = relitCells(placed, light, edition);
  return { ...placed, si: moved, light, stock: vector?.stock ?? cellStock(design.cells, site), assignment: { cellIndex: assignment.cellIndex, ...responses }, ...(vector ? { vector } : {}) };
}
