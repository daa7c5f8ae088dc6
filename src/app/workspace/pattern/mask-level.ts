import { maskLevelDb } from '../../../../shared/antenna/masks/mask-envelope';
import type { MaskEnvelope } from '../../../../shared/antenna/masks/mask-envelope';
import { degFromRad, radFromDeg } from '../../../../shared/units/angles';
import { angleBetweenRad, directionOf } from '../../../../shared/waves/conventions';
import type { Direction } from '../../../../shared/waves/conventions';
import type { Beam } from '../../../../shared/model/design-document';
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

/** The highest level a mask allows at an angle off the wanted beam; null where it is undefined. */
export function maskLevelDbi(mask: MaskEnvelope | null, offDeg: number): number | null {
  return mask === null ? null : maskLevelDb(mask, offDeg);
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
export function forbiddenEdges(mask: MaskEnvelope | null, beams: readonly Beam[], cut: CutDirections, shiftDb: number): readonly ForbiddenEdge[] {
  const edges: { angleDeg: number[]; levelDb: number[] }[] = [];
  const offAxis = offAxisReader(beams, cut);
  let open = false;
  for (let i = 0; i < cut.angleDeg.length; i++) {
    const level = maskLevelDbi(mask, offAxis(i));
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
export function leastMargin(mask: MaskEnvelope | null, beams: readonly Beam[], cut: CutDirections & { readonly gainDbi: ArrayLike<number> }): { readonly at: number; readonly marginDb: number } | null {
  const offAxis = offAxisReader(beams, cut);
  let least: { readonly at: number; readonly marginDb: number } | null = null;
  for (let i = 0; i < cut.angleDeg.length; i++) {
    const level = maskLevelDbi(mask, offAxis(i));
    if (level !== null && (least === null || level - cut.gainDbi[i] < least.marginDb)) least = { at: i, marginDb: level - cut.gainDbi[i] };
  }
  return least;
}
