import * as fc from 'fast-check';
import { encodeAscii } from './file-text';
import { readTouchstone } from './touchstone-reader';
import { writeTouchstone } from './touchstone-writer';
import type { TouchstoneDocument } from './touchstone-writer';

const onePort: TouchstoneDocument = {
  portCount: 1,
  frequenciesHz: Float64Array.of(26e9, 26.2e9),
  values: Float64Array.of(-0.84, 0.54, -0.8384063, 1e-7),
  referenceOhm: [376.730313668],
  comments: [{ key: 'theta_deg', value: '0' }],
};

const network = fc.integer({ min: 1, max: 5 }).chain((portCount) =>
  fc.record({
    portCount: fc.constant(portCount),
    frequenciesHz: fc
      .uniqueArray(fc.double({ min: 0, max: 1e12, noNaN: true }), { minLength: 1, maxLength: 4 })
      .map((list) => Float64Array.from(list.map((value) => value + 0).sort((a, b) => a - b))),
    seed: fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 2 * portCount ** 2, maxLength: 2 * portCount ** 2 }),
    referenceOhm: fc.array(fc.double({ min: 1e-3, max: 1e6, noNaN: true }), { minLength: portCount, maxLength: portCount }),
    value: fc.stringMatching(/^[a-z0-9]([ -~]{0,20}[a-z0-9])?$/),
  }),
);

describe('writeTouchstone', () => {
  it('writes version 1 with hertz, real and imaginary parts and the reference', () => {
    expect(writeTouchstone(onePort)).toBe('! theta_deg: 0\n# Hz S RI R 376.730313668\n26000000000 -0.84 0.54\n26200000000 -0.8384063 1e-7\n');
  });

  it('writes a two-port column by column', () => {
    const text = writeTouchstone({ ...onePort, portCount: 2, frequenciesHz: Float64Array.of(1), values: Float64Array.of(11, 0, 12, 0, 21, 0, 22, 0), referenceOhm: [50, 75] });
    expect(text).toMatch(/# Hz S RI R 50 75\n1 11 0 21 0 12 0 22 0\n$/);
  });

  it('breaks a row after four pairs', () => {
    const values = Float64Array.from({ length: 50 }, (_, i) => i);
    const lines = writeTouchstone({ ...onePort, portCount: 5, frequenciesHz: Float64Array.of(1), values, referenceOhm: [50, 50, 50, 50, 50] }).trim().split('\n');
    expect(lines.slice(2, 4)).toEqual(['1 0 1 2 3 4 5 6 7', '8 9']);
  });

  it('keeps comments to seven bits on one line', () => {
    const text = writeTouchstone({ ...onePort, comments: [{ key: 'angle', value: '45° and\n# GHz 5 µm \u2603' }] });
    expect(text.split('\n')[0]).toBe('! angle: 45deg and # GHz 5 um ?');
  });

  it.each([
    ['a term that is not finite', { values: Float64Array.of(Number.NaN, 0, 0, 0) }, 'Every term must be a finite number'],
    ['falling frequencies', { frequenciesHz: Float64Array.of(2, 1) }, 'Frequencies must rise from 0 up; got 1 Hz at place 1'],
    ['too few numbers', { values: Float64Array.of(1) }, '2 frequencies of 1 port(s) take 4 numbers; got 1'],
    ['a reference of zero', { referenceOhm: [0] }, 'Each of 1 port(s) takes a positive resistance; got 0'],
    ['no port', { portCount: 0 }, 'A network has one port or more; got 0'],
  ])('throws on %s', (_name, change, message) => {
    expect(() => writeTouchstone({ ...onePort, ...change })).toThrow(message);
  });

  it('is undone by the reader to the last bit', () => {
    fc.assert(
      fc.property(network, ({ portCount, frequenciesHz, seed, referenceOhm, value }) => {
        const values = Float64Array.from(Array.from(frequenciesHz).flatMap((_, i) => seed.map((number) => number / (i + 1))));
        const written = writeTouchstone({ portCount, frequenciesHz, values, referenceOhm, comments: [{ key: 'note', value }] });
        const result = readTouchstone(encodeAscii(written), `x.s${portCount}p`);
        if (result.kind === 'refused') throw new Error(JSON.stringify(result.messages));
        const { data } = result;
        expect(Array.from(data.frequenciesHz)).toEqual(Array.from(frequenciesHz));
        // String() writes -0 as 0, and no reader of the format can tell them apart.
        expect(Array.from(data.values, (number) => number + 0)).toEqual(Array.from(values, (number) => number + 0));
        expect(data.referenceOhm).toEqual(referenceOhm);
        expect(data.comments).toEqual([{ line: 1, text: `note: ${value.replace(/\s+/g, ' ')}`, key: 'note', value: value.replace(/\s+/g, ' ') }]);
      }),
      { seed: 51, numRuns: 300 },
    );
  });
});
