import { TransformPlan } from './transform-plan';

/**
 * One piece of work on a rectangle of cells inside a larger grid of samples, filled in by ../plane-job.ts, field by field
 * in this order. Lines of cells are transformed along themselves first, then block after block across the lines.
 */
@unmanaged
export class PlaneJob {
  linePlan: TransformPlan;
  crossPlan: TransformPlan;
  /** Cells in a line, and lines of cells. */
  lineCells: i32;
  lineCount: i32;
  /** Lines of cells, zero up to the next quarter of the grid. */
  cellsRe: usize;
  cellsIm: usize;
  cellsApart: usize;
  /** Lines transformed along themselves. */
  midRe: usize;
  midIm: usize;
  midApart: usize;
  /** Where transformed blocks go, a row for each sample across, from the block's own column on. */
  outRe: usize;
  outIm: usize;
  outApart: usize;
  /** Bytes of a block of columns. */
  block: usize;
  /** Six planes of a block. */
  scratch: usize;
  /** Cosines, then sines, that turn every line's samples; 0 for none. */
  lineTurns: usize;
  /** The same across the lines. */
  crossTurns: usize;
  /** Per block and place in it, one after another: weights, bounds, sums; each kernel says which. */
  first: usize;
  second: usize;
  /** Row-major over the grid in f32, without padding. */
  map: usize;
  /** Amplitudes of the cells in T, laid out as the cells are. */
  amplitudes: usize;
  /** f64 peak, f64 total, i32 index of the peak. */
  result: usize;
}
