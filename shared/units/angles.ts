const RAD_PER_DEG = Math.PI / 180;
const TURN_RAD = 2 * Math.PI;

/** Degrees to radians. Inverse: {@link degFromRad}. */
export function radFromDeg(deg: number): number {
  return deg * RAD_PER_DEG;
}

/** Radians to degrees. Inverse: {@link radFromDeg}. */
export function degFromRad(rad: number): number {
  return rad / RAD_PER_DEG;
}

/** The same angle in (-180, 180]. */
export function wrapDeg(deg: number): number {
  return deg - 360 * Math.ceil((deg - 180) / 360);
}

/** The same angle in (-pi, pi]. */
export function wrapRad(rad: number): number {
  return rad - TURN_RAD * Math.ceil((rad - Math.PI) / TURN_RAD);
}

/** The same angle in [0, 360). */
export function positiveDeg(deg: number): number {
  const turned = deg - 360 * Math.floor(deg / 360);
  return turned >= 360 ? 0 : turned;
}
