import { CONTRIBUTORS } from '../../../../shared/model/tolerance-contributors';
import { MOST_TRIALS, toleranceParameters } from '../../../../shared/model/tolerance-run';
import type { ToleranceParameters } from '../../../../shared/model/tolerance-run';
import type { DesignDocument } from '../../../../shared/model/design-document';

/** Numbers of the form beside the contributors. */
export type ToleranceField = 'trials' | 'seed' | 'expansionPpmPerK' | 'permittivityPpmPerK';

export const FEWEST_TRIALS = 10;

export function fieldValue({ trials, seed, material }: ToleranceParameters, field: ToleranceField): number {
  return { trials, seed, ...material }[field];
}

/** The parameters with one number replaced, or why that cannot be. */
export function withField(parameters: ToleranceParameters, field: ToleranceField, value: number): { readonly parameters: ToleranceParameters } | { readonly reason: string } {
  const next = field === 'trials' || field === 'seed' ? { ...parameters, [field]: value } : { ...parameters, material: { ...parameters.material, [field]: value } };
  if (toleranceParameters.safeParse(next).success) return { parameters: next };
  const reasons: Readonly<Record<ToleranceField, string>> = {
    trials: `A whole number from ${FEWEST_TRIALS} to ${MOST_TRIALS}`,
    seed: 'A whole number from 0 to 2⁵³ − 1',
    expansionPpmPerK: 'From −200 to 500 parts per million and kelvin',
    permittivityPpmPerK: 'From −2000 to 2000 parts per million and kelvin',
  };
  return { reason: reasons[field] };
}

/** Why this cannot be started, in words for the button; null when it can. */
export function toleranceFormFault({ contributors }: ToleranceParameters, design: DesignDocument): string | null {
  const varied = contributors.filter(({ spread }) => spread > 0);
  if (varied.length === 0) return 'Give at least one contributor a spread above 0';
  const geometry = design.cells.kind === 'edition';
  const horn = design.illumination.kind === 'horn';
  const acts = varied.some(({ id }) => (CONTRIBUTORS[id].needs === 'geometry' ? geometry : CONTRIBUTORS[id].needs === 'horn' ? horn : true));
  return acts ? null : 'Nothing that acts on this design is varied';
}

/** Whether two sets of parameters ask for the same run. */
export function sameParameters(a: ToleranceParameters, b: ToleranceParameters): boolean {
  const key = ({ trials, seed, contributors, material }: ToleranceParameters): string =>
    JSON.stringify([trials, seed, material.expansionPpmPerK, material.permittivityPpmPerK, ...contributors.filter(({ spread }) => spread > 0).map(({ id, spread, distribution }) => [id, spread, distribution]).sort()]);
  return key(a) === key(b);
}
