import { storeProduct } from './lanes';
import { columnTransform, lineTransform } from './line-transform';
import { PlaneJob } from './plane-job';

/** Lines `from` to `to` - 1 along themselves. */
function transformLines<T>(job: PlaneJob, from: i32, to: i32): void {
  const bytes = <usize>job.linePlan.size * sizeof<T>();
  for (let line = from; line < to; line++) {
    const cells = <usize>line * job.cellsApart, mid = <usize>line * job.midApart;
    lineTransform<T>(job.linePlan, job.cellsRe + cells, job.cellsIm + cells, job.lineCells, job.midRe + mid, job.midIm + mid, job.scratch);
    if (job.lineTurns !== 0) turnLine<T>(job.midRe + mid, job.midIm + mid, job.lineTurns, bytes);
  }
}

function turnLine<T>(re: usize, im: usize, turns: usize, bytes: usize): void {
  // Lines shorter than a vector are padded to one.
  for (let l: usize = 0; l < bytes; l += 16) {
    const a = v128.load(re + l), b = v128.load(im + l), c = v128.load(turns + l), s = v128.load(turns + bytes + l);
    storeProduct<T>(re + l, im + l, a, b, c, s);
  }
}

/** Columns `from` to `to` - 1, whole blocks, across the lines; the first of them goes to the start of `out`. */
function transformColumns<T>(job: PlaneJob, from: i32, to: i32): void {
  const block = job.block, end = <usize>to * sizeof<T>();
  let out: usize = 0;
  for (let column = <usize>from * sizeof<T>(); column < end; column += block) {
    if (job.crossTurns === 0) {
      columnTransform<T>(job.crossPlan, job.midRe + column, job.midIm + column, job.midApart, job.lineCount, job.outRe + out, job.outIm + out, job.outApart, block, job.scratch);
    } else {
      turnedColumns<T>(job, column, out);
    }
    out += block;
  }
}

function turnedColumns<T>(job: PlaneJob, column: usize, out: usize): void {
  const block = job.block, size = job.crossPlan.size, plane = <usize>size * block;
  let re = job.scratch + 4 * plane, im = re + plane, toRe = job.outRe + out, toIm = job.outIm + out;
  columnTransform<T>(job.crossPlan, job.midRe + column, job.midIm + column, job.midApart, job.lineCount, re, im, block, block, job.scratch);
  const sines = <usize>size * sizeof<T>();
  for (let row = 0; row < size; row++) {
    const turn = job.crossTurns + <usize>row * sizeof<T>();
    const c = v128.load_splat<T>(turn), s = v128.load_splat<T>(turn + sines);
    for (let l: usize = 0; l < block; l += 16) {
      const a = v128.load(re + l), b = v128.load(im + l);
      storeProduct<T>(toRe + l, toIm + l, a, b, c, s);
    }
    re += block;
    im += block;
    toRe += job.outApart;
    toIm += job.outApart;
  }
}

export function transformLines64(job: PlaneJob, from: i32, to: i32): void {
  transformLines<f64>(job, from, to);
}

export function transformLines32(job: PlaneJob, from: i32, to: i32): void {
  transformLines<f32>(job, from, to);
}

export function transformColumns64(job: PlaneJob, from: i32, to: i32): void {
  transformColumns<f64>(job, from, to);
}

export function transformColumns32(job: PlaneJob, from: i32, to: i32): void {
  transformColumns<f32>(job, from, to);
}
