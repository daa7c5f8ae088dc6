import { SPEED_OF_LIGHT_M_PER_S } from '../units/constants';
import { deembeddedReflection, planeShiftRad, waveguideSimulator } from './measuring-cell';

describe('a waveguide simulator', () => {
  it('imitates 41 degrees in WR-90 at 10 GHz, and nothing below cutoff', () => {
    expect(((waveguideSimulator(22.86e-3, 10e9)?.thetaRad ?? 0) * 180) / Math.PI).toBeCloseTo(40.97, 2);
    expect(waveguideSimulator(22.86e-3, 6.5e9)).toBeUndefined();
  });

  it('has k cos theta as the propagation constant of its guide', () => {
    const found = waveguideSimulator(22.86e-3, 10e9);
    const k = (2 * Math.PI * 10e9) / SPEED_OF_LIGHT_M_PER_S;
    expect((2 * Math.PI) / (found?.guideWavelengthM ?? 1)).toBeCloseTo(Math.sqrt(k * k - (Math.PI / 22.86e-3) ** 2), 6);
  });
});

describe('de-embedding in free space', () => {
  it('gives back the reflection that made the reading', () => {
    const place = { frequencyHz: 10e9, thetaRad: 0.35, nearerM: 1.6e-3 };
    // A cell of phase 1 rad lies nearer by delta: measured over the plate's -1 it is -exp(j) exp(+j 2 k cos delta).
    const measured = Math.PI + 1 - planeShiftRad(place);
    const { re, im } = deembeddedReflection({ ...place, ratioRe: 0.8 * Math.cos(measured), ratioIm: 0.8 * Math.sin(measured) });
    expect([Math.hypot(re, im), Math.atan2(im, re)]).toEqual([expect.closeTo(0.8, 12), expect.closeTo(1, 12)]);
  });
});
