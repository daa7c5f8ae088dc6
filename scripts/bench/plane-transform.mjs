/** The bare transform of a full grid in the kernel's memory, against scipy's on warm memory. */

function planeTransform(load, size, precision) {
  const { KernelInstance } = load('server/engine/kernel/kernel-instance');
  const { PlaneJob } = load('server/engine/kernel/plane-job');
  const instance = new KernelInstance();
  const job = new PlaneJob(instance, { lineCells: size, lineCount: size, lineSize: size, crossSize: size, precision });
  const bytes = precision / 8;
  const outApart = size * bytes + 64;
  const outRe = instance.take(2 * outApart * size);
  job.set({ outRe, outIm: outRe + outApart * size, outApart });
  const scattered = (seed) => Float64Array.from({ length: size * size }, (_, n) => Math.sin(seed + n * n));
  job.fillCells(scattered(1), scattered(2));
  const lines = instance.exports[`transformLines${precision}`];
  const columns = instance.exports[`transformColumns${precision}`];
  return () => {
    lines(job.place, 0, size);
    columns(job.place, 0, size);
  };
}

const scipyTransform = (size) => ({
  setup: `
import numpy as np, scipy.fft
rng = np.random.default_rng(1)
grid = np.exp(2j * np.pi * rng.random((${size}, ${size})))
`,
  call: 'scipy.fft.fft2(grid)',
});

const row = (size, precision, ratio, rounds) => ({
  name: `2-D transform, ${size}², f${precision}`,
  against: 'scipy',
  goal: { ratio },
  rounds,
  prepare: (load) => ({ work: planeTransform(load, size, precision), ...scipyTransform(size) }),
});

/** The goals were set against FFTW's planned transform, 1.05 and 0.6 of it at 512² and 1.0 and 0.53 at 2048²; here in terms of scipy. */
export const rows = [row(512, 64, 0.37), row(512, 32, 0.21), row(2048, 64, 0.44, 4), row(2048, 32, 0.24, 4)];
