import { columnPower, exactFarField } from './exact-far-field';
import { FLOOR_DBI, flooredDbi } from './pattern-cut';
import { elementPower, type RadiationPattern } from './radiation-pattern';

/** Gain over the unit square of (u, v): rows from v = -1 to 1, within a row from u = -1 to 1; the floor outside the visible circle. */
export interface UvMap {
  readonly size: number;
  readonly gainDbi: Float32Array;
  readonly floorDbi: number;
}

/** What one interpolated point costs in terms of one step of a plain sum. */
const INTERPOLATION_COST = 700;

/** Samples the pattern at uniform u and v. `gainOffsetDb` is gain less directivity. */
export function uvMap(pattern: RadiationPattern, size: number, gainOffsetDb: number): UvMap {
  const gainDbi = new Float32Array(size * size).fill(FLOOR_DBI);
  const coordinate = (i: number): number => (size === 1 ? 0 : -1 + (2 * i) / (size - 1));
  const scale = (4 * Math.PI) / pattern.radiatedPower;
  const powerInColumn = columnSampler(pattern, size);
  for (let column = 0; column < size; column++) {
    const u = coordinate(column);
    const powerAt = powerInColumn(u);
    for (let row = 0; row < size; row++) {
      const v = coordinate(row);
      const wSquared = 1 - u * u - v * v;
      if (wSquared < 0) continue;
      const ratio = powerAt(v) * elementPower(Math.sqrt(wSquared), pattern.radiateExponent) * scale;
      gainDbi[row * size + column] = Math.max(FLOOR_DBI, flooredDbi(ratio) + gainOffsetDb);
    }
  }
  return { size, gainDbi, floorDbi: FLOOR_DBI };
}

/** |F|^2 along v at one u: plain sums with the rows' inner sums shared by the column, or interpolation where that is cheaper. */
function columnSampler(pattern: RadiationPattern, size: number): (u: number) => (v: number) => number {
  const { field, wavenumber, farField } = pattern;
  const { grid } = field;
  const summing = size * field.re.length + size * size * grid.rowCount;
  if (summing > size * size * INTERPOLATION_COST) return (u) => (v) => farField.powerAt(u, v);
  const exact = exactFarField(field, wavenumber);
  const re = new Float64Array(grid.rowCount);
  const im = new Float64Array(grid.rowCount);
  return (u) => {
    exact.rowSumsAt(u, re, im);
    return (v) => columnPower({ re, im }, wavenumber * grid.firstYM * v, wavenumber * grid.stepYM * v);
  };
}
