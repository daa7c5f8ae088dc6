import type { DesignDocument } from '../model/design-document';
import type { FigureDifference } from './compare-figures';
import { compareFigures, decidingFigure } from './compare-figures';
import { planeWaveDesign } from './example-design';
import { isNumber } from './no-figure';
import { predictDesign } from './predict-design';

const requirementOf = (more: Partial<DesignDocument['requirement']>): DesignDocument['requirement'] => ({ ...planeWaveDesign().requirement, ...more });
const predicted = (changes: Partial<DesignDocument>) => predictDesign(planeWaveDesign(changes), { include: {} });
const rowOf = (rows: readonly FigureDifference[], id: string): FigureDifference | undefined => rows.find((row) => row.id === id);

const limits = requirementOf({ minGainDbi: 26, maxSidelobeDb: -10, minCrossPolarDiscriminationDb: 25 });
const ideal = predicted({ requirement: limits });
const twoLevels = predicted({ requirement: limits, cells: { kind: 'ideal', levels: 2 } });

describe('compareFigures', () => {
  it('negates every change when the sides are swapped, and exchanges the verdicts', () => {
    const [there, back] = [compareFigures(ideal, twoLevels), compareFigures(twoLevels, ideal)];
    there.forEach((row, i) => {
      expect(back[i]).toMatchObject({ before: row.after, after: row.before, verdictBefore: row.verdictAfter, verdictAfter: row.verdictBefore, limit: row.limit });
      if (isNumber(row.change)) expect(back[i].change).toBeCloseTo(-row.change, 12);
      else expect(back[i].change).toEqual(row.change);
    });
  });

  it('shows that two levels under a plane wave cost 3.9 dB and give an image as strong as the beam', () => {
    const rows = compareFigures(ideal, twoLevels);
    // Rounding to two levels leaves 2/pi of the field: 3.92 dB; see R. J. Mailloux, Phased Array Antenna Handbook (from memory).
    expect(rowOf(rows, 'directivity')?.change).toBeCloseTo(-3.9, 0);
    expect(rowOf(rows, 'sidelobe')?.after).toBeCloseTo(0, 1);
    expect(rowOf(rows, 'sidelobe')).toMatchObject({ limit: '≤ -10.0', verdictBefore: 'meets', verdictAfter: 'falls-short' });
  });

  it('leaves a figure without value its reason', () => {
    const reason = { kind: 'scalar-model', reason: 'the scalar prediction has no cross-polar field' };
    expect(rowOf(compareFigures(ideal, ideal), 'cross-polar')).toMatchObject({ before: reason, after: reason, change: reason, verdictAfter: 'not-evaluated' });
    expect(rowOf(compareFigures(ideal, ideal), 'mask')).toMatchObject({ change: { kind: 'no-mask' }, limit: null, verdictBefore: null });
  });

  it('names both limits where the requirement changed', () => {
    const later = predicted({ requirement: requirementOf({ minGainDbi: 27.25 }) });
    expect(rowOf(compareFigures(ideal, later), 'gain')?.limit).toBe('≥ 26.0, then ≥ 27.25');
  });

  it('lets one figure decide only where one verdict changed', () => {
    const gainDbi = Number(ideal.figures.gainAtBeamDbi);
    const hard = requirementOf({ minGainDbi: gainDbi - 1, maxSidelobeDb: -10 });
    const soft = requirementOf({ minGainDbi: gainDbi - 6, maxSidelobeDb: -10 });
    const between = (requirement: DesignDocument['requirement']) => compareFigures(predicted({ requirement }), predicted({ requirement, cells: { kind: 'ideal', levels: 2 } }));
    expect(decidingFigure(between(soft))).toBe('sidelobe');
    expect(between(hard).filter((row) => row.verdictBefore !== row.verdictAfter).map(({ id }) => id)).toEqual(['gain', 'sidelobe']);
    expect(decidingFigure(between(hard))).toBeNull();
    expect(decidingFigure(compareFigures(ideal, ideal))).toBeNull();
  });
});
