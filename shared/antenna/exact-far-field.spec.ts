import * as fc from 'fast-check';
import { exactFarField } from './exact-far-field';
import { exampleField, plainSum } from './example-field';
import { farFieldOf, type FarField } from './far-field';
import { apertureSpectrum } from './aperture-spectrum';

const wavenumber = 210;
const cosine = fc.double({ min: -1, max: 1, noNaN: true });

describe('the exact far field', () => {
  it('equals a plain sum over the cells, for either lattice', () => {
    for (const stagger of ['none', 'even', 'odd'] as const) {
      const field = exampleField({ stagger });
      const far = exactFarField(field, wavenumber);
      fc.assert(
        fc.property(cosine, cosine, (u, v) => {
          const { re, im } = plainSum(field, wavenumber, u, v);
          expect(far.powerAt(u, v)).toBeCloseTo(re * re + im * im, 9);
        }),
        { numRuns: 30 },
      );
    }
  });

  it('turns by a phase slope when the panel is moved, and its power does not change (translation)', () => {
    const field = exampleField();
    const moved = exampleField({ firstXM: field.grid.firstXM + 0.05, firstYM: field.grid.firstYM - 0.02 });
    fc.assert(
      fc.property(cosine, cosine, (u, v) => {
        const before = plainSum(field, wavenumber, u, v);
        const after = plainSum(moved, wavenumber, u, v);
        const turn = wavenumber * (0.05 * u - 0.02 * v);
        expect(after.re).toBeCloseTo(before.re * Math.cos(turn) - before.im * Math.sin(turn), 9);
        expect(exactFarField(moved, wavenumber).powerAt(u, v)).toBeCloseTo(exactFarField(field, wavenumber).powerAt(u, v), 8);
      }),
      { numRuns: 30 },
    );
  });

  it('is symmetric about broadside for real amplitudes (conjugate symmetry)', () => {
    const field = exampleField();
    field.im.fill(0);
    const far = exactFarField(field, wavenumber);
    fc.assert(fc.property(cosine, cosine, (u, v) => expect(far.powerAt(u, v)).toBeCloseTo(far.powerAt(-u, -v), 9)), { numRuns: 30 });
  });
});

describe('the derivatives of the far field', () => {
  const checkSlopes = (far: FarField, [u, v]: number[], tolerance: number): void => {
    const h = 1e-4;
    const at = far.powerAt(u, v);
    const s = { ...far.derivativesAt(u, v) };
    const slopeU = 2 * (s.re * s.uRe + s.im * s.uIm);
    const slopeV = 2 * (s.re * s.vRe + s.im * s.vIm);
    const curveUv = 2 * (s.uRe * s.vRe + s.uIm * s.vIm + s.re * s.uvRe + s.im * s.uvIm);
    const curveUu = 2 * (s.uRe ** 2 + s.uIm ** 2 + s.re * s.uuRe + s.im * s.uuIm);
    const curveVv = 2 * (s.vRe ** 2 + s.vIm ** 2 + s.re * s.vvRe + s.im * s.vvIm);
    const p = far.powerAt;
    const scale = Math.abs(curveUu) + Math.abs(curveVv);
    expect(Math.abs((p(u + h, v) - p(u - h, v)) / (2 * h) - slopeU)).toBeLessThan(tolerance * scale);
    expect(Math.abs((p(u, v + h) - p(u, v - h)) / (2 * h) - slopeV)).toBeLessThan(tolerance * scale);
    expect(Math.abs((p(u + h, v) - 2 * at + p(u - h, v)) / (h * h) - curveUu)).toBeLessThan(tolerance * scale);
    expect(Math.abs((p(u, v + h) - 2 * at + p(u, v - h)) / (h * h) - curveVv)).toBeLessThan(tolerance * scale);
    expect(Math.abs((p(u + h, v + h) - p(u + h, v - h) - p(u - h, v + h) + p(u - h, v - h)) / (4 * h * h) - curveUv)).toBeLessThan(tolerance * scale);
  };

  it('are the slopes and curvatures of the power, summed exactly', () => {
    const far = exactFarField(exampleField({ stagger: 'odd' }), wavenumber);
    for (const direction of [[0.1, -0.2], [0.5, 0.5], [-0.7, 0.1]]) checkSlopes(far, direction, 1e-3);
  });

  it('are near them as difference quotients on a larger panel', () => {
    const field = exampleField({ columnCount: 30, rowCount: 25 });
    const far = farFieldOf(field, apertureSpectrum(field), wavenumber);
    for (const direction of [[0.1, -0.2], [0.5, 0.5]]) checkSlopes(far, direction, 2e-2);
  });
});

describe('a line of constant u', () => {
  it.each([['summed exactly', 9], ['interpolated', 40]])('holds the same field as single directions, %s', (_way, columnCount) => {
    const field = exampleField({ columnCount, rowCount: 25, stagger: 'even' });
    const far = farFieldOf(field, apertureSpectrum(field), wavenumber);
    const line = far.lineAt(0.3);
    for (const v of [-0.6, 0, 0.21]) {
      const along = { ...line(v) };
      const { re, im } = { ...far.fieldAt(0.3, v) };
      expect(Math.hypot(along.re - re, along.im - im)).toBeLessThan(1e-9 * Math.hypot(re, im));
      expect(re * re + im * im).toBeCloseTo(far.powerAt(0.3, v), 6);
      far.lineAt(0.3);
    }
  });
});
