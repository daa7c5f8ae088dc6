import { besselRatio } from '../math/bessel';

/**
 * Power that two equal cells at a distance exchange: the integral over the outward hemisphere of
 * cos^m(theta) exp(j k r.u) dOmega, z = k r, closed by Sonine's first integral:
 * K_m(z) = 2 pi 2^mu Gamma(mu + 1) J_{mu+1}(z) / z^{mu+1}, mu = (m - 1)/2, K_m(0) = 2 pi / (m + 1)
 * (G. N. Watson, Theory of Bessel Functions, 1944, section 12.11, from memory; agrees with quadrature in the spec).
 * m is the exponent of the element's power pattern, twice that of its field. Valid for any m >= 0.
 */
export function hemisphereKernel(powerExponent: number, z: number): number {
  return ((2 * Math.PI) / (powerExponent + 1)) * besselRatio((powerExponent + 1) / 2, z);
}
