import { SPEED_OF_LIGHT_M_PER_S } from '../../units/constants';
import { degFromRad } from '../../units/angles';
import { frozenPhaseLossDb, rimPathDifferenceM, rimPhaseErrorRad } from './spatial-delay';

/** Uniform centre-fed discs at 12 GHz, 5 % off: computed independently by numerical quadrature. */
const cases = [
  { diameterM: 1, focalLengthM: 1, wavelengths: 4.72463, edgeDeg: 85.0433, lossDb: -0.811612 },
  { diameterM: 0.5, focalLengthM: 0.4, wavelengths: 2.86995, edgeDeg: 51.6591, lossDb: -0.295543 },
];

describe('differential spatial phase delay', () => {
  it.each(cases)('of a disc of $diameterM m at $focalLengthM m is $wavelengths wavelengths, $edgeDeg degrees at the rim and $lossDb dB', (aperture) => {
    expect((rimPathDifferenceM(aperture) * 12e9) / SPEED_OF_LIGHT_M_PER_S).toBeCloseTo(aperture.wavelengths, 4);
    expect(degFromRad(rimPhaseErrorRad(aperture, 0.6e9))).toBeCloseTo(aperture.edgeDeg, 3);
    expect(frozenPhaseLossDb(aperture, 0.6e9)).toBeCloseTo(aperture.lossDb, 5);
  });

  it('costs the same on both sides of the design frequency and nothing at it', () => {
    expect(frozenPhaseLossDb(cases[0], -0.6e9)).toBeCloseTo(frozenPhaseLossDb(cases[0], 0.6e9), 12);
    expect(frozenPhaseLossDb(cases[0], 0)).toBe(0);
    expect(frozenPhaseLossDb(cases[0], 1e6)).toBeCloseTo(0, 4);
  });

  it('reaches -1 dB at about 94 degrees and half power at about 160 degrees at the rim, as the quadratic form sinc^2 says', () => {
    // Shallow: F is 5 D, so the rim's path is nearly a parabola.
    const shallow = { diameterM: 1, focalLengthM: 5 };
    const offsetFor = (edgeDeg: number): number => ((edgeDeg / 360) * SPEED_OF_LIGHT_M_PER_S) / rimPathDifferenceM(shallow);
    expect(frozenPhaseLossDb(shallow, offsetFor(94.1))).toBeCloseTo(-1, 2);
    expect(frozenPhaseLossDb(shallow, offsetFor(159.5))).toBeCloseTo(-3.01, 2);
  });
});
