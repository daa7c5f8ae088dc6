import { largestLane, powerOf } from './lanes';
import { columnTransform } from './line-transform';
import { PlaneJob } from './plane-job';

/*
 * Columns transformed, and while a block is still near: |F|^2, its weighted sum (the radiated power, with the transform of
 * the hemisphere's kernel as weights), its peak, and its decibels. The spectrum itself is not kept.
 *   first: weights of the grid in f32, row-major; map: decibels; result: peak, sum, index of the peak, all running on.
 */
function patternColumns<T>(job: PlaneJob, from: i32, to: i32): void {
  const size = job.crossPlan.size, width = <usize>job.linePlan.size * 4, block = job.block, plane = <usize>size * block;
  const lanes = <i32>(block / sizeof<T>());
  const re = job.scratch + 4 * plane, im = re + plane;
  let best = load<f64>(job.result), index = load<i32>(job.result, 16);
  let total = f64x2.splat(0);
  for (let column = from; column < to; column += lanes) {
    const at = <usize>column * sizeof<T>();
    columnTransform<T>(job.crossPlan, job.midRe + at, job.midIm + at, job.midApart, job.lineCount, re, im, block, block, job.scratch);
    let largest = f32x4.splat(0), offset: usize = 0, place = <usize>column * 4, inRow = 0;
    for (let i = 0; i < size * lanes; i += 4) {
      const weight = v128.load(job.first + place);
      let power: v128;
      if (sizeof<T>() === 8) {
        const low = powerOf<f64>(v128.load(re + offset), v128.load(im + offset));
        const high = powerOf<f64>(v128.load(re + offset, 16), v128.load(im + offset, 16));
        total = f64x2.add(total, f64x2.mul(low, f64x2.promote_low_f32x4(weight)));
        total = f64x2.add(total, f64x2.mul(high, f64x2.promote_low_f32x4(v128.shuffle<f64>(weight, weight, 1, 1))));
        power = v128.shuffle<f64>(f32x4.demote_f64x2_zero(low), f32x4.demote_f64x2_zero(high), 0, 2);
        offset += 32;
      } else {
        power = powerOf<f32>(v128.load(re + offset), v128.load(im + offset));
        const weighed = f32x4.mul(power, weight);
        total = f64x2.add(total, f64x2.add(f64x2.promote_low_f32x4(weighed), f64x2.promote_low_f32x4(v128.shuffle<f64>(weighed, weighed, 1, 1))));
        offset += 16;
      }
      largest = f32x4.pmax(largest, power);
      v128.store(job.map + place, decibels(f32x4.add(power, f32x4.splat(1e-30))));
      inRow += 4;
      place += 16;
      if (inRow === lanes) {
        inRow = 0;
        place += width - <usize>lanes * 4;
      }
    }
    const peak = largestLane<f32>(largest);
    if (peak > best) {
      best = peak;
      const found = firstAtLeast<T>(re, im, <f32>peak, size * lanes);
      index = (found / lanes) * job.linePlan.size + column + (found % lanes);
    }
  }
  store<f64>(job.result, best);
  store<f64>(job.result, load<f64>(job.result, 8) + f64x2.extract_lane(total, 0) + f64x2.extract_lane(total, 1), 8);
  store<i32>(job.result, index, 16);
}

/** First place of a block whose power, rounded to f32 as in the comparison, reaches the peak. */
function firstAtLeast<T>(re: usize, im: usize, peak: f32, count: i32): i32 {
  for (let i = 0; i < count; i++) {
    const a = load<T>(re + <usize>i * sizeof<T>()), b = load<T>(im + <usize>i * sizeof<T>());
    if (<f32>(a * a + b * b) >= peak) return i;
  }
  return 0;
}

/**
 * 10 log10 of four positive normal f32: the exponent out of the bits, and log2(1 + t) of the mantissa by a polynomial of
 * degree eight without constant term, whose error is below 1e-6 dB.
 */
function decibels(power: v128): v128 {
  const exponent = f32x4.convert_i32x4_s(i32x4.sub(i32x4.shr_s(power, 23), i32x4.splat(127)));
  const t = f32x4.sub(v128.or(v128.and(power, i32x4.splat(0x7fffff)), i32x4.splat(0x3f800000)), f32x4.splat(1));
  let sum = f32x4.add(f32x4.mul(t, f32x4.splat(-0.012370643450611066)), f32x4.splat(0.06378759832081221));
  sum = f32x4.add(f32x4.mul(sum, t), f32x4.splat(-0.15559997152919353));
  sum = f32x4.add(f32x4.mul(sum, t), f32x4.splat(0.25617970717880856));
  sum = f32x4.add(f32x4.mul(sum, t), f32x4.splat(-0.35345468446382583));
  sum = f32x4.add(f32x4.mul(sum, t), f32x4.splat(0.4800737494207222));
  sum = f32x4.add(f32x4.mul(sum, t), f32x4.splat(-0.721310722866912));
  sum = f32x4.add(f32x4.mul(sum, t), f32x4.splat(1.442694767091754));
  return f32x4.mul(f32x4.add(f32x4.mul(sum, t), exponent), f32x4.splat(3.010299956639812));
}

export function patternColumns64(job: PlaneJob, from: i32, to: i32): void {
  patternColumns<f64>(job, from, to);
}

export function patternColumns32(job: PlaneJob, from: i32, to: i32): void {
  patternColumns<f32>(job, from, to);
}
