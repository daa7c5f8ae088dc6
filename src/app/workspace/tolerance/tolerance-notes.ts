import type { ToleranceResult } from '../../../../shared/model/tolerance-run';

/** Assumptions and cautions of every tolerance run, as drawing notes. */
export const SHEET_NOTES = [
  'Array theory under assumed spreads, not a measurement. At the design frequency; contributors vary independently.',
  'The trials take the scalar model; where the design asks for the vector model, they take what each cell sends into the first beam and start from the gain of that model.',
  'Spreads marked “common practice” have no source: put in what your board shop and your mount hold.',
] as const;

/** What is to be said of the result of one run. */
export function outcomeNotes({ cellsWithoutNeighbour, ranking, trials, envelopeTrials }: ToleranceResult): string[] {
  const estimated = ranking.some(({ id, notApplied }) => notApplied === null && (id === 'permittivity' || id === 'thickness' || id === 'temperature'));
  return [
    ...(estimated ? ['Permittivity, thickness and temperature are estimates: patches as a thin sheet on a grounded slab, too strong near resonance by up to 1.8 times.'] : []),
    ...(cellsWithoutNeighbour > 0 ? [`${cellsWithoutNeighbour} cells have no neighbour of another size in their edition, so etching leaves them as they are.`] : []),
    ...(envelopeTrials < trials ? [`The envelope is that of the first ${envelopeTrials} trials.`] : []),
  ];
}

/** The line beside the title. */
export function toleranceSubtitle(frequencyGHz: number, trials: number): string {
  return `${frequencyGHz} GHz, scalar model, ${trials} panels made by chance`;
}
