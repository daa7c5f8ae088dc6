import { outlineBounds, rowIntervals } from './outline';
import type { SiPanel } from './si-design';

/**
 * The full grid of rows and columns on which the cells stand. x = firstX + column stepX, plus half a step in
 * staggered rows; y = firstY + row stepY. Row 0 is the lowest.
 */
export interface LatticeGrid {
  readonly columnCount: number;
  readonly rowCount: number;
  readonly firstXM: number;
  readonly firstYM: number;
  readonly stepXM: number;
  readonly stepYM: number;
  /** Which rows stand half a step to the right: none (rectangular lattice), those of even or those of odd row index. */
  readonly stagger: 'none' | 'even' | 'odd';
}

/** Where cells stand. */
export interface CellPlaces {
  readonly count: number;
  readonly xM: Float64Array;
  readonly yM: Float64Array;
}

/** Cells in order: row by row from the lowest y, within a row from the lowest x. */
export interface PanelLattice extends CellPlaces {
  readonly grid: LatticeGrid;
  readonly cellAreaM2: number;
  readonly column: Int32Array;
  readonly row: Int32Array;
}

// A side that holds a whole number of periods up to rounding holds all of them.
const WHOLE_SLACK = 1e-9;

export function rowShiftM(grid: LatticeGrid, row: number): number {
  if (grid.stagger === 'none') return 0;
  return (row % 2 === 0) === (grid.stagger === 'even') ? grid.stepXM / 2 : 0;
}

/** The grid that covers the bounding rectangle of the outline; allocates nothing. */
export function latticeGrid(panel: SiPanel): LatticeGrid {
  const { leftM, rightM, bottomM, topM } = outlineBounds(panel.outline);
  if (panel.lattice.kind === 'rectangular') {
    const { periodXM, periodYM } = panel.lattice;
    const columnCount = Math.floor((rightM - leftM) / periodXM + WHOLE_SLACK);
    const rowCount = Math.floor((topM - bottomM) / periodYM + WHOLE_SLACK);
    return {
      columnCount,
      rowCount,
      firstXM: (leftM + rightM) / 2 - ((columnCount - 1) / 2) * periodXM,
      firstYM: (bottomM + topM) / 2 - ((rowCount - 1) / 2) * periodYM,
      stepXM: periodXM,
      stepYM: periodYM,
      stagger: 'none',
    };
  }
  const { periodXM, rowSpacingM } = panel.lattice;
  const firstRow = Math.ceil(bottomM / rowSpacingM - WHOLE_SLACK);
  const lastRow = Math.floor(topM / rowSpacingM + WHOLE_SLACK);
  // Index i stands for x = i p in even rows and (i + 1/2) p in odd ones.
  const firstIndex = Math.ceil(leftM / periodXM - 0.5 - WHOLE_SLACK);
  const lastIndex = Math.floor(rightM / periodXM + WHOLE_SLACK);
  return {
    columnCount: Math.max(0, lastIndex - firstIndex + 1),
    rowCount: Math.max(0, lastRow - firstRow + 1),
    firstXM: firstIndex * periodXM,
    firstYM: firstRow * rowSpacingM,
    stepXM: periodXM,
    stepYM: rowSpacingM,
    stagger: firstRow % 2 === 0 ? 'odd' : 'even',
  };
}

/** Places the cells: every grid point inside or on the outline and outside every keep-out. */
export function panelLattice(panel: SiPanel): PanelLattice {
  const grid = latticeGrid(panel);
  let count = 0;
  eachRowMask(panel, grid, (mask) => {
    for (const kept of mask) count += kept;
  });
  const xM = new Float64Array(count);
  const yM = new Float64Array(count);
  const column = new Int32Array(count);
  const row = new Int32Array(count);
  let n = 0;
  eachRowMask(panel, grid, (mask, rowIndex) => {
    const startM = grid.firstXM + rowShiftM(grid, rowIndex);
    for (let c = 0; c < grid.columnCount; c++) {
      if (!mask[c]) continue;
      xM[n] = startM + c * grid.stepXM;
      yM[n] = grid.firstYM + rowIndex * grid.stepYM;
      column[n] = c;
      row[n] = rowIndex;
      n += 1;
    }
  });
  return { grid, count, cellAreaM2: grid.stepXM * grid.stepYM, xM, yM, column, row };
}

/** Calls back with one byte per column for every row: 1 where a cell stands. The same mask is reused. */
export function eachRowMask(panel: SiPanel, grid: LatticeGrid, visit: (mask: Uint8Array, row: number) => void): void {
  const mask = new Uint8Array(grid.columnCount);
  // A rectangular lattice in a rectangle is counted, not tested: all of its columns and rows stand.
  const all = panel.outline.kind === 'rectangle' && grid.stagger === 'none';
  for (let row = 0; row < grid.rowCount; row++) {
    const yM = grid.firstYM + row * grid.stepYM;
    mask.fill(all ? 1 : 0);
    if (!all) for (const interval of rowIntervals(panel.outline, yM)) markInterval({ mask, grid, row }, interval, 1);
    for (const keepOut of panel.keepOuts) {
      for (const interval of rowIntervals(keepOut, yM)) markInterval({ mask, grid, row }, interval, 0);
    }
    visit(mask, row);
  }
}

function markInterval(target: { mask: Uint8Array; grid: LatticeGrid; row: number }, [fromM, toM]: [number, number], value: 0 | 1): void {
  const { mask, grid, row } = target;
  const startM = grid.firstXM + rowShiftM(grid, row);
  const first = Math.max(0, Math.ceil((fromM - startM) / grid.stepXM));
  const last = Math.min(grid.columnCount - 1, Math.floor((toM - startM) / grid.stepXM));
  for (let c = first; c <= last; c++) mask[c] = value;
}
