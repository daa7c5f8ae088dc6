import type { PlacedDesign } from '../../shared/antenna/place-cells';
import { predictPlaced } from '../../shared/antenna/predict-design';
import type { PreparedEdition } from '../../shared/antenna/prepare-edition';
import { mergeTolerance } from '../../shared/antenna/tolerance/merge-tolerance';
import { toleranceBench, type ToleranceBench } from '../../shared/antenna/tolerance/tolerance-bench';
import { toleranceFaults } from '../../shared/antenna/tolerance/tolerance-faults';
import { computeTolerancePart, type ToleranceChunk, type TolerancePart } from '../../shared/antenna/tolerance/tolerance-part';
import { planTolerance } from '../../shared/antenna/tolerance/tolerance-plan';
import type { Verdict } from '../../shared/model/figures';
import type { ToleranceParameters } from '../../shared/model/tolerance-run';
import { defineRunType } from './run-type';

interface Prepared {
  readonly parameters: string;
  readonly bench: ToleranceBench;
  readonly verdicts: readonly Verdict[];
}

/** The bench last made of a placed design goes with it: a thread takes many chunks of one run in turn. */
const benches = new WeakMap<PlacedDesign, Prepared>();

function preparedOf(placed: PlacedDesign, parameters: ToleranceParameters, edition?: PreparedEdition): Prepared {
  const key = JSON.stringify(parameters);
  const known = benches.get(placed);
  if (known?.parameters === key) return known;
  const made = { parameters: key, bench: toleranceBench({ placed, edition, parameters }), verdicts: predictPlaced(placed, { include: {} }).verdicts };
  benches.set(placed, made);
  return made;
}

/** Tolerances: every chunk computes some trials of everything together, or of one contributor alone. */
export const toleranceRunType = defineRunType<'tolerance', ToleranceChunk, TolerancePart>({
  kind: 'tolerance',
  version: 'tolerance-1',
  faults: toleranceFaults,
  plan: ({ design, parameters }) => planTolerance(design, parameters),
  compute: ({ parameters, placed, edition, chunk, checkStop }) => {
    const { bench, verdicts } = preparedOf(placed, parameters, edition);
    return computeTolerancePart(bench, chunk, verdicts, checkStop);
  },
  merge: ({ parameters }, parts) => mergeTolerance(parameters, parts),
});
