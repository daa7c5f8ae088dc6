import { NUMBER_TEXT } from './file-text';

/** A cell of an exported table: text, a finite number, or nothing. */
export type CsvCell = string | number | null;

// Spreadsheets run a cell that begins with one of these as a formula (OWASP ASVS 5.0, 1.2.10). An apostrophe
// already in front is doubled so that reading takes exactly one away.
const FORMULA_START = /^'*[=+\-@\t\r\n]/;

/**
 * Writes a table by RFC 4180: commas, CRLF, quotes where needed, shortest decimals.
 * Text that a spreadsheet would run as a formula gets an apostrophe; numbers never do. Inverse: `readCsv`.
 */
export function writeCsv(rows: readonly (readonly CsvCell[])[]): string {
  return rows.map((row) => `${row.length === 1 && cellText(row[0]) === '' ? '""' : row.map(cellText).join(',')}\r\n`).join('');
}

function cellText(cell: CsvCell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') {
    if (!Number.isFinite(cell)) throw new RangeError(`A table holds finite numbers; got ${cell}`);
    return String(cell);
  }
  // NUL ends the text for many readers, so it is shown as a replacement character.
  const safe = cell.replaceAll('\0', '\uFFFD');
  const guarded = FORMULA_START.test(safe) && !NUMBER_TEXT.test(safe) ? `'${safe}` : safe;
  return /[",;\t\r\n]/.test(guarded) ? `"${guarded.replaceAll('"', '""')}"` : guarded;
}
