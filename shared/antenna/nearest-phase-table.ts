import { positiveDeg, radFromDeg, degFromRad } from '../units/angles';

/** Phases nearer than this are the same: rounding must not decide a tie. */
const SAME_RAD = 1e-9;
const TURN_RAD = 2 * Math.PI;

/**
 * A look-up of the state nearest in phase round the turn, so 359 degrees finds 1 degree before 350. States of equal
 * phase, and targets half way between two, go to the smallest index.
 */
export function nearestPhaseTable(statePhaseRad: Float64Array): (targetRad: number) => number {
  const turned = Array.from(statePhaseRad, (rad, index) => ({ rad: radFromDeg(positiveDeg(degFromRad(rad))), index }));
  turned.sort((a, b) => a.rad - b.rad || a.index - b.index);
  const distinct: { rad: number; index: number }[] = [];
  for (const state of turned) {
    const last = distinct.at(-1);
    // Members of one cluster of equal phases: the smallest index stands for all.
    if (last && state.rad - last.rad <= SAME_RAD) last.index = Math.min(last.index, state.index);
    else distinct.push({ ...state });
  }
  const phases = Float64Array.from(distinct, (state) => state.rad);
  const indices = Int32Array.from(distinct, (state) => state.index);
  return (targetRad) => {
    const target = targetRad - TURN_RAD * Math.floor(targetRad / TURN_RAD);
    const above = firstAbove(phases, target);
    const upper = above === phases.length ? 0 : above;
    const lower = above === 0 ? phases.length - 1 : above - 1;
    const up = phases[upper] - target + (above === phases.length ? TURN_RAD : 0);
    const down = target - phases[lower] + (above === 0 ? TURN_RAD : 0);
    if (Math.abs(up - down) <= SAME_RAD) return Math.min(indices[upper], indices[lower]);
    return up < down ? indices[upper] : indices[lower];
  };
}

function firstAbove(rising: Float64Array, value: number): number {
  let low = 0;
  let high = rising.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rising[middle] > value) high = middle;
    else low = middle + 1;
  }
  return low;
}
