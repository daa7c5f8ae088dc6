import { prepareEdition } from '../../../shared/antenna/prepare-edition';
import type { CellEdition } from '../../../shared/model/cell-family';
import { curvePair } from './edition-curves';

/** Two cells, three frequencies, normal incidence; the second cell lags the first by 90 degrees. */
function smallEdition(): CellEdition {
  const values: number[] = [];
  for (const lag of [0, 90]) {
    for (const step of [0, 10, 20]) {
      const rad = (-(lag + step) * Math.PI) / 180;
      values.push(0.9 * Math.cos(rad), 0.9 * Math.sin(rad), 0, 0, 0, 0, 0.9 * Math.cos(rad), 0.9 * Math.sin(rad));
    }
  }
  return {
    description: {
      name: 'Small', kind: 'patch', summary: '', operation: 'reflect', periodXMm: 5, periodYMm: 5,
      substrate: { material: 'any', relativePermittivity: 2.2, lossTangent: 0, thicknessMm: 1 }, metal: '',
      parameters: [{ id: 'side', label: 'Patch side', unit: 'mm' }], shapes: [], designFrequencyGHz: 28, ports: 'either',
      referencePlane: 'patch', timeConvention: 'exp(+jwt)', provenance: 'invented', instrument: 'none', date: '2026-12-01', limits: '', excludedRegions: [],
    },
    cells: [{ id: 'two', parametersMm: [2], fileHashes: [] }, { id: 'one', parametersMm: [1], fileHashes: [] }],
    responses: {
      cellCount: 2, frequenciesHz: Float64Array.of(27e9, 28e9, 29e9), thetasRad: Float64Array.of(0), phisRad: Float64Array.of(0),
      values: Float64Array.from(values), present: new Uint8Array(6).fill(1),
    },
  };
}

describe('curves of an edition', () => {
  const prepared = prepareEdition(smallEdition());
  const wish = { cellIndex: 0, frequencyGHz: 28, incidenceDeg: 0, azimuthDeg: 0, polarisation: 'first' } as const;

  it('run over the cells in the order of their parameter and mark the chosen one', () => {
    const { phase, cellIndex } = curvePair(prepared, { ...wish, axis: 'parameter' });
    expect(Array.from(cellIndex ?? [])).toEqual([1, 0]);
    expect(Array.from(phase.lines[0].x)).toEqual([1, 2]);
    expect(phase.chosen).toEqual({ at: 1, label: expect.stringMatching(/^2\.00 mm, \u2212?\d+\.\d°$/) });
    expect(phase.x.title).toBe('Patch side, mm');
  });

  it('run over frequency with the samples of the edition and keep the loss', () => {
    const { phase, magnitude } = curvePair(prepared, { ...wish, axis: 'frequency' });
    expect(Array.from(phase.lines[0].y, (deg) => Math.round(deg * 1e6) / 1e6)).toEqual([0, -10, -20]);
    expect(magnitude.lines[0].y[0]).toBeCloseTo(20 * Math.log10(0.9), 9);
    expect(magnitude.y.from).toBeLessThan(20 * Math.log10(0.9));
    expect(magnitude.y.to).toBeGreaterThan(0);
  });
});
