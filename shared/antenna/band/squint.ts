import type { Direction } from '../../waves/conventions';
import { greatCircle } from '../great-circle';

/** How far a beam stands off the wanted direction, signed. */
export interface Squint {
  /** Away from the z axis, in the plane that holds it and the wanted beam. */
  readonly alongRad: number;
  /** Towards rising phi. */
  readonly acrossRad: number;
}

/** Squint of a beam found at `found` while `wanted` was asked for. */
export function squintOf(wanted: Direction, found: Direction): Squint {
  const along = greatCircle(wanted, 'along')(Math.PI / 2);
  const across = greatCircle(wanted, 'across')(Math.PI / 2);
  return { alongRad: Math.atan2(dot(found, along), dot(found, wanted)), acrossRad: Math.asin(Math.max(-1, Math.min(1, dot(found, across)))) };
}

const dot = (a: Direction, b: Direction): number => a.u * b.u + a.v * b.v + a.w * b.w;

/**
 * Tangential cosine of the beam of frequency-independent phases at frequency f: u(f) = u_i + (f0/f)(u0 - u_i), u_i that of
 * the direction in which the incident plane wave travels, u0 that of the beam at the design frequency f0. It follows from
 * k u = k u_i - grad(phase) with a gradient that does not change; at the specular angle u0 = u_i there is no squint.
 * The beam of a panel that a horn lights follows it in the mean only. The same law holds for v.
 */
export function squintedCosine(incidentCosine: number, designCosine: number, frequencyRatio: number): number {
  return incidentCosine + (designCosine - incidentCosine) / frequencyRatio;
}
