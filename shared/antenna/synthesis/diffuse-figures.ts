import type { DiffuseFigures } from '../../model/law-figures';
import { degFromRad } from '../../units/angles';
import { amplitudeRatioToDb, powerRatioToDb } from '../../units/decibels';
import { anglesOf, outwardDirection } from '../../waves/conventions';
import type { ApertureSpectrum } from '../aperture-spectrum';
import { spectrumPower } from '../aperture-spectrum';
import { shortestReciprocalPerM } from '../grating-lobes';
import type { IlluminatedState } from '../illuminated-state';
import type { SiLattice } from '../si-design';
import type { BoardSearch } from './diffuse-board';
import { highestNear } from './line-search';

/** Peak of the array factor over the hemisphere against an equal metal plate, with the bound that no board can beat. */
export function diffuseFigures(state: IlluminatedState, board: BoardSearch): DiffuseFigures {
  const { placed, pattern, wavelengthM } = state;
  const { lattice, light, si } = placed;
  const plate = light.amplitude.reduce((sum, a) => sum + a, 0) ** 2;
  const { u, v, power } = highestScatter(pattern.spectrum, wavelengthM, (a, b) => pattern.farField.powerAt(a, b));
  const { thetaRad, phiRad } = anglesOf(outwardDirection(u, v));
  return {
    peakDb: powerRatioToDb(power / plate),
    peakThetaDeg: degFromRad(thetaRad),
    peakPhiDeg: degFromRad(phiRad),
    ...diffuseBound(si.panel.lattice, { count: lattice.count, cellAreaM2: lattice.cellAreaM2, wavelengthM }),
    boardPeakDb: powerRatioToDb(board.peakShare),
    samples: board.samples,
    method: board.method,
    equals: board.equals,
  };
}

/** The highest sample inside the horizon, refined along u and v in turn on the exact field. */
export function highestScatter(spectrum: ApertureSpectrum, wavelengthM: number, powerAt: (u: number, v: number) => number): { u: number; v: number; power: number } {
  const { grid, periodU, columns, rows } = spectrum;
  const uStep = wavelengthM / (grid.stepXM * periodU);
  const vStep = wavelengthM / (grid.stepYM * rows);
  let [u, v, top] = [0, 0, -1];
  for (let m = -Math.min(Math.ceil(columns / 2), Math.floor(1 / uStep)); m * uStep <= 1 && m < columns / 2; m++) {
    for (let n = -Math.min(rows / 2, Math.floor(1 / vStep)); n * vStep <= 1 && n < rows / 2; n++) {
      if ((m * uStep) ** 2 + (n * vStep) ** 2 > 1) continue;
      const power = spectrumPower(spectrum, m, n);
      if (power > top) [u, v, top] = [m * uStep, n * vStep, power];
    }
  }
  for (let i = 0; i < 12; i++) {
    const [formerU, formerV] = [u, v];
    u = climbed((at) => powerAt(at, v), u, uStep, Math.sqrt(Math.max(0, 1 - v * v)));
    v = climbed((at) => powerAt(u, at), v, vStep, Math.sqrt(Math.max(0, 1 - u * u)));
    if (Math.hypot(u - formerU, v - formerV) < 1e-8) break;
  }
  return { u, v, power: powerAt(u, v) };
}

/** Maximum within a sample to either side, in steps from the place itself so that the bracket's scale is that of the step. */
function climbed(power: (at: number) => number, at: number, step: number, rim: number): number {
  const shift = highestNear((s) => power(at + s - 2 * step), Math.max(step, 2 * step - rim - at), Math.min(3 * step, 2 * step + rim - at)) - 2 * step;
  return power(at + shift) > power(at) ? at + shift : at;
}

interface Aperture {
  readonly count: number;
  readonly cellAreaM2: number;
  readonly wavelengthM: number;
}

/**
 * No board of N cells of equal strength lies below -10 log N where the hemisphere covers the whole reciprocal cell (Parseval;
 * d at least lambda / sqrt 2); for finer lattices only the energy of the hemisphere bounds it, lambda^2 / (2 pi A).
 */
export function diffuseBound(lattice: SiLattice, { count, cellAreaM2, wavelengthM }: Aperture): Pick<DiffuseFigures, 'boundDb' | 'boundBy'> {
  const covers = 1 / shortestReciprocalPerM(lattice) >= wavelengthM / Math.SQRT2;
  if (covers) return { boundDb: -powerRatioToDb(count), boundBy: 'parseval' };
  return { boundDb: powerRatioToDb((wavelengthM * wavelengthM) / (2 * Math.PI * count * cellAreaM2)), boundBy: 'energy' };
}

/** The lobes of an endless two-state checkerboard of n x n cells: u, v = lambda / (2 n d) in size, 40 log[1 / (n sin(pi / 2n))]. */
export function checkerboardLobe(cellsPerBlock: number, periodM: number, wavelengthM: number): { readonly cosine: number; readonly levelDb: number } {
  return { cosine: wavelengthM / (2 * cellsPerBlock * periodM), levelDb: -2 * amplitudeRatioToDb(cellsPerBlock * Math.sin(Math.PI / (2 * cellsPerBlock))) };
}
