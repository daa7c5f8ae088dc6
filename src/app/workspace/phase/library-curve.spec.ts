import { exampleDesign } from '../../../../shared/antenna/example-design';
import { wrapDeg } from '../../../../shared/units/angles';
import { computedPrediction } from '../computed-prediction';
import { libraryCurve, timesUsed } from './library-curve';
import { SAMPLE_EDITION, SAMPLE_PHASE, SAMPLE_PREPARED } from './sample-phase';

describe('library curve', () => {
  const cell = 57;
  const curve = libraryCurve({ prediction: SAMPLE_PHASE, edition: SAMPLE_EDITION, prepared: SAMPLE_PREPARED, cell });

  it('shows the chosen cell at its own phase, so the curve agrees with the map', () => {
    const at = curve?.figure.chosen?.at ?? -1;
    expect(curve?.cellOfSample[at]).toBe(SAMPLE_PHASE.cells.cellIndex[cell]);
    const phase = curve?.figure.lines[0].y[at] ?? Number.NaN;
    expect(wrapDeg(phase - SAMPLE_PHASE.cells.phaseDeg[cell])).toBeCloseTo(0, 3);
  });
  it('draws the target and the same phase turns away as far as the curve reaches', () => {
    const target = wrapDeg(SAMPLE_PHASE.cells.targetPhaseDeg[cell]);
    for (const { at } of curve?.figure.levels ?? []) expect(wrapDeg(at - target)).toBeCloseTo(0, 6);
    expect(curve?.figure.levels?.length).toBeGreaterThan(0);
  });
  it('counts every cell of the panel once', () => {
    expect(Array.from(timesUsed(SAMPLE_PHASE, SAMPLE_EDITION.cells.length)).reduce((a, b) => a + b)).toBe(400);
  });
  it('says frequency and incidence', () => {
    expect(curve?.unit).toMatch(/^10\.000 GHz, incidence \d+\.\d°; bars: times used$/);
  });
  it('shows levels and table entries where there is no library', () => {
    const levels = computedPrediction(exampleDesign({ cells: { kind: 'ideal', levels: 4 } }));
    expect(libraryCurve({ prediction: levels, edition: null, prepared: null, cell: 3 })?.figure.lines[0].y).toEqual([0, 90, 180, 270]);
    const table = computedPrediction(exampleDesign({ cells: { kind: 'inline', cells: [{ phaseDeg: 170, magnitude: 0.96 }, { phaseDeg: -10, magnitude: 1 }] } }));
    expect(libraryCurve({ prediction: table, edition: null, prepared: null, cell: 3 })?.title).toBe('Table of cells');
  });
  it('does not exist for a continuous phase or before the edition is at hand', () => {
    expect(libraryCurve({ prediction: computedPrediction(exampleDesign()), edition: null, prepared: null, cell: 0 })).toBeNull();
    expect(libraryCurve({ prediction: SAMPLE_PHASE, edition: null, prepared: null, cell: 0 })).toBeNull();
  });
});
