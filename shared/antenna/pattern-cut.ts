import { degFromRad, radFromDeg } from '../units/angles';
import { powerRatioToDb } from '../units/decibels';
import { anglesOf, directionOf, type Direction } from '../waves/conventions';
import { greatCircle, type CutPlane } from './great-circle';
import { directivityRatio, type RadiationPattern } from './radiation-pattern';

/** A cut at constant phi, theta from -90 to 90 (negative on the far side), or a great circle through the wanted beam. */
export type CutRequest =
  | { readonly phiDeg: number; readonly thetaDeg: readonly [number, number, number] }
  | { readonly plane: CutPlane; readonly angleDeg: readonly [number, number, number] };

export interface Cut {
  readonly request: CutRequest;
  readonly angleDeg: Float64Array;
  /** Direction of each sample. */
  readonly thetaDeg: Float64Array;
  readonly phiDeg: Float64Array;
  readonly directivityDbi: Float64Array;
  readonly gainDbi: Float64Array;
  /** Of the cross-polar field, on the same scale; where the model has one. */
  readonly crossGainDbi?: Float64Array;
}

/** Nothing is shown or sent below this, so a null is a number too. */
export const FLOOR_DBI = -200;

/** Directivity ratio in dBi, not below the floor. */
export function flooredDbi(ratio: number): number {
  return ratio > 0 ? Math.max(FLOOR_DBI, powerRatioToDb(ratio)) : FLOOR_DBI;
}

/** Exact directivity and gain along a cut. `gainOffsetDb` is gain less directivity. */
export function patternCut(pattern: RadiationPattern, request: CutRequest, beam: Direction, gainOffsetDb: number): Cut {
  const angleDeg = sampleAngles('plane' in request ? request.angleDeg : request.thetaDeg);
  const along = directionAlong(request, beam);
  const thetaDeg = new Float64Array(angleDeg.length);
  const phiDeg = new Float64Array(angleDeg.length);
  const directivityDbi = new Float64Array(angleDeg.length);
  const gainDbi = new Float64Array(angleDeg.length);
  for (let i = 0; i < angleDeg.length; i++) {
    const direction = along(radFromDeg(angleDeg[i]));
    const angles = anglesOf(direction);
    thetaDeg[i] = degFromRad(angles.thetaRad);
    phiDeg[i] = degFromRad(angles.phiRad);
    directivityDbi[i] = flooredDbi(directivityRatio(pattern, direction));
    gainDbi[i] = Math.max(FLOOR_DBI, directivityDbi[i] + gainOffsetDb);
  }
  return { request, angleDeg, thetaDeg, phiDeg, directivityDbi, gainDbi };
}

function directionAlong(request: CutRequest, beam: Direction): (angleRad: number) => Direction {
  if ('plane' in request) return greatCircle(beam, request.plane);
  const phiRad = radFromDeg(request.phiDeg);
  return (thetaRad) => directionOf(thetaRad, phiRad);
}

/** from, from + step, ... up to and including `to` where it falls on a step. */
export function sampleAngles([from, to, step]: readonly [number, number, number]): Float64Array {
  const count = step > 0 && to >= from ? Math.floor((to - from) / step + 1e-6) + 1 : 1;
  return Float64Array.from({ length: count }, (_, i) => from + i * step);
}
