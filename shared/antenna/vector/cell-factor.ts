import type { Direction } from '../../waves/conventions';

/**
 * Far-field factor C of one cell. `none`: 1. `normal`: that of a uniform cell, sinc(u px/lambda) sinc(v py/lambda). `beam`: the same about
 * the beam, whose phase slope the cell is taken to have. `incident`: about the incident wave's own slope, cell by cell; it
 * has no fast transform and is offered by exact sums alone.
 */
export type CellFactor = 'none' | 'normal' | 'beam' | 'incident';

/** Sides of a cell in wavelengths and the beam that `beam` refers to. */
export interface CellFactorSite {
  readonly sideX: number;
  readonly sideY: number;
  readonly beam: Direction;
}

/** C(u, v) of the factors that all cells share. */
export function sharedCellFactor(factor: Exclude<CellFactor, 'incident'>, { sideX, sideY, beam }: CellFactorSite): (u: number, v: number) => number {
  if (factor === 'none') return () => 1;
  const [u0, v0] = factor === 'beam' ? [beam.u, beam.v] : [0, 0];
  return (u, v) => normalisedSinc((u - u0) * sideX) * normalisedSinc((v - v0) * sideY);
}

/** sin(pi x) / (pi x). */
export function normalisedSinc(x: number): number {
  const t = Math.PI * x;
  return Math.abs(t) < 1e-8 ? 1 : Math.sin(t) / t;
}
