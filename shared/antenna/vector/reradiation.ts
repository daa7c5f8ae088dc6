import type { Polarisation } from '../../model/design-document';
import type { Complex, SphericalField } from '../../waves/polarisation';
import { circularComponents, ludwig3X, ludwig3Y, type CoCross } from '../../waves/polarisation';
import { anglesOf, type Direction } from '../../waves/conventions';
import type { LocalWave } from './local-wave';

/**
 * How a cell's leaving waves make a far field. `power-wave`: the waves b themselves, with sqrt(cos theta) towards the far
 * field, so that power is conserved between incidence and beam at any angles. `aperture`: the leaving tangential field on a
 * conducting plane (magnetic currents 2 E x z), the form of textbooks; at oblique angles it gains or loses power.
 */
export type Reradiation = 'power-wave' | 'aperture';

/** x and y components. */
export interface TangentialField {
  readonly x: Complex;
  readonly y: Complex;
}

/** Weights of b_TE and b_TM in what is re-radiated: 1 for power waves, 1/sqrt c and sqrt c for the tangential field. */
export function waveWeights(form: Reradiation, cosIncidence: number): { te: number; tm: number } {
  if (form === 'power-wave') return { te: 1, tm: 1 };
  const root = Math.sqrt(cosIncidence);
  return { te: 1 / root, tm: root };
}

/** What a leaving wave re-radiates: b_TE phi_i + b_TM rho, or the tangential field e_TE phi_i + e_TM rho. */
export function reradiatedField(wave: LocalWave, form: Reradiation): TangentialField {
  const { cosAzimuth: c, sinAzimuth: s } = wave;
  const { te, tm } = waveWeights(form, wave.cosIncidence);
  return {
    x: { re: c * tm * wave.tmRe - s * te * wave.teRe, im: c * tm * wave.tmIm - s * te * wave.teIm },
    y: { re: s * tm * wave.tmRe + c * te * wave.teRe, im: s * tm * wave.tmIm + c * te * wave.teIm },
  };
}

/**
 * Far field components of a sum of re-radiated fields f = (f_x, f_y) at a direction, cell factor, cell area and 1/lambda left out:
 * E_theta = f.rho_o and E_phi = cos(theta) f.phi_o for the aperture, sqrt(cos theta) for both with power waves.
 */
export function sphericalField(sum: TangentialField, direction: Direction, form: Reradiation): SphericalField {
  const { phiRad } = anglesOf(direction);
  const [c, s] = [Math.cos(phiRad), Math.sin(phiRad)];
  const root = Math.sqrt(Math.max(0, direction.w));
  const [weightTheta, weightPhi] = form === 'power-wave' ? [root, root] : [1, direction.w];
  const { x, y } = sum;
  return {
    theta: { re: weightTheta * (x.re * c + y.re * s), im: weightTheta * (x.im * c + y.im * s) },
    phi: { re: weightPhi * (y.re * c - x.re * s), im: weightPhi * (y.im * c - x.im * s) },
  };
}

/** Co- and cross-polar parts for a wanted polarisation: Ludwig's third definition, or the two circular senses. */
export function coAndCross(field: SphericalField, direction: Direction, polarisation: Polarisation): CoCross {
  const { phiRad } = anglesOf(direction);
  if (polarisation === 'x') return ludwig3X(field, phiRad);
  if (polarisation === 'y') return ludwig3Y(field, phiRad);
  const { right, left } = circularComponents(field);
  return polarisation === 'rhcp' ? { co: right, cross: left } : { co: left, cross: right };
}

/** The co- and cross-polar far field as linear forms of (f_x, f_y) at one direction. */
export interface PolarisationRows {
  readonly coX: Complex;
  readonly coY: Complex;
  readonly crossX: Complex;
  readonly crossY: Complex;
}

export function polarisationRows(direction: Direction, polarisation: Polarisation, form: Reradiation): PolarisationRows {
  const [one, zero] = [{ re: 1, im: 0 }, { re: 0, im: 0 }];
  const ofX = coAndCross(sphericalField({ x: one, y: zero }, direction, form), direction, polarisation);
  const ofY = coAndCross(sphericalField({ x: zero, y: one }, direction, form), direction, polarisation);
  return { coX: ofX.co, coY: ofY.co, crossX: ofX.cross, crossY: ofY.cross };
}
