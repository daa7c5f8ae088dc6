import { designFaults } from '../../../shared/antenna/design-faults';
import { designDocument } from '../../../shared/model/design-document';
import type { DesignDocument } from '../../../shared/model/design-document';
import { replacedAt, valueAt } from '../../../shared/model/design-pointer';
import { formatQuantity, parseQuantity } from '../../../shared/units/quantity';
import type { QuantityDimension } from '../../../shared/units/quantity';

/** What a person typed into the field of one number of the design. */
export interface FieldEntry {
  readonly pointer: string;
  readonly text: string;
  readonly dimension: QuantityDimension;
  readonly shownUnit: string;
  /** An empty field takes the value away. */
  readonly optional: boolean;
  /** Only whole numbers stand here. */
  readonly whole?: boolean;
}

export type FieldEdit =
  | { readonly kind: 'changed'; readonly design: DesignDocument; readonly note: string | null }
  | { readonly kind: 'same' }
  | { readonly kind: 'refused'; readonly reason: string; readonly suggestion: string | null };

/** The design with the entry in its place, or why the entry cannot stand. */
export function editField(design: DesignDocument, entry: FieldEntry): FieldEdit {
  if (entry.optional && entry.text.trim() === '') return editValue(design, entry.pointer, undefined);
  const read = parseQuantity(entry.text, entry.dimension, { shownUnit: entry.shownUnit });
  if (read.kind === 'refused') return { kind: 'refused', reason: read.reason, suggestion: read.suggestion ?? null };
  if (entry.whole && !Number.isInteger(read.value)) {
    return { kind: 'refused', reason: `must be a whole number; got ${read.value}`, suggestion: String(Math.round(read.value)) };
  }
  const edit = editValue(design, entry.pointer, read.value, entry);
  return edit.kind === 'changed' && read.note !== undefined ? { ...edit, note: read.note } : edit;
}

/** How a field shows its number. */
type ShownQuantity = Pick<FieldEntry, 'dimension' | 'shownUnit'>;

/** The same for a value that is not typed: a choice, a pasted table, a whole outline. */
export function editValue(design: DesignDocument, pointer: string, value: unknown, shown?: ShownQuantity): FieldEdit {
  if (Object.is(valueAt(design, pointer), value)) return { kind: 'same' };
  const next = replacedAt(design, pointer, value);
  const parsed = designDocument.safeParse(next);
  if (!parsed.success) return { kind: 'refused', reason: reasonOf(parsed.error.issues[0], next, (at) => (at === pointer ? shown : undefined)), suggestion: null };
  const known = new Set(designFaults(design).map((fault) => fault.pointer));
  const fault = designFaults(next).find((candidate) => !known.has(candidate.pointer));
  if (fault) return { kind: 'refused', reason: fault.detail, suggestion: null };
  return { kind: 'changed', design: next, note: null };
}

interface SchemaIssue {
  readonly code?: string;
  readonly path: readonly PropertyKey[];
  readonly message: string;
  readonly minimum?: unknown;
  readonly maximum?: unknown;
  readonly inclusive?: boolean;
}

/** What would be right, and what was found. */
function reasonOf(issue: SchemaIssue, design: unknown, shownAt: (pointer: string) => ShownQuantity | undefined): string {
  const at = `/${issue.path.map(String).join('/')}`;
  const found = valueAt(design, at);
  const shown = shownAt(at);
  const got = typeof found === 'number' || typeof found === 'string' ? `; got ${quantityText(found, shown)}` : '';
  if (issue.code === 'too_small') return `must be ${issue.inclusive ? 'at least' : 'greater than'} ${quantityText(issue.minimum, shown)}${got}`;
  if (issue.code === 'too_big') return `must be ${issue.inclusive ? 'at most' : 'less than'} ${quantityText(issue.maximum, shown)}${got}`;
  return `${issue.message}${got}`;
}

/** A limit or an entry as the field shows it: with its unit, a space every three digits and a true minus sign. */
function quantityText(value: unknown, shown: ShownQuantity | undefined): string {
  if (typeof value !== 'number') return String(value);
  const text = shown === undefined ? String(value) : formatQuantity(value, shown.dimension, { shownUnit: shown.shownUnit });
  return text.replace('-', '\u2212').replace(/^(\D?)(\d{4,})/, (_, sign: string, whole: string) => `${sign}${whole.replace(/\B(?=(\d{3})+$)/g, '\u00a0')}`);
}
