import type { GratingLobe } from '../model/figures';
import { degFromRad } from '../units/angles';
import { anglesOf, outwardDirection, type Direction } from '../waves/conventions';
import type { SiLattice } from './si-design';

/** Two vectors of the reciprocal lattice in 1/m: orders stand at (u, v) + lambda (m first + n second). */
export interface ReciprocalLattice {
  readonly first: readonly [number, number];
  readonly second: readonly [number, number];
}

/** Rectangular: (1/dx, 0), (0, 1/dy). Triangular with rows along x: (1/p, -1/2h), (0, 1/h). */
export function reciprocalLattice(lattice: SiLattice): ReciprocalLattice {
  if (lattice.kind === 'rectangular') return { first: [1 / lattice.periodXM, 0], second: [0, 1 / lattice.periodYM] };
  const { periodXM, rowSpacingM } = lattice;
  return { first: [1 / periodXM, -1 / (2 * rowSpacingM)], second: [0, 1 / rowSpacingM] };
}

/** Shortest vector of the reciprocal lattice, 1/m: no order but the specular one can travel while lambda times it exceeds 1 + sin(theta). */
export function shortestReciprocalPerM(lattice: SiLattice): number {
  const { first, second } = reciprocalLattice(lattice);
  let shortest = Infinity;
  for (let m = -2; m <= 2; m++) {
    for (let n = -2; n <= 2; n++) {
      if (m !== 0 || n !== 0) shortest = Math.min(shortest, Math.hypot(m * first[0] + n * second[0], m * first[1] + n * second[1]));
    }
  }
  return shortest;
}

/** A list longer than this helps nobody; sparse lattices have thousands of orders. */
const MOST_LISTED = 200;

/** Visible orders of a beam other than itself, nearest to broadside first, and how many there are in all. */
export function gratingLobes(lattice: SiLattice, beam: Direction, wavelengthM: number): { count: number; lobes: GratingLobe[] } {
  const { first, second } = reciprocalLattice(lattice);
  // first has the only u part, so orders of m are bounded by u alone, and those of n by v at that m.
  const uStep = wavelengthM * first[0];
  const vStep = wavelengthM * second[1];
  const found: { radius: number; u: number; v: number; orderX: number; orderY: number }[] = [];
  let count = 0;
  for (let m = Math.ceil((-1 - beam.u) / uStep) + 0; m <= (1 - beam.u) / uStep; m++) {
    const u = beam.u + m * uStep;
    const reach = Math.sqrt(Math.max(0, 1 - u * u));
    const v0 = beam.v + m * wavelengthM * first[1];
    // Adding 0 turns the -0 of Math.ceil into 0.
    const lowest = Math.ceil((-reach - v0) / vStep) + 0;
    const highest = Math.floor((reach - v0) / vStep);
    count += Math.max(0, highest - lowest + 1) - (m === 0 ? 1 : 0);
    for (let n = lowest; n <= Math.min(highest, lowest + MOST_LISTED); n++) {
      if (m === 0 && n === 0) continue;
      const v = v0 + n * vStep;
      if (found.length < MOST_LISTED * 4) found.push({ radius: Math.hypot(u, v), u, v, orderX: m, orderY: n });
    }
  }
  found.sort((a, b) => a.radius - b.radius);
  const lobes = found.slice(0, MOST_LISTED).map(({ u, v, orderX, orderY }) => {
    const { thetaRad, phiRad } = anglesOf(outwardDirection(u, v));
    return { thetaDeg: degFromRad(thetaRad), phiDeg: degFromRad(phiRad), orderX, orderY };
  });
  return { count, lobes };
}
