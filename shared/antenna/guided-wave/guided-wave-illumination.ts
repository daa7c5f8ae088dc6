import type { CellIllumination } from '../illumination';
import { outlineTrace } from '../outline';
import type { CellPlaces } from '../panel-lattice';
import type { SiGuidedWave, SiOutline } from '../si-design';

/**
 * Lights the cells by a wave that runs under the panel. Plane: exp(-(alpha + j k n) s) with s along the wave from the feed
 * edge; radial: exp(-(alpha + j k n) rho) / sqrt(rho) from the launch, nothing within its radius. The index holds at every
 * frequency. There is no angle of incidence.
 */
export function guidedWaveIllumination(wave: SiGuidedWave, lattice: CellPlaces): CellIllumination {
  const { count, xM, yM } = lattice;
  const amplitude = new Float64Array(count);
  const pathM = new Float64Array(count);
  const azimuthRad = new Float64Array(count);
  for (let n = 0; n < count; n++) {
    const way = wayAt(wave, xM[n], yM[n]);
    amplitude[n] = way.size * Math.exp(-wave.leakageNpPerM * way.lengthM);
    pathM[n] = wave.effectiveIndex * way.lengthM;
    azimuthRad[n] = way.azimuthRad;
  }
  return { amplitude, pathM, incidenceRad: new Float64Array(count), azimuthRad, tangentialIndex: wave.effectiveIndex };
}

/** Length that the wave has run to a point of the panel, its direction there, and its spreading. */
function wayAt({ launch }: SiGuidedWave, xM: number, yM: number): { lengthM: number; azimuthRad: number; size: number } {
  if (launch.kind === 'plane') {
    return { lengthM: xM * Math.cos(launch.directionRad) + yM * Math.sin(launch.directionRad) - launch.feedEdgeM, azimuthRad: launch.directionRad, size: 1 };
  }
  const [dx, dy] = [xM - launch.centre.xM, yM - launch.centre.yM];
  const lengthM = Math.hypot(dx, dy);
  return { lengthM, azimuthRad: Math.atan2(dy, dx), size: lengthM < launch.radiusM ? 0 : 1 / Math.sqrt(lengthM) };
}

/** Where the wave starts: the least coordinate of the outline along its direction. */
export function feedEdgeM(outline: SiOutline, directionRad: number): number {
  return Math.min(...alongDirection(outline, directionRad));
}

/** The way that the wave runs under the panel: across the outline, or from the launch to its farthest point. */
export function guideLengthM({ launch }: SiGuidedWave, outline: SiOutline): number {
  if (launch.kind === 'plane') return Math.max(...alongDirection(outline, launch.directionRad)) - launch.feedEdgeM;
  return Math.max(...outlineTrace(outline, 720).map(({ xM, yM }) => Math.hypot(xM - launch.centre.xM, yM - launch.centre.yM)));
}

function alongDirection(outline: SiOutline, directionRad: number): number[] {
  const [c, s] = [Math.cos(directionRad), Math.sin(directionRad)];
  return outlineTrace(outline, 720).map(({ xM, yM }) => xM * c + yM * s);
}
