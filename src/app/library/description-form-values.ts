import { familyDescription } from '../../../shared/model/cell-family';
import type { FamilyDescription } from '../../../shared/model/cell-family';

/** What a person typed for one field, as text; numbers are read when the description is put together. */
export interface DescriptionEntries {
  readonly [field: string]: string;
}

export interface DescriptionField {
  /** Path into the description, with dots. */
  readonly path: string;
  readonly label: string;
  readonly kind: 'text' | 'long' | 'number' | 'choice' | 'date';
  readonly unit?: string;
  readonly choices?: readonly { readonly id: string; readonly label: string }[];
  readonly hint?: string;
}

const choice = (id: string, label = id): { readonly id: string; readonly label: string } => ({ id, label });

/** The fields of a family in the order in which a laboratory thinks of them. */
export const DESCRIPTION_FIELDS: readonly DescriptionField[] = [
  { path: 'name', label: 'Name of the family', kind: 'text' },
  { path: 'kind', label: 'Kind of cell', kind: 'text', hint: 'square patch, ring and patch, rotated split ring' },
  { path: 'summary', label: 'Summary', kind: 'long' },
  { path: 'operation', label: 'Operation', kind: 'choice', choices: [choice('reflect', 'reflecting'), choice('transmit', 'transmitting')] },
  { path: 'periodXMm', label: 'Period along x', kind: 'number', unit: 'mm' },
  { path: 'periodYMm', label: 'Period along y', kind: 'number', unit: 'mm' },
  { path: 'substrate.material', label: 'Substrate', kind: 'text' },
  { path: 'substrate.relativePermittivity', label: 'Relative permittivity', kind: 'number' },
  { path: 'substrate.lossTangent', label: 'Loss tangent', kind: 'number' },
  { path: 'substrate.thicknessMm', label: 'Thickness', kind: 'number', unit: 'mm' },
  { path: 'metal', label: 'Metal', kind: 'text' },
  { path: 'designFrequencyGHz', label: 'Judged at', kind: 'number', unit: 'GHz', hint: 'phase range and gaps are judged here' },
  {
    path: 'ports',
    label: 'What the ports are',
    kind: 'choice',
    choices: [
      choice('either', 'one port, either polarisation by symmetry'),
      choice('x', 'one port, x'),
      choice('y', 'one port, y'),
      choice('x-and-y', 'port 1 x, port 2 y'),
      choice('te-and-tm', 'port 1 TE, port 2 TM'),
    ],
  },
  { path: 'referencePlane', label: 'Reference plane', kind: 'text', hint: 'top of the substrate, ground plane, distance from either' },
  { path: 'timeConvention', label: 'Time convention', kind: 'choice', choices: [choice('exp(+jwt)', 'exp(+jωt), as analysers write'), choice('exp(-jwt)', 'exp(−jωt), conjugated on import')] },
  { path: 'provenance', label: 'Provenance', kind: 'choice', choices: [choice('measured'), choice('simulated'), choice('analytic'), choice('invented')] },
  { path: 'instrument', label: 'Instrument or method', kind: 'text' },
  { path: 'date', label: 'Date', kind: 'date' },
  { path: 'limits', label: 'Stated limits', kind: 'long', hint: 'what a designer must not use it for' },
];

/** Fills the fields from what the files say; what they do not say stays empty. */
export function entriesOf(hint: Partial<FamilyDescription>): DescriptionEntries {
  return Object.fromEntries(
    DESCRIPTION_FIELDS.map(({ path }) => {
      const value = path.split('.').reduce<unknown>((part, key) => (typeof part === 'object' && part !== null ? (part as Record<string, unknown>)[key] : undefined), hint);
      return [path, typeof value === 'string' || typeof value === 'number' ? String(value) : ''];
    }),
  );
}

export type DescriptionResult =
  | { readonly kind: 'complete'; readonly description: FamilyDescription }
  /** By path: what is missing or wrong. */
  | { readonly kind: 'incomplete'; readonly faults: Readonly<Record<string, string>> };

/** Puts the description together from the entries and from the parts that are no plain fields. */
export function descriptionOf(entries: DescriptionEntries, parts: Pick<FamilyDescription, 'parameters' | 'shapes' | 'excludedRegions'>): DescriptionResult {
  const faults: Record<string, string> = {};
  const draft: Record<string, unknown> = { ...parts, substrate: {} };
  for (const field of DESCRIPTION_FIELDS) {
    const text = (entries[field.path] ?? '').trim();
    const value = field.kind === 'number' ? numberOf(text) : text;
    if (value === null) faults[field.path] = text === '' ? 'is needed: a number' : `must be a number${text.includes(',') ? '; use a point for decimals' : ''}`;
    else setAt(draft, field.path, value);
  }
  if (Object.keys(faults).length > 0) return { kind: 'incomplete', faults };
  const parsed = familyDescription.safeParse(draft);
  if (parsed.success) return { kind: 'complete', description: parsed.data };
  for (const issue of parsed.error.issues) faults[issue.path.join('.')] ??= issue.code === 'too_small' ? 'is needed' : issue.message;
  return { kind: 'incomplete', faults };
}

function numberOf(text: string): number | null {
  return /^[+-]?(\d+(\.\d*)?|\.\d+)([eE][+-]?\d+)?$/.test(text) ? Number(text) : null;
}

function setAt(target: Record<string, unknown>, path: string, value: unknown): void {
  const [first, second] = path.split('.');
  if (second === undefined) target[first] = value;
  else (target[first] as Record<string, unknown>)[second] = value;
}
