import { rootMeanSquare } from '../../../../shared/math/statistics';
import { SAMPLE_PHASE } from './sample-phase';
import { selectionStatistics } from './selection-statistics';

describe('statistics of a selection', () => {
  const everything = Int32Array.from({ length: 400 }, (_, i) => i);
  it('of all cells agree with the figure of the prediction', () => {
    const found = selectionStatistics(SAMPLE_PHASE, everything);
    expect(found?.count).toBe(400);
    expect(found?.rmsDeg).toBeCloseTo(SAMPLE_PHASE.head.figures.phaseErrorRmsDeg as number, 3);
  });
  it('of some cells are those of their errors alone', () => {
    const some = [3, 77, 210];
    const own = some.map((cell) => SAMPLE_PHASE.cells.errorDeg[cell]);
    const found = selectionStatistics(SAMPLE_PHASE, some);
    expect(found?.rmsDeg).toBeCloseTo(rootMeanSquare(own), 9);
    expect(found?.meanDeg).toBeCloseTo(own.reduce((a, b) => a + b) / 3, 9);
    expect(Math.abs(found?.largestDeg ?? 0)).toBe(Math.max(...own.map(Math.abs)));
  });
  it('of no cells do not exist', () => {
    expect(selectionStatistics(SAMPLE_PHASE, [])).toBeNull();
  });
});
