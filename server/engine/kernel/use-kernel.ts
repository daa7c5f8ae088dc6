import { installFourierEngine } from '../../../shared/math/active-fourier-engine';
import type { FourierEngine } from '../../../shared/math/fourier-engine';
import { createKernelFourierEngine } from './kernel-fourier-engine';

let ours: FourierEngine | undefined;

/** Has this thread transform in the vector kernel. Whatever computes for the engine calls it first, so that all give the same bits. */
export function useKernel(): void {
  ours ??= createKernelFourierEngine();
  installFourierEngine(ours);
}
