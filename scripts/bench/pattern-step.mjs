/** The pattern step: fill the grid, transform it, power in dB, peak and integral; from the cells in the server's arrays. */

/** A square panel with pseudo-random phases. */
function cells(side) {
  const phase = (n) => 2 * Math.PI * ((n * 0.6180339887498949) % 1);
  return {
    re: Float64Array.from({ length: side * side }, (_, n) => Math.cos(phase(n * n))),
    im: Float64Array.from({ length: side * side }, (_, n) => Math.sin(phase(n * n))),
  };
}

function patternStep(load, side, size, precision) {
  const { createKernelFourierEngine } = load('server/engine/kernel/kernel-fourier-engine');
  const { re, im } = cells(side);
  const weights = new Float64Array(size * size).fill(1);
  const step = createKernelFourierEngine().patternStep({ columnCount: side, rowCount: side, columns: size, rows: size, precision, weights });
  return () => step.run(re, im);
}

/** scipy in its fairest form: rows without cells are not transformed, and the memory is warm. */
const scipyStep = (side, size) => ({
  setup: `
import numpy as np, scipy.fft
rng = np.random.default_rng(1)
cells = np.exp(2j * np.pi * rng.random((${side}, ${side})))
rows = np.zeros((${side}, ${size}), complex)
grid = np.zeros((${size}, ${size}), complex)
def step():
    rows[:, :${side}] = cells
    grid[:${side}] = scipy.fft.fft(rows, axis=1)
    spectrum = scipy.fft.fft(grid, axis=0)
    power = spectrum.real ** 2 + spectrum.imag ** 2
    return power.max(), power.sum(), 10 * np.log10(power + 1e-30)
`,
  call: 'step()',
});

const row = (side, size, precision, { ratio = null, rounds } = {}) => ({
  name: `pattern step, ${side}² cells in ${size}², f${precision}`,
  against: 'scipy',
  goal: { ratio },
  rounds,
  showsMemory: ratio === null,
  prepare: (load) => ({ work: patternStep(load, side, size, precision), ...scipyStep(side, size) }),
});

/** Rows without a goal show how the step grows, which must stay N log N and below scipy. */
export const rows = [
  row(100, 512, 64, { ratio: 0.3 }),
  row(100, 512, 32, { ratio: 0.18 }),
  row(1000, 2048, 64, { ratio: 0.34, rounds: 4 }),
  row(1000, 2048, 32, { ratio: 0.2, rounds: 4 }),
  row(10, 32, 32),
  row(30, 64, 32),
  row(100, 256, 32),
  row(300, 1024, 32, { rounds: 6 }),
  row(1000, 2048, 32, { rounds: 3 }),
  row(2000, 4096, 32, { rounds: 2 }),
].map((each) => (each.goal.ratio === null ? { ...each, name: each.name.replace('pattern step', 'growth') } : each));
