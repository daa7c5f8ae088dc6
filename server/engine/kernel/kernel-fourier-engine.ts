import type { FourierEngine } from '../../../shared/math/fourier-engine';
import { KernelInstance } from './kernel-instance';
import { createLatticeSums } from './kernel-lattice-sums';
import { createPatternStep } from './kernel-pattern-step';
import { createProjections } from './kernel-projections';
import { createSpectrumMaker } from './kernel-spectrum';
import { createTrials } from './kernel-trials';
import { TransformPlans } from './transform-plan';

/** Memories that were given back and wait for the next to ask. */
const MOST_SPARE = 2;

/** The engine's transforms done by the vector kernel; one for each thread. */
export function createKernelFourierEngine(): FourierEngine {
  const instance = new KernelInstance();
  const plans = new TransformPlans(instance);
  const lend = createLender();
  return {
    spectrum: createSpectrumMaker(instance, plans),
    latticeSums: createLatticeSums(instance),
    alternatingProjections: (query) => createProjections(instance, plans, query),
    patternStep: (query) => lend((own) => createPatternStep(own, query)),
    powerTrials: (query) => lend((own) => createTrials(own, query)),
  };
}

/** What lives on beside other work gets a memory of its own, until it is released. */
function createLender(): <Made extends object>(make: (own: KernelInstance) => Made) => Made & { release(): void } {
  const spare: KernelInstance[] = [];
  return (make) => {
    const own = spare.pop() ?? new KernelInstance();
    const mark = own.mark();
    let isLent = true;
    const release = (): void => {
      if (isLent && spare.length < MOST_SPARE) {
        own.release(mark);
        spare.push(own);
      }
      isLent = false;
    };
    return { ...make(own), release };
  };
}
