import { fourierEngine, installFourierEngine } from './active-fourier-engine';
import { plainFourierEngine } from './plain-fourier-engine';

const noise = (count: number, seed: number): Float64Array => Float64Array.from({ length: count }, (_, i) => Math.sin(seed + 12.9898 * i * i + i));
const cells = { columnCount: 5, rowCount: 3, re: noise(15, 1), im: noise(15, 2) };

/** F at phase steps along x and y, as a plain sum. */
function plainSum(stepXRad: number, stepYRad: number, origin = [0, 0]): { re: number; im: number } {
  let [re, im] = [0, 0];
  cells.re.forEach((a, i) => {
    const phase = stepXRad * ((i % 5) - origin[0]) + stepYRad * (Math.floor(i / 5) - origin[1]);
    re += a * Math.cos(phase) - cells.im[i] * Math.sin(phase);
    im += a * Math.sin(phase) + cells.im[i] * Math.cos(phase);
  });
  return { re, im };
}

describe('the plain Fourier engine', () => {
  it.each([[0, 0], [2, 1], [1.5, -0.5]])('makes the spectrum that the sum defines, counted from (%p, %p)', (originColumn, originRow) => {
    const { re, im } = plainFourierEngine.spectrum({ ...cells, columns: 8, rows: 4, originColumn, originRow });
    for (let i = 0; i < 32; i++) {
      const wanted = plainSum((2 * Math.PI * Math.floor(i / 4)) / 8, (2 * Math.PI * (i % 4)) / 4, [originColumn, originRow]);
      expect(re[i]).toBeCloseTo(wanted.re, 12);
      expect(im[i]).toBeCloseTo(wanted.im, 12);
    }
  });

  it('sums exactly at any direction and its opposite', () => {
    const sums = plainFourierEngine.latticeSums({ ...cells, stepXRad: Float64Array.from([0.3, -2.9]), stepYRad: Float64Array.from([1.1, 0.2]) });
    const [one, opposite] = [plainSum(-2.9, 0.2), plainSum(2.9, -0.2)];
    expect([sums.re[1], sums.im[1]]).toEqual([expect.closeTo(one.re, 12), expect.closeTo(one.im, 12)]);
    expect([sums.oppositeRe[1], sums.oppositeIm[1]]).toEqual([expect.closeTo(opposite.re, 12), expect.closeTo(opposite.im, 12)]);
  });

  it('keeps sum and largest of the trials, apart from what is done with the copies', () => {
    const trials = plainFourierEngine.powerTrials({ ...cells, columns: 8, rows: 4, precision: 64 });
    expect(trials.add(cells.re, cells.im)).toBe(Math.max(...trials.largest()));
    trials.sum().fill(0);
    trials.add(new Float64Array(15), new Float64Array(15));
    expect(trials.sum()).toEqual(trials.largest());
    trials.add(cells.re, cells.im);
    expect(trials.sum()[7]).toBeCloseTo(2 * trials.largest()[7], 12);
  });

  it('finds a uniform aperture again from the sizes of its pattern', () => {
    const even = { columnCount: 4, rowCount: 4, columns: 16, rows: 16, amplitude: new Float64Array(16).fill(1) };
    const wanted = plainFourierEngine.spectrum({ ...even, re: even.amplitude, im: new Float64Array(16), originColumn: 0, originRow: 0 });
    const size = wanted.re.map((a, i) => Math.hypot(a, wanted.im[i]));
    const walk = plainFourierEngine.alternatingProjections({
      ...even,
      re: even.amplitude.map((_, i) => Math.cos(0.3 * Math.sin(i))),
      im: even.amplitude.map((_, i) => Math.sin(0.3 * Math.sin(i))),
      lower: size,
      upper: size,
      precision: 64,
    });
    walk.run(400);
    const { re, im } = walk.cells();
    const common = Math.atan2(im[0], re[0]);
    re.forEach((a, i) => expect(Math.cos(Math.atan2(im[i], a) - common)).toBeCloseTo(1, 3));
  });

  it('is what transforms until another is installed', () => {
    expect(fourierEngine()).toBe(plainFourierEngine);
    const other = { ...plainFourierEngine };
    installFourierEngine(other);
    expect(fourierEngine()).toBe(other);
    installFourierEngine(plainFourierEngine);
  });
});
