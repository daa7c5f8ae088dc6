/** A cut at 3601 angles, and the choice of the nearest cell state. */

const wavenumber = (2 * Math.PI) / 0.01;

function panelField(side) {
  const stepM = 0.005;
  const first = (-(side - 1) * stepM) / 2;
  const grid = { columnCount: side, rowCount: side, stepXM: stepM, stepYM: stepM, firstXM: first, firstYM: first, stagger: 'none' };
  return {
    grid,
    re: Float64Array.from({ length: side * side }, (_, n) => Math.cos(n * n)),
    im: Float64Array.from({ length: side * side }, (_, n) => Math.sin(n * n)),
  };
}

const separableCut = {
  setup: `
import numpy as np
rng = np.random.default_rng(1)
cells = np.exp(2j * np.pi * rng.random((100, 100)))
k = 2 * np.pi / 0.01
at = (np.arange(100) - 49.5) * 0.005
theta = np.deg2rad(np.linspace(-90, 90, 3601))
u = np.sin(theta) * np.cos(0.3)
v = np.sin(theta) * np.sin(0.3)
def cut():
    along = np.exp(1j * k * np.outer(u, at)) @ cells.T
    return np.abs((along * np.exp(1j * k * np.outer(v, at))).sum(axis=1)) ** 2
`,
  call: 'cut()',
};

/** From -90 to 90 degrees: the kernel gives every direction together with its opposite. */
function exactCut(load) {
  const { createKernelFourierEngine } = load('server/engine/kernel/kernel-fourier-engine');
  const { grid, re, im } = panelField(100);
  const engine = createKernelFourierEngine();
  const sines = Float64Array.from({ length: 1801 }, (_, i) => Math.sin((i * 0.05 * Math.PI) / 180));
  const power = new Float64Array(3601);
  return () => {
    const stepXRad = sines.map((sine) => wavenumber * grid.stepXM * sine * Math.cos(0.3));
    const stepYRad = sines.map((sine) => wavenumber * grid.stepYM * sine * Math.sin(0.3));
    const sums = engine.latticeSums({ ...grid, re, im, stepXRad, stepYRad });
    for (let i = 0; i <= 1800; i++) {
      power[1800 + i] = sums.re[i] ** 2 + sums.im[i] ** 2;
      power[1800 - i] = sums.oppositeRe[i] ** 2 + sums.oppositeIm[i] ** 2;
    }
    return power;
  };
}

function interpolatedCut(load) {
  const { apertureSpectrum } = load('antenna/aperture-spectrum');
  const { interpolatedFarField } = load('antenna/interpolated-far-field');
  const field = panelField(100);
  const at = interpolatedFarField(apertureSpectrum(field), wavenumber);
  const power = new Float64Array(3601);
  return () => {
    for (let i = 0; i < power.length; i++) {
      const sine = Math.sin(((i * 0.05 - 90) * Math.PI) / 180);
      const { re, im } = at(sine * Math.cos(0.3), sine * Math.sin(0.3));
      power[i] = re * re + im * im;
    }
    return power;
  };
}

const nearestState = {
  setup: `
import numpy as np
rng = np.random.default_rng(1)
states = np.sort(rng.random(512)) * 2 * np.pi
around = np.concatenate(([states[-1] - 2 * np.pi], states, [states[0] + 2 * np.pi]))
targets = rng.random(1000000) * 2 * np.pi
def choose():
    above = np.searchsorted(states, targets)
    up = around[above + 1] - targets
    down = targets - around[above]
    return np.where(up < down, above, above - 1) % 512
`,
  call: 'choose()',
};

function chooseStates(load) {
  const { nearestPhaseTable } = load('antenna/nearest-phase-table');
  const scattered = (n) => (n * 0.6180339887498949) % 1;
  const nearest = nearestPhaseTable(Float64Array.from({ length: 512 }, (_, n) => 2 * Math.PI * scattered(n)));
  const targets = Float64Array.from({ length: 1_000_000 }, (_, n) => 2 * Math.PI * scattered(n * n));
  const chosen = new Int32Array(targets.length);
  return () => {
    for (let n = 0; n < targets.length; n++) chosen[n] = nearest(targets[n]);
    return chosen;
  };
}

export const rows = [
  {
    name: 'exact cut, 10⁴ cells at 3601 angles',
    against: 'numpy, separable',
    goal: { ratio: 0.7 },
    prepare: (load) => ({ work: exactCut(load), ...separableCut }),
  },
  {
    name: 'cut by interpolation, 10⁴ cells at 3601 angles',
    against: 'numpy, separable',
    goal: { ratio: 0.7 },
    prepare: (load) => ({ work: interpolatedCut(load), ...separableCut }),
  },
  {
    name: 'nearest of 512 states, 10⁶ cells',
    against: 'numpy searchsorted',
    goal: { ratio: 0.06 },
    rounds: 4,
    prepare: (load) => ({ work: chooseStates(load), ...nearestState }),
  },
];
