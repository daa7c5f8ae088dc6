import { SPEED_OF_LIGHT_M_PER_S } from '../units/constants';

/** What a waveguide simulator imitates with its dominant mode TE10. */
export interface SimulatedIncidence {
  /** Angle of the TE wave, in the H plane: sin theta = lambda / 2a. Never 0, and it changes with frequency. */
  readonly thetaRad: number;
  /** For de-embedding: k cos theta is the propagation constant of the guide. */
  readonly guideWavelengthM: number;
}

/** A rectangular guide of width a at a frequency, or undefined below its cutoff (P. W. Hannan, M. A. Balfour, IEEE Trans. AP 13(3), 1965). */
export function waveguideSimulator(widthM: number, frequencyHz: number): SimulatedIncidence | undefined {
  const wavelengthM = SPEED_OF_LIGHT_M_PER_S / frequencyHz;
  const sine = wavelengthM / (2 * widthM);
  if (sine >= 1) return undefined;
  const thetaRad = Math.asin(sine);
  return { thetaRad, guideWavelengthM: wavelengthM / Math.cos(thetaRad) };
}

export interface FreeSpaceReading {
  /** Measured reflection over that of a metal plate, isolation taken off both. */
  readonly ratioRe: number;
  readonly ratioIm: number;
  readonly frequencyHz: number;
  readonly thetaRad: number;
  /** Positive where the plane of the cell lies nearer to the source than the face of the plate. */
  readonly nearerM: number;
}

/** Phase of the shift of the reference plane, -2 k cos(theta) delta with exp(+j omega t). */
export function planeShiftRad({ frequencyHz, thetaRad, nearerM }: Pick<FreeSpaceReading, 'frequencyHz' | 'thetaRad' | 'nearerM'>): number {
  return ((-4 * Math.PI * frequencyHz) / SPEED_OF_LIGHT_M_PER_S) * Math.cos(thetaRad) * nearerM;
}

/** Reflection of the cell in its own plane, -ratio exp(-j 2 k cos(theta) delta): the plate reflects -1. */
export function deembeddedReflection(reading: FreeSpaceReading): { readonly re: number; readonly im: number } {
  const shift = planeShiftRad(reading);
  const [cosine, sine] = [Math.cos(shift), Math.sin(shift)];
  return { re: -(reading.ratioRe * cosine - reading.ratioIm * sine), im: -(reading.ratioRe * sine + reading.ratioIm * cosine) };
}
