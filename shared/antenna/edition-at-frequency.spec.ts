import fc from 'fast-check';
import type { CellEdition } from '../model/cell-family';
import { editionAtFrequency, type EditionAtFrequency } from './edition-at-frequency';
import { exampleEdition, exampleResponse } from './example-edition';

const GRID = { cellCount: 3, frequenciesGHz: [9, 9.5, 10, 11], thetasDeg: [0, 30], phisDeg: [0, 45] };
const POINTS = GRID.frequenciesGHz.length;
const tables = (edition: CellEdition, frequencyGHz: number): EditionAtFrequency =>
  editionAtFrequency({ responses: edition.responses, entries: [0, 3], azimuthIndices: Int32Array.of(0, 1) }, frequencyGHz * 1e9);
/** Entry 0 of cell 1 at 30 degrees, azimuth 45. */
const PLACE = (1 * 2 + 0) * 4 + 3;
const expected = (frequencyGHz: number) => exampleResponse(1 / 3, frequencyGHz, { thetaDeg: 30, phiDeg: 45, entry: 0 });
const turns = (rad: number): number => Math.abs(Math.sin(rad / 2));

/** The edition without one frequency of one cell at every angle. */
function without(frequency: number, cell = 1): CellEdition {
  const edition = exampleEdition(GRID);
  const present = edition.responses.present.map((flag, point) => (point % POINTS === frequency && Math.floor(point / (4 * POINTS)) === cell ? 0 : flag));
  return { ...edition, responses: { ...edition.responses, present } };
}

describe('editionAtFrequency', () => {
  it('holds the given responses at a given frequency', () => {
    for (const frequencyGHz of GRID.frequenciesGHz) {
      const at = tables(exampleEdition(GRID), frequencyGHz);
      expect(Math.exp(at.logMagnitude[PLACE])).toBeCloseTo(expected(frequencyGHz).magnitude, 12);
      expect(turns(at.phaseRad[PLACE] - expected(frequencyGHz).phaseRad)).toBeLessThan(1e-12);
      expect([at.outside, Array.from(at.usable)]).toEqual([0, [1, 1, 1]]);
    }
  });

  it('is exact between the points where the phase is a line in frequency, also across the wrap', () => {
    fc.assert(
      fc.property(fc.double({ min: 9, max: 11, noNaN: true }), (frequencyGHz) => {
        const at = tables(exampleEdition(GRID), frequencyGHz);
        expect(turns(at.phaseRad[PLACE] - expected(frequencyGHz).phaseRad)).toBeLessThan(1e-9);
      }),
    );
  });

  it('steps over a missing point to the next ones given, and keeps the cell', () => {
    const at = tables(without(1), 9.5);
    expect(turns(at.phaseRad[PLACE] - expected(9.5).phaseRad)).toBeLessThan(1e-9);
    expect(Array.from(at.usable)).toEqual([1, 1, 1]);
  });

  it('takes a cell out that has no point on one side, and lends it the nearest', () => {
    const at = tables(without(3), 10.5);
    expect(Array.from(at.usable)).toEqual([1, 0, 1]);
    expect(turns(at.phaseRad[PLACE] - expected(10).phaseRad)).toBeLessThan(1e-12);
  });

  it('lets the edge of the band stand in beyond it, and says on which side', () => {
    const [below, above] = [tables(exampleEdition(GRID), 8), tables(exampleEdition(GRID), 12)];
    expect([below.outside, above.outside]).toEqual([-1, 1]);
    expect(turns(below.phaseRad[PLACE] - expected(9).phaseRad)).toBeLessThan(1e-12);
    expect(turns(above.phaseRad[PLACE] - expected(11).phaseRad)).toBeLessThan(1e-12);
  });

  it('has phases without jumps over the angles, entries on one branch', () => {
    const { phaseRad, nodeCount, entryCount } = tables(exampleEdition(GRID), 9.2);
    for (let cell = 0; cell < GRID.cellCount; cell++) {
      const own = phaseRad.subarray(cell * entryCount * nodeCount, (cell + 1) * entryCount * nodeCount);
      expect(Math.abs(own[nodeCount] - own[0])).toBeLessThanOrEqual(Math.PI);
      for (let entry = 0; entry < entryCount; entry++) for (let node = 1; node < nodeCount; node++) expect(Math.abs(own[entry * nodeCount + node] - own[entry * nodeCount + node - (node % 2 === 0 ? 2 : 1)])).toBeLessThanOrEqual(Math.PI);
    }
  });

  it('takes a cell that returns nothing for -240 dB instead of minus infinity', () => {
    const edition = exampleEdition(GRID);
    edition.responses.values.fill(0);
    const at = tables(edition, 10);
    expect(at.logMagnitude.every((value) => Math.abs(value - Math.log(1e-12)) < 1e-9)).toBe(true);
  });
});
