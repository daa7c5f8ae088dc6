import { integrate } from '../../math/quadrature';

/** The reflector that a horn of field cos^q lights from its axis. */
export type FedAperture = 'flat' | 'paraboloid';

/**
 * Half angle that an aperture subtends at a feed on its axis: atan(D/2F) of a flat panel, 2 atan(D/4F) of a paraboloid;
 * 45 and 53.13 degrees at F/D = 0.5.
 */
export function subtendedHalfAngleRad(focalRatio: number, kind: FedAperture): number {
  return kind === 'flat' ? Math.atan(0.5 / focalRatio) : 2 * Math.atan(0.25 / focalRatio);
}

/** Exponent q of the field from the half width at a level in power dB below the axis: q = level / (20 log cos theta). Check feed-07. */
export function feedExponentOfHalfWidth(halfWidthRad: number, levelDb: number): number {
  return levelDb / (20 * Math.log10(Math.cos(halfWidthRad)));
}

/** Exponent q that gives a flat panel an edge taper: the edge has cos^(q+1), pattern and spreading. */
export function feedExponentOfEdgeTaper(edgeTaperDb: number, halfAngleRad: number): number {
  return feedExponentOfHalfWidth(halfAngleRad, edgeTaperDb) - 1;
}

const SIZE = { nodes: 16, panels: 8 };

/**
 * Spillover times taper of a round aperture lit from its axis, by the aperture integral
 *   eta = 2 (2q+1) |integral of cos^q(theta) g(theta) dtheta|^2 / tan^2(theta_e)            (flat, g = tan theta cos^(-1/2))
 *   eta = 2 (2q+1) cot^2(theta_e/2) |integral of cos^q(theta) tan(theta/2) dtheta|^2        (paraboloid)
 * For the flat panel the cell receives with cos^(1/2) of the incidence in field, which conserves energy.
 * Sources: S. Silver, Microwave Antenna Theory and Design, 1949, ch. 12 (from memory) and the closed form of the flat
 * panel, checks feed-04 and feed-05. Valid for 0 < half angle < 90 degrees, q >= 0.
 */
export function feedEfficiency(exponent: number, halfAngleRad: number, kind: FedAperture): number {
  if (!(halfAngleRad > 0 && halfAngleRad < Math.PI / 2) && kind === 'flat') throw new RangeError(`the half angle must lie between 0 and 90 degrees; got ${halfAngleRad} rad`);
  const gain = 2 * (2 * exponent + 1);
  if (kind === 'paraboloid') {
    const sum = integrate((theta) => Math.cos(theta) ** exponent * Math.tan(theta / 2), 0, halfAngleRad, SIZE);
    return (gain * sum * sum) / Math.tan(halfAngleRad / 2) ** 2;
  }
  // rho = F tan(theta), spreading cos(theta), incidence cos^(1/2): cos^(q + 3/2) rho drho = F^2 cos^(q - 3/2) sin(theta) dtheta.
  const sum = integrate((theta) => Math.cos(theta) ** (exponent - 1.5) * Math.sin(theta), 0, halfAngleRad, SIZE);
  return (gain * sum * sum) / Math.tan(halfAngleRad) ** 2;
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** The exponent with the largest product of spillover and taper, by golden section. Check feed-05. */
export function bestFeedExponent(halfAngleRad: number, kind: FedAperture): number {
  let [low, high] = [0.05, 200];
  while (high - low > 1e-5) {
    const [a, b] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
    if (feedEfficiency(a, halfAngleRad, kind) > feedEfficiency(b, halfAngleRad, kind)) high = b;
    else low = a;
  }
  return (low + high) / 2;
}
