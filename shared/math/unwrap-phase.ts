const TURN_RAD = 2 * Math.PI;

/** The value equal to `rad` modulo a turn that lies within half a turn of `nearRad`: 359 and 1 degrees are neighbours. */
export function nearestBranchRad(rad: number, nearRad: number): number {
  return rad - TURN_RAD * Math.round((rad - nearRad) / TURN_RAD);
}

/**
 * Phases made continuous: each lies within half a turn of the one before. Valid where the true step between
 * neighbours is below half a turn. NaN entries stay NaN and are stepped over.
 */
export function unwrapPhasesRad(phasesRad: ArrayLike<number>): Float64Array {
  const unwrapped = Float64Array.from(phasesRad);
  let before = NaN;
  for (let i = 0; i < unwrapped.length; i++) {
    if (Number.isNaN(unwrapped[i])) continue;
    if (!Number.isNaN(before)) unwrapped[i] = nearestBranchRad(unwrapped[i], before);
    before = unwrapped[i];
  }
  return unwrapped;
}
