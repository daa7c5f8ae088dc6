import type { ApertureField } from './aperture-field';
import type { ApertureSpectrum } from './aperture-spectrum';
import { exactFarField } from './exact-far-field';
import { interpolatedFarField, interpolatedLine, type FieldValue } from './interpolated-far-field';

/** Array factor and its derivatives to u and v at one direction. Reused between calls. */
export interface FarFieldSample {
  re: number;
  im: number;
  uRe: number;
  uIm: number;
  vRe: number;
  vIm: number;
  uuRe: number;
  uuIm: number;
  uvRe: number;
  uvIm: number;
  vvRe: number;
  vvIm: number;
}

export function newFarFieldSample(): FarFieldSample {
  return { re: 0, im: 0, uRe: 0, uIm: 0, vRe: 0, vIm: 0, uuRe: 0, uuIm: 0, uvRe: 0, uvIm: 0, vvRe: 0, vvIm: 0 };
}

/** F(u, v) = sum of a_n exp(+j k (x_n u + y_n v)), element factor not applied, phase origin in the middle of the panel. */
export interface FarField {
  /** |F|^2. */
  powerAt(u: number, v: number): number;
  /** F itself, up to a phase that all fields on one grid share; the same object every time. */
  fieldAt(u: number, v: number): FieldValue;
  /** Fixes u; what it gives is F at any v of that line, at a fraction of the cost. Valid until the next line is asked for. */
  lineAt(u: number): (v: number) => FieldValue;
  /** F with first and second derivatives; the same object every time. */
  derivativesAt(u: number, v: number): FarFieldSample;
}

/** Below this many grid points a plain sum costs less than interpolating. */
const SUMMED_DIRECTLY = 600;
/** Step of the difference quotients: phase, in rad, that it makes at the edge of the panel. */
const DIFFERENCE_RAD = 0.05;

/** Far field by whichever way is cheaper: exact sums for small panels, interpolation of the spectrum for the others. */
export function farFieldOf(field: ApertureField, spectrum: ApertureSpectrum, wavenumber: number): FarField {
  if (field.re.length <= SUMMED_DIRECTLY) return exactFarField(field, wavenumber);
  const at = interpolatedFarField(spectrum, wavenumber);
  const { grid } = spectrum;
  const stepU = (2 * DIFFERENCE_RAD) / (wavenumber * grid.columnCount * grid.stepXM);
  const stepV = (2 * DIFFERENCE_RAD) / (wavenumber * grid.rowCount * grid.stepYM);
  return {
    powerAt: (u, v) => {
      const { re, im } = at(u, v);
      return re * re + im * im;
    },
    fieldAt: at,
    lineAt: interpolatedLine(spectrum, wavenumber),
    derivativesAt: differenceQuotients(at, stepU, stepV),
  };
}

/**
 * Central differences over nine points. They serve to find where a climb goes next; their error, of the order of
 * DIFFERENCE_RAD^2, slows the climb by as little and does not move its end, since only steps that climb are taken.
 */
function differenceQuotients(
  at: (u: number, v: number) => { re: number; im: number },
  stepU: number,
  stepV: number,
): (u: number, v: number) => FarFieldSample {
  const sample = newFarFieldSample();
  const re = new Float64Array(9);
  const im = new Float64Array(9);
  return (u, v) => {
    for (let i = 0; i < 9; i++) {
      const value = at(u + ((i % 3) - 1) * stepU, v + (Math.floor(i / 3) - 1) * stepV);
      re[i] = value.re;
      im[i] = value.im;
    }
    // Points 3, 4, 5 lie along u and 1, 4, 7 along v.
    [sample.re, sample.im] = [re[4], im[4]];
    [sample.uRe, sample.uIm] = [(re[5] - re[3]) / (2 * stepU), (im[5] - im[3]) / (2 * stepU)];
    [sample.vRe, sample.vIm] = [(re[7] - re[1]) / (2 * stepV), (im[7] - im[1]) / (2 * stepV)];
    sample.uuRe = (re[5] - 2 * re[4] + re[3]) / (stepU * stepU);
    sample.uuIm = (im[5] - 2 * im[4] + im[3]) / (stepU * stepU);
    sample.vvRe = (re[7] - 2 * re[4] + re[1]) / (stepV * stepV);
    sample.vvIm = (im[7] - 2 * im[4] + im[1]) / (stepV * stepV);
    sample.uvRe = (re[8] - re[6] - re[2] + re[0]) / (4 * stepU * stepV);
    sample.uvIm = (im[8] - im[6] - im[2] + im[0]) / (4 * stepU * stepV);
    return sample;
  };
}
