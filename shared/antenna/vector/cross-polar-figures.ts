import { powerRatioToDb } from '../../units/decibels';
import type { Direction } from '../../waves/conventions';
import { outwardDirection } from '../../waves/conventions';
import { patternPower } from '../radiation-pattern';
import { refinePeak } from '../refine-peak';
import { bothPowers, type VectorPattern } from './vector-pattern';

/** Above this a ratio says that the cross-polar field vanishes by symmetry; more digits would be rounding. */
export const LARGEST_DISCRIMINATION_DB = 200;

/** Co- over cross-polar power in one direction. */
export function discriminationDb(pattern: VectorPattern, direction: Direction): number {
  const [wanted, other] = bothPowers(pattern, direction);
  if (wanted === 0) return -LARGEST_DISCRIMINATION_DB;
  return other === 0 ? LARGEST_DISCRIMINATION_DB : Math.max(-LARGEST_DISCRIMINATION_DB, Math.min(LARGEST_DISCRIMINATION_DB, powerRatioToDb(wanted / other)));
}

export interface WithinHalfPower {
  /** Smallest local discrimination within half power of the co-polar peak. */
  readonly worstDiscriminationDb: number;
  /** Highest cross-polar level there relative to the co-polar peak. */
  readonly highestCrossDb: number;
}

const RAYS = 72;
const STEPS = 12;
/** Of a sixteenth of a beamwidth: far finer than the discrimination varies. */
const BISECTIONS = 12;

/**
 * Along straight rays of (u, v) from the co-polar peak nearest the beam out to half its power: the worst local discrimination and
 * the highest cross-polar level. Undefined where a ray leaves the visible region, or a beamwidth has no end, before half power.
 */
export function withinHalfPower(pattern: VectorPattern, beam: Direction): WithinHalfPower | undefined {
  const { co } = pattern;
  const { grid } = co.spectrum;
  const peak = refinePeak(co, beam.u, beam.v);
  const peakPower = patternPower(co, outwardDirection(peak.u, peak.v));
  // A quarter of the beamwidth of a uniform aperture as wide as the panel's longer side.
  const stride = Math.PI / 2 / (co.wavenumber * Math.max(grid.columnCount * grid.stepXM, grid.rowCount * grid.stepYM));
  let worst = 0;
  let highest = 0;
  for (let i = 0; i < RAYS; i++) {
    const turn = (2 * Math.PI * i) / RAYS;
    const coAt = (radius: number): number => {
      const [u, v] = [peak.u + radius * Math.cos(turn), peak.v + radius * Math.sin(turn)];
      return u * u + v * v > 1 ? -1 : patternPower(co, outwardDirection(u, v));
    };
    const reach = halfPowerRadius(coAt, peakPower / 2, stride);
    if (reach === undefined) return undefined;
    for (let j = 0; j <= STEPS; j++) {
      const radius = (reach * j) / STEPS;
      const [wanted, other] = bothPowers(pattern, outwardDirection(peak.u + radius * Math.cos(turn), peak.v + radius * Math.sin(turn)));
      highest = Math.max(highest, other / peakPower);
      worst = Math.max(worst, other / wanted);
    }
  }
  const db = (ratio: number): number => (ratio > 0 ? Math.max(-LARGEST_DISCRIMINATION_DB, powerRatioToDb(ratio)) : -LARGEST_DISCRIMINATION_DB);
  return { worstDiscriminationDb: -db(worst), highestCrossDb: db(highest) };
}

/** Where a ray first falls to a level; undefined where it does not within the visible region. */
function halfPowerRadius(coAt: (radius: number) => number, level: number, stride: number): number | undefined {
  let inside = 0;
  let outside = stride / 4;
  while (coAt(outside) > level) {
    inside = outside;
    outside += stride / 4;
    if (outside > 2) return undefined;
  }
  if (coAt(outside) < 0) return undefined;
  for (let i = 0; i < BISECTIONS; i++) {
    const middle = (inside + outside) / 2;
    if (coAt(middle) > level) inside = middle;
    else outside = middle;
  }
  return inside;
}
