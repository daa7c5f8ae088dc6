import type { Verdict } from '../../model/figures';
import type { ContributorId, ToleranceReading } from '../../model/tolerance-run';
import type { ToleranceBench, ToleranceStudy } from './tolerance-bench';

/** Trials `from` to `to`, the last not included, of one study. */
export interface ToleranceChunk {
  readonly study: ToleranceStudy;
  readonly from: number;
  readonly to: number;
  /** The first trials also keep their cuts, up to this one. */
  readonly cutsTo: number;
}

/** Gains of the cuts of some trials in hundredths of a decibel, trial after trial: whole numbers are short as text. */
export interface CutGains {
  readonly centiDbi: readonly number[];
}

/** What holds for the panel as drawn; the first chunk of everything together tells it. */
export interface NominalPart {
  readonly reading: ToleranceReading;
  readonly verdicts: readonly Verdict[];
  readonly cuts: readonly { readonly plane: 'along' | 'across'; readonly angleDeg: readonly number[]; readonly centiDbi: readonly number[] }[];
  readonly notApplied: readonly { readonly id: ContributorId; readonly reason: string }[];
  readonly cellsWithoutNeighbour: number;
}

/** Result of one chunk: plain JSON. */
export interface TolerancePart {
  readonly study: ToleranceStudy;
  readonly from: number;
  readonly readings: readonly ToleranceReading[];
  readonly cuts: readonly CutGains[];
  readonly nominal: NominalPart | null;
}

const centi = (gainsDbi: Float64Array): number[] => Array.from(gainsDbi, (dbi) => Math.round(100 * dbi));

/** Computes a chunk. `verdicts` are those of the panel as drawn; `checkStop` may throw between trials. */
export function computeTolerancePart(bench: ToleranceBench, chunk: ToleranceChunk, verdicts: readonly Verdict[], checkStop: () => void): TolerancePart {
  const readings: ToleranceReading[] = [];
  const cuts = bench.cuts.map((): number[] => []);
  for (let trial = chunk.from; trial < chunk.to; trial++) {
    checkStop();
    const pattern = bench.patternOf(chunk.study, trial);
    readings.push(bench.read(pattern));
    if (trial < chunk.cutsTo) bench.cuts.forEach((cut, i) => cuts[i].push(...centi(cut.gainsDbi(pattern))));
  }
  const tells = chunk.study === 'all' && chunk.from === 0;
  return { study: chunk.study, from: chunk.from, readings, cuts: cuts.map((centiDbi) => ({ centiDbi })), nominal: tells ? nominalPart(bench, verdicts) : null };
}

function nominalPart(bench: ToleranceBench, verdicts: readonly Verdict[]): NominalPart {
  const pattern = bench.patternOf('all', null);
  return {
    reading: bench.read(pattern),
    verdicts,
    cuts: bench.cuts.map((cut) => ({ plane: cut.plane, angleDeg: Array.from(cut.angleDeg), centiDbi: centi(cut.gainsDbi(pattern)) })),
    notApplied: bench.model.notApplied,
    cellsWithoutNeighbour: bench.model.cellsWithoutNeighbour,
  };
}
