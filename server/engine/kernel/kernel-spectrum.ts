import type { ComplexSamples, SpectrumQuery } from '../../../shared/math/fourier-engine';
import type { KernelInstance } from './kernel-instance';
import { PlaneJob } from './plane-job';
import type { TransformPlans } from './transform-plan';

/** Columns of the grid that are transformed before they are copied out: their rows then fill whole lines of the cache. */
const COPIED_COLUMNS = 64;

/** Makes spectra in the memory of one instance; only the plans of the sizes seen stay there. */
export function createSpectrumMaker(instance: KernelInstance, plans: TransformPlans): (query: SpectrumQuery) => ComplexSamples {
  return (query) => {
    // Columns of the panel are the kernel's lines, so that the samples of one column of the spectrum neighbour.
    const chosen = plans.of(query.rows, query.columns, 64);
    const mark = instance.mark();
    const shape = { lineCells: query.rowCount, lineCount: query.columnCount, lineSize: query.rows, crossSize: query.columns, precision: 64 as const };
    const job = new PlaneJob(instance, shape, chosen);
    job.set({ lineTurns: originTurns(instance, query.originRow, query.rows), crossTurns: originTurns(instance, query.originColumn, query.columns) });
    fillColumns(job, query);
    instance.exports.transformLines64(job.place, 0, query.columnCount);
    const samples = copiedColumns(instance, job);
    instance.release(mark);
    return samples;
  };
}

/** Columns of cells, each without gaps. */
function fillColumns({ cellsRe, cellsIm, cellsApart }: PlaneJob, { columnCount, rowCount, re, im }: SpectrumQuery): void {
  for (let r = 0; r < rowCount; r++) {
    for (let c = 0; c < columnCount; c++) {
      cellsRe[c * cellsApart + r] = re[r * columnCount + c];
      cellsIm[c * cellsApart + r] = im[r * columnCount + c];
    }
  }
}

/** exp(-j 2 pi origin i / size), cosines then sines; 0, for no turns, where the origin is the first cell. */
function originTurns(instance: KernelInstance, origin: number, size: number): number {
  if (origin === 0) return 0;
  const place = instance.take(2 * 8 * size);
  const turns = instance.doubles(place, 2 * size);
  const step = (-2 * Math.PI * origin) / size;
  for (let i = 0; i < size; i++) {
    turns[i] = Math.cos(step * i);
    turns[size + i] = Math.sin(step * i);
  }
  return place;
}

function copiedColumns(instance: KernelInstance, job: PlaneJob): ComplexSamples {
  const { lineSize, crossSize } = job.shape;
  const width = Math.min(COPIED_COLUMNS, lineSize);
  const plane = 8 * width * crossSize;
  const outRe = instance.take(2 * plane);
  job.set({ outRe, outIm: outRe + plane, outApart: 8 * width });
  const re = new Float64Array(lineSize * crossSize);
  const im = new Float64Array(lineSize * crossSize);
  const stageRe = instance.doubles(outRe, width * crossSize);
  const stageIm = instance.doubles(outRe + plane, width * crossSize);
  for (let from = 0; from < lineSize; from += width) {
    instance.exports.transformColumns64(job.place, from, from + width);
    for (let row = 0; row < crossSize; row++) {
      const to = row * lineSize + from;
      const stage = row * width;
      for (let i = 0; i < width; i++) {
        re[to + i] = stageRe[stage + i];
        im[to + i] = stageIm[stage + i];
      }
    }
  }
  return { re, im };
}
