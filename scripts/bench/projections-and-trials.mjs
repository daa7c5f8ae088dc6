/** Alternating projections, and the patterns of a tolerance run. */

const scattered = (n) => (n * 0.6180339887498949) % 1;
const unitCells = (count, seed) => ({
  re: Float64Array.from({ length: count }, (_, n) => Math.cos(2 * Math.PI * scattered((n + seed) * n))),
  im: Float64Array.from({ length: count }, (_, n) => Math.sin(2 * Math.PI * scattered((n + seed) * n))),
});

function projections(load, precision) {
  const { createKernelFourierEngine } = load('server/engine/kernel/kernel-fourier-engine');
  const [side, size] = [100, 512];
  const bounds = Float64Array.from({ length: size * size }, (_, n) => 1 + scattered(n * n));
  const walk = createKernelFourierEngine().alternatingProjections({
    ...{ columnCount: side, rowCount: side, columns: size, rows: size, precision, ...unitCells(side * side, 1) },
    ...{ amplitude: new Float64Array(side * side).fill(1), lower: bounds, upper: bounds },
  });
  return () => walk.run(100);
}

/** Both ways without the rows that hold no cells, on warm memory. */
const scipyProjections = {
  setup: `
import numpy as np, scipy.fft
rng = np.random.default_rng(1)
start = np.exp(2j * np.pi * rng.random((100, 100)))
wanted = 1 + rng.random((512, 512))
rows = np.zeros((100, 512), complex)
grid = np.zeros((512, 512), complex)
def project(rounds):
    cells = start
    for _ in range(rounds):
        rows[:, :100] = cells
        grid[:100] = scipy.fft.fft(rows, axis=1)
        pattern = scipy.fft.fft(grid, axis=0)
        pattern *= wanted / (np.abs(pattern) + 1e-15)
        back = scipy.fft.ifft(pattern, axis=0, overwrite_x=True)[:100]
        cells = scipy.fft.ifft(back, axis=1)[:, :100]
        cells = cells / (np.abs(cells) + 1e-15)
    return cells
`,
  call: 'project(100)',
};

function trials(load, precision) {
  const { createKernelFourierEngine } = load('server/engine/kernel/kernel-fourier-engine');
  const { powerTrials } = createKernelFourierEngine();
  const fields = Array.from({ length: 8 }, (_, seed) => unitCells(3600, seed));
  const sums = powerTrials({ columnCount: 60, rowCount: 60, columns: 256, rows: 256, precision });
  return () => {
    for (let trial = 0; trial < 500; trial++) sums.add(fields[trial % 8].re, fields[trial % 8].im);
  };
}

const scipyTrials = {
  setup: `
import numpy as np, scipy.fft
rng = np.random.default_rng(1)
fields = np.exp(2j * np.pi * rng.random((8, 60, 60)))
rows = np.zeros((60, 256), complex)
grid = np.zeros((256, 256), complex)
total = np.zeros((256, 256))
largest = np.zeros((256, 256))
def trials(count):
    for trial in range(count):
        rows[:, :60] = fields[trial % 8]
        grid[:60] = scipy.fft.fft(rows, axis=1)
        pattern = scipy.fft.fft(grid, axis=0)
        power = pattern.real ** 2 + pattern.imag ** 2
        np.add(total, power, out=total)
        np.maximum(largest, power, out=largest)
        power.max()
`,
  call: 'trials(500)',
};

const row = (name, ratio, prepare) => ({ name, against: 'scipy', goal: { ratio }, rounds: 3, prepare });

export const rows = [
  row('alternating projections, 100 rounds at 512², f64', 0.28, (load) => ({ work: projections(load, 64), ...scipyProjections })),
  row('alternating projections, 100 rounds at 512², f32', 0.14, (load) => ({ work: projections(load, 32), ...scipyProjections })),
  row('tolerance, 500 trials of 60² cells in 256², f64', 0.25, (load) => ({ work: trials(load, 64), ...scipyTrials })),
  row('tolerance, 500 trials of 60² cells in 256², f32', 0.15, (load) => ({ work: trials(load, 32), ...scipyTrials })),
  {
    name: 'tolerance, 500 trials of 60² cells, time of a thread',
    goal: { wallMs: 1000, rssMb: Infinity },
    prepare: (load) => ({ work: trials(load, 32) }),
  },
];
