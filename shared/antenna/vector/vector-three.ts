/** A vector of space: x, y, z. */
export type Vector3 = readonly [number, number, number];

/** A vector with a complex amplitude along each axis. */
export interface ComplexVector {
  readonly re: Vector3;
  readonly im: Vector3;
}

export function dotProduct(a: Vector3, b: Vector3): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

export function crossProduct(a: Vector3, b: Vector3): Vector3 {
  return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
}

/** The part of `a` across the unit vector `axis`, of unit length; of an `a` along it, some vector across it. */
export function unitAcross(a: Vector3, axis: Vector3): Vector3 {
  const along = dotProduct(a, axis);
  const part: Vector3 = [a[0] - along * axis[0], a[1] - along * axis[1], a[2] - along * axis[2]];
  const length = Math.hypot(...part);
  if (length > 1e-9) return [part[0] / length, part[1] / length, part[2] / length];
  return unitAcross([0, 0, 1], axis);
}
