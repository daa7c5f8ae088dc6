import { gaussLegendre } from '../math/quadrature';
import { apertureSpectrum } from './aperture-spectrum';
import { exampleField, plainSum } from './example-field';
import { exactFarField } from './exact-far-field';
import { hemisphereKernel } from './hemisphere-kernel';
import type { ApertureField } from './aperture-field';
import { radiatedPower } from './radiated-power';

const wavenumber = 210;

/** All pairs of cells, one by one. */
function byPairs(field: ApertureField, fieldExponent: number): number {
  const { grid, re, im } = field;
  const place = (i: number): [number, number] => {
    const row = Math.floor(i / grid.columnCount);
    const shifted = grid.stagger !== 'none' && (row % 2 === 0) === (grid.stagger === 'even');
    return [((i % grid.columnCount) + (shifted ? 0.5 : 0)) * grid.stepXM, row * grid.stepYM];
  };
  let total = 0;
  for (let a = 0; a < re.length; a++) {
    for (let b = 0; b < re.length; b++) {
      const [[xa, ya], [xb, yb]] = [place(a), place(b)];
      total += (re[a] * re[b] + im[a] * im[b]) * hemisphereKernel(2 * fieldExponent, wavenumber * Math.hypot(xa - xb, ya - yb));
    }
  }
  return total;
}

/** |F|^2 cos^2b over the hemisphere, Gauss-Legendre in the square root of cos(theta) and a trapezoidal rule in phi. */
function byQuadrature(field: ApertureField, fieldExponent: number): number {
  const far = exactFarField(field, wavenumber);
  const { nodes, weights } = gaussLegendre(80);
  let sum = 0;
  nodes.forEach((node, i) => {
    const root = (node + 1) / 2;
    const sine = Math.sqrt(1 - root ** 4);
    let ring = 0;
    for (let p = 0; p < 160; p++) ring += far.powerAt(sine * Math.cos((Math.PI * p) / 80), sine * Math.sin((Math.PI * p) / 80));
    sum += weights[i] * root * root ** (4 * fieldExponent) * ring * (Math.PI / 80);
  });
  return sum;
}

const inDb = (a: number, b: number): number => Math.abs(10 * Math.log10(a / b));

describe('radiated power', () => {
  for (const stagger of ['none', 'odd', 'even'] as const) {
    it.each([0, 0.5, 1, 0.35])(`equals the sum over all pairs and the quadrature over the hemisphere, stagger ${stagger}, element exponent %d`, (exponent) => {
      for (const [columnCount, rowCount] of [[7, 5], [6, 8], [1, 9], [9, 1], [1, 1]]) {
        const field = exampleField({ stagger, columnCount, rowCount });
        const power = radiatedPower(apertureSpectrum(field), wavenumber, exponent);
        expect(inDb(power, byPairs(field, exponent))).toBeLessThan(1e-9);
        expect(inDb(power, byQuadrature(field, exponent))).toBeLessThan(1e-5);
      }
    });
  }

  it('leaves out no lobe: a lattice of 2.5 wavelengths agrees with quadrature too', () => {
    const field = exampleField({ columnCount: 3, rowCount: 2, stepXM: 0.075, stepYM: 0.06 });
    expect(inDb(radiatedPower(apertureSpectrum(field), wavenumber, 0.5), byQuadrature(field, 0.5))).toBeLessThan(1e-5);
  });

  it.each([0, 1, 2, 3])('makes one cell of power pattern cos^%d have the directivity 2 (m + 1)', (powerExponent) => {
    const field = exampleField({ columnCount: 1, rowCount: 1 });
    const { re, im } = plainSum(field, wavenumber, 0, 0);
    const power = radiatedPower(apertureSpectrum(field), wavenumber, powerExponent / 2);
    expect((4 * Math.PI * (re * re + im * im)) / power).toBeCloseTo(2 * (powerExponent + 1), 9);
  });
});
