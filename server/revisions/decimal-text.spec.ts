import fc from 'fast-check';
import { decimalText, significantText } from './decimal-text';

/** The same by the plain way. */
const plain = (value: number): string => String(Math.round(value * 1e4) / 1e4 + 0);

describe('significantText', () => {
  it('keeps six digits and no zeros behind them', () => {
    expect([0.123456789, 1234567, 0.5, 1e-9 / 3, -0].map(significantText)).toEqual(['0.123457', '1234570', '0.5', '3.33333e-10', '0']);
  });
});

describe('decimalText', () => {
  it.each([
    [0, '0'],
    [-0, '0'],
    [-0.00004, '0'],
    [-0.00006, '-0.0001'],
    [359.99996, '360'],
    [-12.5, '-12.5'],
    [0.0305, '0.0305'],
    [1e15 / 3, String(Math.round((1e15 / 3) * 1e4) / 1e4)],
  ])('writes %d as %s', (value, text) => {
    expect(decimalText(value)).toBe(text);
  });

  it('writes what rounding to four decimals gives, whatever the number', () => {
    fc.assert(
      fc.property(fc.oneof(fc.double({ min: -400, max: 400, noNaN: true }), fc.double({ min: -1e12, max: 1e12, noNaN: true }), fc.float({ min: -1000, max: 1000, noNaN: true })), (value) => {
        expect(decimalText(value)).toBe(plain(value));
      }),
      { numRuns: 2000 },
    );
  });

  it('refuses what is no finite number', () => {
    for (const value of [NaN, Infinity, -Infinity]) {
      for (const write of [decimalText, significantText]) expect(() => write(value)).toThrow(`A table holds finite numbers; got ${value}`);
    }
  });
});
