import type { FourierEngine } from '../../../shared/math/fourier-engine';
import { KernelInstance } from './kernel-instance';
import { createLatticeSums } from './kernel-lattice-sums';
import { createPatternStep } from './kernel-pattern-step';
import { createProjections } from './kernel-projections';
import { createSpectrumMaker } from './kernel-spectrum';
import { createTrials } from './kernel-trials';

/** The engine's transforms done by the vector kernel; one for each thread. */
export function createKernelFourierEngine(): FourierEngine {
  const instance = new KernelInstance();
  return {
    spectrum: createSpectrumMaker(instance),
    latticeSums: createLatticeSums(instance),
    // These live on beside other work, each in a memory of its own that goes with it.
    patternStep: (query) => createPatternStep(new KernelInstance(), query),
    powerTrials: (query) => createTrials(new KernelInstance(), query),
    alternatingProjections: (query) => createProjections(new KernelInstance(), query),
  };
}
