import { niceStep } from './axis-ticks';

export interface HistogramBins {
  /** Edges are from + i width. */
  readonly from: number;
  readonly width: number;
  readonly counts: readonly number[];
  /** Values that lie beyond the last edge on either side; they are counted into the end bins. */
  readonly beyond: number;
}

/** Bins of a round width, symmetric about zero, that reach the largest magnitude or the limit, whichever is nearer. */
export function symmetricBins(values: ArrayLike<number>, limit: number, aboutBins = 30): HistogramBins {
  let largest = 0;
  // Comparisons pass over NaN, which stands where there is no value.
  for (let i = 0; i < values.length; i++) if (Math.abs(values[i]) > largest) largest = Math.abs(values[i]);
  const reach = Math.min(limit, largest > 0 ? largest : 1);
  const width = niceStep(2 * reach, aboutBins);
  const half = Math.max(1, Math.ceil(reach / width - 1e-9));
  const counts = new Array<number>(2 * half).fill(0);
  let beyond = 0;
  for (let i = 0; i < values.length; i++) {
    if (Number.isNaN(values[i])) continue;
    const bin = Math.floor(values[i] / width) + half;
    if (bin < 0 || bin > 2 * half - 1) beyond += values[i] === half * width ? 0 : 1;
    counts[Math.max(0, Math.min(2 * half - 1, bin))] += 1;
  }
  return { from: -half * width, width, counts, beyond };
}

/** The bin that holds a value. */
export function binOf(bins: HistogramBins, value: number): number {
  return Math.max(0, Math.min(bins.counts.length - 1, Math.floor((value - bins.from) / bins.width)));
}
