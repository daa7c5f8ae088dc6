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

/** Assumptions and cautions of the pattern, as drawing notes. */
export function patternNotes(prediction: LivePrediction | null): readonly string[] {
  const mask = prediction?.head.figures.maskMargin;
  const notes = [
    'A prediction is array theory, not a measurement. Blockage by the horn is not included.',
    crossPolarNote(prediction),
    'A range test is a transmission: confirm authorisation for frequency, power, place and dates.',
  ];
  if (mask && 'kind' in mask && /^mask-(?:not-applicable|unknown)$/.test(mask.kind)) return [...notes, `The mask is not drawn: ${mask.reason}.`];
  return notes;
}
