import { amplitudeRatioToDb, dbToAmplitudeRatio } from '../units/decibels';

/** A complex number. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

/** Far-field components of a wave travelling outward. */
export interface SphericalField {
  readonly theta: Complex;
  readonly phi: Complex;
}

export interface CoCross {
  readonly co: Complex;
  readonly cross: Complex;
}

const combine = (a: Complex, weightA: number, b: Complex, weightB: number): Complex => ({
  re: a.re * weightA + b.re * weightB,
  im: a.im * weightA + b.im * weightB,
});

/** a + j b, times a scale. */
const plusJ = (a: Complex, b: Complex, scale: number): Complex => ({ re: (a.re - b.im) * scale, im: (a.im + b.re) * scale });

/**
 * Ludwig's third definition with the x reference: co = E_theta cos phi - E_phi sin phi, cross = E_theta sin phi + E_phi cos phi.
 * A. C. Ludwig, IEEE Trans. Antennas Propag. 21(1), 116-119, 1973 (from memory).
 */
export function ludwig3X(field: SphericalField, phiRad: number): CoCross {
  const c = Math.cos(phiRad);
  const s = Math.sin(phiRad);
  return { co: combine(field.theta, c, field.phi, -s), cross: combine(field.theta, s, field.phi, c) };
}

/** Ludwig's third definition with the y reference: co and cross of {@link ludwig3X} change places. */
export function ludwig3Y(field: SphericalField, phiRad: number): CoCross {
  const { co, cross } = ludwig3X(field, phiRad);
  return { co: cross, cross: co };
}

/** Right and left circular components, IEEE sense, exp(+j omega t): E_R = (E_theta + j E_phi)/sqrt 2, E_L = (E_theta - j E_phi)/sqrt 2. */
export function circularComponents(field: SphericalField): { right: Complex; left: Complex } {
  const minusPhi = { re: -field.phi.re, im: -field.phi.im };
  return { right: plusJ(field.theta, field.phi, Math.SQRT1_2), left: plusJ(field.theta, minusPhi, Math.SQRT1_2) };
}

/** Cross-polar discrimination of a circular wave of given axial ratio: 20 log[(AR + 1)/(AR - 1)]; infinite at 0 dB. Inverse: {@link axialRatioDb}. */
export function crossPolarDiscriminationDb(axialRatioInDb: number): number {
  const ratio = dbToAmplitudeRatio(axialRatioInDb);
  return amplitudeRatioToDb((ratio + 1) / (ratio - 1));
}

/** Axial ratio that goes with a cross-polar discrimination. Inverse: {@link crossPolarDiscriminationDb}. */
export function axialRatioDb(discriminationDb: number): number {
  const ratio = dbToAmplitudeRatio(discriminationDb);
  return amplitudeRatioToDb((ratio + 1) / (ratio - 1));
}
