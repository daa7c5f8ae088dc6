import type { FieldSample } from './vector-horn';

/**
 * A plane wave at a cell in its own plane of incidence. rho is the tangential part of the direction of travel, of unit
 * length; phi_i = z x rho. E_TE = E.phi_i, E_TM = E.rho (tangential). The waves are a_TE = E_TE sqrt c, a_TM = E_TM / sqrt c with c
 * the cosine of incidence, so that |a_TE|^2 + |a_TM|^2 is the power that passes a unit of the panel's area.
 */
export interface LocalWave {
  cosIncidence: number;
  /** rho = (cosAzimuth, sinAzimuth): the direction of travel, not that towards the horn. */
  cosAzimuth: number;
  sinAzimuth: number;
  teRe: number;
  teIm: number;
  tmRe: number;
  tmIm: number;
}

export function newLocalWave(): LocalWave {
  return { cosIncidence: 1, cosAzimuth: 1, sinAzimuth: 0, teRe: 0, teIm: 0, tmRe: 0, tmIm: 0 };
}

/** Nearer to normal incidence than this there is no plane of incidence and x stands for rho. */
const NORMAL = 1e-9;

/** Waves a of a field that travels along the unit direction (dx, dy, dz), written into `out`. */
export function localWave(field: FieldSample, [dx, dy, dz]: readonly [number, number, number], out: LocalWave): LocalWave {
  const transverse = Math.sqrt(dx * dx + dy * dy);
  const isNormal = transverse < NORMAL;
  const cosine = Math.abs(dz);
  const root = Math.sqrt(cosine);
  const c = isNormal ? 1 : dx / transverse;
  const s = isNormal ? 0 : dy / transverse;
  out.cosIncidence = cosine;
  out.cosAzimuth = c;
  out.sinAzimuth = s;
  out.teRe = (c * field.yRe - s * field.xRe) * root;
  out.teIm = (c * field.yIm - s * field.xIm) * root;
  out.tmRe = (c * field.xRe + s * field.yRe) / root;
  out.tmIm = (c * field.xIm + s * field.yIm) / root;
  return out;
}
