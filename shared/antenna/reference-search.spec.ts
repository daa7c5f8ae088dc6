import { radFromDeg, wrapRad } from '../units/angles';
import { cellStock, type CellStock } from './cell-stock';
import type { Cells, DesignDocument } from '../model/design-document';
import { EXAMPLE_DESIGN, exampleDesign, planeWaveDesign } from './example-design';
import { placeCells } from './place-cells';
import { predictDesign } from './predict-design';

const search = (cells: Cells, design: DesignDocument = EXAMPLE_DESIGN): number => placeCells({ ...design, cells, referencePhaseDeg: 'search' }).referencePhaseRad;

/** Field at the wanted beam for one reference, by placing the cells anew. */
function fieldAtBeam(design: DesignDocument, cells: Cells, referenceDeg: number): number {
  const placed = placeCells({ ...design, cells, referencePhaseDeg: referenceDeg });
  const { u, v } = placed.si.beams[0].direction;
  let re = 0;
  let im = 0;
  placed.assignment.phaseRad.forEach((phase, n) => {
    const size = placed.light.amplitude[n] * placed.assignment.magnitude[n];
    const angle = phase + placed.designWavenumber * (placed.lattice.xM[n] * u + placed.lattice.yM[n] * v - placed.light.pathM[n]);
    re += size * Math.cos(angle);
    im += size * Math.sin(angle);
  });
  return Math.hypot(re, im);
}

describe('the search for a reference phase', () => {
  const table: Cells = { kind: 'inline', cells: [0, 47, 110, 200, 260].map((phaseDeg, i) => ({ phaseDeg, magnitude: 0.9 - i / 20 })) };

  it.each<[string, Cells]>([
    ['two levels', { kind: 'ideal', levels: 2 }],
    ['five levels', { kind: 'ideal', levels: 5 }],
    ['a table', table],
  ])('finds, for %s, the field of the best whole degree', (_name, cells) => {
    const found = fieldAtBeam(EXAMPLE_DESIGN, cells, (search(cells) * 180) / Math.PI);
    const period = cells.kind === 'ideal' ? 360 / (cells.levels ?? 1) : 360;
    let best = 0;
    for (let deg = 0; deg < period; deg += 1) best = Math.max(best, fieldAtBeam(EXAMPLE_DESIGN, cells, deg));
    expect(found).toBeGreaterThanOrEqual(best * (1 - 1e-9));
  });

  it('leaves continuous cells at 0, where no reference is better than another', () => {
    expect(search({ kind: 'ideal', levels: null })).toBe(0);
  });

  it('loses nothing on a 24 x 24 two-bit panel at 30 degrees under a plane wave, where every target is a tie', () => {
    const design = planeWaveDesign({
      requirement: { designFrequencyGHz: 10, beams: [{ thetaDeg: 30, phiDeg: 0 }], polarisation: 'x' },
      panel: { ...EXAMPLE_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 24 * 14.9896229, heightMm: 24 * 14.9896229 }, lattice: { kind: 'rectangular', periodXMm: 14.9896229, periodYMm: 14.9896229 } },
      cells: { kind: 'ideal', levels: 4 },
    });
    for (const referencePhaseDeg of [0, 45, 'search'] as const) {
      const { phaseLossDb, pointingErrorDeg } = predictDesign({ ...design, referencePhaseDeg }, { include: {} }).figures;
      expect(phaseLossDb).toBeGreaterThan(-0.001);
      expect(pointingErrorDeg).toBeLessThan(0.3);
    }
  });

  it('gains on the fixed reference 0 where rounding happens to be unkind', () => {
    const design = planeWaveDesign({ cells: { kind: 'ideal', levels: 2 }, requirement: { ...EXAMPLE_DESIGN.requirement, beams: [{ thetaDeg: 0, phiDeg: 0 }] } });
    const tilted: DesignDocument = { ...design, illumination: { kind: 'plane-wave', thetaDeg: 3, phiDeg: 30, polarisation: 'x' } };
    const loss = (referencePhaseDeg: number | 'search'): number => Number(predictDesign({ ...tilted, referencePhaseDeg }, { include: {} }).figures.gainAtBeamDbi);
    expect(loss('search')).toBeGreaterThan(loss(0) + 0.01);
  });

  it('takes the smallest of equal references', () => {
    const single: CellStock = cellStock({ kind: 'inline', cells: [{ phaseDeg: 10, magnitude: 1 }] }, { light: placeCells(EXAMPLE_DESIGN).light, designFrequencyHz: 10e9, si: placeCells(EXAMPLE_DESIGN).si });
    const query = { targetRad: Float64Array.of(1, 2), weightRe: Float64Array.of(1, 0.5), weightIm: Float64Array.of(0, 0.2) };
    expect(single.searchReferenceRad(query)).toBe(0);
  });

  it('reports the reference it found and adds it to the targets', () => {
    const design = exampleDesign({ cells: { kind: 'ideal', levels: 2 }, referencePhaseDeg: 'search' });
    const placed = placeCells(design);
    const bare = placeCells(exampleDesign({ cells: { kind: 'ideal', levels: 2 } }));
    placed.targetRad.forEach((target, n) => expect(wrapRad(target - bare.targetRad[n] - placed.referencePhaseRad)).toBeCloseTo(0, 9));
    expect(placed.referencePhaseRad).toBeLessThan(radFromDeg(180));
  });
});
