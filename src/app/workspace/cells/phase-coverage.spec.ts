import { cellUse, phaseCoverage } from './phase-coverage';

describe('phaseCoverage', () => {
  it('finds the gap that even levels leave', () => {
    expect(phaseCoverage([0, 90, 180, 270])).toEqual({ rangeDeg: 270, largestGapDeg: 90 });
  });

  it('closes the circle over the wrap', () => {
    expect(phaseCoverage([350, -40, 10])?.largestGapDeg).toBe(310);
  });

  it('takes a curve that turns more than once for what it covers', () => {
    expect(phaseCoverage([0, -120, -240, -300, -500])).toMatchObject({ rangeDeg: 500, largestGapDeg: 120 });
  });

  it('leaves a single cell the whole circle', () => {
    expect(phaseCoverage([17])).toEqual({ rangeDeg: 0, largestGapDeg: 360 });
    expect(phaseCoverage([])).toBeNull();
  });
});

describe('cellUse', () => {
  it('counts placed cells and passes over positions without one', () => {
    expect([...cellUse(Int32Array.of(0, 2, 2, -1), 3)]).toEqual([1, 0, 2]);
  });
});
