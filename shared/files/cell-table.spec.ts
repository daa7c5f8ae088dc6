import { suggestTableMapping } from './cell-table-mapping';
import { readCellTable } from './cell-table';
import { readCsv } from './csv-table';
import type { CsvTable } from './csv-table';
import type { CellTableMapping, TableColumnRole } from './family-inspection';
import { encodeUtf8 } from './file-text';

function tableOf(text: string): CsvTable {
  const result = readCsv(encodeUtf8(text));
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.messages));
  return result.table;
}

function mapping(roles: readonly TableColumnRole[], change: Partial<CellTableMapping> = {}): CellTableMapping {
  return { columns: roles.map((holds, column) => ({ column, holds })), headerRow: 1, blanks: 'refuse', ...change };
}

const polar: readonly TableColumnRole[] = [
  { role: 'cell' },
  { role: 'frequency', unit: 'GHz' },
  { role: 'response', term: 'S11', part: 'magnitude' },
  { role: 'response', term: 'S11', part: 'phase', unit: 'deg' },
];

function read(text: string, given: CellTableMapping) {
  const result = readCellTable(tableOf(text), given, { name: 'table.csv', sha256: 'ab' });
  return { ...result, said: result.messages.map((m) => `${m.line}${m.column ? `:${m.column}` : ''} ${m.text}`).join('\n') };
}

describe('readCellTable', () => {
  it('gives curves in SI with rows in any order', () => {
    const { curves } = read('cell,f,m,p\nA,11,0.5,180\nB,10,1,0\nA,10,1,90\n', mapping(polar));
    expect(curves.map((curve) => [curve.cellId, Array.from(curve.frequenciesHz)])).toEqual([['A', [10e9, 11e9]], ['B', [10e9]]]);
    expect(curves[0]).toMatchObject({ file: 'table.csv', sha256: 'ab', thetaDeg: 0, phiDeg: 0, portCount: 1 });
    [0, 1, -0.5, 0].forEach((value, i) => expect(curves[0].values[i]).toBeCloseTo(value, 12));
  });

  it('reads lengths, angles and frequencies in the units chosen', () => {
    const roles: TableColumnRole[] = [
      { role: 'parameter', name: 'side', unit: 'in' },
      { role: 'frequency', unit: 'MHz' },
      { role: 'theta', unit: 'rad' },
      { role: 'phi', unit: 'deg' },
      { role: 'response', term: 'S11', part: 'real' },
      { role: 'response', term: 'S11', part: 'imaginary' },
    ];
    const [curve] = read(`s,f,t,p,re,im\n0.42,28100,${Math.PI / 6},22.5,0.6,-0.8\n`, mapping(roles)).curves;
    expect(curve).toMatchObject({ cellId: 'side10.668', parametersMm: [{ name: 'side', value: 10.668 }], thetaDeg: 30, phiDeg: 22.5 });
    expect([curve.frequenciesHz[0], ...curve.values]).toEqual([28.1e9, 0.6, -0.8]);
  });

  it('lays four terms row by row', () => {
    const roles: TableColumnRole[] = [
      { role: 'cell' },
      { role: 'frequency', unit: 'Hz' },
      ...(['S11', 'S21', 'S12', 'S22'] as const).flatMap((term): TableColumnRole[] => [{ role: 'response', term, part: 'real' }, { role: 'response', term, part: 'imaginary' }]),
    ];
    const [curve] = read('c,f,a,b,c,d,e,f,g,h\nA,1,11,0,21,0,12,0,22,0\n', mapping(roles)).curves;
    expect([curve.portCount, ...curve.values]).toEqual([2, 11, 0, 12, 0, 21, 0, 22, 0]);
  });

  it('reads decimal commas', () => {
    const [curve] = read('cell;f;m;p\nA;10,5;0,5;0\n', mapping(polar)).curves;
    expect([curve.frequenciesHz[0], curve.values[0]]).toEqual([10.5e9, 0.5]);
  });

  it('lists blanks with row and column, or leaves their points missing when that is chosen', () => {
    const text = 'cell,f,m,p\nA,10,1,0\nA,11,,0\nA,12,#N/A,0\n';
    const refused = read(text, mapping(polar));
    expect(refused.said).toBe('3:3 "" is not a number\n4:3 "#N/A" is not a number');
    expect(refused.curves).toEqual([]);
    const kept = read(text, mapping(polar, { blanks: 'missing' }));
    expect(Array.from(kept.curves[0].frequenciesHz)).toEqual([10e9]);
    expect(kept.said).toBe('0 2 row(s) without a complete response are left out as missing points');
  });

  it('lists the first twenty bad cells and counts the rest', () => {
    const refused = read(`cell,f,m,p\n${'A,10,x,0\n'.repeat(30)}`, mapping(polar));
    expect(refused.messages.length).toBe(21);
    expect(refused.messages[20].text).toBe('10 further faults are not listed');
  });

  it('merges equal repeats and refuses unequal ones', () => {
    expect(read('cell,f,m,p\nA,10,1,0\nA,10,1,0\n', mapping(polar)).said).toBe('3 10000000000 Hz stands twice with the same values for "A"; it was merged');
    expect(read('cell,f,m,p\nA,10,1,0\nA,10,1,5\n', mapping(polar)).said).toBe('3 10000000000 Hz stands twice with different values for "A"; first on line 2');
  });

  it.each<readonly [string, readonly TableColumnRole[], RegExp]>([
    ['no frequency', [{ role: 'cell' }, { role: 'response', term: 'S11', part: 'dB' }, { role: 'response', term: 'S11', part: 'phase', unit: 'deg' }], /No column holds the frequency/],
    ['no cell', polar.slice(1), /No column names the cell/],
    ['half a response', polar.slice(0, 3), /S11 takes real and imaginary part, or dB or magnitude and phase; given: magnitude/],
    ['no response', polar.slice(0, 2), /given: none/],
    ['two of four terms', [...polar, { role: 'response', term: 'S22', part: 'dB' }], /given: S11, S22/],
  ])('refuses a mapping with %s', (_name, roles, expected) => {
    expect(read('a,b,c,d,e\nA,10,1,0,0\n', mapping(roles)).said).toMatch(expected);
  });

  it('refuses columns that do not exist, negative frequencies and changing parameters', () => {
    expect(read('cell,f,m\nA,1,1\n', mapping(polar)).said).toMatch(/Column 4 does not exist; the table has 3/);
    expect(read('cell,f,m,p\nA,-1,1,0\n', mapping(polar)).said).toMatch(/2 A frequency or a response on this row is out of range/);
    const withSide = [...polar, { role: 'parameter', name: 'side', unit: 'mm' } as const];
    expect(read('cell,f,m,p,s\nA,1,1,0,3\nA,2,1,0,4\n', mapping(withSide)).said).toMatch(/3 Cell "A" has other parameters here than on line 2/);
  });
});

describe('suggestTableMapping', () => {
  it.each<readonly [string, TableColumnRole | null]>([
    ['cell_id', { role: 'cell' }],
    ['freq_Hz', { role: 'frequency', unit: 'Hz' }],
    ['Frequency (GHz)', { role: 'frequency', unit: 'GHz' }],
    ['f [MHz]', { role: 'frequency', unit: 'MHz' }],
    ['frequency', null],
    ['theta_deg', { role: 'theta', unit: 'deg' }],
    ['phi (rad)', { role: 'phi', unit: 'rad' }],
    ['theta', null],
    ['S11_dB', { role: 'response', term: 'S11', part: 'dB' }],
    ['S21 phase (deg)', { role: 'response', term: 'S21', part: 'phase', unit: 'deg' }],
    ['Re(S12)', { role: 'response', term: 'S12', part: 'real' }],
    ['S22_imag', { role: 'response', term: 'S22', part: 'imaginary' }],
    ['|S11| mag', { role: 'response', term: 'S11', part: 'magnitude' }],
    ['S11 phase', null],
    ['patch_side_mm', { role: 'parameter', name: 'patchSide', unit: 'mm' }],
    ['gap um', { role: 'parameter', name: 'gap', unit: 'um' }],
    ['notes', null],
  ])('reads the heading %j', (heading, role) => {
    const { mapping: suggested, undecided } = suggestTableMapping(tableOf(`${heading}\n1\n`));
    expect([suggested.columns.map(({ holds }) => holds), undecided.length]).toEqual(role === null ? [[], 1] : [[role], 0]);
  });
});
