import { editionKeeper } from '../kept-by-edition';
import type { MatrixSample, MatrixSampler } from './matrix-response';

/** More matrices than this are not kept: 26 MB for each panel. */
export const MOST_KEPT_MATRICES = 400_000;
const NUMBERS_PER_MATRIX = 8;

/** The 2x2 responses of all cells that may be used, at every position: [position][cell][entry]. */
export interface PositionMatrices {
  /** Place of each cell of the edition in the list, -1 where it may not be used. */
  readonly slot: Int32Array;
  readonly slotCount: number;
  readonly values: Float64Array;
}

export interface MatrixSource {
  readonly sampler: MatrixSampler;
  readonly incidenceRad: Float64Array;
  readonly azimuthRad: Float64Array;
  /** Cells that may be used, by their index in an edition of `cellCount`. */
  readonly allowed: Int32Array;
  readonly cellCount: number;
}

export const keptPositionMatrices = editionKeeper<PositionMatrices>();

export function listPositionMatrices({ sampler, incidenceRad, azimuthRad, allowed, cellCount }: MatrixSource, out: MatrixSample): PositionMatrices {
  const slot = new Int32Array(cellCount).fill(-1);
  allowed.forEach((cell, i) => (slot[cell] = i));
  const values = new Float64Array(incidenceRad.length * allowed.length * NUMBERS_PER_MATRIX);
  let at = 0;
  for (let n = 0; n < incidenceRad.length; n++) {
    sampler.setAngle(incidenceRad[n], azimuthRad[n]);
    for (const cell of allowed) {
      const s = sampler.sample(cell, out);
      values[at++] = s.s11Re;
      values[at++] = s.s11Im;
      values[at++] = s.s12Re;
      values[at++] = s.s12Im;
      values[at++] = s.s21Re;
      values[at++] = s.s21Im;
      values[at++] = s.s22Re;
      values[at++] = s.s22Im;
    }
  }
  return { slot, slotCount: allowed.length, values };
}

/** Response of a cell at position n, as the sampler gave it. Written into `out`. */
export function readMatrix({ slot, slotCount, values }: PositionMatrices, n: number, cell: number, out: MatrixSample): MatrixSample {
  if (slot[cell] < 0) throw new RangeError(`cell ${cell} is not among those listed`);
  let at = (n * slotCount + slot[cell]) * NUMBERS_PER_MATRIX;
  out.s11Re = values[at++];
  out.s11Im = values[at++];
  out.s12Re = values[at++];
  out.s12Im = values[at++];
  out.s21Re = values[at++];
  out.s21Im = values[at++];
  out.s22Re = values[at++];
  out.s22Im = values[at];
  return out;
}
