import { CONTRIBUTORS } from '../../../../shared/model/tolerance-contributors';
import type { ContributorId } from '../../../../shared/model/tolerance-run';
import { parseQuantity } from '../../../../shared/units/quantity';
import type { QuantityDimension } from '../../../../shared/units/quantity';

/** How the spread of a contributor is shown and typed. */
interface SpreadForm {
  readonly unit: string;
  readonly dimension: QuantityDimension;
  /** Shown number for one of the unit in the parameters. */
  readonly scale: number;
}

const MICROMETRES: SpreadForm = { unit: 'µm', dimension: 'length', scale: 1000 };
const MILLIMETRES: SpreadForm = { unit: 'mm', dimension: 'length', scale: 1 };

const FORMS: Readonly<Record<ContributorId, SpreadForm>> = {
  'etch-random': MICROMETRES,
  'etch-common': MICROMETRES,
  permittivity: { unit: '', dimension: 'number', scale: 1 },
  thickness: MICROMETRES,
  temperature: { unit: 'K', dimension: 'number', scale: 1 },
  lift: MILLIMETRES,
  'tilt-x': MILLIMETRES,
  'tilt-y': MILLIMETRES,
  bow: MILLIMETRES,
  'feed-axial': MILLIMETRES,
  'feed-x': MILLIMETRES,
  'feed-y': MILLIMETRES,
  'phase-scatter': { unit: '°', dimension: 'angle', scale: 1 },
  'dead-cells': { unit: '%', dimension: 'number', scale: 100 },
};

export type ReadSpread = { readonly kind: 'value'; readonly spread: number } | { readonly kind: 'refused'; readonly reason: string; readonly suggestion: string | null };

/** More than this would be refused by the server. */
const LARGEST = 1000;

export const spreadUnit = (id: ContributorId): string => FORMS[id].unit;

/** A spread in its shown unit, without the unit. */
export function spreadText(id: ContributorId, spread: number): string {
  return String(Number((spread * FORMS[id].scale).toPrecision(6)));
}

/** Reads a typed spread into the unit of the parameters. Inverse of {@link spreadText}. */
export function readSpread(id: ContributorId, text: string): ReadSpread {
  const { unit, dimension, scale } = FORMS[id];
  const plain = dimension === 'number';
  // Kelvin and percent are no units of the quantity grammar; a bare number means them here.
  const typed = plain && unit !== '' && text.trim().endsWith(unit) ? text.trim().slice(0, -unit.length) : text;
  const read = parseQuantity(typed, dimension, plain ? {} : { shownUnit: unit });
  if (read.kind === 'refused') return { kind: 'refused', reason: read.reason, suggestion: read.suggestion ?? null };
  const spread = plain ? read.value / scale : read.value;
  if (spread < 0) return { kind: 'refused', reason: 'A spread is a size and not negative', suggestion: spreadText(id, -spread) };
  const most = id === 'dead-cells' ? 1 : LARGEST;
  if (spread > most) return { kind: 'refused', reason: `At most ${spreadText(id, most)} ${unit}`.trim(), suggestion: null };
  return { kind: 'value', spread };
}

/** What the number means, by its distribution. */
export const spreadMeaning = (distribution: 'normal' | 'uniform' | 'share'): string => ({ normal: 'σ', uniform: '±', share: 'share' })[distribution];

export const contributorLabel = (id: ContributorId): string => CONTRIBUTORS[id].label;
