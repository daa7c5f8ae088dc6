import * as fc from 'fast-check';
import { encodeAscii } from './file-text';
import type { TouchstoneData } from './touchstone-data';
import { readTouchstone } from './touchstone-reader';
import { recordSize, toRectangular } from './touchstone-values';

function read(text: string, name: string): TouchstoneData {
  const result = readTouchstone(encodeAscii(text), name);
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.messages));
  return result.data;
}

const magnitude = fc.double({ min: 1e-3, max: 10, noNaN: true });
const degrees = fc.double({ min: -180, max: 180, noNaN: true });
const polarMatrix = fc.array(fc.tuple(magnitude, degrees), { minLength: 4, maxLength: 4 });

/** Largest difference of two lists, against the largest value: products and logarithms of doubles agree to about 1e-13. */
function expectAlike(a: Float64Array, b: Float64Array): void {
  expect(a.length).toBe(b.length);
  const scale = a.reduce((largest, value) => Math.max(largest, Math.abs(value)), 1e-300);
  a.forEach((value, i) => expect(Math.abs(value - b[i]) / scale).toBeLessThan(1e-12));
}

describe('one matrix written in several ways', () => {
  it('reads alike as MA, DB and RI', () => {
    fc.assert(
      fc.property(polarMatrix, (terms) => {
        const line = (pair: (m: number, d: number) => readonly number[]) => terms.flatMap(([m, d]) => pair(m, d)).join(' ');
        const asMagnitude = read(`# GHz S MA R 50\n1 ${line((m, d) => [m, d])}\n`, 'a.s2p');
        const asLevel = read(`# GHz S DB R 50\n1 ${line((m, d) => [20 * Math.log10(m), d])}\n`, 'a.s2p');
        const asParts = read(`# GHz S RI R 50\n1 ${line((m, d) => toRectangular(m, d, 'MA'))}\n`, 'a.s2p');
        expectAlike(asMagnitude.values, asLevel.values);
        expectAlike(asMagnitude.values, asParts.values);
      }),
      { seed: 121 },
    );
  });

  it('reads alike in both orders of version 2 and in version 1', () => {
    fc.assert(
      fc.property(polarMatrix, ([a, b, c, d]) => {
        const keywords = (order: string, terms: readonly (readonly number[])[]) =>
          `[Version] 2.1\n# GHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] ${order}\n[Number of Frequencies] 1\n[Network Data]\n1 ${terms.flat().join(' ')}\n[End]\n`;
        const rows = read(keywords('12_21', [a, b, c, d]), 'a.ts');
        const columns = read(keywords('21_12', [a, c, b, d]), 'a.ts');
        const old = read(`# GHz S MA R 50\n1 ${[a, c, b, d].flat().join(' ')}\n`, 'a.s2p');
        expect(Array.from(columns.values)).toEqual(Array.from(rows.values));
        expect(Array.from(old.values)).toEqual(Array.from(rows.values));
      }),
      { seed: 122 },
    );
  });

  it('reads alike normalised in version 1 and absolute in version 2', () => {
    const scales = { Z: (ohm: number) => [ohm, ohm, ohm, ohm], Y: (ohm: number) => [1 / ohm, 1 / ohm, 1 / ohm, 1 / ohm], H: (ohm: number) => [ohm, 1, 1, 1 / ohm], G: (ohm: number) => [1 / ohm, 1, 1, ohm] };
    fc.assert(
      fc.property(polarMatrix, fc.double({ min: 1, max: 500, noNaN: true }), fc.constantFrom<keyof typeof scales>('Z', 'Y', 'H', 'G'), (terms, ohm, parameter) => {
        const scale = scales[parameter](ohm);
        const absolute = terms.map(([m, d], i) => [m * scale[i], d]);
        const [a, b, c, d] = terms;
        const old = read(`# GHz ${parameter} MA R ${ohm}\n1 ${[a, c, b, d].flat().join(' ')}\n`, 'a.s2p');
        const now = read(`[Version] 2.0\n# GHz ${parameter} MA R ${ohm}\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Network Data]\n1 ${absolute.flat().join(' ')}\n[End]\n`, 'a.ts');
        expect(old.parameter).toBe(parameter);
        expectAlike(now.values, old.values);
      }),
      { seed: 123 },
    );
  });

  it('scales mutual impedances of unequal ports by the root of both', () => {
    const data = read('# GHz Z RI R 50 200\n1 1 0 1 0 1 0 1 0\n', 'a.s2p');
    expect(Array.from(data.values)).toEqual([50, 0, 100, 0, 100, 0, 200, 0]);
  });
});

describe('recordSize', () => {
  it.each([
    [1, 'full', 3],
    [2, 'full', 9],
    [4, 'full', 33],
    [2, 'lower', 7],
    [3, 'upper', 13],
  ] as const)('of %d ports, %s, is %d numbers', (ports, format, numbers) => {
    expect(recordSize(ports, format)).toBe(numbers);
  });
});
