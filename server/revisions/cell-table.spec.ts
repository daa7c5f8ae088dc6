import { exampleDesign } from '../../shared/antenna/example-design';
import { exampleEdition } from '../../shared/antenna/example-edition';
import type { CellArrays } from '../../shared/antenna/cell-arrays';
import { predictDesign, type Prediction } from '../../shared/antenna/predict-design';
import { prepareEdition } from '../../shared/antenna/prepare-edition';
import { writeCsv } from '../../shared/files/csv-writer';
import type { DesignDocument } from '../../shared/model/design-document';
import { cellTable, positionMm, type ExportedStock } from './cell-table';

const edition = prepareEdition(exampleEdition());
const onEdition: DesignDocument['cells'] = { kind: 'edition', editionId: '00000000-0000-4000-8000-000000000001', rule: 'nearest-phase', excludedCells: [] };
const predicted = (cells: DesignDocument['cells']): Required<Pick<Prediction, 'cells'>> & Prediction =>
  predictDesign(exampleDesign({ cells }), { edition, include: { cells: true } }) as Required<Prediction>;
const linesOf = (table: string): string[] => table.trimEnd().split('\r\n');
const textOf = async (arrays: CellArrays, stock: ExportedStock): Promise<string> => (await cellTable(arrays, stock)).toString('utf8');
const rounded = (value: number): number => Math.round(value * 1e4) / 1e4 + 0;

describe('the table of cells', () => {
  it('has a row for every cell, also where they take more than one turn to write', async () => {
    const panel = { ...exampleDesign().panel, outline: { kind: 'rectangle', widthMm: 1500, heightMm: 1500 } } as const;
    const { cells } = predictDesign(exampleDesign({ panel }), { include: { cells: true } });
    if (cells === undefined) throw new Error('no cells came');
    const lines = linesOf(await textOf(cells, { cells: { kind: 'ideal', levels: null }, edition: null }));
    expect(lines).toHaveLength(1 + 10_000);
    expect(new Set(lines.map((line) => line.split(',').length))).toEqual(new Set([12]));
    expect(lines.at(-1)?.startsWith('742.5,742.5,99,99,,')).toBe(true);
  });

  it('names the cell and its dimensions where there is an edition', async () => {
    const { cells } = predicted(onEdition);
    const [header, first] = linesOf(await textOf(cells, { cells: onEdition, edition: edition.edition })).map((line) => line.split(','));
    const [parameter] = edition.edition.description.parameters;
    const entry = edition.edition.cells[cells.cellIndex[0]];
    expect(header.slice(4, 6)).toEqual(['cell_id', `${parameter.id}_mm`]);
    expect(first.slice(4, 6)).toEqual([entry.id, String(entry.parametersMm[0])]);
  });

  it('numbers ideal levels and cells of a what-if table', async () => {
    const idsOf = async (kind: DesignDocument['cells']): Promise<Set<string>> =>
      new Set(linesOf(await textOf(predicted(kind).cells, { cells: kind, edition: null })).slice(1).map((line) => line.split(',')[4]));
    expect(await idsOf({ kind: 'ideal', levels: 2 })).toEqual(new Set(['level-0', 'level-1']));
    expect(await idsOf({ kind: 'inline', cells: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 0.9 }] })).toEqual(new Set(['cell-0', 'cell-1']));
    expect(await idsOf({ kind: 'ideal', levels: null })).toEqual(new Set(['']));
  });

  it('writes what the general writer of tables would, names that are formulas and need quotes among them', async () => {
    const { cells } = predicted(onEdition);
    const named = { ...edition.edition, cells: edition.edition.cells.map((cell, k) => ({ ...cell, id: ['=1+1', 'a "b", c', '-2.5', cell.id][k % 4] })) };
    const rows = Array.from(cells.xMm, (_, n) => {
      const entry = named.cells[cells.cellIndex[n]];
      const angles = [cells.targetPhaseDeg[n], cells.phaseDeg[n], cells.errorDeg[n]].map(rounded);
      const light = [Number(cells.amplitude[n].toPrecision(6)), rounded(cells.responseDb[n]), rounded(cells.incidenceDeg[n]), rounded(cells.incidenceAzimuthDeg[n])];
      return [positionMm(cells.xMm[n]), positionMm(cells.yMm[n]), cells.column[n], cells.row[n], entry.id, ...entry.parametersMm, ...angles, ...light];
    });
    const [, ...lines] = (await textOf(cells, { cells: onEdition, edition: named })).split('\r\n');
    expect(lines.join('\r\n')).toBe(writeCsv(rows));
  });

  it('refuses a number that is not finite', async () => {
    const { cells } = predicted({ kind: 'ideal', levels: 2 });
    const broken = { ...cells, errorDeg: cells.errorDeg.map((error, n) => (n === 7 ? NaN : error)) };
    await expect(cellTable(broken, { cells: { kind: 'ideal', levels: 2 }, edition: null })).rejects.toThrow('A table holds finite numbers; got NaN');
  });
});
