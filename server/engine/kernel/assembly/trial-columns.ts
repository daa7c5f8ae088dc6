import { add, largestLane, powerOf } from './lanes';
import { columnTransform } from './line-transform';
import { PlaneJob } from './plane-job';

/*
 * Columns of one trial, its powers added to the running sums and held against the running largest.
 *   first, second: sum and largest of |F|^2 in T, block by block as the samples stand in it. Gives the trial's peak.
 */
function accumulateColumns<T>(job: PlaneJob): f64 {
  const size = job.crossPlan.size, block = job.block, plane = <usize>size * block;
  const re = job.scratch + 4 * plane, im = re + plane, end = <usize>job.linePlan.size * sizeof<T>();
  let largest = f64x2.splat(0), sums = job.first, tops = job.second;
  for (let column: usize = 0; column < end; column += block) {
    columnTransform<T>(job.crossPlan, job.midRe + column, job.midIm + column, job.midApart, job.lineCount, re, im, block, block, job.scratch);
    for (let i: usize = 0; i < plane; i += 16) {
      const power = powerOf<T>(v128.load(re + i), v128.load(im + i));
      v128.store(sums + i, add<T>(v128.load(sums + i), power));
      v128.store(tops + i, v128.pmax<T>(v128.load(tops + i), power));
      largest = v128.pmax<T>(largest, power);
    }
    sums += plane;
    tops += plane;
  }
  return largestLane<T>(largest);
}

export function accumulateColumns64(job: PlaneJob): f64 {
  return accumulateColumns<f64>(job);
}

export function accumulateColumns32(job: PlaneJob): f64 {
  return accumulateColumns<f32>(job);
}
