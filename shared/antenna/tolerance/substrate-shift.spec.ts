import type { CellEdition } from '../../model/cell-family';
import { degFromRad, radFromDeg, wrapRad } from '../../units/angles';
import { exampleEdition } from '../example-edition';
import { gridReflection, type PatchGrid } from '../grid-model';
import { prepareEdition } from '../prepare-edition';
import { shiftedEdition } from './substrate-shift';

/** The cell of published check his-01. */
const GRID: PatchGrid = { periodM: 5e-3, gapM: 0.5e-3, thicknessM: 1.6e-3, relativePermittivity: 4.4, lossTangent: 0.02 };
const THETAS_DEG = [0, 30];
const FREQUENCIES_GHZ = Array.from({ length: 81 }, (_, i) => 9.5 + i / 80);

/** Cells that are a thin sheet on a slab by construction: the averaged grid, of two gaps. */
function gridEdition(grid: PatchGrid): CellEdition {
  const shape = { cellCount: 2, frequenciesGHz: FREQUENCIES_GHZ, thetasDeg: THETAS_DEG, phisDeg: [0] };
  const edition = exampleEdition(shape, {
    substrate: { material: 'invented', relativePermittivity: grid.relativePermittivity, lossTangent: grid.lossTangent, thicknessMm: grid.thicknessM * 1e3 },
  });
  const { values } = edition.responses;
  const points = [1, 1.4].flatMap((widening) => THETAS_DEG.flatMap((thetaDeg) => FREQUENCIES_GHZ.map((ghz) => ({ widening, thetaDeg, ghz }))));
  points.forEach(({ widening, thetaDeg, ghz }, at) => {
    for (const [entry, polarisation] of [[0, 'te'], [3, 'tm']] as const) {
      const { re, im } = gridReflection({ ...grid, gapM: grid.gapM * widening }, { frequencyHz: ghz * 1e9, thetaRad: radFromDeg(thetaDeg), polarisation });
      values[8 * at + 2 * entry] = re;
      values[8 * at + 2 * entry + 1] = im;
    }
  });
  return edition;
}

const drawn = prepareEdition(gridEdition(GRID));
const FREQUENCY_HZ = 10e9;

describe('shiftedEdition', () => {
  it('leaves the edition as it is without a shift', () => {
    const shifted = shiftedEdition(drawn, FREQUENCY_HZ, {});
    const at = drawn.atFrequency(FREQUENCY_HZ);
    expect(Math.max(...at.phaseRad.map((rad, i) => Math.abs(rad - shifted.phaseRad[i])))).toBeLessThan(1e-12);
    expect(Math.max(...at.logMagnitude.map((log, i) => Math.abs(log - shifted.logMagnitude[i])))).toBeLessThan(1e-12);
  });

  it('is exact in thickness where the cell is a sheet on a slab, at every angle', () => {
    const shifted = shiftedEdition(drawn, FREQUENCY_HZ, { thicknessM: 50e-6 });
    const made = prepareEdition(gridEdition({ ...GRID, thicknessM: GRID.thicknessM + 50e-6 })).atFrequency(FREQUENCY_HZ);
    shifted.phaseRad.forEach((rad, i) => expect(wrapRad(rad - made.phaseRad[i])).toBeCloseTo(0, 9));
    shifted.logMagnitude.forEach((log, i) => expect(log).toBeCloseTo(made.logMagnitude[i], 9));
  });

  it('is exact in permittivity at normal incidence, up to the interpolation between frequencies', () => {
    const shifted = shiftedEdition(drawn, FREQUENCY_HZ, { permittivity: 0.1 });
    const made = prepareEdition(gridEdition({ ...GRID, relativePermittivity: 4.5 })).atFrequency(FREQUENCY_HZ);
    // TE of both gaps at normal incidence: cell 0 and cell 1, each with two entries of two nodes.
    for (const i of [0, 4]) expect(degFromRad(wrapRad(shifted.phaseRad[i] - made.phaseRad[i]))).toBeCloseTo(0, 2);
  });

  // Computed independently for this cell at 10 GHz: permittivity +0.1 -> -4.7 degrees, 50 micrometres of thickness -> -6.7 degrees.
  it('turns the phase of a dense patch grid by the published amounts', () => {
    const before = drawn.atFrequency(FREQUENCY_HZ).phaseRad[0];
    expect(degFromRad(shiftedEdition(drawn, FREQUENCY_HZ, { permittivity: 0.1 }).phaseRad[0] - before)).toBeCloseTo(-4.7, 1);
    expect(degFromRad(shiftedEdition(drawn, FREQUENCY_HZ, { thicknessM: 50e-6 }).phaseRad[0] - before)).toBeCloseTo(-6.7, 1);
  });
});
