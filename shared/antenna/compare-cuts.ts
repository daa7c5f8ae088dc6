/** A cut as its level over a coordinate that moves along with a beam: u in the plane of the cut. */
export interface LevelOverU {
  /** Rising. */
  readonly u: Float64Array;
  readonly levelDbi: Float64Array;
}

/**
 * After minus before once `before` is shifted by `shiftU`, at the places of `after`: level(after, u) less
 * level(before, u - shiftU). NaN where either lies below the floor, or where `before` has no sample.
 * Linear between samples, so samples must be dense against a lobe. Without shift and on equal places the difference
 * turns its sign when the sides are swapped.
 */
export function cutDifferenceDb(before: LevelOverU, after: LevelOverU, shiftU: number, floorDbi: number): Float64Array {
  const difference = new Float64Array(after.u.length);
  let k = 0;
  for (let i = 0; i < after.u.length; i++) {
    const u = after.u[i] - shiftU;
    while (k + 2 < before.u.length && before.u[k + 1] <= u) k += 1;
    const level = levelBetween(before, k, u);
    difference[i] = after.levelDbi[i] < floorDbi || !(level >= floorDbi) ? NaN : after.levelDbi[i] - level;
  }
  return difference;
}

/** Outside the samples there is no level: NaN. Rounding at the ends is forgiven. */
function levelBetween({ u, levelDbi }: LevelOverU, k: number, at: number): number {
  const slack = 1e-12;
  if (u.length < 2 || at < u[0] - slack || at > u[u.length - 1] + slack) return NaN;
  const span = u[k + 1] - u[k];
  // Near the horizon samples of equal angle crowd together in u.
  const share = span > 0 ? Math.min(1, Math.max(0, (at - u[k]) / span)) : 0;
  // At a sample its own level stands, untouched by the neighbour's.
  if (share === 0) return levelDbi[k];
  return share === 1 ? levelDbi[k + 1] : levelDbi[k] + share * (levelDbi[k + 1] - levelDbi[k]);
}

/** After minus before, point by point over equal maps; 0 where either lies below the floor. Odd in its sides. */
export function mapDifferenceDb(before: Float32Array, after: Float32Array, floorDbi: number): Float32Array {
  if (before.length !== after.length) throw new RangeError(`maps of one size are compared; got ${before.length} and ${after.length} points`);
  return after.map((level, n) => (level < floorDbi || before[n] < floorDbi ? 0 : level - before[n]));
}

/** Levels this far below the higher of the two peaks are not compared: there nulls differ by anything. */
const COMPARED_RANGE_DB = 50;

/** The floor of a comparison, from the peaks of both sides: a whole number of dBi. */
export function comparisonFloorDbi(peakBeforeDbi: number, peakAfterDbi: number): number {
  return Math.round(Math.max(peakBeforeDbi, peakAfterDbi) - COMPARED_RANGE_DB);
}
