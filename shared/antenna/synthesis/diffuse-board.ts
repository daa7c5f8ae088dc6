import { randomStream } from '../../math/seeded-random';

/** A board of blocks, each in one of a few states evenly spaced round the circle. */
export interface BoardQuestion {
  readonly columns: number;
  readonly rows: number;
  readonly states: number;
  /** Cells of a block along x and y: the block's own pattern weighs the board's. */
  readonly blockColumns: number;
  readonly blockRows: number;
  readonly seed: number;
}

export interface BoardSearch {
  /** State of each block, row by row. */
  readonly state: Int32Array;
  /** Highest |F|^2 over (number of blocks)^2 on the samples, against all blocks equal. */
  readonly peakShare: number;
  /** Samples of a side over the whole reciprocal cell of the blocks. */
  readonly samples: number;
  /** Every board was tried, or one after the other was improved. */
  readonly method: 'exhaustive' | 'descent';
  /** Boards that reach the same peak, of those tried. */
  readonly equals: number;
}

/** All boards of up to this many blocks of one cell and two states are tried. */
const MOST_TRIED_BLOCKS = 16;
const RESTARTS = 6;
const SAME_SHARE = 1e-9;

/** The board with the lowest peak that the search finds. Equal questions have equal answers. */
export function searchBoard(question: BoardQuestion, samples = samplesFor(question)): BoardSearch {
  const { columns, rows, states, blockColumns, blockRows } = question;
  const plain = blockColumns === 1 && blockRows === 1 && columns > 1 && rows > 1;
  if (plain && states === 2 && columns * rows <= MOST_TRIED_BLOCKS) return tryAll(question, samples);
  return descend(question, samples);
}

function samplesFor({ columns, rows }: BoardQuestion): number {
  let samples = 16;
  while (samples < 4 * Math.max(columns, rows)) samples *= 2;
  return samples;
}

/** exp(j 2 pi c m / samples) for every place and sample of a side. */
interface SideTurns {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

function sideTurns(places: number, samples: number): SideTurns {
  const at = (i: number): number => (2 * Math.PI * ((Math.floor(i / samples) * (i % samples)) % samples)) / samples;
  return { re: Float64Array.from({ length: places * samples }, (_, i) => Math.cos(at(i))), im: Float64Array.from({ length: places * samples }, (_, i) => Math.sin(at(i))) };
}

/** |sin(n psi / 2) / (n sin(psi / 2))|^2 of the cells of a block, psi the phase from cell to cell. */
function blockShare(cells: number, sample: number, samples: number): number {
  const turn = (sample < samples / 2 ? sample : sample - samples) / samples;
  const psi = (2 * Math.PI * turn) / cells;
  return turn === 0 ? 1 : (Math.sin((cells * psi) / 2) / (cells * Math.sin(psi / 2))) ** 2;
}

function weights({ blockColumns, blockRows }: BoardQuestion, samples: number): Float64Array {
  return Float64Array.from({ length: samples * samples }, (_, i) => blockShare(blockColumns, Math.floor(i / samples), samples) * blockShare(blockRows, i % samples, samples));
}

/** Boards that differ by their sign, by the signs of every other column or row: the same pattern, whole or moved by half a period. */
const ALIKE = 8;

/** Real boards of +1 and -1: the pattern at -u is its conjugate, so half of the samples along u suffice. */
function tryAll(question: BoardQuestion, samples: number): BoardSearch {
  const { columns, rows } = question;
  const weight = weights(question, samples);
  const across = sideTurns(columns, samples);
  const along = sideTurns(rows, samples);
  const half = samples / 2 + 1;
  const lines = lineSpectra(columns, half, across, samples);
  const count = 2 ** (columns * rows);
  let best = { board: 0, peak: Infinity, equals: 0 };
  // One board of each eight has +1 in the first block and in its neighbours along both sides.
  const fixed = 1 | 2 | (1 << columns);
  for (let board = 0; board < count; board += 4) {
    if ((board & fixed) !== 0) continue;
    const peak = boardPeak({ board, columns, rows, half, samples, lines, along, weight }, best.peak * (1 + SAME_SHARE));
    if (peak < best.peak * (1 - SAME_SHARE)) best = { board, peak, equals: ALIKE };
    else if (peak <= best.peak * (1 + SAME_SHARE)) best = { ...best, equals: best.equals + ALIKE };
  }
  const blocks = columns * rows;
  const state = Int32Array.from({ length: blocks }, (_, i) => (best.board >> i) & 1);
  return { state, peakShare: best.peak / (blocks * blocks), samples, method: 'exhaustive', equals: best.equals };
}

/** Spectrum of every pattern of one row. */
function lineSpectra(columns: number, half: number, across: SideTurns, samples: number): SideTurns {
  const re = new Float64Array(2 ** columns * half);
  const im = new Float64Array(2 ** columns * half);
  for (let line = 0; line < 2 ** columns; line++) {
    for (let m = 0; m < half; m++) {
      for (let c = 0; c < columns; c++) {
        const sign = (line >> c) & 1 ? -1 : 1;
        re[line * half + m] += sign * across.re[c * samples + m];
        im[line * half + m] += sign * across.im[c * samples + m];
      }
    }
  }
  return { re, im };
}

interface BoardTrial {
  readonly board: number;
  readonly columns: number;
  readonly rows: number;
  readonly half: number;
  readonly samples: number;
  readonly lines: SideTurns;
  readonly along: SideTurns;
  readonly weight: Float64Array;
}

/** Highest weighted |F|^2; gives up above `enough`, since another board is better already. */
function boardPeak({ board, columns, rows, half, samples, lines, along, weight }: BoardTrial, enough: number): number {
  let peak = 0;
  for (let m = 0; m < half; m++) {
    for (let n = 0; n < samples; n++) {
      let [re, im] = [0, 0];
      for (let r = 0; r < rows; r++) {
        const at = ((board >> (r * columns)) & (2 ** columns - 1)) * half + m;
        const [c, s] = [along.re[r * samples + n], along.im[r * samples + n]];
        re += lines.re[at] * c - lines.im[at] * s;
        im += lines.re[at] * s + lines.im[at] * c;
      }
      const power = (re * re + im * im) * weight[m * samples + n];
      if (power > peak) peak = power;
    }
    if (peak > enough) return peak;
  }
  return peak;
}

/** From seeded boards, block after block takes the state with the lowest peak, until none helps; the best of a few starts. */
function descend(question: BoardQuestion, samples: number): BoardSearch {
  const blocks = question.columns * question.rows;
  const scene = descentScene(question, samples);
  let best: { state: Int32Array; peak: number } | undefined;
  let equals = 0;
  for (let restart = 0; restart < RESTARTS; restart++) {
    const uniform = new Float64Array(blocks);
    randomStream({ seed: question.seed, trial: restart, channel: 0 }).fillUniforms(uniform);
    const found = improved(scene, Int32Array.from(uniform, (u) => Math.floor(u * question.states)));
    if (!best || found.peak < best.peak * (1 - SAME_SHARE)) [best, equals] = [found, 1];
    else if (found.peak <= best.peak * (1 + SAME_SHARE)) equals += 1;
  }
  const { state, peak } = best ?? { state: new Int32Array(blocks), peak: blocks * blocks };
  return { state, peakShare: peak / (blocks * blocks), samples, method: 'descent', equals };
}

interface DescentScene {
  readonly question: BoardQuestion;
  readonly samples: number;
  readonly across: SideTurns;
  readonly along: SideTurns;
  readonly weight: Float64Array;
}

function descentScene(question: BoardQuestion, samples: number): DescentScene {
  return { question, samples, across: sideTurns(question.columns, samples), along: sideTurns(question.rows, samples), weight: weights(question, samples) };
}

const MOST_SWEEPS = 12;

function improved(scene: DescentScene, state: Int32Array): { state: Int32Array; peak: number } {
  const { states } = scene.question;
  const field = { re: new Float64Array(scene.samples ** 2), im: new Float64Array(scene.samples ** 2) };
  state.forEach((s, block) => addBlock(scene, field, block, [Math.cos((2 * Math.PI * s) / states), Math.sin((2 * Math.PI * s) / states)]));
  let peak = peakWith(scene, field, { block: 0, step: [0, 0] }, Infinity);
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    const before = peak;
    for (let block = 0; block < state.length; block++) {
      const better = betterState(scene, field, { block, state: state[block] }, peak);
      if (better === null) continue;
      addBlock(scene, field, block, better.step);
      [state[block], peak] = [better.state, better.peak];
    }
    if (peak >= before * (1 - SAME_SHARE)) break;
  }
  return { state, peak };
}

/** The state of a block that lowers the peak most, or null where none does. */
function betterState(scene: DescentScene, field: SideTurns, at: { block: number; state: number }, peak: number): { state: number; step: readonly number[]; peak: number } | null {
  const { states } = scene.question;
  const now = (2 * Math.PI * at.state) / states;
  let best: { state: number; step: readonly number[]; peak: number } | null = null;
  for (let state = 0; state < states; state++) {
    if (state === at.state) continue;
    const angle = (2 * Math.PI * state) / states;
    const step = [Math.cos(angle) - Math.cos(now), Math.sin(angle) - Math.sin(now)];
    const lowest = best?.peak ?? peak;
    const height = peakWith(scene, field, { block: at.block, step }, lowest);
    if (height < lowest * (1 - SAME_SHARE)) best = { state, step, peak: height };
  }
  return best;
}

/** Highest weighted |F|^2 with a block changed by a step; gives up as soon as it cannot be below `enough`. */
function peakWith({ question, samples, across, along, weight }: DescentScene, field: SideTurns, { block, step }: { block: number; step: readonly number[] }, enough: number): number {
  const [stepRe, stepIm] = step;
  const [c, r] = [block % question.columns, Math.floor(block / question.columns)];
  let peak = 0;
  for (let m = 0; m < samples; m++) {
    const [ar, ai] = [across.re[c * samples + m], across.im[c * samples + m]];
    const [br, bi] = [stepRe * ar - stepIm * ai, stepRe * ai + stepIm * ar];
    for (let n = 0; n < samples; n++) {
      const at = m * samples + n;
      const [lr, li] = [along.re[r * samples + n], along.im[r * samples + n]];
      const re = field.re[at] + br * lr - bi * li;
      const im = field.im[at] + br * li + bi * lr;
      const power = (re * re + im * im) * weight[at];
      if (power > peak) peak = power;
    }
    if (peak >= enough) return peak;
  }
  return peak;
}

function addBlock({ question, samples, across, along }: DescentScene, field: SideTurns, block: number, [stepRe, stepIm]: readonly number[]): void {
  const [c, r] = [block % question.columns, Math.floor(block / question.columns)];
  for (let m = 0; m < samples; m++) {
    const [ar, ai] = [across.re[c * samples + m], across.im[c * samples + m]];
    const [br, bi] = [stepRe * ar - stepIm * ai, stepRe * ai + stepIm * ar];
    for (let n = 0; n < samples; n++) {
      const [lr, li] = [along.re[r * samples + n], along.im[r * samples + n]];
      field.re[m * samples + n] += br * lr - bi * li;
      field.im[m * samples + n] += br * li + bi * lr;
    }
  }
}

/** Highest |F|^2 over (number of blocks)^2 of a given board on a grid of samples. */
export function boardPeakShare(question: BoardQuestion, state: ArrayLike<number>, samples: number): number {
  const scene = descentScene(question, samples);
  const field = { re: new Float64Array(samples * samples), im: new Float64Array(samples * samples) };
  for (let block = 0; block < state.length; block++) {
    const angle = (2 * Math.PI * state[block]) / question.states;
    addBlock(scene, field, block, [Math.cos(angle), Math.sin(angle)]);
  }
  return peakWith(scene, field, { block: 0, step: [0, 0] }, Infinity) / state.length ** 2;
}
