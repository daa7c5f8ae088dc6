import type { CellResponseTable } from '../model/cell-family';
import { bracket } from '../math/interpolate';
import { nearestBranchRad } from '../math/unwrap-phase';

/**
 * Co-polar responses of all cells at one frequency. Node t azimuthCount + a of entry e of a cell stands at
 * (cell entryCount + e) nodeCount + node; phases are unwrapped over the nodes, so both tables may be interpolated.
 */
export interface EditionAtFrequency {
  readonly frequencyHz: number;
  /** -1 below the band of the edition, 1 above it (the responses are those of the band's edge), 0 inside. */
  readonly outside: -1 | 0 | 1;
  readonly entryCount: number;
  readonly nodeCount: number;
  readonly logMagnitude: Float64Array;
  readonly phaseRad: Float64Array;
  /** 1 where every angle of the cell has given points on both sides of the frequency. */
  readonly usable: Uint8Array;
}

interface FrequencySource {
  readonly responses: CellResponseTable;
  readonly entries: readonly number[];
  readonly azimuthIndices: Int32Array;
}

/** Stands for a response of exactly 0 in the logarithm: -240 dB. */
const LEAST_MAGNITUDE = 1e-12;

/** Interpolates to a frequency, linearly in ln |S| and in the wrapped phase step between the two neighbouring points given. */
export function editionAtFrequency(source: FrequencySource, frequencyHz: number): EditionAtFrequency {
  const { responses, entries, azimuthIndices } = source;
  const azimuthCount = azimuthIndices.length;
  const nodeCount = responses.thetasRad.length * azimuthCount;
  const length = responses.cellCount * entries.length * nodeCount;
  const table = { logMagnitude: new Float64Array(length), phaseRad: new Float64Array(length) };
  const usable = new Uint8Array(responses.cellCount).fill(1);
  for (let cell = 0; cell < responses.cellCount; cell++) {
    for (let node = 0; node < nodeCount; node++) {
      const theta = Math.floor(node / azimuthCount);
      const series = (cell * responses.thetasRad.length + theta) * responses.phisRad.length + azimuthIndices[node % azimuthCount];
      const points = neighbours(responses, series, frequencyHz);
      if (!points?.enclosed) usable[cell] = 0;
      entries.forEach((entry, e) => {
        const at = (cell * entries.length + e) * nodeCount + node;
        const value = points ? betweenPoints(responses, points, entry) : { logMagnitude: Math.log(LEAST_MAGNITUDE), phaseRad: 0 };
        table.logMagnitude[at] = value.logMagnitude;
        table.phaseRad[at] = value.phaseRad;
      });
    }
    unwrapCell(table.phaseRad, { cell, entryCount: entries.length, nodeCount, azimuthCount });
  }
  const { outside } = bracket(responses.frequenciesHz, frequencyHz);
  return { frequencyHz, outside, entryCount: entries.length, nodeCount, ...table, usable };
}

/** Where a frequency falls among the points of one series. */
export interface Neighbours {
  /** Point indices into the table of values. */
  readonly below: number;
  readonly above: number;
  readonly fraction: number;
  readonly enclosed: boolean;
}

/** The given points on both sides of a frequency in one series; missing points are stepped over. */
export function neighbours(responses: CellResponseTable, series: number, frequencyHz: number): Neighbours | undefined {
  const { frequenciesHz, present } = responses;
  const count = frequenciesHz.length;
  const { lower, fraction } = bracket(frequenciesHz, frequencyHz);
  const from = series * count;
  let below = fraction === 1 ? lower + 1 : lower;
  let above = fraction === 0 ? lower : lower + 1;
  while (below >= 0 && !present[from + below]) below -= 1;
  while (above < count && !present[from + above]) above += 1;
  const enclosed = below >= 0 && above < count;
  if (below < 0 && above >= count) return undefined;
  if (below < 0) below = above;
  if (above >= count) above = below;
  const span = frequenciesHz[above] - frequenciesHz[below];
  // The band's edge stands in for anything beyond it.
  const inBand = Math.min(frequenciesHz[count - 1], Math.max(frequenciesHz[0], frequencyHz));
  return { below: from + below, above: from + above, fraction: span === 0 ? 0 : (inBand - frequenciesHz[below]) / span, enclosed };
}

function betweenPoints(responses: CellResponseTable, points: Neighbours, entry: number): { logMagnitude: number; phaseRad: number } {
  const below = polar(responses.values, points.below * 8 + 2 * entry);
  const above = polar(responses.values, points.above * 8 + 2 * entry);
  const step = nearestBranchRad(above.phaseRad, below.phaseRad) - below.phaseRad;
  return {
    logMagnitude: below.logMagnitude + points.fraction * (above.logMagnitude - below.logMagnitude),
    phaseRad: below.phaseRad + points.fraction * step,
  };
}

function polar(values: Float64Array, at: number): { logMagnitude: number; phaseRad: number } {
  const [re, im] = [values[at], values[at + 1]];
  return { logMagnitude: Math.log(Math.max(LEAST_MAGNITUDE, Math.hypot(re, im))), phaseRad: Math.atan2(im, re) };
}

/**
 * Makes the phases of a cell continuous over its nodes: from the smallest angle of incidence along the first azimuth,
 * then along azimuth; all entries start on one branch, since at normal incidence they are equal.
 */
function unwrapCell(phaseRad: Float64Array, shape: { cell: number; entryCount: number; nodeCount: number; azimuthCount: number }): void {
  const { cell, entryCount, nodeCount, azimuthCount } = shape;
  const start = cell * entryCount * nodeCount;
  for (let e = 0; e < entryCount; e++) {
    const from = start + e * nodeCount;
    phaseRad[from] = nearestBranchRad(phaseRad[from], phaseRad[start]);
    for (let node = 1; node < nodeCount; node++) {
      const before = node % azimuthCount === 0 ? node - azimuthCount : node - 1;
      phaseRad[from + node] = nearestBranchRad(phaseRad[from + node], phaseRad[from + before]);
    }
  }
}
