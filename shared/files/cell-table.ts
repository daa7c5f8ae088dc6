import { csvNumber } from './csv-table';
import type { CsvTable } from './csv-table';
import type { CellTableMapping, FamilyCurve, ResponseTerm, TableColumnRole } from './family-inspection';
import { FileFaults, quoted } from './file-faults';
import type { FileMessage } from './file-message';
import { decimalTimesTen } from './file-text';

export interface CellTableResult {
  readonly curves: readonly FamilyCurve[];
  readonly hasErrors: boolean;
  readonly messages: readonly FileMessage[];
}

const TERM_ORDER: readonly ResponseTerm[] = ['S11', 'S12', 'S21', 'S22'];
const FREQUENCY_EXPONENTS = { Hz: 0, kHz: 3, MHz: 6, GHz: 9 } as const;
const MM_PER_UNIT = { m: 1000, mm: 1, um: 1e-3, in: 25.4, mil: 0.0254 } as const;
/** The first so many bad cells are listed; a damaged column would otherwise fill the screen. */
const LISTED_BLANKS = 20;

interface TablePoint {
  readonly line: number;
  readonly frequencyHz: number;
  readonly terms: readonly number[];
}

interface CurveRows {
  readonly cellId: string;
  readonly parametersMm: readonly { readonly name: string; readonly value: number }[];
  readonly thetaDeg: number;
  readonly phiDeg: number;
  readonly points: TablePoint[];
}

/** Reads a table with one row per cell, incidence and frequency into the same curves that network files give. */
export function readCellTable(table: CsvTable, mapping: CellTableMapping, file: { readonly name: string; readonly sha256?: string }): CellTableResult {
  const faults = new FileFaults(LISTED_BLANKS);
  const terms = givenTerms(mapping, faults);
  if (!mapping.columns.some(({ holds }) => holds.role === 'frequency')) faults.error(mapping.headerRow, 'No column holds the frequency');
  if (!mapping.columns.some(({ holds }) => holds.role === 'cell' || holds.role === 'parameter')) faults.error(mapping.headerRow, 'No column names the cell or a parameter of it');
  const width = table.rows[0].length;
  for (const { column } of mapping.columns) if (!(column >= 0 && column < width)) faults.error(mapping.headerRow, `Column ${column + 1} does not exist; the table has ${width}`);
  if (faults.hasErrors) return { curves: [], hasErrors: true, messages: faults.messages() };
  const groups = groupRows({ table, mapping, terms, faults });
  const curves = [...groups.values()].map((group) => toCurve(group, terms.length === 1 ? 1 : 2, file, faults));
  if (curves.length === 0 && !faults.hasErrors) faults.error(0, 'The table holds no complete row');
  return { curves: faults.hasErrors ? [] : curves, hasErrors: faults.hasErrors, messages: faults.messages() };
}

/** S11 alone makes a one-port, all four a two-port; anything between would need invented zeros. */
function givenTerms(mapping: CellTableMapping, faults: FileFaults): readonly ResponseTerm[] {
  const line = mapping.headerRow;
  const given = TERM_ORDER.filter((term) => mapping.columns.some(({ holds }) => holds.role === 'response' && holds.term === term));
  for (const term of given) {
    const parts = mapping.columns.flatMap(({ holds }) => (holds.role === 'response' && holds.term === term ? [holds.part] : []));
    const isRectangular = parts.length === 2 && parts.includes('real') && parts.includes('imaginary');
    const isPolar = parts.length === 2 && parts.includes('phase') && (parts.includes('dB') || parts.includes('magnitude'));
    if (!isRectangular && !isPolar) faults.error(line, `${term} takes real and imaginary part, or dB or magnitude and phase; given: ${parts.join(', ')}`);
  }
  if (!(given.length === 4 || (given.length === 1 && given[0] === 'S11')))
    faults.error(line, `A response is S11 alone or S11, S21, S12 and S22; given: ${given.join(', ') || 'none'}`);
  return given;
}

interface TableReading {
  readonly table: CsvTable;
  readonly mapping: CellTableMapping;
  readonly terms: readonly ResponseTerm[];
  readonly faults: FileFaults;
}

function groupRows(reading: TableReading): Map<string, CurveRows> {
  const { table, mapping, faults } = reading;
  const groups = new Map<string, CurveRows>();
  let missing = 0;
  for (let index = mapping.headerRow; index < table.rows.length; index++) {
    const row = readRow(reading, index);
    if (row === null) {
      missing += 1;
      continue;
    }
    const key = JSON.stringify([row.cellId, row.thetaDeg, row.phiDeg]);
    const group = groups.get(key);
    if (group === undefined) groups.set(key, { ...row, points: [row.point] });
    else if (group.parametersMm.every(({ value }, i) => value === row.parametersMm[i].value)) group.points.push(row.point);
    else faults.error(row.point.line, `Cell ${quoted(row.cellId)} has other parameters here than on line ${group.points[0].line}`);
  }
  if (missing > 0 && mapping.blanks === 'missing') faults.warn(0, `${missing} row(s) without a complete response are left out as missing points`);
  return groups;
}

type RowReading = Omit<CurveRows, 'points'> & { readonly point: TablePoint };

/** One row, or null when a needed cell is no number. */
function readRow({ table, mapping, terms, faults }: TableReading, index: number): RowReading | null {
  const line = table.rowLines[index];
  const row = table.rows[index];
  let isComplete = true;
  const numberAt = (column: number): number => {
    const value = csvNumber(row[column], table.dialect);
    if (value !== null) return value;
    isComplete = false;
    if (mapping.blanks === 'refuse') faults.add('error', { line, column: column + 1, text: `${quoted(row[column])} is not a number`, suggestion: 'Correct it, or leave such rows out as missing' });
    return 0;
  };
  const found = mapping.columns.map(({ column, holds }) => ({ holds, value: holds.role === 'cell' ? 0 : numberAt(column), text: row[column].trim() }));
  const parametersMm = found.flatMap(({ holds, value }) => (holds.role === 'parameter' ? [{ name: holds.name, value: Number((value * MM_PER_UNIT[holds.unit]).toPrecision(15)) }] : []));
  const cellId = found.find(({ holds }) => holds.role === 'cell')?.text || parametersMm.map(({ name, value }) => `${name}${value}`).join('_');
  const frequencyHz = frequencyOf(found);
  const complexTerms = terms.flatMap((term) => complexOf(term, found));
  const isUsable = isComplete && frequencyHz >= 0 && complexTerms.every(Number.isFinite);
  if (isComplete && !isUsable) faults.error(line, 'A frequency or a response on this row is out of range');
  if (!isUsable) return null;
  return { cellId, parametersMm, thetaDeg: angleDeg('theta', found), phiDeg: angleDeg('phi', found), point: { line, frequencyHz, terms: complexTerms } };
}

interface FoundValue {
  readonly holds: TableColumnRole;
  readonly value: number;
}

function frequencyOf(found: readonly FoundValue[]): number {
  const entry = found.find(({ holds }) => holds.role === 'frequency');
  if (entry === undefined || entry.holds.role !== 'frequency') return Number.NaN;
  return decimalTimesTen(String(entry.value), FREQUENCY_EXPONENTS[entry.holds.unit]);
}

function angleDeg(role: 'theta' | 'phi', found: readonly FoundValue[]): number {
  const entry = found.find(({ holds }) => holds.role === role);
  if (entry === undefined || entry.holds.role !== role) return 0;
  return entry.holds.unit === 'deg' ? entry.value : Number(((entry.value * 180) / Math.PI).toPrecision(12));
}

function complexOf(term: ResponseTerm, found: readonly FoundValue[]): readonly [number, number] {
  let [re, im, magnitude, phaseRad] = [0, 0, 0, 0];
  let isPolar = false;
  for (const { holds, value } of found) {
    if (holds.role !== 'response' || holds.term !== term) continue;
    if (holds.part === 'real') re = value;
    else if (holds.part === 'imaginary') im = value;
    else if (holds.part === 'phase') phaseRad = holds.unit === 'deg' ? (value * Math.PI) / 180 : value;
    else magnitude = holds.part === 'dB' ? 10 ** (value / 20) : value;
    isPolar ||= holds.part === 'phase';
  }
  return isPolar ? [magnitude * Math.cos(phaseRad), magnitude * Math.sin(phaseRad)] : [re, im];
}

function toCurve(group: CurveRows, portCount: number, file: { readonly name: string; readonly sha256?: string }, faults: FileFaults): FamilyCurve {
  const points = [...group.points].sort((a, b) => a.frequencyHz - b.frequencyHz || a.line - b.line);
  const kept = points.filter((point, i) => {
    const before = points[i - 1];
    if (before === undefined || before.frequencyHz !== point.frequencyHz) return true;
    const isEqual = point.terms.every((value, term) => value === before.terms[term]);
    if (isEqual) faults.warn(point.line, `${point.frequencyHz} Hz stands twice with the same values for ${quoted(group.cellId)}; it was merged`);
    else faults.error(point.line, `${point.frequencyHz} Hz stands twice with different values for ${quoted(group.cellId)}; first on line ${before.line}`);
    return false;
  });
  return {
    file: file.name,
    ...(file.sha256 === undefined ? {} : { sha256: file.sha256 }),
    cellId: group.cellId,
    parametersMm: group.parametersMm,
    thetaDeg: group.thetaDeg,
    phiDeg: group.phiDeg,
    portCount,
    frequenciesHz: Float64Array.from(kept, (point) => point.frequencyHz),
    values: Float64Array.from(kept.flatMap((point) => point.terms)),
    lines: Int32Array.from(kept, (point) => point.line),
  };
}
