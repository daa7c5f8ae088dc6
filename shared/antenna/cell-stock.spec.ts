import type { Cells } from '../model/design-document';
import { degFromRad, radFromDeg } from '../units/angles';
import { cellStock, type CellStock } from './cell-stock';
import { EXAMPLE_DESIGN } from './example-design';
import { illuminateCells } from './illumination';
import { panelLattice } from './panel-lattice';
import { siDesign } from './si-design';

const si = siDesign(EXAMPLE_DESIGN);
const light = illuminateCells(si.illumination, panelLattice(si.panel), 0.5);
const stock = (cells: Cells): CellStock => cellStock(cells, { light, designFrequencyHz: 10e9, si });
const radians = (degrees: number[]): Float64Array => Float64Array.from(degrees, radFromDeg);

describe('ideal cells', () => {
  it('take the target phase itself when continuous, without an index', () => {
    const { cellIndex, phaseRad, magnitude } = stock({ kind: 'ideal', levels: null }).assign(radians([10, 500]));
    expect(Array.from(phaseRad, degFromRad)).toEqual([expect.closeTo(10, 9), expect.closeTo(500, 9)]);
    expect(Array.from(cellIndex)).toEqual([-1, -1]);
    expect(Array.from(magnitude)).toEqual([1, 1]);
  });

  it('take the nearest of four levels, ties upward, round the turn', () => {
    const { cellIndex, phaseRad } = stock({ kind: 'ideal', levels: 4 }).assign(radians([44, 45, 46, 134.9, 316, 359, -45, -46, 765]));
    expect(Array.from(cellIndex)).toEqual([0, 1, 1, 1, 0, 0, 0, 3, 1]);
    expect(Array.from(phaseRad.slice(0, 3), degFromRad)).toEqual([0, 90, 90].map((deg) => expect.closeTo(deg, 9)));
  });

  it('take a tie upward even when rounding has left it a hair below', () => {
    const { cellIndex } = stock({ kind: 'ideal', levels: 2 }).assign(Float64Array.of(Math.PI / 2 - 1e-13));
    expect(cellIndex[0]).toBe(1);
  });

  it('keep their phases at every frequency', () => {
    const ideal = stock({ kind: 'ideal', levels: 8 });
    const assignment = ideal.assign(radians([33, 77]));
    expect(ideal.respond(assignment, 12e9).phaseRad).toEqual(assignment.phaseRad);
  });
});

describe('inline cells', () => {
  const cells: Cells = { kind: 'inline', cells: [{ phaseDeg: 170, magnitude: 0.9 }, { phaseDeg: -10, magnitude: 0.8 }, { phaseDeg: 530, magnitude: 0.7 }] };

  it('are chosen by nearest phase with their own magnitude; equal phases go to the first', () => {
    const { cellIndex, phaseRad, magnitude } = stock(cells).assign(radians([350, 175, 79]));
    expect(Array.from(cellIndex)).toEqual([1, 0, 1]);
    expect(Array.from(magnitude)).toEqual([0.8, 0.9, 0.8]);
    expect(degFromRad(phaseRad[1])).toBeCloseTo(170, 9);
  });
});
