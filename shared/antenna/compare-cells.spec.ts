import type { DesignDocument } from '../model/design-document';
import { compareCells, type CellChanges, type CellIdentities, type PlacedCells } from './compare-cells';
import { planeWaveDesign } from './example-design';
import { exampleEdition } from './example-edition';
import { predictDesign } from './predict-design';
import { prepareEdition } from './prepare-edition';

const edition = prepareEdition(exampleEdition());
const family: CellIdentities & { kind: 'family' } = {
  kind: 'family',
  familyId: 'family',
  editionId: 'edition 1',
  parameterLabel: 'Size',
  parametersMm: edition.edition.cells.map(({ parametersMm }) => parametersMm),
};
const onEdition: DesignDocument['cells'] = { kind: 'edition', editionId: '00000000-0000-4000-8000-000000000001', rule: 'nearest-phase', excludedCells: [] };
const beamAt = (thetaDeg: number): DesignDocument['requirement'] => ({ ...planeWaveDesign().requirement, beams: [{ thetaDeg, phiDeg: 0 }] });
const size = (widthMm: number, heightMm = 300): DesignDocument['panel'] => ({ ...planeWaveDesign().panel, outline: { kind: 'rectangle', widthMm, heightMm } });

function identities({ cells }: DesignDocument): CellIdentities {
  if (cells.kind === 'edition') return family;
  return cells.kind === 'ideal' && cells.levels !== null ? { kind: 'table', key: `ideal ${cells.levels}` } : { kind: 'continuous' };
}

function placed(changes: Partial<DesignDocument>): PlacedCells {
  const design = planeWaveDesign(changes);
  const { cells } = predictDesign(design, { edition, include: { cells: true } });
  if (cells === undefined) throw new Error('no cells came');
  return { lattice: design.panel.lattice, arrays: cells, identities: identities(design) };
}

function changes(before: PlacedCells, after: PlacedCells): CellChanges {
  const result = compareCells(before, after);
  if (!('arrays' in result)) throw new Error('not compared');
  return result as CellChanges;
}

/** Without the sign of zero. */
const negated = (numbers: ArrayLike<number>): number[] => Array.from(numbers, (value) => 0 - value + 0);

describe('compareCells', () => {
  it('finds nothing changed between a design and itself', () => {
    const one = placed({ cells: onEdition });
    const same = changes(one, one);
    expect(same).toMatchObject({ kind: 'compared', total: 400, changed: 0, parameter: { label: 'Size', larger: 0, smaller: 0, meanChangeMm: 0 } });
    for (const name of ['parameterChangeMm', 'phaseChangeDeg', 'errorChangeDeg', 'changed'] as const) expect(same.arrays[name].every((value) => value === 0)).toBe(true);
  });

  it('turns the sign of every change when the sides are swapped, and nothing else', () => {
    const sides = [{ cells: onEdition }, { cells: onEdition, requirement: beamAt(30) }, { cells: { kind: 'ideal', levels: 2 } }, {}, { panel: size(240, 330) }] as const;
    const panels = sides.map((side) => placed(side));
    for (const left of panels) {
      for (const right of panels) {
        const [there, back] = [changes(left, right), changes(right, left)];
        for (const name of ['parameterChangeMm', 'phaseChangeDeg', 'errorChangeDeg'] as const) {
          expect(Array.from(back.arrays[name], (value) => value + 0)).toEqual(negated(there.arrays[name]));
        }
        expect([back.arrays.changed, back.arrays.xMm, back.total]).toEqual([there.arrays.changed, there.arrays.xMm, there.total]);
        expect([back.rmsErrorBeforeDeg, back.errorOver15Before]).toEqual([there.rmsErrorAfterDeg, there.errorOver15After]);
        expect([back.parameter?.larger, back.parameter?.smaller, back.parameter?.meanChangeMm]).toEqual([there.parameter?.smaller, there.parameter?.larger, there.parameter?.meanChangeMm]);
      }
    }
  });

  it('keeps the sign of half a turn, so that even that is odd', () => {
    const flat = placed({ cells: { kind: 'inline', cells: [{ phaseDeg: 0, magnitude: 1 }] } });
    const turned = placed({ cells: { kind: 'inline', cells: [{ phaseDeg: 180, magnitude: 1 }] } });
    expect(changes(flat, turned).arrays.phaseChangeDeg[0]).toBe(180);
    expect(changes(turned, flat).arrays.phaseChangeDeg[0]).toBe(-180);
  });

  it('takes the shorter way round the turn', () => {
    const at = (phaseDeg: number): PlacedCells => placed({ cells: { kind: 'inline', cells: [{ phaseDeg, magnitude: 1 }] } });
    // 350 to 10 degrees; single precision rounds at 3e-5 degrees.
    expect(changes(at(350), at(10)).arrays.phaseChangeDeg[0]).toBeCloseTo(20, 4);
    expect(changes(at(10), at(350)).arrays.phaseChangeDeg[0]).toBeCloseTo(-20, 4);
  });

  it('counts the change of the first parameter cell by cell', () => {
    const [before, after] = [placed({ cells: onEdition }), placed({ cells: onEdition, requirement: beamAt(25) })];
    const { arrays, changed, parameter } = changes(before, after);
    const sizes = (side: PlacedCells): number[] => Array.from(side.arrays.cellIndex, (index) => family.parametersMm[index][0]);
    const [old, now] = [sizes(before), sizes(after)];
    const expected = now.map((value, i) => value - old[i]);
    expect(Array.from(arrays.parameterChangeMm)).toEqual(expected);
    expect(changed).toBe(expected.filter((change) => change !== 0).length);
    expect(parameter?.larger).toBe(expected.filter((change) => change > 0).length);
    expect(parameter?.meanChangeMm).toBeCloseTo(expected.reduce((sum, change) => sum + Math.abs(change), 0) / changed, 12);
  });

  it('tells cells of two editions of a family apart by their sizes, not by their places in the list', () => {
    const before = placed({ cells: onEdition });
    const reversed = { ...family, editionId: 'edition 2', parametersMm: [...family.parametersMm].reverse() };
    const last = family.parametersMm.length - 1;
    const after = { ...before, identities: reversed, arrays: { ...before.arrays, cellIndex: before.arrays.cellIndex.map((index) => last - index) } };
    expect(changes(before, after)).toMatchObject({ changed: 0, parameter: { larger: 0, smaller: 0 } });
    expect(changes(before, { ...after, identities: { ...reversed, familyId: 'another' } })).toMatchObject({ changed: 400 });
  });

  it('tells cells of one edition apart by their places in its list, also where their sizes are equal', () => {
    const before = placed({ cells: onEdition });
    const alike: CellIdentities = { ...family, parametersMm: family.parametersMm.map(() => [1]) };
    const after = { ...before, identities: alike, arrays: { ...before.arrays, cellIndex: before.arrays.cellIndex.map((index) => (index + 1) % family.parametersMm.length) } };
    expect(changes({ ...before, identities: alike }, after)).toMatchObject({ changed: 400, parameter: { larger: 0, smaller: 0, meanChangeMm: 0 } });
    // Of another edition the sizes are all there is to go by.
    expect(changes({ ...before, identities: alike }, { ...after, identities: { ...alike, editionId: 'edition 2' } })).toMatchObject({ changed: 0 });
  });

  it('measures the error left by four levels: at most 45 degrees, 26 degrees RMS', () => {
    const { rmsErrorAfterDeg, errorOver15After, rmsErrorBeforeDeg, errorOver15Before, parameter } = changes(placed({}), placed({ cells: { kind: 'ideal', levels: 4 } }));
    expect([rmsErrorBeforeDeg, errorOver15Before, parameter]).toEqual([0, 0, undefined]);
    // An even error over +-45 degrees has 45 / sqrt(3) = 26 degrees RMS, and two thirds of it lies beyond 15 degrees.
    expect(rmsErrorAfterDeg).toBeCloseTo(26, -0.5);
    expect(errorOver15After / 400).toBeCloseTo(2 / 3, 1);
  });

  it('counts every cell as changed where ideal cells give way to those of a family', () => {
    expect(changes(placed({}), placed({ cells: onEdition })).changed).toBe(400);
  });

  it('compares the positions that both outlines have', () => {
    const both = changes(placed({ panel: size(300) }), placed({ panel: size(240, 330) }));
    expect(both.total).toBe(16 * 20);
    expect(Math.max(...both.arrays.xMm)).toBe(112.5);
    // The order of the panel: row by row from the lowest y.
    expect(Array.from(both.arrays.yMm)).toEqual(Array.from(both.arrays.yMm).sort((a, b) => a - b));
  });

  it('says why where no position is in both', () => {
    const { panel } = planeWaveDesign();
    const finer = placed({ panel: { ...panel, lattice: { kind: 'rectangular', periodXMm: 10, periodYMm: 15 } } });
    const triangular = placed({ panel: { ...panel, lattice: { kind: 'triangular', periodXMm: 15, rowSpacingMm: 15 } } });
    expect(compareCells(placed({}), finer)).toEqual({ kind: 'lattices-differ', reason: 'one lattice has 15 × 15 mm, the other 10 × 15 mm' });
    expect(compareCells(placed({}), triangular)).toEqual({ kind: 'lattices-differ', reason: 'one lattice is rectangular, the other triangular' });
    expect(compareCells(placed({}), placed({ panel: size(285) }))).toEqual({
      kind: 'no-common-cells',
      reason: 'the two lattices are shifted against each other, so no position is in both',
    });
  });
});
