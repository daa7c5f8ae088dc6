import { gaussLegendre, integrate } from './quadrature';

describe('Gauss-Legendre quadrature', () => {
  it('has the textbook nodes and weights for three points', () => {
    const { nodes, weights } = gaussLegendre(3);
    expect(Array.from(nodes)).toEqual([expect.closeTo(-Math.sqrt(0.6), 14), expect.closeTo(0, 14), expect.closeTo(Math.sqrt(0.6), 14)]);
    expect(Array.from(weights)).toEqual([expect.closeTo(5 / 9, 14), expect.closeTo(8 / 9, 14), expect.closeTo(5 / 9, 14)]);
  });

  it.each([1, 2, 5, 16, 64])('integrates every power up to 2n-1 exactly with n = %d nodes', (count) => {
    const { nodes, weights } = gaussLegendre(count);
    for (let power = 0; power <= 2 * count - 1; power++) {
      const sum = nodes.reduce((total, x, i) => total + weights[i] * x ** power, 0);
      expect(sum).toBeCloseTo(power % 2 ? 0 : 2 / (power + 1), 12);
    }
  });

  it('integrates a cosine over several panels to 1e-13', () => {
    expect(integrate(Math.cos, 0, 40, { nodes: 12, panels: 10 })).toBeCloseTo(Math.sin(40), 12);
  });

  it('refuses a rule without nodes', () => {
    expect(() => gaussLegendre(0)).toThrow('at least one node; got 0');
  });
});
