import * as fc from 'fast-check';
import { mean, median, quantile, rootMeanSquare, sampleDeviation } from './statistics';

const list = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 30 });

describe('statistics of a list', () => {
  it('gives the textbook values of 2, 4, 4, 4, 5, 5, 7, 9', () => {
    const values = [2, 4, 4, 4, 5, 5, 7, 9];
    expect(mean(values)).toBe(5);
    expect(median(values)).toBe(4.5);
    // Sum of squares 232; deviations sum to 32, over 7.
    expect(rootMeanSquare(values)).toBeCloseTo(Math.sqrt(29), 12);
    expect(sampleDeviation(values)).toBeCloseTo(Math.sqrt(32 / 7), 12);
  });

  it('interpolates between order statistics', () => {
    expect(quantile([10, 20, 30, 40], 0.25)).toBeCloseTo(17.5, 12);
    expect(quantile([3], 0.9)).toBe(3);
  });

  it('leaves the list in its order', () => {
    const values = [3, 1, 2];
    expect([median(values), values]).toEqual([2, [3, 1, 2]]);
  });

  it('keeps quantiles within the list and rising with the fraction', () => {
    fc.assert(
      fc.property(list, fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (values, a, b) => {
        const [low, high] = [quantile(values, Math.min(a, b)), quantile(values, Math.max(a, b))];
        expect(low).toBeLessThanOrEqual(high);
        expect(low).toBeGreaterThanOrEqual(Math.min(...values));
        expect(high).toBeLessThanOrEqual(Math.max(...values));
      }),
      { seed: 81 },
    );
  });

  it('splits the mean square into mean and deviation', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -1e3, max: 1e3, noNaN: true }), { minLength: 2, maxLength: 30 }), (values) => {
        const n = values.length;
        const parts = mean(values) ** 2 + (sampleDeviation(values) ** 2 * (n - 1)) / n;
        // Squares up to 1e6 keep nine decimals in doubles.
        expect(parts).toBeCloseTo(rootMeanSquare(values) ** 2, 6);
      }),
      { seed: 82 },
    );
  });

  it('has no answer for an empty list or a fraction beyond one', () => {
    expect(() => mean([])).toThrow('The mean of no values does not exist');
    expect(() => median([])).toThrow('The quantile of no values does not exist');
    expect(() => rootMeanSquare([])).toThrow('The root mean square of no values does not exist');
    expect(() => sampleDeviation([1])).toThrow('A sample deviation takes two values or more; got 1');
    expect(() => quantile([1], 1.5)).toThrow('A quantile takes a fraction from 0 to 1; got 1.5');
  });
});
