import { degFromRad } from '../../units/angles';
import { greatCircle, visibleArcRad, type CutPlane } from '../great-circle';
import type { PanelLattice } from '../panel-lattice';
import type { Direction } from '../../waves/conventions';

/** Angles at which a cut is read in every trial, in degrees from the beam, and their directions. */
export interface EnvelopeAngles {
  readonly plane: CutPlane;
  readonly angleDeg: Float64Array;
  readonly directions: readonly Direction[];
}

const COARSE_DEG = 1;
/** Near the beam: so many beamwidths either way, so many samples to one. */
const FINE_BEAMWIDTHS = 8;
const SAMPLES_PER_BEAMWIDTH = 6;

/** Fine steps about the beam and steps of a degree elsewhere, over the part of the great circle in front of the panel. */
export function envelopeAngles(beam: Direction, plane: CutPlane, { grid }: PanelLattice, wavenumber: number): EnvelopeAngles {
  const sideM = Math.max(grid.columnCount * grid.stepXM, grid.rowCount * grid.stepYM);
  // Uniform line, 0.886 lambda / L: the finest that any plane of the panel has.
  const beamwidthDeg = degFromRad((0.886 * 2 * Math.PI) / (wavenumber * sideM));
  const fineDeg = Math.min(COARSE_DEG, beamwidthDeg / SAMPLES_PER_BEAMWIDTH);
  const reachDeg = Math.min(90, FINE_BEAMWIDTHS * beamwidthDeg);
  const [from, to] = visibleArcRad(beam, plane).map(degFromRad);
  const angles: number[] = [];
  for (let deg = Math.ceil(from / COARSE_DEG) * COARSE_DEG; deg < -reachDeg; deg += COARSE_DEG) angles.push(deg);
  const steps = Math.floor(reachDeg / fineDeg);
  for (let i = -steps; i <= steps; i++) if (i * fineDeg >= from && i * fineDeg <= to) angles.push(i * fineDeg);
  for (let deg = Math.floor(reachDeg / COARSE_DEG) * COARSE_DEG + COARSE_DEG; deg <= to; deg += COARSE_DEG) angles.push(deg);
  const at = greatCircle(beam, plane);
  return { plane, angleDeg: Float64Array.from(angles), directions: angles.map((deg) => at((deg * Math.PI) / 180)) };
}
