import { cellChoices } from './cell-choices';
import { EXAMPLE_DESIGN, exampleDesign } from './example-design';
import { EXAMPLE_EDITION_ID, exampleEdition } from './example-edition';
import { placeCells } from './place-cells';
import { prepareEdition } from './prepare-edition';

describe('the best cells for one position', () => {
  it.each(['nearest-phase', 'least-error'] as const)('begin with the one assigned and are ordered by the rule %s', (rule) => {
    const edition = prepareEdition(exampleEdition());
    const placed = placeCells(exampleDesign({ cells: { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule, excludedCells: [] } }), edition);
    for (const position of [0, 123, 399]) {
      const choices = cellChoices(placed, position, edition);
      expect(choices).toHaveLength(3);
      expect(choices[0].cellIndex).toBe(placed.assignment.cellIndex[position]);
      const measures = choices.map((choice) => (rule === 'least-error' ? choice.complexError : Math.abs(choice.errorDeg)));
      expect([...measures].sort((a, b) => a - b)).toEqual(measures);
    }
  });

  it('are levels or table entries for ideal and inline cells, and none for a continuous phase', () => {
    const levels = placeCells(exampleDesign({ cells: { kind: 'ideal', levels: 4 } }));
    const [first, second] = cellChoices(levels, 17);
    expect(first.cellIndex).toBe(levels.assignment.cellIndex[17]);
    expect(Math.abs(first.errorDeg) + Math.abs(second.errorDeg)).toBeCloseTo(90, 6);
    const table = placeCells(exampleDesign({ cells: { kind: 'inline', cells: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 0.5 }] } }));
    expect(cellChoices(table, 17).map((choice) => choice.cellIndex)).toContain(table.assignment.cellIndex[17]);
    expect(cellChoices(placeCells(EXAMPLE_DESIGN), 17)).toEqual([]);
  });

  it('exist for positions of the panel only', () => {
    expect(() => cellChoices(placeCells(EXAMPLE_DESIGN), 400)).toThrow('positions 0 to 399; got 400');
  });
});
