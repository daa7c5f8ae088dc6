/*
 * Power density on the axis of an aperture antenna, as in FCC OET Bulletin 65, edition 97-01, 1997, equations 11 to 18
 * (12, 13, 16 and 17 confirmed in public code). An estimate of the main beam, not a survey. The bulletin writes round
 * apertures; here the true area stands in the densities and the largest dimension in the ranges, so that an aperture
 * that is not round is told too long rather than too short.
 */

export interface RadiatingAperture {
  /** Accepted by the antenna, averaged over time. */
  readonly powerW: number;
  readonly areaM2: number;
  readonly largestDimensionM: number;
  /** Gain on the axis as a ratio. */
  readonly gainRatio: number;
  readonly wavelengthM: number;
}

export interface ExposureZones {
  /** 4 P / A. */
  readonly surfaceWPerM2: number;
  /** Most of the near field: 4 eta P / A, which is 16 eta P / (pi D^2) for a round aperture. */
  readonly nearFieldWPerM2: number;
  /** D^2 / (4 lambda). */
  readonly nearFieldEndM: number;
  /** 0.6 D^2 / lambda. */
  readonly farFieldFromM: number;
}

/** Checks rf-03 and rf-04. */
export function exposureZones({ powerW, areaM2, largestDimensionM, gainRatio, wavelengthM }: RadiatingAperture): ExposureZones {
  const apertureEfficiency = (gainRatio * wavelengthM * wavelengthM) / (4 * Math.PI * areaM2);
  const squaredOverWavelength = (largestDimensionM * largestDimensionM) / wavelengthM;
  return {
    surfaceWPerM2: (4 * powerW) / areaM2,
    nearFieldWPerM2: (4 * apertureEfficiency * powerW) / areaM2,
    nearFieldEndM: squaredOverWavelength / 4,
    farFieldFromM: 0.6 * squaredOverWavelength,
  };
}

/** P G / (4 pi R^2), W/m^2. */
export function farFieldDensityWPerM2(powerW: number, gainRatio: number, distanceM: number): number {
  return (powerW * gainRatio) / (4 * Math.PI * distanceM * distanceM);
}

/** Highest density on the axis at a distance: constant in the near field, falling with R, then with R^2. */
export function densityOnAxisWPerM2(aperture: RadiatingAperture, distanceM: number): number {
  const { nearFieldWPerM2, nearFieldEndM, farFieldFromM } = exposureZones(aperture);
  if (distanceM <= nearFieldEndM) return nearFieldWPerM2;
  if (distanceM < farFieldFromM) return (nearFieldWPerM2 * nearFieldEndM) / distanceM;
  return farFieldDensityWPerM2(aperture.powerW, aperture.gainRatio, distanceM);
}

/**
 * Distance on the axis from which the estimate stays at or below a limit. 0 where the near-field maximum does so
 * already, whatever the far-field formula gives; the transition formula inside 0.6 D^2 / lambda.
 */
export function distanceToLimitM(aperture: RadiatingAperture, limitWPerM2: number): number {
  const { nearFieldWPerM2, nearFieldEndM, farFieldFromM } = exposureZones(aperture);
  if (nearFieldWPerM2 <= limitWPerM2) return 0;
  const farM = Math.sqrt((aperture.powerW * aperture.gainRatio) / (4 * Math.PI * limitWPerM2));
  if (farM >= farFieldFromM) return farM;
  return Math.min(farFieldFromM, (nearFieldWPerM2 * nearFieldEndM) / limitWPerM2);
}
