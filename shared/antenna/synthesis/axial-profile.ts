import { fallingEdge, highestNear } from './line-search';

/** Cells as point sources with their complex field, and the line on which the level is asked. */
export interface AxialSources {
  readonly xM: Float64Array;
  readonly yM: Float64Array;
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly wavenumber: number;
  /** Exponent b of the element factor (z/r)^b, in field. */
  readonly radiateExponent: number;
  /** Unit vector of the line from the panel's centre. */
  readonly along: readonly [number, number, number];
}

/**
 * Level on the line, S(s) = |sum a_n (z/r_n)^b exp(-j k r_n) / r_n|^2 with r_n the distance from cell n to the point at s.
 * Spherical waves from every cell, so it holds from a wavelength or so away; the panel's own reactive field is not in it.
 */
export function axialLevel({ xM, yM, re, im, wavenumber, radiateExponent, along }: AxialSources, distanceM: number): number {
  const [px, py, pz] = along.map((part) => part * distanceM);
  let [sumRe, sumIm] = [0, 0];
  for (let n = 0; n < xM.length; n++) {
    const r = Math.sqrt((px - xM[n]) ** 2 + (py - yM[n]) ** 2 + pz * pz);
    const size = (radiateExponent === 0.5 ? Math.sqrt(pz / r) : Math.pow(pz / r, radiateExponent)) / r;
    const [cosine, sine] = [size * Math.cos(wavenumber * r), size * Math.sin(wavenumber * r)];
    sumRe += re[n] * cosine + im[n] * sine;
    sumIm += im[n] * cosine - re[n] * sine;
  }
  return sumRe * sumRe + sumIm * sumIm;
}

export interface AxialMaximum {
  readonly distanceM: number;
  readonly level: number;
  /** Where the level falls to half, when it does within the scan. */
  readonly nearHalfM?: number;
  readonly farHalfM?: number;
  /** Samples of the scan, evenly spaced in 1/s, in rising s. */
  readonly sampleM: Float64Array;
  readonly sampleLevel: Float64Array;
}

export interface AxialScan {
  readonly fromM: number;
  readonly toM: number;
  readonly samples: number;
}

/**
 * The highest level on the line within the scan and its half-power points. Even steps in 1/s follow the Fresnel ripple of
 * the near zone, whose period is constant in 1/s.
 */
export function axialMaximum(sources: AxialSources, { fromM, toM, samples }: AxialScan): AxialMaximum {
  const level = (s: number): number => axialLevel(sources, s);
  const sampleM = Float64Array.from({ length: samples }, (_, i) => 1 / (1 / fromM + ((1 / toM - 1 / fromM) * i) / (samples - 1)));
  const sampleLevel = sampleM.map(level);
  let top = 0;
  for (let i = 1; i < samples; i++) if (sampleLevel[i] > sampleLevel[top]) top = i;
  const distanceM = highestNear(level, sampleM[Math.max(0, top - 1)], sampleM[Math.min(samples - 1, top + 1)]);
  const half = level(distanceM) / 2;
  const crossing = (direction: 1 | -1): number | undefined => {
    let i = top;
    while (i >= 0 && i < samples && sampleLevel[i] > half) i += direction;
    return i < 0 || i >= samples ? undefined : fallingEdge(level, half, sampleM[i - direction], sampleM[i]);
  };
  return { distanceM, level: level(distanceM), nearHalfM: crossing(-1), farHalfM: crossing(1), sampleM, sampleLevel };
}
