import { exampleDesign } from '../../shared/antenna/example-design';
import { exampleEdition } from '../../shared/antenna/example-edition';
import { predictDesign, type Prediction } from '../../shared/antenna/predict-design';
import { prepareEdition } from '../../shared/antenna/prepare-edition';
import type { DesignDocument } from '../../shared/model/design-document';
import { cutTable, figureTable } from './export-tables';

const edition = prepareEdition(exampleEdition());
const onEdition: DesignDocument['cells'] = { kind: 'edition', editionId: '00000000-0000-4000-8000-000000000001', rule: 'nearest-phase', excludedCells: [] };
const predicted = (cells: DesignDocument['cells']): Required<Pick<Prediction, 'cells' | 'cuts'>> & Prediction => {
  const cuts = [{ plane: 'along', angleDeg: [-110, 70, 0.1] }] as const;
  return predictDesign(exampleDesign({ cells }), { edition, include: { cells: true, cuts } }) as Required<Prediction>;
};
const linesOf = (table: string): string[] => table.trimEnd().split('\r\n');

describe('the table of a cut', () => {
  it('steps in plain decimals, without the crumbs of binary arithmetic', () => {
    const rows = linesOf(cutTable(predicted(onEdition).cuts[0])).slice(1).map((line) => line.split(','));
    expect(rows.slice(0, 4).map(([angle]) => angle)).toEqual(['-110', '-109.9', '-109.8', '-109.7']);
    expect(Math.max(...rows.flat().map((cell) => cell.replace(/^-?\d*\.?/, '').length))).toBeLessThanOrEqual(6);
  });
});

describe('the table of a cut by the vector model', () => {
  const design = exampleDesign({ cells: onEdition, prediction: { receiveExponent: 0.5, radiateExponent: 0.5, model: 'vector' } });
  const { cuts = [], figures, verdicts } = predictDesign(design, { edition, include: { cuts: [{ plane: 'across', angleDeg: [0, 4, 2] }] } });

  it('holds the cross-polar gain beside the co-polar one', () => {
    const [head, ...rows] = linesOf(cutTable(cuts[0])).map((line) => line.split(','));
    expect(head).toEqual(['angle_deg', 'theta_deg', 'phi_deg', 'directivity_dbi', 'gain_dbi', 'cross_polar_gain_dbi']);
    expect(rows.map((row) => Number(row[5]))).toEqual(Array.from(cuts[0].crossGainDbi ?? [], (level) => Math.round(level * 1e4) / 1e4));
  });

  it('lists the budget and the discrimination among the figures', () => {
    const rows = new Map(linesOf(figureTable(figures, verdicts)).map((line) => [line.split(',')[0], line.split(',')]));
    expect(Number(rows.get('vector.budget.spilloverDb')?.[1])).toBeCloseTo(figures.spilloverDb as number, 9);
    expect(rows.get('vector.crossPolarDiscriminationDb.0')?.[2]).toBe('dB');
    expect(rows.get('vector.axialRatioDb')?.[7]).toContain('circular beam only');
  });
});

describe('the table of figures', () => {
  it('gives value, unit and uncertainty, and the reason where there is no value', () => {
    const { figures, verdicts } = predicted({ kind: 'ideal', levels: null });
    const rows = new Map(linesOf(figureTable(figures, verdicts)).map((line) => [line.split(',')[0], line]));
    expect(rows.get('directivityDbi')).toBe(`directivityDbi,${figures.directivityDbi},dBi,${figures.uncertainty['directivityDbi']},,,,`);
    expect(rows.get('halfPowerBeamwidthDeg.across')).toContain(',deg,1e-7,');
    expect(rows.get('maskMargin')).toBe('maskMargin,,,,,,,the requirement has no mask');
    expect(rows.get('beams.0.gainDbi')).toContain(',dBi,');
    expect([...rows.keys()].filter((name) => name.startsWith('requirement.'))).toEqual([]);
  });
});
