import type { Outline } from '../../../../shared/model/design-document';
import type { DesignColumn } from '../fields/design-table';

export const OUTLINE_OPTIONS: readonly { readonly value: Outline['kind']; readonly label: string }[] = [
  { value: 'rectangle', label: 'Rectangle' },
  { value: 'ellipse', label: 'Ellipse' },
  { value: 'polygon', label: 'Polygon' },
];

export const CORNER_COLUMNS: readonly DesignColumn[] = [
  { key: '0', label: 'x', dimension: 'length', unit: 'mm' },
  { key: '1', label: 'y', dimension: 'length', unit: 'mm' },
];

/** A new last corner half way back to the first one, so that the outline keeps its shape. */
export function nextCorner(rows: readonly (readonly number[])[]): readonly number[] {
  const first = rows[0] ?? [0, 0];
  const last = rows.at(-1) ?? [0, 0];
  return [(first[0] + last[0]) / 2, (first[1] + last[1]) / 2];
}
