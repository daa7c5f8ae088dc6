import { readCellTable } from './cell-table';
import { suggestTableMapping } from './cell-table-mapping';
import { readCsv } from './csv-table';
import { kindOfTable, readFamilyIndex } from './family-index';
import { encodeUtf8 } from './file-text';

/** Changes nothing but the run: the same seed makes the same cases on every machine. */
const SEED = 20261202;
const CASES = 100_000;

const CORPUS = [
  'cell,side_mm,freq_GHz,theta_deg,S11_dB,S11_deg\r\nA,1,10,0,0,90\r\nA,1,11,0,-6,-90\r\n',
  'cell;side_mm;freq_GHz;S11_re;S11_im\nA;1,5;10,5;0,5;-0,5\n',
  'file,cell_id,patch_mm,theta_deg,phi_deg,period_mm\na.s1p,A,3.5,15,0,5\nb.s1p,B,4,15,0,5\n',
  'file,parameter_name,parameter_mm,label\nr1.s2p,patch_x,5,"sim, ""full"""\n',
  "name\tnote\n'=1+1\t\"two\nlines\"\n",
].map(encodeUtf8);
const INSERTIONS = ['"', '""', ',', ';', '\t', '\r', '\n', '\0', "'", "'=", '=', 'NaN', '1e999', '-inf', '1,5', '#N/A', '\ufeff', '__proto__', 'constructor', '9'.repeat(400), 'x'.repeat(500)].map(encodeUtf8);

function randomSource(seed: number): (below: number) => number {
  let state = seed >>> 0;
  // Numerical Recipes' congruential generator; its high bits are good enough to choose cases.
  return (below) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 4294967296) * below);
  };
}

function mutate(bytes: Uint8Array, random: (below: number) => number): Uint8Array {
  const at = random(bytes.length + 1);
  const kind = random(4);
  if (kind === 0) return bytes.map((byte, i) => (i === at ? random(256) : byte));
  if (kind === 1) return bytes.slice(0, at);
  if (kind === 2) return Uint8Array.of(...bytes.subarray(0, at), ...INSERTIONS[random(INSERTIONS.length)], ...bytes.subarray(at));
  return Uint8Array.of(...bytes.subarray(0, at), ...bytes.subarray(at + random(20)));
}

/** What is wrong with how a file was dealt with, or null. */
function faultOf(bytes: Uint8Array): string | null {
  const result = readCsv(bytes);
  if (result.kind === 'refused') return result.messages.some(({ severity }) => severity === 'error') ? null : 'refused without an error';
  const { table } = result;
  if (new Set(table.rows.map((row) => row.length)).size !== 1) return 'rows of different lengths were read';
  if (kindOfTable(table) === 'index') {
    const facts = [...readFamilyIndex(table).byFile.values()];
    const numbers = facts.flatMap((one) => [...one.parameters.map(({ value }) => value), one.thetaDeg?.value ?? 0, one.phiDeg?.value ?? 0]);
    return numbers.every(Number.isFinite) ? null : 'an index gave a number that is not finite';
  }
  const { mapping } = suggestTableMapping(table);
  const read = readCellTable(table, { ...mapping, blanks: bytes.length % 2 === 0 ? 'missing' : 'refuse' }, { name: 'x.csv' });
  if (read.hasErrors) return read.curves.length === 0 && read.messages.length > 0 ? null : 'refused without a word, or not wholly';
  const isSound = read.curves.every((curve) => curve.values.every(Number.isFinite) && curve.frequenciesHz.every((value, i) => value >= 0 && (i === 0 || value > curve.frequenciesHz[i - 1])));
  return isSound ? null : 'a curve is not finite or does not rise';
}

describe('damaged tables', () => {
  it(`end in data or in messages for ${CASES} mutations of seed ${SEED}`, () => {
    const random = randomSource(SEED);
    let read = 0;
    for (let index = 0; index < CASES; index++) {
      let bytes = CORPUS[random(CORPUS.length)];
      for (let round = 0; round < 1 + random(3); round++) bytes = mutate(bytes, random);
      const fault = faultOf(bytes);
      if (readCsv(bytes).kind === 'read') read += 1;
      if (fault !== null) throw new Error(`Case ${index} of seed ${SEED}: ${fault}; bytes ${Array.from(bytes).join(',')}`);
    }
    expect(read).toBeGreaterThan(CASES / 10);
    expect(CASES - read).toBeGreaterThan(CASES / 10);
  }, 120_000);
});
