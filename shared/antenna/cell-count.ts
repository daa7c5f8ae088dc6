import { MAX_CELL_COUNT, type Panel } from '../model/design-document';
import { eachRowMask, latticeGrid } from './panel-lattice';
import { siPanel } from './si-design';

/** Cells of the lattice over the bounding rectangle of the outline: never fewer than the panel has. Allocates nothing. */
export function cellCountUpperBound(panel: Panel): number {
  const grid = latticeGrid(siPanel(panel));
  return grid.columnCount * grid.rowCount;
}

/**
 * Cells that the panel has, keep-outs left out. Needs memory for one row only, but time in proportion to
 * {@link cellCountUpperBound}, so ask that first.
 */
export function countCells(panel: Panel): number {
  const si = siPanel(panel);
  let count = 0;
  eachRowMask(si, latticeGrid(si), (mask) => {
    for (const kept of mask) count += kept;
  });
  return count;
}

/** A bounding rectangle this much above the limit is refused without counting: no ordinary outline fills so little of it. */
const COUNTING_LIMIT = 4 * MAX_CELL_COUNT;

/** Why the panel has too many cells, or none at all, or undefined. Decides before any memory is taken. */
export function cellCountFault(panel: Panel): string | undefined {
  const bound = cellCountUpperBound(panel);
  if (bound === 0) return 'the outline is smaller than one period, so the panel has no cells';
  if (bound > COUNTING_LIMIT) return tooMany(bound);
  const count = countCells(panel);
  if (count === 0) return 'no cell centre lies inside the outline and outside the keep-outs, so the panel has no cells';
  return count > MAX_CELL_COUNT ? tooMany(count) : undefined;
}

function tooMany(count: number): string {
  return `the panel would have ${count} cells; the limit is ${MAX_CELL_COUNT}`;
}
