import { comparisonFloorDbi, cutDifferenceDb } from '../../shared/antenna/compare-cuts';
import { apertureOverWavelength } from '../../shared/antenna/derived-values';
import type { Cut, CutRequest } from '../../shared/antenna/pattern-cut';
import type { UvShift } from '../../shared/antenna/uv-map';
import type { Beam, DesignDocument } from '../../shared/model/design-document';
import { degFromRad, radFromDeg } from '../../shared/units/angles';
import { directionOf } from '../../shared/waves/conventions';

/** Which cut to compare, and by how much to shift the earlier side in u so that the first beams coincide. */
export interface ComparedPlane {
  readonly request: CutRequest;
  readonly shiftU: number;
}

export interface ComparedCut extends ComparedPlane {
  readonly angleDeg: Float64Array;
  readonly beforeDbi: Float64Array;
  readonly afterDbi: Float64Array;
  /** NaN in gaps. */
  readonly differenceDb: Float64Array;
  readonly floorDbi: number;
}

/** Steps offered, in degrees. Linear interpolation between samples needs some twenty of them in a lobe. */
const STEPS_DEG = [0.1, 0.05, 0.02] as const;
const SAMPLES_PER_LOBE = 20;
/** Azimuths nearer than this make one plane. */
const SAME_PLANE_DEG = 1e-6;

/**
 * Along: the plane of both first beams where there is one, over theta with the beams shifted onto each other; else for
 * each side the plane of its own beam, over the angle from it. Across: for each side through its own beam.
 */
export function comparedPlanes(before: DesignDocument, after: DesignDocument): ComparedPlane[] {
  const angleDeg: [number, number, number] = [-90, 90, Math.min(stepFor(before), stepFor(after))];
  const along = commonPlane(before.requirement.beams[0], after.requirement.beams[0], angleDeg);
  return [along ?? { request: { plane: 'along', angleDeg }, shiftU: 0 }, { request: { plane: 'across', angleDeg }, shiftU: 0 }];
}

function commonPlane(before: Beam, after: Beam, thetaDeg: [number, number, number]): ComparedPlane | undefined {
  // A beam at broadside lies in every plane.
  const phiDeg = after.thetaDeg === 0 ? before.phiDeg : after.phiDeg;
  const turnDeg = before.thetaDeg === 0 ? 0 : Math.abs(before.phiDeg - phiDeg) % 180;
  if (Math.min(turnDeg, 180 - turnDeg) > SAME_PLANE_DEG) return undefined;
  return { request: { phiDeg, thetaDeg }, shiftU: sineAlong(after, phiDeg) - sineAlong(before, phiDeg) };
}

/** Position of a beam along the plane at phi in direction cosines: negative on the far side of broadside. */
function sineAlong(beam: Beam, phiDeg: number): number {
  const side = Math.cos(radFromDeg(beam.phiDeg - phiDeg)) < 0 ? -1 : 1;
  return side * Math.sin(radFromDeg(beam.thetaDeg));
}

/** From the first beam before to the first beam after, by their tangential direction cosines. */
export function beamShift(before: DesignDocument, after: DesignDocument): UvShift {
  const [from, to] = [before, after].map(({ requirement: { beams: [beam] } }) => directionOf(radFromDeg(beam.thetaDeg), radFromDeg(beam.phiDeg)));
  return { u: to.u - from.u, v: to.v - from.v };
}

function stepFor(design: DesignDocument): number {
  const lobeDeg = degFromRad(1 / apertureOverWavelength(design));
  return STEPS_DEG.find((stepDeg) => stepDeg <= lobeDeg / SAMPLES_PER_LOBE) ?? STEPS_DEG[STEPS_DEG.length - 1];
}

export function comparedCuts(planes: readonly ComparedPlane[], before: readonly Cut[], after: readonly Cut[]): ComparedCut[] {
  const floorDbi = comparisonFloorDbi(peakDbi(before), peakDbi(after));
  return planes.map(({ request, shiftU }, i) => ({
    request,
    shiftU,
    floorDbi,
    angleDeg: after[i].angleDeg,
    beforeDbi: before[i].gainDbi,
    afterDbi: after[i].gainDbi,
    differenceDb: cutDifferenceDb(overU(before[i]), overU(after[i]), shiftU, floorDbi),
  }));
}

/** The highest gain along the cuts of one side. */
function peakDbi(cuts: readonly Cut[]): number {
  return Math.max(...cuts.map(({ gainDbi }) => gainDbi.reduce((most, level) => Math.max(most, level), -Infinity)));
}

/** Angles run from -90 to 90 degrees, over which the sine rises. */
function overU({ angleDeg, gainDbi }: Cut): { u: Float64Array; levelDbi: Float64Array } {
  return { u: angleDeg.map((angle) => Math.sin(radFromDeg(angle))), levelDbi: gainDbi };
}
