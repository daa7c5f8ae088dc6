import { degFromRad, radFromDeg } from '../../../../shared/units/angles';

export interface AnglesDeg {
  readonly thetaDeg: number;
  readonly phiDeg: number;
}

export interface UvPoint {
  readonly u: number;
  readonly v: number;
}

/** Levels over the square from u, v = -1 to 1, row by row from v = -1. */
export interface UvLevels {
  readonly size: number;
  readonly levelDb: ArrayLike<number>;
}

/** The largest theta a beam can be steered to; at 90 degrees a panel radiates nothing. */
export const STEEPEST_DEG = 89.9;

export function uvOf({ thetaDeg, phiDeg }: AnglesDeg): UvPoint {
  const sine = Math.sin(radFromDeg(thetaDeg));
  return { u: sine * Math.cos(radFromDeg(phiDeg)), v: sine * Math.sin(radFromDeg(phiDeg)) };
}

/** Inverse of {@link uvOf}; on the steepest direction where the point lies beyond it. phi is 0 at broadside. */
export function anglesOfUv({ u, v }: UvPoint): AnglesDeg {
  const sine = Math.hypot(u, v);
  const thetaDeg = Math.min(STEEPEST_DEG, degFromRad(Math.asin(Math.min(1, sine))));
  return { thetaDeg, phiDeg: sine < 1e-9 ? 0 : degFromRad(Math.atan2(v, u)) };
}

/** Steering is done in tenths of a degree: what a person can set is what a person can read. */
export function steeringStep({ thetaDeg, phiDeg }: AnglesDeg): AnglesDeg {
  const tenths = (deg: number): number => Math.round(deg * 10) / 10;
  const phi = tenths(phiDeg);
  return { thetaDeg: Math.min(STEEPEST_DEG, tenths(thetaDeg)), phiDeg: tenths(thetaDeg) === 0 || phi === 0 ? 0 : phi === -180 ? 180 : phi };
}

/** A disc of directions in pixels: v upwards. */
export interface UvDisc {
  readonly centre: number;
  readonly radius: number;
}

export function discPoint(disc: UvDisc, { u, v }: UvPoint): { readonly x: number; readonly y: number } {
  return { x: disc.centre + u * disc.radius, y: disc.centre - v * disc.radius };
}

/** Inverse of {@link discPoint}. */
export function uvOfPoint(disc: UvDisc, x: number, y: number): UvPoint {
  return { u: (x - disc.centre) / disc.radius, v: (disc.centre - y) / disc.radius };
}

/** Level at a point, linear in dB between samples. */
export function levelAtUv({ size, levelDb }: UvLevels, { u, v }: UvPoint): number {
  const column = ((u + 1) / 2) * (size - 1);
  const row = ((v + 1) / 2) * (size - 1);
  const [c, r] = [Math.max(0, Math.min(size - 2, Math.floor(column))), Math.max(0, Math.min(size - 2, Math.floor(row)))];
  const [dc, dr] = [column - c, row - r];
  const at = r * size + c;
  return (levelDb[at] * (1 - dc) + levelDb[at + 1] * dc) * (1 - dr) + (levelDb[at + size] * (1 - dc) + levelDb[at + size + 1] * dc) * dr;
}

/**
 * Segments of the line of one level, by marching squares with linear interpolation (W. E. Lorensen, H. E. Cline, SIGGRAPH 1987,
 * in two dimensions; from memory).
 */
export function contourSegments({ size, levelDb }: UvLevels, level: number): readonly (readonly [UvPoint, UvPoint])[] {
  const found: (readonly [UvPoint, UvPoint])[] = [];
  const toUv = (place: number): number => (2 * place) / (size - 1) - 1;
  for (let row = 0; row < size - 1; row++) {
    for (let column = 0; column < size - 1; column++) {
      const at = row * size + column;
      const corners = [levelDb[at], levelDb[at + 1], levelDb[at + size + 1], levelDb[at + size]];
      const crossings = crossingsOf(corners, level).map(([x, y]) => ({ u: toUv(column + x), v: toUv(row + y) }));
      for (let i = 0; i + 1 < crossings.length; i += 2) found.push([crossings[i], crossings[i + 1]]);
    }
  }
  return found;
}

const CORNERS = [[0, 0], [1, 0], [1, 1], [0, 1]] as const;

function crossingsOf(corners: readonly number[], level: number): [number, number][] {
  const crossings: [number, number][] = [];
  for (let edge = 0; edge < 4; edge++) {
    const next = (edge + 1) % 4;
    if (corners[edge] > level === corners[next] > level) continue;
    const part = (level - corners[edge]) / (corners[next] - corners[edge]);
    const [from, to] = [CORNERS[edge], CORNERS[next]];
    crossings.push([from[0] + part * (to[0] - from[0]), from[1] + part * (to[1] - from[1])]);
  }
  return crossings;
}
