import type { SamplePrecision } from '../../../shared/math/fourier-engine';
import type { KernelInstance } from './kernel-instance';

/** Below this the kernel writes the sums out; its stages need four lanes in a quarter. */
const FEWEST_STAGED = 16;
const HEADER_BYTES = 16;
const STAGE_BYTES = 8;

/** Lays out what a transform of one size needs (TransformPlan in assembly/transform-plan.ts) and gives its place. */
export function writeTransformPlan(instance: KernelInstance, size: number, precision: SamplePrecision): number {
  if (size < 2 || !Number.isInteger(size) || (size & (size - 1)) !== 0) {
    throw new RangeError(`a transform in the kernel needs a power of two from 2 on as its size; got ${size}`);
  }
  const quarters = size < FEWEST_STAGED ? [] : quartersOf(size);
  const plan = instance.take(HEADER_BYTES + STAGE_BYTES * quarters.length);
  const lastRadix = size < FEWEST_STAGED ? 0 : Math.log2(size) % 2 === 0 ? 4 : 8;
  const first = quarters.length === 0 ? writeRoots(instance, size, precision) : writeTwiddles(instance, quarters[0], precision, 'planes');
  instance.integers(plan, 4).set([size, lastRadix, quarters.length, first]);
  quarters.forEach((quarter, stage) => {
    instance.integers(plan + HEADER_BYTES + STAGE_BYTES * stage, 2).set([quarter, writeTwiddles(instance, quarter, precision, 'groups')]);
  });
  return plan;
}

/** The plans of one instance, each written once and kept there. */
export class TransformPlans {
  private readonly known = new Map<string, number>();

  constructor(private readonly instance: KernelInstance) {}

  /** Both plans of a plane; ask before the instance is marked, or they go with what is released. */
  of(lineSize: number, crossSize: number, precision: SamplePrecision): { linePlan: number; crossPlan: number } {
    return { linePlan: this.planOf(lineSize, precision), crossPlan: this.planOf(crossSize, precision) };
  }

  private planOf(size: number, precision: SamplePrecision): number {
    const key = `${size}/${precision}`;
    const place = this.known.get(key) ?? writeTransformPlan(this.instance, size, precision);
    this.known.set(key, place);
    return place;
  }
}

/** Quarter lengths of the stages of radix four: down to a last one of four, or of eight where the exponent is odd. */
function quartersOf(size: number): number[] {
  const quarters: number[] = [];
  for (let length = size; length > 8; length /= 4) quarters.push(length / 4);
  return quarters;
}

function writeRoots(instance: KernelInstance, size: number, precision: SamplePrecision): number {
  const place = instance.take((2 * size * precision) / 8);
  const roots = instance.numbers(place, 2 * size, precision);
  for (let i = 0; i < size; i++) {
    roots[i] = Math.cos((2 * Math.PI * i) / size);
    roots[size + i] = Math.sin((2 * Math.PI * i) / size);
  }
  return place;
}

/** For each p the cosine and sine of the first, second and third twiddle: six together, or in six planes. */
function writeTwiddles(instance: KernelInstance, quarter: number, precision: SamplePrecision, order: 'groups' | 'planes'): number {
  const place = instance.take((6 * quarter * precision) / 8);
  const twiddles = instance.numbers(place, 6 * quarter, precision);
  const length = 4 * quarter;
  for (let p = 0; p < quarter; p++) {
    for (let power = 1; power <= 3; power++) {
      const angle = (2 * Math.PI * ((p * power) % length)) / length;
      const at = (i: number): number => (order === 'groups' ? 6 * p + i : i * quarter + p);
      twiddles[at(2 * power - 2)] = Math.cos(angle);
      twiddles[at(2 * power - 1)] = Math.sin(angle);
    }
  }
  return place;
}
