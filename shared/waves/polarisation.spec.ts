import { radFromDeg } from '../units/angles';
import { axialRatioDb, circularComponents, crossPolarDiscriminationDb, ludwig3X, ludwig3Y } from './polarisation';

const one = { re: 1, im: 0 };
const zero = { re: 0, im: 0 };
const size = (z: { re: number; im: number }): number => Math.hypot(z.re, z.im);

describe('polarisation', () => {
  it('splits E_theta at phi 30 degrees into Ludwig-3 co 0.866025 and cross 0.5 for x, the reverse for y', () => {
    const x = ludwig3X({ theta: one, phi: zero }, radFromDeg(30));
    const y = ludwig3Y({ theta: one, phi: zero }, radFromDeg(30));
    expect([x.co.re, x.cross.re]).toEqual([expect.closeTo(0.866025, 6), expect.closeTo(0.5, 6)]);
    expect([y.co.re, y.cross.re]).toEqual([expect.closeTo(0.5, 6), expect.closeTo(0.866025, 6)]);
  });

  it('gives E_phi at phi 90 degrees the sign -1 on the x reference', () => {
    expect(ludwig3X({ theta: zero, phi: one }, Math.PI / 2).co.re).toBeCloseTo(-1, 12);
  });

  it('calls x-hat - j y-hat on the axis pure right-hand circular', () => {
    const { right, left } = circularComponents({ theta: one, phi: { re: 0, im: -1 } });
    expect(size(right)).toBeCloseTo(Math.SQRT2, 12);
    expect(size(left)).toBeCloseTo(0, 12);
  });

  it.each([
    [0.5, 30.8199],
    [1, 24.8065],
    [3, 15.3402],
  ])('takes an axial ratio of %d dB as %d dB of discrimination and back', (axialDb, expectedDb) => {
    expect(crossPolarDiscriminationDb(axialDb)).toBeCloseTo(expectedDb, 3);
    expect(axialRatioDb(crossPolarDiscriminationDb(axialDb))).toBeCloseTo(axialDb, 9);
  });
});
