import { wrapRad } from '../units/angles';
import type { ReferenceQuery } from './cell-stock';

/** The states a cell can take at one position; filled in place by whoever knows them. */
export interface CellStates {
  count: number;
  readonly index: Int32Array;
  readonly phaseRad: Float64Array;
  readonly magnitude: Float64Array;
}

export function newCellStates(capacity: number): CellStates {
  return { count: 0, index: new Int32Array(capacity), phaseRad: new Float64Array(capacity), magnitude: new Float64Array(capacity) };
}

export type CellRule = 'nearest-phase' | 'least-error' | 'band-fit';

/** References judged: 0, 1, ... 359 degrees. */
const REFERENCE_COUNT = 360;
const STEP_RAD = (2 * Math.PI) / REFERENCE_COUNT;
/** State evaluations that a search may cost; beyond it every m-th cell stands for its neighbours. */
const EVALUATION_BUDGET = 40_000_000;

export interface StateSearch {
  readonly query: ReferenceQuery;
  readonly rule: CellRule;
  readonly capacity: number;
  /** Fills in the states at position n. */
  statesAt(n: number, states: CellStates): void;
}

/** Reference phase, in whole degrees, under which the chosen states add up to the most field at the wanted beam. */
export function searchStateReferenceRad(search: StateSearch): number {
  const { query, rule, capacity } = search;
  const perCell = rule === 'nearest-phase' ? capacity * 8 : capacity * REFERENCE_COUNT;
  const stride = Math.max(1, Math.ceil((query.targetRad.length * perCell) / EVALUATION_BUDGET));
  const re = new Float64Array(REFERENCE_COUNT + 1);
  const im = new Float64Array(REFERENCE_COUNT + 1);
  const states = newCellStates(capacity);
  const order = Int32Array.from({ length: capacity }, (_, i) => i);
  for (let n = 0; n < query.targetRad.length; n += stride) {
    search.statesAt(n, states);
    if (states.count === 0) continue;
    if (rule === 'nearest-phase') addNearestRanges({ re, im, states, order }, query, n);
    else addLeastErrors({ re, im, states }, query, n);
  }
  return bestReferenceIndex(re, im, REFERENCE_COUNT) * STEP_RAD;
}

/** Index of the largest running sum; `re` and `im` hold the change of the sum at each index. Ties go to the smallest. */
export function bestReferenceIndex(re: Float64Array, im: Float64Array, count: number): number {
  let best = 0;
  let bestPower = -1;
  let sumRe = 0;
  let sumIm = 0;
  for (let i = 0; i < count; i++) {
    sumRe += re[i];
    sumIm += im[i];
    const power = sumRe * sumRe + sumIm * sumIm;
    // Equal up to rounding counts as equal, or noise would choose.
    if (power > bestPower * (1 + 1e-9)) [best, bestPower] = [i, power];
  }
  return best;
}

interface RangeSums {
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly states: CellStates;
  readonly order: Int32Array;
}

/**
 * With the nearest-phase rule each state is chosen while target + reference lies between the middles to its
 * neighbours in phase, one run of references, so its part is added at the run's start and taken away after its end.
 */
function addNearestRanges({ re, im, states, order }: RangeSums, query: ReferenceQuery, n: number): void {
  const count = sortByPhase(states, order);
  for (let i = 0; i < count; i++) {
    const state = order[i];
    const before = states.phaseRad[order[(i + count - 1) % count]] - (i === 0 ? 2 * Math.PI : 0);
    const after = states.phaseRad[order[(i + 1) % count]] + (i === count - 1 ? 2 * Math.PI : 0);
    const phase = states.phaseRad[state];
    const first = Math.ceil(((before + phase) / 2 - query.targetRad[n]) / STEP_RAD);
    const last = Math.ceil(((phase + after) / 2 - query.targetRad[n]) / STEP_RAD);
    const cosine = states.magnitude[state] * Math.cos(phase);
    const sine = states.magnitude[state] * Math.sin(phase);
    const partRe = query.weightRe[n] * cosine - query.weightIm[n] * sine;
    const partIm = query.weightRe[n] * sine + query.weightIm[n] * cosine;
    addRun(re, { first, last }, partRe);
    addRun(im, { first, last }, partIm);
  }
}

/** Adds `part` to the running sum for references first, ..., last - 1, counted round the turn. */
function addRun(sums: Float64Array, { first, last }: { first: number; last: number }, part: number): void {
  if (last <= first) return;
  const start = first - REFERENCE_COUNT * Math.floor(first / REFERENCE_COUNT);
  const end = start + (last - first);
  sums[start] += part;
  if (end <= REFERENCE_COUNT) {
    sums[end] -= part;
    return;
  }
  sums[0] += part;
  sums[end - REFERENCE_COUNT] -= part;
}

/** Wraps the phases into one turn and orders the states by them; from the former order, since neighbours differ little. */
function sortByPhase(states: CellStates, order: Int32Array): number {
  const { count, phaseRad } = states;
  for (let i = 0; i < count; i++) phaseRad[i] = wrapRad(phaseRad[i]);
  if (count !== order.length) for (let i = 0; i < order.length; i++) order[i] = i;
  for (let i = 1; i < count; i++) {
    const moving = order[i];
    let j = i - 1;
    while (j >= 0 && phaseRad[order[j]] > phaseRad[moving]) {
      order[j + 1] = order[j];
      j -= 1;
    }
    order[j + 1] = moving;
  }
  return count;
}

function addLeastErrors({ re, im, states }: Omit<RangeSums, 'order'>, query: ReferenceQuery, n: number): void {
  const cosines = Array.from({ length: states.count }, (_, k) => states.magnitude[k] * Math.cos(states.phaseRad[k]));
  const sines = Array.from({ length: states.count }, (_, k) => states.magnitude[k] * Math.sin(states.phaseRad[k]));
  let beforeRe = 0;
  let beforeIm = 0;
  for (let i = 0; i < REFERENCE_COUNT; i++) {
    const wantedRe = Math.cos(query.targetRad[n] + i * STEP_RAD);
    const wantedIm = Math.sin(query.targetRad[n] + i * STEP_RAD);
    let best = 0;
    let bestError = Infinity;
    for (let k = 0; k < states.count; k++) {
      const error = (cosines[k] - wantedRe) ** 2 + (sines[k] - wantedIm) ** 2;
      if (error < bestError) [best, bestError] = [k, error];
    }
    const partRe = query.weightRe[n] * cosines[best] - query.weightIm[n] * sines[best];
    const partIm = query.weightRe[n] * sines[best] + query.weightIm[n] * cosines[best];
    re[i] += partRe - beforeRe;
    im[i] += partIm - beforeIm;
    [beforeRe, beforeIm] = [partRe, partIm];
  }
}
