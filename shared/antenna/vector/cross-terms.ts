import { neighbours } from '../edition-at-frequency';
import type { PermittedNodes } from '../excluded-nodes';
import type { PreparedEdition } from '../prepare-edition';

/** Entries of a response: S11, S21, S12, S22. */
const S21 = 1;
const S12 = 2;
/** Nearer to a plane of symmetry than this (sine of fold phi) a cross term is 0 by symmetry and tells nothing. */
const ON_SYMMETRY = 0.1;

/**
 * Cross terms of all cells at one frequency, relative to the half sum of the phases of S11 and S22: X = S12 exp(-j(phi11 + phi22)/2).
 * A lossless reciprocal cell has a purely imaginary X, so X may be interpolated and the matrix stays passive; S12 itself,
 * interpolated, gave singular values up to 1.05. Node t count + a of a cell stands at cell nodes + node.
 */
export interface CrossTerms {
  /** Azimuth nodes that tell about cross terms, as places in the edition's azimuth nodes, with the symmetry taken out: X / sin(fold phi). */
  readonly azimuths: readonly number[];
  readonly nodeCount: number;
  readonly x12Re: Float64Array;
  readonly x12Im: Float64Array;
  readonly x21Re: Float64Array;
  readonly x21Im: Float64Array;
}

/** What the data of an edition say of cross terms: given, zero throughout, or no azimuth between the planes of symmetry. */
export type CrossTermsGiven = 'given' | 'zero' | 'not-described';

/** Whether a description holds cross terms at all; one response for all polarisations holds none. */
export function crossTermsGiven({ ports, edition, azimuths, largestThetaRad }: PreparedEdition): CrossTermsGiven {
  if (ports.kind === 'one') return 'not-described';
  const { values } = edition.responses;
  for (let at = 0; at < values.length; at += 8) {
    if (values[at + 2 * S12] !== 0 || values[at + 2 * S12 + 1] !== 0 || values[at + 2 * S21] !== 0 || values[at + 2 * S21 + 1] !== 0) return 'given';
  }
  // Between TE and TM the cross term vanishes by symmetry at normal incidence and in the planes of symmetry only.
  const silent = ports.kind === 'te-and-tm' && largestThetaRad > 0 && tellingAzimuths(edition.responses.phisRad, azimuths).length === 0;
  return silent ? 'not-described' : 'zero';
}

/** Sine of fold phi at each azimuth node of the edition. */
function symmetrySines(phisRad: Float64Array, { fold, indices }: PreparedEdition['azimuths']): number[] {
  return Array.from(indices, (index) => Math.sin(fold * phisRad[index]));
}

function tellingAzimuths(phisRad: Float64Array, azimuths: PreparedEdition['azimuths']): number[] {
  return symmetrySines(phisRad, azimuths).flatMap((sine, a) => (Math.abs(sine) > ON_SYMMETRY ? [a] : []));
}

/**
 * Cross terms at a frequency: linear between the points given, as complex numbers, then turned by the half sum of the phases. At an
 * excluded angle the nearest one permitted stands in, so that no number of such a region is read.
 */
export function crossTermsAt(prepared: PreparedEdition, nodes: PermittedNodes): CrossTerms {
  const { at } = nodes;
  const { responses } = prepared.edition;
  const { azimuths, ports } = prepared;
  const sines = symmetrySines(responses.phisRad, azimuths);
  const odd = ports.kind === 'te-and-tm';
  const telling = odd ? tellingAzimuths(responses.phisRad, azimuths) : sines.map((_, a) => a);
  const thetaCount = responses.thetasRad.length;
  const nodeCount = thetaCount * telling.length;
  const length = responses.cellCount * nodeCount;
  const table = { x12Re: new Float64Array(length), x12Im: new Float64Array(length), x21Re: new Float64Array(length), x21Im: new Float64Array(length) };
  const azimuthCount = azimuths.indices.length;
  for (let cell = 0; cell < responses.cellCount; cell++) {
    for (let theta = 0; theta < thetaCount; theta++) {
      telling.forEach((a, place) => {
        const told = permittedTheta(responses.thetasRad, theta, { from: nodes.lowestRad[cell * azimuthCount + a], to: nodes.highestRad[cell * azimuthCount + a] });
        const series = (cell * thetaCount + told) * responses.phisRad.length + azimuths.indices[a];
        const points = neighbours(responses, series, at.frequencyHz);
        if (!points) return;
        const first = cell * at.entryCount * at.nodeCount + told * azimuthCount + a;
        const halfSum = (at.phaseRad[first] + at.phaseRad[first + at.nodeCount]) / 2;
        const scale = odd ? 1 / sines[a] : 1;
        const to = cell * nodeCount + theta * telling.length + place;
        [table.x12Re[to], table.x12Im[to]] = relativeTerm(responses.values, { ...points, entry: S12 }, { halfSum, scale });
        [table.x21Re[to], table.x21Im[to]] = relativeTerm(responses.values, { ...points, entry: S21 }, { halfSum, scale });
      });
    }
  }
  return { azimuths: telling, nodeCount, ...table };
}

/** The node nearest to one whose angle is permitted; the node itself where none is. */
function permittedTheta(thetasRad: Float64Array, theta: number, { from, to }: { from: number; to: number }): number {
  if (to < from) return theta;
  let nearest = theta;
  while (thetasRad[nearest] > to && nearest > 0) nearest -= 1;
  while (thetasRad[nearest] < from && nearest < thetasRad.length - 1) nearest += 1;
  return nearest;
}

interface PointPair {
  readonly below: number;
  readonly above: number;
  readonly fraction: number;
  readonly entry: number;
}

function relativeTerm(values: Float64Array, { below, above, fraction, entry }: PointPair, { halfSum, scale }: { halfSum: number; scale: number }): [number, number] {
  const [from, to] = [below * 8 + 2 * entry, above * 8 + 2 * entry];
  const re = values[from] + fraction * (values[to] - values[from]);
  const im = values[from + 1] + fraction * (values[to + 1] - values[from + 1]);
  const [c, s] = [Math.cos(halfSum) * scale, Math.sin(halfSum) * scale];
  return [re * c + im * s, im * c - re * s];
}
