import { parseQuantity } from '../../../../shared/units/quantity';
import type { QuantityDimension } from '../../../../shared/units/quantity';

export interface TableColumn {
  readonly label: string;
  readonly dimension: QuantityDimension;
  readonly unit: string;
}

/** One entry of a pasted table that cannot be read. Line and column are counted from 1. */
export interface PasteFault {
  readonly line: number;
  readonly column: number;
  readonly text: string;
  readonly reason: string;
  readonly suggestion: string | null;
}

export interface PastedTable {
  readonly rows: readonly (readonly number[])[];
  readonly faults: readonly PasteFault[];
  /** Lines left out because they hold headings. */
  readonly headingLines: number;
}

/**
 * Reads lines from a spreadsheet or a text file: columns by tabulator or semicolon, else by comma or blanks.
 * A first line without any number is a heading. Nothing of a table with faults is meant to be used.
 */
export function readPastedTable(text: string, columns: readonly TableColumn[]): PastedTable {
  const rows: number[][] = [];
  const faults: PasteFault[] = [];
  let headingLines = 0;
  text.split(/\r\n|\r|\n/).forEach((lineText, at) => {
    if (lineText.trim() === '') return;
    const entries = splitLine(lineText);
    if (rows.length === 0 && faults.length === 0 && entries.every((entry) => !/\d/.test(entry))) {
      headingLines += 1;
      return;
    }
    const row = readLine(entries, columns, at + 1);
    faults.push(...row.faults);
    if (row.faults.length === 0) rows.push(row.values);
  });
  return { rows, faults, headingLines };
}

function splitLine(line: string): readonly string[] {
  const separator = line.includes('\t') ? /\t/ : line.includes(';') ? /;/ : /\s*,\s+|\s+|,/;
  return line.trim().split(separator).map((entry) => entry.trim());
}

function readLine(entries: readonly string[], columns: readonly TableColumn[], line: number): { values: number[]; faults: PasteFault[] } {
  const values: number[] = [];
  const faults: PasteFault[] = [];
  columns.forEach((column, at) => {
    const text = entries[at] ?? '';
    const read = parseQuantity(text, column.dimension, { shownUnit: column.unit });
    if (read.kind === 'value') values.push(read.value);
    else faults.push({ line, column: at + 1, text, reason: `${column.label}: ${read.reason}`, suggestion: read.suggestion ?? null });
  });
  if (entries.length > columns.length) {
    const text = entries.slice(columns.length).join(' ');
    const reason = `${columns.length} columns belong here: ${columns.map(({ label }) => label).join(', ')}`;
    faults.push({ line, column: columns.length + 1, text, reason, suggestion: null });
  }
  return { values, faults };
}

/** The table as a spreadsheet takes it: headings with units, tabulators, full precision. */
export function copiedTable(rows: readonly (readonly number[])[], columns: readonly TableColumn[]): string {
  const heading = columns.map(({ label, unit }) => (unit === '' ? label : `${label} (${unit})`)).join('\t');
  return [heading, ...rows.map((row) => row.join('\t'))].join('\n');
}
