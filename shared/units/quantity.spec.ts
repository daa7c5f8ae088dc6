import * as fc from 'fast-check';
import { exactQuantity, formatQuantity, parseQuantity } from './quantity';
import type { QuantityDimension } from './quantity';

type Row = readonly [text: string, dimension: QuantityDimension, value: number];

const accepted: readonly Row[] = [
  ['28 GHz', 'frequency', 28],
  ['28', 'frequency', 28],
  ['28GHz', 'frequency', 28],
  ['28e9 Hz', 'frequency', 28],
  ['28000 MHz', 'frequency', 28],
  ['0.028 THz', 'frequency', 28],
  ['28 ghz', 'frequency', 28],
  ['28000 mhz', 'frequency', 28],
  ['28000 MHZ', 'frequency', 28],
  ['2.8e7 kHz', 'frequency', 28],
  ['  28.5\u00a0GHz ', 'frequency', 28.5],
  ['28.5\u2009GHz', 'frequency', 28.5],
  ['.5 GHz', 'frequency', 0.5],
  ['5. GHz', 'frequency', 5],
  ['10.7 mm', 'length', 10.7],
  ['10.7', 'length', 10.7],
  ['0.42 in', 'length', 10.668],
  ['0.4214 in', 'length', 10.70356],
  ['0.42″', 'length', 10.668],
  ['0.42"', 'length', 10.668],
  ["0.42''", 'length', 10.668],
  ['20 mil', 'length', 0.508],
  ['508 µm', 'length', 0.508],
  ['508 \u03bcm', 'length', 0.508],
  ['508 um', 'length', 0.508],
  ['1.2 m', 'length', 1200],
  ['3 cm', 'length', 30],
  ['10 MM', 'length', 10],
  ['2 ft', 'length', 609.6],
  ['\u22122.5 mm', 'length', -2.5],
  ['+2.5 mm', 'length', 2.5],
  ['45°', 'angle', 45],
  ['45 deg', 'angle', 45],
  ['45', 'angle', 45],
  ['-45 °', 'angle', -45],
  ['0.785 rad', 'angle', 44.97718691777],
  ['10 mrad', 'angle', 0.57295779513],
  ['30 arcmin', 'angle', 0.5],
  ['36″', 'angle', 0.01],
  ['-3 dB', 'level', -3],
  ['\u20133 dB', 'level', -3],
  ['34.5 dBi', 'level', 34.5],
  ['-20 db', 'level', -20],
  ['33 dBm', 'power', 1.99526231497],
  ['500 mW', 'power', 0.5],
  ['3 dBW', 'power', 1.99526231497],
  ['0.0009', 'number', 0.0009],
  ['1e-3', 'number', 0.001],
  ['-0', 'number', 0],
];

type Refusal = readonly [text: string, dimension: QuantityDimension, reason: RegExp, suggestion: string | undefined];

const refused: readonly Refusal[] = [
  ['', 'frequency', /nothing was typed/i, '28 GHz'],
  ['28,5 GHz', 'frequency', /decimal sign/i, '28.5 GHz'],
  ['28,5', 'frequency', /decimal sign/i, '28.5'],
  [',5 mm', 'length', /decimal sign/i, '0.5 mm'],
  ['28,500 MHz', 'frequency', /28\.500 or 28500/, undefined],
  ['28 000 MHz', 'frequency', /without separators/i, '28000 MHz'],
  ['1,000,000 Hz', 'frequency', /without separators/i, '1000000 Hz'],
  ['28g', 'frequency', /not a whole unit/i, '28 GHz'],
  ['28 M', 'frequency', /not a whole unit/i, '28 MHz'],
  ['28 m', 'frequency', /unit of length/i, '28 MHz'],
  ['-5 mm', 'frequency', /unit of length/i, undefined],
  ['28 mHz', 'frequency', /millihertz/i, '28 MHz'],
  ['28 °', 'frequency', /unit of angle/i, undefined],
  ['10 Mm', 'length', /megametre/i, '10 mm'],
  ['10 GHz', 'length', /unit of frequency/i, undefined],
  ['10 furlong', 'length', /not a unit of length/i, '10 mm'],
  ['45 grad', 'angle', /not a unit of angle/i, '45 °'],
  ['10 + 5 mm', 'length', /type the result/i, '10.7 mm'],
  ['2*5', 'length', /type the result/i, '10.7 mm'],
  ['0x1C', 'number', /is not a number$/i, '4'],
  ['NaN', 'number', /not a finite number/i, undefined],
  ['-Infinity', 'level', /not a finite number/i, undefined],
  ['1e999 mm', 'length', /too large/i, undefined],
  ['wide', 'length', /not a number with a unit/i, '10.7 mm'],
  ['10 mm 5', 'length', /not a number with a unit/i, '10.7 mm'],
  ['4 %', 'number', /without a unit/i, '4'],
  ['1'.repeat(81), 'number', /longer than 80/i, undefined],
];

describe('parseQuantity', () => {
  it.each(accepted)('reads %j as a %s of %d', (text, dimension, value) => {
    const read = parseQuantity(text, dimension);
    expect(read.kind).toBe('value');
    // Eleven digits cover the irrational factors; decimal units are checked to the bit below.
    if (read.kind === 'value') expect(read.value).toBeCloseTo(value, 9);
  });

  it.each(refused)('refuses %j as a %s', (text, dimension, reason, suggestion) => {
    const read = parseQuantity(text, dimension);
    expect(read.kind).toBe('refused');
    if (read.kind === 'refused') {
      expect(read.reason).toMatch(reason);
      expect(read.suggestion).toBe(suggestion);
    }
  });

  it('offers suggestions that it reads itself', () => {
    for (const [text, dimension] of refused) {
      const read = parseQuantity(text, dimension);
      if (read.kind === 'refused' && read.suggestion !== undefined)
        expect([text, read.suggestion, parseQuantity(read.suggestion, dimension).kind]).toEqual([text, read.suggestion, 'value']);
    }
  });

  it('scales decimal units without touching a bit', () => {
    expect(parseQuantity('28.3e9 Hz', 'frequency')).toEqual({ kind: 'value', value: 28.3 });
    expect(parseQuantity('0.42 in', 'length')).toEqual({ kind: 'value', value: 10.668 });
    expect(parseQuantity('0.0107 m', 'length')).toEqual({ kind: 'value', value: 10.7 });
  });

  it('gives a bare number the unit the field shows', () => {
    expect(parseQuantity('1.2', 'length', { shownUnit: 'm' })).toEqual({ kind: 'value', value: 1200 });
    expect(parseQuantity('28000', 'frequency', { shownUnit: 'MHz' })).toEqual({ kind: 'value', value: 28 });
  });

  it('says how a bare number in hertz was read', () => {
    expect(parseQuantity('28e9', 'frequency')).toEqual({ kind: 'value', value: 28e9, note: 'Read in GHz; for hertz write 28e9 Hz' });
  });

  it('says aloud that a small m was read as mega', () => {
    expect(parseQuantity('2400 mhz', 'frequency')).toEqual({ kind: 'value', value: 2.4, note: '"mhz" read as MHz, megahertz' });
  });

  it('keeps gain and relative level apart where the field shows which it is', () => {
    expect(parseQuantity('30 dBi', 'level', { shownUnit: 'dB' })).toMatchObject({ kind: 'refused', suggestion: '30 dB' });
    expect(parseQuantity('30 dB', 'level', { shownUnit: 'dBi' })).toEqual({ kind: 'value', value: 30, note: 'dB read as dBi' });
  });

  it('ends for every text with a finite value or a reason', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 40, unit: 'grapheme' }), fc.constantFrom<QuantityDimension>('frequency', 'length', 'angle', 'level', 'power', 'number'), (text, dimension) => {
        const read = parseQuantity(text, dimension);
        if (read.kind === 'value') expect(Number.isFinite(read.value)).toBe(true);
        else expect(read.reason).not.toBe('');
      }),
      { seed: 41, numRuns: 2000 },
    );
  });
});

describe('formatQuantity', () => {
  it.each<readonly [number, QuantityDimension, string]>([
    [28, 'frequency', '28 GHz'],
    [10.70356, 'length', '10.704 mm'],
    [45, 'angle', '45°'],
    [-13.261, 'level', '-13.261 dB'],
    [-1e-12, 'level', '-1e-12 dB'],
    [-0, 'length', '0 mm'],
    [123456, 'length', '123460 mm'],
    [0.0009, 'number', '0.0009'],
  ])('writes %d as a %s: %s', (value, dimension, text) => {
    expect(formatQuantity(value, dimension)).toBe(text);
  });

  it('writes the value in the unit the field shows', () => {
    expect(formatQuantity(1200, 'length', { shownUnit: 'm' })).toBe('1.2 m');
    expect(formatQuantity(10.668, 'length', { shownUnit: 'in' })).toBe('0.42 in');
    expect(formatQuantity(34.5, 'level', { shownUnit: 'dBi' })).toBe('34.5 dBi');
    expect(formatQuantity(2, 'power', { shownUnit: 'dBm' })).toBe('33.01 dBm');
  });

  it('refuses numbers that are not finite', () => {
    expect(() => formatQuantity(Number.NaN, 'length')).toThrow('A length to be shown must be finite; got NaN');
  });

  const dimensions = fc.constantFrom<QuantityDimension>('frequency', 'length', 'angle', 'level', 'power', 'number');

  it('is undone by parseQuantity for every number of five figures', () => {
    fc.assert(
      fc.property(fc.integer({ min: -99999, max: 99999 }), fc.integer({ min: -9, max: 6 }), dimensions, (mantissa, exponent, dimension) => {
        const value = Number(`${mantissa}e${exponent}`);
        const read = parseQuantity(formatQuantity(value, dimension), dimension);
        expect(read).toMatchObject({ kind: 'value', value: value === 0 ? 0 : value });
      }),
      { seed: 42 },
    );
  });

  it('has an exact form that is undone for every finite number', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), dimensions, (value, dimension) => {
        expect(parseQuantity(exactQuantity(value, dimension), dimension)).toMatchObject({ kind: 'value', value: value === 0 ? 0 : value });
      }),
      { seed: 43 },
    );
  });
});
