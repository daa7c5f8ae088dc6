import type { FamilyDescription } from '../model/cell-family';
import { assembleEdition } from './edition-assembly';
import { inspectFamilyFiles } from './family-import';
import type { NamedFile } from './family-inspection';
import { encodeUtf8 } from './file-text';

const description: FamilyDescription = {
  name: 'Patches',
  kind: 'square patch',
  summary: '',
  operation: 'reflect',
  periodXMm: 5,
  periodYMm: 5,
  substrate: { material: 'slab', relativePermittivity: 2.2, lossTangent: 0, thicknessMm: 0.5 },
  metal: '',
  parameters: [{ id: 'side', label: 'Side', unit: 'mm' }],
  shapes: [],
  designFrequencyGHz: 10,
  ports: 'x',
  referencePlane: 'patch plane',
  timeConvention: 'exp(+jwt)',
  provenance: 'invented',
  instrument: 'none',
  date: '2026-12-01',
  limits: '',
  excludedRegions: [],
};

function network(name: string, comments: readonly string[], points: string): NamedFile {
  return { name, sha256: `hash-of-${name}`, bytes: encodeUtf8(`${comments.map((line) => `! ${line}\n`).join('')}# GHz S RI R 50\n${points}`) };
}

const twoSides = [network('b.s1p', ['side_mm = 4'], '10 0.1 0.2\n11 0.3 0.4\n'), network('a.s1p', ['side_mm = 3'], '10 0.5 0.6\n')];

function assembled(files: readonly NamedFile[], change: Partial<FamilyDescription> = {}) {
  const result = assembleEdition(inspectFamilyFiles(files), { ...description, ...change });
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.messages));
  return { edition: result.edition, said: result.messages.map(({ text }) => text).join('\n') };
}

function refusal(files: readonly NamedFile[], change: Partial<FamilyDescription> = {}): string {
  const result = assembleEdition(inspectFamilyFiles(files), { ...description, ...change });
  if (result.kind === 'edition') throw new Error('an edition was assembled');
  return result.messages.map(({ text }) => text).join('\n');
}

describe('the origin of responses', () => {
  it('names the file of every curve and the line of every point', () => {
    const result = assembleEdition(inspectFamilyFiles(twoSides), description);
    if (result.kind === 'refused') throw new Error('refused');
    const { fileOfCurve, lineOfPoint, repeats } = result.origin;
    // One comment and the option line stand above the first record; a has no second frequency.
    expect([fileOfCurve, Array.from(lineOfPoint), repeats]).toEqual([['a.s1p', 'b.s1p'], [3, 0, 3, 4], []]);
  });

  it('holds a repeated measurement as the table would: conjugated where the table is', () => {
    const repeat = network('b2.s1p', ['side_mm = 4', 'cell_id = b'], '10 0.11 0.21\n11 0.31 0.41\n');
    const result = assembleEdition(inspectFamilyFiles([...twoSides, repeat], { repeatFiles: ['b2.s1p'] }), { ...description, timeConvention: 'exp(-jwt)' });
    if (result.kind === 'refused') throw new Error(JSON.stringify(result.messages));
    expect(result.edition.cells.map(({ id }) => id)).toEqual(['a', 'b']);
    expect(Array.from(result.edition.responses.values.subarray(24, 26))).toEqual([0.3, -0.4]);
    expect(result.origin.repeats).toEqual([
      {
        file: 'b2.s1p',
        cell: 1,
        theta: 0,
        phi: 0,
        frequenciesHz: Float64Array.of(10e9, 11e9),
        values: Float64Array.of(0.11, -0.21, 0, -0, 0, -0, 0.11, -0.21, 0.31, -0.41, 0, -0, 0, -0, 0.31, -0.41).map((value) => value + 0),
        lines: Int32Array.of(4, 5),
      },
    ]);
  });
});

describe('assembleEdition', () => {
  it('sorts cells by parameter, repeats a one-port in S22 and marks what was not given', () => {
    const { edition, said } = assembled(twoSides);
    expect(edition.cells).toEqual([
      { id: 'a', parametersMm: [3], fileHashes: ['hash-of-a.s1p'] },
      { id: 'b', parametersMm: [4], fileHashes: ['hash-of-b.s1p'] },
    ]);
    expect(Array.from(edition.responses.frequenciesHz)).toEqual([10e9, 11e9]);
    expect(Array.from(edition.responses.present)).toEqual([1, 0, 1, 1]);
    expect(Array.from(edition.responses.values.subarray(24))).toEqual([0.3, 0.4, 0, 0, 0, 0, 0.3, 0.4]);
    expect(said).toBe('1 of 4 points of the grid are not given');
  });

  it('keeps S11, S21, S12, S22 of a two-port in that order at its angle', () => {
    const files = [0, 30].map((theta) => network(`t${theta}.s2p`, ['side_mm = 3', 'cell_id = A', `theta_deg = ${theta}`, 'phi_deg = 45'], `10 ${theta} 1 2 3 4 5 6 7\n`));
    const { edition } = assembled(files, { ports: 'te-and-tm' });
    expect(edition.cells.length).toBe(1);
    expect(Array.from(edition.responses.thetasRad)).toEqual([0, Math.PI / 6]);
    // A version 1 file writes S11 S21 S12 S22.
    expect(Array.from(edition.responses.values.subarray(8))).toEqual([30, 1, 2, 3, 4, 5, 6, 7]);
  });

  it('conjugates files that turn the other way and keeps the fact', () => {
    const { edition, said } = assembled([network('a.s1p', ['side_mm = 3', 'exp(-j w t)'], '10 0.5 0.6\n')], { timeConvention: 'exp(-jwt)' });
    expect(edition.responses.values[1]).toBe(-0.6);
    expect(edition.description.timeConvention).toBe('exp(-jwt)');
    expect(said).toBe('The files turn with exp(-jwt): every response was conjugated to exp(+jwt)');
  });

  it('warns when the description denies the files about time', () => {
    expect(assembled([network('a.s1p', ['side_mm = 3', 'exp(-j w t)'], '10 0.5 0.6\n')]).said).toBe('The files say exp(-jwt); the description says exp(+jwt) and holds');
  });

  it('takes parameters by name, or in order and says so', () => {
    expect(assembled([twoSides[1]], { parameters: [{ id: 'width', label: 'Width', unit: 'mm' }] }).said).toBe('The parameters were taken in order: width from side');
    const pair = [network('a.s1p', ['x_mm = 1', 'y_mm = 2'], '10 0 0\n')];
    const swapped = assembled(pair, { parameters: [{ id: 'y', label: 'y', unit: 'mm' }, { id: 'x', label: 'x', unit: 'mm' }] });
    expect(swapped.edition.cells[0].parametersMm).toEqual([2, 1]);
  });

  it.each<readonly [string, readonly NamedFile[], Partial<FamilyDescription>, RegExp]>([
    ['a set that the inspection blocks', [twoSides[0], { name: 'c.s1p', bytes: encodeUtf8('junk') }], {}, /1 file\(s\) were refused: c\.s1p/],
    ['parameters the files do not have', twoSides, { parameters: [{ id: 'p', label: 'p', unit: 'mm' }, { id: 'q', label: 'q', unit: 'mm' }] }, /The description has the parameters p, q; the files have side/],
    ['one port said to be two', twoSides, { ports: 'te-and-tm' }, /The files have one port; "te-and-tm" takes two/],
    ['ports mixed', [twoSides[0], network('c.s2p', ['side_mm = 5'], '10 0 0 0 0 0 0 0 0\n')], {}, /Some files have one port and some have two/],
    ['a cell with two sizes', [network('a.s1p', ['cell_id = A', 'side_mm = 3', 'theta_deg = 0'], '10 0 0\n'), network('b.s1p', ['cell_id = A', 'side_mm = 4', 'theta_deg = 15'], '10 0 0\n')], {}, /b\.s1p gives 4 mm for A; another file gives 3 mm/],
    ['a cell without its size', [twoSides[0], twoSides[1], network('c.s1p', ['other_mm = 5'], '10 0 0\n')], { parameters: [{ id: 'side', label: 'Side', unit: 'mm' }] }, /c\.s1p does not give side/],
  ])('refuses %s', (_name, files, change, expected) => {
    expect(refusal(files, change)).toMatch(expected);
  });

  it('refuses a grid that would not fit, before it is made', () => {
    const rows = (offset: number) => Array.from({ length: 1500 }, (_, i) => `${10 + (i * 50 + offset) * 1e-6} 0 0`).join('\n');
    const files = Array.from({ length: 60 }, (_, i) => network(`c${i}.s1p`, [`side_mm = ${i + 1}`], `${rows(i % 50)}\n`));
    expect(refusal(files)).toMatch(/The grid of cells, angles and frequencies has 4\d{6} points; at most 4000000 are kept/);
  });
});
