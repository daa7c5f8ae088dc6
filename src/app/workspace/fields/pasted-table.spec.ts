import * as fc from 'fast-check';
import { copiedTable, readPastedTable } from './pasted-table';
import type { TableColumn } from './pasted-table';

const columns: readonly TableColumn[] = [
  { label: 'Off axis', dimension: 'angle', unit: '°' },
  { label: 'Level', dimension: 'level', unit: 'dBi' },
];

describe('readPastedTable', () => {
  it.each([
    ['tabulators', '5\t20\n10\t12.5'],
    ['semicolons', '5;20\n10;12.5'],
    ['commas', '5,20\n10,12.5'],
    ['blanks', '5 20\n10   12.5'],
    ['a heading and a blank line', 'angle\tlevel\n\n5\t20\n10\t12.5\n'],
    ['units', '5 deg\t20 dBi\r\n10°\t12.5'],
  ])('reads columns parted by %s', (_name, text) => {
    expect(readPastedTable(text, columns)).toMatchObject({ rows: [[5, 20], [10, 12.5]], faults: [] });
  });

  it('names line, column, reason and remedy of every entry it cannot read', () => {
    const { rows, faults } = readPastedTable('5\t20\n7,5\tabc\n10', columns);
    expect(rows).toEqual([[5, 20]]);
    expect(faults.map(({ line, column, text }) => [line, column, text])).toEqual([
      [2, 1, '7,5'],
      [2, 2, 'abc'],
      [3, 2, ''],
    ]);
    expect(faults[0].suggestion).toBe('7.5');
    expect(faults[1].reason).toMatch(/^Level: /);
  });

  it('refuses more columns than belong in the table', () => {
    expect(readPastedTable('5\t20\t9', columns).faults).toEqual([
      { line: 1, column: 3, text: '9', reason: '2 columns belong here: Off axis, Level', suggestion: null },
    ]);
  });

  it('reads back what was copied, to the last bit', () => {
    const finite = fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e6, max: 1e6 }).map((value) => (value === 0 ? 0 : value));
    fc.assert(
      fc.property(fc.array(fc.tuple(finite, finite), { minLength: 1, maxLength: 20 }), (rows) => {
        expect(readPastedTable(copiedTable(rows, columns), columns)).toEqual({ rows, faults: [], headingLines: 1 });
      }),
      { seed: 5 },
    );
  });
});
