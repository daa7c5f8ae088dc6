/**
 * A discrete Fourier transform of one fixed size on split planes (real parts and imaginary parts apart).
 * The engine asks for nothing more, so another kernel can take the place of {@link radixFourTransform}.
 */
export interface FourierTransform {
  readonly size: number;
  /**
   * Replaces x_n by the sum over n of x_n exp(+j 2 pi n m / size), unscaled. The sign is the one of the radiated
   * pattern, exp(+j k r.u). Swapping the two arguments gives the transform with exp(-j ...).
   */
  transform(re: Float64Array, im: Float64Array): void;
}

/** Makes a transform of a given size; sizes are powers of two. */
export type FourierTransformFactory = (size: number) => FourierTransform;

interface Stage {
  readonly radix: 2 | 4;
  /** Length of the transforms still to do, and how many are interleaved. */
  readonly length: number;
  readonly stride: number;
}

const plans = new Map<number, FourierTransform>();

/** Smallest power of two that is at least `count`. */
export function nextPowerOfTwo(count: number): number {
  let size = 1;
  while (size < count) size *= 2;
  return size;
}

/**
 * Stockham's self-sorting transform, radix four with one radix-two stage where the exponent is odd
 * (C. Van Loan, Computational Frameworks for the Fast Fourier Transform, 1992, section 1.7; from memory).
 * Sizes are powers of two. Plans are kept: a transform of a size holds its scratch planes and is not re-entrant.
 */
export const radixFourTransform: FourierTransformFactory = (size) => {
  const known = plans.get(size);
  if (known) return known;
  if (size < 1 || !Number.isInteger(size) || (size & (size - 1)) !== 0) {
    throw new RangeError(`a transform needs a power of two as its size; got ${size}`);
  }
  const plan = planTransform(size);
  plans.set(size, plan);
  return plan;
};

function planTransform(size: number): FourierTransform {
  const stages = stagesOf(size);
  const cosines = new Float64Array(size);
  const sines = new Float64Array(size);
  for (let i = 0; i < size; i++) {
    cosines[i] = Math.cos((2 * Math.PI * i) / size);
    sines[i] = Math.sin((2 * Math.PI * i) / size);
  }
  const scratchRe = new Float64Array(size);
  const scratchIm = new Float64Array(size);
  const transform = (re: Float64Array, im: Float64Array): void => {
    let from: Planes = { re, im };
    let to: Planes = { re: scratchRe, im: scratchIm };
    for (const stage of stages) {
      if (stage.radix === 4) radixFourStage(stage, from, to, { cosines, sines });
      else radixTwoStage(stage, from, to);
      [from, to] = [to, from];
    }
    if (from.re !== re) {
      re.set(scratchRe);
      im.set(scratchIm);
    }
  };
  return { size, transform };
}

function stagesOf(size: number): Stage[] {
  const stages: Stage[] = [];
  let length = size;
  let stride = 1;
  while (length >= 4) {
    stages.push({ radix: 4, length, stride });
    length /= 4;
    stride *= 4;
  }
  if (length === 2) stages.push({ radix: 2, length, stride });
  return stages;
}

interface Planes {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

function radixFourStage(stage: Stage, from: Planes, to: Planes, table: { cosines: Float64Array; sines: Float64Array }): void {
  const { length, stride } = stage;
  const quarter = length / 4;
  const block = quarter * stride;
  const { re: xr, im: xi } = from;
  const { re: yr, im: yi } = to;
  for (let p = 0; p < quarter; p++) {
    const c1 = table.cosines[p * stride];
    const s1 = table.sines[p * stride];
    const c2 = table.cosines[2 * p * stride];
    const s2 = table.sines[2 * p * stride];
    const c3 = table.cosines[3 * p * stride];
    const s3 = table.sines[3 * p * stride];
    let a = p * stride;
    let o = 4 * p * stride;
    for (let q = 0; q < stride; q++, a++, o++) {
      const b = a + block;
      const c = b + block;
      const d = c + block;
      const sumAcRe = xr[a] + xr[c];
      const sumAcIm = xi[a] + xi[c];
      const difAcRe = xr[a] - xr[c];
      const difAcIm = xi[a] - xi[c];
      const sumBdRe = xr[b] + xr[d];
      const sumBdIm = xi[b] + xi[d];
      const difBdRe = xr[b] - xr[d];
      const difBdIm = xi[b] - xi[d];
      yr[o] = sumAcRe + sumBdRe;
      yi[o] = sumAcIm + sumBdIm;
      const e1r = difAcRe - difBdIm;
      const e1i = difAcIm + difBdRe;
      yr[o + stride] = e1r * c1 - e1i * s1;
      yi[o + stride] = e1r * s1 + e1i * c1;
      const e2r = sumAcRe - sumBdRe;
      const e2i = sumAcIm - sumBdIm;
      yr[o + 2 * stride] = e2r * c2 - e2i * s2;
      yi[o + 2 * stride] = e2r * s2 + e2i * c2;
      const e3r = difAcRe + difBdIm;
      const e3i = difAcIm - difBdRe;
      yr[o + 3 * stride] = e3r * c3 - e3i * s3;
      yi[o + 3 * stride] = e3r * s3 + e3i * c3;
    }
  }
}

function radixTwoStage(stage: Stage, from: Planes, to: Planes): void {
  const { stride } = stage;
  for (let q = 0; q < stride; q++) {
    to.re[q] = from.re[q] + from.re[q + stride];
    to.im[q] = from.im[q] + from.im[q + stride];
    to.re[q + stride] = from.re[q] - from.re[q + stride];
    to.im[q + stride] = from.im[q] - from.im[q + stride];
  }
}
