import { fourierEngine } from '../math/active-fourier-engine';
import type { ComplexSamples, FourierEngine } from '../math/fourier-engine';
import { nextPowerOfTwo } from '../math/fourier-transform';
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

/** Two-dimensional transform of the aperture; the empty part of the grid is not transformed. */
export function apertureSpectrum(field: ApertureField, engine: FourierEngine = fourierEngine()): ApertureSpectrum {
  const { grid, re, im } = field;
  const periodU = spectrumSize(grid.columnCount);
  const rows = spectrumSize(grid.rowCount);
  const middle = { originColumn: (grid.columnCount - 1) / 2, originRow: (grid.rowCount - 1) / 2 };
  const query = { columnCount: grid.columnCount, rowCount: grid.rowCount, columns: periodU, rows, ...middle };
  if (grid.stagger === 'none') return { grid, periodU, columns: periodU, rows, ...engine.spectrum({ ...query, re, im }) };
  const still = engine.spectrum({ ...query, ...rowsAlone(field, 0) });
  // Half a step to the right is the middle moved half a step to the left.
  const shifted = engine.spectrum({ ...query, ...rowsAlone(field, grid.stepXM / 2), originColumn: middle.originColumn - 0.5 });
  return { grid, periodU, columns: 2 * periodU, rows, ...twoPeriods(still, shifted, grid.columnCount) };
}

/** The field of the rows that are shifted by so much, zero in the others. */
function rowsAlone({ grid, re, im }: ApertureField, shiftM: number): ComplexSamples {
  const stands = (i: number): boolean => rowShiftM(grid, Math.floor(i / grid.columnCount)) === shiftM;
  return { re: re.map((a, i) => (stands(i) ? a : 0)), im: im.map((b, i) => (stands(i) ? b : 0)) };
}

/**
 * One period on, the centred phase of the rows that stand still has turned by -pi (cells - 1), that of the shifted ones
 * by -pi (cells - 2).
 */
function twoPeriods(still: ComplexSamples, shifted: ComplexSamples, cells: number): ComplexSamples {
  const count = still.re.length;
  const sign = cells % 2 === 1 ? 1 : -1;
  const joined = (a: Float64Array, b: Float64Array): Float64Array => {
    const both = new Float64Array(2 * count);
    for (let i = 0; i < count; i++) {
      both[i] = a[i] + b[i];
      both[count + i] = sign * (a[i] - b[i]);
    }
    return both;
  };
  return { re: joined(still.re, shifted.re), im: joined(still.im, shifted.im) };
}

/** |F|^2 at any whole sample, inside or outside the stored period. */
export function spectrumPower(spectrum: ApertureSpectrum, m: number, n: number): number {
  const { columns, rows, re, im } = spectrum;
  const at = (m - columns * Math.floor(m / columns)) * rows + (n - rows * Math.floor(n / rows));
  return re[at] * re[at] + im[at] * im[at];
}
