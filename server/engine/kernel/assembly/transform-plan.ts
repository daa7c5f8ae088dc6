/**
 * What a transform of one size needs, laid out in memory by ../kernel-plan.ts: these four numbers, then for each stage
 * of radix four two more, its quarter length m and the place of its twiddles: for p = 0 ... m - 1 cosine and sine of
 * 2 pi p j / (4 m), j = 1, 2, 3.
 */
@unmanaged
export class TransformPlan {
  size: i32;
  /** Radix of the last stage: 4 or 8. 0 where the size is below 16: then the sums are written out. */
  lastRadix: i32;
  /** Stages of radix four before the last. */
  stageCount: i32;
  /**
   * Where lines are transformed: twiddles of the first stage once more, each of the six in a plane of m, since there
   * the lanes of a vector belong to different p. Below 16: cosines of 2 pi i / size, then its sines.
   */
  firstTwiddles: usize;
}

const HEADER: usize = 16;

export function quarterOf(plan: TransformPlan, stage: i32): i32 {
  return load<i32>(changetype<usize>(plan) + HEADER + (<usize>stage << 3));
}

export function twiddlesOf(plan: TransformPlan, stage: i32): usize {
  return load<i32>(changetype<usize>(plan) + HEADER + (<usize>stage << 3), 4);
}
