import * as fc from 'fast-check';
import { csvNumber, readCsv } from './csv-table';
import type { CsvChoices, CsvTable } from './csv-table';
import { writeCsv } from './csv-writer';
import { encodeUtf8 } from './file-text';

function table(text: string, choices?: CsvChoices): CsvTable {
  const result = readCsv(encodeUtf8(text), choices);
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.messages));
  return result.table;
}

function refusal(text: string, choices?: CsvChoices): string {
  const result = readCsv(encodeUtf8(text), choices);
  if (result.kind === 'read') throw new Error('the table was read');
  return result.messages.map((m) => `${m.line}${m.column === undefined ? '' : `:${m.column}`} ${m.text}`).join('\n');
}

describe('readCsv', () => {
  it.each([
    ['commas', 'a,b\r\n1,2\r\n', ',', '.'],
    ['semicolons', 'a;b\n1.5;2\n', ';', '.'],
    ['semicolons with decimal commas', 'a;b\n1,5;2,5\n', ';', ','],
    ['tabs', 'a\tb\n1,5\t2\n', '\t', ','],
    ['quoted separators', '"a;x",b\n"1;2",3\n', ',', '.'],
    ['one column', 'a\n1\n', ',', '.'],
  ])('detects %s', (_name, text, separator, decimal) => {
    const read = table(text);
    expect(read.dialect).toEqual({ separator, decimal });
    expect(read.rows.length).toBe(2);
  });

  it('keeps quotes, separators and line ends inside quotes, and the line each row begins on', () => {
    const read = table('name,note\r\n"a ""b""","x,\r\ny"\r\nlast,z');
    expect(read.rows).toEqual([['name', 'note'], ['a "b"', 'x,\r\ny'], ['last', 'z']]);
    expect(read.rowLines).toEqual([1, 2, 4]);
  });

  it('takes blanks as data and drops a byte order mark and blank lines at the end', () => {
    expect(table('\ufeffa, b\n1, 2\n\n\n').rows).toEqual([['a', ' b'], ['1', ' 2']]);
  });

  it('takes one guarding apostrophe away', () => {
    expect(table("a,b\n'=1+1,''-x\n'quoted,-12.5\n").rows.slice(1)).toEqual([['=1+1', "'-x"], ["'quoted", '-12.5']]);
  });

  it.each([
    ['ragged rows', 'a,b\n1,2\n3\n4,5,6\n', '3:2 Row 3 has 1 cell(s); the first row has 2\n4:3 Row 4 has 3 cell(s); the first row has 2'],
    ['an unclosed quote', 'a,b\n1,"2\n', '2:2 The quote that opens here is never closed'],
    ['a quote inside a plain cell', 'a,b\n1,2"3\n', '2:2 A quote stands inside the cell that begins "2"'],
    ['text after a quote', 'a,b\n"1"x,2\n', '2:1 Text follows the closing quote of the cell'],
    ['a NUL', 'a,b\n1,\u0000\n', '2 The file holds a NUL character'],
    ['mixed decimal signs', 'a;b\n1,5;2\n1.5;3\n', '3 Decimal commas (line 2) and decimal points (line 3) are mixed'],
    ['nothing', '', '0 The table is empty'],
    ['a blank line in the middle', 'a,b\n\n1,2\n', '2:2 Row 2 has 1 cell(s); the first row has 2'],
  ])('refuses %s with its place', (_name, text, said) => {
    expect(refusal(text)).toBe(said);
  });

  it('checks bytes, rows, columns and cells against their limits', () => {
    const limits = { bytes: 40, rows: 3, columns: 3, cellLength: 10 };
    expect(refusal('x'.repeat(41), { limits })).toBe('0 The file has 41 bytes; at most 40 are read');
    expect(refusal('1\n2\n3\n4\n', { limits })).toMatch(/more than 3 rows/);
    expect(refusal('1,2,3,4\n', { limits })).toMatch(/1:4 The row has more than 3 columns/);
    expect(refusal('12345678901,2\n', { limits })).toMatch(/1:1 The cell is longer than 10/);
  });

  it('lets a person name the dialect', () => {
    expect(table('a,b;c\n', { dialect: { separator: ';' } }).rows).toEqual([['a,b', 'c']]);
  });

  it('ends for arbitrary bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 200 }), (bytes) => {
        const result = readCsv(bytes);
        if (result.kind === 'refused') expect(result.messages.length).toBeGreaterThan(0);
        else expect(new Set(result.table.rows.map((row) => row.length)).size).toBe(1);
      }),
      { seed: 71, numRuns: 2000 },
    );
  });
});

describe('csvNumber', () => {
  const point = { separator: ';', decimal: '.' } as const;
  const comma = { separator: ';', decimal: ',' } as const;

  it.each([
    ['-12.5', point, -12.5],
    [' 1e-3 ', point, 0.001],
    ['1,5', comma, 1.5],
    ['1.5', comma, null],
    ['28GHz', point, null],
    ['', point, null],
    ['0x1C', point, null],
    ['NaN', point, null],
    ['1e999', point, null],
    ['#N/A', point, null],
  ])('reads %j as %p', (cell, dialect, value) => {
    expect(csvNumber(cell, dialect)).toBe(value);
  });
});

describe('writeCsv', () => {
  it('guards text that would run as a formula and leaves numbers alone', () => {
    expect(writeCsv([['-12.5', '-1+1', '--5', '=HYPERLINK("http://x","a,b")', '@SUM(A1)', "'=x", ' =1', -2.5e-3, null]])).toBe(
      `-12.5,'-1+1,'--5,"'=HYPERLINK(""http://x"",""a,b"")",'@SUM(A1),''=x, =1,-0.0025,\r\n`,
    );
  });

  it('throws on numbers that are not finite', () => {
    expect(() => writeCsv([[Number.NaN]])).toThrow('A table holds finite numbers; got NaN');
  });

  it('is undone by readCsv', () => {
    const cell = fc.oneof(fc.string({ unit: 'grapheme', maxLength: 12 }), fc.stringMatching(/^['=+@\t\r\n;,"-]{0,4}[a-z0-9]{0,3}$/), fc.double({ noNaN: true, noDefaultInfinity: true }));
    const rows = fc.integer({ min: 1, max: 5 }).chain((width) => fc.array(fc.array(cell, { minLength: width, maxLength: width }), { minLength: 1, maxLength: 6 }));
    fc.assert(
      fc.property(rows, (written) => {
        const expected = written.map((row) => row.map((value) => String(value).replaceAll('\0', '\ufffd')));
        fc.pre(!expected[0][0].startsWith('\ufeff'));
        // The separator of our own files is known; a table of one text column may look like another dialect.
        expect(table(writeCsv(written), { dialect: { separator: ',' } }).rows).toEqual(expected);
      }),
      { seed: 72, numRuns: 500 },
    );
  });
});
