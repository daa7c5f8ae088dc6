import type { Direction } from '../waves/conventions';
import { outwardDirection } from '../waves/conventions';
import type { ApertureField } from './aperture-field';
import { apertureSpectrum, type ApertureSpectrum } from './aperture-spectrum';
import { farFieldOf, type FarField } from './far-field';
import { radiatedPower } from './radiated-power';

/** Everything that the figures and cuts ask of one aperture field at one frequency. */
export interface RadiationPattern {
  readonly wavenumber: number;
  /** Exponent b of the element factor cos^b(theta), in field. */
  readonly radiateExponent: number;
  readonly spectrum: ApertureSpectrum;
  readonly farField: FarField;
  /** Integral of |F|^2 over the outward hemisphere. */
  readonly radiatedPower: number;
}

export function radiationPattern(field: ApertureField, wavenumber: number, radiateExponent: number): RadiationPattern {
  const spectrum = apertureSpectrum(field);
  return {
    wavenumber,
    radiateExponent,
    spectrum,
    farField: farFieldOf(field, spectrum, wavenumber),
    radiatedPower: radiatedPower(spectrum, wavenumber, radiateExponent),
  };
}

/** Element factor in power, cos^2b(theta), zero behind the panel. */
export function elementPower(cosTheta: number, radiateExponent: number): number {
  if (cosTheta < 0) return 0;
  return radiateExponent === 0.5 ? cosTheta : Math.pow(cosTheta, 2 * radiateExponent);
}

/** Directivity as a ratio, 4 pi |F|^2 over the integral of |F|^2 over the outward hemisphere. */
export function directivityRatio(pattern: RadiationPattern, direction: Direction): number {
  if (direction.w < 0) return 0;
  const power = pattern.farField.powerAt(direction.u, direction.v) * elementPower(direction.w, pattern.radiateExponent);
  return (4 * Math.PI * power) / pattern.radiatedPower;
}

/** The same for tangential cosines inside the unit circle. */
export function directivityRatioAt(pattern: RadiationPattern, u: number, v: number): number {
  return directivityRatio(pattern, outwardDirection(u, v));
}
