import type { FamilyDescription } from '../../../shared/model/cell-family';
import { cellOutlines, lengthMm } from './cell-outlines';

const description: FamilyDescription = {
  name: 'Ring', kind: 'ring', summary: '', operation: 'reflect', periodXMm: 5, periodYMm: 5,
  substrate: { material: 'any', relativePermittivity: 2.2, lossTangent: 0, thicknessMm: 1 }, metal: '',
  parameters: [{ id: 'outer', label: 'Ring outer side', unit: 'mm' }],
  shapes: [
    { kind: 'ring', outerMm: { parameter: 'outer', factor: 1 }, stripMm: 0.15 },
    { kind: 'rectangle', widthMm: { parameter: 'outer', factor: 0.62 }, heightMm: 1 },
  ],
  designFrequencyGHz: 28, ports: 'either', referencePlane: 'patch', timeConvention: 'exp(+jwt)', provenance: 'simulated', instrument: 'x', date: '2026-12-01', limits: '', excludedRegions: [],
};
const cell = { id: 'L2.30', parametersMm: [2.3], fileHashes: [] };

describe('outlines of a cell', () => {
  it('puts the parameter of the cell into the lengths of the shapes', () => {
    expect(lengthMm(description, cell, { parameter: 'outer', factor: 0.62 })).toBeCloseTo(1.426, 9);
    expect(lengthMm(description, cell, { parameter: 'outer', factor: 1, plusMm: 0.2 })).toBeCloseTo(2.5, 9);
  });

  it('centres the ring in the period and leaves its inside open', () => {
    const { width, shapes } = cellOutlines(description, cell, 100);
    expect(width).toBe(100);
    const corners = [...shapes[0].path.matchAll(/M([\d.]+) ([\d.]+)h([\d.]+)/g)].map((match) => match.slice(1).map(Number));
    expect(corners[0][0]).toBeCloseTo(27, 9);
    expect(corners[0][2]).toBeCloseTo(46, 9);
    expect(corners[1][2]).toBeCloseTo(40, 9);
  });
});
