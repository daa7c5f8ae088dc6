const DEG = Math.PI / 180;

export interface PolarDirection {
  readonly thetaDeg: number;
  readonly phiDeg: number;
}

/** az = atan2(x, z), el = asin(y) of the unit vector: the axes of the panel, y upwards. */
export interface AzElDirection {
  readonly azimuthDeg: number;
  readonly elevationDeg: number;
}

export function azElOf({ thetaDeg, phiDeg }: PolarDirection): AzElDirection {
  const x = Math.sin(thetaDeg * DEG) * Math.cos(phiDeg * DEG);
  const y = Math.sin(thetaDeg * DEG) * Math.sin(phiDeg * DEG);
  return { azimuthDeg: tidy(Math.atan2(x, Math.cos(thetaDeg * DEG)) / DEG), elevationDeg: tidy(Math.asin(y) / DEG) };
}

/** Inverse of {@link azElOf}; phi is 0 where theta is 0. */
export function polarOf({ azimuthDeg, elevationDeg }: AzElDirection): PolarDirection {
  const x = Math.sin(azimuthDeg * DEG) * Math.cos(elevationDeg * DEG);
  const y = Math.sin(elevationDeg * DEG);
  const z = Math.cos(azimuthDeg * DEG) * Math.cos(elevationDeg * DEG);
  const thetaDeg = tidy(Math.atan2(Math.hypot(x, y), z) / DEG);
  return { thetaDeg, phiDeg: thetaDeg === 0 ? 0 : tidy(Math.atan2(y, x) / DEG) };
}

/** Takes away what the round trip through sines leaves in the tenth decimal. */
function tidy(deg: number): number {
  const rounded = Math.round(deg * 1e10) / 1e10;
  return rounded === 0 ? 0 : rounded;
}

/** Tangential wavenumber k sin(theta) in rad/m. */
export function tangentialWavenumberRadPerM(wavelengthMm: number, thetaDeg: number): number {
  return ((2 * Math.PI) / (wavelengthMm / 1000)) * Math.sin(thetaDeg * DEG);
}
