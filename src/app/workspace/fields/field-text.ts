import type { QuantityDimension } from '../../../../shared/units/quantity';
import type { EntryStep } from './entry-box';

/** What one press of an arrow key adds, in the document's unit. */
const ARROW_STEPS: Readonly<Record<QuantityDimension, number>> = { frequency: 0.1, length: 1, distance: 10, angle: 0.5, level: 0.5, power: 0.1, number: 0.5 };

/** The whole value, so that taking the entry back changes nothing. */
export function fieldText(value: unknown): string {
  return typeof value === 'number' ? String(value).replace('-', '\u2212') : '';
}

export function steppedValue(value: number, { direction, coarse }: EntryStep, step: number | QuantityDimension): number {
  const size = typeof step === 'number' ? step : ARROW_STEPS[step];
  // Counted in decimals, so that steps do not gather rounding.
  return Number((value + direction * size * (coarse ? 10 : 1)).toPrecision(12));
}
