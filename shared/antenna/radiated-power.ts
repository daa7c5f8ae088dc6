import type { ApertureSpectrum } from './aperture-spectrum';
import { kernelSpectrum } from './kernel-spectrum';

/**
 * Integral of |F|^2 over the outward hemisphere, exact for the finite array: the sum over all pairs of cells of
 * conj(a_m) a_n K(k r_mn), done as the sum over the transform of |A|^2 times the transform of the kernel, so it costs
 * N log N. `fieldExponent` is the element factor's in field.
 */
export function radiatedPower(spectrum: ApertureSpectrum, wavenumber: number, fieldExponent: number): number {
  const { grid, periodU, rows, re, im } = spectrum;
  const kernel = kernelSpectrum({ grid, columns: periodU, rows, wavenumber, powerExponent: 2 * fieldExponent });
  const half = rows / 2;
  const powerAt = (at: number): number => re[at] * re[at] + im[at] * im[at];
  let total = 0;
  // On a staggered lattice the second period repeats the first with v moved half a period; the kernel does too.
  for (let m = 0; m < periodU; m++) {
    const at = m * rows;
    const kernelAt = m * (half + 1);
    let sum = powerAt(at) * kernel[kernelAt] + powerAt(at + half) * kernel[kernelAt + half];
    for (let n = 1; n < half; n++) sum += (powerAt(at + n) + powerAt(at + rows - n)) * kernel[kernelAt + n];
    total += sum;
  }
  return total / (periodU * rows);
}
