import { bracket } from '../../math/interpolate';
import { entryLogMagnitude, entryPhaseRad, incidenceWeigher, MOST_AZIMUTH_NODES, MOST_THETA_NODES, weightedSum, windowedWeigher } from '../cell-response';
import { permittedNodes, type PermittedNodes } from '../excluded-nodes';
import type { PreparedEdition } from '../prepare-edition';
import { crossTermsAt, type CrossTerms } from './cross-terms';

/** A 2x2 response; reused between calls. */
export interface MatrixSample {
  s11Re: number;
  s11Im: number;
  s12Re: number;
  s12Im: number;
  s21Re: number;
  s21Im: number;
  s22Re: number;
  s22Im: number;
}

export function newMatrixSample(): MatrixSample {
  return { s11Re: 0, s11Im: 0, s12Re: 0, s12Im: 0, s21Re: 0, s21Im: 0, s22Re: 0, s22Im: 0 };
}

/** How the angle of incidence is interpolated: one polynomial in sin^2 theta, or piecewise in theta. */
export type ThetaRule = 'poly' | 'linear';

/** Responses of an edition's cells at one frequency: set the angle, then ask for cells. */
export interface MatrixSampler {
  setAngle(incidenceRad: number, azimuthRad: number): void;
  sample(cell: number, out: MatrixSample): MatrixSample;
}

/** Every angle of an edition at a frequency, excluded ones too. */
export function allNodes(prepared: PreparedEdition, frequencyHz: number): PermittedNodes {
  return permittedNodes(prepared, { isEmpty: true, mark: () => false }, prepared.atFrequency(frequencyHz));
}

const keptCrossTerms = new WeakMap<object, CrossTerms>();

/**
 * The whole 2x2 response between the points given. Frequency first. Then S11 and S22 as in the scalar model: ln |S| and unwrapped
 * phase by Lagrange in sin^2 theta and in cos 4 phi (or cos 2 phi). Cross terms relative to the half sum of the two phases, in sin^2
 * theta and, being odd about the planes of symmetry of the cell, as sin 4 phi (or sin 2 phi) times an even function.
 */
export function matrixSampler(prepared: PreparedEdition, permitted: PermittedNodes, thetaRule: ThetaRule = 'poly'): MatrixSampler {
  const { at } = permitted;
  if (at.entryCount !== 2) throw new RangeError('a description of one response holds no matrix');
  const cross = keptCrossTerms.get(at) ?? crossTermsAt(prepared, permitted);
  keptCrossTerms.set(at, cross);
  const weigh = incidenceWeigher(prepared, 'x');
  const thetaWeights = thetaWeigher(prepared, thetaRule);
  const crossAzimuthWeights = azimuthWeigher(prepared, cross);
  const azimuthCount = prepared.azimuths.cosines.length;
  const crossNodes = new Float64Array(cross.nodeCount);
  let nodes: Float64Array = new Float64Array(0);
  return {
    setAngle: (incidenceRad, azimuthRad) => {
      nodes = weigh(incidenceRad, azimuthRad).nodes;
      const alongTheta = thetaWeights(incidenceRad);
      if (thetaRule === 'linear') spreadWeights(nodes, alongTheta, azimuthCount);
      const alongAzimuth = crossAzimuthWeights(azimuthRad);
      for (let t = 0; t < alongTheta.length; t++) {
        for (let a = 0; a < alongAzimuth.length; a++) crossNodes[t * alongAzimuth.length + a] = alongTheta[t] * alongAzimuth[a];
      }
    },
    sample: (cell, out) => {
      const phase1 = entryPhaseRad(at, cell, 0, nodes);
      const phase2 = entryPhaseRad(at, cell, 1, nodes);
      const size1 = Math.exp(entryLogMagnitude(at, cell, 0, nodes));
      const size2 = Math.exp(entryLogMagnitude(at, cell, 1, nodes));
      out.s11Re = size1 * Math.cos(phase1);
      out.s11Im = size1 * Math.sin(phase1);
      out.s22Re = size2 * Math.cos(phase2);
      out.s22Im = size2 * Math.sin(phase2);
      const [c, s] = [Math.cos((phase1 + phase2) / 2), Math.sin((phase1 + phase2) / 2)];
      const from = cell * cross.nodeCount;
      const x12Re = weightedSum(cross.x12Re, from, crossNodes);
      const x12Im = weightedSum(cross.x12Im, from, crossNodes);
      const x21Re = weightedSum(cross.x21Re, from, crossNodes);
      const x21Im = weightedSum(cross.x21Im, from, crossNodes);
      out.s12Re = x12Re * c - x12Im * s;
      out.s12Im = x12Re * s + x12Im * c;
      out.s21Re = x21Re * c - x21Im * s;
      out.s21Im = x21Re * s + x21Im * c;
      return out;
    },
  };
}

function thetaWeigher({ sineSquaredNodes, smallestThetaRad, largestThetaRad, edition }: PreparedEdition, rule: ThetaRule): (incidenceRad: number) => Float64Array {
  const weights = new Float64Array(sineSquaredNodes.length);
  const weigh = windowedWeigher(sineSquaredNodes, MOST_THETA_NODES);
  return (incidenceRad) => {
    // Beyond the angles given the nearest one stands in, as for the co-polar response.
    const theta = Math.min(largestThetaRad, Math.max(smallestThetaRad, incidenceRad));
    if (rule === 'poly') {
      weigh(Math.sin(theta) ** 2, weights);
      return weights;
    }
    weights.fill(0);
    const { lower, fraction } = bracket(edition.responses.thetasRad, theta);
    weights[lower] = 1 - fraction;
    if (fraction > 0) weights[lower + 1] = fraction;
    return weights;
  };
}

/** Rewrites the weights of the nodes [theta][azimuth] for other weights along theta; those along azimuth are their sums. */
function spreadWeights(nodes: Float64Array, alongTheta: Float64Array, azimuthCount: number): void {
  for (let a = 0; a < azimuthCount; a++) {
    let alongAzimuth = 0;
    for (let t = 0; t < alongTheta.length; t++) alongAzimuth += nodes[t * azimuthCount + a];
    for (let t = 0; t < alongTheta.length; t++) nodes[t * azimuthCount + a] = alongTheta[t] * alongAzimuth;
  }
}

/** Weights of the azimuth nodes in a cross term, its odd factor sin(fold phi) included between TE and TM. */
function azimuthWeigher({ azimuths, ports }: PreparedEdition, cross: CrossTerms): (azimuthRad: number) => Float64Array {
  const cosines = Float64Array.from(cross.azimuths, (a) => azimuths.cosines[a]);
  const weights = new Float64Array(cosines.length);
  if (cosines.length === 0) return () => weights;
  const [lowest, highest] = [cosines[0], cosines[cosines.length - 1]];
  const weigh = windowedWeigher(cosines, MOST_AZIMUTH_NODES);
  return (azimuthRad) => {
    const cosine = Math.min(highest, Math.max(lowest, Math.cos(azimuths.fold * azimuthRad)));
    weigh(cosine, weights);
    if (ports.kind === 'te-and-tm') {
      const odd = Math.sin(azimuths.fold * azimuthRad);
      for (let a = 0; a < weights.length; a++) weights[a] *= odd;
    }
    return weights;
  };
}
