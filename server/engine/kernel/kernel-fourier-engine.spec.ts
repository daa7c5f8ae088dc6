import FFT from 'fft.js';
import type { ComplexCells, SampleCounts, SpectrumQuery } from '../../../shared/math/fourier-engine';
import { plainFourierEngine } from '../../../shared/math/plain-fourier-engine';
import { createKernelFourierEngine } from './kernel-fourier-engine';

const kernel = createKernelFourierEngine();
const sizes = Array.from({ length: 12 }, (_, i) => 2 ** (i + 1));

/** Made-up numbers between -1 and 1 that look like chance. */
const scattered = (count: number, seed = 1): Float64Array => Float64Array.from({ length: count }, (_, i) => 2 * (((i + seed) * (i + 7) * 0.6180339887498949) % 1) - 1);

function query(cells: [number, number], samples: [number, number], origin: [number, number] = [0, 0]): SpectrumQuery {
  const [columnCount, rowCount] = cells;
  const count = columnCount * rowCount;
  return { columnCount, rowCount, re: scattered(count), im: scattered(count, 5), columns: samples[0], rows: samples[1], originColumn: origin[0], originRow: origin[1] };
}

/** Largest difference of two arrays, relative to the largest of the second. */
function difference(got: ArrayLike<number>, wanted: ArrayLike<number>): number {
  let most = 0;
  let scale = 0;
  for (let i = 0; i < wanted.length; i++) {
    most = Math.max(most, Math.abs(got[i] - wanted[i]));
    scale = Math.max(scale, Math.abs(wanted[i]));
  }
  return got.length === wanted.length ? most / scale : Infinity;
}

/** One line by the independent package: its inverse transform has the sign exp(+j ...) and is divided by the size. */
function oracleLine(re: Float64Array, im: Float64Array): { re: Float64Array; im: Float64Array } {
  const size = re.length;
  if (size < 2) return { re, im };
  const fft = new FFT(size);
  const input = fft.createComplexArray();
  for (let i = 0; i < size; i++) [input[2 * i], input[2 * i + 1]] = [re[i], im[i]];
  const output = fft.createComplexArray();
  fft.inverseTransform(output, input);
  return { re: Float64Array.from({ length: size }, (_, i) => output[2 * i] * size), im: Float64Array.from({ length: size }, (_, i) => output[2 * i + 1] * size) };
}

const padded = (values: Float64Array, size: number): Float64Array => {
  const all = new Float64Array(size);
  all.set(values);
  return all;
};

describe('the kernel against an independent transform', () => {
  it.each(sizes)('transforms full columns of %i samples', (size) => {
    const asked = query([1, size], [2, size]);
    const { re, im } = kernel.spectrum(asked);
    const wanted = oracleLine(asked.re, asked.im);
    expect(difference(re.subarray(0, size), wanted.re)).toBeLessThan(1e-14);
    expect(difference(im.subarray(0, size), wanted.im)).toBeLessThan(1e-14);
  });

  it.each(sizes)('transforms full rows of %i samples', (size) => {
    const asked = query([size, 1], [size, 2]);
    const { re, im } = kernel.spectrum(asked);
    const wanted = oracleLine(asked.re, asked.im);
    expect(difference(re.filter((_, i) => i % 2 === 0), wanted.re)).toBeLessThan(1e-14);
    expect(difference(im.filter((_, i) => i % 2 === 0), wanted.im)).toBeLessThan(1e-14);
  });

  it.each([3, 16, 17, 20, 31, 32, 33, 40, 63])('skips what is empty beyond %i cells of 64 without a difference', (cells) => {
    for (const shape of [[1, cells], [cells, 1]] as [number, number][]) {
      const asked = query(shape, [shape[0] === 1 ? 2 : 64, shape[1] === 1 ? 2 : 64]);
      const { re } = kernel.spectrum(asked);
      const wanted = oracleLine(padded(asked.re, 64), padded(asked.im, 64));
      const line = shape[0] === 1 ? re.subarray(0, 64) : re.filter((_, i) => i % 2 === 0);
      expect(difference(line, wanted.re)).toBeLessThan(1e-14);
    }
  });
});

describe('the kernel in closed forms', () => {
  it('keeps the energy: the sum of |F|^2 is the number of samples times that of the cells', () => {
    const asked = query([37, 50], [128, 64]);
    const { re, im } = kernel.spectrum(asked);
    const energy = (a: Float64Array, b: Float64Array): number => a.reduce((sum, x, i) => sum + x * x + b[i] * b[i], 0);
    expect(energy(re, im) / (128 * 64 * energy(asked.re, asked.im))).toBeCloseTo(1, 13);
  });

  it('gives one lit cell the same size everywhere and the phase of its place', () => {
    const [columnCount, rowCount, c, r] = [20, 9, 13, 4];
    const re = new Float64Array(columnCount * rowCount);
    re[r * columnCount + c] = 1;
    const { re: gotRe, im: gotIm } = kernel.spectrum({ columnCount, rowCount, re, im: new Float64Array(re.length), columns: 32, rows: 16, originColumn: 9.5, originRow: 4 });
    const phase = (i: number): number => 2 * Math.PI * (((c - 9.5) * Math.floor(i / 16)) / 32 + ((r - 4) * (i % 16)) / 16);
    expect(difference(gotRe, gotRe.map((_, i) => Math.cos(phase(i))))).toBeLessThan(5e-14);
    expect(difference(gotIm, gotIm.map((_, i) => Math.sin(phase(i))))).toBeLessThan(5e-14);
  });

  it('gathers a plane wave into one sample', () => {
    const [columns, rows, m, n] = [64, 32, 11, 29];
    const phase = (i: number): number => -2 * Math.PI * ((m * (i % columns)) / columns + (n * Math.floor(i / columns)) / rows);
    const re = Float64Array.from({ length: columns * rows }, (_, i) => Math.cos(phase(i)));
    const im = Float64Array.from({ length: columns * rows }, (_, i) => Math.sin(phase(i)));
    const got = kernel.spectrum({ columnCount: columns, rowCount: rows, re, im, columns, rows, originColumn: 0, originRow: 0 });
    expect(got.re[m * rows + n]).toBeCloseTo(columns * rows, 9);
    got.re[m * rows + n] = 0;
    expect(Math.max(...got.re.map(Math.abs), ...got.im.map(Math.abs))).toBeLessThan(5e-11);
  });
});

describe('the kernel against the same in TypeScript', () => {
  it.each([
    [[1, 1], [2, 2], [0, 0]],
    [[5, 3], [8, 4], [2, 1]],
    [[40, 40], [128, 128], [19.5, 19.5]],
    [[100, 90], [512, 256], [49.5, 44.5]],
    [[300, 260], [1024, 1024], [0, 0]],
  ] as [[number, number], [number, number], [number, number]][])('makes the spectrum of %p cells in %p samples about %p', (cells, samples, origin) => {
    const asked = query(cells, samples, origin);
    const [got, wanted] = [kernel.spectrum(asked), plainFourierEngine.spectrum(asked)];
    expect(difference(got.re, wanted.re)).toBeLessThan(2e-15 * Math.log2(samples[0] * samples[1] + 2) * 4);
    expect(difference(got.im, wanted.im)).toBeLessThan(2e-15 * Math.log2(samples[0] * samples[1] + 2) * 4);
  });

  it('refuses more cells than samples, and sizes that are no powers of two', () => {
    expect(() => kernel.spectrum(query([9, 4], [8, 4]))).toThrow('4 by 9 cells do not fit into 4 by 8 samples');
    expect(() => kernel.spectrum(query([9, 4], [12, 4]))).toThrow('a power of two from 2 on as its size; got 12');
  });

  it('leaves nothing behind: a spectrum is the same after any other', () => {
    const asked = query([30, 20], [64, 64]);
    const before = kernel.spectrum(asked);
    kernel.spectrum(query([100, 70], [256, 128]));
    kernel.spectrum(query([4, 7], [8, 16]));
    expect(kernel.spectrum(asked)).toEqual(before);
  });

  it.each([
    [64, 1e-13],
    [32, 3e-6],
  ] as const)('adds the patterns of trials up in %i bits', (precision, within) => {
    const shape = { columnCount: 13, rowCount: 21, columns: 32, rows: 64, precision };
    const [got, wanted] = [kernel.powerTrials(shape), plainFourierEngine.powerTrials(shape)];
    for (let trial = 0; trial < 5; trial++) {
      const [re, im] = [scattered(273, trial), scattered(273, trial + 40)];
      const peaks = [got.add(re, im), wanted.add(re, im)];
      expect(Math.abs(peaks[0] / peaks[1] - 1)).toBeLessThan(within);
    }
    expect(difference(got.sum(), wanted.sum())).toBeLessThan(within);
    expect(difference(got.largest(), wanted.largest())).toBeLessThan(within);
  });

  it('begins anew in memory that was given back', () => {
    const shape = { columnCount: 13, rowCount: 21, columns: 32, rows: 64, precision: 64 as const };
    const cells = [scattered(273), scattered(273, 9)] as const;
    const first = kernel.powerTrials(shape);
    first.add(...cells);
    const sum = first.sum();
    first.release();
    first.release();
    const [second, third] = [kernel.powerTrials(shape), kernel.powerTrials(shape)];
    third.add(cells[1], cells[0]);
    second.add(...cells);
    expect(second.sum()).toEqual(sum);
  });

  it('adds trials on grids narrower than a vector', () => {
    const shape = { columnCount: 2, rowCount: 3, columns: 2, rows: 4, precision: 32 as const };
    const [got, wanted] = [kernel.powerTrials(shape), plainFourierEngine.powerTrials(shape)];
    const cells = [scattered(6), scattered(6, 9)] as const;
    expect(got.add(...cells) / wanted.add(...cells)).toBeCloseTo(1, 5);
    expect(difference(got.sum(), wanted.sum())).toBeLessThan(1e-6);
  });
});

describe('the pattern step in the kernel', () => {
  const count = 40 * 30;
  const shape = { columnCount: 40, rowCount: 30, columns: 128, rows: 64 };
  const weights = scattered(128 * 64, 11).map((w) => 1 + w);

  it.each([
    [64, 1e-6],
    [32, 1e-5],
  ] as const)('finds peak, place, total and decibels as in TypeScript, in %i bits', (precision, within) => {
    const query = { ...shape, precision, weights };
    const [got, wanted] = [kernel.patternStep(query), plainFourierEngine.patternStep(query)];
    for (const seed of [1, 2, 3]) {
      const cells = [scattered(count, seed), scattered(count, seed + 9)] as const;
      const [own, theirs] = [got.run(...cells), wanted.run(...cells)];
      expect(own.peakSample).toBe(theirs.peakSample);
      expect(own.peak / theirs.peak).toBeCloseTo(1, 5);
      expect(Math.abs(own.total / theirs.total - 1)).toBeLessThan(within);
      const peakDb = 10 * Math.log10(theirs.peak);
      const errors = wanted.powerDb.map((db, i) => (db > peakDb - 60 ? Math.abs(db - got.powerDb[i]) : 0));
      expect(Math.max(...errors)).toBeLessThan(precision === 64 ? 2e-5 : 5e-3);
    }
  });

  it('puts nothing at -300 dB and keeps the place of a single beam', () => {
    const step = kernel.patternStep({ ...shape, precision: 64, weights });
    expect(step.run(new Float64Array(count), new Float64Array(count))).toEqual({ peak: 0, peakSample: 0, total: 0 });
    expect(step.powerDb[77]).toBeCloseTo(-300, 3);
    const phase = (i: number): number => -2 * Math.PI * ((9 * (i % 40)) / 128 + (50 * Math.floor(i / 40)) / 64);
    const beam = step.run(Float64Array.from({ length: count }, (_, i) => Math.cos(phase(i))), Float64Array.from({ length: count }, (_, i) => Math.sin(phase(i))));
    expect(beam.peakSample).toBe(9 * 64 + 50);
    expect(beam.peak).toBeCloseTo(count * count, 0);
  });

  it('refuses a grid narrower than its blocks', () => {
    expect(() => kernel.patternStep({ ...shape, columnCount: 8, columns: 8, precision: 64, weights })).toThrow('at least 16 samples along each side; got 8 by 64');
  });
});

describe('alternating projections in the kernel', () => {
  const shape: ComplexCells & SampleCounts = { columnCount: 12, rowCount: 10, re: scattered(120), im: scattered(120, 3), columns: 32, rows: 32 };
  const amplitude = Float64Array.from({ length: 120 }, (_, i) => (i % 11 === 0 ? 0 : 1 + 0.3 * Math.sin(i)));
  const lower = Float64Array.from({ length: 1024 }, (_, i) => (i % 37 === 0 ? 20 : 0));
  const upper = Float64Array.from({ length: 1024 }, (_, i) => (i % 37 === 0 ? 30 : i % 2 === 0 ? 8 : Infinity));

  it.each([
    [64, 1e-11],
    [32, 1e-3],
  ] as const)('walk the same way as in TypeScript, in %i bits', (precision, within) => {
    const asked = { ...shape, amplitude, lower, upper, precision };
    const walks = [kernel.alternatingProjections(asked), plainFourierEngine.alternatingProjections(asked)];
    walks.forEach((walk) => walk.run(6));
    const [got, wanted] = walks.map((walk) => walk.cells());
    expect(difference(got.re, wanted.re)).toBeLessThan(within);
    expect(difference(got.im, wanted.im)).toBeLessThan(within);
  });

  it('bring every cell to its amplitude, and leave empty places empty', () => {
    const walk = kernel.alternatingProjections({ ...shape, amplitude, lower, upper: lower, precision: 64 });
    walk.run(3);
    const { re, im } = walk.cells();
    expect(difference(re.map((a, i) => Math.hypot(a, im[i])), amplitude)).toBeLessThan(1e-14);
  });

  it('walk on where they stopped, whatever else was done meanwhile', () => {
    const asked = { ...shape, amplitude, lower, upper, precision: 64 as const };
    const [once, inParts] = [kernel.alternatingProjections(asked), kernel.alternatingProjections(asked)];
    once.run(5);
    inParts.run(2);
    kernel.spectrum(query([40, 40], [128, 128]));
    inParts.run(0);
    inParts.run(3);
    expect(inParts.cells()).toEqual(once.cells());
  });

  it('come nearer to the bounds with every few rounds', () => {
    const outside = (rounds: number): number => {
      const walk = kernel.alternatingProjections({ ...shape, amplitude, lower, upper, precision: 64 });
      walk.run(rounds);
      const { re, im } = kernel.spectrum({ ...shape, ...walk.cells(), originColumn: 0, originRow: 0 });
      return re.reduce((sum, a, i) => {
        const size = Math.hypot(a, im[i]);
        return sum + Math.max(0, lower[i] - size, size - upper[i]) ** 2;
      }, 0);
    };
    expect(outside(5)).toBeLessThan(outside(1));
    expect(outside(60)).toBeLessThan(outside(5));
  });
});

describe('exact sums in the kernel', () => {
  it('are the plain sums at any directions and their opposites', () => {
    const cells: ComplexCells = { columnCount: 33, rowCount: 18, re: scattered(594), im: scattered(594, 2) };
    const steps = (scale: number): Float64Array => Float64Array.from({ length: 19 }, (_, i) => scale * Math.PI * Math.sin(3 * i * i));
    const asked = { ...cells, stepXRad: steps(1.3), stepYRad: steps(0.9) };
    const [got, wanted] = [kernel.latticeSums(asked), plainFourierEngine.latticeSums(asked)];
    for (const key of ['re', 'im', 'oppositeRe', 'oppositeIm'] as const) expect(difference(got[key], wanted[key])).toBeLessThan(2e-14);
  });

  it('hold at broadside, at quarter and half turns, and a hair beside them, on a side of 1000 cells', () => {
    const cells: ComplexCells = { columnCount: 1000, rowCount: 2, re: scattered(2000), im: scattered(2000, 8) };
    const stepXRad = Float64Array.from([0, 1e-9, 1e-4, Math.PI / 2, Math.PI / 2 + 1e-9, Math.PI, -Math.PI + 1e-7, 0.3, 2.9]);
    const asked = { ...cells, stepXRad, stepYRad: stepXRad.map((x) => 0.5 * x) };
    const [got, wanted] = [kernel.latticeSums(asked), plainFourierEngine.latticeSums(asked)];
    for (const key of ['re', 'im', 'oppositeRe', 'oppositeIm'] as const) expect(difference(got[key], wanted[key])).toBeLessThan(1e-12);
  });
});
