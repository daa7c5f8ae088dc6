import type { CellIllumination } from './illumination';
import type { CellPlaces } from './panel-lattice';
import type { SiPlaneWave } from './si-design';

/** Lights the cells by a plane wave: amplitude 1, path -r.i for a wave that comes from direction i. */
export function planeWaveIllumination(wave: SiPlaneWave, lattice: CellPlaces): CellIllumination {
  const { count, xM, yM } = lattice;
  const { u, v, w } = wave.source;
  const pathM = new Float64Array(count);
  for (let n = 0; n < count; n++) pathM[n] = -(xM[n] * u + yM[n] * v);
  const transverse = Math.hypot(u, v);
  return {
    amplitude: new Float64Array(count).fill(1),
    pathM,
    incidenceRad: new Float64Array(count).fill(Math.atan2(transverse, w)),
    azimuthRad: new Float64Array(count).fill(transverse < 1e-12 ? 0 : Math.atan2(-v, -u)),
  };
}
