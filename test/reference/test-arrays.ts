import type { ApertureField } from '../../shared/antenna/aperture-field';
import { cutMetrics, type CutMetrics } from '../../shared/antenna/cut-metrics';
import { greatCircle, visibleArcRad, type CutPlane } from '../../shared/antenna/great-circle';
import { elementPower, radiationPattern, type RadiationPattern } from '../../shared/antenna/radiation-pattern';
import { radFromDeg } from '../../shared/units/angles';
import { directionOf, type Direction } from '../../shared/waves/conventions';

/** Arrays for checks, at a wavelength of 1 m, so that positions are in wavelengths. */
export const WAVENUMBER = 2 * Math.PI; // rad/m

export interface TestArray {
  readonly columns: number;
  readonly rows: number;
  readonly stepX: number;
  readonly stepY: number;
  /** Real weight at column and row; 1 unless given. */
  readonly weight?: (column: number, row: number) => number;
  /** Phase in rad at a position; 0 unless given. */
  readonly phase?: (x: number, y: number) => number;
}

export function testField({ columns, rows, stepX, stepY, weight, phase }: TestArray): ApertureField {
  const firstXM = -((columns - 1) / 2) * stepX;
  const firstYM = -((rows - 1) / 2) * stepY;
  const re = new Float64Array(columns * rows);
  const im = new Float64Array(columns * rows);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const size = weight?.(column, row) ?? 1;
      const angle = phase?.(firstXM + column * stepX, firstYM + row * stepY) ?? 0;
      re[row * columns + column] = size * Math.cos(angle);
      im[row * columns + column] = size * Math.sin(angle);
    }
  }
  const grid = { columnCount: columns, rowCount: rows, firstXM, firstYM, stepXM: stepX, stepYM: stepY, stagger: 'none' as const };
  return { grid, re, im };
}

/** Pattern with power element factor cos^m, m = 2b. */
export const testPattern = (array: TestArray, powerExponent = 0): RadiationPattern =>
  radiationPattern(testField(array), WAVENUMBER, powerExponent / 2);

/** Phase that steers to a direction: a beam at b needs -k r.b. */
export const steeringPhase = (beam: Direction) => (x: number, y: number): number => -WAVENUMBER * (x * beam.u + y * beam.v);

export const beamAt = (thetaDeg: number, phiDeg: number): Direction => directionOf(radFromDeg(thetaDeg), radFromDeg(phiDeg));

/** Beamwidth and sidelobe on the great circle through a beam. */
export function cutThrough(pattern: RadiationPattern, beam: Direction, plane: CutPlane, samples = 4000): CutMetrics {
  const circle = greatCircle(beam, plane);
  const [fromRad, toRad] = visibleArcRad(beam, plane);
  const power = (angleRad: number): number => {
    const direction = circle(angleRad);
    return pattern.farField.powerAt(direction.u, direction.v) * elementPower(direction.w, pattern.radiateExponent);
  };
  return cutMetrics({ power, fromRad, toRad, samples });
}

/** A figure that must be a number here. */
export function numberOf(figure: unknown): number {
  if (typeof figure !== 'number') throw new Error(`there is no such figure: ${JSON.stringify(figure)}`);
  return figure;
}
