import type { ApertureSpectrum } from './aperture-spectrum';
import { kernelSpectrum } from './kernel-spectrum';

/**
 * Integral of |F|^2 over the outward hemisphere, exact for the finite array: the sum over all pairs of cells of
 * conj(a_m) a_n K(k r_mn), done as the sum over the transform of |A|^2 times the transform of the kernel, so it costs
 * N log N. `fieldExponent` is the element factor's in field.
 */
export function radiatedPower(spectrum: ApertureSpectrum, wavenumber: number, fieldExponent: number): number {
  const { columns, rows, power, grid } = spectrum;
  const kernel = kernelSpectrum({ grid, columns, rows, wavenumber, powerExponent: 2 * fieldExponent });
  const half = rows / 2;
  let total = 0;
  for (let m = 0; m < columns; m++) {
    const at = m * rows;
    const kernelAt = m * (half + 1);
    let sum = power[at] * kernel[kernelAt] + power[at + half] * kernel[kernelAt + half];
    for (let n = 1; n < half; n++) sum += (power[at + n] + power[at + rows - n]) * kernel[kernelAt + n];
    total += sum;
  }
  return total / (columns * rows);
}
