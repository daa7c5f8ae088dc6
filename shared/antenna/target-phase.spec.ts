import * as fc from 'fast-check';
import type { DesignDocument } from '../model/design-document';
import { degFromRad, positiveDeg } from '../units/angles';
import { wavenumberRadPerM } from '../waves/conventions';
import { apertureLaw } from './aperture-law';
import { EXAMPLE_DESIGN, exampleDesign, planeWaveDesign } from './example-design';
import { illuminateCells } from './illumination';
import { panelLattice } from './panel-lattice';
import { siDesign } from './si-design';
import { evanescentCellCount, targetPhasesRad } from './target-phase';

const wavenumber = wavenumberRadPerM(10e9);

function targets(design: DesignDocument): { deg: number[]; at: (xMm: number, yMm: number) => number } {
  const si = siDesign(design);
  const lattice = panelLattice(si.panel);
  const light = illuminateCells(si.illumination, lattice, 0.5);
  const deg = Array.from(targetPhasesRad(apertureLaw(si), lattice, light, wavenumber), degFromRad);
  const at = (xMm: number, yMm: number): number =>
    deg[lattice.xM.findIndex((x, n) => Math.abs(x * 1000 - xMm) < 1e-6 && Math.abs(lattice.yM[n] * 1000 - yMm) < 1e-6)];
  return { deg, at };
}

describe('the target phase', () => {
  it('is k (R - r.b) for a horn: 3602.29 and 150.383 degrees (mod 360) at two cells of the example', () => {
    const { at } = targets(EXAMPLE_DESIGN);
    expect(at(142.5, -142.5)).toBeCloseTo(3602.29, 2);
    expect(positiveDeg(at(-142.5, 7.5))).toBeCloseTo(150.383, 3);
  });

  it('is constant for the specular beam of a plane wave', () => {
    const { deg } = targets(planeWaveDesign({ illumination: { kind: 'plane-wave', thetaDeg: 20, phiDeg: 180, polarisation: 'x' } }));
    expect(Math.max(...deg) - Math.min(...deg)).toBeLessThan(1e-6);
  });

  it('is k (R + |f - r|) for a focus', () => {
    const { at } = targets(exampleDesign({ synthesis: { kind: 'focus', pointMm: [10, 20, 500] } }));
    const path = Math.hypot(0.1425 + 0.082084, 0.1425, 0.225526) + Math.hypot(0.01 - 0.1425, 0.02 + 0.1425, 0.5);
    expect(at(142.5, -142.5)).toBeCloseTo(degFromRad(wavenumber * path), 6);
  });

  it('is the phase of the weighted sum of several beams', () => {
    const beams = [{ thetaDeg: 10, phiDeg: 0, levelDb: 0 }, { thetaDeg: 25, phiDeg: 90, levelDb: -6, phaseDeg: 40 }];
    const { at } = targets(planeWaveDesign({ requirement: { ...EXAMPLE_DESIGN.requirement, beams } }));
    const [x, y] = [0.0075, -0.0225];
    const first = -wavenumber * x * Math.sin(Math.PI / 18);
    const second = (40 * Math.PI) / 180 - wavenumber * y * Math.sin((25 * Math.PI) / 180);
    const weight = 10 ** (-6 / 20);
    const sum = Math.atan2(Math.sin(first) + weight * Math.sin(second), Math.cos(first) + weight * Math.cos(second));
    expect(positiveDeg(at(7.5, -22.5))).toBeCloseTo(positiveDeg(degFromRad(sum)), 9);
  });

  it('ignores the phase of a single beam, which has nothing to be relative to', () => {
    const beams = [{ thetaDeg: 20, phiDeg: 0, phaseDeg: 77 }];
    expect(targets(exampleDesign({ requirement: { ...EXAMPLE_DESIGN.requirement, beams } })).deg[5]).toBe(targets(EXAMPLE_DESIGN).deg[5]);
  });

  it('has tangential cosines that are its own slope, for every synthesis', () => {
    const several = exampleDesign({ requirement: { ...EXAMPLE_DESIGN.requirement, beams: [{ thetaDeg: 10, phiDeg: 0 }, { thetaDeg: 30, phiDeg: 50, levelDb: -3, phaseDeg: 20 }] } });
    const focus = exampleDesign({ synthesis: { kind: 'focus', pointMm: [10, 20, 300] } });
    const vortex = exampleDesign({ synthesis: { kind: 'vortex', order: -2 } });
    const vortices = { ...several, synthesis: vortex.synthesis };
    for (const design of [EXAMPLE_DESIGN, several, focus, vortex, vortices]) {
      const law = apertureLaw(siDesign(design));
      fc.assert(
        fc.property(fc.double({ min: -0.1, max: 0.1, noNaN: true }), fc.double({ min: -0.1, max: 0.1, noNaN: true }), (x, y) => {
          // On the axis of a vortex there is no slope.
          fc.pre(Math.hypot(x, y) > 0.01);
          const out = { u: 0, v: 0 };
          law.tangential(wavenumber, x, y, out);
          const h = 1e-6;
          const slope = (a: number, b: number): number => Math.atan2(Math.sin(a - b), Math.cos(a - b)) / (2 * h);
          expect(out.u).toBeCloseTo(-slope(law.phaseRad(wavenumber, x + h, y), law.phaseRad(wavenumber, x - h, y)) / wavenumber, 5);
          expect(out.v).toBeCloseTo(-slope(law.phaseRad(wavenumber, x, y + h), law.phaseRad(wavenumber, x, y - h)) / wavenumber, 5);
        }),
        { numRuns: 30 },
      );
    }
  });
});

describe('evanescent cells', () => {
  const count = (design: DesignDocument, frequencyGHz: number): number => {
    const si = siDesign(design);
    const lattice = panelLattice(si.panel);
    const light = illuminateCells(si.illumination, lattice, 0.5);
    return evanescentCellCount({ law: apertureLaw(si), lattice, light, designWavenumber: wavenumber, wavenumber: wavenumberRadPerM(frequencyGHz * 1e9) });
  };
  const steep = planeWaveDesign({ requirement: { ...EXAMPLE_DESIGN.requirement, beams: [{ thetaDeg: 75, phiDeg: 0 }] } });

  it('are none for one visible beam at the design frequency', () => {
    expect(count(EXAMPLE_DESIGN, 10)).toBe(0);
    expect(count(steep, 10)).toBe(0);
  });

  it('are all where a lower frequency squints the beam past the horizon: sin 75 / 0.95 > 1', () => {
    expect(count(steep, 9.5)).toBe(400);
    expect(count(steep, 10.5)).toBe(0);
  });
});
