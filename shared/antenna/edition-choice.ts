import { wrapRad } from '../units/angles';
import { coPolarResponse, entryPhaseRad, type IncidenceWeights, type PolarResponse } from './cell-response';
import type { EditionAtFrequency } from './edition-at-frequency';
import type { PositionStates } from './position-states';
import type { CellRule } from './reference-search';

/** Errors nearer than this are equal, so that rounding does not decide a tie; the smallest index then stands. */
const SAME_ERROR = 1e-9;

/**
 * Chooses a cell for one target at weighed angles; `allowed` lists the candidates. -1 where there is none. The response of
 * the one chosen is written into `chosen` where that is given.
 */
export type CellChooser = (targetRad: number, weights: IncidenceWeights, allowed: Int32Array, chosen?: PolarResponse) => number;

/**
 * Best cell of an edition at a frequency. The phase of a mixture of TE and TM lies between the phases of the two, so a
 * lower bound of every cell's error costs no exponential; only cells whose bound can win are evaluated exactly. The
 * result is that of trying them all.
 */
export function editionChooser(at: EditionAtFrequency, rule: CellRule): CellChooser {
  const bounds = new Float64Array(at.usable.length);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  const errorOf = rule === 'nearest-phase' ? phaseError : complexError;
  const boundOf = rule === 'nearest-phase' ? (phaseBound: number): number => phaseBound : leastComplexError;
  const unasked: PolarResponse = { magnitude: 0, phaseRad: 0 };
  return (targetRad, weights, allowed, chosen = unasked) => {
    if (allowed.length === 1) {
      coPolarResponse(at, allowed[0], weights, chosen);
      return allowed[0];
    }
    let promising = -1;
    for (let i = 0; i < allowed.length; i++) {
      const k = allowed[i];
      bounds[i] = boundOf(phaseErrorBound(at, k, weights, targetRad));
      if (promising < 0 || bounds[i] < bounds[promising]) promising = i;
    }
    if (promising < 0) return -1;
    let best = allowed[promising];
    let least = errorOf(coPolarResponse(at, best, weights, chosen), targetRad);
    for (let i = 0; i < allowed.length; i++) {
      if (i === promising || bounds[i] > least + SAME_ERROR) continue;
      const k = allowed[i];
      const error = errorOf(coPolarResponse(at, k, weights, response), targetRad);
      if (error >= least - SAME_ERROR && (error > least + SAME_ERROR || k > best)) continue;
      best = k;
      least = Math.min(error, least);
      chosen.magnitude = response.magnitude;
      chosen.phaseRad = response.phaseRad;
    }
    return best;
  };
}

/** The same choice among the states of position n that are reckoned already: the place of the best in the list, -1 where there is none. */
export function chooseListed(states: PositionStates, n: number, rule: CellRule, targetRad: number): number {
  const errorOf = rule === 'nearest-phase' ? phaseErrorAt : complexErrorAt;
  let best = -1;
  let least = Infinity;
  for (let i = states.offset[n]; i < states.offset[n + 1]; i++) {
    const error = errorOf(states, i, targetRad);
    if (best >= 0 && error >= least - SAME_ERROR && (error > least + SAME_ERROR || states.index[i] > states.index[best])) continue;
    best = i;
    least = Math.min(error, least);
  }
  return best;
}

const phaseErrorAt = (states: PositionStates, i: number, targetRad: number): number => Math.abs(wrapRad(states.phaseRad[i] - targetRad));

const complexErrorAt = (states: PositionStates, i: number, targetRad: number): number =>
  complexError({ magnitude: states.magnitude[i], phaseRad: states.phaseRad[i] }, targetRad);

/** Size of the wrapped phase error. */
export function phaseError(response: PolarResponse, targetRad: number): number {
  return Math.abs(wrapRad(response.phaseRad - targetRad));
}

/** |Gamma - exp(j target)|: counts what the cell loses as well. */
export function complexError({ magnitude, phaseRad }: PolarResponse, targetRad: number): number {
  const re = magnitude * Math.cos(phaseRad) - Math.cos(targetRad);
  const im = magnitude * Math.sin(phaseRad) - Math.sin(targetRad);
  return Math.hypot(re, im);
}

/** Least |m exp(j e) - 1| over m >= 0 for a phase error e of at least the bound. */
function leastComplexError(phaseBoundRad: number): number {
  return phaseBoundRad >= Math.PI / 2 ? 1 : Math.sin(phaseBoundRad);
}

/** Lower bound of the phase error of a cell: the distance from the target to the arc between its entries' phases. */
function phaseErrorBound(at: EditionAtFrequency, cell: number, { nodes, shares }: IncidenceWeights, targetRad: number): number {
  const first = shares[0] === 0 && shares.length > 1 ? 1 : 0;
  const error = wrapRad(entryPhaseRad(at, cell, first, nodes) - targetRad);
  if (shares.length === 1 || first === 1 || shares[1] === 0) return Math.abs(error);
  const span = wrapRad(entryPhaseRad(at, cell, 1, nodes) - targetRad - error);
  const other = error + span;
  const low = Math.min(error, other);
  const high = Math.max(error, other);
  if (low <= 0 && high >= 0) return 0;
  if (high > Math.PI) return Math.max(0, Math.min(low, 2 * Math.PI - high));
  if (low < -Math.PI) return Math.max(0, Math.min(-high, 2 * Math.PI + low));
  return Math.min(Math.abs(low), Math.abs(high));
}
