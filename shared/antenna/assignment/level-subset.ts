import { wrapRad } from '../../units/angles';
import { coPolarResponse, incidenceWeigher } from '../cell-response';
import type { EditionAtFrequency } from '../edition-at-frequency';
import type { PreparedEdition } from '../prepare-edition';
import type { Polarisation } from '../../model/design-document';

export interface SubsetQuestion {
  readonly edition: PreparedEdition;
  readonly at: EditionAtFrequency;
  readonly polarisation: Polarisation;
  /** Candidates, rising. */
  readonly allowed: Int32Array;
  readonly levels: number;
}

/** Offsets of the wanted levels that are tried over one step. */
const OFFSETS = 72;

/**
 * The N cells that come nearest to N phases evenly spaced round the circle, at the smallest angle of incidence of the data:
 * of all turns of the N phases the one with the least sum of squared complex errors. All of them where there are no more.
 */
export function levelSubset({ edition, at, polarisation, allowed, levels }: SubsetQuestion): Int32Array {
  if (allowed.length <= levels) return allowed;
  const weights = incidenceWeigher(edition, polarisation)(0, 0);
  const responses = Array.from(allowed, (k) => ({ k, ...coPolarResponse(at, k, weights, { magnitude: 0, phaseRad: 0 }) }));
  const step = (2 * Math.PI) / levels;
  let best: { cells: number[]; error: number } | undefined;
  for (let i = 0; i < OFFSETS; i++) {
    const cells: number[] = [];
    let error = 0;
    for (let level = 0; level < levels; level++) {
      const wanted = step * (level + i / OFFSETS);
      const nearest = responses
        .filter(({ k }) => !cells.includes(k))
        .map(({ k, magnitude, phaseRad }) => ({ k, off: 1 + magnitude * magnitude - 2 * magnitude * Math.cos(wrapRad(phaseRad - wanted)) }))
        .reduce((a, b) => (b.off < a.off - 1e-12 ? b : a));
      cells.push(nearest.k);
      error += nearest.off;
    }
    if (!best || error < best.error - 1e-12) best = { cells, error };
  }
  return Int32Array.from(best?.cells ?? []).sort();
}
