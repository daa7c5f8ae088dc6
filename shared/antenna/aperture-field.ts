import type { CellResponses } from './cell-stock';
import type { CellIllumination } from './illumination';
import type { LatticeGrid, PanelLattice } from './panel-lattice';

/** Complex amplitudes of the cells on the full grid, row by row; zero where no cell stands. */
export interface ApertureField {
  readonly grid: LatticeGrid;
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** What each cell radiates: incident amplitude times response, phase -k path plus that of the cell. */
export function apertureField(lattice: PanelLattice, light: CellIllumination, cells: CellResponses, wavenumber: number): ApertureField {
  const { grid, count, column, row } = lattice;
  const re = new Float64Array(grid.columnCount * grid.rowCount);
  const im = new Float64Array(re.length);
  for (let n = 0; n < count; n++) {
    const size = light.amplitude[n] * cells.magnitude[n];
    const phase = cells.phaseRad[n] - wavenumber * light.pathM[n];
    const at = row[n] * grid.columnCount + column[n];
    re[at] = size * Math.cos(phase);
    im[at] = size * Math.sin(phase);
  }
  return { grid, re, im };
}
