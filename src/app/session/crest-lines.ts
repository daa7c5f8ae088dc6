import type { OutgoingField } from './outgoing-field';

/** Short straight pieces of wave crests: x and z of both ends in metres, and the amplitude in [0, 1] of the largest. */
export interface CrestLines {
  readonly count: number;
  /** Five numbers a piece: from x, from z, to x, to z, amplitude. */
  readonly pieces: Float32Array;
}

/** Pieces per sample step: the carrier is put back on this finer grid, where a wavelength spans at least ten points. */
const FINER = 4;
const NUMBERS = 5;

interface Lattice {
  readonly columns: number;
  readonly rows: number;
  readonly stepM: number;
  readonly re: Float32Array;
  readonly im: Float32Array;
}

/** Crests of the wave at the instant when its phase is 0: where the imaginary part crosses zero and the real part is positive. */
export function crestLines(field: OutgoingField): CrestLines {
  const fine = withCarrier(field);
  const found: number[] = [];
  for (let row = 0; row + 1 < fine.rows; row++) {
    for (let column = 0; column + 1 < fine.columns; column++) crossSquare(field, fine, { column, row }, found);
  }
  return { count: found.length / NUMBERS, pieces: Float32Array.from(found) };
}

function withCarrier({ grid, real, imaginary, wavenumber, beamU, beamW }: OutgoingField): Lattice {
  const columns = (grid.columns - 1) * FINER + 1;
  const rows = (grid.rows - 1) * FINER + 1;
  const stepM = grid.stepM / FINER;
  const re = new Float32Array(columns * rows);
  const im = new Float32Array(re.length);
  for (let at = 0; at < re.length; at++) {
    const column = at % columns;
    const row = Math.floor(at / columns);
    const left = Math.min(grid.columns - 2, Math.floor(column / FINER));
    const low = Math.min(grid.rows - 2, Math.floor(row / FINER));
    const across = column / FINER - left;
    const up = row / FINER - low;
    const slowRe = bilinear(real, grid.columns, { left, low, across, up });
    const slowIm = bilinear(imaginary, grid.columns, { left, low, across, up });
    const phase = -wavenumber * (beamU * (grid.fromXM + column * stepM) + beamW * (grid.fromZM + row * stepM));
    re[at] = slowRe * Math.cos(phase) - slowIm * Math.sin(phase);
    im[at] = slowRe * Math.sin(phase) + slowIm * Math.cos(phase);
  }
  return { columns, rows, stepM, re, im };
}

function bilinear(values: Float32Array, columns: number, place: { left: number; low: number; across: number; up: number }): number {
  const at = place.low * columns + place.left;
  const below = values[at] + (values[at + 1] - values[at]) * place.across;
  const above = values[at + columns] + (values[at + columns + 1] - values[at + columns]) * place.across;
  return below + (above - below) * place.up;
}

/** Adds the piece of a crest that crosses one square; a square whose corners disagree twice over is left out, as at a null. */
function crossSquare(field: OutgoingField, fine: Lattice, { column, row }: { column: number; row: number }, found: number[]): void {
  const at = row * fine.columns + column;
  const corners = [at, at + 1, at + fine.columns + 1, at + fine.columns];
  if (corners.every((corner) => fine.im[corner] > 0) || corners.every((corner) => fine.im[corner] <= 0)) return;
  if (corners.reduce((sum, corner) => sum + fine.re[corner], 0) <= 0) return;
  const ends: number[] = [];
  for (let side = 0; side < 4; side++) {
    const from = fine.im[corners[side]];
    const to = fine.im[corners[(side + 1) % 4]];
    if (from > 0 === to > 0) continue;
    const share = from / (from - to);
    const [x, z] = [
      [column + share, row],
      [column + 1, row + share],
      [column + 1 - share, row + 1],
      [column, row + 1 - share],
    ][side];
    ends.push(field.grid.fromXM + x * fine.stepM, field.grid.fromZM + z * fine.stepM);
  }
  if (ends.length !== 4) return;
  found.push(...ends, Math.hypot(fine.re[at], fine.im[at]) / field.largest);
}
