import { SAMPLE_EDITION, SAMPLE_PHASE } from './sample-phase';
import { brightestCell, worstCells } from './worst-cells';
import { worstRows } from './worst-rows';

const errors = Array.from(SAMPLE_PHASE.cells.errorDeg, Math.abs);

describe('worst cells', () => {
  it('are the largest errors of the whole panel, largest first', () => {
    const sorted = [...errors].sort((a, b) => b - a).slice(0, 6);
    expect(worstCells(SAMPLE_PHASE, 6).map((cell) => errors[cell])).toEqual(sorted);
  });
  it('are as many as there are, when more are asked for', () => {
    expect(worstCells(SAMPLE_PHASE, 1000)).toHaveLength(400);
  });
  it('list the chosen cell last when it is not among them', () => {
    const worst = worstCells(SAMPLE_PHASE, 3);
    const table = worstRows({ prediction: SAMPLE_PHASE, edition: SAMPLE_EDITION, worst, chosen: 210, brightest: 1 });
    expect(table.rows.map(({ cell, chosen }) => [cell, chosen])).toEqual([[worst[0], false], [worst[1], false], [210, true]]);
    expect([table.stockHead, table.rows[2].place]).toEqual(['Cell, mm', '11, 11']);
    expect(table.range).toMatch(/^\u2212\d+\.\d\d° to \+\d+\.\d\d°$/);
  });
});

it('finds the brightest cell that fulfils a condition', () => {
  const { amplitude, cellIndex } = SAMPLE_PHASE.cells;
  const found = brightestCell(SAMPLE_PHASE, (cell) => cellIndex[cell] === 4);
  expect(cellIndex[found]).toBe(4);
  for (let i = 0; i < amplitude.length; i++) if (cellIndex[i] === 4) expect(amplitude[found]).toBeGreaterThanOrEqual(amplitude[i]);
  expect(brightestCell(SAMPLE_PHASE, () => false)).toBe(-1);
});
