import type { CellEdition, FamilyDescription } from '../model/cell-family';
import { radFromDeg } from '../units/angles';

export interface ExampleGrid {
  readonly cellCount: number;
  readonly frequenciesGHz: readonly number[];
  readonly thetasDeg: readonly number[];
  readonly phisDeg: readonly number[];
}

export const EXAMPLE_GRID: ExampleGrid = {
  cellCount: 24,
  frequenciesGHz: [9, 9.5, 10, 10.5, 11],
  thetasDeg: [0, 15, 30, 45, 60],
  phisDeg: [0, 22.5, 45],
};

/**
 * An invented edition with a smooth made-up response: phase falls with the cell, with frequency and, differently for TE
 * and TM, with sin^2 of incidence; a slight loss about the resonance. It stands for no real cell.
 */
export function exampleEdition(grid: ExampleGrid = EXAMPLE_GRID, description: Partial<FamilyDescription> = {}): CellEdition {
  const { cellCount, frequenciesGHz, thetasDeg, phisDeg } = grid;
  const points = gridPoints(grid);
  const values = new Float64Array(points.length * 8);
  points.forEach(({ cell, frequencyGHz, thetaDeg, phiDeg }, i) => {
    for (const entry of [0, 3]) {
      const { magnitude, phaseRad } = exampleResponse(cell / cellCount, frequencyGHz, { thetaDeg, phiDeg, entry });
      values[8 * i + 2 * entry] = magnitude * Math.cos(phaseRad);
      values[8 * i + 2 * entry + 1] = magnitude * Math.sin(phaseRad);
    }
  });
  return {
    description: { ...EXAMPLE_DESCRIPTION, ...description },
    cells: Array.from({ length: cellCount }, (_, k) => ({ id: `cell-${k}`, parametersMm: [1 + k / 10], fileHashes: [] })),
    responses: {
      cellCount,
      frequenciesHz: Float64Array.from(frequenciesGHz, (ghz) => ghz * 1e9),
      thetasRad: Float64Array.from(thetasDeg, radFromDeg),
      phisRad: Float64Array.from(phisDeg, radFromDeg),
      values,
      present: new Uint8Array(points.length).fill(1),
    },
  };
}

/** Every point of the grid in the order of a response table. */
function gridPoints({ cellCount, frequenciesGHz, thetasDeg, phisDeg }: ExampleGrid): { cell: number; frequencyGHz: number; thetaDeg: number; phiDeg: number }[] {
  const cells = Array.from({ length: cellCount }, (_, cell) => cell);
  return cells.flatMap((cell) =>
    thetasDeg.flatMap((thetaDeg) => phisDeg.flatMap((phiDeg) => frequenciesGHz.map((frequencyGHz) => ({ cell, frequencyGHz, thetaDeg, phiDeg })))),
  );
}

/** The made-up response behind {@link exampleEdition}. `size` runs from 0 to 1; entry 0 is TE, 3 is TM. */
export function exampleResponse(
  size: number,
  frequencyGHz: number,
  angles: { thetaDeg: number; phiDeg: number; entry: number },
): { magnitude: number; phaseRad: number } {
  const sineSquared = Math.sin(radFromDeg(angles.thetaDeg)) ** 2;
  const aroundAxis = 1 + 0.2 * Math.cos(4 * radFromDeg(angles.phiDeg));
  const tilt = (angles.entry === 0 ? -0.9 : 0.5) * sineSquared * aroundAxis * Math.sin(Math.PI * size);
  const phaseRad = 2.7 - 5.9 * size - 0.4 * (frequencyGHz - 10) + tilt;
  return { magnitude: 0.98 - 0.06 * Math.sin(Math.PI * size) * (1 + sineSquared / 2), phaseRad };
}

const EXAMPLE_DESCRIPTION: FamilyDescription = {
  name: 'Invented example cells',
  kind: 'made-up response',
  summary: 'Invented for checks of the engine; no such cell exists.',
  operation: 'reflect',
  periodXMm: 15,
  periodYMm: 15,
  substrate: { material: 'invented', relativePermittivity: 2.2, lossTangent: 0, thicknessMm: 1 },
  metal: '',
  parameters: [{ id: 'a', label: 'size', unit: 'mm' }],
  shapes: [],
  designFrequencyGHz: 10,
  ports: 'te-and-tm',
  referencePlane: 'top of the substrate',
  timeConvention: 'exp(+jwt)',
  provenance: 'invented',
  instrument: 'a formula',
  date: '2026-01-01',
  limits: 'Invented.',
  excludedRegions: [],
};

export const EXAMPLE_EDITION_ID = '00000000-0000-4000-8000-000000000001';
