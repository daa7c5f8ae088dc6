import type { Direction } from '../waves/conventions';

export type CutPlane = 'along' | 'across';

/**
 * The great circle through a beam: "along" holds the z axis too, "across" is orthogonal to it. Angle 0 is the beam;
 * positive angles go away from z along, and towards rising phi across.
 */
export function greatCircle(beam: Direction, plane: CutPlane): (angleRad: number) => Direction {
  const transverse = Math.hypot(beam.u, beam.v);
  // At broadside any plane holds z; phi = 0 is taken.
  const cosPhi = transverse < 1e-12 ? 1 : beam.u / transverse;
  const sinPhi = transverse < 1e-12 ? 0 : beam.v / transverse;
  const side: Direction =
    plane === 'along' ? { u: beam.w * cosPhi, v: beam.w * sinPhi, w: -transverse } : { u: -sinPhi, v: cosPhi, w: 0 };
  return (angleRad) => {
    const c = Math.cos(angleRad);
    const s = Math.sin(angleRad);
    return { u: c * beam.u + s * side.u, v: c * beam.v + s * side.v, w: c * beam.w + s * side.w };
  };
}

/** The part of the great circle that lies in front of the panel, as angles from the beam. */
export function visibleArcRad(beam: Direction, plane: CutPlane): [number, number] {
  const thetaRad = plane === 'along' ? Math.atan2(Math.hypot(beam.u, beam.v), beam.w) : 0;
  return [-Math.PI / 2 - thetaRad, Math.PI / 2 - thetaRad];
}
