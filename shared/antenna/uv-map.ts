import { interpolatedColumn } from './interpolated-far-field';
import { FLOOR_DBI, flooredDbi } from './pattern-cut';
import { blendedLine, elementPower, type RadiationPattern } from './radiation-pattern';

/** Gain over the unit square of (u, v): rows from v = -1 to 1, within a row from u = -1 to 1; the floor outside the visible circle. */
export interface UvMap {
  readonly size: number;
  readonly gainDbi: Float32Array;
  /** Of the cross-polar field; where the model has one. */
  readonly crossGainDbi?: Float32Array;
  readonly floorDbi: number;
}

/** A move of a pattern over direction cosines, which leaves its form as it is. */
export interface UvShift {
  readonly u: number;
  readonly v: number;
}

/**
 * Samples the pattern at uniform u and v. `gainOffsetDb` is gain less directivity. With a shift the map holds at (u, v)
 * the exact gain in the direction (u - shift.u, v - shift.v), and the floor where that is no direction.
 */
export function uvMap(pattern: RadiationPattern, size: number, gainOffsetDb: number, shift: UvShift = { u: 0, v: 0 }): UvMap {
  const gainDbi = new Float32Array(size * size).fill(FLOOR_DBI);
  const coordinates = Float64Array.from({ length: size }, (_, i) => (size === 1 ? 0 : -1 + (2 * i) / (size - 1)));
  const scale = (4 * Math.PI) / pattern.radiatedPower;
  const vs = coordinates.map((v) => v - shift.v);
  const powersAt = pattern.blend ? undefined : interpolatedColumn(pattern.spectrum, pattern.wavenumber, vs);
  const powers = new Float64Array(size);
  for (let column = 0; column < size; column++) {
    const u = coordinates[column] - shift.u;
    powersAt?.(u, powers);
    const lines = pattern.blend ? blendedLine(pattern, pattern.blend, u) : () => 0;
    for (let row = 0; row < size; row++) {
      const wSquared = 1 - u * u - vs[row] * vs[row];
      if (wSquared < 0) continue;
      const w = Math.sqrt(wSquared);
      const ratio = scale * (powersAt ? powers[row] * elementPower(w, pattern.radiateExponent) : lines(vs[row], w));
      gainDbi[row * size + column] = Math.max(FLOOR_DBI, flooredDbi(ratio) + gainOffsetDb);
    }
  }
  return { size, gainDbi, floorDbi: FLOOR_DBI };
}
