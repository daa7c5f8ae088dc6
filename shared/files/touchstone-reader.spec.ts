import { encodeAscii, encodeUtf8 } from './file-text';
import type { TouchstoneChoices, TouchstoneData } from './touchstone-data';
import { readTouchstone } from './touchstone-reader';

const TERMS = '0.5 10 0.1 20 0.2 30 0.6 40';

function read(text: string | Uint8Array, fileName = 'cell.s2p', choices: TouchstoneChoices = {}) {
  return readTouchstone(typeof text === 'string' ? encodeUtf8(text) : text, fileName, choices);
}

function accepted(text: string | Uint8Array, fileName?: string, choices?: TouchstoneChoices): { data: TouchstoneData; said: string } {
  const result = read(text, fileName, choices);
  if (result.kind !== 'read') throw new Error(`refused: ${JSON.stringify(result.messages)}`);
  return { data: result.data, said: result.notices.map((m) => `${m.line} ${m.severity}: ${m.text}`).join('\n') };
}

function refusal(text: string | Uint8Array, fileName?: string, choices?: TouchstoneChoices) {
  const result = read(text, fileName, choices);
  if (result.kind !== 'refused') throw new Error('the file was read');
  return { said: result.messages.map((m) => `${m.line} ${m.severity}: ${m.text}`).join('\n'), question: result.question, messages: result.messages };
}

function term(data: TouchstoneData, row: number, column: number, point = 0): [magnitude: number, degrees: number] {
  const at = 2 * ((point * data.portCount + row) * data.portCount + column);
  return [Math.hypot(data.values[at], data.values[at + 1]), (Math.atan2(data.values[at + 1], data.values[at]) * 180) / Math.PI];
}

function expectTerm(data: TouchstoneData, place: readonly [row: number, column: number], expected: readonly [number, number]): void {
  const [magnitude, degrees] = term(data, place[0], place[1]);
  expect(magnitude).toBeCloseTo(expected[0], 12);
  expect(degrees).toBeCloseTo(expected[1], 10);
}

const keywordFile = (version: string, order: string, extra = '') =>
  `[Version] ${version}\n# GHz S MA R 50\n[Number of Ports] 2\n${order}[Number of Frequencies] 1\n${extra}[Network Data]\n1 ${TERMS}\n[End]\n`;

describe('reading version 1 files', () => {
  it.each([
    ['LF', `! c\n# GHz S MA R 50\n1.0 ${TERMS}\n2.0 ${TERMS}\n`],
    ['CRLF', `! c\r\n# GHz S MA R 50\r\n1.0 ${TERMS}\r\n2.0 ${TERMS}\r\n`],
    ['CR alone', `! c\r# GHz S MA R 50\r1.0 ${TERMS}\r2.0 ${TERMS}\r`],
    ['mixed line ends', `! c\r\n# GHz S MA R 50\r1.0 ${TERMS}\n2.0 ${TERMS}`],
    ['blanks before the mark', `   # GHz S MA R 50\n1.0 ${TERMS}\n2.0 ${TERMS}\n`],
    ['tabs between numbers', `# GHz S MA R 50\n1.0\t${TERMS.replace(/ /g, '\t')}\n2.0 ${TERMS}\n`],
    ['lower case', `# ghz s ma r 50\n1.0 ${TERMS}\n2.0 ${TERMS}\n`],
    ['a comment on the option line', `# GHz S MA R 50 ! note\n1.0 ${TERMS}\n2.0 ${TERMS}\n`],
    ['comments after data', `# GHz S MA R 50\n1.0 ${TERMS} ! 0.7\n\n2.0 ${TERMS}\n`],
    ['permuted options', `# MA S R 50 GHz\n1.0 ${TERMS}\n2.0 ${TERMS}\n`],
    ['another unit', `# MHz S MA R 50\n1000 ${TERMS}\n2e3 ${TERMS}\n`],
    ['an old end-of-file mark', `# GHz S MA R 50\n1.0 ${TERMS}\n2.0 ${TERMS}\n\u001a`],
  ])('reads %s alike', (_name, text) => {
    const { data } = accepted(text);
    expect(Array.from(data.frequenciesHz)).toEqual([1e9, 2e9]);
    expect([data.version, data.portCount, data.parameter, data.referenceOhm]).toEqual(['1.0', 2, 'S', [50, 50]]);
    expectTerm(data, [0, 0], [0.5, 10]);
  });

  it('takes the second pair of a two-port as S21', () => {
    const { data } = accepted(`# GHz S MA R 50\n1 ${TERMS}\n`);
    expectTerm(data, [1, 0], [0.1, 20]);
    expectTerm(data, [0, 1], [0.2, 30]);
    expectTerm(data, [1, 1], [0.6, 40]);
  });

  it('reads three ports row by row', () => {
    const { data } = accepted('# GHz S MA R 50\n1 .1 1 .2 2 .3 3\n.4 4 .5 5 .6 6\n.7 7 .8 8 .9 9\n', 'a.s3p');
    expectTerm(data, [0, 1], [0.2, 2]);
    expectTerm(data, [2, 0], [0.7, 7]);
  });

  it('tells four ports from two although their first lines are equally long', () => {
    const row = '.1 1 .2 2 .3 3 .4 4';
    const { data } = accepted(`# GHz S MA R 50\n1 ${row}\n${row}\n${row}\n${row}\n2 ${row}\n${row}\n${row}\n${row}\n`, 'a.s4p');
    expect([data.portCount, data.frequenciesHz.length]).toEqual([4, 2]);
  });

  it('tells the defaults a bare option line stands for', () => {
    const { data, said } = accepted(`#\n1.0 ${TERMS}\n`);
    expect(data.frequenciesHz[0]).toBe(1e9);
    expect(said).toBe("1 notice: The option line leaves out GHz, S, MA, R 50: the format's default was taken");
  });

  it('reads decibels as 20 log10 of the magnitude', () => {
    const { data } = accepted('# GHz S DB R 50\n1 -6 10\n', 'a.s1p');
    expectTerm(data, [0, 0], [0.5011872336272722, 10]);
  });

  it('keeps a reference of any resistance', () => {
    expect(accepted('# GHz S RI R 376.730313668\n1 0.1 0.2\n', 'a.s1p').data.referenceOhm).toEqual([376.730313668]);
  });

  it('scales frequencies in decimal, not in binary', () => {
    expect(accepted('# GHz S RI R 50\n28.1 0.1 0.2\n', 'a.s1p').data.frequenciesHz[0]).toBe(28_100_000_000);
  });

  it('reads one resistance per port as version 1.1', () => {
    const { data } = accepted(`# GHz S MA R 50 75\n1 ${TERMS}\n`);
    expect([data.version, data.referenceOhm]).toEqual(['1.1', [50, 75]]);
  });

  it('keeps comments with their keys and lines', () => {
    const { data } = accepted('! patch_side_mm = 3.00\n! Port 1: TE\n! plain words\n# GHz S RI R 50\n1 0.1 0.2\n', 'a.s1p');
    expect(data.comments).toEqual([
      { line: 1, text: 'patch_side_mm = 3.00', key: 'patch_side_mm', value: '3.00' },
      { line: 2, text: 'Port 1: TE', key: 'Port 1', value: 'TE' },
      { line: 3, text: 'plain words' },
    ]);
  });

  it.each([
    ['two option lines', `# GHz S MA R 50\n# MHz S RI R 75\n1 ${TERMS}\n`, /^2 warning: A second option line/],
    ['a two-port wrapped over two lines', '# GHz S MA R 50\n1 0.5 10 0.1 20\n0.2 30 0.6 40\n', /^2 warning: .*one line per frequency/],
    ['a Fortran exponent', `# Hz S MA R 50\n1.0D9 ${TERMS}\n`, /^2 warning: .*D exponent/],
    ['an equal repeat', `# GHz S MA R 50\n1 ${TERMS}\n1 ${TERMS}\n`, /^3 warning: .*merged/],
    ['Latin-1 in a comment', encodeLatin(`! angle \u00b0\n# GHz S MA R 50\n1 ${TERMS}\n`), /^1 warning: .*beyond ASCII/],
    ['a last line without an end', `# GHz S MA R 50\n1 ${TERMS}`, /^2 notice: The last line has no line end/],
    ['a byte order mark', `\ufeff# GHz S MA R 50\n1 ${TERMS}\n`, /^1 notice: A byte order mark/],
    ['UTF-16', encodeUtf16(`# GHz S MA R 50\n1 ${TERMS}\n`), /^1 notice: The file is in UTF-16LE/],
  ])('reads %s and says so', (_name, text, said) => {
    const result = accepted(text);
    expect(result.data.frequenciesHz[0]).toBe(1e9);
    expect(result.said).toMatch(said);
  });
});

describe('the specification\'s own pairs', () => {
  it('gives Z of version 1 at R 75 as 74.25 ohm where version 2 writes 74.25', () => {
    const old = accepted('# MHz Z MA R 75\n100 0.99 -4\n', 'z.s1p').data;
    const now = accepted('[Version] 2.0\n# MHz Z MA R 75\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n100 74.25 -4\n[End]\n', 'z.ts').data;
    expectTerm(old, [0, 0], [74.25, -4]);
    expectTerm(now, [0, 0], [74.25, -4]);
  });

  it('gives a noise resistance of 0.38 in version 1 as 19 ohm at R 50', () => {
    const { data } = accepted('#\n2 .95 -26 3.57 157 .04 76 .66 -14\n22 .60 -144 1.30 40 .14 40 .56 -85\n4 .7 .64 69 .38\n18 2.7 .46 -33 .40\n');
    expect(data.frequenciesHz.length).toBe(2);
    expect(Array.from(data.noise?.resistanceOhm ?? [])).toEqual([19, 20]);
    expect(Array.from(data.noise?.frequenciesHz ?? [])).toEqual([4e9, 18e9]);
  });

  it('leaves a noise resistance of 19 in version 2 as it is', () => {
    const text = `[Version] 2.0\n# GHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Number of Noise Frequencies] 1\n[Reference] 50 25.0\n[Network Data]\n2 ${TERMS}\n[Noise Data]\n4 .7 .64 69 19\n[End]\n`;
    expect(Array.from(accepted(text, 'n.ts').data.noise?.resistanceOhm ?? [])).toEqual([19]);
  });

  it('multiplies h11 by R, divides h22 by R and leaves h12 and h21', () => {
    const { data } = accepted('# GHz H RI R 50\n1 2 0 3 0 4 0 5 0\n');
    expect(Array.from(data.values)).toEqual([100, 0, 4, 0, 3, 0, 0.1, 0]);
  });

  it('divides Y by R', () => {
    expect(accepted('# GHz Y RI R 50\n1 1 2\n', 'y.s1p').data.values[1]).toBeCloseTo(0.04, 15);
  });
});

describe('reading keyword files', () => {
  it.each(['2.0', '2.1'])('reads version %s with its order of two-port terms', (version) => {
    const columns = accepted(keywordFile(version, '[Two-Port Data Order] 21_12\n'), 'a.ts').data;
    const rows = accepted(keywordFile(version, '[two-port  data order] 12_21\n'), 'a.ts').data;
    expect(columns.version).toBe(version);
    expectTerm(columns, [1, 0], [0.1, 20]);
    expectTerm(rows, [0, 1], [0.1, 20]);
  });

  it.each([
    ['on its line', '[Reference] 50 75\n'],
    ['on the next line', '[Reference]\n50 75\n'],
    ['wrapped', '[Reference] 50\n75\n'],
  ])('lets [Reference] %s win over R', (_name, reference) => {
    expect(accepted(keywordFile('2.0', '[Two-Port Data Order] 12_21\n', reference), 'a.ts').data.referenceOhm).toEqual([50, 75]);
  });

  it.each([
    ['Lower', '1 .1 1\n.2 2 .3 3\n'],
    ['Upper', '1 .1 1 .2 2\n.3 3\n'],
  ])('mirrors a %s matrix', (format, rows) => {
    const text = `[Version] 2.0\n# GHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Matrix Format] ${format}\n[Network Data]\n${rows}[End]\n`;
    const { data } = accepted(text, 'a.ts');
    expectTerm(data, [0, 1], [0.2, 2]);
    expectTerm(data, [1, 0], [0.2, 2]);
    expectTerm(data, [1, 1], [0.3, 3]);
  });

  it('passes over an information section', () => {
    const text = keywordFile('2.1', '[Two-Port Data Order] 12_21\n', '[Begin Information]\n[Manufacturer] any words 1 2 3\n[End Information]\n');
    expect(accepted(text, 'a.ts').data.portCount).toBe(2);
  });

  it.each([
    ['no data order', keywordFile('2.0', ''), /3 error: \[Two-Port Data Order\] is missing/],
    ['another version', keywordFile('3.0', '[Two-Port Data Order] 12_21\n'), /1 error: Version "3.0" is not read/],
    ['an unknown keyword', keywordFile('2.0', '[Two-Port Data Order] 12_21\n[Colour] red\n'), /5 error: The keyword "\[colour\]"/],
    ['a keyword twice', keywordFile('2.0', '[Two-Port Data Order] 12_21\n[Two-Port Data Order] 12_21\n'), /5 error: .*stands twice; first on line 4/],
    ['mixed modes', keywordFile('2.0', '[Two-Port Data Order] 12_21\n[Mixed-Mode Order] D1,2 C1,2\n'), /5 error: Mixed-mode/],
    ['too few resistances', keywordFile('2.0', '[Two-Port Data Order] 12_21\n', '[Reference] 50\n'), /\[Reference\] gives 1 resistance\(s\) for 2/],
    ['a wrong count', keywordFile('2.0', '[Two-Port Data Order] 12_21\n').replace('Frequencies] 1', 'Frequencies] 2'), /says 2; 1 were found/],
    ['ports before options', `[Version] 2.0\n[Number of Ports] 1\n# GHz S RI R 50\n[Number of Frequencies] 1\n[Network Data]\n1 0 1\n[End]\n`, /2 error: \[Number of Ports\] stands before/],
    ['ports that the data deny', keywordFile('2.0', '').replace('Ports] 2', 'Ports] 1'), /says 1; the first record on line 6 shows 2/],
    ['no data', '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n', /\[Network Data\] is missing/],
    ['keywords without a version', `# GHz S MA R 50\n[Reference] 50 50\n1 ${TERMS}\n`, /2 error: The keyword/],
  ])('refuses %s', (_name, text, said) => {
    expect(refusal(text, 'a.ts').said).toMatch(said);
  });

  it('reads a complete file whose [End] is missing, and says so', () => {
    expect(accepted(keywordFile('2.0', '[Two-Port Data Order] 12_21\n').replace('[End]\n', ''), 'a.ts').said).toMatch(/7 warning: \[End\] is missing/);
  });
});

describe('the errors importers meet', () => {
  it('refuses a name and a record that disagree, naming both numbers and the line', () => {
    expect(refusal(`# GHz S MA R 50\n1 ${TERMS}\n`, 'cell.s1p').said).toBe('2 error: The name says 1 port(s); the first record shows 2');
    expect(refusal('# GHz S MA R 50\n1 0.1 0.2\n', 'cell.S2P').said).toBe('2 error: The name says 2 port(s); the first record shows 1');
  });

  it('takes the port count from the data where the name has none', () => {
    expect(accepted(`# GHz S MA R 50\n1 ${TERMS}\n`, 'cell.txt').data.portCount).toBe(2);
  });

  it('asks for a missing option line and never assumes gigahertz', () => {
    const { said, question } = refusal(`1 ${TERMS}\n`);
    expect(said).toMatch(/^1 error: The option line is missing: frequency unit, parameter and format are unknown$/);
    expect(question).toEqual({ kind: 'option-line' });
  });

  it('reads the same file with the option line a person supplies, and keeps the fact', () => {
    const { data, said } = accepted(`1 ${TERMS}\n`, 'cell.s2p', { optionLine: 'MHz S MA R 50' });
    expect(data.frequenciesHz[0]).toBe(1e6);
    expect(said).toBe('1 notice: The option line "# MHz S MA R 50" was supplied by choice; the file has none');
  });

  it.each([
    ['NaN', `# GHz S MA R 50\n1 ${TERMS}\n2 NaN 10 0.1 20 0.2 30 0.6 40\n`, /^3 error: "NaN" is not a finite number$/],
    ['minus infinity in dB', `# GHz S DB R 50\n1 ${TERMS}\n2 -inf 10 -20 20 -14 30 -4 40\n`, /^3 error: "-inf" is not a finite number$/],
    ['a number beyond doubles', `# GHz S MA R 50\n1 ${TERMS}\n2 1e999 10 0.1 20 0.2 30 0.6 40\n`, /^3 error: "1e999" is too large a number$/],
    ['a level beyond doubles', `# GHz S DB R 50\n1 ${TERMS}\n2 1e5 10 0.1 20 0.2 30 0.6 40\n`, /^3 error: The pair 100000 10 is too large a value$/],
    ['a cut-off last record', `# GHz S MA R 50\n1 ${TERMS}\n2 0.5 10 0.1\n`, /^3 error: The last record is cut off: it holds 4 number\(s\) where 9 belong$/],
    ['an unequal repeat', `# GHz S MA R 50\n1 ${TERMS}\n1 ${TERMS.replace('0.5', '0.51')}\n`, /^3 error: The frequency 1000000000 Hz stands twice with different values$/],
    ['falling frequencies', `# GHz S MA R 50\n2 ${TERMS}\n1 ${TERMS}\n`, /^3 error: The frequency falls from 2000000000 Hz to 1000000000 Hz/],
  ])('refuses %s with its line, and offers to keep the records before it', (_name, text, said) => {
    const refused = refusal(text);
    expect(refused.said).toMatch(said);
    expect(refused.question).toEqual({ kind: 'keep-complete-records', completeRecords: 1 });
    const kept = accepted(text, 'cell.s2p', { keepFirstRecords: 1 });
    expect(kept.data.frequenciesHz.length).toBe(1);
    expect(kept.said).toMatch(/^2 notice: Only the first 1 of 2 records are kept, by choice$/);
  });

  it('refuses to keep more records than are whole', () => {
    expect(refusal(`# GHz S MA R 50\n1 ${TERMS}\n2 0.5\n`, 'a.s2p', { keepFirstRecords: 2 }).said).toMatch(/2 records were to be kept; the file has 1/);
  });

  it.each([
    ['a decimal comma', '# GHz S MA R 50\n1,0 0,5 10 0,1 20 0,2 30 0,6 40\n', /2 error: "1,0" has a decimal comma/],
    ['commas between numbers', '# GHz S MA R 50\n1.0,0.5,10,0.1,20,0.2,30,0.6,40\n', /2 error: .*separated by commas/],
    ['a degree sign in the data', encodeLatin('# GHz S MA R 50\n1 0.5 10\u00b0\n2 0.5 10\n'), /2 error: Character U\+00B0/],
    ['a NUL in the data', '# GHz S MA R 50\n1 0.5 1\u00000\n2 0.5 10\n', /2 error: Character U\+0000/],
    ['a word', '# GHz S MA R 50\n1 0.5 ten\n', /2 error: "ten" is not a number/],
    ['hexadecimal', '# GHz S MA R 50\n1 0x5 10\n', /2 error: "0x5" is not a number/],
    ['a negative frequency', '# GHz S MA R 50\n-1 0.5 10\n', /2 error: -1 is not a possible frequency/],
    ['THz', '# THz S MA R 50\n1 0.5 10\n', /1 error: THz is not a unit/],
    ['R without a number', '# GHz S MA R\n1 0.5 10\n', /1 error: R is not followed/],
    ['a complex reference', '# GHz S MA R 50 j5\n1 0.5 10\n', /1 error: .*complex reference/],
    ['a reference of zero', '# GHz S MA R 0\n1 0.5 10\n', /1 error: The reference resistance 0/],
    ['two units', '# GHz MHz S MA R 50\n1 0.5 10\n', /1 error: The option line names two frequency units/],
    ['options after a list of resistances', '# GHz R 50 75 S MA\n1 0.5 10\n', /1 error: A list of resistances/],
    ['H terms of one port', '# GHz H MA R 50\n1 0.5 10\n', /1 error: H terms exist for two ports only/],
    ['an empty file', '', /0 error: The file is empty/],
    ['comments alone', '! nothing\n', /0 error: The file holds comments but no data/],
    ['a header alone', '# GHz S MA R 50\n', /1 error: The file has a header but no data/],
    ['a count that fits no network', '# GHz S MA R 50\n1 2 3 4\n', /2 error: The first record holds 4/],
  ])('refuses %s', (_name, text, said) => {
    expect(refusal(text, 'cell.txt').said).toMatch(said);
  });

  it('lists every fault of a file, not the first alone', () => {
    const { messages } = refusal('# GHz S MA R 50\n1 NaN 10\n2 0.5 x\n3 0.5 10\n2.5 0.5 10\n', 'a.s1p');
    expect(messages.map((message) => message.line)).toEqual([2, 3, 5]);
  });

  it('bounds the list and counts the rest', () => {
    const { messages } = refusal(`# GHz S MA R 50\n${'1 NaN 10\n'.repeat(80)}`, 'a.s1p');
    expect(messages.length).toBe(51);
    expect(messages[50].text).toBe('30 further faults are not listed');
  });

  it('checks bytes, ports and points against their limits', () => {
    const limits = { bytes: 200, ports: 1, points: 2 };
    expect(refusal('!'.repeat(201), 'a.s1p', { limits }).said).toMatch(/has 201 bytes; at most 200/);
    expect(refusal(`# GHz S MA R 50\n1 ${TERMS}\n`, 'a.s2p', { limits }).said).toMatch(/has 2 ports; at most 1/);
    expect(refusal('# GHz S RI R 50\n1 0 0\n2 0 0\n3 0 0\n', 'a.s1p', { limits }).said).toMatch(/4 error: The file has 3 frequencies; at most 2/);
  });

  it('survives lines made to make a matcher hang', () => {
    const blanks = ' '.repeat(200_000);
    for (const text of [`[${blanks}`, `[${blanks}x`, `#${blanks}x${blanks}`, '\u001a'.repeat(200_000) + 'x', `! a${blanks}`, `1${blanks}x`])
      expect(read(text, 'a.s1p').kind).toBe('refused');
  });
});

function encodeLatin(text: string): Uint8Array {
  return Uint8Array.from(text, (character) => character.charCodeAt(0));
}

function encodeUtf16(text: string): Uint8Array {
  const ascii = encodeAscii(text);
  const bytes = new Uint8Array(2 + 2 * ascii.length);
  bytes.set([0xff, 0xfe]);
  ascii.forEach((byte, i) => (bytes[2 + 2 * i] = byte));
  return bytes;
}
