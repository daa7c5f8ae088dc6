import type { DesignDocument } from './design-document';
import { fieldLabel } from './design-labels';
import { isBranch, pointerTo } from './design-pointer';
import { designPartText } from './design-text';

/** A part that can be exchanged on its own: a single value, a list whose length changed, or a choice whose kind changed. */
export interface DifferingPart {
  readonly pointer: string;
  /** Undefined when the part is absent on that side. */
  readonly before: unknown;
  readonly after: unknown;
}

export interface DesignDifference {
  readonly pointer: string;
  readonly label: string;
  readonly unit: string;
  readonly before: number | string | boolean | null;
  readonly after: number | string | boolean | null;
}

/** The smallest parts by which two documents differ, in the order of the document. */
export function differingParts(before: unknown, after: unknown, pointer = ''): readonly DifferingPart[] {
  if (Object.is(before, after)) return [];
  const whole = [{ pointer, before, after }];
  if (!isBranch(before) || !isBranch(after)) return whole;
  if (Array.isArray(before) !== Array.isArray(after)) return whole;
  if (Array.isArray(before) && before.length !== (after as readonly unknown[]).length) return whole;
  const left = before as Readonly<Record<string, unknown>>;
  const right = after as Readonly<Record<string, unknown>>;
  if (left['kind'] !== right['kind']) return whole;
  const names = new Set([...Object.keys(left), ...Object.keys(right)]);
  return [...names].flatMap((name) => differingParts(left[name], right[name], pointerTo(pointer, name)));
}

/** What two designs have different, named as on the screens. Equal designs have no differences. */
export function designDifferences(before: DesignDocument, after: DesignDocument): DesignDifference[] {
  return differingParts(before, after).map((part) => ({
    pointer: part.pointer,
    ...fieldLabel(part.pointer),
    before: designPartText(part.before),
    after: designPartText(part.after),
  }));
}

/** How many single values a design holds: the number that a count of differences is to be read against. */
export function countParameters(design: DesignDocument): number {
  return countLeaves(design);
}

function countLeaves(value: unknown): number {
  if (!isBranch(value)) return value === undefined ? 0 : 1;
  return Object.values(value).reduce<number>((count, inner) => count + countLeaves(inner), 0);
}
