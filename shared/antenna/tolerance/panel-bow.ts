import type { PanelLattice } from '../panel-lattice';

/** Shapes that a panel is off flat by, each as the height at every cell for a deviation of one. */
export interface PanelShapes {
  /** The same everywhere. */
  readonly lift: Float64Array;
  /** Linear, 1 at the outermost cell along x or y, measured from the middle of the cells. */
  readonly tiltX: Float64Array;
  readonly tiltY: Float64Array;
  /** 1 - rho^2 / rho_max^2, rho from the centre of the panel, rho_max that of the farthest cell. */
  readonly bow: Float64Array;
}

export function panelShapes({ xM, yM, count }: PanelLattice): PanelShapes {
  let farthestSquared = 0;
  for (let n = 0; n < count; n++) farthestSquared = Math.max(farthestSquared, xM[n] * xM[n] + yM[n] * yM[n]);
  return {
    lift: new Float64Array(count).fill(1),
    tiltX: centred(xM),
    tiltY: centred(yM),
    bow: xM.map((x, n) => (farthestSquared === 0 ? 1 : 1 - (x * x + yM[n] * yM[n]) / farthestSquared)),
  };
}

/** From -1 to 1 over a list; 0 where all are alike. */
function centred(values: Float64Array): Float64Array {
  let [least, most] = [Infinity, -Infinity];
  for (const value of values) [least, most] = [Math.min(least, value), Math.max(most, value)];
  const half = (most - least) / 2;
  return values.map((value) => (half > 0 ? (value - (most + least) / 2) / half : 0));
}

/**
 * Phase that a cell gains by standing `heightM` too near to the beam side: k z (cos incidence + cos theta) where the panel
 * reflects, k z (cos theta - cos incidence) where the wave comes from behind. First order in z, for directions near the beam.
 */
export function heightPhaseRad(wavenumber: number, operation: 'reflect' | 'transmit', cosIncidence: number, cosBeam: number): (heightM: number) => number {
  const perM = wavenumber * (operation === 'reflect' ? cosBeam + cosIncidence : cosBeam - cosIncidence);
  return (heightM) => perM * heightM;
}
