import type { CellResponseTable } from '../model/cell-family';
import type { Warning } from '../model/figures';
import { bracket } from '../math/interpolate';
import { degFromRad } from '../units/angles';
import { amplitudeRatioToDb } from '../units/decibels';
import { degreesText } from './angle-text';
import type { CellAssignment } from './cell-stock';
import type { EditionSite } from './edition-stock';

/** A tenth of the field: added at the worst phase it turns a response by 5.7 degrees. */
const MATTERS = 0.1;
const CROSS_ENTRIES = [1, 2] as const;

/**
 * The scalar model takes the co-polar response of a cell from its diagonal alone, S_TM cos^2 + S_TE sin^2, and leaves out
 * S12 and S21: what a cell turns from one polarisation into the other. Says how large that is, at the frequency of use and the
 * angles in use, wherever it is more than a tenth of the field in cells that were placed.
 */
export function crossResponseWarning(site: EditionSite, { cellIndex }: CellAssignment, frequencyHz: number): Warning[] {
  const { ports, edition } = site.edition;
  if (ports.kind === 'one') return [];
  const largest = largestCross(edition.responses, { frequencyHz, incidenceRad: site.light.incidenceRad.reduce((most, incidence) => Math.max(most, incidence), 0) });
  let positions = 0;
  let worst = -1;
  for (const cell of cellIndex) {
    if (cell < 0) continue;
    if (largest.amplitude[cell] > MATTERS) positions += 1;
    if (worst < 0 || largest.amplitude[cell] > largest.amplitude[worst]) worst = cell;
  }
  if (positions === 0) return [];
  const crossDb = amplitudeRatioToDb(largest.amplitude[worst]);
  const thetaDeg = degFromRad(largest.thetaRad[worst]);
  return [
    {
      code: 'cross-response',
      pointer: '#/cells',
      severity: 'warn',
      message:
        `The scalar model leaves out what a cell turns from one polarisation into the other (S12, S21): up to ${crossDb.toFixed(1)} dB, ` +
        `in cell ${edition.cells[worst].id} at ${degreesText(thetaDeg)} of incidence; above ${amplitudeRatioToDb(MATTERS).toFixed(0)} dB in the cells at ${positions} of ${cellIndex.length} positions.`,
      numbers: { crossDb, thetaDeg, positions },
    },
  ];
}

interface LargestCross {
  /** Per cell, and where it stands. */
  readonly amplitude: Float64Array;
  readonly thetaRad: Float64Array;
}

/** Largest |S12| or |S21| of each cell, over the angles up to the first one that covers the incidence, at the points about the frequency. */
function largestCross(responses: CellResponseTable, { frequencyHz, incidenceRad }: { frequencyHz: number; incidenceRad: number }): LargestCross {
  const { cellCount, thetasRad, phisRad, frequenciesHz } = responses;
  const { lower, fraction } = bracket(frequenciesHz, frequencyHz);
  const points = [...(fraction < 1 ? [lower] : []), ...(fraction > 0 ? [lower + 1] : [])];
  const covering = thetasRad.findIndex((theta) => theta >= incidenceRad);
  const thetaCount = covering < 0 ? thetasRad.length : covering + 1;
  const largest = { amplitude: new Float64Array(cellCount), thetaRad: new Float64Array(cellCount) };
  for (let series = 0; series < cellCount * thetasRad.length * phisRad.length; series++) {
    const cell = Math.floor(series / (thetasRad.length * phisRad.length));
    const theta = Math.floor(series / phisRad.length) % thetasRad.length;
    if (theta >= thetaCount) continue;
    const amplitude = Math.max(...points.map((point) => crossAmplitude(responses, series * frequenciesHz.length + point)));
    if (amplitude <= largest.amplitude[cell]) continue;
    largest.amplitude[cell] = amplitude;
    largest.thetaRad[cell] = thetasRad[theta];
  }
  return largest;
}

/** The larger of |S12| and |S21| of a point; 0 where it was never given. */
function crossAmplitude({ values, present }: CellResponseTable, point: number): number {
  if (!present[point]) return 0;
  return Math.max(...CROSS_ENTRIES.map((entry) => Math.hypot(values[8 * point + 2 * entry], values[8 * point + 2 * entry + 1])));
}
