import { cellChoices } from '../../../../shared/antenna/cell-choices';
import { exampleDesign } from '../../../../shared/antenna/example-design';
import { placeCells } from '../../../../shared/antenna/place-cells';
import { computedPrediction } from '../computed-prediction';
import { bestCells } from './best-cells';
import { SAMPLE_DESIGN, SAMPLE_PHASE, SAMPLE_PREPARED } from './sample-phase';

describe('best cells of one position', () => {
  it.each([0, 123, 399])('are those of the whole design at position %d', (position) => {
    const whole = cellChoices(placeCells(SAMPLE_DESIGN, SAMPLE_PREPARED), position, SAMPLE_PREPARED);
    const alone = bestCells(SAMPLE_PHASE, position, SAMPLE_PREPARED);
    expect(alone.map(({ cellIndex }) => cellIndex)).toEqual(whole.map(({ cellIndex }) => cellIndex));
    // The prediction travels in single precision.
    alone.forEach(({ errorDeg }, i) => expect(errorDeg).toBeCloseTo(whole[i].errorDeg, 3));
  });
  it('are those of what cells send into the beam, by the vector model', () => {
    const design = { ...SAMPLE_DESIGN, prediction: { ...SAMPLE_DESIGN.prediction, model: 'vector' as const } };
    const prediction = computedPrediction(design, { edition: SAMPLE_PREPARED });
    const placed = placeCells(design, SAMPLE_PREPARED);
    for (const position of [7, 200]) {
      const alone = bestCells(prediction, position, SAMPLE_PREPARED);
      expect(alone[0].cellIndex).toBe(prediction.cells.cellIndex[position]);
      const whole = cellChoices(placed, position, SAMPLE_PREPARED);
      alone.forEach(({ errorDeg }, i) => expect(errorDeg).toBeCloseTo(whole[i].errorDeg, 3));
    }
  });
  it('begin with the cell that stands there', () => {
    expect(bestCells(SAMPLE_PHASE, 57, SAMPLE_PREPARED)[0].cellIndex).toBe(SAMPLE_PHASE.cells.cellIndex[57]);
  });
  it('are none for a continuous phase, or while the edition is not at hand', () => {
    expect(bestCells(computedPrediction(exampleDesign()), 5, null)).toEqual([]);
    expect(bestCells(SAMPLE_PHASE, 5, null)).toEqual([]);
  });
});
