import { radixFourTransform } from '../math/fourier-transform';
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
  const spectrum = columnTransforms(rowTransforms(query), query);
  recent.set(key, spectrum);
  const [oldest] = recent.keys();
  if (recent.size > KEPT) recent.delete(oldest);
  return spectrum;
}

/**
 * Real transforms along x for the lags of y = 0, 1, ...: lag row d, column m at m rowCount + d. Two real even rows
 * share one complex transform. On a staggered lattice odd lag rows hold the lags (c + 1/2) stepX.
 */
function rowTransforms({ grid, columns, wavenumber, powerExponent }: KernelQuery): Float64Array {
  const lagRows = grid.rowCount;
  const staggered = grid.stagger !== 'none';
  const result = new Float64Array(columns * lagRows);
  const transform = radixFourTransform(columns);
  const planes = [new Float64Array(columns), new Float64Array(columns)];
  const fill = (plane: Float64Array, lagRow: number, offset: number): void => {
    plane.fill(0);
    if (lagRow >= lagRows) return;
    const y = lagRow * grid.stepYM;
    for (let c = 0; c < grid.columnCount; c++) {
      const value = hemisphereKernel(powerExponent, wavenumber * Math.hypot((c + offset) * grid.stepXM, y));
      plane[c] = value;
      // Lag -c without offset, lag -(c + 1/2) = (-c - 1) + 1/2 with it.
      const mirrored = offset === 0 ? (columns - c) % columns : columns - c - 1;
      plane[mirrored] = value;
    }
  };
  const step = staggered ? 2 : 1;
  for (let pair = 0; pair < lagRows; pair += 2 * step) {
    for (let start = 0; start < step; start++) {
      const offset = start === 1 ? 0.5 : 0;
      fill(planes[0], pair + start, offset);
      fill(planes[1], pair + start + step, offset);
      transform.transform(planes[0], planes[1]);
      storePair({ result, lagRows, columns, offset }, planes, pair + start, step);
    }
  }
  return result;
}

/** The even rows' transforms are real: the two planes hold one each, once the half-step offset is turned out of them. */
function storePair(
  target: { result: Float64Array; lagRows: number; columns: number; offset: number },
  [first, second]: Float64Array[],
  row: number,
  step: number,
): void {
  const { result, lagRows, columns, offset } = target;
  for (let m = 0; m < columns; m++) {
    const cosine = Math.cos((2 * Math.PI * offset * m) / columns);
    const sine = Math.sin((2 * Math.PI * offset * m) / columns);
    if (row < lagRows) result[m * lagRows + row] = first[m] * cosine - second[m] * sine;
    if (row + step < lagRows) result[m * lagRows + row + step] = first[m] * sine + second[m] * cosine;
  }
}

/** Transforms along y of the even extension of the lag rows, two columns at a time. */
function columnTransforms(lagSpectra: Float64Array, { grid, columns, rows }: KernelQuery): Float64Array {
  const lagRows = grid.rowCount;
  const half = rows / 2;
  const result = new Float64Array(columns * (half + 1));
  const transform = radixFourTransform(rows);
  const first = new Float64Array(rows);
  const second = new Float64Array(rows);
  for (let m = 0; m < columns; m += 2) {
    first.fill(0);
    second.fill(0);
    for (let d = 0; d < lagRows; d++) {
      first[d] = lagSpectra[m * lagRows + d];
      second[d] = lagSpectra[(m + 1) * lagRows + d];
      first[(rows - d) % rows] = first[d];
      second[(rows - d) % rows] = second[d];
    }
    transform.transform(first, second);
    for (let n = 0; n <= half; n++) {
      result[m * (half + 1) + n] = first[n];
      result[(m + 1) * (half + 1) + n] = second[n];
    }
  }
  return result;
}
