import { wrapRad } from '../../units/angles';
import type { ApertureLaw } from '../aperture-law';
import type { CellGrid } from './cell-grid';

/** A law that knows a phase for every cell and nothing between: what a search over the whole panel has found. */
export function placedPhaseLaw(grid: CellGrid, phaseRad: Float64Array): Pick<ApertureLaw, 'phaseRad' | 'tangential'> {
  const occupied = new Uint8Array(grid.columnCount * grid.rowCount);
  for (const place of grid.placeOf) occupied[place] = 1;
  // The mean of the wrapped steps to the neighbours on both sides, where they stand: each at most half a turn.
  const slope = (place: number, step: number, lengthM: number, wavenumber: number): number => {
    let [sum, count] = [0, 0];
    for (const [from, to] of [[place - step, place], [place, place + step]]) {
      if (occupied[from] !== 1 || occupied[to] !== 1) continue;
      sum += wrapRad(phaseRad[to] - phaseRad[from]);
      count += 1;
    }
    return count === 0 ? 0 : -sum / (count * lengthM * wavenumber);
  };
  const neighbour = grid.placeOf.length > 1 && grid.placeOf[1] - grid.placeOf[0] === 2 ? 2 : 1;
  return {
    phaseRad: (_wavenumber, xM, yM) => phaseRad[grid.placeAt(xM, yM)],
    tangential: (wavenumber, xM, yM, out) => {
      const place = grid.placeAt(xM, yM);
      out.u = slope(place, neighbour, neighbour * grid.stepXM, wavenumber);
      out.v = neighbour === 2 ? 0 : slope(place, grid.columnCount, grid.stepYM, wavenumber);
    },
  };
}
