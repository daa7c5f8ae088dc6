import { powerRatioToDb } from '../../units/decibels';
import type { Direction } from '../../waves/conventions';
import { freeSpaceLossDb } from './free-space';

/** Cells of a panel that is lit from one antenna and seen from another. */
export interface RelayCells {
  readonly xM: ArrayLike<number>;
  readonly yM: ArrayLike<number>;
  /** Response of each cell. */
  readonly magnitude: ArrayLike<number>;
  readonly phaseRad: ArrayLike<number>;
  readonly cellAreaM2: number;
}

export interface RelayPath {
  /** Towards the source and towards the receiver, from the middle of the panel. */
  readonly source: Direction;
  readonly receiver: Direction;
  /** Infinite for plane waves. */
  readonly incomingDistanceM: number;
  readonly outgoingDistanceM: number;
  readonly wavenumber: number;
}

/** Largest cross-section of a flat plate: 4 pi A^2 cos theta_i cos theta_s / lambda^2, m^2. Physical optics; check rcs-01. */
export function plateCrossSectionM2(areaM2: number, wavelengthM: number, cosIncidence = 1, cosScatter = 1): number {
  return (4 * Math.PI * areaM2 * areaM2 * cosIncidence * cosScatter) / (wavelengthM * wavelengthM);
}

/**
 * Bistatic radar cross-section of a panel,
 *   sigma = (4 pi / lambda^2) A_c^2 |sum Gamma_n (d1/r1n)(d2/r2n) e^{-jk(r1n - d1 + r2n - d2)}|^2 cos theta_i cos theta_s,
 * with the true distances r1n, r2n of each cell; for infinite distances the exponent is +jk r_n.(i + s).
 * Valid for cells small against both distances and a scalar response; both antennas in the far field of a cell, not
 * necessarily of the panel. Check link-21.
 */
export function bistaticCrossSectionM2(cells: RelayCells, path: RelayPath): number {
  const { source, receiver, wavenumber } = path;
  const incoming = excessOf(source, path.incomingDistanceM);
  const outgoing = excessOf(receiver, path.outgoingDistanceM);
  let [re, im] = [0, 0];
  for (let n = 0; n < cells.xM.length; n++) {
    const [first, second] = [incoming(cells.xM[n], cells.yM[n]), outgoing(cells.xM[n], cells.yM[n])];
    const amplitude = cells.magnitude[n] * first.amplitude * second.amplitude;
    const phase = cells.phaseRad[n] - wavenumber * (first.pathM + second.pathM);
    re += amplitude * Math.cos(phase);
    im += amplitude * Math.sin(phase);
  }
  const wavelengthM = (2 * Math.PI) / wavenumber;
  return plateCrossSectionM2(cells.cellAreaM2, wavelengthM, source.w, receiver.w) * (re * re + im * im);
}

/** Path to a far point beyond that from the middle of the panel, and d/r. */
function excessOf({ u, v, w }: Direction, distanceM: number): (xM: number, yM: number) => { pathM: number; amplitude: number } {
  if (distanceM === Infinity) return (xM, yM) => ({ pathM: -(xM * u + yM * v), amplitude: 1 });
  return (xM, yM) => {
    const along = xM * u + yM * v;
    const squared = xM * xM + yM * yM;
    const r = Math.hypot(distanceM * u - xM, distanceM * v - yM, distanceM * w);
    // r - d without losing digits over long distances.
    return { pathM: (squared - 2 * distanceM * along) / (r + distanceM), amplitude: distanceM / r };
  };
}

export interface RelayBudget {
  readonly powerW: number;
  readonly sourceGainDbi: number;
  readonly farGainDbi: number;
  readonly lossDb: number;
  readonly frequencyHz: number;
  readonly incomingDistanceM: number;
  readonly outgoingDistanceM: number;
  readonly crossSectionM2: number;
}

/**
 * Received power over a passive panel, dBm: P_t G_t G_r lambda^2 sigma / [(4 pi)^3 d1^2 d2^2], written as two hops of
 * free-space loss with the panel's 4 pi sigma / lambda^2 between them. Check link-21.
 */
export function relayedPowerDbm(budget: RelayBudget, wavelengthM: number): number {
  const { frequencyHz, incomingDistanceM, outgoingDistanceM } = budget;
  const panelDb = powerRatioToDb((4 * Math.PI * budget.crossSectionM2) / (wavelengthM * wavelengthM));
  const hopsDb = freeSpaceLossDb(frequencyHz, incomingDistanceM) + freeSpaceLossDb(frequencyHz, outgoingDistanceM);
  return powerRatioToDb(budget.powerW * 1000) + budget.sourceGainDbi + budget.farGainDbi + panelDb - hopsDb - budget.lossDb;
}
