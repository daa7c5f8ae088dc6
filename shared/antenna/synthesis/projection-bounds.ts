import { angleBetweenRad, azimuthElevationRad, outwardDirection, type Direction } from '../../waves/conventions';

/** Samples of a transform and the steps of u and v between them. */
export interface BoundsGrid {
  readonly columns: number;
  readonly rows: number;
  /** u of sample m is m uStep, the upper half counted negative. */
  readonly uStep: number;
  readonly vStep: number;
  /** Exponent b of the element factor cos^b, in field: the bounds are those of the pattern, not of the array factor. */
  readonly radiateExponent: number;
  /** The pattern of a staggered lattice stands twice on the samples of its places: once beyond the horizon, which is left free. */
  readonly copies: 1 | 2;
}

export interface Sector {
  readonly azimuthRad: readonly [number, number];
  readonly elevationRad: readonly [number, number];
}

export interface SectorGoal {
  readonly kind: 'sectors';
  readonly sectors: readonly Sector[];
  readonly rippleDb: number;
  /** Between the sector and the outside, where only the upper bound of the sector holds. */
  readonly transitionRad: number;
  readonly outsideDb: number;
}

export interface MaskGoal {
  readonly kind: 'mask';
  /** Angle off the nearest wanted beam, rising, and highest level relative to the peak wanted. */
  readonly points: readonly { readonly offAxisRad: number; readonly levelDb: number }[];
  /** How far the peak may fall below all cells in step. */
  readonly peakLossDb: number;
}

export interface Bounds {
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  /** Samples that must hold a level; a goal without any is narrower than a sample. */
  readonly heldCount: number;
}

/** The element factor is taken as at least this: bounds near the horizon would ask for what no cell radiates. */
const LEAST_ELEMENT = 0.1;
const ratio = (db: number): number => 10 ** (db / 20);

/**
 * A flat level in the sectors that takes all power sum A^2 (by Parseval, level^2 sum 1/g^2 = samples sum A^2 with g the element
 * factor), ripple up and down there, the upper bound alone in the transition, the outside level elsewhere and beyond the horizon.
 */
export function sectorBounds(goal: SectorGoal, grid: BoundsGrid, power: number): Bounds {
  const count = grid.columns * grid.rows;
  const held = new Uint8Array(count);
  const free = new Uint8Array(count);
  const element = new Float64Array(count);
  let [heldCount, weight] = [0, 0];
  eachSample(grid, (at, direction) => {
    element[at] = elementAt(direction, grid.radiateExponent);
    held[at] = direction === null ? 0 : zoneOf(goal, direction);
    if (direction === null && grid.copies === 2) free[at] = 1;
    if (held[at] !== 2) return;
    heldCount += 1;
    weight += 1 / element[at] ** 2;
  });
  const level = heldCount > 0 ? Math.sqrt((count * power) / (grid.copies * weight)) : 0;
  const lower = new Float64Array(count);
  const upper = new Float64Array(count);
  for (let at = 0; at < count; at++) {
    lower[at] = held[at] === 2 ? (level * ratio(-goal.rippleDb)) / element[at] : 0;
    upper[at] = free[at] === 1 ? Infinity : (level * ratio(held[at] > 0 ? goal.rippleDb : goal.outsideDb)) / element[at];
  }
  return { lower, upper, heldCount };
}

/** 2 in a sector, 1 in its transition, 0 outside. */
function zoneOf({ sectors, transitionRad }: SectorGoal, direction: Direction): 0 | 1 | 2 {
  const { azimuthRad, elevationRad } = azimuthElevationRad(direction);
  const within = ([from, to]: readonly [number, number], at: number, more: number): boolean => at >= from - more && at <= to + more;
  const reaches = (more: number): boolean => sectors.some((sector) => within(sector.azimuthRad, azimuthRad, more) && within(sector.elevationRad, elevationRad, more));
  return reaches(0) ? 2 : reaches(transitionRad) ? 1 : 0;
}

/**
 * Beams with an upper bound by the angle off the nearest one, relative to their peak; the sample nearest to each beam holds at
 * least the peak wanted. `fullField` is the field of all cells in step.
 */
export function maskBounds(goal: MaskGoal, grid: BoundsGrid, query: { beams: readonly Direction[]; fullField: number }): Bounds {
  const count = grid.columns * grid.rows;
  const peak = (query.fullField * ratio(-goal.peakLossDb)) / Math.sqrt(query.beams.length);
  const lower = new Float64Array(count);
  const upper = new Float64Array(count);
  eachSample(grid, (at, direction) => {
    const off = direction === null ? Math.PI / 2 : Math.min(...query.beams.map((beam) => angleBetweenRad(beam, direction)));
    const level = direction === null && grid.copies === 2 ? null : maskLevelDb(goal, off);
    const beamElement = elementAt(query.beams[0], grid.radiateExponent);
    upper[at] = level === null ? Infinity : (peak * ratio(level) * beamElement) / elementAt(direction, grid.radiateExponent);
  });
  for (const beam of query.beams) {
    const at = sampleOf(grid.columns, beam.u / grid.uStep) * grid.rows + sampleOf(grid.rows, beam.v / grid.vStep);
    lower[at] = peak;
    upper[at] = Infinity;
  }
  return { lower, upper, heldCount: query.beams.length };
}

/** Straight in angle and dB between the points; none before the first, the last level beyond the last. */
function maskLevelDb({ points }: MaskGoal, offAxisRad: number): number | null {
  if (offAxisRad < points[0].offAxisRad) return null;
  const next = points.findIndex((point) => point.offAxisRad > offAxisRad);
  if (next < 0) return points[points.length - 1].levelDb;
  const [a, b] = [points[next - 1], points[next]];
  return a.levelDb + ((b.levelDb - a.levelDb) * (offAxisRad - a.offAxisRad)) / (b.offAxisRad - a.offAxisRad);
}

function elementAt(direction: Direction | null, radiateExponent: number): number {
  return direction === null ? LEAST_ELEMENT : Math.max(LEAST_ELEMENT, Math.pow(direction.w, radiateExponent));
}

function sampleOf(size: number, place: number): number {
  const nearest = Math.round(place);
  return nearest - size * Math.floor(nearest / size);
}

/** Calls back for every sample with its direction, or null beyond the horizon. */
function eachSample({ columns, rows, uStep, vStep }: BoundsGrid, visit: (at: number, direction: Direction | null) => void): void {
  for (let m = 0; m < columns; m++) {
    const u = (m < columns / 2 ? m : m - columns) * uStep;
    for (let n = 0; n < rows; n++) {
      const v = (n < rows / 2 ? n : n - rows) * vStep;
      visit(m * rows + n, u * u + v * v <= 1 ? outwardDirection(u, v) : null);
    }
  }
}
