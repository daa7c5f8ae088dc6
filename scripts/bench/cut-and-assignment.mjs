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

/** Sorted phases of 192 slices of incidence; in each the four states about every target are held against it exactly. */
const obliqueStates = {
  setup: `
import numpy as np
rng = np.random.default_rng(1)
nodes = rng.random((512, 1)) * 2 * np.pi + 0.3 * np.sin(np.linspace(0, 3, 13)) * rng.random((512, 1))
targets = rng.random(1000000) * 2 * np.pi
angles = rng.random(1000000) * 12
slices = np.minimum((angles * 16).astype(int), 191)
order = np.argsort(slices, kind='stable')
ends = np.searchsorted(slices[order], np.arange(193))
def choose():
    chosen = np.empty(1000000, int)
    for s in range(192):
        own = order[ends[s]:ends[s + 1]]
        at = (s + 0.5) / 16
        left = int(at)
        phases = (nodes[:, left] + (at - left) * (nodes[:, left + 1] - nodes[:, left])) % (2 * np.pi)
        sort = np.argsort(phases)
        near = (np.searchsorted(phases[sort], targets[own])[:, None] + np.array([-2, -1, 0, 1])) % 512
        states = sort[near]
        share = (angles[own] - left)[:, None]
        exact = nodes[states, left] + share * (nodes[states, left + 1] - nodes[states, left])
        error = np.abs((exact - targets[own][:, None] + np.pi) % (2 * np.pi) - np.pi)
        chosen[own] = states[np.arange(len(own)), error.argmin(axis=1)]
    return chosen
`,
  call: 'choose()',
};

/** As the engine assigns: polynomials through the angles, and the response of the cell chosen as well. */
function assignOblique(load) {
  const { cellStock } = load('antenna/cell-stock');
  const { exampleEdition } = load('antenna/example-edition');
  const { prepareEdition } = load('antenna/prepare-edition');
  const grid = { cellCount: 512, frequenciesGHz: [10], thetasDeg: Array.from({ length: 13 }, (_, i) => 5 * i), phisDeg: [0] };
  const edition = prepareEdition(exampleEdition(grid, { ports: 'either' }));
  const scattered = (n) => (n * 0.6180339887498949) % 1;
  const count = 1_000_000;
  const light = {
    incidenceRad: Float64Array.from({ length: count }, (_, n) => (scattered(n) * Math.PI) / 3),
    azimuthRad: Float64Array.from({ length: count }, (_, n) => 6 * scattered(n * n) - 3),
  };
  const site = { light, designFrequencyHz: 10e9, si: { operation: 'reflect', illumination: { polarisation: 'x' } }, edition };
  const cells = { kind: 'edition', editionId: '00000000-0000-4000-8000-000000000001', excludedCells: [], rule: 'nearest-phase' };
  const targets = Float64Array.from({ length: count }, (_, n) => 2 * Math.PI * scattered(n * n + 1));
  return () => cellStock(cells, site).assign(targets);
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
  {
    name: 'nearest of 512 states at 13 angles, 10⁶ cells',
    against: 'numpy searchsorted',
    goal: { ratio: 0.09 },
    rounds: 3,
    prepare: (load) => ({ work: assignOblique(load), ...obliqueStates }),
  },
];
