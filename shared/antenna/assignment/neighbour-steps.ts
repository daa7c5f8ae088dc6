import type { PanelLattice } from '../panel-lattice';

export interface NeighbourQuery {
  readonly lattice: PanelLattice;
  readonly cellIndex: Int32Array;
  readonly cells: readonly { readonly parametersMm: readonly number[] }[];
  readonly limitMm: number;
}

export interface NeighbourSteps {
  /** Pairs of cells next to each other along rows and columns. */
  readonly pairs: number;
  readonly violations: number;
  /** Largest change of the first parameter between neighbours. */
  readonly largestMm: number;
}

/** The violation of one step beyond rounding of the parameters, which have micrometres at best. */
const SLACK_MM = 1e-9;

/** How often the first parameter changes by more than the limit from one cell to its neighbour: there the endless lattice of equal cells holds least. */
export function neighbourSteps({ lattice, cellIndex, cells, limitMm }: NeighbourQuery): NeighbourSteps {
  const { columnCount, rowCount } = lattice.grid;
  const size = new Float64Array(columnCount * rowCount).fill(Number.NaN);
  for (let n = 0; n < lattice.count; n++) {
    if (cellIndex[n] >= 0) size[lattice.row[n] * columnCount + lattice.column[n]] = cells[cellIndex[n]].parametersMm[0];
  }
  let [pairs, violations, largestMm] = [0, 0, 0];
  const compare = (from: number, to: number): void => {
    const step = Math.abs(size[to] - size[from]);
    if (Number.isNaN(step)) return;
    pairs += 1;
    largestMm = Math.max(largestMm, step);
    if (step > limitMm + SLACK_MM) violations += 1;
  };
  for (let at = 0; at < size.length; at++) {
    if (at % columnCount < columnCount - 1) compare(at, at + 1);
    if (at + columnCount < size.length) compare(at, at + columnCount);
  }
  return { pairs, violations, largestMm };
}
