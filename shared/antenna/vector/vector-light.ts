import type { PanelLattice } from '../panel-lattice';
import type { SiHorn, SiPlaneWave } from '../si-design';
import { localWave, newLocalWave, type LocalWave } from './local-wave';
import { polarisationVector } from './polarisation-vector';
import { newFieldSample, vectorHornPattern, type FieldSample } from './vector-horn';

/** Waves a_TE and a_TM at every cell, their path phase -k path left out, in one plane of incidence each: see LocalWave. */
export interface VectorWaves {
  readonly teRe: Float64Array;
  readonly teIm: Float64Array;
  readonly tmRe: Float64Array;
  readonly tmIm: Float64Array;
}

/** What arrives at every cell as a vector, at every frequency. */
export interface VectorLight extends VectorWaves {
  readonly cosIncidence: Float64Array;
  /** rho, the tangential direction of travel. */
  readonly cosAzimuth: Float64Array;
  readonly sinAzimuth: Float64Array;
}

export function newVectorWaves(count: number): VectorWaves {
  return { teRe: new Float64Array(count), teIm: new Float64Array(count), tmRe: new Float64Array(count), tmIm: new Float64Array(count) };
}

/** What arrives through free space, with a direction at every cell. */
export type RayIllumination = SiHorn | SiPlaneWave;

/** The wave at one point of the panel, by the field there. */
type WaveAt = (xM: number, yM: number, out: LocalWave) => LocalWave;

/** Gives the vector wave that arrives at any point of the panel. */
export function vectorWaveSampler(illumination: RayIllumination): WaveAt {
  return illumination.kind === 'horn' ? hornWaves(illumination) : planeWaves(illumination);
}

function hornWaves(horn: SiHorn): WaveAt {
  const fieldAt = vectorHornPattern(horn);
  const field = newFieldSample();
  const { xM: hornX, yM: hornY, zM: hornZ } = horn.position;
  return (xM, yM, out) => {
    const [ax, ay, az] = [xM - hornX, yM - hornY, -hornZ];
    const distance = Math.sqrt(ax * ax + ay * ay + az * az);
    const [dx, dy, dz] = [ax / distance, ay / distance, az / distance];
    fieldAt(dx, dy, dz, field);
    spread(field, 1 / distance);
    return localWave(field, [dx, dy, dz], out);
  };
}

function spread(field: FieldSample, scale: number): void {
  field.xRe *= scale;
  field.xIm *= scale;
  field.yRe *= scale;
  field.yIm *= scale;
  field.zRe *= scale;
  field.zIm *= scale;
}

/** Amplitude 1 everywhere, as in the scalar model; it travels against the direction it comes from. */
function planeWaves({ source, polarisation }: SiPlaneWave): WaveAt {
  const travel = [-source.u, -source.v, -source.w] as const;
  const { re, im } = polarisationVector(travel, polarisation);
  const field: FieldSample = { xRe: re[0], xIm: im[0], yRe: re[1], yIm: im[1], zRe: re[2], zIm: im[2] };
  return (_xM, _yM, out) => localWave(field, travel, out);
}

export function vectorLight(illumination: RayIllumination, { count, xM, yM }: Pick<PanelLattice, 'count' | 'xM' | 'yM'>): VectorLight {
  const waveAt = vectorWaveSampler(illumination);
  const wave = newLocalWave();
  const light = { ...newVectorWaves(count), cosIncidence: new Float64Array(count), cosAzimuth: new Float64Array(count), sinAzimuth: new Float64Array(count) };
  for (let n = 0; n < count; n++) {
    waveAt(xM[n], yM[n], wave);
    light.cosIncidence[n] = wave.cosIncidence;
    light.cosAzimuth[n] = wave.cosAzimuth;
    light.sinAzimuth[n] = wave.sinAzimuth;
    light.teRe[n] = wave.teRe;
    light.teIm[n] = wave.teIm;
    light.tmRe[n] = wave.tmRe;
    light.tmIm[n] = wave.tmIm;
  }
  return light;
}

/** Sum of |a|^2 over the cells: times the area of one, the power that passes the panel. */
export function wavePower(waves: VectorWaves): number {
  let sum = 0;
  for (let n = 0; n < waves.teRe.length; n++) sum += waves.teRe[n] ** 2 + waves.teIm[n] ** 2 + waves.tmRe[n] ** 2 + waves.tmIm[n] ** 2;
  return sum;
}
