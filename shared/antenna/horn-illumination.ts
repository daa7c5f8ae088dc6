import { hornSampler } from './horn-field';
import type { CellIllumination } from './illumination';
import type { CellPlaces } from './panel-lattice';
import type { SiHorn } from './si-design';

/** Lights the cells by a horn: amplitude cos^q / R times cos^a of the angle of incidence, a the receive exponent. */
export function hornIllumination(horn: SiHorn, lattice: CellPlaces, receiveExponent: number): CellIllumination {
  const { count, xM, yM } = lattice;
  const amplitude = new Float64Array(count);
  const pathM = new Float64Array(count);
  const incidenceRad = new Float64Array(count);
  const azimuthRad = new Float64Array(count);
  const sampleAt = hornSampler(horn);
  for (let n = 0; n < count; n++) {
    const sample = sampleAt(xM[n], yM[n]);
    amplitude[n] = sample.field * Math.pow(sample.cosIncidence, receiveExponent);
    pathM[n] = sample.distanceM;
    incidenceRad[n] = Math.acos(sample.cosIncidence);
    azimuthRad[n] = sample.azimuthRad;
  }
  return { amplitude, pathM, incidenceRad, azimuthRad };
}
