import type { PowerTrials, TrialQuery } from '../../../shared/math/fourier-engine';
import type { KernelInstance } from './kernel-instance';
import { PlaneJob } from './plane-job';

/** Sums of |F|^2 over trials, kept in the memory of the instance. */
export function createTrials(instance: KernelInstance, query: TrialQuery): Omit<PowerTrials, 'release'> {
  const { columnCount, rowCount, columns, rows, precision } = query;
  const job = new PlaneJob(instance, { lineCells: columnCount, lineCount: rowCount, lineSize: columns, crossSize: rows, precision });
  const sum = job.takeSamples();
  const largest = job.takeSamples();
  job.set({ first: sum.place, second: largest.place });
  const { exports } = instance;
  const [transformLines, accumulate] = precision === 64 ? [exports.transformLines64, exports.accumulateColumns64] : [exports.transformLines32, exports.accumulateColumns32];
  const inOrder = (numbers: ArrayLike<number>): Float64Array => {
    const samples = new Float64Array(columns * rows);
    for (let m = 0; m < columns; m++) for (let n = 0; n < rows; n++) samples[m * rows + n] = numbers[job.blockedPlace(m, n)];
    return samples;
  };
  return {
    add: (re, im) => {
      job.fillCells(re, im);
      transformLines(job.place, 0, rowCount);
      return accumulate(job.place);
    },
    sum: () => inOrder(sum.numbers),
    largest: () => inOrder(largest.numbers),
  };
}
