import type { LivePrediction } from '../live-prediction-data';
import { cellFacts, cellSentence } from './chosen-cell';
import { countEmpty, emptyPlaces, withoutEmpty } from './empty-places';
import { errorLayer, phaseLayer } from './phase-views';
import { SAMPLE_EDITION, SAMPLE_PHASE } from './sample-phase';
import { selectionStatistics } from './selection-statistics';
import { worstCells } from './worst-cells';

/** As the server tells a position where the edition has no cell that may stand: index -1, phase 0, the whole target as error. */
function withEmptyPlace(place: number): LivePrediction {
  const { cells } = SAMPLE_PHASE;
  const [cellIndex, phaseDeg, errorDeg] = [cells.cellIndex.slice(), cells.phaseDeg.slice(), cells.errorDeg.slice()];
  cellIndex[place] = -1;
  phaseDeg[place] = 0;
  errorDeg[place] = -179;
  return { ...SAMPLE_PHASE, cells: { ...cells, cellIndex, phaseDeg, errorDeg } };
}

describe('a place without a cell', () => {
  const prediction = withEmptyPlace(7);
  const source = { prediction, parent: null, parentNumber: null, edition: SAMPLE_EDITION };

  it('is told from the others, and none is missing where the phase is ideal', () => {
    expect([emptyPlaces(prediction)(7), emptyPlaces(prediction)(8), countEmpty(prediction)]).toEqual([true, false, 1]);
    const ideal = { ...prediction, of: { ...prediction.of, cells: { kind: 'ideal' as const, levels: null } } };
    expect(countEmpty(ideal)).toBe(0);
    expect(withoutEmpty(ideal, ideal.cells.errorDeg)).toBe(ideal.cells.errorDeg);
  });

  it('is bare and hatched in the maps of error and cells, and keeps its target', () => {
    expect(errorLayer(prediction).values[7]).toBeNaN();
    expect(errorLayer(prediction).scale.to).toBeLessThan(179);
    for (const view of ['error', 'cell'] as const) {
      const found = phaseLayer(view, source);
      if (found.kind === 'none') throw new Error(found.reason);
      expect([found.layer.isHatched?.(7), found.layer.isHatched?.(8)]).toEqual([true, false]);
      expect(found.layer.values[7]).toBeNaN();
    }
    const target = phaseLayer('target', source);
    expect(target.kind === 'layer' && [target.layer.values[7], target.layer.isHatched]).toEqual([prediction.cells.targetPhaseDeg[7], undefined]);
  });

  it('counts neither among the worst nor in the statistics of a selection', () => {
    expect(worstCells(prediction, 3)).not.toContain(7);
    expect(selectionStatistics(prediction, [6, 7, 8])?.count).toBe(2);
    expect(selectionStatistics(prediction, [7])).toBeNull();
  });

  it('says that no cell may stand there instead of a phase and an error', () => {
    const facts = cellFacts({ prediction, edition: SAMPLE_EDITION, cell: 7, choices: [], brightest: 1 });
    expect(facts.find(({ name }) => name === 'Cell')?.value).toBe('no cell');
    expect(facts.find(({ name }) => name === 'Phase error')?.value).toBe('none: no cell may stand here');
    expect(cellSentence(prediction, 7)).toMatch(/target .*, no cell may stand here$/);
  });
});
