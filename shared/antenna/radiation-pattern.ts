import type { Direction } from '../waves/conventions';
import { outwardDirection } from '../waves/conventions';
import type { ApertureField } from './aperture-field';
import { apertureSpectrum, type ApertureSpectrum } from './aperture-spectrum';
import { farFieldOf, type FarField } from './far-field';
import type { FieldValue } from './interpolated-far-field';
import { radiatedPower } from './radiated-power';

/** What multiplies the pattern's own array factor and the second one of a blend at a direction. */
export interface BlendWeights {
  own: number;
  otherRe: number;
  otherIm: number;
}

/** A second array factor on the same grid that takes part in the field, as the two tangential components of a panel do. */
export interface PatternBlend {
  readonly spectrum: ApertureSpectrum;
  readonly farField: FarField;
  /** Smooth weights at a direction in front of the panel, written into `out`; the element factor is part of them. */
  weigh(u: number, v: number, w: number, out: BlendWeights): BlendWeights;
}

/** Everything that the figures and cuts ask of one aperture field at one frequency. */
export interface RadiationPattern {
  readonly wavenumber: number;
  /** Exponent b of the element factor cos^b(theta), in field. */
  readonly radiateExponent: number;
  readonly spectrum: ApertureSpectrum;
  readonly farField: FarField;
  /** Integral of |field|^2 over the outward hemisphere, of all polarisations where there are several. */
  readonly radiatedPower: number;
  /** Absent where the field is the element factor times the one array factor. */
  readonly blend?: PatternBlend;
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

const weights: BlendWeights = { own: 0, otherRe: 0, otherIm: 0 };

/** |field|^2 from the array factors at a direction in front of the panel, element factor or weights included. */
export function blendedPower(blend: PatternBlend, { u, v, w }: Direction, own: FieldValue, other: FieldValue): number {
  blend.weigh(u, v, w, weights);
  const re = weights.own * own.re + weights.otherRe * other.re - weights.otherIm * other.im;
  const im = weights.own * own.im + weights.otherRe * other.im + weights.otherIm * other.re;
  return re * re + im * im;
}

/** |field|^2 in a direction, zero behind the panel. */
export function patternPower(pattern: RadiationPattern, direction: Direction): number {
  const { u, v, w } = direction;
  if (w < 0) return 0;
  const { blend, farField } = pattern;
  if (!blend) return farField.powerAt(u, v) * elementPower(w, pattern.radiateExponent);
  return blendedPower(blend, direction, farField.fieldAt(u, v), blend.farField.fieldAt(u, v));
}

/** |field|^2 along a line of constant u, for a blend. */
export function blendedLine({ farField }: RadiationPattern, blend: PatternBlend, u: number): (v: number, w: number) => number {
  const own = farField.lineAt(u);
  const other = blend.farField.lineAt(u);
  return (v, w) => blendedPower(blend, { u, v, w }, own(v), other(v));
}

/** Directivity as a ratio, 4 pi |field|^2 over the radiated power. */
export function directivityRatio(pattern: RadiationPattern, direction: Direction): number {
  return (4 * Math.PI * patternPower(pattern, direction)) / pattern.radiatedPower;
}

/** The same for tangential cosines inside the unit circle. */
export function directivityRatioAt(pattern: RadiationPattern, u: number, v: number): number {
  return directivityRatio(pattern, outwardDirection(u, v));
}
