import { degFromRad, radFromDeg } from '../units/angles';
import { amplitudeRatioToDb } from '../units/decibels';
import { unwrapPhasesRad } from '../math/unwrap-phase';
import { coPolarResponse, incidenceWeigher } from './cell-response';
import type { PreparedEdition } from './prepare-edition';

/** Which part of the response: an entry of the description alone, or the mixture that the scalar model uses. */
export type CurvePolarisation = 'first' | 'second' | 'x' | 'y';

/** What is held fixed. Along a curve the value of its own axis is not used. */
export interface CurvePoint {
  readonly cellIndex: number;
  readonly frequencyGHz: number;
  readonly incidenceDeg: number;
  readonly azimuthDeg: number;
  /** first = TE, x or the only port; second = TM or y; x and y = co-polar response to that linear polarisation. */
  readonly polarisation: CurvePolarisation;
}

/** Phase (continuous along the curve) and magnitude, for drawing. */
export interface ResponseCurve {
  readonly abscissa: Float64Array;
  readonly phaseDeg: Float64Array;
  readonly magnitudeDb: Float64Array;
}

/** Against the cell: abscissa is the first parameter in mm, cells in its rising order. */
export function curveOverCells(prepared: PreparedEdition, fixed: CurvePoint): ResponseCurve & { readonly cellIndex: Int32Array } {
  const { cells } = prepared.edition;
  const order = Array.from(cells.keys()).sort((a, b) => cells[a].parametersMm[0] - cells[b].parametersMm[0] || a - b);
  const abscissa = Float64Array.from(order, (k) => cells[k].parametersMm[0]);
  const curve = sampledCurve(abscissa, (i) => responseAt(prepared, { ...fixed, cellIndex: order[i] }));
  return { ...curve, cellIndex: Int32Array.from(order) };
}

/** Against frequency: abscissa in GHz, the points of the edition. */
export function curveOverFrequency(prepared: PreparedEdition, fixed: CurvePoint): ResponseCurve {
  const abscissa = prepared.edition.responses.frequenciesHz.map((hz) => hz / 1e9);
  return sampledCurve(abscissa, (i) => responseAt(prepared, { ...fixed, frequencyGHz: abscissa[i] }));
}

/** Against the angle of incidence: abscissa in degrees, over what the edition covers. */
export function curveOverIncidence(prepared: PreparedEdition, fixed: CurvePoint, stepDeg = 1): ResponseCurve {
  const from = degFromRad(prepared.smallestThetaRad);
  const to = degFromRad(prepared.largestThetaRad);
  const count = Math.max(1, Math.floor((to - from) / stepDeg + 1e-9) + 1);
  const abscissa = Float64Array.from({ length: count }, (_, i) => from + i * stepDeg);
  return sampledCurve(abscissa, (i) => responseAt(prepared, { ...fixed, incidenceDeg: abscissa[i] }));
}

function sampledCurve(abscissa: Float64Array, at: (i: number) => { magnitude: number; phaseRad: number }): ResponseCurve {
  const phaseRad = new Float64Array(abscissa.length);
  const magnitudeDb = new Float64Array(abscissa.length);
  for (let i = 0; i < abscissa.length; i++) {
    const response = at(i);
    phaseRad[i] = response.phaseRad;
    magnitudeDb[i] = amplitudeRatioToDb(Math.max(1e-12, response.magnitude));
  }
  return { abscissa, phaseDeg: unwrapPhasesRad(phaseRad).map(degFromRad), magnitudeDb };
}

function responseAt(prepared: PreparedEdition, point: CurvePoint): { magnitude: number; phaseRad: number } {
  const at = prepared.atFrequency(point.frequencyGHz * 1e9);
  const linear = point.polarisation === 'y' ? 'y' : 'x';
  const weights = incidenceWeigher(prepared, linear)(radFromDeg(point.incidenceDeg), radFromDeg(point.azimuthDeg));
  if ((point.polarisation === 'first' || point.polarisation === 'second') && weights.shares.length > 1) {
    weights.shares[0] = point.polarisation === 'first' ? 1 : 0;
    weights.shares[1] = point.polarisation === 'first' ? 0 : 1;
  }
  return coPolarResponse(at, point.cellIndex, weights, { magnitude: 0, phaseRad: 0 });
}
