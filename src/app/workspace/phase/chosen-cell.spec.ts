import { exampleDesign } from '../../../../shared/antenna/example-design';
import { computedPrediction } from '../computed-prediction';
import { bestCells } from './best-cells';
import { cellFacts, cellSentence } from './chosen-cell';
import { SAMPLE_EDITION, SAMPLE_PHASE, SAMPLE_PREPARED } from './sample-phase';

const factsOf = (cell: number) => cellFacts({ prediction: SAMPLE_PHASE, edition: SAMPLE_EDITION, cell, choices: bestCells(SAMPLE_PHASE, cell, SAMPLE_PREPARED), brightest: Math.max(...SAMPLE_PHASE.cells.amplitude) });

describe('facts of a cell', () => {
  it('count columns and rows from one and give every number its unit', () => {
    const facts = Object.fromEntries(factsOf(0).map(({ name, value }) => [name, value]));
    expect(facts['Position']).toBe('col 1, row 1');
    expect(facts['x, y']).toBe('\u2212142.50, \u2212142.50 mm');
    expect(facts['Target phase']).toMatch(/^.\d+\.\d°$|^\d+\.\d°$/);
    expect(facts['Phase error']).toMatch(/^[+\u2212]?\d+\.\d\d°$/);
    expect(facts['Illumination']).toMatch(/ dB$/);
  });
  it('name the cell by its parameter and the next best with its error', () => {
    const facts = Object.fromEntries(factsOf(57).map(({ name, value }) => [name, value]));
    const own = SAMPLE_EDITION.cells[SAMPLE_PHASE.cells.cellIndex[57]].parametersMm[0];
    expect(facts['Cell']).toBe(`${own.toFixed(2)} mm`);
    expect(facts['Next best']).toMatch(/^\d\.\d\d mm, [+\u2212]\d+\.\d\d°$/);
  });
  it('keep the number in full beside what is shown', () => {
    const error = factsOf(57).find(({ name }) => name === 'Phase error');
    expect(Number(error?.full)).toBe(SAMPLE_PHASE.cells.errorDeg[57]);
  });
  it('warn where the data do not reach the incidence of the cell', () => {
    const flat = { ...SAMPLE_EDITION, responses: { ...SAMPLE_EDITION.responses, thetasRad: Float64Array.of(0) } };
    const facts = cellFacts({ prediction: SAMPLE_PHASE, edition: flat, cell: 399, choices: [], brightest: 1 });
    expect(facts.at(-1)).toMatchObject({ name: 'Incidence', tone: 'warn', value: expect.stringContaining('data at 0°') });
    expect(factsOf(210).at(-1)).toMatchObject({ tone: 'plain', value: expect.stringContaining('covered') });
  });
  it('say that a continuous phase has no next best', () => {
    const ideal = computedPrediction(exampleDesign());
    expect(cellFacts({ prediction: ideal, edition: null, cell: 3, choices: [], brightest: 1 }).find(({ name }) => name === 'Next best')?.value).toContain('continuous');
    expect(cellSentence(ideal, 3)).toMatch(/^col 4, row 1: target .*°, error .*°$/);
  });
});
