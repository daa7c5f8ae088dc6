/** The pattern step: fill the grid, transform it, power in dB, peak and integral. */

const wavelengthM = 0.01;

/** A square panel of cells half a wavelength apart with pseudo-random phases. */
function squareField(side) {
  const stepM = wavelengthM / 2;
  const first = (-(side - 1) * stepM) / 2;
  const grid = { columnCount: side, rowCount: side, stepXM: stepM, stepYM: stepM, firstXM: first, firstYM: first, stagger: 'none' };
  const phase = (n) => 2 * Math.PI * ((n * 0.6180339887498949) % 1);
  return {
    grid,
    re: Float64Array.from({ length: side * side }, (_, n) => Math.cos(phase(n))),
    im: Float64Array.from({ length: side * side }, (_, n) => Math.sin(phase(n))),
  };
}

function patternStep(load, side) {
  const { apertureSpectrum } = load('antenna/aperture-spectrum');
  const field = squareField(side);
  return () => {
    const { re, im } = apertureSpectrum(field);
    const powerDb = new Float32Array(re.length);
    let peak = 0;
    let integral = 0;
    for (let i = 0; i < re.length; i++) {
      const power = re[i] * re[i] + im[i] * im[i];
      if (power > peak) peak = power;
      integral += power;
      powerDb[i] = 10 * Math.log10(power + 1e-30);
    }
    return { powerDb, peak, integral };
  };
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

const row = (side, size, ratio, rounds) => ({
  name: `pattern step, ${side}² cells in ${size}²`,
  against: 'scipy',
  goal: { ratio },
  rounds,
  prepare: (load) => ({ work: patternStep(load, side), ...scipyStep(side, size) }),
});

/** Only the sizes that performance asks for have a goal; the others show how the step grows, which must stay N log N. */
export const rows = [row(10, 32, null), row(30, 128, null), row(100, 512, 0.3), row(300, 1024, null, 6), row(1000, 2048, 0.34, 3)];
