import { wrapRad } from '../units/angles';
import { coPolarResponse, incidenceWeigher, type PolarResponse } from './cell-response';
import type { EditionAtFrequency } from './edition-at-frequency';
import type { PreparedEdition } from './prepare-edition';
import type { Polarisation } from '../model/design-document';

export interface CandidateQuery {
  readonly prepared: PreparedEdition;
  readonly at: EditionAtFrequency;
  readonly polarisation: Polarisation;
  readonly allowed: Int32Array;
  readonly largestIncidenceRad: number;
}

/** Bins of incidence, of azimuth over a quarter turn, and of target phase over a turn. */
const THETA_BINS = 96;
const AZIMUTH_BINS = 24;
const TARGET_BINS = 128;
/** Room for what happens between the sampled angles of a bin: a fixed part, and a share of what was seen. */
const MARGIN_RAD = 1e-3;
const MARGIN_SHARE = 0.15;

/** Phases that each allowed cell takes within one bin of angles. */
interface PhaseRanges {
  readonly middle: Float64Array;
  readonly halfWidth: Float64Array;
  readonly lists: (Int32Array | undefined)[];
}

/**
 * For panels of very many cells: the few cells of an edition that can be nearest in phase for a bin of incidence, azimuth
 * and target. Within a bin each cell's phase is taken from nine sampled angles with a margin; a cell whose least
 * possible error exceeds the largest possible error of another cannot be the choice. What is left is chosen from exactly,
 * so the result is that of trying every cell, up to responses that leave their range by more than the margin (0.06
 * degrees and 15 % of the variation over the bin), which would need a response that bends within half a degree.
 */
export function candidateBins(query: CandidateQuery): (targetRad: number, incidenceRad: number, azimuthRad: number) => Int32Array {
  const { largestIncidenceRad } = query;
  const thetaStep = Math.max(1e-9, largestIncidenceRad / THETA_BINS);
  const azimuthStep = Math.PI / 2 / AZIMUTH_BINS;
  const targetStep = (2 * Math.PI) / TARGET_BINS;
  const bins: (PhaseRanges | undefined)[] = new Array<PhaseRanges | undefined>(THETA_BINS * AZIMUTH_BINS);
  const measure = rangeSampler(query, phaseSampler(query, thetaStep / 2, azimuthStep / 2));
  const list = listMaker(query);
  return (targetRad, incidenceRad, azimuthRad) => {
    const theta = Math.min(THETA_BINS - 1, Math.floor(incidenceRad / thetaStep));
    // Responses and shares are the same at -phi and 180 - phi, whatever the fold of the edition.
    const inHalfTurn = azimuthRad - Math.PI * Math.floor(azimuthRad / Math.PI);
    const azimuth = Math.min(AZIMUTH_BINS - 1, Math.floor(Math.min(inHalfTurn, Math.PI - inHalfTurn) / azimuthStep));
    const ranges = (bins[theta * AZIMUTH_BINS + azimuth] ??= measure(theta, azimuth));
    const turned = targetRad - 2 * Math.PI * Math.floor(targetRad / (2 * Math.PI));
    const target = Math.min(TARGET_BINS - 1, Math.floor(turned / targetStep));
    return (ranges.lists[target] ??= list(ranges, { middleRad: (target + 0.5) * targetStep, halfRad: targetStep / 2 }));
  };
}

/** Phases of all allowed cells at one pair of angles, given in half bins: neighbouring bins share those on their edges. */
type PhaseSampler = (halfTheta: number, halfAzimuth: number) => Float64Array;

function phaseSampler({ prepared, at, polarisation, allowed }: CandidateQuery, thetaStep: number, azimuthStep: number): PhaseSampler {
  const weigh = incidenceWeigher(prepared, polarisation);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  const known = new Map<number, Float64Array>();
  return (halfTheta, halfAzimuth) => {
    const key = halfTheta * (2 * AZIMUTH_BINS + 1) + halfAzimuth;
    const kept = known.get(key);
    if (kept) return kept;
    const weights = weigh(halfTheta * thetaStep, halfAzimuth * azimuthStep);
    const phases = new Float64Array(allowed.length);
    for (let i = 0; i < phases.length; i++) phases[i] = coPolarResponse(at, allowed[i], weights, response).phaseRad;
    known.set(key, phases);
    return phases;
  };
}

/** Takes nine samples of a bin: its corners, the middles of its edges and its own middle. */
function rangeSampler({ allowed }: CandidateQuery, phasesAt: PhaseSampler): (theta: number, azimuth: number) => PhaseRanges {
  return (theta, azimuth) => {
    const low = new Float64Array(allowed.length).fill(Infinity);
    const high = new Float64Array(allowed.length).fill(-Infinity);
    const first = phasesAt(2 * theta, 2 * azimuth);
    for (let sample = 0; sample < 9; sample++) {
      const phases = phasesAt(2 * theta + (sample % 3), 2 * azimuth + Math.floor(sample / 3));
      for (let i = 0; i < phases.length; i++) {
        const near = first[i] + wrapRad(phases[i] - first[i]);
        low[i] = Math.min(low[i], near);
        high[i] = Math.max(high[i], near);
      }
    }
    const middle = low.map((value, i) => (value + high[i]) / 2);
    const halfWidth = low.map((value, i) => ((high[i] - value) / 2) * (1 + 2 * MARGIN_SHARE) + MARGIN_RAD);
    return { middle, halfWidth, lists: new Array<Int32Array | undefined>(TARGET_BINS) };
  };
}

/** Lists longer than this are not worth remembering by their members. */
const LONGEST_SHARED = 4;

/**
 * Makes the list of one bin. A large panel meets hundreds of thousands of bins but few different short lists, so equal ones
 * are one array.
 */
function listMaker({ allowed }: CandidateQuery): (ranges: PhaseRanges, target: { middleRad: number; halfRad: number }) => Int32Array {
  const found = new Int32Array(allowed.length);
  const shared = new Map<number, Int32Array>();
  return ({ middle, halfWidth }, target) => {
    let surely = Infinity;
    for (let i = 0; i < allowed.length; i++) surely = Math.min(surely, Math.abs(wrapRad(middle[i] - target.middleRad)) + halfWidth[i]);
    const limit = surely + 2 * target.halfRad;
    let count = 0;
    let key = 0;
    for (let i = 0; i < allowed.length; i++) {
      if (Math.abs(wrapRad(middle[i] - target.middleRad)) - halfWidth[i] > limit) continue;
      found[count++] = allowed[i];
      key = key * (allowed.length + 1) + i + 1;
    }
    if (count > LONGEST_SHARED) return found.slice(0, count);
    const list = shared.get(key) ?? found.slice(0, count);
    shared.set(key, list);
    return list;
  };
}
