import { anglesOf, type Direction } from '../../waves/conventions';

type Vector = readonly [number, number, number];

/**
 * The plane across a beam: theta and phi unit vectors of its direction, turned back by phi so that azimuth about the
 * axis is counted from x, whatever the azimuth of the beam. At broadside this is x and y themselves.
 */
export interface BeamFrame {
  readonly axis: Vector;
  readonly across: Vector;
  readonly upright: Vector;
}

export function beamFrame(beam: Direction): BeamFrame {
  const { thetaRad, phiRad } = anglesOf(beam);
  const [ct, st, cp, sp] = [Math.cos(thetaRad), Math.sin(thetaRad), Math.cos(phiRad), Math.sin(phiRad)];
  const theta: Vector = [ct * cp, ct * sp, -st];
  const phi: Vector = [-sp, cp, 0];
  return { axis: [beam.u, beam.v, beam.w], across: mixed(theta, cp, phi, -sp), upright: mixed(theta, sp, phi, cp) };
}

function mixed(a: Vector, p: number, b: Vector, q: number): Vector {
  return [a[0] * p + b[0] * q, a[1] * p + b[1] * q, a[2] * p + b[2] * q];
}

/** Direction at an angle off the axis and an azimuth about it. */
export function directionAbout(frame: BeamFrame, offAxisRad: number, azimuthRad: number): Direction {
  const [c, s] = [Math.cos(offAxisRad), Math.sin(offAxisRad)];
  const [x, y] = [s * Math.cos(azimuthRad), s * Math.sin(azimuthRad)];
  const part = (i: 0 | 1 | 2): number => c * frame.axis[i] + x * frame.across[i] + y * frame.upright[i];
  return { u: part(0), v: part(1), w: part(2) };
}
