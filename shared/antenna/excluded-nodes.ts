import { lagrangeWeights } from '../math/interpolate';
import { nearestBranchRad } from '../math/unwrap-phase';
import { MOST_AZIMUTH_NODES, MOST_THETA_NODES } from './cell-response';
import type { EditionAtFrequency } from './edition-at-frequency';
import type { RegionFilter } from './excluded-regions';
import type { PreparedEdition } from './prepare-edition';

/** What an edition holds at a frequency once the angles that the laboratory excludes are left out. */
export interface PermittedNodes {
  /** The table with every excluded node replaced by what the permitted ones say there. */
  readonly at: EditionAtFrequency;
  /** Smallest and largest angle permitted, per cell and azimuth; from infinity to minus infinity where there is none. */
  readonly lowestRad: Float64Array;
  readonly highestRad: Float64Array;
}

/**
 * Keeps excluded angles out of the interpolation. An excluded node takes the value of the polynomial through the permitted
 * nodes nearest to it, so a polynomial through all of them is the one through the permitted alone: just below an
 * excluded region no number of that region is read. Up to the region the response is carried on from the angles
 * below it. Where an azimuth has no permitted angle the other azimuths stand in; where a cell has none at all its numbers
 * stay, since it is chosen nowhere. Within a region the original table tells what was given.
 */
export function permittedNodes(prepared: PreparedEdition, regions: RegionFilter, at: EditionAtFrequency): PermittedNodes {
  const { thetasRad, phisRad, cellCount } = prepared.edition.responses;
  const { azimuths, sineSquaredNodes, smallestThetaRad, largestThetaRad } = prepared;
  const azimuthCount = azimuths.cosines.length;
  const ranges = cellCount * azimuthCount;
  if (regions.isEmpty) return { at, lowestRad: new Float64Array(ranges).fill(smallestThetaRad), highestRad: new Float64Array(ranges).fill(largestThetaRad) };
  const permitted = new Uint8Array(cellCount * at.nodeCount).fill(1);
  const lowestRad = new Float64Array(ranges).fill(Infinity);
  const highestRad = new Float64Array(ranges).fill(-Infinity);
  const barred = new Uint8Array(cellCount);
  for (let node = 0; node < at.nodeCount; node++) {
    const [thetaRad, azimuth] = [thetasRad[Math.floor(node / azimuthCount)], node % azimuthCount];
    barred.fill(0);
    regions.mark(thetaRad, phisRad[azimuths.indices[azimuth]], barred);
    for (let cell = 0; cell < cellCount; cell++) {
      if (barred[cell]) permitted[cell * at.nodeCount + node] = 0;
      else {
        const range = cell * azimuthCount + azimuth;
        lowestRad[range] = Math.min(lowestRad[range], thetaRad);
        highestRad[range] = Math.max(highestRad[range], thetaRad);
      }
    }
  }
  const table = { ...at, logMagnitude: at.logMagnitude.slice(), phaseRad: at.phaseRad.slice() };
  for (let cell = 0; cell < cellCount; cell++) {
    const own = permitted.subarray(cell * at.nodeCount, (cell + 1) * at.nodeCount);
    if (!own.includes(0) || !own.includes(1)) continue;
    for (let entry = 0; entry < at.entryCount; entry++) {
      const from = (cell * at.entryCount + entry) * at.nodeCount;
      const nodes = { permitted: own, sineSquaredNodes, cosines: azimuths.cosines };
      const phaseRad = table.phaseRad.subarray(from, from + at.nodeCount);
      unwrapPermitted(phaseRad, own, azimuthCount);
      replaceExcluded(phaseRad, nodes);
      replaceExcluded(table.logMagnitude.subarray(from, from + at.nodeCount), nodes);
    }
  }
  return { at: table, lowestRad, highestRad };
}

/** A response in an excluded region may turn by anything, so it must not decide on which branch the next angle lies. */
function unwrapPermitted(phaseRad: Float64Array, permitted: Uint8Array, azimuthCount: number): void {
  let before: number | undefined;
  for (let azimuth = 0; azimuth < azimuthCount; azimuth++) {
    let first: number | undefined;
    for (let node = azimuth; node < phaseRad.length; node += azimuthCount) {
      if (!permitted[node]) continue;
      if (before !== undefined) phaseRad[node] = nearestBranchRad(phaseRad[node], phaseRad[before]);
      before = node;
      first ??= node;
    }
    // The next azimuth starts from the smallest angle of this one, where azimuths differ least.
    before = first ?? before;
  }
}

interface NodeGrid {
  readonly permitted: Uint8Array;
  readonly sineSquaredNodes: Float64Array;
  readonly cosines: Float64Array;
}

/** Replaces along the angle of incidence where that azimuth has permitted angles, then along azimuth. */
function replaceExcluded(values: Float64Array, { permitted, sineSquaredNodes, cosines }: NodeGrid): void {
  const azimuthCount = cosines.length;
  const told = new Uint8Array(azimuthCount);
  for (let azimuth = 0; azimuth < azimuthCount; azimuth++) {
    const nodeOf = (theta: number): number => theta * azimuthCount + azimuth;
    const known = Array.from(sineSquaredNodes.keys()).filter((theta) => permitted[nodeOf(theta)]);
    if (known.length === 0) continue;
    told[azimuth] = 1;
    for (let theta = 0; theta < sineSquaredNodes.length; theta++) {
      if (!permitted[nodeOf(theta)]) values[nodeOf(theta)] = throughNearest({ xs: sineSquaredNodes, known, most: MOST_THETA_NODES - 1 }, theta, (k) => values[nodeOf(k)]);
    }
  }
  const known = Array.from(told.keys()).filter((azimuth) => told[azimuth]);
  for (let node = 0; node < values.length; node++) {
    const azimuth = node % azimuthCount;
    if (!told[azimuth]) values[node] = throughNearest({ xs: cosines, known, most: MOST_AZIMUTH_NODES - 1 }, azimuth, (k) => values[node - azimuth + k]);
  }
}

interface KnownNodes {
  readonly xs: Float64Array;
  readonly known: readonly number[];
  readonly most: number;
}

/** Value at node `at` of the polynomial through the known nodes nearest to it. */
function throughNearest({ xs, known, most }: KnownNodes, at: number, valueAt: (node: number) => number): number {
  const nearest = [...known].sort((a, b) => Math.abs(xs[a] - xs[at]) - Math.abs(xs[b] - xs[at])).slice(0, most);
  const weights = lagrangeWeights(nearest.map((node) => xs[node]), xs[at], new Float64Array(nearest.length));
  return nearest.reduce((sum, node, i) => sum + weights[i] * valueAt(node), 0);
}
