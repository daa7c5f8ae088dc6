import { FileFaults, quoted } from './file-faults';
import { NUMBER_TEXT, decodeFileText } from './file-text';
import type { FileMessage } from './file-message';

export type CsvSeparator = ',' | ';' | '\t';

export interface CsvDialect {
  readonly separator: CsvSeparator;
  /** A decimal comma is possible only where the comma does not separate. */
  readonly decimal: '.' | ',';
}

/** A table of text: every row has the same number of cells. */
export interface CsvTable {
  readonly dialect: CsvDialect;
  readonly rows: readonly (readonly string[])[];
  /** Line of the file on which each row begins, from 1. */
  readonly rowLines: readonly number[];
}

export type CsvResult =
  | { readonly kind: 'read'; readonly table: CsvTable; readonly notices: readonly FileMessage[] }
  | { readonly kind: 'refused'; readonly messages: readonly FileMessage[] };

export interface CsvLimits {
  readonly bytes: number;
  readonly rows: number;
  readonly columns: number;
  readonly cellLength: number;
}

export const CSV_LIMITS: CsvLimits = { bytes: 50_000_000, rows: 1_000_000, columns: 500, cellLength: 10_000 };

export interface CsvChoices {
  /** A person's word on the separator and the decimal sign; wins over detection. */
  readonly dialect?: Partial<CsvDialect>;
  readonly limits?: CsvLimits;
}

/** Rows that decide the dialect. */
const PROBED_ROWS = 50;

/**
 * Reads a CSV table by RFC 4180 with comma, semicolon or tab, and any line end.
 * Quotes are strict, rows are of one length, NUL is refused; messages carry line and column. Inverse: `writeCsv`.
 */
export function readCsv(bytes: Uint8Array, choices: CsvChoices = {}): CsvResult {
  const faults = new FileFaults();
  const limits = choices.limits ?? CSV_LIMITS;
  if (bytes.length > limits.bytes) {
    faults.error(0, `The file has ${bytes.length} bytes; at most ${limits.bytes} are read`);
    return { kind: 'refused', messages: faults.messages() };
  }
  const decoded = decodeFileText(bytes);
  if (decoded.encoding.startsWith('utf-16')) faults.notice(1, 'The file is in UTF-16 and was decoded');
  if (decoded.encoding === 'latin-1') faults.warn(1, 'The file is not UTF-8; its characters beyond ASCII were read as Latin-1');
  const { text } = decoded;
  const nul = text.indexOf('\0');
  if (nul >= 0) faults.error(text.slice(0, nul).split(/\r\n|\n|\r/).length, 'The file holds a NUL character', 'Export it again as text');
  const separator = choices.dialect?.separator ?? detectSeparator(text);
  const cells = faults.hasErrors ? { rows: [], rowLines: [] } : new CsvScanner(text, separator, limits, faults).scan();
  checkShape(cells, limits, faults);
  const decimal = faults.hasErrors ? '.' : (choices.dialect?.decimal ?? detectDecimal(cells, separator, faults));
  if (faults.hasErrors) return { kind: 'refused', messages: faults.messages() };
  return { kind: 'read', table: { dialect: { separator, decimal }, ...cells }, notices: faults.messages() };
}

/** A cell as a number in the table's dialect; null when it is anything else. */
export function csvNumber(cell: string, dialect: CsvDialect): number | null {
  const text = dialect.decimal === ',' ? cell.trim().replace(',', '.') : cell.trim();
  if (dialect.decimal === ',' && cell.includes('.')) return null;
  const value = NUMBER_TEXT.test(text) ? Number(text) : Number.NaN;
  return Number.isFinite(value) ? value : null;
}

interface CsvCells {
  readonly rows: readonly (readonly string[])[];
  readonly rowLines: readonly number[];
}

/** The separator that stands equally often on every probed line; tab and semicolon come before the comma, which may be a decimal sign. */
function detectSeparator(text: string): CsvSeparator {
  const lines = text
    .slice(0, 200_000)
    .replace(/"[^"]*"/g, '')
    .split(/\r\n|\n|\r/, PROBED_ROWS)
    .filter((line) => line !== '');
  const counts = (['\t', ';', ','] as const).map((separator) => ({ separator, perLine: lines.map((line) => line.split(separator).length - 1) }));
  const even = counts.find(({ perLine }) => perLine.length > 0 && perLine[0] > 0 && perLine.every((count) => count === perLine[0]));
  const some = counts.find(({ perLine }) => perLine.length > 0 && perLine[0] > 0);
  return (even ?? some)?.separator ?? ',';
}

function detectDecimal({ rows, rowLines }: CsvCells, separator: CsvSeparator, faults: FileFaults): '.' | ',' {
  if (separator === ',') return '.';
  let firstComma = -1;
  let firstPoint = -1;
  rows.forEach((row, index) => {
    if (firstComma < 0 && row.some((cell) => /^\s*[+-]?\d+,\d+(?:[eE][+-]?\d+)?\s*$/.test(cell))) firstComma = index;
    if (firstPoint < 0 && row.some((cell) => /^\s*[+-]?\d+\.\d+(?:[eE][+-]?\d+)?\s*$/.test(cell))) firstPoint = index;
  });
  if (firstComma >= 0 && firstPoint >= 0)
    faults.error(rowLines[Math.max(firstComma, firstPoint)], `Decimal commas (line ${rowLines[firstComma]}) and decimal points (line ${rowLines[firstPoint]}) are mixed`, 'Export the table with one decimal sign');
  else if (firstComma >= 0) faults.notice(rowLines[firstComma], 'Decimal commas were read as decimal signs');
  return firstComma >= 0 ? ',' : '.';
}

function checkShape({ rows, rowLines }: CsvCells, limits: CsvLimits, faults: FileFaults): void {
  if (faults.hasErrors) return;
  if (rows.length === 0) {
    faults.error(0, 'The table is empty');
    return;
  }
  const width = rows[0].length;
  if (width > limits.columns) faults.error(rowLines[0], `The table has ${width} columns; at most ${limits.columns} are read`);
  rows.forEach((row, index) => {
    if (row.length === width) return;
    const column = Math.min(row.length, width) + 1;
    faults.add('error', { line: rowLines[index], column, text: `Row ${index + 1} has ${row.length} cell(s); the first row has ${width}` });
  });
}

// One apostrophe in front of these was put there by a writer that guards against formulas.
const GUARDED = /^'+[=+\-@\t\r\n]/;

const LINE_FEED = 10;
const CARRIAGE_RETURN = 13;
const QUOTE = 34;

/** Walks over the text once; each method leaves `at` behind what it read. */
class CsvScanner {
  private at = 0;
  private line = 1;
  private readonly rows: string[][] = [];
  private readonly rowLines: number[] = [];

  constructor(
    private readonly text: string,
    private readonly separator: CsvSeparator,
    private readonly limits: CsvLimits,
    private readonly faults: FileFaults,
  ) {}

  scan(): CsvCells {
    let trailingBlank = 0;
    while (this.at < this.text.length && this.rows.length <= this.limits.rows && !this.faults.hasErrors) {
      const start = this.at;
      this.rowLines.push(this.line);
      this.rows.push(this.scanRow());
      trailingBlank = this.text[start] === '\n' || this.text[start] === '\r' ? trailingBlank + 1 : 0;
    }
    if (this.rows.length > this.limits.rows) this.faults.error(this.line, `The table has more than ${this.limits.rows} rows`);
    const kept = this.rows.length - trailingBlank;
    return { rows: this.rows.slice(0, kept), rowLines: this.rowLines.slice(0, kept) };
  }

  private scanRow(): string[] {
    const row: string[] = [];
    for (;;) {
      const cell = this.text[this.at] === '"' ? this.scanQuoted(row.length + 1) : this.scanPlain(row.length + 1);
      if (cell.length > this.limits.cellLength) this.fault(row.length + 1, `The cell is longer than ${this.limits.cellLength} characters`);
      row.push(cell.startsWith("'") && GUARDED.test(cell) ? cell.slice(1) : cell);
      if (row.length > this.limits.columns) this.fault(row.length, `The row has more than ${this.limits.columns} columns`);
      if (this.text[this.at] !== this.separator || this.faults.hasErrors) break;
      this.at += 1;
    }
    this.skipLineEnd();
    return row;
  }

  private scanPlain(column: number): string {
    const start = this.at;
    const separator = this.separator.charCodeAt(0);
    // The inner loop of every import: codes are compared and not one-character strings.
    let at = start;
    for (; at < this.text.length; at++) {
      const code = this.text.charCodeAt(at);
      if (code === separator || code === LINE_FEED || code === CARRIAGE_RETURN) break;
      if (code === QUOTE) this.fault(column, `A quote stands inside the cell that begins ${quoted(this.text.slice(start, at))}`);
    }
    this.at = at;
    return this.text.slice(start, at);
  }

  private scanQuoted(column: number): string {
    const parts: string[] = [];
    const opened = this.line;
    for (;;) {
      const close = this.text.indexOf('"', this.at + 1);
      if (close < 0) {
        this.faults.add('error', { line: opened, column, text: 'The quote that opens here is never closed' });
        this.at = this.text.length;
        return '';
      }
      parts.push(this.text.slice(this.at + 1, close));
      this.at = close + 1;
      if (this.text[this.at] !== '"') break;
    }
    const cell = parts.join('"');
    this.line += cell.split(/\r\n|\n|\r/).length - 1;
    if (this.at < this.text.length && !this.isCellEnd()) this.fault(column, 'Text follows the closing quote of the cell');
    return cell;
  }

  private isCellEnd(): boolean {
    const character = this.text[this.at];
    return character === this.separator || character === '\n' || character === '\r';
  }

  private skipLineEnd(): void {
    if (this.text[this.at] === '\r' && this.text[this.at + 1] === '\n') this.at += 1;
    this.at += 1;
    this.line += 1;
  }

  private fault(column: number, text: string): void {
    if (!this.faults.hasErrors) this.faults.add('error', { line: this.line, column, text });
  }
}
