import { apertureSpectrum, spectrumPower, spectrumSize } from './aperture-spectrum';
import { exampleField, plainSum } from './example-field';

const wavenumber = 210;

describe('the spectrum of an aperture', () => {
  it.each(['none', 'odd', 'even'] as const)('holds |F|^2 at its samples, inside and outside the stored period, stagger %s', (stagger) => {
    for (const [columnCount, rowCount] of [[7, 5], [6, 8], [1, 4], [5, 1]]) {
      const field = exampleField({ stagger, columnCount, rowCount });
      const spectrum = apertureSpectrum(field);
      for (const [m, n] of [[0, 0], [3, 5], [-4, 2], [spectrum.periodU + 2, -7], [-3 * spectrum.periodU, 40], [90, -90]]) {
        const u = (2 * Math.PI * m) / (wavenumber * field.grid.stepXM * spectrum.periodU);
        const v = (2 * Math.PI * n) / (wavenumber * field.grid.stepYM * spectrum.rows);
        const { re, im } = plainSum(field, wavenumber, u, v);
        expect(spectrumPower(spectrum, m, n)).toBeCloseTo(re * re + im * im, 8);
      }
    }
  });

  it('keeps the power of the aperture (Parseval)', () => {
    for (const stagger of ['none', 'odd'] as const) {
      const field = exampleField({ stagger });
      const { re, im, columns, rows } = apertureSpectrum(field);
      const inSpectrum = re.reduce((sum, value, i) => sum + value * value + im[i] * im[i], 0) / (columns * rows);
      const inAperture = field.re.reduce((sum, value, i) => sum + value * value + field.im[i] * field.im[i], 0);
      expect(inSpectrum).toBeCloseTo(inAperture, 10);
    }
  });

  it('is three times as fine as it need be up to 256 cells a side, twice beyond', () => {
    expect([1, 5, 6, 40, 256, 257, 1000].map(spectrumSize)).toEqual([16, 16, 32, 128, 1024, 1024, 2048]);
  });
});
