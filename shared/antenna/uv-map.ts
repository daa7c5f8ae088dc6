import { interpolatedColumn } from './interpolated-far-field';
import { FLOOR_DBI, flooredDbi } from './pattern-cut';
import { elementPower, type RadiationPattern } from './radiation-pattern';

/** Gain over the unit square of (u, v): rows from v = -1 to 1, within a row from u = -1 to 1; the floor outside the visible circle. */
export interface UvMap {
  readonly size: number;
  readonly gainDbi: Float32Array;
  readonly floorDbi: number;
}

/** Samples the pattern at uniform u and v. `gainOffsetDb` is gain less directivity. */
export function uvMap(pattern: RadiationPattern, size: number, gainOffsetDb: number): UvMap {
  const gainDbi = new Float32Array(size * size).fill(FLOOR_DBI);
  const coordinates = Float64Array.from({ length: size }, (_, i) => (size === 1 ? 0 : -1 + (2 * i) / (size - 1)));
  const scale = (4 * Math.PI) / pattern.radiatedPower;
  const powersAt = interpolatedColumn(pattern.spectrum, pattern.wavenumber, coordinates);
  const powers = new Float64Array(size);
  for (let column = 0; column < size; column++) {
    const u = coordinates[column];
    powersAt(u, powers);
    for (let row = 0; row < size; row++) {
      const wSquared = 1 - u * u - coordinates[row] * coordinates[row];
      if (wSquared < 0) continue;
      const ratio = powers[row] * elementPower(Math.sqrt(wSquared), pattern.radiateExponent) * scale;
      gainDbi[row * size + column] = Math.max(FLOOR_DBI, flooredDbi(ratio) + gainOffsetDb);
    }
  }
  return { size, gainDbi, floorDbi: FLOOR_DBI };
}
