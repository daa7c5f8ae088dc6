import { binOf, symmetricBins } from './histogram-bins';

describe('symmetric bins', () => {
  it('are of one degree for errors up to 15 degrees', () => {
    const bins = symmetricBins([-14.2, -0.5, 0, 0.4, 13.4], 180);
    expect([bins.from, bins.width, bins.counts.length]).toEqual([-15, 1, 30]);
    expect(bins.counts[0]).toBe(1);
    expect([bins.counts[14], bins.counts[15]]).toEqual([1, 2]);
  });
  it('count every value once, also those beyond the limit', () => {
    const values = [-170, 3, 4, 190];
    const bins = symmetricBins(values, 90);
    expect(bins.counts.reduce((a, b) => a + b)).toBe(4);
    expect(bins.beyond).toBe(2);
  });
  it('put a value on the last edge into the last bin and count it as inside', () => {
    const bins = symmetricBins([10, -10], 180);
    expect([bins.beyond, bins.counts[bins.counts.length - 1]]).toEqual([0, 1]);
  });
  it('pass over places without a value', () => {
    const bins = symmetricBins([Number.NaN, -3, 3], 180);
    expect(bins.counts.reduce((sum, count) => sum + count, 0)).toBe(2);
    expect(bins.from).toBeCloseTo(-3, 6);
  });
  it('stand for a design without any error', () => {
    const bins = symmetricBins([0, 0, 0], 180);
    expect(bins.counts[binOf(bins, 0)]).toBe(3);
  });
});
