import { columnPower } from './far-field';
import { FLOOR_DBI, flooredDbi } from './pattern-cut';
import { elementPower, type RadiationPattern } from './radiation-pattern';

/** Gain over the unit square of (u, v): rows from v = -1 to 1, within a row from u = -1 to 1; the floor outside the visible circle. */
export interface UvMap {
  readonly size: number;
  readonly gainDbi: Float32Array;
  readonly floorDbi: number;
}

/** Samples the pattern at uniform u and v: the inner sums of the rows are shared by all v of a column. */
export function uvMap(pattern: RadiationPattern, size: number, gainOffsetDb: number): UvMap {
  const { grid } = pattern.spectrum;
  const gainDbi = new Float32Array(size * size).fill(FLOOR_DBI);
  const re = new Float64Array(grid.rowCount);
  const im = new Float64Array(grid.rowCount);
  const coordinate = (i: number): number => (size === 1 ? 0 : -1 + (2 * i) / (size - 1));
  for (let column = 0; column < size; column++) {
    const u = coordinate(column);
    pattern.farField.rowSumsAt(u, re, im);
    for (let row = 0; row < size; row++) {
      const v = coordinate(row);
      const wSquared = 1 - u * u - v * v;
      if (wSquared < 0) continue;
      const array = columnPower({ re, im }, pattern.wavenumber * grid.firstYM * v, pattern.wavenumber * grid.stepYM * v);
      const power = array * elementPower(Math.sqrt(wSquared), pattern.radiateExponent);
      gainDbi[row * size + column] = Math.max(FLOOR_DBI, flooredDbi((4 * Math.PI * power) / pattern.radiatedPower) + gainOffsetDb);
    }
  }
  return { size, gainDbi, floorDbi: FLOOR_DBI };
}
