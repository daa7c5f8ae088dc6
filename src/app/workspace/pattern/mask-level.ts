import { linearThrough } from '../../../../shared/math/interpolate';
import { degFromRad, radFromDeg } from '../../../../shared/units/angles';
import { angleBetweenRad, directionOf } from '../../../../shared/waves/conventions';
import type { Direction } from '../../../../shared/waves/conventions';
import type { Beam, Mask } from '../../../../shared/model/design-document';
import type { ForbiddenEdge } from '../../ui/plots/cut-figure';

export interface DirectionDeg {
  readonly thetaDeg: number;
  readonly phiDeg: number;
}

/** Angle to the nearest of the wanted beams. */
export function offAxisDeg(direction: DirectionDeg, beams: readonly DirectionDeg[]): number {
  const at = unitOf(direction);
  return degFromRad(Math.min(...beams.map((beam) => angleBetweenRad(at, unitOf(beam)))));
}

/** The highest level a mask allows at an angle off the wanted beam; null inside its first angle, and for masks given by name alone. */
export function maskLevelDbi(mask: Mask | undefined, offDeg: number): number | null {
  return maskReader(mask)(offDeg);
}

/** The same for many angles. */
function maskReader(mask: Mask | undefined): (offDeg: number) => number | null {
  if (mask?.kind !== 'custom') return () => null;
  const angles = mask.points.map(([angle]) => angle);
  const levels = mask.points.map(([, level]) => level);
  return (offDeg) => (offDeg < angles[0] ? null : linearThrough(angles, levels, offDeg));
}

/** Angle of each direction of a cut to the nearest of the beams; their unit vectors are worked out once. */
function offAxisReader(beams: readonly DirectionDeg[], cut: CutDirections): (i: number) => number {
  const units = beams.map(unitOf);
  return (i) => {
    const at = unitOf({ thetaDeg: cut.thetaDeg[i], phiDeg: cut.phiDeg[i] });
    let least = Infinity;
    for (const unit of units) least = Math.min(least, angleBetweenRad(at, unit));
    return degFromRad(least);
  };
}

function unitOf({ thetaDeg, phiDeg }: DirectionDeg): Direction {
  return directionOf(radFromDeg(thetaDeg), radFromDeg(phiDeg));
}

/** A cut as directions: one for each of its angles. */
export interface CutDirections {
  readonly angleDeg: ArrayLike<number>;
  readonly thetaDeg: ArrayLike<number>;
  readonly phiDeg: ArrayLike<number>;
}

/** Where a mask forbids along a cut, one edge for each stretch. `shiftDb` is taken from every level, for relative cuts. */
export function forbiddenEdges(mask: Mask | undefined, beams: readonly Beam[], cut: CutDirections, shiftDb: number): readonly ForbiddenEdge[] {
  const edges: { angleDeg: number[]; levelDb: number[] }[] = [];
  const [allowed, offAxis] = [maskReader(mask), offAxisReader(beams, cut)];
  let open = false;
  for (let i = 0; i < cut.angleDeg.length; i++) {
    const level = allowed(offAxis(i));
    if (level === null) {
      open = false;
      continue;
    }
    if (!open) edges.push({ angleDeg: [], levelDb: [] });
    open = true;
    edges[edges.length - 1].angleDeg.push(cut.angleDeg[i]);
    edges[edges.length - 1].levelDb.push(level - shiftDb);
  }
  return edges;
}

/** Where the gain comes nearest to a mask along a cut, or reaches furthest into it. */
export function leastMargin(mask: Mask | undefined, beams: readonly Beam[], cut: CutDirections & { readonly gainDbi: ArrayLike<number> }): { readonly at: number; readonly marginDb: number } | null {
  const [allowed, offAxis] = [maskReader(mask), offAxisReader(beams, cut)];
  let least: { readonly at: number; readonly marginDb: number } | null = null;
  for (let i = 0; i < cut.angleDeg.length; i++) {
    const level = allowed(offAxis(i));
    if (level !== null && (least === null || level - cut.gainDbi[i] < least.marginDb)) least = { at: i, marginDb: level - cut.gainDbi[i] };
  }
  return least;
}
