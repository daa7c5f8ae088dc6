import { SPEED_OF_LIGHT_M_PER_S } from '../../units/constants';
import { powerRatioToDb } from '../../units/decibels';

/** A circular panel of diameter D lit from a height F over its centre. */
export interface CentredAperture {
  readonly diameterM: number;
  readonly focalLengthM: number;
}

/** How much longer the way to the rim is than that to the centre: sqrt(F^2 + D^2/4) - F. */
export function rimPathDifferenceM({ diameterM, focalLengthM }: CentredAperture): number {
  return Math.hypot(focalLengthM, diameterM / 2) - focalLengthM;
}

/** Phase error at the rim against the centre when phases are frozen at f0 and used at f0 + offset: 2 pi S (f - f0) / c. */
export function rimPhaseErrorRad(aperture: CentredAperture, offsetHz: number): number {
  return (2 * Math.PI * rimPathDifferenceM(aperture) * offsetHz) / SPEED_OF_LIGHT_M_PER_S;
}

/**
 * Gain lost by a uniform centre-fed circular aperture whose ideal phases are frozen: |mean of exp(-j dk (R - F))|^2. With
 * r dr = R dR the mean over the disc is the integral of R exp(-j a R) from F to the rim, which has a closed form.
 * Differential spatial phase delay: J. Huang, J. A. Encinar, Reflectarray Antennas, 2007, ch. 3; D. M. Pozar, Electronics
 * Letters 39(21), 1490-1491, 2003 (both from memory).
 */
export function frozenPhaseLossDb(aperture: CentredAperture, offsetHz: number): number {
  const a = (2 * Math.PI * offsetHz) / SPEED_OF_LIGHT_M_PER_S;
  const from = aperture.focalLengthM;
  const to = from + rimPathDifferenceM(aperture);
  // Where the phases hardly differ the closed form loses all its digits to cancellation.
  if (Math.abs(a) * (to - from) < 1e-4) return 0;
  const edge = (x: number): { re: number; im: number } => ({ re: Math.cos(a * x) + a * x * Math.sin(a * x), im: a * x * Math.cos(a * x) - Math.sin(a * x) });
  const [upper, lower] = [edge(to), edge(from)];
  const mean = Math.hypot(upper.re - lower.re, upper.im - lower.im) / (a * a) / ((to * to - from * from) / 2);
  return powerRatioToDb(mean * mean);
}
