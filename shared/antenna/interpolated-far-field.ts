import type { ApertureSpectrum } from './aperture-spectrum';

/** F(u, v) between the samples of an aperture spectrum, phase origin in the middle of the panel. Reused between calls. */
export interface FieldValue {
  re: number;
  im: number;
}

/** Most samples used along an axis on either side. */
const MOST_HALF_TAPS = 12;
/** Fewer are used where this exponent of the error is reached with fewer: exp(-21) is 1e-9. */
const ENOUGH = 21;

/** Weights along one axis for one coordinate. */
interface AxisWeights {
  readonly weights: Float64Array;
  readonly indices: Int32Array;
}

/**
 * Interpolates F to any direction from the samples of its transform by a windowed sinc, at a cost that does not depend
 * on the number of cells. F is band-limited: the samples are s >= 2 times as fine as needed (3 up to 256 cells a side),
 * and the window exp(beta (sqrt(1 - t^2) - 1)), beta = pi half (1 - 1/s) with `half` samples on either side, keeps the error
 * below about exp(-beta) of the highest sample nearby: 1e-8 for s = 2, 1e-9 from s = 2.3 on. The window is the "exponential of semicircle" of
 * A. H. Barnett et al., SIAM J. Sci. Comput. 41(5), C479-C504, 2019 (from memory).
 */
export function interpolatedFarField(spectrum: ApertureSpectrum, wavenumber: number): (u: number, v: number) => FieldValue {
  const { rows, re, im } = spectrum;
  const { alongU, alongV, samplesPerU, samplesPerV } = axes(spectrum, wavenumber);
  const value: FieldValue = { re: 0, im: 0 };
  return (u, v) => {
    const { weights: weightsU, indices: indicesU } = alongU(u * samplesPerU);
    const { weights: weightsV, indices: indicesV } = alongV(v * samplesPerV);
    let sumRe = 0;
    let sumIm = 0;
    for (let i = 0; i < weightsU.length; i++) {
      const column = indicesU[i] * rows;
      let lineRe = 0;
      let lineIm = 0;
      for (let j = 0; j < weightsV.length; j++) {
        const at = column + indicesV[j];
        lineRe += weightsV[j] * re[at];
        lineIm += weightsV[j] * im[at];
      }
      sumRe += weightsU[i] * lineRe;
      sumIm += weightsU[i] * lineIm;
    }
    value.re = sumRe;
    value.im = sumIm;
    return value;
  };
}

/**
 * |F|^2 at many v of one u: interpolates the samples along u once for the whole column, then along v. Writes one
 * value for each of `vs` into `power`.
 */
export function interpolatedColumn(spectrum: ApertureSpectrum, wavenumber: number, vs: Float64Array): (u: number, power: Float64Array) => void {
  const { rows, re, im } = spectrum;
  const { alongU, alongV, samplesPerU, samplesPerV } = axes(spectrum, wavenumber);
  const fixed = Array.from(vs, (v) => {
    const { weights, indices } = alongV(v * samplesPerV);
    return { weights: weights.slice(), indices: indices.slice() };
  });
  const lineRe = new Float64Array(rows);
  const lineIm = new Float64Array(rows);
  return (u, power) => {
    lineRe.fill(0);
    lineIm.fill(0);
    const { weights, indices } = alongU(u * samplesPerU);
    for (let i = 0; i < weights.length; i++) {
      const weight = weights[i];
      const column = indices[i] * rows;
      for (let n = 0; n < rows; n++) {
        lineRe[n] += weight * re[column + n];
        lineIm[n] += weight * im[column + n];
      }
    }
    for (let k = 0; k < fixed.length; k++) {
      const { weights: weightsV, indices: indicesV } = fixed[k];
      let sumRe = 0;
      let sumIm = 0;
      for (let j = 0; j < weightsV.length; j++) {
        sumRe += weightsV[j] * lineRe[indicesV[j]];
        sumIm += weightsV[j] * lineIm[indicesV[j]];
      }
      power[k] = sumRe * sumRe + sumIm * sumIm;
    }
  };
}

/** |F|^2 of any spectrum of one shape at fixed directions: their weights are worked out once. */
export function interpolatedDirections(
  shape: ApertureSpectrum,
  wavenumber: number,
  directions: readonly { readonly u: number; readonly v: number }[],
): (spectrum: ApertureSpectrum, power: Float64Array) => void {
  const { alongU, alongV, samplesPerU, samplesPerV } = axes(shape, wavenumber);
  const copy = ({ weights, indices }: AxisWeights): AxisWeights => ({ weights: weights.slice(), indices: indices.slice() });
  const fixed = directions.map(({ u, v }) => ({ along: copy(alongU(u * samplesPerU)), across: copy(alongV(v * samplesPerV)) }));
  return ({ rows, re, im }, power) => {
    fixed.forEach(({ along, across }, k) => {
      let sumRe = 0;
      let sumIm = 0;
      for (let i = 0; i < along.weights.length; i++) {
        const column = along.indices[i] * rows;
        let lineRe = 0;
        let lineIm = 0;
        for (let j = 0; j < across.weights.length; j++) {
          const at = column + across.indices[j];
          lineRe += across.weights[j] * re[at];
          lineIm += across.weights[j] * im[at];
        }
        sumRe += along.weights[i] * lineRe;
        sumIm += along.weights[i] * lineIm;
      }
      power[k] = sumRe * sumRe + sumIm * sumIm;
    });
  };
}

/** F along lines of constant u: interpolates the samples along u once for the line, then along v for each point. */
export function interpolatedLine(spectrum: ApertureSpectrum, wavenumber: number): (u: number) => (v: number) => FieldValue {
  const { rows, re, im } = spectrum;
  const { alongU, alongV, samplesPerU, samplesPerV } = axes(spectrum, wavenumber);
  const lineRe = new Float64Array(rows);
  const lineIm = new Float64Array(rows);
  const value: FieldValue = { re: 0, im: 0 };
  const alongLine = (v: number): FieldValue => {
    const { weights, indices } = alongV(v * samplesPerV);
    let sumRe = 0;
    let sumIm = 0;
    for (let j = 0; j < weights.length; j++) {
      sumRe += weights[j] * lineRe[indices[j]];
      sumIm += weights[j] * lineIm[indices[j]];
    }
    value.re = sumRe;
    value.im = sumIm;
    return value;
  };
  return (u) => {
    lineRe.fill(0);
    lineIm.fill(0);
    const { weights, indices } = alongU(u * samplesPerU);
    for (let i = 0; i < weights.length; i++) {
      const weight = weights[i];
      const column = indices[i] * rows;
      for (let n = 0; n < rows; n++) {
        lineRe[n] += weight * re[column + n];
        lineIm[n] += weight * im[column + n];
      }
    }
    return alongLine;
  };
}

interface Axes {
  readonly samplesPerU: number;
  readonly samplesPerV: number;
  alongU(position: number): AxisWeights;
  alongV(position: number): AxisWeights;
}

function axes({ grid, periodU, columns, rows }: ApertureSpectrum, wavenumber: number): Axes {
  return {
    alongU: axisWeigher({ size: columns, cells: grid.columnCount, period: periodU, staggered: grid.stagger !== 'none' }),
    alongV: axisWeigher({ size: rows, cells: grid.rowCount, period: rows, staggered: false }),
    samplesPerU: (wavenumber * grid.stepXM * periodU) / (2 * Math.PI),
    samplesPerV: (wavenumber * grid.stepYM * rows) / (2 * Math.PI),
  };
}

function axisWeigher(axis: { size: number; cells: number; period: number; staggered: boolean }): (position: number) => AxisWeights {
  const { size, cells, period, staggered } = axis;
  // Half a step more width where rows are staggered.
  const fineness = period / (cells + (staggered ? 0.5 : 0));
  const betaPerTap = Math.PI * (1 - 1 / fineness);
  const half = Math.min(MOST_HALF_TAPS, Math.ceil(ENOUGH / betaPerTap));
  const beta = betaPerTap * half;
  // One period on, the centred phase has turned by -pi (cells - 1); over the two periods of a staggered lattice by a whole turn.
  const flips = !staggered && cells % 2 === 0;
  const weights = new Float64Array(2 * half);
  const indices = new Int32Array(2 * half);
  const result = { weights, indices };
  return (position) => {
    const first = Math.floor(position) - half + 1;
    const fraction = position - Math.floor(position);
    // sinc(x) = sin(pi x) / (pi x), and sin(pi (fraction + integer)) only changes sign.
    const sine = Math.sin(Math.PI * fraction) / Math.PI;
    for (let i = 0; i < weights.length; i++) {
      const x = fraction - (i - half + 1);
      const t = x / half;
      const sinc = Math.abs(x) < 1e-9 ? 1 : ((i - half + 1) % 2 === 0 ? sine : -sine) / x;
      const sample = first + i;
      const periods = Math.floor(sample / size);
      const sign = flips && periods % 2 !== 0 ? -1 : 1;
      weights[i] = sign * sinc * Math.exp(beta * (Math.sqrt(Math.max(0, 1 - t * t)) - 1));
      indices[i] = sample - periods * size;
    }
    return result;
  };
}
