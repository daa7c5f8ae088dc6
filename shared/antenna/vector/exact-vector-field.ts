import type { Direction } from '../../waves/conventions';
import type { SphericalField } from '../../waves/polarisation';
import { normalisedSinc, sharedCellFactor, type CellFactor } from './cell-factor';
import { hemispherePower } from './hemisphere-power';
import { sphericalField, waveWeights, type Reradiation } from './reradiation';
import type { VectorLight, VectorWaves } from './vector-light';
import type { VectorPatternQuery } from './vector-pattern';

export interface ExactFieldQuery {
  readonly lattice: Pick<VectorPatternQuery['lattice'], 'count' | 'xM' | 'yM' | 'cellAreaM2'>;
  /** Sides of a cell, for its factor. */
  readonly sideXM: number;
  readonly sideYM: number;
  readonly light: Pick<VectorLight, 'cosIncidence' | 'cosAzimuth' | 'sinAzimuth'>;
  readonly pathM: Float64Array;
  readonly leaving: VectorWaves;
  readonly wavenumber: number;
  readonly reradiation: Reradiation;
  readonly cellFactor: CellFactor;
  readonly beam: Direction;
}

/**
 * Far field times the distance, exp(-j k r) and the common factor j left out, as a plain sum over the cells: slow, for any cell
 * factor, and the measure that the transforms are held against.
 */
export function exactVectorField(query: ExactFieldQuery): (direction: Direction) => SphericalField {
  const { lattice, light, leaving, pathM, wavenumber, reradiation } = query;
  const factorAt = factorOfCells(query);
  const scale = (lattice.cellAreaM2 * wavenumber) / (2 * Math.PI);
  return (direction) => {
    let [xRe, xIm, yRe, yIm] = [0, 0, 0, 0];
    for (let n = 0; n < lattice.count; n++) {
      const { te, tm } = waveWeights(reradiation, light.cosIncidence[n]);
      const phase = wavenumber * (lattice.xM[n] * direction.u + lattice.yM[n] * direction.v - pathM[n]);
      const size = scale * factorAt(n, direction);
      const [cosine, sine] = [size * Math.cos(phase), size * Math.sin(phase)];
      const teRe = te * (leaving.teRe[n] * cosine - leaving.teIm[n] * sine);
      const teIm = te * (leaving.teRe[n] * sine + leaving.teIm[n] * cosine);
      const tmRe = tm * (leaving.tmRe[n] * cosine - leaving.tmIm[n] * sine);
      const tmIm = tm * (leaving.tmRe[n] * sine + leaving.tmIm[n] * cosine);
      xRe += light.cosAzimuth[n] * tmRe - light.sinAzimuth[n] * teRe;
      xIm += light.cosAzimuth[n] * tmIm - light.sinAzimuth[n] * teIm;
      yRe += light.sinAzimuth[n] * tmRe + light.cosAzimuth[n] * teRe;
      yIm += light.sinAzimuth[n] * tmIm + light.cosAzimuth[n] * teIm;
    }
    return sphericalField({ x: { re: xRe, im: xIm }, y: { re: yRe, im: yIm } }, direction, reradiation);
  };
}

function factorOfCells({ light, wavenumber, sideXM, sideYM, cellFactor, beam }: ExactFieldQuery): (n: number, direction: Direction) => number {
  const sideX = (sideXM * wavenumber) / (2 * Math.PI);
  const sideY = (sideYM * wavenumber) / (2 * Math.PI);
  if (cellFactor !== 'incident') {
    const shared = sharedCellFactor(cellFactor, { sideX, sideY, beam });
    return (_n, { u, v }) => shared(u, v);
  }
  return (n, { u, v }) => {
    const sine = Math.sqrt(Math.max(0, 1 - light.cosIncidence[n] ** 2));
    return normalisedSinc((u - sine * light.cosAzimuth[n]) * sideX) * normalisedSinc((v - sine * light.sinAzimuth[n]) * sideY);
  };
}

/** Power of all polarisations that the exact field carries through the hemisphere. */
export function exactRadiatedPower(query: ExactFieldQuery): number {
  const fieldAt = exactVectorField(query);
  const { lattice, sideXM, sideYM, wavenumber } = query;
  const reach = { alongX: wavenumber * (spanOf(lattice.xM) + sideXM), alongY: wavenumber * (spanOf(lattice.yM) + sideYM) };
  return hemispherePower((u) => (v, w) => fieldPower(fieldAt({ u, v, w })), reach);
}

function spanOf(coordinates: Float64Array): number {
  const [low, high] = coordinates.reduce(([least, most], x) => [Math.min(least, x), Math.max(most, x)], [Infinity, -Infinity]);
  return Math.max(0, high - low);
}

/** |E|^2 of a far field. */
export function fieldPower({ theta, phi }: SphericalField): number {
  return theta.re * theta.re + theta.im * theta.im + phi.re * phi.re + phi.im * phi.im;
}
