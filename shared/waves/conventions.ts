import { SPEED_OF_LIGHT_M_PER_S } from '../units/constants';

/*
 * The conventions of this house, each stated once.
 *
 *   time            exp(+j omega t), peak phasors: a delay is a falling phase
 *   wave            exp(-j k.r) for a wave travelling along k
 *   panel           z = 0, centre at the origin, +z the outward side where the beams are
 *   angles          theta from +z, phi from +x towards +y
 *   cosines         u = sin theta cos phi, v = sin theta sin phi, w = cos theta
 *   pattern         F(u, v) = sum of a_n exp(+j k (x_n u + y_n v))
 *   incidence       a plane wave "from" (theta, phi) comes from that direction
 *   grids           row-major, rows from the lowest y (or v), within a row from the lowest x (or u)
 */

/** Direction cosines of a unit vector. */
export interface Direction {
  readonly u: number;
  readonly v: number;
  readonly w: number;
}

/** Unit vector of (theta, phi). Inverse: {@link anglesOf}. */
export function directionOf(thetaRad: number, phiRad: number): Direction {
  const sine = Math.sin(thetaRad);
  return { u: sine * Math.cos(phiRad), v: sine * Math.sin(phiRad), w: Math.cos(thetaRad) };
}

/** (theta, phi) of a unit vector; phi is 0 where theta is. Inverse: {@link directionOf}. */
export function anglesOf(direction: Direction): { thetaRad: number; phiRad: number } {
  const transverse = Math.hypot(direction.u, direction.v);
  return { thetaRad: Math.atan2(transverse, direction.w), phiRad: transverse < 1e-12 ? 0 : Math.atan2(direction.v, direction.u) };
}

/** The direction in the outward half space with given tangential cosines; on the rim where they exceed it by rounding. */
export function outwardDirection(u: number, v: number): Direction {
  return { u, v, w: Math.sqrt(Math.max(0, 1 - u * u - v * v)) };
}

/** Angle between two unit vectors, accurate for small angles too. */
export function angleBetweenRad(a: Direction, b: Direction): number {
  const chord = Math.hypot(a.u - b.u, a.v - b.v, a.w - b.w);
  return 2 * Math.asin(Math.min(1, chord / 2));
}

/** Wavenumber k = 2 pi f / c in rad/m. */
export function wavenumberRadPerM(frequencyHz: number): number {
  return (2 * Math.PI * frequencyHz) / SPEED_OF_LIGHT_M_PER_S;
}

/** Phase that a wave has gained after a path: -k s, negative because time is exp(+j omega t). */
export function pathPhaseRad(wavenumber: number, pathM: number): number {
  return -wavenumber * pathM;
}

/** Phase at a point of the wave that comes from `source`: it travels along -source, so -k (-source).r. */
export function incidentPlaneWavePhaseRad(wavenumber: number, source: Direction, xM: number, yM: number): number {
  return wavenumber * (xM * source.u + yM * source.v);
}

/** Phase that the field of a panel must have at a point to radiate towards `beam`: -k r.b. */
export function beamAperturePhaseRad(wavenumber: number, beam: Direction, xM: number, yM: number): number {
  return -wavenumber * (xM * beam.u + yM * beam.v);
}

/**
 * Azimuth and elevation where offered: az = atan2(x, z), el = asin(y).
 * Other definitions go by the same names, so the formula is shown beside the field.
 */
export function azimuthElevationRad(direction: Direction): { azimuthRad: number; elevationRad: number } {
  return { azimuthRad: Math.atan2(direction.u, direction.w), elevationRad: Math.asin(direction.v) };
}
