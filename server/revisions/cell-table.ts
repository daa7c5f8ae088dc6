import type { CellArrays } from '../../shared/antenna/cell-arrays';
import { writeCsv, type CsvCell } from '../../shared/files/csv-writer';
import type { CellEntry, FamilyDescription } from '../../shared/model/cell-family';
import type { DesignDocument } from '../../shared/model/design-document';
import { TableBytes } from './table-bytes';

/** What the numbers of cells in a design point at: the edition where there is one. */
export interface ExportedStock {
  readonly cells: DesignDocument['cells'];
  readonly edition: { readonly description: FamilyDescription; readonly cells: readonly CellEntry[] } | null;
}

/** Positions are given to the nanometre. */
export const positionMm = (mm: number): number => Math.round(mm * 1e6) / 1e6 + 0;

/** Rows written between two turns of the event loop, so that others are answered meanwhile. */
const ROWS_PER_TURN = 5000;

/** A row of numbers as they usually are, for the first guess of the size. */
const ROW_BYTES = 96;

/**
 * One row for each cell, in the order of the panel, as UTF-8. Texts are made once: a panel has few columns, rows and kinds of
 * cells, and many places.
 */
export async function cellTable(arrays: CellArrays, stock: ExportedStock): Promise<Buffer> {
  const parameters = stock.edition?.description.parameters ?? [];
  const header = [
    'x_mm', 'y_mm', 'column', 'row', 'cell_id', ...parameters.map(({ id }) => `${id}_mm`), 'target_phase_deg', 'phase_deg', 'error_deg',
    'amplitude', 'response_db', 'incidence_deg', 'incidence_azimuth_deg',
  ];
  const table = new TableBytes(ROW_BYTES * (arrays.xMm.length + 4));
  table.text(Buffer.from(writeCsv([header])));
  const writeRow = rowWriter(table, arrays, { stock, parameterCount: parameters.length });
  for (let from = 0; from < arrays.xMm.length; from += ROWS_PER_TURN) {
    for (let n = from; n < Math.min(from + ROWS_PER_TURN, arrays.xMm.length); n++) writeRow(n);
    await new Promise((resolve) => setImmediate(resolve));
  }
  return table.take();
}

function rowWriter(table: TableBytes, arrays: CellArrays, { stock, parameterCount }: { stock: ExportedStock; parameterCount: number }): (n: number) => void {
  const placeBytes = remembered((mm) => writtenCells([positionMm(mm)]));
  const stockBytes = remembered((index) => writtenCells(stockCells(stock, index, parameterCount)));
  const phases = [arrays.targetPhaseDeg, arrays.phaseDeg, arrays.errorDeg];
  const angles = [arrays.responseDb, arrays.incidenceDeg, arrays.incidenceAzimuthDeg];
  const decimals = (columns: readonly Float32Array[], n: number): void => {
    for (const column of columns) {
      table.comma();
      table.decimal(column[n]);
    }
  };
  return (n) => {
    table.text(placeBytes(arrays.xMm[n]));
    table.comma();
    table.text(placeBytes(arrays.yMm[n]));
    table.comma();
    table.whole(arrays.column[n]);
    table.comma();
    table.whole(arrays.row[n]);
    table.comma();
    table.text(stockBytes(arrays.cellIndex[n]));
    decimals(phases, n);
    table.comma();
    table.significant(arrays.amplitude[n]);
    decimals(angles, n);
    table.endRow();
  };
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

/** Neighbouring cells of a row as the writer of tables writes them, guarded and quoted. */
function writtenCells(cells: readonly CsvCell[]): Uint8Array {
  // With one more, an empty cell alone stays empty.
  return Buffer.from(writeCsv([[...cells, null]]).slice(0, -',\r\n'.length));
}

/** Keeps what was made, by its number. */
function remembered(make: (key: number) => Uint8Array): (key: number) => Uint8Array {
  const kept = new Map<number, Uint8Array>();
  return (key) => {
    const known = kept.get(key);
    if (known !== undefined) return known;
    const made = make(key);
    kept.set(key, made);
    return made;
  };
}
