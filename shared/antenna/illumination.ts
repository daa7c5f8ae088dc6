import { guidedWaveIllumination } from './guided-wave/guided-wave-illumination';
import { hornIllumination } from './horn-illumination';
import type { CellPlaces } from './panel-lattice';
import { planeWaveIllumination } from './plane-wave-illumination';
import type { SiIllumination } from './si-design';

/**
 * What lights each cell, at every frequency: the incident phase is -k pathM. The azimuth is that of the direction of
 * travel, so (incidence, azimuth) give the tangential cosines sin(incidence) (cos, sin)(azimuth).
 */
export interface CellIllumination {
  readonly amplitude: Float64Array;
  readonly pathM: Float64Array;
  readonly incidenceRad: Float64Array;
  readonly azimuthRad: Float64Array;
  /** Tangential wavenumber over k of a wave that does not come through free space; the sine of the incidence otherwise. */
  readonly tangentialIndex?: number;
}

type Illuminator<Kind extends SiIllumination['kind']> = (
  illumination: Extract<SiIllumination, { kind: Kind }>,
  lattice: CellPlaces,
  receiveExponent: number,
) => CellIllumination;

/** One line for each way of lighting a panel. */
const illuminators: { readonly [Kind in SiIllumination['kind']]: Illuminator<Kind> } = {
  horn: hornIllumination,
  'plane-wave': planeWaveIllumination,
  'guided-wave': guidedWaveIllumination,
};

/** Amplitude, path and incidence at every cell. */
export function illuminateCells(illumination: SiIllumination, lattice: CellPlaces, receiveExponent: number): CellIllumination {
  const illuminate = illuminators[illumination.kind] as (i: SiIllumination, l: CellPlaces, a: number) => CellIllumination;
  return illuminate(illumination, lattice, receiveExponent);
}
