import type { DesignDocument } from '../../../../shared/model/design-document';

const RANGE_TEST = 'A range test is a transmission: confirm authorisation for frequency, power, place and dates.';
const BLOCKAGE = {
  reflect: 'Blockage counts where the radius of horn and mount is given: cells in their shadow along the first beam re-radiate nothing. Spillover counts the power that misses the outline; cuts show it behind a reflecting panel.',
  transmit: 'The horn stands behind the panel and blocks nothing. Spillover counts the power that misses the outline.',
} as const;

/** Assumptions and cautions of what lights the panel; those of a horn only where there is one. */
export function illuminationNotes({ illumination, panel }: DesignDocument): readonly string[] {
  if (illumination.kind !== 'horn') return [RANGE_TEST];
  return [BLOCKAGE[panel.operation], `Do not enter the space between horn and panel while transmitting. ${RANGE_TEST}`];
}
