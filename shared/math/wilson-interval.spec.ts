import * as fc from 'fast-check';
import { wilsonInterval, Z_OF_95_PERCENT } from './wilson-interval';

const counts = fc.integer({ min: 1, max: 5000 }).chain((count) => fc.tuple(fc.integer({ min: 0, max: count }), fc.constant(count)));

describe('wilsonInterval', () => {
  it('does not take 20 of 20 for certainty', () => {
    const [low, high] = wilsonInterval(20, 20);
    expect(low).toBeCloseTo(1 / (1 + Z_OF_95_PERCENT ** 2 / 20), 12);
    expect(high).toBe(1);
  });

  it('ends where the share is z standard errors of the bound away', () => {
    fc.assert(
      fc.property(counts, ([successes, count]) => {
        const share = successes / count;
        for (const bound of wilsonInterval(successes, count)) {
          expect((share - bound) ** 2).toBeCloseTo((Z_OF_95_PERCENT ** 2 * bound * (1 - bound)) / count, 12);
        }
      }),
      { seed: 4 },
    );
  });

  it('mirrors success and failure, holds the share and stays within 0 and 1', () => {
    fc.assert(
      fc.property(counts, ([successes, count]) => {
        const [low, high] = wilsonInterval(successes, count);
        const [mirroredLow, mirroredHigh] = wilsonInterval(count - successes, count);
        expect(1 - mirroredHigh).toBeCloseTo(low, 12);
        expect(1 - mirroredLow).toBeCloseTo(high, 12);
        expect(low >= 0 && low <= successes / count && successes / count <= high && high <= 1).toBe(true);
      }),
      { seed: 5 },
    );
  });

  it('refuses counts that cannot be', () => {
    expect(() => wilsonInterval(3, 2)).toThrow('got 3 of 2');
    expect(() => wilsonInterval(0, 0)).toThrow('got 0 of 0');
  });
});
