import { lastRadixEight, lastRadixFour } from './last-stages';
import { firstLineStage, radixFourStage } from './radix-four-stages';
import { quarterOf, twiddlesOf, TransformPlan } from './transform-plan';

/**
 * One line of neighbouring numbers, zero from `filled` on. `scratch` holds four planes of the size. Memory up to the next
 * quarter of the size must hold zeros.
 */
export function lineTransform<T>(plan: TransformPlan, xRe: usize, xIm: usize, filled: i32, yRe: usize, yIm: usize, scratch: usize): void {
  if (plan.lastRadix === 0) {
    writtenOutLine<T>(plan, xRe, xIm, sizeof<T>(), filled, yRe, yIm, sizeof<T>());
    return;
  }
  const plane = <usize>plan.size * sizeof<T>();
  let fromRe = scratch, fromIm = scratch + plane, toRe = scratch + 2 * plane, toIm = scratch + 3 * plane;
  firstLineStage<T>(xRe, xIm, filled, fromRe, fromIm, quarterOf(plan, 0), plan.firstTwiddles);
  let stride: usize = 4 * sizeof<T>();
  for (let stage = 1; stage < plan.stageCount; stage++) {
    const m = quarterOf(plan, stage);
    radixFourStage<T>(fromRe, fromIm, stride, 4 * m, toRe, toIm, stride, m, twiddlesOf(plan, stage));
    const re = fromRe, im = fromIm;
    fromRe = toRe;
    fromIm = toIm;
    toRe = re;
    toIm = im;
    stride *= 4;
  }
  // One unit per run: the whole run is neighbouring numbers.
  if (plan.lastRadix === 4) lastRadixFour<T>(fromRe, fromIm, plane >> 2, 1, yRe, yIm, plane >> 2);
  else lastRadixEight<T>(fromRe, fromIm, plane >> 3, 1, yRe, yIm, plane >> 3);
}

/**
 * A block of neighbouring columns, `block` bytes wide, of rows `apart` bytes from one another, zero from row `filled` on.
 * `scratch` holds four planes of size times block.
 */
export function columnTransform<T>(plan: TransformPlan, xRe: usize, xIm: usize, apart: usize, filled: i32, yRe: usize, yIm: usize, yApart: usize, block: usize, scratch: usize): void {
  if (plan.lastRadix === 0) {
    for (let l: usize = 0; l < block; l += sizeof<T>()) writtenOutLine<T>(plan, xRe + l, xIm + l, apart, filled, yRe + l, yIm + l, yApart);
    return;
  }
  const plane = <usize>plan.size * block;
  let fromRe = scratch, fromIm = scratch + plane, toRe = scratch + 2 * plane, toIm = scratch + 3 * plane;
  radixFourStage<T>(xRe, xIm, apart, filled, fromRe, fromIm, block, quarterOf(plan, 0), twiddlesOf(plan, 0));
  let stride = 4 * block;
  for (let stage = 1; stage < plan.stageCount; stage++) {
    const m = quarterOf(plan, stage);
    radixFourStage<T>(fromRe, fromIm, stride, 4 * m, toRe, toIm, stride, m, twiddlesOf(plan, stage));
    const re = fromRe, im = fromIm;
    fromRe = toRe;
    fromIm = toIm;
    toRe = re;
    toIm = im;
    stride *= 4;
  }
  if (plan.lastRadix === 4) lastRadixFour<T>(fromRe, fromIm, block, plan.size >> 2, yRe, yIm, yApart);
  else lastRadixEight<T>(fromRe, fromIm, block, plan.size >> 3, yRe, yIm, yApart);
}

/** Sizes below 16 by the sum as it is defined; at most 8 by 8 products. y must not be x. */
function writtenOutLine<T>(plan: TransformPlan, xRe: usize, xIm: usize, apart: usize, filled: i32, yRe: usize, yIm: usize, yApart: usize): void {
  const size = plan.size, cosines = plan.firstTwiddles, sines = cosines + <usize>size * sizeof<T>();
  for (let k = 0; k < size; k++) {
    let sumRe = <T>0, sumIm = <T>0;
    for (let n = 0; n < filled; n++) {
      const turn = <usize>((k * n) & (size - 1)) * sizeof<T>();
      const c = load<T>(cosines + turn), s = load<T>(sines + turn), a = load<T>(xRe + <usize>n * apart), b = load<T>(xIm + <usize>n * apart);
      sumRe += a * c - b * s;
      sumIm += a * s + b * c;
    }
    store<T>(yRe + <usize>k * yApart, sumRe);
    store<T>(yIm + <usize>k * yApart, sumIm);
  }
}
