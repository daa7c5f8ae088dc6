import { readTouchstone } from './touchstone-reader';
import type { TouchstoneData } from './touchstone-data';
import { toScattering } from './touchstone-scattering';
import { encodeUtf8 } from './file-text';

/** Changes nothing but the run: the same seed makes the same cases on every machine. */
const SEED = 20261201;
const CASES = 100_000;
/** A case is a file of less than a kilobyte; one that takes a second has found a way to hang. */
const SLOWEST_CASE_MS = 1000;

const TERMS = '0.5 10 0.1 20 0.2 30 0.6 40';

/** The batteries of the format, valid and damaged, that mutations start from. */
const CORPUS: readonly (readonly [name: string, text: string])[] = [
  ['ma.s2p', `! c\n# GHz S MA R 50\n1.0 ${TERMS}\n2.0 ${TERMS}\n`],
  ['crlf.s2p', `! c\r\n# GHz S MA R 50\r\n1.0 ${TERMS}\r\n2.0 ${TERMS}\r\n`],
  ['cr.s2p', `! c\r# GHz S MA R 50\r1.0 ${TERMS}\r2.0 ${TERMS}\r`],
  ['bare.s2p', `#\n1.0 ${TERMS}\n`],
  ['permuted.s2p', `# MA S R 75 MHz\n100 ${TERMS}\n`],
  ['db.s2p', '# ghz s db r 50\n1 -6 10 -20 20 -14 30 -4 40\n'],
  ['noise.s2p', '#\n2 .95 -26 3.57 157 .04 76 .66 -14\n22 .60 -144 1.30 40 .14 40 .56 -85\n4 .7 .64 69 .38\n18 2.7 .46 -33 .40\n'],
  ['list.s2p', `# GHz S MA R 50 75\n1 ${TERMS}\n`],
  ['one.s1p', '# Hz S RI R 376.73\n28e9 0.5 0.1\n28.1e9 0.4 0.2\n'],
  ['z.s1p', '# GHz Z RI R 50\n1 1.5 0.5\n'],
  ['y.s2p', `# GHz Y RI R 50\n1 ${TERMS}\n`],
  ['h.s2p', `# GHz H RI R 50\n1 ${TERMS}\n`],
  ['three.s3p', '# GHz S MA R 50\n1 .1 1 .2 2 .3 3\n.4 4 .5 5 .6 6\n.7 7 .8 8 .9 9\n'],
  ['two.ts', `[Version] 2.0\n# GHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Reference] 50 75\n[Matrix Format] Full\n[Network Data]\n1 ${TERMS}\n[End]\n`],
  ['lower.ts', '[Version] 2.1\n# GHz Z RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Number of Noise Frequencies] 1\n[Matrix Format] Lower\n[Network Data]\n2 .1 1\n.2 2 .3 3\n[Noise Data]\n1 .7 .64 69 19\n[End]\n'],
  ['information.ts', '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 2\n[Begin Information]\nany\n[End Information]\n[Network Data]\n1 0.5 0.1\n2 0.4 0.2\n[End]\n'],
  ['missing.s2p', `1 ${TERMS}\n`],
  ['comma.s2p', '# GHz S MA R 50\n1,0 0,5 10 0,1 20 0,2 30 0,6 40\n'],
  ['odd.s1p', '# Hz S MA R 50\n1.0D9 NaN 10\n-inf 1 1\n'],
];

const INSERTIONS = ['1e999', '-1e999', '1e308', '9'.repeat(400), '1e-400', 'NaN', 'inf', '\0', '\ufeff', '\u001a', '\r', '\n', '\t', '!', '#', '[', ']', '[End]', '[Version] 2.0', '[Reference]', '[Begin Information]', '°', ',', '-', '.', '1e', '1D5', '0x1', ' '.repeat(300), '1 '.repeat(200)];

/** Mulberry32, a small generator of 32-bit state (public domain, T. Ettinger). */
function randomSource(seed: number): (below: number) => number {
  let state = seed >>> 0;
  return (below) => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) % below;
  };
}

type Random = (below: number) => number;

const MUTATIONS: readonly ((bytes: Uint8Array, random: Random) => Uint8Array)[] = [
  function flipByte(bytes, random) {
    const changed = bytes.slice();
    for (let i = 0; i < 1 + random(4) && changed.length > 0; i++) changed[random(changed.length)] = random(256);
    return changed;
  },
  function truncate(bytes, random) {
    return bytes.slice(0, random(bytes.length + 1));
  },
  function insert(bytes, random) {
    const piece = encodeUtf8(INSERTIONS[random(INSERTIONS.length)]);
    const at = random(bytes.length + 1);
    return Uint8Array.of(...bytes.subarray(0, at), ...piece, ...bytes.subarray(at));
  },
  function duplicateLine(bytes, random) {
    const start = random(bytes.length + 1);
    const end = Math.min(bytes.length, start + random(80));
    return Uint8Array.of(...bytes.subarray(0, end), ...bytes.subarray(start, end), ...bytes.subarray(end));
  },
  function removePiece(bytes, random) {
    const start = random(bytes.length + 1);
    return Uint8Array.of(...bytes.subarray(0, start), ...bytes.subarray(start + random(40)));
  },
  function mixLineEnds(bytes, random) {
    return bytes.map((byte) => (byte === 10 && random(3) === 0 ? 13 : byte));
  },
  function widen(bytes, random) {
    const wide = new Uint8Array(2 + 2 * bytes.length);
    wide.set(random(2) === 0 ? [0xff, 0xfe] : [0xfe, 0xff]);
    bytes.forEach((byte, i) => (wide[2 + 2 * i + (wide[0] === 0xff ? 0 : 1)] = byte));
    return wide;
  },
];

function faultOf(data: TouchstoneData): string | null {
  const rising = data.frequenciesHz.every((value, i) => Number.isFinite(value) && (i === 0 ? value >= 0 : value > data.frequenciesHz[i - 1]));
  if (!rising) return 'frequencies do not rise';
  if (data.values.length !== data.frequenciesHz.length * 2 * data.portCount ** 2) return 'values and frequencies disagree';
  if (data.frequenciesHz.length === 0) return 'a file without points was read';
  const noise = data.noise === undefined ? [] : [data.noise.frequenciesHz, data.noise.minimumFigureDb, data.noise.optimumReflection, data.noise.resistanceOhm];
  const scattering = toScattering(data);
  const arrays = [data.values, Float64Array.from(data.referenceOhm), ...noise, ...(scattering.kind === 'scattering' ? [scattering.values] : [])];
  return arrays.every((list) => list.every(Number.isFinite)) ? null : 'a number is not finite';
}

describe('damaged network files', () => {
  it(`end in data or in messages for ${CASES} mutations of seed ${SEED}`, () => {
    const random = randomSource(SEED);
    let read = 0;
    for (let index = 0; index < CASES; index++) {
      const [name, text] = CORPUS[random(CORPUS.length)];
      let bytes = encodeUtf8(text);
      for (let round = 0; round < 1 + random(3); round++) bytes = MUTATIONS[random(MUTATIONS.length)](bytes, random);
      const choices = random(8) === 0 ? { keepFirstRecords: 1 + random(3) } : random(8) === 0 ? { optionLine: '# GHz S RI R 50' } : {};
      const started = performance.now();
      const result = readTouchstone(bytes, name, choices);
      const fault = result.kind === 'read' ? faultOf(result.data) : result.messages.some(({ severity, line }) => severity === 'error' && line >= 0) ? null : 'refused without an error';
      if (result.kind === 'read') read += 1;
      if (performance.now() - started > SLOWEST_CASE_MS) throw new Error(`Case ${index} of seed ${SEED} (${name}) took longer than ${SLOWEST_CASE_MS} ms`);
      if (fault !== null) throw new Error(`Case ${index} of seed ${SEED} (${name}): ${fault}; bytes ${Array.from(bytes.subarray(0, 600)).join(',')}`);
    }
    // Both ways out must be walked, or the run proves little.
    expect(read).toBeGreaterThan(CASES / 50);
    expect(CASES - read).toBeGreaterThan(CASES / 4);
  }, 120_000);

  it('end in data or in messages when cut at every byte', () => {
    for (const [name, text] of CORPUS) {
      const bytes = encodeUtf8(text);
      for (let length = 0; length <= bytes.length; length++) {
        const result = readTouchstone(bytes.subarray(0, length), name);
        const fault = result.kind === 'read' ? faultOf(result.data) : result.messages.length === 0 ? 'refused without a message' : null;
        if (fault !== null) throw new Error(`${name} cut at ${length}: ${fault}`);
      }
    }
    expect(CORPUS.length).toBeGreaterThan(15);
  });
});
