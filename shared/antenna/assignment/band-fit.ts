import { wrapRad } from '../../units/angles';
import { coPolarResponse, incidenceWeigher, type PolarResponse } from '../cell-response';
import type { EditionAtFrequency } from '../edition-at-frequency';
import type { CellIllumination } from '../illumination';
import type { PreparedEdition } from '../prepare-edition';
import type { Polarisation } from '../../model/design-document';

/** What is needed at one frequency: the phases of the same law there, without a common one. */
export interface BandTarget {
  readonly frequencyHz: number;
  readonly targetRad: Float64Array;
}

export interface BandFitSite {
  readonly edition: PreparedEdition;
  readonly polarisation: Polarisation;
  readonly light: Pick<CellIllumination, 'amplitude' | 'incidenceRad' | 'azimuthRad'>;
  /** Candidates at an angle of incidence. */
  allowedAt(incidenceRad: number, azimuthRad: number): Int32Array;
  /** The design frequency first: its common phase is the reference phase and stays; the others have their own. */
  readonly band: readonly BandTarget[];
}

export interface BandFit {
  readonly cellIndex: Int32Array;
  /** Common phase of each frequency. */
  readonly offsetRad: Float64Array;
  /** Root mean square of the phase errors left at each frequency, common phase taken off. */
  readonly errorRmsRad: Float64Array;
  readonly rounds: number;
}

/** Rounds of choosing cells and common phases in turn; the sum of squared errors cannot rise, and a few rounds settle it. */
const MOST_ROUNDS = 8;
const SAME_ERROR = 1e-12;

/**
 * Cells that come nearest over several frequencies: least sum over frequencies of |Gamma_f - exp(j(target_f + c_f))|^2, each
 * cell weighted by the power that falls on it, with a
 * common phase c_f free at each frequency but the first. A common phase costs nothing, and with it any slope of the common
 * phase over frequency, a delay of the whole panel, is free too.
 */
export function bandFit(site: BandFitSite, referenceRad: number, mostRounds = MOST_ROUNDS): BandFit {
  const { band, edition } = site;
  const ats = band.map(({ frequencyHz }) => edition.atFrequency(frequencyHz));
  const offsetRad = new Float64Array(band.length);
  offsetRad[0] = referenceRad;
  const count = band[0].targetRad.length;
  const cellIndex = new Int32Array(count).fill(-1);
  let rounds = 0;
  // The first round judges the design frequency alone: the others have no common phase yet.
  for (let judged = 1; rounds < mostRounds; judged = band.length) {
    const changed = chooseCells(site, ats.slice(0, judged), offsetRad, cellIndex);
    rounds += 1;
    if (changed === 0) break;
    fitOffsets(site, ats, cellIndex, offsetRad);
  }
  return { cellIndex, offsetRad, errorRmsRad: errorsLeft(site, ats, cellIndex, offsetRad), rounds };
}

/** Brings every position to its best cell under the present common phases; gives how many changed. */
function chooseCells(site: BandFitSite, ats: readonly EditionAtFrequency[], offsetRad: Float64Array, cellIndex: Int32Array): number {
  const { light, band } = site;
  const weigh = incidenceWeigher(site.edition, site.polarisation);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  let changed = 0;
  for (let n = 0; n < cellIndex.length; n++) {
    const weights = weigh(light.incidenceRad[n], light.azimuthRad[n]);
    const errorOf = (k: number): number =>
      ats.reduce((sum, at, f) => {
        if (at.usable[k] !== 1) return Infinity;
        const { magnitude, phaseRad } = coPolarResponse(at, k, weights, response);
        return sum + 1 + magnitude * magnitude - 2 * magnitude * Math.cos(phaseRad - band[f].targetRad[n] - offsetRad[f]);
      }, 0);
    let [best, least] = [-1, Infinity];
    for (const k of site.allowedAt(light.incidenceRad[n], light.azimuthRad[n])) {
      const error = errorOf(k);
      if (error < least - SAME_ERROR) [best, least] = [k, error];
    }
    if (best !== cellIndex[n]) changed += 1;
    cellIndex[n] = best;
  }
  return changed;
}

/** The common phase of each other frequency under which the placed cells add up best, by the power that falls on them. */
function fitOffsets(site: BandFitSite, ats: readonly EditionAtFrequency[], cellIndex: Int32Array, offsetRad: Float64Array): void {
  for (let f = 1; f < ats.length; f++) {
    let [re, im] = [0, 0];
    eachPlaced(site, ats[f], cellIndex, (n, { magnitude, phaseRad }) => {
      const size = magnitude * site.light.amplitude[n] ** 2;
      re += size * Math.cos(phaseRad - site.band[f].targetRad[n]);
      im += size * Math.sin(phaseRad - site.band[f].targetRad[n]);
    });
    offsetRad[f] = Math.atan2(im, re);
  }
}

function errorsLeft(site: BandFitSite, ats: readonly EditionAtFrequency[], cellIndex: Int32Array, offsetRad: Float64Array): Float64Array {
  return Float64Array.from(ats, (at, f) => {
    let [squares, count] = [0, 0];
    eachPlaced(site, at, cellIndex, (n, { phaseRad }) => {
      squares += wrapRad(phaseRad - site.band[f].targetRad[n] - offsetRad[f]) ** 2;
      count += 1;
    });
    return count > 0 ? Math.sqrt(squares / count) : 0;
  });
}

function eachPlaced(site: BandFitSite, at: EditionAtFrequency, cellIndex: Int32Array, visit: (n: number, response: PolarResponse) => void): void {
  const weigh = incidenceWeigher(site.edition, site.polarisation);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  for (let n = 0; n < cellIndex.length; n++) {
    if (cellIndex[n] < 0) continue;
    visit(n, coPolarResponse(at, cellIndex[n], weigh(site.light.incidenceRad[n], site.light.azimuthRad[n]), response));
  }
}

/** References tried, and positions that stand for all of them. */
const REFERENCES = 24;
const MOST_JUDGED = 150;
const SEARCHING_ROUNDS = 3;

/** The reference phase under which the fit over the whole band leaves the least, tried in steps of 15 degrees on a part of the cells. */
export function bandReferenceRad(site: BandFitSite): number {
  const count = site.band[0].targetRad.length;
  const stride = Math.max(1, Math.ceil(count / MOST_JUDGED));
  const part = (values: Float64Array): Float64Array => values.filter((_, n) => n % stride === 0);
  const { amplitude, incidenceRad, azimuthRad } = site.light;
  const sample: BandFitSite = {
    ...site,
    light: { amplitude: part(amplitude), incidenceRad: part(incidenceRad), azimuthRad: part(azimuthRad) },
    band: site.band.map(({ frequencyHz, targetRad }) => ({ frequencyHz, targetRad: part(targetRad) })),
  };
  let [best, least] = [0, Infinity];
  for (let i = 0; i < REFERENCES; i++) {
    const reference = (2 * Math.PI * i) / REFERENCES;
    const left = bandFit(sample, reference, SEARCHING_ROUNDS).errorRmsRad.reduce((sum, rms) => sum + rms * rms, 0);
    if (left < least * (1 - 1e-9)) [best, least] = [reference, left];
  }
  return best;
}
