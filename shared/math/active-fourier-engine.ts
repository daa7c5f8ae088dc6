import type { FourierEngine } from './fourier-engine';
import { plainFourierEngine } from './plain-fourier-engine';

let active: FourierEngine = plainFourierEngine;

/** What transforms in this thread. */
export function fourierEngine(): FourierEngine {
  return active;
}

/**
 * Sets what transforms in this thread from now on, once, when the thread starts. Which of two equal makers does the sums
 * belongs to the machine as the choice of a sine function does, so it is not handed through every function of the engine.
 */
export function installFourierEngine(engine: FourierEngine): void {
  active = engine;
}
