import { derivedValues } from './derived-values';
import { EXAMPLE_DESIGN, exampleDesign, planeWaveDesign } from './example-design';

describe('derived values', () => {
  const values = derivedValues(EXAMPLE_DESIGN);

  it('follow from the fields of the example', () => {
    expect(values.wavelengthMm).toBeCloseTo(29.9792458, 9);
    expect(values.cellCount).toBe(400);
    expect(values.areaMm2).toBeCloseTo(90_000, 6);
    expect(values.largestDimensionMm).toBeCloseTo(300 * Math.SQRT2, 9);
    expect(values.apertureOverWavelength).toBeCloseTo((300 * Math.SQRT2) / 29.9792458, 9);
    expect(values.hornGainDbi).toBeCloseTo(14.4716, 4);
    expect(values.hornBeamwidthDeg).toEqual({ e: expect.closeTo(37.0888, 4), h: expect.closeTo(37.0888, 4) });
    expect(values.focalRatio).toBeCloseTo(240 / (300 * Math.SQRT2), 4);
    expect(values.maxIncidenceDeg).toBeGreaterThan(49.7);
    expect(values.largestFreeSpacingMm).toBeCloseTo(29.9792458 / (1 + Math.sin(Math.PI / 9)), 9);
    expect(values.spacingMm).toBeCloseTo(15, 9);
  });

  it('take the diagonal for the far field: 39.9723 m for 40 x 40 half-wave cells at 12 GHz, not 19.99', () => {
    const side = 40 * (299.792458 / 12 / 2);
    const design = exampleDesign({
      requirement: { ...EXAMPLE_DESIGN.requirement, designFrequencyGHz: 12 },
      panel: { ...EXAMPLE_DESIGN.panel, outline: { kind: 'rectangle', widthMm: side, heightMm: side } },
    });
    expect(derivedValues(design).farFieldDistanceM).toBeCloseTo(39.9723, 4);
  });

  it('say why there is none', () => {
    const plane = derivedValues(planeWaveDesign());
    expect([plane.focalRatio, plane.hornGainDbi]).toEqual([expect.objectContaining({ kind: 'plane-wave' }), expect.objectContaining({ kind: 'plane-wave' })]);
    const { panel } = EXAMPLE_DESIGN;
    const crossed = exampleDesign({ panel: { ...panel, outline: { kind: 'polygon', pointsMm: [[0, 0], [9, 9], [9, 0], [0, 9]] } } });
    expect(derivedValues(crossed).cellCount).toMatchObject({ kind: 'outline' });
    const huge = exampleDesign({ panel: { ...panel, lattice: { kind: 'rectangular', periodXMm: 0.001, periodYMm: 0.001 } } });
    expect(derivedValues(huge).cellCount).toMatchObject({ kind: 'too-many' });
  });
});
