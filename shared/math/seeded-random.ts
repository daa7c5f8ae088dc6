import { normalQuantile } from './normal-quantile';

/** Where a stream of draws starts. All three are whole numbers from 0. */
export interface StreamAddress {
  readonly seed: number;
  readonly trial: number;
  /** One channel for each thing that is drawn, so that adding one leaves the others as they are. */
  readonly channel: number;
}

/** A stream of draws in which each has an address: neither the order nor who draws matters. */
export interface RandomStream {
  /** Draw n as 64 bits, high half first, both unsigned. */
  wordAt(n: number): readonly [number, number];
  /** Draw n, equally likely anywhere between 0 and 1, ends not included. */
  uniformAt(n: number): number;
  /** Draw n, normal with mean 0 and deviation 1. */
  normalAt(n: number): number;
  /** Draws 0, 1, 2, ... into an array. */
  fillUniforms(into: Float64Array): void;
  fillNormals(into: Float64Array): void;
}

/** A 64-bit number in two halves of 32 bits. Kept in one place and changed, so that a draw takes no memory. */
interface Word {
  high: number;
  low: number;
}

/** The golden ratio in 64 bits, 9E3779B97F4A7C15, and the two multipliers of the mixer. */
const STEP: Readonly<Word> = { high: 0x9e3779b9, low: 0x7f4a7c15 };
const FIRST_MULTIPLIER: Readonly<Word> = { high: 0xbf58476d, low: 0x1ce4e5b9 };
const SECOND_MULTIPLIER: Readonly<Word> = { high: 0x94d049bb, low: 0x133111eb };

/** Largest double below 1; the largest word would round up to 1, whose normal is infinite. */
const BELOW_ONE = 1 - 2 ** -53;
const TWO_32 = 2 ** 32;

/**
 * SplitMix64 with an address (G. L. Steele, D. Lea, C. H. Flood, OOPSLA 2014; constants from memory, held by the published
 * words of its seed 0): k = mix(seed + G (trial + 1)), K = mix(k + G (channel + 1)), word n = mix(K + G (n + 1)), all modulo 2^64.
 * uniform = (word / 2^11 + 1/2) 2^-53; normal = its quantile.
 */
export function randomStream(address: StreamAddress): RandomStream {
  for (const [name, value] of Object.entries(address)) requireWhole(name, value);
  const state = wordOf(address.seed);
  for (const index of [address.trial, address.channel]) {
    addSteps(state, index + 1);
    mix(state);
  }
  const work: Word = { high: 0, low: 0 };
  const draw = (n: number): Word => {
    work.high = state.high;
    work.low = state.low;
    addSteps(work, n + 1);
    mix(work);
    return work;
  };
  const fill = (into: Float64Array, shape: (uniform: number) => number): void => {
    const counter: Word = { ...state };
    for (let n = 0; n < into.length; n++) {
      add(counter, STEP);
      work.high = counter.high;
      work.low = counter.low;
      mix(work);
      into[n] = shape(uniformOf(work));
    }
  };
  return {
    wordAt: (n) => {
      const { high, low } = draw(n);
      return [high >>> 0, low >>> 0];
    },
    uniformAt: (n) => uniformOf(draw(n)),
    normalAt: (n) => normalQuantile(uniformOf(draw(n))),
    fillUniforms: (into) => fill(into, (uniform) => uniform),
    fillNormals: (into) => fill(into, normalQuantile),
  };
}

function requireWhole(name: string, value: number): void {
  if (!Number.isSafeInteger(value) || value < 0) throw new RangeError(`The ${name} of a random stream must be a whole number from 0 to 2^53 - 1; got ${value}`);
}

/** (word >> 11 + 1/2) 2^-53. */
function uniformOf({ high, low }: Word): number {
  const top53 = (high >>> 0) * 2 ** 21 + (low >>> 11);
  return Math.min(BELOW_ONE, (top53 + 0.5) * 2 ** -53);
}

function wordOf(value: number): Word {
  return { high: Math.floor(value / TWO_32) | 0, low: value | 0 };
}

function add(into: Word, other: Readonly<Word>): void {
  const low = (into.low >>> 0) + (other.low >>> 0);
  into.high = (into.high + other.high + (low >= TWO_32 ? 1 : 0)) | 0;
  into.low = low | 0;
}

/** Adds G times a count. */
function addSteps(into: Word, count: number): void {
  const product = wordOf(count);
  multiply(product, STEP);
  add(into, product);
}

/** Keeps the lower 64 bits of a product. */
function multiply(into: Word, { high, low }: Readonly<Word>): void {
  const a0 = into.low & 0xffff;
  const a1 = into.low >>> 16;
  const b0 = low & 0xffff;
  const b1 = low >>> 16;
  const crossA = a1 * b0;
  const crossB = a0 * b1;
  const middle = ((a0 * b0) >>> 16) + (crossA & 0xffff) + (crossB & 0xffff);
  const carried = a1 * b1 + (crossA >>> 16) + (crossB >>> 16) + (middle >>> 16);
  into.high = (carried + Math.imul(into.high, low) + Math.imul(into.low, high)) | 0;
  into.low = Math.imul(into.low, low);
}

/** The finaliser: shift and exclusive or by 30, 27 and 31, with a product between. */
function mix(word: Word): void {
  shiftXor(word, 30);
  multiply(word, FIRST_MULTIPLIER);
  shiftXor(word, 27);
  multiply(word, SECOND_MULTIPLIER);
  shiftXor(word, 31);
}

function shiftXor(word: Word, by: number): void {
  word.low ^= (word.low >>> by) | (word.high << (32 - by));
  word.high ^= word.high >>> by;
}
