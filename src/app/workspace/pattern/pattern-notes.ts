import type { DesignDocument } from '../../../../shared/model/design-document';
import { numberText } from '../../ui/plots/plot-text';
import type { LivePrediction } from '../live-prediction-data';
import { modelText } from './vector-rows';

/** The line beside the title: frequency, model, what the gain holds. */
export function patternSubtitle({ requirement, prediction }: DesignDocument): string {
  return `${numberText(requirement.designFrequencyGHz, 3)} GHz, ${modelText(prediction)}`;
}

function crossPolarNote(prediction: LivePrediction | null): string {
  const vector = prediction?.head.figures.vector;
  if (!vector) return 'Cross-polar: not evaluated, the scalar model has no cross-polar part. The vector model is chosen on the Illumination sheet.';
  const balance = typeof vector.radiatedOverLeavingDb === 'number' ? ` Power of the far field against what leaves the cells: ${signedDb(vector.radiatedOverLeavingDb)} dB.` : '';
  return `Cuts, lobes and beamwidths are of the co-polar field; the definitions of both stand under “How computed”.${balance}`;
}

function signedDb(value: number): string {
  const text = numberText(value, 2);
  return value > 0 && text !== '0.00' ? `+${text}` : text;
}

/** What the pattern holds of horn and mount in the way of the beam; null where no horn stands before the panel. */
export function blockageNote({ illumination, panel }: DesignDocument): string | null {
  if (illumination.kind !== 'horn') return null;
  if (panel.operation === 'transmit') return 'The horn stands behind the panel and blocks nothing.';
  if (illumination.blockageRadiusMm === undefined) return 'Blockage by the horn is not included; the Illumination sheet takes the radius of horn and mount.';
  return `Blockage is included: a disc of radius ${numberText(illumination.blockageRadiusMm, 1)} mm for horn and mount shades cells along the first beam; what horn and mount scatter is not.`;
}

/** Assumptions and cautions of the pattern, as drawing notes. */
export function patternNotes(design: DesignDocument, prediction: LivePrediction | null): readonly string[] {
  const mask = prediction?.head.figures.maskMargin;
  const blockage = blockageNote(design);
  const notes = [
    `A prediction is array theory, not a measurement.${blockage ? ` ${blockage}` : ''}`,
    crossPolarNote(prediction),
    'A range test is a transmission: confirm authorisation for frequency, power, place and dates.',
  ];
  if (mask && 'kind' in mask && /^mask-(?:not-applicable|unknown)$/.test(mask.kind)) return [...notes, `The mask is not drawn: ${mask.reason}.`];
  return notes;
}
