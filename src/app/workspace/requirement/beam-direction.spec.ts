import * as fc from 'fast-check';
import { azElOf, polarOf, tangentialWavenumberRadPerM } from './beam-direction';

describe('beam directions', () => {
  it('has azimuth in the x-z plane and elevation towards y', () => {
    expect(azElOf({ thetaDeg: 20, phiDeg: 0 })).toEqual({ azimuthDeg: 20, elevationDeg: 0 });
    expect(azElOf({ thetaDeg: 20, phiDeg: 90 })).toEqual({ azimuthDeg: 0, elevationDeg: 20 });
    expect(azElOf({ thetaDeg: 20, phiDeg: 180 })).toEqual({ azimuthDeg: -20, elevationDeg: 0 });
  });

  it('gives boresight one name', () => {
    expect(polarOf({ azimuthDeg: 0, elevationDeg: 0 })).toEqual({ thetaDeg: 0, phiDeg: 0 });
  });

  it('comes back to the same direction', () => {
    const angle = (max: number) => fc.integer({ min: -max * 10, max: max * 10 }).map((tenths) => tenths / 10);
    fc.assert(
      fc.property(angle(89), angle(89), (azimuthDeg, elevationDeg) => {
        const back = azElOf(polarOf({ azimuthDeg, elevationDeg }));
        // Near grazing the cosine of the elevation divides the rounding of the tenth decimal.
        expect(Math.abs(back.azimuthDeg - azimuthDeg)).toBeLessThan(1e-7);
        expect(Math.abs(back.elevationDeg - elevationDeg)).toBeLessThan(1e-7);
      }),
      { seed: 3 },
    );
  });

  it('gives 200.71 rad/m for 20 degrees at 28 GHz', () => {
    expect(tangentialWavenumberRadPerM(299.792458 / 28, 20)).toBeCloseTo(200.71, 2);
  });
});
