import { nextPowerOfTwo, radixFourTransform, type FourierTransformFactory } from '../math/fourier-transform';
import type { ApertureField } from './aperture-field';
import { rowShiftM, type LatticeGrid } from './panel-lattice';

/**
 * Array factor F (element factor not applied) on the natural grid of its transform, over one period of u and v:
 * sample (m, n) is u = lambda m / (stepX periodU), v = lambda n / (stepY rows), stored at m rows + n. The phase origin
 * is the middle of the grid, so that neighbouring samples differ as little as they can.
 */
export interface ApertureSpectrum {
  readonly grid: LatticeGrid;
  /** Samples of u to lambda / stepX. */
  readonly periodU: number;
  /** Samples of u stored: periodU, or twice that on a staggered lattice, whose pattern repeats after two. */
  readonly columns: number;
  readonly rows: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
}

const FEWEST_SAMPLES = 16;
/** Up to this many cells along a side the grid is at least three times as fine as the pattern needs, beyond it twice. */
const FINE_SIDE = 256;

/** Samples for a side: enough for the autocorrelation (2 n - 1), for finding every lobe and for interpolating between. */
export function spectrumSize(cellsAlongSide: number): number {
  return Math.max(FEWEST_SAMPLES, nextPowerOfTwo((cellsAlongSide <= FINE_SIDE ? 3 : 2) * cellsAlongSide));
}

/** Two-dimensional transform of the aperture, rows of cells first; the empty part of the grid is not transformed. */
export function apertureSpectrum(field: ApertureField, makeTransform: FourierTransformFactory = radixFourTransform): ApertureSpectrum {
  const { grid } = field;
  const periodU = spectrumSize(grid.columnCount);
  const columns = grid.stagger === 'none' ? periodU : 2 * periodU;
  const rows = spectrumSize(grid.rowCount);
  const rowSpectra = transformRows(field, { periodU, columns }, makeTransform);
  const re = new Float64Array(columns * rows);
  const im = new Float64Array(columns * rows);
  const transform = makeTransform(rows);
  const lineRe = new Float64Array(rows);
  const lineIm = new Float64Array(rows);
  const turns = centringTurns(grid.rowCount, rows);
  for (let m = 0; m < columns; m++) {
    const from = m * grid.rowCount;
    lineRe.fill(0, grid.rowCount);
    lineIm.fill(0, grid.rowCount);
    lineRe.set(rowSpectra.re.subarray(from, from + grid.rowCount));
    lineIm.set(rowSpectra.im.subarray(from, from + grid.rowCount));
    transform.transform(lineRe, lineIm);
    const to = m * rows;
    for (let n = 0; n < rows; n++) {
      re[to + n] = lineRe[n] * turns.cosines[n] - lineIm[n] * turns.sines[n];
      im[to + n] = lineRe[n] * turns.sines[n] + lineIm[n] * turns.cosines[n];
    }
  }
  return { grid, periodU, columns, rows, re, im };
}

/** exp(-j 2 pi middle i / size): moves the phase origin from the first cell of a side to its middle. */
function centringTurns(cells: number, size: number, count = size): { cosines: Float64Array; sines: Float64Array } {
  const step = (-Math.PI * (cells - 1)) / size;
  return {
    cosines: Float64Array.from({ length: count }, (_, i) => Math.cos(step * i)),
    sines: Float64Array.from({ length: count }, (_, i) => Math.sin(step * i)),
  };
}

/** Transforms along x, centred, half-step shifts included: row r at sample m stands at m rowCount + r. */
function transformRows(field: ApertureField, size: { periodU: number; columns: number }, makeTransform: FourierTransformFactory): { re: Float64Array; im: Float64Array } {
  const { columnCount, rowCount } = field.grid;
  const { periodU, columns } = size;
  const spectraRe = new Float64Array(columns * rowCount);
  const spectraIm = new Float64Array(columns * rowCount);
  const transform = makeTransform(periodU);
  const re = new Float64Array(periodU);
  const im = new Float64Array(periodU);
  const still = centringTurns(columnCount, periodU, columns);
  // Half a step to the right is the middle moved half a step to the left: exp(j 2 pi m / (2 periodU)) on top.
  const shifted = centringTurns(columnCount - 1, periodU, columns);
  for (let r = 0; r < rowCount; r++) {
    re.fill(0, columnCount);
    im.fill(0, columnCount);
    re.set(field.re.subarray(r * columnCount, (r + 1) * columnCount));
    im.set(field.im.subarray(r * columnCount, (r + 1) * columnCount));
    transform.transform(re, im);
    const { cosines, sines } = rowShiftM(field.grid, r) === 0 ? still : shifted;
    for (let m = 0; m < columns; m++) {
      const at = m < periodU ? m : m - periodU;
      spectraRe[m * rowCount + r] = re[at] * cosines[m] - im[at] * sines[m];
      spectraIm[m * rowCount + r] = re[at] * sines[m] + im[at] * cosines[m];
    }
  }
  return { re: spectraRe, im: spectraIm };
}

/** |F|^2 at any whole sample, inside or outside the stored period. */
export function spectrumPower(spectrum: ApertureSpectrum, m: number, n: number): number {
  const { columns, rows, re, im } = spectrum;
  const at = (m - columns * Math.floor(m / columns)) * rows + (n - rows * Math.floor(n / rows));
  return re[at] * re[at] + im[at] * im[at];
}
