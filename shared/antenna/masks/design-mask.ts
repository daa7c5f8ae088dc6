import type { DesignDocument } from '../../model/design-document';
import type { Mask } from '../../model/mask';
import type { Figure } from '../../model/figures';
import { wavenumberRadPerM } from '../../waves/conventions';
import { isNumber } from '../no-figure';
import { largestDimensionM } from '../outline';
import { siPanel } from '../si-design';
import { maskEnvelope, maskFacts, type MaskEnvelope } from './mask-envelope';

/** Where a design was predicted and what gain was found. */
export interface MaskedAt {
  readonly frequencyGHz: number;
  readonly gainDbi: Figure;
}

/** The mask of a design as it is judged and drawn; null where there is none, or none for this panel, frequency and gain. */
export function designMask({ requirement, panel }: DesignDocument, at: MaskedAt): MaskEnvelope | null {
  return maskOfPanel(requirement.mask, panel, at);
}

/** The same for any mask of the requirement. */
export function maskOfPanel(mask: Mask | undefined, panel: DesignDocument['panel'], { frequencyGHz, gainDbi }: MaskedAt): MaskEnvelope | null {
  if (mask === undefined || (mask.kind === 'published' && !isNumber(gainDbi))) return null;
  const gain = isNumber(gainDbi) ? gainDbi : -Infinity;
  const envelope = maskEnvelope(mask, maskFacts(largestDimensionM(siPanel(panel).outline), wavenumberRadPerM(frequencyGHz * 1e9), gain));
  return 'reason' in envelope ? null : envelope;
}
