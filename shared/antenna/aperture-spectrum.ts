import { nextPowerOfTwo, radixFourTransform, type FourierTransformFactory } from '../math/fourier-transform';
import type { ApertureField } from './aperture-field';
import { rowShiftM, type LatticeGrid } from './panel-lattice';

/** Transforms along x of every row: value of row r at sample m stands at m rowCount + r, half-step shifts included. */
export interface RowSpectra {
  /** Samples of one period of u, which is lambda / stepX. */
  readonly size: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/**
 * |F|^2 of the array (element factor not applied) on the natural grid of its transform:
 * u = lambda m / (stepX columns), v = lambda n / (stepY rows), stored at m rows + n for one period of each.
 */
export interface ApertureSpectrum {
  readonly grid: LatticeGrid;
  readonly columns: number;
  readonly rows: number;
  readonly power: Float64Array;
  readonly rowSpectra: RowSpectra;
}

const FEWEST_SAMPLES = 16;
/** Up to this many cells along a side the grid is three times as fine as the pattern needs, beyond it twice. */
const FINE_SIDE = 256;

/** Samples for a side: enough for the autocorrelation (2 n - 1) and for finding every lobe. */
export function spectrumSize(cellsAlongSide: number): number {
  return Math.max(FEWEST_SAMPLES, nextPowerOfTwo((cellsAlongSide <= FINE_SIDE ? 3 : 2) * cellsAlongSide));
}

/** Two-dimensional transform of the aperture, rows first; rows without a cell are not transformed. */
export function apertureSpectrum(field: ApertureField, makeTransform: FourierTransformFactory = radixFourTransform): ApertureSpectrum {
  const { grid } = field;
  const columns = spectrumSize(grid.columnCount);
  const rows = spectrumSize(grid.rowCount);
  const rowSpectra = transformRows(field, columns, makeTransform);
  const power = new Float64Array(columns * rows);
  const transform = makeTransform(rows);
  const re = new Float64Array(rows);
  const im = new Float64Array(rows);
  for (let m = 0; m < columns; m++) {
    const from = m * grid.rowCount;
    re.fill(0, grid.rowCount);
    im.fill(0, grid.rowCount);
    re.set(rowSpectra.re.subarray(from, from + grid.rowCount));
    im.set(rowSpectra.im.subarray(from, from + grid.rowCount));
    transform.transform(re, im);
    const to = m * rows;
    for (let n = 0; n < rows; n++) power[to + n] = re[n] * re[n] + im[n] * im[n];
  }
  return { grid, columns, rows, power, rowSpectra };
}

function transformRows(field: ApertureField, size: number, makeTransform: FourierTransformFactory): RowSpectra {
  const { columnCount, rowCount } = field.grid;
  const spectraRe = new Float64Array(size * rowCount);
  const spectraIm = new Float64Array(size * rowCount);
  const transform = makeTransform(size);
  const re = new Float64Array(size);
  const im = new Float64Array(size);
  for (let r = 0; r < rowCount; r++) {
    re.fill(0, columnCount);
    im.fill(0, columnCount);
    re.set(field.re.subarray(r * columnCount, (r + 1) * columnCount));
    im.set(field.im.subarray(r * columnCount, (r + 1) * columnCount));
    transform.transform(re, im);
    const shifted = rowShiftM(field.grid, r) !== 0;
    for (let m = 0; m < size; m++) {
      // A row half a step to the right: exp(j k u stepX / 2) with k u stepX = 2 pi m / size.
      const c = shifted ? Math.cos((Math.PI * m) / size) : 1;
      const s = shifted ? Math.sin((Math.PI * m) / size) : 0;
      spectraRe[m * rowCount + r] = re[m] * c - im[m] * s;
      spectraIm[m * rowCount + r] = re[m] * s + im[m] * c;
    }
  }
  return { size, re: spectraRe, im: spectraIm };
}

/**
 * |F|^2 at any whole sample, inside or outside the stored period. On a staggered lattice one period on in u is
 * half a period on in v: the reciprocal lattice is centred.
 */
export function spectrumPower(spectrum: ApertureSpectrum, m: number, n: number): number {
  const { columns, rows, power, grid } = spectrum;
  const periods = Math.floor(m / columns);
  const shift = grid.stagger !== 'none' && periods % 2 !== 0 ? rows / 2 : 0;
  const row = n + shift;
  return power[(m - periods * columns) * rows + (row - rows * Math.floor(row / rows))];
}
