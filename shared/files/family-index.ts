import { readCsv } from './csv-table';
import type { CsvTable } from './csv-table';
import { parameterId, baseName, collectNamedValue, noFacts } from './family-facts';
import type { CollectedFacts, FileFacts } from './family-facts';
import type { FileMessage } from './file-message';
import { NUMBER_TEXT } from './file-text';

/** What an index table says of each file, by the file's name without folders. */
export interface FamilyIndex {
  readonly byFile: ReadonlyMap<string, FileFacts>;
  /** Names listed in the index, in its order. */
  readonly listed: readonly string[];
}

export type TableKind = 'index' | 'responses' | 'other';

/** An index has a column `file` and says something of the cells; a table of responses has a frequency column. */
export function kindOfTable(table: CsvTable): TableKind {
  const heads = table.rows[0].map((head) => head.trim().toLowerCase());
  if (heads.some((head) => /^(f|freq|frequency)\b|^(f|freq|frequency)_/.test(head)) && !heads.includes('file')) return 'responses';
  const saysSomething = heads.some((head) => head.endsWith('_mm') || head === 'theta_deg' || head === 'cell_id' || head === 'parameter_name');
  return heads.includes('file') && saysSomething ? 'index' : 'other';
}

/** Reads an index: one row per file, with parameter columns either by name (`patch_mm`) or as `parameter_name`, `parameter_mm` pairs. */
export function readFamilyIndex(table: CsvTable): FamilyIndex {
  const heads = table.rows[0].map((head) => head.trim());
  const fileColumn = heads.findIndex((head) => head.toLowerCase() === 'file');
  const byFile = new Map<string, FileFacts>();
  const listed: string[] = [];
  for (const row of table.rows.slice(1)) {
    const name = baseName(row[fileColumn].trim());
    if (name === '') continue;
    listed.push(name);
    byFile.set(name, factsOfRow(heads, row));
  }
  return { byFile, listed };
}

function factsOfRow(heads: readonly string[], row: readonly string[]): FileFacts {
  const facts = noFacts();
  heads.forEach((head, column) => {
    const key = head.toLowerCase();
    const value = row[column].trim();
    const named = /^parameter\d*_name$/.test(key);
    if (value === '' || /^parameter\d*_mm$/.test(key)) return;
    if (named) collectPair(facts, value, row[heads.findIndex((other) => other.toLowerCase() === key.replace('_name', '_mm'))] ?? '');
    else if (key === 'polarisation' || key === 'polarization') facts.polarisation = value;
    else if (key === 'label' || key === 'provenance') facts.provenance = value;
    else if (key === 'substrate' || key === 'material') facts.surroundings.material = value;
    else collectNamedValue(facts, head, value, 'index');
  });
  return facts;
}

function collectPair(facts: CollectedFacts, name: string, value: string): void {
  const text = value.trim();
  if (!NUMBER_TEXT.test(text) || !Number.isFinite(Number(text)) || parameterId(name) === '') return;
  facts.parameters.push({ name: parameterId(name), value: Number(text), from: 'index' });
}

/** Reads the bytes of a CSV and tells what kind of table it is. */
export function readTableFile(bytes: Uint8Array): { readonly table: CsvTable | null; readonly kind: TableKind; readonly messages: readonly FileMessage[] } {
  const result = readCsv(bytes);
  if (result.kind === 'refused') return { table: null, kind: 'other', messages: result.messages };
  return { table: result.table, kind: kindOfTable(result.table), messages: result.notices };
}
