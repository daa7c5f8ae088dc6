import { fourierEngine } from '../math/active-fourier-engine';
import { hemisphereKernel } from './hemisphere-kernel';
import type { LatticeGrid } from './panel-lattice';

export interface KernelQuery {
  readonly grid: LatticeGrid;
  /** Samples of the transform along x and y; at least twice the cells along each side. */
  readonly columns: number;
  readonly rows: number;
  readonly wavenumber: number;
  readonly powerExponent: number;
}

/** The spectra last asked for: steering a beam asks for the same one again and again. */
const recent = new Map<string, Float64Array>();
const KEPT = 4;

/**
 * Transform of the power kernel over all lags of a lattice. The kernel is real and even in x and in y, so its
 * transform is too: column m, row n stands at m (rows/2 + 1) + n for n up to rows/2.
 */
export function kernelSpectrum(query: KernelQuery): Float64Array {
  const { grid, columns, rows, wavenumber, powerExponent } = query;
  const sides = [grid.columnCount, grid.rowCount, grid.stagger === 'none', columns, rows];
  const key = [...sides, wavenumber * grid.stepXM, wavenumber * grid.stepYM, powerExponent].join(' ');
  const known = recent.get(key);
  if (known) return known;
  const spectrum = evenTransform(query);
  recent.set(key, spectrum);
  const [oldest] = recent.keys();
  if (recent.size > KEPT) recent.delete(oldest);
  return spectrum;
}

/**
 * From the lags of one quarter, those on an axis halved: the sum over all four signs of exp(j (a + b)) is
 * 2 Re(exp(j (a + b)) + exp(j (a - b))). On a staggered lattice odd lag rows hold the lags (c + 1/2) stepX, none on an axis.
 */
function evenTransform(query: KernelQuery): Float64Array {
  const { grid, columns, rows } = query;
  const lines = { columnCount: grid.columnCount, rowCount: grid.rowCount, columns, rows, originRow: 0, im: new Float64Array(grid.columnCount * grid.rowCount) };
  const result = new Float64Array(columns * (rows / 2 + 1));
  const steps = grid.stagger === 'none' ? 1 : 2;
  for (let first = 0; first < steps; first++) {
    const re = quarterLags(query, first, steps);
    addEven(result, fourierEngine().spectrum({ ...lines, re, originColumn: first === 0 ? 0 : -0.5 }).re, { columns, rows });
  }
  return result;
}

/** Kernel at the lags of rows `first`, `first` + `step`, ..., zero in the others; row by row. */
function quarterLags({ grid, wavenumber, powerExponent }: KernelQuery, first: number, step: number): Float64Array {
  const { columnCount, rowCount, stepXM, stepYM } = grid;
  const lags = new Float64Array(columnCount * rowCount);
  const offset = first === 0 ? 0 : 0.5;
  for (let d = first; d < rowCount; d += step) {
    for (let c = 0; c < columnCount; c++) {
      const halved = (d === 0 ? 0.5 : 1) * (c + offset === 0 ? 0.5 : 1);
      lags[d * columnCount + c] = halved * hemisphereKernel(powerExponent, wavenumber * Math.hypot((c + offset) * stepXM, d * stepYM));
    }
  }
  return lags;
}

function addEven(result: Float64Array, quarter: Float64Array, { columns, rows }: { columns: number; rows: number }): void {
  const half = rows / 2;
  for (let m = 0; m < columns; m++) {
    const from = m * rows;
    const to = m * (half + 1);
    for (let n = 0; n <= half; n++) result[to + n] += 2 * (quarter[from + n] + quarter[from + ((rows - n) % rows)]);
  }
}
