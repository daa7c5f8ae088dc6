import * as fc from 'fast-check';
import { randomStream } from './seeded-random';
import { mean, sampleDeviation } from './statistics';

const MASK = (1n << 64n) - 1n;
const G = 0x9e3779b97f4a7c15n;

/** The finaliser in whole numbers of any size: slow and obvious. */
function plainMix(word: bigint): bigint {
  let z = word & MASK;
  z = ((z ^ (z >> 30n)) * 0xbf58476d1ce4e5b9n) & MASK;
  z = ((z ^ (z >> 27n)) * 0x94d049bb133111ebn) & MASK;
  return z ^ (z >> 31n);
}

function plainWord({ seed, trial, channel, n }: { seed: number; trial: number; channel: number; n: number }): bigint {
  const first = plainMix(BigInt(seed) + G * BigInt(trial + 1));
  const state = plainMix(first + G * BigInt(channel + 1));
  return plainMix(state + G * BigInt(n + 1));
}

const joined = ([high, low]: readonly [number, number]): bigint => (BigInt(high) << 32n) | BigInt(low);
const whole = fc.integer({ min: 0, max: Number.MAX_SAFE_INTEGER - 1 });

describe('randomStream', () => {
  it('agrees bit by bit with the same arithmetic in whole numbers of any size', () => {
    fc.assert(
      fc.property(whole, whole, fc.nat(1000), fc.nat(2 ** 31 - 1), (seed, trial, channel, n) => {
        expect(joined(randomStream({ seed, trial, channel }).wordAt(n))).toBe(plainWord({ seed, trial, channel, n }));
      }),
      { seed: 3, numRuns: 300 },
    );
  });

  it('mixes the published first words of the plain generator with seed 0', () => {
    expect([1n, 2n, 3n].map((n) => plainMix(G * n).toString(16))).toEqual(['e220a8397b1dcdaf', '6e789e6aa1b965f4', '6c45d188009454f']);
  });

  it('fills an array with the draws of their addresses', () => {
    const stream = randomStream({ seed: 42, trial: 17, channel: 3 });
    const uniforms = new Float64Array(50);
    const normals = new Float64Array(50);
    stream.fillUniforms(uniforms);
    stream.fillNormals(normals);
    expect(Array.from(uniforms)).toEqual(Array.from(uniforms, (_, n) => stream.uniformAt(n)));
    expect(Array.from(normals)).toEqual(Array.from(normals, (_, n) => stream.normalAt(n)));
  });

  it('gives neighbouring seeds, trials and channels unlike draws', () => {
    const addresses = [
      { seed: 1, trial: 0, channel: 0 },
      { seed: 0, trial: 1, channel: 0 },
      { seed: 0, trial: 0, channel: 1 },
      { seed: 0, trial: 0, channel: 0 },
    ];
    const draws = addresses.flatMap((address) => [0, 1, 2].map((n) => randomStream(address).uniformAt(n)));
    expect(new Set(draws).size).toBe(12);
  });

  it('has the mean and deviation of its distributions over 20 000 draws', () => {
    const uniforms = new Float64Array(20_000);
    const normals = new Float64Array(20_000);
    randomStream({ seed: 5, trial: 0, channel: 0 }).fillUniforms(uniforms);
    randomStream({ seed: 5, trial: 0, channel: 1 }).fillNormals(normals);
    // Four standard errors of each: 1 / sqrt(12 n), 1 / sqrt(n), and 1 / sqrt(2 n) for the deviation.
    expect(Math.abs(mean(uniforms) - 0.5)).toBeLessThan(4 * 0.00205);
    expect(Math.abs(mean(normals))).toBeLessThan(4 * 0.00708);
    expect(Math.abs(sampleDeviation(normals) - 1)).toBeLessThan(4 * 0.005);
  });

  it('refuses a seed that is no whole number', () => {
    expect(() => randomStream({ seed: 1.5, trial: 0, channel: 0 })).toThrow('The seed of a random stream must be a whole number from 0 to 2^53 - 1; got 1.5');
    expect(() => randomStream({ seed: 1, trial: -1, channel: 0 })).toThrow('The trial of a random stream');
  });
});
