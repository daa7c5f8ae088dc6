import { nextPowerOfTwo } from '../../math/fourier-transform';
import { rowShiftM, type PanelLattice } from '../panel-lattice';

/** Cells on a plain rectangle of places for transforms; a staggered lattice stands on every other place of half the step. */
export interface CellGrid {
  readonly columnCount: number;
  readonly rowCount: number;
  readonly stepXM: number;
  readonly stepYM: number;
  /** Place of every cell, row by row. */
  readonly placeOf: Int32Array;
  /** Samples of the transform: three to eight times the places of a side, at least 16. */
  readonly columns: number;
  readonly rows: number;
  /** How often the pattern stands on those samples. */
  readonly copies: 1 | 2;
  /** Place of the cell at a point of the panel. */
  placeAt(xM: number, yM: number): number;
}

export function cellGrid({ grid, column, row, count }: PanelLattice): CellGrid {
  const split = grid.stagger === 'none' ? 1 : 2;
  const columnCount = grid.columnCount * split + (split - 1);
  const stepXM = grid.stepXM / split;
  const shiftOf = (r: number): number => (rowShiftM(grid, r) === 0 ? 0 : 1);
  return {
    columnCount,
    rowCount: grid.rowCount,
    stepXM,
    stepYM: grid.stepYM,
    placeOf: Int32Array.from({ length: count }, (_, n) => row[n] * columnCount + split * column[n] + shiftOf(row[n])),
    columns: sampleCount(columnCount),
    rows: sampleCount(grid.rowCount),
    copies: split,
    placeAt: (xM, yM) => Math.round((yM - grid.firstYM) / grid.stepYM) * columnCount + Math.round((xM - grid.firstXM) / stepXM),
  };
}

/** Four samples to a cell up to 32 cells a side, three beyond, rounded up to a power of two. */
export function sampleCount(cells: number): number {
  return Math.max(16, nextPowerOfTwo((cells <= 32 ? 4 : 3) * cells));
}
