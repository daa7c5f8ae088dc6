import type { CellArrays } from '../../shared/antenna/cell-arrays';
import { writeCsv, type CsvCell } from '../../shared/files/csv-writer';
import type { CellEntry, FamilyDescription } from '../../shared/model/cell-family';
import type { DesignDocument } from '../../shared/model/design-document';
import { decimalText, significantText } from './decimal-text';

/** What the numbers of cells in a design point at: the edition where there is one. */
export interface ExportedStock {
  readonly cells: DesignDocument['cells'];
  readonly edition: { readonly description: FamilyDescription; readonly cells: readonly CellEntry[] } | null;
}

/** Positions are given to the nanometre. */
export const positionMm = (mm: number): number => Math.round(mm * 1e6) / 1e6 + 0;

/** Rows written between two turns of the event loop, so that others are answered meanwhile. */
const ROWS_PER_TURN = 5000;

/**
 * One row for each cell, in the order of the panel. Rows are put together from texts that are made once: a panel has few
 * columns, rows and kinds of cells, and many places.
 */
export async function cellTable(arrays: CellArrays, stock: ExportedStock): Promise<string> {
  const parameters = stock.edition?.description.parameters ?? [];
  const header = [
    'x_mm', 'y_mm', 'column', 'row', 'cell_id', ...parameters.map(({ id }) => `${id}_mm`), 'target_phase_deg', 'phase_deg', 'error_deg',
    'amplitude', 'response_db', 'incidence_deg', 'incidence_azimuth_deg',
  ];
  const pieces = [writeCsv([header])];
  const rowText = rowWriter(arrays, stock, parameters.length);
  for (let from = 0; from < arrays.xMm.length; from += ROWS_PER_TURN) {
    let piece = '';
    for (let n = from; n < Math.min(from + ROWS_PER_TURN, arrays.xMm.length); n++) piece += rowText(n);
    pieces.push(piece);
    await new Promise((resolve) => setImmediate(resolve));
  }
  return pieces.join('');
}

function rowWriter(arrays: CellArrays, stock: ExportedStock, parameterCount: number): (n: number) => string {
  const placeText = remembered((mm: number) => writtenCell(positionMm(mm)));
  const stockText = remembered((index: number) => stockCells(stock, index, parameterCount).map(writtenCell).join(','));
  return (n) =>
    `${placeText(arrays.xMm[n])},${placeText(arrays.yMm[n])},${arrays.column[n]},${arrays.row[n]},${stockText(arrays.cellIndex[n])},` +
    `${decimalText(arrays.targetPhaseDeg[n])},${decimalText(arrays.phaseDeg[n])},${decimalText(arrays.errorDeg[n])},` +
    `${significantText(arrays.amplitude[n])},${decimalText(arrays.responseDb[n])},${decimalText(arrays.incidenceDeg[n])},${decimalText(arrays.incidenceAzimuthDeg[n])}\r\n`;
}

/** Name and dimensions of the cell that an index points at. */
function stockCells({ cells, edition }: ExportedStock, index: number, parameterCount: number): CsvCell[] {
  const entry = edition?.cells[index];
  const parameters = Array.from({ length: parameterCount }, (_, i): CsvCell => entry?.parametersMm[i] ?? null);
  return [entry?.id ?? plainCellId(cells, index), ...parameters];
}

/** Cells without a name of their own; a continuous ideal phase has no cell at all. */
function plainCellId(cells: DesignDocument['cells'], index: number): CsvCell {
  if (index < 0) return null;
  return cells.kind === 'ideal' ? `level-${index}` : `cell-${index}`;
}

/** One cell as the writer of tables writes it, guarded and quoted. */
function writtenCell(cell: CsvCell): string {
  // A row of two keeps an empty cell empty.
  return writeCsv([[cell, null]]).slice(0, -',\r\n'.length);
}

/** Keeps every text that was made, by its number. */
function remembered(make: (key: number) => string): (key: number) => string {
  const texts = new Map<number, string>();
  return (key) => {
    const known = texts.get(key);
    if (known !== undefined) return known;
    const made = make(key);
    texts.set(key, made);
    return made;
  };
}
