import * as fc from 'fast-check';
import { bracket, lagrangeWeigher, lagrangeWeights, linearThrough } from './interpolate';

describe('interpolation', () => {
  it('finds the interval and says when a value lies outside', () => {
    expect(bracket([1, 2, 4], 3)).toEqual({ lower: 1, fraction: 0.5, outside: 0 });
    expect(bracket([1, 2, 4], 5)).toEqual({ lower: 1, fraction: 1, outside: 1 });
    expect(bracket([1, 2, 4], 0)).toEqual({ lower: 0, fraction: 0, outside: -1 });
    expect(bracket([28], 28)).toEqual({ lower: 0, fraction: 0, outside: 0 });
  });

  it('does not call the last point of its own list outside', () => {
    expect(bracket([26e9, 30e9], 30e9 * (1 + 1e-12)).outside).toBe(0);
  });

  it('joins points by lines and stays constant beyond the ends', () => {
    expect([-1, 0, 0.5, 3, 9].map((x) => linearThrough([0, 1, 3], [10, 20, 0], x))).toEqual([10, 10, 15, 0, 0]);
    expect(linearThrough([2], [7], 5)).toBe(7);
  });

  it('reproduces a quartic through five nodes', () => {
    const nodes = [0, 0.067, 0.25, 0.5, 0.75];
    const quartic = (x: number): number => 3 - x + 2 * x ** 2 - 4 * x ** 3 + x ** 4;
    fc.assert(
      fc.property(fc.double({ min: 0, max: 0.75, noNaN: true }), (x) => {
        const weights = lagrangeWeights(nodes, x, new Float64Array(5));
        expect(nodes.reduce((sum, node, i) => sum + weights[i] * quartic(node), 0)).toBeCloseTo(quartic(x), 11);
      }),
    );
  });

  it('gives weights that sum to one, and a single node all of it', () => {
    expect(lagrangeWeights([0.3], 0.9, new Float64Array(1))[0]).toBe(1);
    expect(lagrangeWeights([0, 1, 2], 0.4, new Float64Array(3)).reduce((a, b) => a + b)).toBeCloseTo(1, 14);
  });

  it('weighs the same when the nodes are divided by once', () => {
    const nodes = [0, 0.07, 0.25, 0.5, 0.75];
    const weigh = lagrangeWeigher(nodes);
    for (const x of [-0.1, 0, 0.07, 0.3, 0.75, 1]) {
      const weights = new Float64Array(5);
      weigh(x, weights);
      lagrangeWeights(nodes, x, new Float64Array(5)).forEach((weight, i) => expect(weights[i]).toBeCloseTo(weight, 13));
    }
  });
});
