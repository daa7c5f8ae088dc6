import { fourierEngine, installFourierEngine } from '../../../shared/math/active-fourier-engine';
import { plainFourierEngine } from '../../../shared/math/plain-fourier-engine';
import { createChunkAnswerer } from '../answer-chunk';
import { createTaskAnswerer } from '../answer-task';
import { useKernel } from './use-kernel';

describe('using the kernel', () => {
  afterEach(() => installFourierEngine(plainFourierEngine));

  it('keeps one kernel for the thread, however often it is asked for', () => {
    useKernel();
    const first = fourierEngine();
    useKernel();
    expect(first).not.toBe(plainFourierEngine);
    expect(fourierEngine()).toBe(first);
  });

  it.each([
    ['predictions', createTaskAnswerer],
    ['pieces of runs', createChunkAnswerer],
  ])('comes with whatever answers %s', (_what, create) => {
    create();
    expect(fourierEngine()).not.toBe(plainFourierEngine);
  });
});
