import type { PatternStep, PatternStepQuery } from '../../../shared/math/fourier-engine';
import type { KernelInstance } from './kernel-instance';
import { PlaneJob } from './plane-job';

const FEWEST_SAMPLES = 16;
/** f64 peak, f64 total, i32 place. */
const RESULT_BYTES = 24;

/** The pattern step with its weights and its map in the memory of the instance. */
export function createPatternStep(instance: KernelInstance, query: PatternStepQuery): Omit<PatternStep, 'release'> {
  const { columnCount, rowCount, columns, rows, precision } = query;
  if (Math.min(columns, rows) < FEWEST_SAMPLES) {
    throw new RangeError(`a pattern step needs at least ${FEWEST_SAMPLES} samples along each side; got ${columns} by ${rows}`);
  }
  const job = new PlaneJob(instance, { lineCells: columnCount, lineCount: rowCount, lineSize: columns, crossSize: rows, precision });
  const map = instance.take(4 * columns * rows);
  const result = instance.take(RESULT_BYTES);
  job.set({ first: writeWeights(instance, query), map, result });
  const summary = instance.doubles(result, 2);
  const place = instance.integers(result + 16, 1);
  const { exports } = instance;
  const [transformLines, patternColumns] = precision === 64 ? [exports.transformLines64, exports.patternColumns64] : [exports.transformLines32, exports.patternColumns32];
  return {
    powerDb: instance.floats(map, columns * rows),
    run: (re, im) => {
      job.fillCells(re, im);
      summary.fill(0);
      place[0] = 0;
      transformLines(job.place, 0, rowCount);
      patternColumns(job.place, 0, columns);
      const [peak, total] = summary;
      return { peak, peakSample: (place[0] % columns) * rows + Math.floor(place[0] / columns), total };
    },
  };
}

/** Row after row, as the map is written. */
function writeWeights(instance: KernelInstance, { columns, rows, weights }: PatternStepQuery): number {
  const place = instance.take(4 * columns * rows);
  const written = instance.floats(place, columns * rows);
  for (let m = 0; m < columns; m++) for (let n = 0; n < rows; n++) written[n * columns + m] = weights[m * rows + n];
  return place;
}
