import { apertureSpectrum } from './aperture-spectrum';
import { exampleField, plainSum } from './example-field';
import { interpolatedFarField } from './interpolated-far-field';

const wavenumber = 210;
const directions = Array.from({ length: 60 }, (_, i) => [Math.sin(7 * i + 0.3), Math.cos(11 * i * i)]);

/** Largest error of |F| relative to the sum of the amplitudes, which bounds |F|. */
function worstError(field: ReturnType<typeof exampleField>): number {
  const at = interpolatedFarField(apertureSpectrum(field), wavenumber);
  const most = field.re.reduce((sum, value, i) => sum + Math.hypot(value, field.im[i]), 0);
  const { grid } = field;
  const centreX = grid.firstXM + ((grid.columnCount - 1) / 2) * grid.stepXM;
  const centreY = grid.firstYM + ((grid.rowCount - 1) / 2) * grid.stepYM;
  let worst = 0;
  for (const [u, v] of directions) {
    const plain = plainSum(field, wavenumber, u, v);
    // The plain sum has its origin at x = y = 0, the interpolation in the middle of the grid.
    const turn = wavenumber * (centreX * u + centreY * v);
    const { re, im } = at(u, v);
    const error = Math.hypot(re * Math.cos(turn) - im * Math.sin(turn) - plain.re, re * Math.sin(turn) + im * Math.cos(turn) - plain.im);
    worst = Math.max(worst, error / most);
  }
  return worst;
}

describe('the interpolated far field', () => {
  it.each(['none', 'odd', 'even'] as const)('equals the plain sum to 1e-9 in amplitude and phase, stagger %s', (stagger) => {
    for (const [columnCount, rowCount] of [[7, 5], [20, 33], [1, 12], [40, 40]]) {
      expect(worstError(exampleField({ stagger, columnCount, rowCount }))).toBeLessThan(1e-9);
    }
  });

  it('equals it to 2e-8 where the spectrum is only twice as fine as needed', () => {
    expect(worstError(exampleField({ columnCount: 512, rowCount: 2 }))).toBeLessThan(2e-8);
    expect(worstError(exampleField({ columnCount: 2, rowCount: 512, stagger: 'odd' }))).toBeLessThan(2e-8);
  });
});
