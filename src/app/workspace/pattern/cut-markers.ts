import type { CutTrace } from '../../ui/plots/cut-figure';

/** A place on a cut, refined between samples. */
export interface CutPlace {
  readonly angleDeg: number;
  readonly levelDb: number;
}

/** What a range engineer reads off a cut about one lobe. A place that does not exist is null; the table says why. */
export interface CutMarkers {
  readonly peak: CutPlace;
  /** Below and above the peak in angle. */
  readonly halfPower: readonly [CutPlace | null, CutPlace | null];
  readonly firstNulls: readonly [CutPlace | null, CutPlace | null];
  readonly sidelobes: readonly [CutPlace | null, CutPlace | null];
}

const HALF_POWER_DB = 10 * Math.log10(2);

/**
 * Peak, half-power places, first nulls and highest sidelobes of the lobe nearest to an angle. Peaks are refined by a parabola
 * through three samples in dB, half-power places linearly in dB; with ten samples to a beamwidth this is within 0.01 dB and a
 * hundredth of a step of the exact pattern. Null of a cut with fewer than three samples.
 */
export function cutMarkers(trace: CutTrace, aboutDeg: number): CutMarkers | null {
  const { angleDeg, levelDb } = trace;
  if (angleDeg.length < 3) return null;
  const top = climbed(levelDb, nearest(angleDeg, aboutDeg));
  const peak = refined(trace, top);
  const sides = ([-1, 1] as const).map((side) => oneSide(trace, top, peak, side));
  return {
    peak,
    halfPower: [sides[0].halfPower, sides[1].halfPower],
    firstNulls: [sides[0].firstNull, sides[1].firstNull],
    sidelobes: [sides[0].sidelobe, sides[1].sidelobe],
  };
}

interface Side {
  readonly halfPower: CutPlace | null;
  readonly firstNull: CutPlace | null;
  readonly sidelobe: CutPlace | null;
}

function oneSide(trace: CutTrace, top: number, peak: CutPlace, side: 1 | -1): Side {
  const { levelDb } = trace;
  const last = side === 1 ? levelDb.length - 1 : 0;
  const half = peak.levelDb - HALF_POWER_DB;
  let i = top;
  while (i !== last && levelDb[i] > half) i += side;
  if (levelDb[i] > half) return { halfPower: null, firstNull: null, sidelobe: null };
  const halfPower = crossing(trace, i - side, i, half);
  while (i !== last && levelDb[i + side] < levelDb[i]) i += side;
  if (i === last) return { halfPower, firstNull: null, sidelobe: null };
  const firstNull = { angleDeg: trace.angleDeg[i], levelDb: levelDb[i] };
  let highest = i;
  for (let k = i; k !== last + side; k += side) if (levelDb[k] > levelDb[highest]) highest = k;
  // At the very end of the cut there is a slope and no lobe.
  return { halfPower, firstNull, sidelobe: highest === i || highest === last ? null : refined(trace, highest) };
}

function nearest(angleDeg: ArrayLike<number>, wantedDeg: number): number {
  let found = 0;
  for (let i = 1; i < angleDeg.length; i++) if (Math.abs(angleDeg[i] - wantedDeg) < Math.abs(angleDeg[found] - wantedDeg)) found = i;
  return found;
}

/** Uphill to a local maximum. */
function climbed(levelDb: ArrayLike<number>, start: number): number {
  let i = start;
  for (;;) {
    const right = i + 1 < levelDb.length ? levelDb[i + 1] : -Infinity;
    const left = i > 0 ? levelDb[i - 1] : -Infinity;
    if (right <= levelDb[i] && left <= levelDb[i]) return i;
    i += right >= left ? 1 : -1;
  }
}

/** The top of the parabola through a sample and its neighbours; the sample itself at an end of the cut. */
function refined({ angleDeg, levelDb }: CutTrace, i: number): CutPlace {
  if (i === 0 || i === levelDb.length - 1) return { angleDeg: angleDeg[i], levelDb: levelDb[i] };
  const [left, middle, right] = [levelDb[i - 1], levelDb[i], levelDb[i + 1]];
  const bend = left - 2 * middle + right;
  if (!(bend < 0)) return { angleDeg: angleDeg[i], levelDb: middle };
  const shift = (left - right) / (2 * bend);
  return { angleDeg: angleDeg[i] + shift * (angleDeg[i + 1] - angleDeg[i]), levelDb: middle - ((left - right) * shift) / 4 };
}

function crossing({ angleDeg, levelDb }: CutTrace, inside: number, outside: number, level: number): CutPlace {
  const part = (levelDb[inside] - level) / (levelDb[inside] - levelDb[outside]);
  return { angleDeg: angleDeg[inside] + part * (angleDeg[outside] - angleDeg[inside]), levelDb: level };
}
