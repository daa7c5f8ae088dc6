import type { AlternatingProjections, ComplexSamples, ProjectionQuery } from '../../../shared/math/fourier-engine';
import type { KernelInstance } from './kernel-instance';
import { PlaneJob } from './plane-job';
import type { TransformPlans } from './transform-plan';

/**
 * Alternating projections; between calls the cells live outside the kernel, so that what is begun and forgotten holds no
 * memory of the instance. Copying bounds and cells in and out costs about as much as a round.
 */
export function createProjections(instance: KernelInstance, plans: TransformPlans, query: ProjectionQuery): AlternatingProjections {
  let cells: ComplexSamples = { re: query.re.slice(), im: query.im.slice() };
  return {
    run: (rounds) => {
      if (rounds > 0) cells = projected(instance, plans, { ...query, ...cells }, rounds);
    },
    cells: () => ({ re: cells.re.slice(), im: cells.im.slice() }),
  };
}

function projected(instance: KernelInstance, plans: TransformPlans, query: ProjectionQuery, rounds: number): ComplexSamples {
  const { columnCount, rowCount, columns, rows, precision } = query;
  const chosen = plans.of(columns, rows, precision);
  const mark = instance.mark();
  const job = new PlaneJob(instance, { lineCells: columnCount, lineCount: rowCount, lineSize: columns, crossSize: rows, precision }, chosen);
  const lower = writeBounds(job, query.lower);
  // One array for both where they are equal: it is read once from the cache.
  const upper = query.upper === query.lower ? lower : writeBounds(job, query.upper);
  job.set({ first: lower, second: upper, amplitudes: writeAmplitudes(instance, job, query) });
  job.fillCells(query.re, query.im);
  const { exports } = instance;
  const [transformLines, projectColumns, projectLines] =
    precision === 64
      ? [exports.transformLines64, exports.projectColumns64, exports.projectLines64]
      : [exports.transformLines32, exports.projectColumns32, exports.projectLines32];
  for (let i = 0; i < rounds; i++) {
    transformLines(job.place, 0, rowCount);
    projectColumns(job.place, 0, columns);
    projectLines(job.place, 0, rowCount);
  }
  const inOrder = (numbers: ArrayLike<number>): Float64Array =>
    Float64Array.from({ length: columnCount * rowCount }, (_, i) => numbers[Math.floor(i / columnCount) * job.cellsApart + (i % columnCount)]);
  const cells = { re: inOrder(job.cellsRe), im: inOrder(job.cellsIm) };
  instance.release(mark);
  return cells;
}

function writeBounds(job: PlaneJob, bounds: Float64Array): number {
  const { lineSize, crossSize } = job.shape;
  const { place, numbers } = job.takeSamples();
  for (let m = 0; m < lineSize; m++) for (let n = 0; n < crossSize; n++) numbers[job.blockedPlace(m, n)] = bounds[m * crossSize + n];
  return place;
}

/** Zero in the padding, which keeps the cells there zero. */
function writeAmplitudes(instance: KernelInstance, job: PlaneJob, { columnCount, rowCount, amplitude, precision }: ProjectionQuery): number {
  const place = instance.take((job.cellsApart * rowCount * precision) / 8);
  const numbers = instance.numbers(place, job.cellsApart * rowCount, precision);
  numbers.fill(0);
  for (let r = 0; r < rowCount; r++) for (let c = 0; c < columnCount; c++) numbers[r * job.cellsApart + c] = amplitude[r * columnCount + c];
  return place;
}
