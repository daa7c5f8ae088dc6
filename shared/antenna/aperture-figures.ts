import type { Figure } from '../model/figures';
import { degFromRad, wrapRad } from '../units/angles';
import { amplitudeRatioToDb, powerRatioToDb } from '../units/decibels';
import type { CellResponses } from './cell-stock';
import { hornSampler } from './horn-field';
import type { CellIllumination } from './illumination';
import { noFigure, nothingLit } from './no-figure';
import { outlineTrace } from './outline';
import type { PanelLattice } from './panel-lattice';
import type { SiIllumination, SiPanel } from './si-design';

/** Losses of the aperture, all at most 0 dB, and what they are made of. */
export interface ApertureLosses {
  readonly taperDb: Figure;
  readonly phaseErrorRmsDeg: Figure;
  readonly phaseLossDb: Figure;
  readonly cellLossDb: Figure;
}

/**
 * Taper |sum A|^2 / (N sum A^2), phase loss |sum A exp(j error)|^2 / |sum A|^2, cell loss sum |A Gamma|^2 / sum A^2 with A
 * the incident amplitudes. Cells that nothing was chosen for (magnitude 0) count in the cell loss, not in the phase error.
 */
export function apertureLosses(light: CellIllumination, cells: CellResponses, errorRad: Float64Array): ApertureLosses {
  const { amplitude } = light;
  let [sum, squares, leaving, errorRe, errorIm, errorSquares, standing, standingSum] = [0, 0, 0, 0, 0, 0, 0, 0];
  for (let n = 0; n < amplitude.length; n++) {
    const a = amplitude[n];
    sum += a;
    squares += a * a;
    leaving += (a * cells.magnitude[n]) ** 2;
    if (cells.magnitude[n] === 0) continue;
    standing += 1;
    standingSum += a;
    errorRe += a * Math.cos(errorRad[n]);
    errorIm += a * Math.sin(errorRad[n]);
    errorSquares += errorRad[n] ** 2;
  }
  if (squares === 0) return { taperDb: nothingLit(), phaseErrorRmsDeg: nothingLit(), phaseLossDb: nothingLit(), cellLossDb: nothingLit() };
  const dark = noFigure('nothing-reflected', 'no lit cell returns anything');
  if (leaving === 0) return { taperDb: lossDb((sum * sum) / (amplitude.length * squares)), phaseErrorRmsDeg: dark, phaseLossDb: dark, cellLossDb: dark };
  const coherent = (errorRe * errorRe + errorIm * errorIm) / (standingSum * standingSum);
  return {
    taperDb: lossDb((sum * sum) / (amplitude.length * squares)),
    phaseErrorRmsDeg: degFromRad(Math.sqrt(errorSquares / standing)),
    phaseLossDb: coherent > 0 ? lossDb(coherent) : noFigure('cancels', 'the errors cancel the whole beam'),
    cellLossDb: lossDb(leaving / squares),
  };
}

/** A ratio that cannot exceed 1 except by rounding. */
function lossDb(ratio: number): number {
  return Math.min(0, powerRatioToDb(ratio));
}

/** Phase errors achieved less needed, in (-pi, pi]. */
export function phaseErrorsRad(achievedRad: Float64Array, neededRad: Float64Array): Float64Array {
  return achievedRad.map((rad, n) => wrapRad(rad - neededRad[n]));
}

/** The part of achieved less needed that all cells share: the phase of the sum of exp(j difference). */
export function commonPhaseRad(achievedRad: Float64Array, neededRad: Float64Array): number {
  let re = 0;
  let im = 0;
  for (let n = 0; n < achievedRad.length; n++) {
    re += Math.cos(achievedRad[n] - neededRad[n]);
    im += Math.sin(achievedRad[n] - neededRad[n]);
  }
  return Math.atan2(im, re);
}

/**
 * Strongest horn field on the outline's edge relative to the strongest anywhere on the panel; spreading included, the
 * cells' receive factor not. 0 dB for a plane wave.
 */
export function edgeTaperDb(illumination: SiIllumination, panel: SiPanel, lattice: PanelLattice): Figure {
  if (illumination.kind === 'guided-wave') return noFigure('guided-wave', 'a guided wave falls off along its way, not towards an edge');
  if (illumination.kind !== 'horn') return 0;
  const sampleAt = hornSampler(illumination);
  let edge = 0;
  for (const { xM, yM } of outlineTrace(panel.outline, 720)) edge = Math.max(edge, sampleAt(xM, yM).field);
  let strongest = edge;
  for (let n = 0; n < lattice.count; n++) strongest = Math.max(strongest, sampleAt(lattice.xM[n], lattice.yM[n]).field);
  if (strongest === 0) return nothingLit();
  if (edge === 0) return noFigure('edge-dark', 'the horn does not light the edge of the panel');
  return amplitudeRatioToDb(edge / strongest);
}

export function maxIncidenceRad(light: CellIllumination): number {
  let largest = 0;
  for (const incidence of light.incidenceRad) largest = Math.max(largest, incidence);
  return largest;
}
