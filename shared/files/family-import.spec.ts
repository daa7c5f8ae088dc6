import { encodeAscii, encodeUtf8 } from './file-text';
import { factsOfComments, factsOfName, parameterId, timeConventionIn } from './family-facts';
import { inspectFamilyFiles } from './family-import';
import type { FamilyMapping, InspectedFamily, NamedFile } from './family-inspection';
import { portsIn, provenanceIn } from './family-summary';

const file = (name: string, text: string): NamedFile => ({ name, bytes: encodeUtf8(text) });

function network(comments: readonly string[], points = '10 0.1 0.2\n11 0.1 0.1\n'): string {
  return `${comments.map((line) => `! ${line}\n`).join('')}# GHz S RI R 50\n${points}`;
}

function said(family: InspectedFamily): string {
  return family.inspection.messages.map((m) => `${m.severity}: ${m.text}`).join('\n');
}

describe('a cell measured twice', () => {
  const files = [file('a.s1p', network(['a_mm = 1', 'cell_id = A'])), file('again.s1p', network(['a_mm = 1', 'cell_id = A'], '10 0.1 0.21\n'))];

  it('is refused with both ways out until a person says which', () => {
    const { inspection } = inspectFamilyFiles(files);
    expect(inspection.messages).toContainEqual(
      expect.objectContaining({ severity: 'error', text: 'a.s1p and again.s1p both describe A at theta 0 deg, phi 0 deg', suggestion: 'Leave one of them aside, or say that it measures the cell again' }),
    );
  });

  it('is kept apart from the family once the second file is said to measure it again', () => {
    const { inspection, curves, repeats } = inspectFamilyFiles(files, { repeatFiles: ['again.s1p'] });
    expect(inspection.messages.filter(({ severity }) => severity === 'error')).toEqual([]);
    expect([curves, repeats].map((list) => list.map((curve) => [curve.file, Array.from(curve.lines ?? [])]))).toEqual([[['a.s1p', [4, 5]]], [['again.s1p', [4]]]]);
    expect(inspection.detected.frequencyCount).toBe(2);
  });

  it('needs a first measurement', () => {
    const alone = inspectFamilyFiles([files[0], file('other.s1p', network(['a_mm = 2', 'cell_id = B']))], { repeatFiles: ['other.s1p'] });
    expect(said(alone)).toContain('error: other.s1p is to measure B at theta 0 deg, phi 0 deg again, but no other file measures that');
  });
});

describe('inspectFamilyFiles', () => {
  it('detects parameters, angles, ports, provenance and time convention from comments', () => {
    const comments = (side: number, theta: number) => [
      'PROVENANCE: simulated: method of moments',
      `patch_side_mm = ${side}`,
      'period_mm = 5.00 (square lattice)',
      'substrate: eps_r = 2.2, tan_delta = 0.0009 (constant), thickness_mm = 0.508',
      `theta_deg = ${theta}`,
      'phi_deg = 22.5',
      'Port 1 = TE, port 2 = TM',
      'Time convention exp(+j w t)',
    ];
    const points = '26 1 0 0 0 0 0 1 0\n30 1 0 0 0 0 0 1 0\n';
    const names = [[3, 0], [3, 15], [4, 0], [4, 15]];
    const family = inspectFamilyFiles(names.map(([side, theta], i) => file(`cell${i}.s2p`, network([...comments(side, theta), `cell_id = C${side}`], points))));
    const { detected } = family.inspection;
    expect(detected).toEqual({
      portCount: 2,
      parameterNames: ['patchSide'],
      thetasDeg: [0, 15],
      phisDeg: [22.5],
      frequencyRangeGHz: { from: 26, to: 30 },
      frequencyCount: 2,
      cellCount: 2,
      portsHint: 'te-and-tm',
      provenanceHint: 'simulated',
      timeConventionHint: 'exp(+jwt)',
      descriptionHint: {
        periodXMm: 5,
        periodYMm: 5,
        substrate: { material: 'not named in the files', relativePermittivity: 2.2, lossTangent: 0.0009, thicknessMm: 0.508 },
        parameters: [{ id: 'patchSide', label: 'Patch side', unit: 'mm' }],
        designFrequencyGHz: 28,
        ports: 'te-and-tm',
        provenance: 'simulated',
        timeConvention: 'exp(+jwt)',
      },
    });
    expect(family.inspection.files[1]).toMatchObject({ kind: 'touchstone', status: 'read', cellId: 'C3', portCount: 2, pointCount: 2, fromGHz: 26, toGHz: 30, thetaDeg: { value: 15, from: 'comment' } });
    expect(said(family)).toBe('');
  });

  it('lets the index win over comments and the mapping over the index', () => {
    const files = [
      file('set/index.csv', 'file,cell_id,patch_mm,theta_deg,phi_deg,period_mm\na.s1p,A,3.5,15,0,5\nb.s1p,B,4,15,0,5\n'),
      file('set/a.s1p', network(['patch_side_mm = 9', 'theta_deg = 60'])),
      file('set/b.s1p', network(['patch_side_mm = 9', 'theta_deg = 60'])),
    ];
    const indexed = inspectFamilyFiles(files);
    expect(indexed.curves.map(({ cellId, parametersMm, thetaDeg }) => [cellId, parametersMm[0], thetaDeg])).toEqual([
      ['A', { name: 'patch', value: 3.5 }, 15],
      ['B', { name: 'patch', value: 4 }, 15],
    ]);
    const mapped = inspectFamilyFiles(files, { corrections: [{ file: 'set/a.s1p', parametersMm: [{ name: 'patch', value: 3.6 }], thetaDeg: 30 }] });
    expect(mapped.inspection.files[1]).toMatchObject({ cellId: 'A', parameters: [{ name: 'patch', value: 3.6, from: 'mapping' }], thetaDeg: { value: 30, from: 'mapping' }, phiDeg: { value: 0, from: 'index' } });
  });

  it('reads parameter name and value from paired columns of the index', () => {
    const files = [
      file('index.csv', 'file,parameter_name,parameter_mm,parameter2_name,parameter2_mm,polarisation,label\nr1.s2p,patch_x,5,patch_y,7,port1=x port2=y,simulated\nr2.s2p,patch_x,6,patch_y,8,port1=x port2=y,simulated\n'),
      ...['r1', 'r2'].map((name) => file(`${name}.s2p`, network([], '10 1 0 0 0 0 0 1 0\n'))),
    ];
    const { detected } = inspectFamilyFiles(files).inspection;
    expect([detected.parameterNames, detected.portsHint, detected.provenanceHint]).toEqual([['patchX', 'patchY'], 'x-and-y', 'simulated']);
  });

  it('falls back on the name of the file', () => {
    const family = inspectFamilyFiles(['K5_a03.00_t15_p22.5.s1p', 'K5_a04.00_t15_p22.5.s1p'].map((name) => file(name, network([]))));
    expect(family.inspection.files[0]).toMatchObject({ cellId: 'K5_a03.00', parameters: [{ name: 'a', value: 3, from: 'file-name' }], thetaDeg: { value: 15, from: 'file-name' }, phiDeg: { value: 22.5, from: 'file-name' } });
  });

  it('leaves out lengths that do not vary and lengths drawn from another', () => {
    const sides = [1.6, 2, 3, 4.2];
    const family = inspectFamilyFiles(sides.map((side) => file(`r${side}.s1p`, network([`ring_outer_side_mm = ${side}`, 'ring_strip_width_mm = 0.150', `inner_patch_side_mm = ${(0.62 * side).toFixed(4)}`]))));
    expect(family.inspection.detected.parameterNames).toEqual(['ringOuterSide']);
  });

  it('carries its whole report through JSON', () => {
    const { inspection } = inspectFamilyFiles([file('a.s1p', network(['a_mm = 1'])), file('b.s1p', 'x'), file('c.csv', 'file,a_mm\na.s1p,1\n')]);
    expect(JSON.parse(JSON.stringify(inspection))).toEqual(inspection);
  });

  it('keeps refused files with their faults and their question', () => {
    const family = inspectFamilyFiles([file('a.s1p', network(['a_mm = 1'])), file('b.s1p', `${network(['a_mm = 2'])}12 0.1\n`)]);
    expect(family.inspection.files[1]).toMatchObject({ status: 'refused', question: { kind: 'keep-complete-records', completeRecords: 2 } });
    expect(said(family)).toMatch(/error: 1 file\(s\) were refused: b\.s1p/);
    const kept = inspectFamilyFiles([file('a.s1p', network(['a_mm = 1'])), file('b.s1p', `${network(['a_mm = 2'])}12 0.1\n`)], { keepFirstRecords: [{ file: 'b.s1p', records: 2 }] });
    expect(said(kept)).not.toMatch(/error/);
    expect(kept.inspection.files[1].messages[0].text).toMatch(/Only the first 2 of 3 records are kept/);
  });

  it('asks for a missing option line and takes the answer', () => {
    const bare = [file('a_x1.s1p', '10 0.1 0.2\n')];
    expect(inspectFamilyFiles(bare).inspection.files[0].question).toEqual({ kind: 'option-line' });
    expect(inspectFamilyFiles(bare, { optionLines: [{ file: 'a_x1.s1p', optionLine: '# GHz S RI R 50' }] }).inspection.files[0].status).toBe('read');
  });

  it('turns impedances into S and says so', () => {
    const family = inspectFamilyFiles([file('z_a1.s1p', '# GHz Z RI R 50\n10 2 0\n')]);
    expect(family.curves[0].values[0]).toBeCloseTo(1 / 3, 12);
    expect(family.inspection.files[0].messages[0].text).toBe('Z terms were turned into S against 50 ohm');
  });

  it.each<readonly [string, readonly NamedFile[], FamilyMapping, RegExp]>([
    ['two files of one cell and incidence', [file('a_x1.s1p', network([])), file('more/a_x1.s1p', network([]))], {}, /error: a_x1\.s1p and more\/a_x1\.s1p both describe a_x1 at theta 0 deg, phi 0 deg/],
    ['files without a parameter', [file('plain.s1p', network([]))], {}, /error: 1 file\(s\) name no parameter of the cell: plain\.s1p/],
    ['an index that lists absent files', [file('index.csv', 'file,a_mm\nx.s1p,1\ny.s1p,2\n'), file('x.s1p', network([]))], {}, /warning: The index lists 1 file\(s\) that are not here: y\.s1p/],
    ['files beside the index', [file('index.csv', 'file,a_mm\nx.s1p,1\n'), file('x.s1p', network([])), file('y_a2.s1p', network([]))], {}, /warning: 1 file\(s\) are not in the index: y_a2\.s1p/],
    ['opposite time conventions', [file('a_x1.s1p', network(['exp(+jwt)'])), file('b_x2.s1p', network(['exp(-i w t)']))], {}, /warning: The files name different time conventions/],
    ['no response at all', [file('README.md', '# hello')], {}, /error: No file holds a response/],
    ['no angle', [file('a_x1.s1p', network([]))], {}, /notice: No file names an angle of incidence: normal incidence is taken/],
    ['nothing else when the bad file is left aside', [file('a_x1_t0.s1p', network([])), file('b.s1p', 'junk')], { ignoredFiles: ['b.s1p'] }, /^$/],
  ])('reports %s', (_name, files, mapping, expected) => {
    expect(said(inspectFamilyFiles(files, mapping))).toMatch(expected);
  });

  it('takes what is valid from a foreign description and the whole of its own', () => {
    const foreign = inspectFamilyFiles([file('family.json', '{"name":"K5","kind":"reflect","periodXMm":5,"limits":7,"__proto__":{"ports":"x"}}')]);
    expect(foreign.inspection.detected.descriptionHint).toEqual({ name: 'K5', kind: 'reflect', periodXMm: 5 });
    expect(foreign.inspection.files[0].messages[0].text).toBe("The description is not in this program's form; taken over: name, kind, periodXMm");
    expect(inspectFamilyFiles([file('family.json', '{')]).inspection.files[0]).toMatchObject({ kind: 'other', status: 'ignored' });
  });

  it('refuses cells of three ports', () => {
    const family = inspectFamilyFiles([{ name: 'a_x1.s3p', bytes: encodeAscii('# GHz S RI R 50\n1 1 0 0 0 0 0\n0 0 1 0 0 0\n0 0 0 0 1 0\n') }]);
    expect(family.inspection.files[0].messages[0].text).toBe('A cell has one or two ports; the file has 3');
  });
});

describe('a CSV table of responses among the files', () => {
  const rows = 'cell,side_mm,freq_GHz,theta_deg,S11_dB,S11_deg\nA,1,10,0,0,90\nA,1,11,0,-6,-90\nB,2,10,0,0,45\nB,2,11,0,0,30\n';

  it('becomes curves without a mapping when its headings carry their units', () => {
    const family = inspectFamilyFiles([file('table.csv', rows)]);
    expect(family.inspection.files[0]).toMatchObject({ kind: 'table', status: 'read', portCount: 1, pointCount: 4, fromGHz: 10, toGHz: 11 });
    expect(family.curves.map(({ cellId, parametersMm }) => [cellId, parametersMm])).toEqual([['A', [{ name: 'side', value: 1 }]], ['B', [{ name: 'side', value: 2 }]]]);
    expect(family.curves[0].values[1]).toBeCloseTo(1, 12);
    expect(family.curves[0].values[3]).toBeCloseTo(-(10 ** -0.3), 12);
  });

  it('names headings without a unit and refuses what is then incomplete', () => {
    const family = inspectFamilyFiles([file('table.csv', rows.replace('freq_GHz', 'freq'))]);
    expect(family.inspection.files[0].status).toBe('refused');
    expect(family.inspection.files[0].messages.map(({ text }) => text).join('\n')).toMatch(/The heading "freq" does not say.*\n.*No column holds the frequency/);
  });
});

describe('words in files', () => {
  it.each([
    ['exp(+j w t) convention', 'exp(+jwt)'],
    ['e^{-i omega t}', 'exp(-jwt)'],
    ['exp(jwt)', 'exp(+jwt)'],
    ['exp(-j*w*t)', 'exp(-jwt)'],
    ['nothing of the kind', undefined],
  ])('say of time in %j: %s', (text, convention) => {
    expect(timeConventionIn(text)).toBe(convention);
  });

  it.each([
    ['invented demo data derived from simulation', 'invented'],
    ['simulated, full-wave FDTD', 'simulated'],
    ['measured in a waveguide', 'measured'],
    ['closed form', 'analytic'],
    ['NOT a measurement', null],
  ])('say of provenance in %j: %s', (text, kind) => {
    expect(provenanceIn(text)).toBe(kind);
  });

  it.each([
    ['either (square symmetry)', 'either'],
    ['port1=x port2=y', 'x-and-y'],
    ['Port 1 = TE, port 2 = TM', 'te-and-tm'],
    ['x', 'x'],
    ['y-polarised', 'y'],
    ['both', null],
  ])('say of ports in %j: %s', (text, ports) => {
    expect(portsIn(text)).toBe(ports);
  });

  it('make identifiers of names', () => {
    expect(['ring_outer_side_mm', 'patch x', '2nd_side', 'L', '_mm'].map(parameterId)).toEqual(['ringOuterSide', 'patchX', 'ndSide', 'l', '']);
  });

  it('are read once each, and odd ones are passed over', () => {
    const facts = factsOfComments([{ line: 1, text: 'a_mm = 1 a_mm = 2; b_mm = wide; theta_deg = 1e999; cell_id = X' }]);
    expect(facts).toEqual({ cellId: 'X', parameters: [{ name: 'a', value: 1, from: 'comment' }], surroundings: {} });
  });

  it('take nothing from a name without lengths', () => {
    expect(factsOfName('folder/patch15.s1p')).toEqual({ cellId: 'patch15', parameters: [], surroundings: {} });
  });
});
