import { readFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import type { SamplePrecision } from '../../../shared/math/fourier-engine';

/** A piece of work on columns or lines `from` to `to` - 1 of the job at a place in memory. */
type JobStep = (job: number, from: number, to: number) => void;

/** What assembly/*.ts exports; the endings say how many bits its numbers have. */
export interface KernelExports {
  readonly transformLines64: JobStep;
  readonly transformLines32: JobStep;
  readonly transformColumns64: JobStep;
  readonly transformColumns32: JobStep;
  readonly patternColumns64: JobStep;
  readonly patternColumns32: JobStep;
  readonly projectColumns64: JobStep;
  readonly projectColumns32: JobStep;
  readonly projectLines64: JobStep;
  readonly projectLines32: JobStep;
  accumulateColumns64(job: number): number;
  accumulateColumns32(job: number): number;
  latticeSums(cells: number, alternating: number, columns: number, rows: number, table: number, flips: number, out: number, count: number): void;
}

interface KernelMemory {
  readonly buffer: SharedArrayBuffer;
  grow(pages: number): number;
}

/** The part of WebAssembly that is used; its types otherwise come with those of the browser. */
interface WebAssemblyApi {
  readonly Module: new (bytes: Uint8Array) => object;
  readonly Memory: new (limits: { initial: number; maximum: number; shared: boolean }) => KernelMemory;
  readonly Instance: new (module: object, imports: { env: { memory: KernelMemory } }) => { readonly exports: object };
}

const webAssembly = (globalThis as unknown as { readonly WebAssembly: WebAssemblyApi }).WebAssembly;

const PAGE_BYTES = 65_536;
/** 2 GiB, as the kernel was compiled: far above what a panel of 10^6 cells takes, about 60 MB. */
const MOST_PAGES = 32_768;
/** Vectors stand on whole cache lines of any machine. */
const ALIGNMENT = 128;

let compiled: object | undefined;

/** Where the build puts the kernel: seen from the sources, as in tests, and from the compiled server. */
const kernelFile = (): string => join(__dirname, ...(extname(__filename) === '.ts' ? ['../../..', 'dist'] : ['../../../..']), 'kernel/kernel.wasm');

function kernelModule(): object {
  compiled ??= new webAssembly.Module(readFileSync(kernelFile()));
  return compiled;
}

/**
 * The kernel with a memory of its own, handed out from the bottom up. Shared memory grows without moving, so views stay
 * valid for good.
 */
export class KernelInstance {
  readonly exports: KernelExports;
  private readonly memory = new webAssembly.Memory({ initial: 1, maximum: MOST_PAGES, shared: true });
  private top = ALIGNMENT;

  constructor() {
    // What the module exports is what assembly/ says; the tests call each.
    this.exports = new webAssembly.Instance(kernelModule(), { env: { memory: this.memory } }).exports as unknown as KernelExports;
  }

  /** Place of so many bytes, not cleared. */
  take(bytes: number): number {
    const place = this.top;
    this.top = Math.ceil((place + bytes) / ALIGNMENT) * ALIGNMENT;
    const lacking = this.top - this.memory.buffer.byteLength;
    if (lacking > 0) this.memory.grow(Math.ceil(lacking / PAGE_BYTES));
    return place;
  }

  /** Everything taken after this is given back by {@link release}. */
  mark(): number {
    return this.top;
  }

  release(mark: number): void {
    this.top = mark;
  }

  doubles(place: number, count: number): Float64Array {
    return new Float64Array(this.memory.buffer, place, count);
  }

  floats(place: number, count: number): Float32Array {
    return new Float32Array(this.memory.buffer, place, count);
  }

  integers(place: number, count: number): Int32Array {
    return new Int32Array(this.memory.buffer, place, count);
  }

  numbers(place: number, count: number, precision: SamplePrecision): Float64Array | Float32Array {
    return precision === 64 ? this.doubles(place, count) : this.floats(place, count);
  }
}
