import { DEFAULT_TOLERANCE } from '../../model/tolerance-contributors';
import type { ToleranceParameters, ToleranceResult } from '../../model/tolerance-run';
import { exampleDesign } from '../example-design';
import { placeCells } from '../place-cells';
import { predictPlaced } from '../predict-design';
import { mergeTolerance } from './merge-tolerance';
import { toleranceBench } from './tolerance-bench';
import { computeTolerancePart } from './tolerance-part';
import { planTolerance } from './tolerance-plan';

/** The example design with a requirement that some of its trials miss. Invented, for checks. */
export const SAMPLE_TOLERANCE_DESIGN = exampleDesign({
  requirement: { ...exampleDesign().requirement, minGainDbi: 29.05, maxSidelobeDb: -20.5, pointingToleranceDeg: 0.15, minCrossPolarDiscriminationDb: 25 },
});

export const SAMPLE_TOLERANCE_PARAMETERS: ToleranceParameters = {
  ...DEFAULT_TOLERANCE,
  trials: 20,
  contributors: [
    { id: 'phase-scatter', spread: 15, distribution: 'normal' },
    { id: 'bow', spread: 1, distribution: 'normal' },
    { id: 'etch-random', spread: 0.02, distribution: 'normal' },
  ],
};

/** A whole run of the sample, as a page or a test sees it. */
export function sampleToleranceResult(parameters = SAMPLE_TOLERANCE_PARAMETERS): ToleranceResult {
  const placed = placeCells(SAMPLE_TOLERANCE_DESIGN);
  const bench = toleranceBench({ placed, parameters });
  const { verdicts } = predictPlaced(placed, { include: {} });
  const parts = planTolerance(SAMPLE_TOLERANCE_DESIGN, parameters).map(({ chunk }) => computeTolerancePart(bench, chunk, verdicts, () => undefined));
  return mergeTolerance(parameters, parts);
}

/** A figure that must be a number here. */
export function numberIn(figure: unknown): number {
  if (typeof figure !== 'number') throw new Error(`there is no such figure: ${JSON.stringify(figure)}`);
  return figure;
}
