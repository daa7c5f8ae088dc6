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

/** Bins of incidence, and of azimuth over a quarter turn. */
const THETA_BINS = 96;
const AZIMUTH_BINS = 24;
/** Bins of target phase over a turn: two to every cell, so that few cells fall into one, within limits. */
const FEWEST_TARGET_BINS = 128;
const MOST_TARGET_BINS = 1024;
const TURN_RAD = 2 * Math.PI;
/** Room for what happens between the sampled angles of a bin: a fixed part, and a share of what was seen. */
const MARGIN_RAD = 1e-3;
const MARGIN_SHARE = 0.15;

/** Phases that the allowed cells take within one bin of angles, in the order of their middles round the turn. */
interface PhaseRanges {
  /** Place in `allowed`. */
  readonly order: Int32Array;
  /** In [0, 2 pi), rising. */
  readonly middle: Float64Array;
  readonly halfWidth: Float64Array;
  readonly largestHalfWidth: number;
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
  const { largestIncidenceRad, prepared, at } = query;
  const thetaStep = Math.max(1e-9, largestIncidenceRad / THETA_BINS);
  const azimuthBins = at.entryCount === 1 && prepared.azimuths.cosines.length === 1 ? 1 : AZIMUTH_BINS;
  const azimuthStep = Math.PI / 2 / azimuthBins;
  const targetBins = Math.min(MOST_TARGET_BINS, Math.max(FEWEST_TARGET_BINS, 2 * query.allowed.length));
  const targetStep = TURN_RAD / targetBins;
  const bins: (PhaseRanges | undefined)[] = new Array<PhaseRanges | undefined>(THETA_BINS * azimuthBins);
  const measure = rangeSampler(query, phaseSampler(query, thetaStep / 2, azimuthStep / 2), targetBins);
  const list = listMaker(query);
  return (targetRad, incidenceRad, azimuthRad) => {
    const theta = Math.min(THETA_BINS - 1, Math.floor(incidenceRad / thetaStep));
    // Responses and shares are the same at -phi and 180 - phi, whatever the fold of the edition.
    const inHalfTurn = azimuthRad - Math.PI * Math.floor(azimuthRad / Math.PI);
    const azimuth = Math.min(azimuthBins - 1, Math.floor(Math.min(inHalfTurn, Math.PI - inHalfTurn) / azimuthStep));
    const ranges = (bins[theta * azimuthBins + azimuth] ??= measure(theta, azimuth));
    const turned = targetRad - 2 * Math.PI * Math.floor(targetRad / (2 * Math.PI));
    const target = Math.min(targetBins - 1, Math.floor(turned / targetStep));
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
function rangeSampler({ allowed }: CandidateQuery, phasesAt: PhaseSampler, targetBins: number): (theta: number, azimuth: number) => PhaseRanges {
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
    return { ...inOrder(low, high), lists: new Array<Int32Array | undefined>(targetBins) };
  };
}

function inOrder(low: Float64Array, high: Float64Array): Omit<PhaseRanges, 'lists'> {
  const turned = low.map((value, i) => {
    const middle = (value + high[i]) / 2;
    return middle - TURN_RAD * Math.floor(middle / TURN_RAD);
  });
  const order = Int32Array.from(low.keys()).sort((a, b) => turned[a] - turned[b]);
  const halfWidth = Float64Array.from(order, (i) => ((high[i] - low[i]) / 2) * (1 + 2 * MARGIN_SHARE) + MARGIN_RAD);
  const largestHalfWidth = halfWidth.reduce((most, width) => Math.max(most, width), 0);
  return { order, middle: Float64Array.from(order, (i) => turned[i]), halfWidth, largestHalfWidth };
}

/** Lists longer than this are not worth remembering by their members. */
const LONGEST_SHARED = 4;

/**
 * Makes the list of one bin, walking from its middle to both sides as far as a cell can matter. A large panel meets
 * hundreds of thousands of bins but few different short lists, so equal ones are one array.
 */
function listMaker({ allowed }: CandidateQuery): (ranges: PhaseRanges, target: { middleRad: number; halfRad: number }) => Int32Array {
  const found = new Int32Array(allowed.length);
  const shared = new Map<number, Int32Array>();
  return (ranges, target) => {
    const { order, halfWidth } = ranges;
    let surely = Infinity;
    walkOutward(ranges, target.middleRad, (i, distance) => {
      surely = Math.min(surely, distance + halfWidth[i]);
      return distance <= surely;
    });
    const limit = surely + 2 * target.halfRad;
    let count = 0;
    let key = 0;
    walkOutward(ranges, target.middleRad, (i, distance) => {
      if (distance - halfWidth[i] <= limit) {
        found[count++] = allowed[order[i]];
        key = key * (allowed.length + 1) + order[i] + 1;
      }
      return distance - ranges.largestHalfWidth <= limit;
    });
    if (count > LONGEST_SHARED) return found.slice(0, count);
    const list = shared.get(key) ?? found.slice(0, count);
    shared.set(key, list);
    return list;
  };
}

/** Visits every place at most once, upward to half a turn away and then downward, each way as long as `visit` says. */
function walkOutward({ middle }: PhaseRanges, fromRad: number, visit: (i: number, distanceRad: number) => boolean): void {
  const count = middle.length;
  const above = firstNotBelow(middle, fromRad);
  for (let step = 0; step < count; step++) {
    const i = above + step < count ? above + step : above + step - count;
    const distance = middle[i] - fromRad + (middle[i] < fromRad ? TURN_RAD : 0);
    if (distance > Math.PI || !visit(i, distance)) break;
  }
  for (let step = 1; step <= count; step++) {
    const i = above - step >= 0 ? above - step : above - step + count;
    const distance = fromRad - middle[i] + (middle[i] < fromRad ? 0 : TURN_RAD);
    if (distance >= Math.PI || !visit(i, distance)) break;
  }
}

function firstNotBelow(rising: Float64Array, value: number): number {
  let low = 0;
  let high = rising.length;
  while (low < high) {
    const half = (low + high) >> 1;
    if (rising[half] < value) low = half + 1;
    else high = half;
  }
  return low;
}
