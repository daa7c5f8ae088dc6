import { degFromRad, positiveDeg, wrapRad } from '../units/angles';
import { amplitudeRatioToDb } from '../units/decibels';
import type { CellAssignment, CellResponses } from './cell-stock';
import type { CellIllumination } from './illumination';
import { FLOOR_DBI } from './pattern-cut';
import type { PanelLattice } from './panel-lattice';

/** What stands and happens at each cell, in the order of the lattice. Phases in [0, 360), errors in (-180, 180]. */
export interface CellArrays {
  readonly xMm: Float64Array;
  readonly yMm: Float64Array;
  readonly column: Int32Array;
  readonly row: Int32Array;
  /** Reference phase included; away from the design frequency what that frequency needs, see `IlluminatedState.targetRad`. */
  readonly targetPhaseDeg: Float32Array;
  readonly cellIndex: Int32Array;
  readonly phaseDeg: Float32Array;
  /** Achieved minus target; `phaseErrorRmsDeg` is over these. */
  readonly errorDeg: Float32Array;
  readonly amplitude: Float32Array;
  readonly responseDb: Float32Array;
  readonly incidenceDeg: Float32Array;
  /** Azimuth of the direction of travel of the incident wave. */
  readonly incidenceAzimuthDeg: Float32Array;
}

export interface CellSources {
  readonly lattice: PanelLattice;
  readonly light: CellIllumination;
  /** At the frequency of the responses, reference phase included. */
  readonly targetRad: Float64Array;
  readonly assignment: CellAssignment;
  readonly responses: CellResponses;
}

export function cellArrays({ lattice, light, targetRad, assignment, responses }: CellSources): CellArrays {
  const { count } = lattice;
  const arrays: CellArrays = {
    xMm: lattice.xM.map((x) => x * 1000),
    yMm: lattice.yM.map((y) => y * 1000),
    column: lattice.column,
    row: lattice.row,
    targetPhaseDeg: new Float32Array(count),
    cellIndex: assignment.cellIndex,
    phaseDeg: new Float32Array(count),
    errorDeg: new Float32Array(count),
    amplitude: Float32Array.from(light.amplitude),
    responseDb: new Float32Array(count),
    incidenceDeg: new Float32Array(count),
    incidenceAzimuthDeg: new Float32Array(count),
  };
  for (let n = 0; n < count; n++) {
    arrays.targetPhaseDeg[n] = phaseInTurnDeg(targetRad[n]);
    arrays.phaseDeg[n] = phaseInTurnDeg(responses.phaseRad[n]);
    arrays.errorDeg[n] = degFromRad(wrapRad(responses.phaseRad[n] - targetRad[n]));
    const magnitude = responses.magnitude[n];
    arrays.responseDb[n] = magnitude > 0 ? Math.max(FLOOR_DBI, amplitudeRatioToDb(magnitude)) : FLOOR_DBI;
    arrays.incidenceDeg[n] = degFromRad(light.incidenceRad[n]);
    arrays.incidenceAzimuthDeg[n] = degFromRad(light.azimuthRad[n]);
  }
  return arrays;
}

/** A phase in degrees, in [0, 360) even after rounding to single precision. */
export function phaseInTurnDeg(rad: number): number {
  const deg = Math.fround(positiveDeg(degFromRad(rad)));
  return deg >= 360 ? 0 : deg;
}
