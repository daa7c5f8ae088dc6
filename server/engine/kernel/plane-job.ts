import type { SamplePrecision } from '../../../shared/math/fourier-engine';
import type { KernelInstance } from './kernel-instance';
import { writeTransformPlan } from './transform-plan';

/** Fields of PlaneJob in assembly/plane-job.ts, in its order; each is 32 bits wide. */
const FIELDS = [
  'linePlan', 'crossPlan', 'lineCells', 'lineCount', 'cellsRe', 'cellsIm', 'cellsApart', 'midRe', 'midIm', 'midApart', 'outRe', 'outIm', 'outApart', 'block',
  'scratch', 'lineTurns', 'crossTurns', 'first', 'second', 'map', 'amplitudes', 'result',
] as const;

type Field = (typeof FIELDS)[number];

/** Up to this many samples across the lines a block of 32 bytes stays nearest; beyond it twice that loads less in vain. */
const NARROW_UP_TO = 512;
/** Rows a power of two apart fall into the same lines of the cache: they are moved apart by one more. */
const PADDING_BYTES = 64;
const PLANES_OF_SCRATCH = 6;
const VECTOR_BYTES = 16;

/** Lines of cells that neighbour in memory, and the samples along and across them. */
export interface PlaneShape {
  readonly lineCells: number;
  readonly lineCount: number;
  readonly lineSize: number;
  readonly crossSize: number;
  readonly precision: SamplePrecision;
}

/** A job in the memory of an instance, with room for the cells and their lines. */
export class PlaneJob {
  readonly place: number;
  readonly block: number;
  readonly cellsRe: Float64Array | Float32Array;
  readonly cellsIm: Float64Array | Float32Array;
  /** Numbers from the start of a line of cells to that of the next. */
  readonly cellsApart: number;
  private readonly fields: Int32Array;

  constructor(
    private readonly instance: KernelInstance,
    readonly shape: PlaneShape,
    plans: { linePlan: number; crossPlan: number } = {
      linePlan: writeTransformPlan(instance, shape.lineSize, shape.precision),
      crossPlan: writeTransformPlan(instance, shape.crossSize, shape.precision),
    },
  ) {
    const { lineCells, lineCount, lineSize, crossSize, precision } = shape;
    // The kernel checks nothing and would write over whatever stands beside.
    if (lineCells > lineSize || lineCount > crossSize) {
      throw new RangeError(`${lineCells} by ${lineCount} cells do not fit into ${lineSize} by ${crossSize} samples`);
    }
    const bytes = precision / 8;
    this.block = Math.min(crossSize <= NARROW_UP_TO ? 32 : 64, Math.max(VECTOR_BYTES, lineSize * bytes));
    this.place = instance.take(4 * FIELDS.length);
    this.fields = instance.integers(this.place, FIELDS.length);
    const cellsApart = roundUp(quarterUp(lineCells, lineSize) * bytes, VECTOR_BYTES) + PADDING_BYTES;
    const midApart = roundUp(lineSize * bytes, VECTOR_BYTES) + PADDING_BYTES;
    const cells = instance.take(2 * cellsApart * lineCount);
    // Across the lines, too, whole quarters are read: lines that no cell stands on are zero.
    const midLines = quarterUp(lineCount, crossSize);
    const midPlane = midApart * midLines;
    const mid = instance.take(2 * midPlane);
    // Scratch serves lines too, which need five and six planes of their own length.
    const scratch = instance.take(PLANES_OF_SCRATCH * Math.max(crossSize * this.block, roundUp(lineSize * bytes, VECTOR_BYTES)));
    this.cellsApart = cellsApart / bytes;
    this.cellsRe = instance.numbers(cells, this.cellsApart * lineCount, precision);
    this.cellsIm = instance.numbers(cells + cellsApart * lineCount, this.cellsApart * lineCount, precision);
    this.cellsRe.fill(0);
    this.cellsIm.fill(0);
    // So is what lies beyond lines shorter than a vector.
    const keptBytes = lineSize * bytes < VECTOR_BYTES ? 0 : midApart * lineCount;
    for (const plane of [mid, mid + midPlane]) instance.integers(plane + keptBytes, (midPlane - keptBytes) / 4).fill(0);
    this.fields.fill(0);
    this.set({ ...plans, lineCells, lineCount, cellsRe: cells, cellsIm: cells + cellsApart * lineCount, cellsApart });
    this.set({ midRe: mid, midIm: mid + midPlane, midApart, block: this.block, scratch });
  }

  set(fields: Partial<Record<Field, number>>): void {
    for (const [name, value] of Object.entries(fields)) this.fields[FIELDS.indexOf(name as Field)] = value;
  }

  /** Numbers of the grid in the order in which blocks of columns hold them. */
  get sampleCount(): number {
    return this.shape.crossSize * roundUp(this.shape.lineSize, this.lanes);
  }

  get lanes(): number {
    return this.block / (this.shape.precision / 8);
  }

  /** Place of sample `along` a line and `across` the lines in that order. */
  blockedPlace(along: number, across: number): number {
    const lane = along % this.lanes;
    return (along - lane) * this.shape.crossSize + across * this.lanes + lane;
  }

  /** Room for one number of every sample in that order, cleared. */
  takeSamples(): { place: number; numbers: Float64Array | Float32Array } {
    const place = this.instance.take((this.sampleCount * this.shape.precision) / 8);
    const numbers = this.instance.numbers(place, this.sampleCount, this.shape.precision);
    numbers.fill(0);
    return { place, numbers };
  }

  /** Copies cells that stand line by line without gaps. */
  fillCells(re: Float64Array, im: Float64Array): void {
    const { lineCells, lineCount } = this.shape;
    for (let line = 0; line < lineCount; line++) {
      this.cellsRe.set(re.subarray(line * lineCells, (line + 1) * lineCells), line * this.cellsApart);
      this.cellsIm.set(im.subarray(line * lineCells, (line + 1) * lineCells), line * this.cellsApart);
    }
  }
}

const roundUp = (value: number, unit: number): number => Math.ceil(value / unit) * unit;

/** The kernel reads a line of cells in whole quarters of its transform: one, two or all four. */
function quarterUp(cells: number, size: number): number {
  if (4 * cells <= size) return size / 4;
  return 2 * cells <= size ? size / 2 : size;
}
