import type { LatticeSumQuery, LatticeSums } from '../../../shared/math/fourier-engine';
import type { KernelInstance } from './kernel-instance';

/** Numbers that the kernel takes for each direction, and how many directions it sums side by side. */
const NUMBERS = 5;
const SIDE_BY_SIDE = 4;

export function createLatticeSums(instance: KernelInstance): (query: LatticeSumQuery) => LatticeSums {
  return (query) => {
    const mark = instance.mark();
    const { columnCount, rowCount, stepXRad } = query;
    const count = Math.ceil(stepXRad.length / SIDE_BY_SIDE) * SIDE_BY_SIDE;
    const cells = writePairs(instance, query);
    const { table, flips } = writeDirections(instance, query, count);
    const out = instance.take(8 * 4 * count);
    instance.exports.latticeSums(cells.plain, cells.alternating, columnCount, rowCount, table, flips, out, count);
    const sums = joinedSums(instance.doubles(out, 4 * count), stepXRad.length);
    instance.release(mark);
    return sums;
  };
}

/** Pairs (re, im), and the same with every odd column negated. */
function writePairs(instance: KernelInstance, { columnCount, rowCount, re, im }: LatticeSumQuery): { plain: number; alternating: number } {
  const length = 2 * columnCount * rowCount;
  const plain = instance.take(8 * length);
  const alternating = instance.take(8 * length);
  const pairs = instance.doubles(plain, length);
  const turned = instance.doubles(alternating, length);
  for (let i = 0; i < re.length; i++) {
    const sign = (i % columnCount) % 2 === 0 ? 1 : -1;
    pairs[2 * i] = re[i];
    pairs[2 * i + 1] = im[i];
    turned[2 * i] = sign * re[i];
    turned[2 * i + 1] = sign * im[i];
  }
  return { plain, alternating };
}

/** The last direction again where the number is not a multiple of those done side by side. */
function writeDirections(instance: KernelInstance, { stepXRad, stepYRad }: LatticeSumQuery, count: number): { table: number; flips: number } {
  const table = instance.take(8 * NUMBERS * count);
  const flips = instance.take(4 * count);
  const numbers = instance.doubles(table, NUMBERS * count);
  const flipped = instance.integers(flips, count);
  for (let k = 0; k < count; k++) {
    const i = Math.min(k, stepXRad.length - 1);
    const isFlipped = Math.cos(stepXRad[i]) < 0;
    const x = isFlipped ? stepXRad[i] + Math.PI : stepXRad[i];
    // 1 - cos as 2 sin^2 of the half: the difference itself would lose what small steps hold.
    const short = 2 * Math.sin(x / 2) ** 2;
    flipped[k] = isFlipped ? 1 : 0;
    numbers.set([-2 * short, short, Math.sin(x), Math.cos(stepYRad[i]), Math.sin(stepYRad[i])], NUMBERS * k);
  }
  return { table, flips };
}

/** Sums of the real and of the imaginary parts, A and B: F = A + jB, and in the opposite direction conj A + j conj B. */
function joinedSums(lanes: Float64Array, count: number): LatticeSums {
  const sums: LatticeSums = { re: new Float64Array(count), im: new Float64Array(count), oppositeRe: new Float64Array(count), oppositeIm: new Float64Array(count) };
  for (let k = 0; k < count; k++) {
    const [aRe, bRe, aIm, bIm] = lanes.subarray(4 * k, 4 * k + 4);
    sums.re[k] = aRe - bIm;
    sums.im[k] = aIm + bRe;
    sums.oppositeRe[k] = aRe + bIm;
    sums.oppositeIm[k] = bRe - aIm;
  }
  return sums;
}
