import fc from 'fast-check';
import { densityOnAxisWPerM2, distanceToLimitM, exposureZones, type RadiatingAperture } from './aperture-exposure';
import { exposureLimits } from './exposure-limits';

const round = (diameterM: number, apertureEfficiency: number, powerW: number): RadiatingAperture => {
  const [areaM2, wavelengthM] = [(Math.PI / 4) * diameterM ** 2, 0.0107];
  return { powerW, areaM2, largestDimensionM: diameterM, gainRatio: (apertureEfficiency * 4 * Math.PI * areaM2) / wavelengthM ** 2, wavelengthM };
};

describe('power density on the axis of an aperture', () => {
  it('never exceeds a limit beyond the distance that is told for it', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 3, noNaN: true }), fc.double({ min: 0.1, max: 0.8, noNaN: true }), fc.double({ min: 0.01, max: 1e4, noNaN: true }), (diameterM, efficiency, powerW) => {
        const aperture = round(diameterM, efficiency, powerW);
        const distanceM = distanceToLimitM(aperture, 10);
        for (const times of [1 + 1e-9, 1.1, 2, 10]) expect(densityOnAxisWPerM2(aperture, distanceM * times + 1e-12)).toBeLessThanOrEqual(10 * (1 + 1e-6));
      }),
      { seed: 11 },
    );
  });

  it('steps by -0.12 dB where the transition meets the far field of a round aperture', () => {
    const aperture = round(0.5, 0.6, 10);
    const { farFieldFromM } = exposureZones(aperture);
    const [inside, outside] = [1 - 1e-9, 1 + 1e-9].map((times) => densityOnAxisWPerM2(aperture, farFieldFromM * times));
    expect(10 * Math.log10(inside / outside)).toBeCloseTo(-0.12, 2);
  });

  it('meets a limit at distance 0 where the near field does, and not a watt above', () => {
    const aperture = round(0.4, 0.45, 2);
    const { nearFieldWPerM2, nearFieldEndM } = exposureZones(aperture);
    expect(distanceToLimitM(aperture, nearFieldWPerM2)).toBe(0);
    expect(distanceToLimitM(aperture, nearFieldWPerM2 * 0.999)).toBeGreaterThan(nearFieldEndM);
  });
});

describe('published limits', () => {
  it('end where their tables end, with the reason', () => {
    const low = exposureLimits(1.2e9);
    expect(low.fccPublic).toEqual({ kind: 'outside-table', reason: 'the table does not hold 1.2 GHz' });
    expect(low.icnirpPublicLocal).toMatchObject({ kind: 'outside-table' });
    expect(exposureLimits(140e9).fccOccupational).toMatchObject({ kind: 'outside-table' });
    expect(exposureLimits(140e9).icnirpPublicLocal).toMatchObject({ limitWPerM2: 55 * 140 ** -0.177, averagingMin: 6 });
  });
});
