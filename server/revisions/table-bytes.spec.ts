import fc from 'fast-check';
import { TableBytes } from './table-bytes';

type Kind = 'decimal' | 'significant' | 'whole';

function written(kind: Kind, value: number): string {
  const table = new TableBytes();
  table[kind](value);
  return table.take().toString('latin1');
}

/** The same by the plain way. */
const plain = (value: number): string => String(Math.round(value * 1e4) / 1e4 + 0);

describe('decimals of a table', () => {
  it.each([
    [0, '0'],
    [-0, '0'],
    [-0.00004, '0'],
    [-0.00006, '-0.0001'],
    [359.99996, '360'],
    [-12.5, '-12.5'],
    [0.0305, '0.0305'],
    [1e15 / 4, '250000000000000'],
  ])('of %d are %s', (value, text) => {
    expect(written('decimal', value)).toBe(text);
  });

  it('are what rounding to four of them gives, whatever the number', () => {
    fc.assert(
      fc.property(fc.oneof(fc.double({ min: -400, max: 400, noNaN: true }), fc.double({ min: -9e10, max: 9e10, noNaN: true }), fc.float({ min: -1000, max: 1000, noNaN: true })), (value) => {
        expect(written('decimal', value)).toBe(plain(value));
      }),
      { numRuns: 2000 },
    );
  });
});

describe('numbers of a table', () => {
  it('keep six digits where they are to, and no zeros behind them', () => {
    expect([0.123456789, 1234567, 0.5, 1e-9 / 3, -0].map((value) => written('significant', value))).toEqual(['0.123457', '1234570', '0.5', '3.33333e-10', '0']);
  });

  it('are whole where they are counts', () => {
    fc.assert(fc.property(fc.maxSafeNat().map((value) => value % 1e15), (value) => expect(written('whole', value)).toBe(String(value))));
  });

  it('are finite', () => {
    for (const value of [NaN, Infinity, -Infinity]) {
      for (const kind of ['decimal', 'significant'] as const) expect(() => written(kind, value)).toThrow(`A table holds finite numbers; got ${value}`);
    }
  });
});

describe('a table in bytes', () => {
  it('grows with what is written, and loses nothing', () => {
    const table = new TableBytes(1);
    const rows = Array.from({ length: 500 }, (_, n) => `${n},Å ${n},${n / 8}`);
    rows.forEach((_row, n) => {
      table.whole(n);
      table.comma();
      table.text(Buffer.from(`Å ${n}`));
      table.comma();
      table.decimal(n / 8);
      table.endRow();
    });
    expect(table.take().toString('utf8')).toBe(rows.map((row) => `${row}\r\n`).join(''));
  });
});
