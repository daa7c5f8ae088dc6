/** Ten times the decimal logarithm of a power ratio; -Infinity for 0. Inverse: {@link dbToPowerRatio}. */
export function powerRatioToDb(powerRatio: number): number {
  return 10 * Math.log10(powerRatio);
}

/** Twenty times the decimal logarithm of an amplitude ratio; -Infinity for 0. Inverse: {@link dbToAmplitudeRatio}. */
export function amplitudeRatioToDb(amplitudeRatio: number): number {
  return 20 * Math.log10(amplitudeRatio);
}

/** Inverse: {@link powerRatioToDb}. */
export function dbToPowerRatio(db: number): number {
  return 10 ** (db / 10);
}

/** Inverse: {@link amplitudeRatioToDb}. */
export function dbToAmplitudeRatio(db: number): number {
  return 10 ** (db / 20);
}
