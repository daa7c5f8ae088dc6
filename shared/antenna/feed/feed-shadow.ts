import type { Direction } from '../../waves/conventions';
import type { CellPlaces } from '../panel-lattice';
import type { SiPosition } from '../si-design';

/** A disc that stands for horn and mount, in the way of the beam. */
export interface FeedDisc {
  readonly position: SiPosition;
  readonly radiusM: number;
}

/**
 * Distance of each cell's ray towards the beam from the middle of the disc; infinite where the disc lies behind the cell. With
 * alpha = (F - r).b the shadow falls along the beam: |F - r - alpha b|.
 */
export function shadowDistanceM({ xM, yM }: Pick<CellPlaces, 'xM' | 'yM'>, { position }: FeedDisc, beam: Direction): Float64Array {
  return xM.map((x, n) => {
    const [dx, dy, dz] = [position.xM - x, position.yM - yM[n], position.zM];
    const along = dx * beam.u + dy * beam.v + dz * beam.w;
    return along > 0 ? Math.hypot(dx - along * beam.u, dy - along * beam.v, dz - along * beam.w) : Infinity;
  });
}

/** 1 for the cells whose ray meets the disc: they re-radiate nothing (null field). */
export function shadowedCells(places: Pick<CellPlaces, 'xM' | 'yM'>, disc: FeedDisc, beam: Direction): Uint8Array {
  return Uint8Array.from(shadowDistanceM(places, disc, beam), (distance) => (distance < disc.radiusM ? 1 : 0));
}

/** Field at the centre of a circular aperture lost behind a disc of diameter x D: uniform 1 - x^2, illumination 1 - r^2 less again. */
export function centreBlockage(diameterRatio: number, illumination: 'uniform' | 'parabolic'): number {
  const x2 = diameterRatio * diameterRatio;
  // Integral of (1 - r^2) r from x to 1 over that from 0 to 1: (1 - x^2)^2.
  return illumination === 'uniform' ? 1 - x2 : (1 - x2) ** 2;
}
