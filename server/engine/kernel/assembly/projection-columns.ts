import { add, mul, powerOf } from './lanes';
import { columnTransform, lineTransform } from './line-transform';
import { PlaneJob } from './plane-job';

/** Keeps a division by the size of nothing finite; far below any field. */
const TINY = 1e-30;

/*
 * Half a round of alternating projections, block after block of columns: across the lines into the pattern, every sample's
 * size brought within its bounds with its phase kept, back across the lines, and only the lines that hold cells written.
 *   first, second: lower and upper bound of |F| in T, block by block as the samples stand in it.
 */
function projectColumns<T>(job: PlaneJob, from: i32, to: i32): void {
  const size = job.crossPlan.size, block = job.block, plane = <usize>size * block;
  const re = job.scratch + 4 * plane, im = re + plane;
  const tiny = v128.splat<T>(<T>TINY);
  const firstByte = <usize>from * sizeof<T>(), endByte = <usize>to * sizeof<T>();
  for (let column = firstByte; column < endByte; column += block) {
    columnTransform<T>(job.crossPlan, job.midRe + column, job.midIm + column, job.midApart, job.lineCount, re, im, block, block, job.scratch);
    const bounds = column * size;
    for (let i: usize = 0; i < plane; i += 16) {
      const a = v128.load(re + i), b = v128.load(im + i);
      const length = v128.sqrt<T>(add<T>(powerOf<T>(a, b), tiny));
      const wanted = v128.pmin<T>(v128.load(job.second + bounds + i), v128.pmax<T>(v128.load(job.first + bounds + i), length));
      const share = v128.div<T>(wanted, length);
      v128.store(re + i, mul<T>(a, share));
      v128.store(im + i, mul<T>(b, share));
    }
    // Real and imaginary parts exchanged: the transform with exp(-j ...), back from the pattern.
    columnTransform<T>(job.crossPlan, im, re, block, size, im, re, block, block, job.scratch);
    let fromRe = re, fromIm = im, toRe = job.midRe + column, toIm = job.midIm + column;
    for (let line = 0; line < job.lineCount; line++) {
      for (let l: usize = 0; l < block; l += 16) {
        v128.store(toRe + l, v128.load(fromRe + l));
        v128.store(toIm + l, v128.load(fromIm + l));
      }
      fromRe += block;
      fromIm += block;
      toRe += job.midApart;
      toIm += job.midApart;
    }
  }
}

/** The other half: lines `from` to `to` - 1 back along themselves, and every cell brought to its amplitude with its phase kept. */
function projectLines<T>(job: PlaneJob, from: i32, to: i32): void {
  const plane = <usize>job.linePlan.size * sizeof<T>(), bytes = <usize>job.lineCells * sizeof<T>();
  const re = job.scratch + 4 * plane, im = re + plane;
  const tiny = v128.splat<T>(<T>TINY);
  for (let line = from; line < to; line++) {
    const mid = <usize>line * job.midApart, cells = <usize>line * job.cellsApart;
    lineTransform<T>(job.linePlan, job.midIm + mid, job.midRe + mid, job.linePlan.size, im, re, job.scratch);
    // The last vector may reach beyond the cells, where the amplitudes are zero and so are the cells.
    for (let l: usize = 0; l < bytes; l += 16) {
      const a = v128.load(re + l), b = v128.load(im + l);
      const share = v128.div<T>(v128.load(job.amplitudes + cells + l), v128.sqrt<T>(add<T>(powerOf<T>(a, b), tiny)));
      v128.store(job.cellsRe + cells + l, mul<T>(a, share));
      v128.store(job.cellsIm + cells + l, mul<T>(b, share));
    }
  }
}

export function projectColumns64(job: PlaneJob, from: i32, to: i32): void {
  projectColumns<f64>(job, from, to);
}

export function projectColumns32(job: PlaneJob, from: i32, to: i32): void {
  projectColumns<f32>(job, from, to);
}

export function projectLines64(job: PlaneJob, from: i32, to: i32): void {
  projectLines<f64>(job, from, to);
}

export function projectLines32(job: PlaneJob, from: i32, to: i32): void {
  projectLines<f32>(job, from, to);
}
