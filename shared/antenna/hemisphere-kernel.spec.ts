import { gaussLegendre } from '../math/quadrature';
import { hemisphereKernel } from './hemisphere-kernel';

/** Brute force: cos^m(theta) cos(z sin theta cos phi) over the hemisphere. */
function byQuadrature(powerExponent: number, z: number): number {
  const { nodes, weights } = gaussLegendre(120);
  let sum = 0;
  for (let i = 0; i < nodes.length; i++) {
    // Nodes in the square root of cos(theta) soften the fractional powers at the horizon.
    const root = (nodes[i] + 1) / 2;
    const cosine = root * root;
    const sine = Math.sqrt(1 - cosine * cosine);
    let ring = 0;
    for (let p = 0; p < 128; p++) ring += Math.cos(z * sine * Math.cos((2 * Math.PI * p) / 128));
    sum += weights[i] * root * cosine ** powerExponent * ring * ((2 * Math.PI) / 128);
  }
  return sum;
}

describe('the power kernel of the hemisphere', () => {
  it.each([
    [1, [3.14159, 2.76492, 0.569231, 0.0273147]],
    [2, [2.0944, 1.8923, 0.63662, 0.0493022]],
  ])('has the tabulated values for m = %d', (powerExponent, expected) => {
    [0, 1, Math.PI, 10].forEach((z, i) => expect(hemisphereKernel(powerExponent, z)).toBeCloseTo(expected[i], 5));
  });

  it.each([0, 0.6, 1, 1.4, 2, 3, 20])('agrees with quadrature for m = %d', (powerExponent) => {
    for (const z of [0, 0.3, 2.2, 7, 19, 30]) {
      expect(Math.abs(hemisphereKernel(powerExponent, z) - byQuadrature(powerExponent, z))).toBeLessThan(2e-8);
    }
  });

  it('is 2 pi sin z / z for an element that is the same in every forward direction', () => {
    expect(hemisphereKernel(0, 3.3)).toBeCloseTo((2 * Math.PI * Math.sin(3.3)) / 3.3, 12);
  });
});
