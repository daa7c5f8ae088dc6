import { positiveDeg, radFromDeg, degFromRad } from '../units/angles';

/** Phases nearer than this are the same: rounding must not decide a tie. */
const SAME_RAD = 1e-9;
const TURN_RAD = 2 * Math.PI;
const TURNS_PER_RAD = 1 / TURN_RAD;

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
  return boundaryLookUp(distinct);
}

interface State {
  readonly rad: number;
  readonly index: number;
}

/** Bins of the look-up per state: few then hold a boundary, and the branch that looks for one is foreseen. */
const BINS_PER_STATE = 32;

/**
 * Which state is nearest changes half way between neighbours and nowhere else. The bin of a target says how many
 * such boundaries lie below its start; the few within it are stepped over.
 */
function boundaryLookUp(states: readonly State[]): (targetRad: number) => number {
  const changes = states.map((state, i) => boundaryAfter(state, states[i + 1] ?? { ...states[0], rad: states[0].rad + TURN_RAD }));
  changes.sort((a, b) => a.rad - b.rad);
  // Below the first boundary of the turn stands the state after the last.
  const owners = Int32Array.from([changes[changes.length - 1], ...changes], (change) => change.next);
  const boundaries = Float64Array.from([...changes.map(({ rad }) => rad), Infinity]);
  const binCount = BINS_PER_STATE * states.length;
  const binsPerRad = binCount / TURN_RAD;
  const below = new Int32Array(binCount + 1);
  for (let bin = 0, rank = 0; bin <= binCount; bin++) {
    while (boundaries[rank] <= bin / binsPerRad - SAME_RAD) rank += 1;
    below[bin] = rank;
  }
  return (targetRad) => {
    const target = targetRad - TURN_RAD * Math.floor(targetRad * TURNS_PER_RAD);
    // Rounding may leave a target a hair outside the turn: cutting off puts it into the first or the last bin.
    let rank = below[(target * binsPerRad) | 0];
    while (target >= boundaries[rank]) rank += 1;
    return owners[rank];
  };
}

/** Where the next state takes over, in [0, 2 pi): half way, less or more the width of a tie, which goes to the smaller index. */
function boundaryAfter(state: State, next: State): { rad: number; next: number } {
  const tie = (state.index < next.index ? SAME_RAD : -SAME_RAD) / 2;
  const rad = (state.rad + next.rad) / 2 + tie;
  return { rad: rad - TURN_RAD * Math.floor(rad / TURN_RAD), next: next.index };
}
