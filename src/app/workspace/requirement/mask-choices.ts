import { PUBLISHED_MASKS } from '../../../../shared/antenna/masks/published-masks';
import type { Mask, Requirement } from '../../../../shared/model/design-document';

/** The kinds of a mask as a row of words, "none" among them. */
export const MASK_KINDS: readonly { readonly value: string; readonly label: string }[] = [
  { value: 'none', label: 'None' },
  { value: 'custom', label: 'Points' },
  { value: 'formula', label: 'Formula' },
  { value: 'published', label: 'Published' },
];

/** The published envelopes by their short names. */
export const PUBLISHED_CHOICES = PUBLISHED_MASKS.map(({ id, title }) => ({ value: id, label: title.replace('ITU-R ', '') }));

const FALLEN_BACK_GAIN_DBI = 30;

/** What stands first under a kind that was chosen; undefined for none. */
export function firstMask(kind: string, { minGainDbi }: Requirement): Mask | undefined {
  const gain = minGainDbi ?? FALLEN_BACK_GAIN_DBI;
  switch (kind) {
    case 'custom':
      return { kind: 'custom', points: [[5, gain - 12], [30, gain - 28], [90, gain - 34]] };
    case 'formula':
      return {
        kind: 'formula',
        segments: [
          { fromDeg: 5, toDeg: 48, expression: '32 - 25*log10(theta)' },
          { fromDeg: 48, toDeg: 180, expression: '-10' },
        ],
      };
    case 'published':
      return { kind: 'published', id: PUBLISHED_MASKS[0].id };
    default:
      return undefined;
  }
}
