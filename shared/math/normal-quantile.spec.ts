import * as fc from 'fast-check';
import { normalQuantile } from './normal-quantile';

describe('normalQuantile', () => {
  // Python 3, statistics.NormalDist().inv_cdf.
  it.each([
    [1e-300, -37.0470962993612],
    [1e-20, -9.262340089798405],
    [1e-5, -4.2648907939228256],
    [0.001, -3.090232306167813],
    [0.025, -1.9599639845400538],
    [0.0749999, -1.4395321773759004],
    [0.3, -0.5244005127080407],
    [0.5, 0],
    [0.6, 0.2533471031357998],
    [0.9, 1.2815515655446008],
    [0.999999, 4.753424308817089],
  ])('gives at %d the value %d of an independent program', (probability, value) => {
    expect(Math.abs(normalQuantile(probability) - value)).toBeLessThanOrEqual(4e-16 * Math.max(1, Math.abs(value)));
  });

  it('is odd about one half and rises', () => {
    const probability = fc.double({ min: 1e-12, max: 0.5, noNaN: true });
    fc.assert(
      fc.property(probability, probability, (a, b) => {
        expect(normalQuantile(1 - a)).toBeCloseTo(-normalQuantile(a), 3);
        if (a < b) expect(normalQuantile(a)).toBeLessThanOrEqual(normalQuantile(b));
      }),
      { seed: 12 },
    );
  });

  it('is infinite at the ends and refuses what is no probability', () => {
    expect([normalQuantile(0), normalQuantile(1)]).toEqual([-Infinity, Infinity]);
    expect(() => normalQuantile(1.01)).toThrow('A normal quantile takes a probability from 0 to 1; got 1.01');
  });
});
