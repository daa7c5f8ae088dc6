import type { BandLine, BandPoint, BandResult, Extreme } from '../../model/band-run';
import type { Figure, Verdict } from '../../model/figures';
import { isNumber } from '../no-figure';
import type { BandQuestion } from './band-faults';
import { bandEdgesGHz } from './band-frequencies';
import { gainBandwidth } from './gain-bandwidth';

const DROPS_DB = [1, 3] as const;

/** Puts the points of a band together, in whatever order they come. */
export function mergeBand(question: BandQuestion, given: readonly BandPoint[]): BandResult {
  const points = [...given].sort((a, b) => a.frequencyGHz - b.frequencyGHz);
  const { designFrequencyGHz } = question.design.requirement;
  return {
    bandGHz: bandEdgesGHz(question),
    designFrequencyGHz,
    points,
    bandwidths: DROPS_DB.map((dropDb) => gainBandwidth(points, dropDb, designFrequencyGHz)),
    lines: worstLines(points),
    extremes: {
      highestGainAtBeamDbi: extremeOf(points, (point) => point.gainAtBeamDbi, Math.max),
      lowestGainAtBeamDbi: extremeOf(points, (point) => point.gainAtBeamDbi, Math.min),
      largestPointingErrorDeg: extremeOf(points, (point) => point.pointingErrorDeg, Math.max),
      highestSidelobeDb: extremeOf(points, (point) => point.sidelobeDb, Math.max),
    },
  };
}

interface Judged {
  readonly frequencyGHz: number;
  readonly verdict: Verdict;
}

/**
 * Each line of the requirement at its worst frequency. It meets only if it was judged and met everywhere; one that falls
 * short anywhere falls short; else the first frequency at which it was not evaluated is named.
 */
export function worstLines(points: readonly BandPoint[]): BandLine[] {
  const names = points[0]?.verdicts.map(({ line }) => line) ?? [];
  return names.map((name) => {
    const judged = points.flatMap(({ frequencyGHz, verdicts }) => verdicts.filter(({ line }) => line === name).map((verdict): Judged => ({ frequencyGHz, verdict })));
    const worst = judged.filter(({ verdict }) => isNumber(verdict.margin)).reduce<Judged | null>(worse, null);
    const open = judged.find(({ verdict }) => verdict.verdict === 'not-evaluated');
    const { frequencyGHz, verdict } = worst?.verdict.verdict === 'falls-short' ? worst : (open ?? worst ?? judged[0]);
    return { ...verdict, frequencyGHz };
  });
}

function worse(worst: Judged | null, next: Judged): Judged {
  if (worst === null) return next;
  return Number(next.verdict.margin) < Number(worst.verdict.margin) ? next : worst;
}

function extremeOf(points: readonly BandPoint[], figure: (point: BandPoint) => Figure, pick: (...values: number[]) => number): Extreme {
  const values = points.map((point) => ({ frequencyGHz: point.frequencyGHz, value: figure(point) }));
  const missing = values.find(({ value }) => !isNumber(value));
  if (missing !== undefined && !isNumber(missing.value)) return missing.value;
  const numbers = values.map(({ value }) => (isNumber(value) ? value : NaN));
  const best = numbers.indexOf(pick(...numbers));
  return { value: numbers[best], frequencyGHz: values[best].frequencyGHz };
}
