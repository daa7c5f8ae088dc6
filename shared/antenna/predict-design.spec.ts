import * as fc from 'fast-check';
import { MAX_CELL_COUNT, type DesignDocument } from '../model/design-document';
import { figures as figuresSchema, type Figures } from '../model/figures';
import { EXAMPLE_DESIGN, exampleDesign, planeWaveDesign } from './example-design';
import { placeCells } from './place-cells';
import { predictDesign, predictPlaced, type Prediction } from './predict-design';

const { requirement, panel } = EXAMPLE_DESIGN;
const everything = { cells: true, cuts: [{ phiDeg: 0, thetaDeg: [-90, 90, 5] as const }], uv: { size: 17 } };
const figuresOf = (design: DesignDocument, frequencyGHz?: number): Figures => predictDesign(design, { frequencyGHz, include: {} }).figures;

/** First number anywhere in a prediction that is not finite. */
function notFinite(value: unknown, path = 'prediction'): string | undefined {
  if (typeof value === 'number') return Number.isFinite(value) ? undefined : `${path} = ${value}`;
  if (ArrayBuffer.isView(value)) return Array.from(value as Float64Array).every(Number.isFinite) ? undefined : path;
  if (typeof value !== 'object' || value === null) return undefined;
  return Object.entries(value).map(([key, part]) => notFinite(part, `${path}.${key}`)).find((found) => found !== undefined);
}

describe('predicting a design', () => {
  it('gives the offset-fed 20 x 20 panel 29.809 dBi at 19.9502 degrees', () => {
    const { directivityDbi, directivityAtBeamDbi, peakThetaDeg, halfPowerBeamwidthDeg, sidelobeDb, cellCount } = figuresOf(EXAMPLE_DESIGN);
    expect(cellCount).toBe(400);
    expect([directivityDbi, directivityAtBeamDbi]).toEqual([expect.closeTo(29.809, 3), expect.closeTo(29.8083, 3)]);
    expect(peakThetaDeg).toBeCloseTo(19.9502, 4);
    expect(halfPowerBeamwidthDeg).toEqual({ along: expect.closeTo(6.42997, 4), across: expect.closeTo(6.11965, 4) });
    expect(sidelobeDb).toMatchObject({ along: expect.closeTo(-22.0771, 3), across: expect.closeTo(-25.0653, 3) });
  });

  it('has gain = directivity + spillover + cell loss and an efficiency from it', () => {
    const table = exampleDesign({ cells: { kind: 'inline', cells: [0, 90, 180, 270].map((phaseDeg) => ({ phaseDeg, magnitude: 0.8 })) } });
    const f = figuresOf(table);
    expect(f.cellLossDb).toBeCloseTo(20 * Math.log10(0.8), 10);
    expect(Number(f.gainDbi)).toBeCloseTo(Number(f.directivityDbi) + Number(f.spilloverDb) + Number(f.cellLossDb), 12);
    expect(Number(f.apertureEfficiency)).toBeCloseTo((10 ** (Number(f.gainDbi) / 10) * f.wavelengthMm ** 2) / (4 * Math.PI * 300 * 300), 9);
  });

  it('squints by sin theta = u_i + (f0/f)(u_0 - u_i): 30 degrees to 31.757 at 0.95 f0, none at the specular angle', () => {
    const broadsideElement = { receiveExponent: 0.5, radiateExponent: 0 };
    const beam = { ...requirement, beams: [{ thetaDeg: 30, phiDeg: 0 }] };
    const low = figuresOf(planeWaveDesign({ requirement: beam, prediction: broadsideElement }), 9.5);
    expect(low.peakThetaDeg).toBeCloseTo(31.757, 1);
    const specular = planeWaveDesign({ requirement: beam, prediction: broadsideElement, illumination: { kind: 'plane-wave', thetaDeg: 30, phiDeg: 180, polarisation: 'x' } });
    expect(figuresOf(specular, 9.5).peakThetaDeg).toBeCloseTo(Number(figuresOf(specular).peakThetaDeg), 1);
  });

  it('loses 3.92 dB into each of two equal beams, not 3.01', () => {
    const beams = [{ thetaDeg: 15, phiDeg: 0 }, { thetaDeg: 15, phiDeg: 180 }];
    const two = figuresOf(planeWaveDesign({ requirement: { ...requirement, beams }, panel: { ...panel, outline: { kind: 'rectangle', widthMm: 900, heightMm: 300 } } }));
    const one = figuresOf(planeWaveDesign({ requirement: { ...requirement, beams: beams.slice(0, 1) }, panel: { ...panel, outline: { kind: 'rectangle', widthMm: 900, heightMm: 300 } } }));
    expect(two.beams).toHaveLength(2);
    // Sixty samples of the phase along x, not a continuum: within 0.15 dB of the limit.
    expect(Math.abs(Number(two.beams[0].directivityDbi) - Number(one.directivityAtBeamDbi) + 3.92)).toBeLessThan(0.15);
    expect(Number(two.beams[1].directivityDbi)).toBeCloseTo(Number(two.beams[0].directivityDbi), 6);
  });

  it('keeps an ideal cell frozen and changes only the geometry with frequency', () => {
    const at = (frequencyGHz?: number): Prediction => predictDesign(EXAMPLE_DESIGN, { frequencyGHz, include: { cells: true } });
    expect(at(10.5).cells?.phaseDeg).toEqual(at().cells?.phaseDeg);
    expect(at(10.5).figures.wavelengthMm).toBeCloseTo(29.9792458 / 1.05, 9);
    expect(Number(at(10.5).figures.phaseErrorRmsDeg)).toBeGreaterThan(1);
  });

  it('predicts the same from cells placed once', () => {
    const placed = placeCells(EXAMPLE_DESIGN);
    for (const frequencyGHz of [9.6, 10, 10.4]) expect(predictPlaced(placed, { frequencyGHz, include: {} }).figures).toEqual(figuresOf(EXAMPLE_DESIGN, frequencyGHz));
  });

  it('holds one entry per cell, in the order of the lattice, errors wrapped', () => {
    const { cells, figures } = predictDesign(exampleDesign({ cells: { kind: 'ideal', levels: 4 } }), { include: everything });
    if (!cells) throw new Error('cells were asked for');
    for (const array of Object.values(cells)) expect(array).toHaveLength(figures.cellCount);
    cells.errorDeg.forEach((error, n) => {
      expect(Math.abs(error)).toBeLessThanOrEqual(45.001);
      const difference = cells.phaseDeg[n] - cells.targetPhaseDeg[n] - error;
      expect(Math.abs(difference - 360 * Math.round(difference / 360))).toBeLessThan(1e-3);
      expect(cells.cellIndex[n] * 90).toBe(cells.phaseDeg[n]);
    });
  });

  it('holds at every frequency the errors that the phase error is the RMS of, and targets they are against', () => {
    const placed = placeCells(exampleDesign({ cells: { kind: 'ideal', levels: 4 } }));
    for (const frequencyGHz of [9.5, 10, 10.5]) {
      const { cells, figures } = predictPlaced(placed, { frequencyGHz, include: { cells: true } });
      if (!cells) throw new Error('cells were asked for');
      const rmsDeg = Math.sqrt(cells.errorDeg.reduce((sum, error) => sum + error * error, 0) / cells.errorDeg.length);
      // The cells come in single precision.
      expect(rmsDeg).toBeCloseTo(Number(figures.phaseErrorRmsDeg), 4);
      cells.errorDeg.forEach((error, n) => {
        const difference = cells.phaseDeg[n] - cells.targetPhaseDeg[n] - error;
        expect(Math.abs(difference - 360 * Math.round(difference / 360))).toBeLessThan(1e-3);
      });
    }
  });

  it('has a reason instead of figures when the horn lights nothing', () => {
    const dark = exampleDesign({ illumination: { kind: 'horn', positionMm: [0, 0, 200], aimMm: [0, 0, 400], exponentE: 6, exponentH: 6, polarisation: 'x' } });
    const prediction = predictDesign(dark, { include: everything });
    expect(prediction.figures.directivityDbi).toEqual({ kind: 'nothing-lit', reason: expect.any(String) });
    expect(prediction.figures.gainDbi).toMatchObject({ kind: 'nothing-lit' });
    expect(notFinite(prediction)).toBeUndefined();
    expect(figuresSchema.safeParse(prediction.figures).success).toBe(true);
  });

  it('predicts a single cell: 6.02 dBi for cos^1 in power, no beamwidth lost to NaN', () => {
    const one = planeWaveDesign({ panel: { ...panel, outline: { kind: 'rectangle', widthMm: 15, heightMm: 15 } } });
    const prediction = predictDesign(one, { include: everything });
    expect(prediction.figures.directivityDbi).toBeCloseTo(10 * Math.log10(4), 6);
    expect(prediction.figures.sidelobeDb.hemisphere).toMatchObject({ kind: 'no-sidelobe' });
    expect(notFinite(prediction)).toBeUndefined();
  });

  it('refuses too many cells by their number before placing them', () => {
    const huge = exampleDesign({ panel: { ...panel, lattice: { kind: 'rectangular', periodXMm: 0.01, periodYMm: 0.01 } } });
    expect(() => predictDesign(huge, { include: {} })).toThrow(`#/panel: the panel would have 900000000 cells; the limit is ${MAX_CELL_COUNT}`);
  });

  it('leaves no number that is not finite, whatever the design', () => {
    const size = fc.constantFrom(15, 40, 111);
    const design = fc.record({
      widthMm: size,
      heightMm: size,
      kind: fc.constantFrom('rectangle' as const, 'ellipse' as const),
      triangular: fc.boolean(),
      thetaDeg: fc.double({ min: 0, max: 89.9, noNaN: true }),
      phiDeg: fc.double({ min: -180, max: 180, noNaN: true }),
      horn: fc.tuple(fc.integer({ min: -100, max: 100 }), fc.integer({ min: -100, max: 100 }), fc.constantFrom(-90, 2, 90)),
      exponents: fc.tuple(fc.constantFrom(0, 0.5, 6, 200), fc.constantFrom(0, 6)),
      radiateExponent: fc.constantFrom(0, 0.5, 0.8, 10),
      levels: fc.constantFrom(null, 2, 3, 16),
      frequencyGHz: fc.constantFrom(1, 9.5, 10, 40),
    });
    fc.assert(
      fc.property(design, (d) => {
        const document = exampleDesign({
          requirement: { ...requirement, beams: [{ thetaDeg: d.thetaDeg, phiDeg: d.phiDeg }], mask: { kind: 'custom', points: [[10, 0], [90, -10]] }, minGainDbi: 10, maxSidelobeDb: -10 },
          panel: { ...panel, outline: { kind: d.kind, widthMm: d.widthMm, heightMm: d.heightMm }, lattice: d.triangular ? { kind: 'triangular', periodXMm: 14, rowSpacingMm: 11 } : panel.lattice },
          illumination: { kind: 'horn', positionMm: [...d.horn], aimMm: [0, 0, 0], exponentE: d.exponents[0], exponentH: d.exponents[1], polarisation: 'x' },
          cells: { kind: 'ideal', levels: d.levels },
          prediction: { receiveExponent: 0.5, radiateExponent: d.radiateExponent },
        });
        const prediction = predictDesign(document, { frequencyGHz: d.frequencyGHz, include: everything });
        expect(notFinite(prediction)).toBeUndefined();
        expect(figuresSchema.safeParse(prediction.figures).success).toBe(true);
        for (const loss of ['spilloverDb', 'taperDb', 'phaseLossDb', 'cellLossDb'] as const) {
          const value = prediction.figures[loss];
          if (typeof value === 'number') expect(value).toBeLessThanOrEqual(0);
        }
        if (typeof prediction.figures.directivityDbi === 'number') {
          expect(prediction.figures.directivityDbi).toBeGreaterThanOrEqual(Number(prediction.figures.directivityAtBeamDbi) - 1e-7);
        }
      }),
      { numRuns: 25 },
    );
  });
});
