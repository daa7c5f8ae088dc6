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
  /** Room for one list while it is made. */
  readonly found: Int32Array;
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
  const measure = rangeSampler(query);
  return (targetRad, incidenceRad, azimuthRad) => {
    const theta = Math.min(THETA_BINS - 1, Math.floor(incidenceRad / thetaStep));
    // Responses and shares are the same at -phi and 180 - phi, whatever the fold of the edition.
    const inHalfTurn = azimuthRad - Math.PI * Math.floor(azimuthRad / Math.PI);
    const azimuth = Math.min(AZIMUTH_BINS - 1, Math.floor(Math.min(inHalfTurn, Math.PI - inHalfTurn) / azimuthStep));
    const key = theta * AZIMUTH_BINS + azimuth;
    const ranges = (bins[key] ??= measure([theta * thetaStep, (theta + 1) * thetaStep], [azimuth * azimuthStep, (azimuth + 1) * azimuthStep]));
    const turned = targetRad - 2 * Math.PI * Math.floor(targetRad / (2 * Math.PI));
    const target = Math.min(TARGET_BINS - 1, Math.floor(turned / targetStep));
    return (ranges.lists[target] ??= candidates(ranges, query.allowed, { middleRad: (target + 0.5) * targetStep, halfRad: targetStep / 2 }));
  };
}

function rangeSampler({ prepared, at, polarisation, allowed }: CandidateQuery): (theta: readonly [number, number], azimuth: readonly [number, number]) => PhaseRanges {
  const weigh = incidenceWeigher(prepared, polarisation);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  const found = new Int32Array(allowed.length);
  return ([thetaFrom, thetaTo], [azimuthFrom, azimuthTo]) => {
    const low = new Float64Array(allowed.length).fill(Infinity);
    const high = new Float64Array(allowed.length).fill(-Infinity);
    const first = new Float64Array(allowed.length);
    for (let sample = 0; sample < 9; sample++) {
      const theta = thetaFrom + ((sample % 3) / 2) * (thetaTo - thetaFrom);
      const azimuth = azimuthFrom + (Math.floor(sample / 3) / 2) * (azimuthTo - azimuthFrom);
      const weights = weigh(theta, azimuth);
      for (let i = 0; i < allowed.length; i++) {
        const { phaseRad } = coPolarResponse(at, allowed[i], weights, response);
        if (sample === 0) first[i] = phaseRad;
        const near = first[i] + wrapRad(phaseRad - first[i]);
        low[i] = Math.min(low[i], near);
        high[i] = Math.max(high[i], near);
      }
    }
    const middle = low.map((value, i) => (value + high[i]) / 2);
    const halfWidth = low.map((value, i) => ((high[i] - value) / 2) * (1 + 2 * MARGIN_SHARE) + MARGIN_RAD);
    return { middle, halfWidth, found, lists: new Array<Int32Array | undefined>(TARGET_BINS) };
  };
}

/** Two passes and no array but the result: a large panel meets hundreds of thousands of bins. */
function candidates({ middle, halfWidth, found }: PhaseRanges, allowed: Int32Array, target: { middleRad: number; halfRad: number }): Int32Array {
  let surely = Infinity;
  for (let i = 0; i < allowed.length; i++) surely = Math.min(surely, Math.abs(wrapRad(middle[i] - target.middleRad)) + halfWidth[i]);
  const limit = surely + 2 * target.halfRad;
  let count = 0;
  for (let i = 0; i < allowed.length; i++) {
    if (Math.abs(wrapRad(middle[i] - target.middleRad)) - halfWidth[i] <= limit) found[count++] = allowed[i];
  }
  return found.slice(0, count);
}
