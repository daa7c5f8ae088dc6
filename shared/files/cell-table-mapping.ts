import type { CsvTable } from './csv-table';
import type { CellTableMapping, ResponseTerm, TableColumn, TableColumnRole } from './family-inspection';
import { parameterId } from './family-facts';

export interface SuggestedMapping {
  readonly mapping: CellTableMapping;
  /** Headings that say what they hold but not in which unit, or nothing known: a person decides. */
  readonly undecided: readonly { readonly column: number; readonly heading: string }[];
}

const FREQUENCY_UNITS: Readonly<Record<string, 'Hz' | 'kHz' | 'MHz' | 'GHz'>> = { hz: 'Hz', khz: 'kHz', mhz: 'MHz', ghz: 'GHz' };
const LENGTH_UNITS: Readonly<Record<string, 'm' | 'mm' | 'um' | 'in' | 'mil'>> = { m: 'm', mm: 'mm', um: 'um', µm: 'um', in: 'in', mil: 'mil' };
const TERMS: Readonly<Record<string, ResponseTerm>> = { s11: 'S11', s21: 'S21', s12: 'S12', s22: 'S22', gamma: 'S11' };

/** Reads the headings `freq_GHz`, `theta_deg`, `S11_dB`, `S11 phase (deg)`, `Re(S11)`, `patch_mm` and their like. A unit is never assumed. */
export function suggestTableMapping(table: CsvTable): SuggestedMapping {
  const columns: TableColumn[] = [];
  const undecided: { column: number; heading: string }[] = [];
  table.rows[0].forEach((heading, column) => {
    const holds = roleOfHeading(heading);
    if (holds === null) undecided.push({ column, heading });
    else columns.push({ column, holds });
  });
  return { mapping: { columns, headerRow: 1, blanks: 'refuse' }, undecided };
}

function roleOfHeading(heading: string): TableColumnRole | null {
  const words = heading.trim().split(/[^A-Za-z0-9µ.]+/).filter((word) => word !== '');
  const folded = words.map((word) => word.toLowerCase());
  const term = folded.map((word) => (Object.hasOwn(TERMS, word) ? TERMS[word] : undefined)).find((found) => found !== undefined);
  if (term !== undefined) return responseRole(term, folded);
  if (['cell', 'cellid', 'id'].includes(folded[0]) && folded.every((word) => ['cell', 'cellid', 'id', 'name'].includes(word))) return { role: 'cell' };
  const unit = folded[folded.length - 1] ?? '';
  const angle = unit === 'deg' || unit === 'rad' ? unit : null;
  if (['f', 'freq', 'frequency'].includes(folded[0])) return Object.hasOwn(FREQUENCY_UNITS, unit) ? { role: 'frequency', unit: FREQUENCY_UNITS[unit] } : null;
  if (folded[0] === 'theta') return angle ? { role: 'theta', unit: angle } : null;
  if (folded[0] === 'phi') return angle ? { role: 'phi', unit: angle } : null;
  const name = parameterId(words.slice(0, -1).join('_'));
  return words.length > 1 && name !== '' && Object.hasOwn(LENGTH_UNITS, unit) ? { role: 'parameter', name, unit: LENGTH_UNITS[unit] } : null;
}

function responseRole(term: ResponseTerm, words: readonly string[]): TableColumnRole | null {
  const has = (...wanted: readonly string[]) => words.some((word) => wanted.includes(word));
  if (has('db')) return { role: 'response', term, part: 'dB' };
  if (has('re', 'real')) return { role: 'response', term, part: 'real' };
  if (has('im', 'imag', 'imaginary')) return { role: 'response', term, part: 'imaginary' };
  if (has('deg')) return { role: 'response', term, part: 'phase', unit: 'deg' };
  if (has('rad')) return { role: 'response', term, part: 'phase', unit: 'rad' };
  if (has('phase', 'ang', 'angle', 'arg')) return null;
  return has('mag', 'magnitude', 'abs') ? { role: 'response', term, part: 'magnitude' } : null;
}
