import type { AlternatingProjections, ComplexSamples, FourierEngine, LatticeSumQuery, LatticeSums, PatternStep, PatternStepQuery, PowerTrials, ProjectionQuery, SpectrumQuery, TrialQuery } from './fourier-engine';
import { radixFourTransform } from './fourier-transform';

/** Everything in TypeScript, 64-bit whatever is asked for: where there is no kernel, and what kernels are held against. */
export const plainFourierEngine: FourierEngine = {
  spectrum: plainSpectrum,
  patternStep: plainPatternStep,
  powerTrials: plainTrials,
  alternatingProjections: plainProjections,
  latticeSums: plainLatticeSums,
};

interface Turns {
  readonly cosines: Float64Array;
  readonly sines: Float64Array;
}

/** exp(-j 2 pi origin i / size): moves the phase origin from the first cell of a side to the place given. */
function originTurns(origin: number, size: number): Turns {
  const step = (-2 * Math.PI * origin) / size;
  return {
    cosines: Float64Array.from({ length: size }, (_, i) => Math.cos(step * i)),
    sines: Float64Array.from({ length: size }, (_, i) => Math.sin(step * i)),
  };
}

/** Rows of cells first; the empty rows of the grid are not transformed. */
function plainSpectrum(query: SpectrumQuery): ComplexSamples {
  const { columns, rows, rowCount } = query;
  const lines = rowSpectra(query);
  const re = new Float64Array(columns * rows);
  const im = new Float64Array(columns * rows);
  const transform = radixFourTransform(rows);
  const lineRe = new Float64Array(rows);
  const lineIm = new Float64Array(rows);
  const turns = originTurns(query.originRow, rows);
  for (let m = 0; m < columns; m++) {
    const from = m * rowCount;
    lineRe.fill(0, rowCount);
    lineIm.fill(0, rowCount);
    lineRe.set(lines.re.subarray(from, from + rowCount));
    lineIm.set(lines.im.subarray(from, from + rowCount));
    transform.transform(lineRe, lineIm);
    const to = m * rows;
    for (let n = 0; n < rows; n++) {
      re[to + n] = lineRe[n] * turns.cosines[n] - lineIm[n] * turns.sines[n];
      im[to + n] = lineRe[n] * turns.sines[n] + lineIm[n] * turns.cosines[n];
    }
  }
  return { re, im };
}

/** Transforms along x: row r at sample m stands at m rowCount + r. */
function rowSpectra(query: SpectrumQuery): ComplexSamples {
  const { columnCount, rowCount, columns } = query;
  const spectraRe = new Float64Array(columns * rowCount);
  const spectraIm = new Float64Array(columns * rowCount);
  const transform = radixFourTransform(columns);
  const re = new Float64Array(columns);
  const im = new Float64Array(columns);
  const { cosines, sines } = originTurns(query.originColumn, columns);
  for (let r = 0; r < rowCount; r++) {
    re.fill(0, columnCount);
    im.fill(0, columnCount);
    re.set(query.re.subarray(r * columnCount, (r + 1) * columnCount));
    im.set(query.im.subarray(r * columnCount, (r + 1) * columnCount));
    transform.transform(re, im);
    for (let m = 0; m < columns; m++) {
      spectraRe[m * rowCount + r] = re[m] * cosines[m] - im[m] * sines[m];
      spectraIm[m * rowCount + r] = re[m] * sines[m] + im[m] * cosines[m];
    }
  }
  return { re: spectraRe, im: spectraIm };
}

function plainTrials(query: TrialQuery): PowerTrials {
  const { columns, rows } = query;
  const sum = new Float64Array(columns * rows);
  const largest = new Float64Array(columns * rows);
  return {
    add: (cellsRe, cellsIm) => {
      const { re, im } = plainSpectrum({ ...query, re: cellsRe, im: cellsIm, originColumn: 0, originRow: 0 });
      let peak = 0;
      for (let i = 0; i < sum.length; i++) {
        const power = re[i] * re[i] + im[i] * im[i];
        sum[i] += power;
        if (power > largest[i]) largest[i] = power;
        if (power > peak) peak = power;
      }
      return peak;
    },
    sum: () => sum.slice(),
    largest: () => largest.slice(),
    release: () => undefined,
  };
}

/** Power that stands for nothing in decibels. */
const NO_POWER = 1e-30;

function plainPatternStep(query: PatternStepQuery): PatternStep {
  const { columns, rows, weights } = query;
  const powerDb = new Float32Array(columns * rows);
  return {
    powerDb,
    run: (cellsRe, cellsIm) => {
      const { re, im } = plainSpectrum({ ...query, re: cellsRe, im: cellsIm, originColumn: 0, originRow: 0 });
      let [peak, peakSample, total] = [0, 0, 0];
      for (let i = 0; i < re.length; i++) {
        const power = re[i] * re[i] + im[i] * im[i];
        if (power > peak) [peak, peakSample] = [power, i];
        total += power * weights[i];
        powerDb[(i % rows) * columns + Math.floor(i / rows)] = 10 * Math.log10(power + NO_POWER);
      }
      return { peak, peakSample, total };
    },
    release: () => undefined,
  };
}

/** The size of nothing, when it is divided by. */
const TINY = 1e-15;

function plainProjections(query: ProjectionQuery): AlternatingProjections {
  const { columnCount, rowCount, columns, rows, amplitude, lower, upper } = query;
  const re = query.re.slice();
  const im = query.im.slice();
  const round = (): void => {
    const samples = plainSpectrum({ ...query, re, im, originColumn: 0, originRow: 0 });
    for (let i = 0; i < lower.length; i++) {
      const length = Math.hypot(samples.re[i], samples.im[i], TINY);
      const share = Math.min(upper[i], Math.max(lower[i], length)) / length;
      samples.re[i] *= share;
      samples.im[i] *= share;
    }
    // Back by exchanging real and imaginary parts; the samples stand column by column, so x and y are exchanged too.
    const back = plainSpectrum({ columnCount: rows, rowCount: columns, columns: rows, rows: columns, re: samples.im, im: samples.re, originColumn: 0, originRow: 0 });
    for (let r = 0; r < rowCount; r++) {
      for (let c = 0; c < columnCount; c++) {
        const [a, b] = [back.im[r * columns + c], back.re[r * columns + c]];
        const at = r * columnCount + c;
        const share = amplitude[at] / Math.hypot(a, b, TINY);
        re[at] = a * share;
        im[at] = b * share;
      }
    }
  };
  return {
    run: (rounds) => {
      for (let i = 0; i < rounds; i++) round();
    },
    cells: () => ({ re: re.slice(), im: im.slice() }),
  };
}

function plainLatticeSums(query: LatticeSumQuery): LatticeSums {
  const { stepXRad, stepYRad } = query;
  const count = stepXRad.length;
  const sums: LatticeSums = { re: new Float64Array(count), im: new Float64Array(count), oppositeRe: new Float64Array(count), oppositeIm: new Float64Array(count) };
  for (let i = 0; i < count; i++) {
    [sums.re[i], sums.im[i]] = hornerSum(query, stepXRad[i], stepYRad[i]);
    [sums.oppositeRe[i], sums.oppositeIm[i]] = hornerSum(query, -stepXRad[i], -stepYRad[i]);
  }
  return sums;
}

/** Horner's rule along every row and across the rows. */
function hornerSum({ columnCount, rowCount, re, im }: LatticeSumQuery, stepXRad: number, stepYRad: number): [number, number] {
  const [cosX, sinX, cosY, sinY] = [Math.cos(stepXRad), Math.sin(stepXRad), Math.cos(stepYRad), Math.sin(stepYRad)];
  let sumRe = 0;
  let sumIm = 0;
  for (let r = rowCount - 1; r >= 0; r--) {
    let lineRe = 0;
    let lineIm = 0;
    for (let c = columnCount - 1; c >= 0; c--) {
      const turned = lineRe * cosX - lineIm * sinX + re[r * columnCount + c];
      lineIm = lineRe * sinX + lineIm * cosX + im[r * columnCount + c];
      lineRe = turned;
    }
    const turned = sumRe * cosY - sumIm * sinY + lineRe;
    sumIm = sumRe * sinY + sumIm * cosY + lineIm;
    sumRe = turned;
  }
  return [sumRe, sumIm];
}
