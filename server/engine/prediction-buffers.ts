import type { PredictionOutcome } from './prediction-task';

/** The memory of every array in an outcome, once each, so that a thread can give it away instead of copying it. */
export function buffersOf(outcome: PredictionOutcome): ArrayBuffer[] {
  if (outcome.kind !== 'predicted') return [];
  const { cells, cuts, uv } = outcome.prediction;
  const holders: object[] = [...(cells === undefined ? [] : [cells]), ...(cuts ?? []), ...(uv === undefined ? [] : [uv])];
  const arrays = holders.flatMap((holder) => Object.values(holder) as unknown[]).filter((value) => ArrayBuffer.isView(value));
  return [...new Set(arrays.map(({ buffer }) => buffer))].filter((buffer) => buffer instanceof ArrayBuffer);
}
