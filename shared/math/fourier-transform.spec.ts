import * as fc from 'fast-check';
import FFT from 'fft.js';
import { nextPowerOfTwo, radixFourTransform } from './fourier-transform';

const noise = (size: number, seed: number): Float64Array => Float64Array.from({ length: size }, (_, i) => Math.sin(seed + 12.9898 * i * i + i));

describe('the Fourier transform', () => {
  it.each([1, 2, 4, 8, 32, 64, 512])('equals the plain sum with exp(+j) at size %d', (size) => {
    const re = noise(size, 1);
    const im = noise(size, 2);
    const outRe = re.slice();
    const outIm = im.slice();
    radixFourTransform(size).transform(outRe, outIm);
    for (const m of new Set([0, 1 % size, (size >> 1) % size, size - 1])) {
      let sumRe = 0;
      let sumIm = 0;
      for (let n = 0; n < size; n++) {
        const angle = (2 * Math.PI * n * m) / size;
        sumRe += re[n] * Math.cos(angle) - im[n] * Math.sin(angle);
        sumIm += re[n] * Math.sin(angle) + im[n] * Math.cos(angle);
      }
      expect(outRe[m]).toBeCloseTo(sumRe, 9);
      expect(outIm[m]).toBeCloseTo(sumIm, 9);
    }
  });

  it('equals an independent library at 2048 points once the sign is turned', () => {
    const size = 2048;
    const re = noise(size, 3);
    const im = noise(size, 4);
    const oracle = new FFT(size);
    const input = oracle.createComplexArray();
    const output = oracle.createComplexArray();
    for (let n = 0; n < size; n++) [input[2 * n], input[2 * n + 1]] = [re[n], im[n]];
    oracle.transform(output, input);
    radixFourTransform(size).transform(im, re);
    for (let m = 0; m < size; m++) {
      expect(Math.abs(re[m] - output[2 * m])).toBeLessThan(1e-10);
      expect(Math.abs(im[m] - output[2 * m + 1])).toBeLessThan(1e-10);
    }
  });

  it('keeps the power (Parseval) and returns to its input by the opposite sign', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 9 }), fc.double({ min: 0, max: 100, noNaN: true }), (exponent, seed) => {
        const size = 2 ** exponent;
        const re = noise(size, seed);
        const im = noise(size, seed + 7);
        const power = (x: Float64Array, y: Float64Array): number => x.reduce((sum, value, i) => sum + value * value + y[i] * y[i], 0);
        const [outRe, outIm] = [re.slice(), im.slice()];
        const plan = radixFourTransform(size);
        plan.transform(outRe, outIm);
        expect(power(outRe, outIm) / size).toBeCloseTo(power(re, im), 8);
        plan.transform(outIm, outRe);
        outRe.forEach((value, i) => expect(value / size).toBeCloseTo(re[i], 10));
      }),
      { numRuns: 40 },
    );
  });

  it('refuses a size that is not a power of two', () => {
    expect(() => radixFourTransform(48)).toThrow('power of two as its size; got 48');
    expect([1, 3, 64, 65].map(nextPowerOfTwo)).toEqual([1, 4, 64, 128]);
  });
});
