import { powerRatioToDb } from '../../units/decibels';

/** Mean loss by independent phase errors, exp(-sigma^2) in power (J. Ruze, Proc. IEEE 54(4), 1966; from memory). At most 0 dB. */
export function randomPhaseLossDb(sigmaRad: number): number {
  return powerRatioToDb(Math.exp(-sigmaRad * sigmaRad));
}

/** Phase error of a curved reflector whose surface is off by `errorM` rms: the path changes twice, 4 pi e / lambda. */
export function reflectorPhaseRad(errorM: number, wavelengthM: number): number {
  return (4 * Math.PI * errorM) / wavelengthM;
}

/** Independent errors of an array, all cells alike. */
export interface IndependentErrors {
  readonly phaseSigmaRad: number;
  /** Share of cells that radiate nothing. */
  readonly deadFraction: number;
}

/** Mean of the factor that a cell's field is multiplied with: (1 - p) exp(-sigma^2 / 2). */
export function meanFieldFactor({ phaseSigmaRad, deadFraction }: IndependentErrors): number {
  return (1 - deadFraction) * Math.exp((-phaseSigmaRad * phaseSigmaRad) / 2);
}

/**
 * Mean power in a direction under independent normal phase errors and dead cells: m^2 |F0|^2 + (1 - p - m^2) sum A^2, exact
 * for any array and direction. `errorFreePower` is |F0|^2 there, `squaresSum` the sum of the squared cell amplitudes.
 */
export function meanPower(errors: IndependentErrors, errorFreePower: number, squaresSum: number): number {
  const m = meanFieldFactor(errors);
  return m * m * errorFreePower + (1 - errors.deadFraction - m * m) * squaresSum;
}

/** Mean level far from the beam relative to it, as a power ratio: (1 - p - m^2) / (m^2 taper N). For an N large enough that the floor is low. */
export function meanFloorRatio(errors: IndependentErrors, taperRatio: number, cellCount: number): number {
  const m = meanFieldFactor(errors);
  return (1 - errors.deadFraction - m * m) / (m * m * taperRatio * cellCount);
}

/** Cells of an array with phase errors that neighbours share. */
export interface CorrelatedErrors {
  readonly sigmaRad: number;
  /** Correlation of the errors is exp(-r^2 / c^2); 0 for independent ones. */
  readonly correlationLengthM: number;
}

interface ArrayCells {
  readonly xM: ArrayLike<number>;
  readonly yM: ArrayLike<number>;
  readonly amplitude: ArrayLike<number>;
}

/**
 * Mean gain at the beam of an array whose normal phase errors are correlated, relative to the array without them:
 * sum over m, n of A_m A_n exp(-sigma^2 (1 - rho_mn)) over (sum A)^2. A power ratio; takes the square of the number of cells.
 */
export function correlatedGainRatio({ sigmaRad, correlationLengthM }: CorrelatedErrors, { xM, yM, amplitude }: ArrayCells): number {
  const variance = sigmaRad * sigmaRad;
  const apart = Math.exp(-variance);
  let sum = 0;
  let pairs = 0;
  for (let m = 0; m < amplitude.length; m++) {
    sum += amplitude[m];
    pairs += amplitude[m] * amplitude[m];
    for (let n = 0; n < m; n++) {
      const r2 = (xM[m] - xM[n]) ** 2 + (yM[m] - yM[n]) ** 2;
      const coherence = correlationLengthM > 0 ? Math.exp(-variance * (1 - Math.exp(-r2 / (correlationLengthM * correlationLengthM)))) : apart;
      pairs += 2 * amplitude[m] * amplitude[n] * coherence;
    }
  }
  return pairs / (sum * sum);
}
