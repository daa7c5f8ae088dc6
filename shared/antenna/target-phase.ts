import type { ApertureLaw } from './aperture-law';
import type { CellIllumination } from './illumination';
import type { PanelLattice } from './panel-lattice';

/**
 * Phase that each cell should add: the wanted aperture phase less the incident one, which is -k path. For a horn and
 * one beam this is k (R - r.b); for a plane wave from i, -k (r.i + r.b). Not wrapped, reference phase not added.
 */
export function targetPhasesRad(law: ApertureLaw, lattice: PanelLattice, light: CellIllumination, wavenumber: number): Float64Array {
  const target = new Float64Array(lattice.count);
  for (let n = 0; n < target.length; n++) {
    target[n] = law.phaseRad(wavenumber, lattice.xM[n], lattice.yM[n]) + wavenumber * light.pathM[n];
  }
  return target;
}

export interface OutgoingQuery {
  readonly law: ApertureLaw;
  readonly lattice: PanelLattice;
  readonly light: CellIllumination;
  /** At the design frequency, where the phases are made. */
  readonly designWavenumber: number;
  /** Where the panel is used. */
  readonly wavenumber: number;
}

/**
 * Cells whose wanted wave does not travel away: by the generalised law the phase frozen at the design frequency sends
 * the wave of frequency f to in + (f0/f)(wanted - in), and beyond 1 that is evanescent.
 */
export function evanescentCellCount(query: OutgoingQuery): number {
  const { law, lattice, light, designWavenumber, wavenumber } = query;
  const ratio = designWavenumber / wavenumber;
  const wanted = { u: 0, v: 0 };
  let count = 0;
  for (let n = 0; n < lattice.count; n++) {
    law.tangential(designWavenumber, lattice.xM[n], lattice.yM[n], wanted);
    const sine = light.tangentialIndex ?? Math.sin(light.incidenceRad[n]);
    const inU = sine * Math.cos(light.azimuthRad[n]);
    const inV = sine * Math.sin(light.azimuthRad[n]);
    const u = inU + ratio * (wanted.u - inU);
    const v = inV + ratio * (wanted.v - inV);
    if (u * u + v * v > 1 + 1e-12) count += 1;
  }
  return count;
}
