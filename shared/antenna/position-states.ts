import { editionKeeper } from './kept-by-edition';
import type { CellStates } from './reference-search';

/** More states than this are not kept: 12 MB for each panel. */
export const MOST_KEPT_STATES = 600_000;

/** What every cell allowed at each position answers there: everything about the choice that the wanted beam does not change. */
export interface PositionStates {
  /** States of position n stand at offset[n] to offset[n + 1] - 1. */
  readonly offset: Int32Array;
  /** Index of the cell in its edition. */
  readonly index: Int32Array;
  readonly phaseRad: Float64Array;
  readonly magnitude: Float64Array;
}

export interface StateSource {
  readonly positionCount: number;
  /** Most cells at one position. */
  readonly capacity: number;
  statesAt(n: number, states: CellStates): void;
}

export function listPositionStates({ positionCount, capacity, statesAt }: StateSource, states: CellStates): PositionStates {
  const listed = { offset: new Int32Array(positionCount + 1), index: new Int32Array(positionCount * capacity), phaseRad: new Float64Array(positionCount * capacity), magnitude: new Float64Array(positionCount * capacity) };
  let at = 0;
  for (let n = 0; n < positionCount; n++) {
    statesAt(n, states);
    for (let i = 0; i < states.count; i++, at++) {
      listed.index[at] = states.index[i];
      listed.phaseRad[at] = states.phaseRad[i];
      listed.magnitude[at] = states.magnitude[i];
    }
    listed.offset[n + 1] = at;
  }
  return listed;
}

/** Copies the states of one position, as `statesAt` would find them. */
export function copyStates(from: PositionStates, n: number, to: CellStates): void {
  const start = from.offset[n];
  const end = from.offset[n + 1];
  to.count = end - start;
  for (let i = start; i < end; i++) {
    to.index[i - start] = from.index[i];
    to.phaseRad[i - start] = from.phaseRad[i];
    to.magnitude[i - start] = from.magnitude[i];
  }
}

export const keptPositionStates = editionKeeper<PositionStates>();
