import { prepareEdition } from '../../../../shared/antenna/prepare-edition';
import type { CellEdition } from '../../../../shared/model/cell-family';
import { cellUse } from './phase-coverage';
import { editionCurve } from './edition-curve';

/** Four cells without loss, phases 0, -100, -200, -300 degrees at normal incidence and 10 less at 40 degrees. */
const edition: CellEdition = {
  description: {
    name: 'Invented patch',
    kind: 'patch',
    summary: '',
    operation: 'reflect',
    periodXMm: 5,
    periodYMm: 5,
    substrate: { material: 'invented', relativePermittivity: 2.2, lossTangent: 0, thicknessMm: 0.5 },
    metal: 'copper',
    parameters: [{ id: 'L', label: 'Side', unit: 'mm' }],
    shapes: [],
    designFrequencyGHz: 28,
    ports: 'either',
    referencePlane: 'patch',
    timeConvention: 'exp(+jwt)',
    provenance: 'invented',
    instrument: 'none',
    date: '2026-12-01',
    limits: '',
    excludedRegions: [],
  },
  // Given out of order: the curve sorts by the parameter.
  cells: [3, 2, 4, 5].map((side) => ({ id: `L${side}`, parametersMm: [side], fileHashes: [] })),
  responses: {
    cellCount: 4,
    frequenciesHz: Float64Array.of(28e9),
    thetasRad: Float64Array.of(0, (40 * Math.PI) / 180),
    phisRad: Float64Array.of(0),
    values: Float64Array.from(
      [-100, 0, -200, -300].flatMap((phase) =>
        [phase, phase - 10].flatMap((deg) => {
          const [re, im] = [Math.cos((deg * Math.PI) / 180), Math.sin((deg * Math.PI) / 180)];
          return [re, im, 0, 0, 0, 0, re, im];
        }),
      ),
    ),
    present: new Uint8Array(8).fill(1),
  },
};

describe('editionCurve', () => {
  const curve = editionCurve(prepareEdition(edition), { frequencyGHz: 28, steepestDeg: 40, polarisation: 'x', use: cellUse(Int32Array.of(1, 1, 0), 4) });

  it('draws the phase against the parameter in its rising order, at the flat and the steep angle', () => {
    const [flat, steep] = curve.figure.lines;
    expect(Array.from(flat.x)).toEqual([2, 3, 4, 5]);
    expect(Array.from(flat.y, Math.round)).toEqual([0, -100, -200, -300]);
    expect(Array.from(steep.y, Math.round)).toEqual([-10, -110, -210, -310]);
    expect([flat.label, steep.label]).toEqual(['at 0°', 'at 40°']);
  });

  it('stands the use of each cell below its own sample', () => {
    expect(Array.from(curve.figure.bars?.counts ?? [])).toEqual([2, 1, 0, 0]);
    expect(curve.phaseDegOf.get(0)).toBeCloseTo(-100, 6);
  });

  it('measures how the cells cover the circle', () => {
    expect(curve.coverage?.rangeDeg).toBeCloseTo(300, 6);
    expect(curve.coverage?.largestGapDeg).toBeCloseTo(100, 6);
  });

  it('has one line where the panel is lit no steeper than the data begin', () => {
    expect(editionCurve(prepareEdition(edition), { frequencyGHz: 28, steepestDeg: 0, polarisation: 'x', use: new Int32Array(4) }).figure.lines).toHaveLength(1);
  });
});
