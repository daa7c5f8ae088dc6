import type { DesignDocument } from '../../../../shared/model/design-document';
import { numberText } from '../../ui/plots/plot-text';
import type { LivePrediction } from '../live-prediction-data';

/** The line beside the title: frequency, model, what the gain holds. */
export function patternSubtitle({ requirement, prediction }: DesignDocument): string {
  return `${numberText(requirement.designFrequencyGHz, 3)} GHz, scalar model, radiate exponent ${prediction.radiateExponent}, after spillover and cell loss`;
}

/** Assumptions and cautions of the pattern, as drawing notes. */
export function patternNotes(prediction: LivePrediction | null): readonly string[] {
  const mask = prediction?.head.figures.maskMargin;
  const notes = [
    'A prediction is array theory, not a measurement. Blockage by the horn is not included.',
    'Cross-polar: not evaluated, the scalar model has no cross-polar part.',
    'A range test is a transmission: confirm authorisation for frequency, power, place and dates.',
  ];
  if (mask && 'kind' in mask && /^mask-(?:not-applicable|unknown)$/.test(mask.kind)) return [...notes, `The mask is not drawn: ${mask.reason}.`];
  return notes;
}
