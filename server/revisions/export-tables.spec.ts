import { exampleDesign } from '../../shared/antenna/example-design';
import { exampleEdition } from '../../shared/antenna/example-edition';
import { predictDesign, type Prediction } from '../../shared/antenna/predict-design';
import { prepareEdition } from '../../shared/antenna/prepare-edition';
import type { DesignDocument } from '../../shared/model/design-document';
import { cellTable, cutTable, figureTable } from './export-tables';

const edition = prepareEdition(exampleEdition());
const onEdition: DesignDocument['cells'] = { kind: 'edition', editionId: '00000000-0000-4000-8000-000000000001', rule: 'nearest-phase', excludedCells: [] };
const predicted = (cells: DesignDocument['cells']): Required<Pick<Prediction, 'cells' | 'cuts'>> & Prediction => {
  const cuts = [{ plane: 'along', angleDeg: [-110, 70, 0.1] }] as const;
  return predictDesign(exampleDesign({ cells }), { edition, include: { cells: true, cuts } }) as Required<Prediction>;
};
const linesOf = (table: string): string[] => table.trimEnd().split('\r\n');

describe('the table of cells', () => {
  it('has a row for every cell, also where they take more than one turn to write', async () => {
    const panel = { ...exampleDesign().panel, outline: { kind: 'rectangle', widthMm: 1500, heightMm: 1500 } } as const;
    const { cells } = predictDesign(exampleDesign({ panel }), { include: { cells: true } });
    if (cells === undefined) throw new Error('no cells came');
    const lines = linesOf(await cellTable(cells, { cells: { kind: 'ideal', levels: null }, edition: null }));
    expect(lines).toHaveLength(1 + 10_000);
    expect(new Set(lines.map((line) => line.split(',').length))).toEqual(new Set([12]));
    expect(lines.at(-1)?.startsWith('742.5,742.5,99,99,,')).toBe(true);
  });

  it('names the cell and its dimensions where there is an edition', async () => {
    const { cells } = predicted(onEdition);
    const [header, first] = linesOf(await cellTable(cells, { cells: onEdition, edition: edition.edition })).map((line) => line.split(','));
    const [parameter] = edition.edition.description.parameters;
    const entry = edition.edition.cells[cells.cellIndex[0]];
    expect(header.slice(4, 6)).toEqual(['cell_id', `${parameter.id}_mm`]);
    expect(first.slice(4, 6)).toEqual([entry.id, String(entry.parametersMm[0])]);
  });

  it('numbers ideal levels and cells of a what-if table', async () => {
    const idsOf = async (kind: DesignDocument['cells']): Promise<Set<string>> =>
      new Set(linesOf(await cellTable(predicted(kind).cells, { cells: kind, edition: null })).slice(1).map((line) => line.split(',')[4]));
    expect(await idsOf({ kind: 'ideal', levels: 2 })).toEqual(new Set(['level-0', 'level-1']));
    expect(await idsOf({ kind: 'inline', cells: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 0.9 }] })).toEqual(new Set(['cell-0', 'cell-1']));
    expect(await idsOf({ kind: 'ideal', levels: null })).toEqual(new Set(['']));
  });
});

describe('the table of a cut', () => {
  it('steps in plain decimals, without the crumbs of binary arithmetic', () => {
    const rows = linesOf(cutTable(predicted(onEdition).cuts[0])).slice(1).map((line) => line.split(','));
    expect(rows.slice(0, 4).map(([angle]) => angle)).toEqual(['-110', '-109.9', '-109.8', '-109.7']);
    expect(Math.max(...rows.flat().map((cell) => cell.replace(/^-?\d*\.?/, '').length))).toBeLessThanOrEqual(6);
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
