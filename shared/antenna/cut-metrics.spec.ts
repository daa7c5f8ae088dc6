import { cutMetrics } from './cut-metrics';

/** Uniform continuous line of a length in wavelengths, over the angle from its normal. */
const line = (lengthInWaves: number) => (angleRad: number): number => {
  const x = Math.PI * lengthInWaves * Math.sin(angleRad);
  return x === 0 ? 1 : (Math.sin(x) / x) ** 2;
};

const arc = { fromRad: -Math.PI / 2, toRad: Math.PI / 2 };

describe('the figures of a cut', () => {
  it('gives a uniform line source a first sidelobe of -13.26 dB and a beamwidth of 0.8859 wavelengths over length', () => {
    const { halfPowerBeamwidthDeg, sidelobeDb } = cutMetrics({ power: line(50), ...arc, samples: 1500 });
    expect(sidelobeDb).toBeCloseTo(-13.26146, 4);
    expect(Number(halfPowerBeamwidthDeg)).toBeCloseTo((2 * Math.asin(0.8858929 / 2 / 50) * 180) / Math.PI, 5);
  });

  it('does not depend on the samples', () => {
    const widths = [701, 1500, 4003].map((samples) => Number(cutMetrics({ power: line(40), ...arc, samples }).halfPowerBeamwidthDeg));
    expect(Math.max(...widths) - Math.min(...widths)).toBeLessThan(1e-7);
    const levels = [701, 1500, 4003].map((samples) => Number(cutMetrics({ power: line(40), ...arc, samples }).sidelobeDb));
    expect(Math.max(...levels) - Math.min(...levels)).toBeLessThan(1e-6);
  });

  it('climbs to a peak that is not at angle 0 and measures about it', () => {
    const shifted = cutMetrics({ power: (a) => line(50)(a - 0.004), ...arc, samples: 1500 });
    expect(shifted.sidelobeDb).toBeCloseTo(-13.26146, 3);
  });

  it('shows a lobe stronger than the main one above 0 dB', () => {
    const { sidelobeDb } = cutMetrics({ power: (a) => line(30)(a) + 2 * line(30)(a - 0.7), ...arc, samples: 2000 });
    expect(sidelobeDb).toBeCloseTo(3.01, 1);
  });

  it('finds the higher of two tops though its samples lie lower', () => {
    // Two equal lobes but for 0.01 dB; the higher one falls between two samples, the lower one on a sample.
    const step = Math.PI / 200;
    const bump = (a: number, at: number, height: number): number => height * Math.exp(-(((a - at) / (2 * step)) ** 2));
    const power = (a: number): number => bump(a, 0, 1) + bump(a, -40 * step, 0.1) + bump(a, 40.5 * step, 0.1 * 10 ** 0.001);
    expect(Number(cutMetrics({ power, ...arc, samples: 200 }).sidelobeDb)).toBeCloseTo(-9.99, 4);
  });

  it('says so when half power is not reached or nothing lies outside', () => {
    const broad = cutMetrics({ power: () => 1, ...arc, samples: 200 });
    expect(broad.halfPowerBeamwidthDeg).toEqual({ kind: 'not-reached', reason: expect.any(String) });
    expect(broad.sidelobeDb).toEqual({ kind: 'no-sidelobe', reason: expect.any(String) });
    const single = cutMetrics({ power: (a) => Math.cos(a) ** 8, ...arc, samples: 200 });
    expect(single.halfPowerBeamwidthDeg).toBeCloseTo((2 * Math.acos(0.5 ** (1 / 8)) * 180) / Math.PI, 6);
    expect(single.sidelobeDb).toEqual({ kind: 'no-sidelobe', reason: expect.any(String) });
  });
});
