import type { Polarisation } from '../model/design-document';
import { lagrangeWeigher } from '../math/interpolate';
import { wrapRad } from '../units/angles';
import type { EditionAtFrequency } from './edition-at-frequency';
import type { PreparedEdition } from './prepare-edition';

/** Interpolation weights of one angle of incidence, for all cells of an edition. Reused between positions. */
export interface IncidenceWeights {
  /** Weight of each node, [theta][azimuth]. */
  readonly nodes: Float64Array;
  /** Share of each entry in the co-polar response: TE and TM, or the ports x and y; 1 where there is one entry. */
  readonly shares: Float64Array;
}

/** Polynomials through more points than this swing between them; nearer nodes are taken. */
export const MOST_THETA_NODES = 5;
export const MOST_AZIMUTH_NODES = 3;

/**
 * Gives the weights of an angle of incidence: Lagrange's polynomial in sin^2 theta, and in cos 4 phi (or cos 2 phi) of
 * azimuth. Beyond the angles given the nearest one stands in; whoever asks counts those.
 *
 * The co-polar response of a TE and TM description is S_TM cos^2 + S_TE sin^2 of the angle between the linear E and
 * the plane of incidence: cos^2 phi for x, sin^2 phi for y. For circular polarisation both shares are one half, which is the
 * part of either sense that an unrotated cell turns into the beam.
 */
export function incidenceWeigher(prepared: PreparedEdition, polarisation: Polarisation): (incidenceRad: number, azimuthRad: number) => IncidenceWeights {
  const { sineSquaredNodes, smallestThetaRad, largestThetaRad, azimuths } = prepared;
  const weighTheta = windowedWeigher(sineSquaredNodes, MOST_THETA_NODES);
  const weighAzimuth = windowedWeigher(azimuths.cosines, MOST_AZIMUTH_NODES);
  const thetaWeights = new Float64Array(sineSquaredNodes.length);
  const azimuthWeights = new Float64Array(azimuths.cosines.length);
  const nodes = new Float64Array(thetaWeights.length * azimuthWeights.length);
  const shares = new Float64Array(prepared.ports.entries.length);
  const weights = { nodes, shares };
  const lowest = azimuths.cosines[0];
  const highest = azimuths.cosines[azimuths.cosines.length - 1];
  return (incidenceRad, azimuthRad) => {
    const sine = Math.sin(Math.min(largestThetaRad, Math.max(smallestThetaRad, incidenceRad)));
    weighTheta(sine * sine, thetaWeights);
    const cosine = Math.min(highest, Math.max(lowest, Math.cos(azimuths.fold * azimuthRad)));
    weighAzimuth(cosine, azimuthWeights);
    for (let t = 0; t < thetaWeights.length; t++) {
      for (let a = 0; a < azimuthWeights.length; a++) nodes[t * azimuthWeights.length + a] = thetaWeights[t] * azimuthWeights[a];
    }
    fillShares(shares, prepared.ports.kind, polarisation, azimuthRad);
    return weights;
  };
}

function fillShares(shares: Float64Array, kind: PreparedEdition['ports']['kind'], polarisation: Polarisation, azimuthRad: number): void {
  if (kind === 'one') {
    shares[0] = 1;
    return;
  }
  const linear = polarisation === 'x' || polarisation === 'y';
  if (!linear) {
    shares.fill(0.5);
    return;
  }
  const alongX = polarisation === 'x';
  if (kind === 'x-and-y') {
    shares[0] = alongX ? 1 : 0;
    shares[1] = alongX ? 0 : 1;
    return;
  }
  const cosine = Math.cos(azimuthRad);
  const inPlane = alongX ? cosine * cosine : 1 - cosine * cosine;
  shares[0] = 1 - inPlane;
  shares[1] = inPlane;
}

/** Gives the Lagrange weights through the `most` nodes about `x`, zero for the others. */
export function windowedWeigher(nodes: Float64Array, most: number): (x: number, weights: Float64Array) => void {
  if (nodes.length <= most) {
    const weigh = lagrangeWeigher(nodes);
    return (x, weights) => weigh(x, weights);
  }
  const weighers = Array.from({ length: nodes.length - most + 1 }, (_, first) => lagrangeWeigher(nodes.subarray(first, first + most)));
  return (x, weights) => {
    let first = 0;
    while (first + most < nodes.length && Math.abs(nodes[first + most] - x) < Math.abs(nodes[first] - x)) first += 1;
    weights.fill(0);
    weighers[first](x, weights, first);
  };
}

/** Interpolated phase of one entry of one cell, rad, on the edition's own branch. */
export function entryPhaseRad(at: EditionAtFrequency, cell: number, entry: number, nodes: Float64Array): number {
  return weightedSum(at.phaseRad, (cell * at.entryCount + entry) * at.nodeCount, nodes);
}

/** Interpolated natural logarithm of the magnitude of one entry of one cell. */
export function entryLogMagnitude(at: EditionAtFrequency, cell: number, entry: number, nodes: Float64Array): number {
  return weightedSum(at.logMagnitude, (cell * at.entryCount + entry) * at.nodeCount, nodes);
}

/** Three running sums, so that an addition need not wait for the one before. */
export function weightedSum(values: Float64Array, from: number, weights: Float64Array): number {
  const { length } = weights;
  const even = length - (length % 3);
  let a = 0;
  let b = 0;
  let c = 0;
  for (let i = 0; i < even; i += 3) {
    a += weights[i] * values[from + i];
    b += weights[i + 1] * values[from + i + 1];
    c += weights[i + 2] * values[from + i + 2];
  }
  for (let i = even; i < length; i++) a += weights[i] * values[from + i];
  return a + b + c;
}

/** A complex response in polar form. */
export interface PolarResponse {
  magnitude: number;
  phaseRad: number;
}

/** Co-polar response of a cell at weighed angles: the shares of its entries, added as complex numbers. Written into `out`. */
export function coPolarResponse(at: EditionAtFrequency, cell: number, { nodes, shares }: IncidenceWeights, out: PolarResponse): PolarResponse {
  const alone = shares.length === 1 || shares[1] === 0;
  const first = alone || shares[0] !== 0 ? 0 : 1;
  const phase = entryPhaseRad(at, cell, first, nodes);
  const logMagnitude = entryLogMagnitude(at, cell, first, nodes);
  const size = shares[first] * Math.exp(logMagnitude);
  if (alone || first === 1) {
    out.magnitude = size;
    out.phaseRad = shares.length === 1 ? phase : wrapRad(phase);
    return out;
  }
  // The second entry relative to the first: one turn of the plane instead of two.
  const ratio = (shares[1] / shares[0]) * Math.exp(entryLogMagnitude(at, cell, 1, nodes) - logMagnitude);
  const turn = entryPhaseRad(at, cell, 1, nodes) - phase;
  const re = 1 + ratio * Math.cos(turn);
  const im = ratio * Math.sin(turn);
  out.magnitude = size * Math.sqrt(re * re + im * im);
  out.phaseRad = wrapRad(phase + Math.atan2(im, re));
  return out;
}
