import type { DesignDocument } from '../model/design-document';
import { exampleDesign, planeWaveDesign } from './example-design';
import { predictDesign } from './predict-design';

const figuresOf = (design: DesignDocument) => predictDesign(design, { include: {} }).figures;
const requirement = { designFrequencyGHz: 28, polarisation: 'x' as const };

describe('the uncertainty of the peak', () => {
  // Places where the exact gradient of the summed field is zero, found in another language.
  it.each<[string, number, number, Partial<DesignDocument>]>([
    ['a reflecting rectangle', 19.97706540854403, 0, {
      requirement: { ...requirement, beams: [{ thetaDeg: 20, phiDeg: 0 }] },
      panel: { operation: 'reflect', outline: { kind: 'rectangle', widthMm: 150, heightMm: 120 }, lattice: { kind: 'rectangular', periodXMm: 5, periodYMm: 5 }, keepOuts: [] },
      illumination: { kind: 'horn', positionMm: [-50, 0, 140], aimMm: [0, 0, 0], exponentE: 6.5, exponentH: 6.5, polarisation: 'x' },
    }],
    ['a transmitting polygon of staggered rows, three levels', 30.017916217557428, -70.13419471163353, {
      requirement: { ...requirement, beams: [{ thetaDeg: 30, phiDeg: -70 }] },
      panel: {
        operation: 'transmit',
        outline: { kind: 'polygon', pointsMm: [[-70, -50], [60, -60], [80, 20], [10, 70], [-60, 40]] },
        lattice: { kind: 'triangular', periodXMm: 5.4, rowSpacingMm: 4.676 },
        keepOuts: [],
      },
      illumination: { kind: 'horn', positionMm: [10, 30, -130], aimMm: [0, -5, 0], exponentE: 5, exponentH: 7, polarisation: 'x' },
      cells: { kind: 'ideal', levels: 3 },
      referencePhaseDeg: 17,
    }],
  ])('covers how far the peak of %s is off', (_name, thetaDeg, phiDeg, changes) => {
    const { peakThetaDeg, peakPhiDeg, uncertainty } = figuresOf(exampleDesign(changes));
    expect(Math.abs(Number(peakThetaDeg) - thetaDeg)).toBeLessThan(uncertainty['peakThetaDeg']);
    expect(Math.abs(Number(peakPhiDeg) - phiDeg)).toBeLessThan(uncertainty['peakPhiDeg']);
    expect(uncertainty['peakThetaDeg']).toBeLessThan(1e-4);
  });

  it('leaves the azimuth of a peak at broadside open', () => {
    const { uncertainty } = figuresOf(planeWaveDesign({ requirement: { ...requirement, designFrequencyGHz: 10, beams: [{ thetaDeg: 0, phiDeg: 0 }] } }));
    expect(uncertainty['peakPhiDeg']).toBeGreaterThan(1);
  });
});

describe('figures', () => {
  it('state no uncertainty of a spillover that does not exist', () => {
    expect(figuresOf(planeWaveDesign()).uncertainty).not.toHaveProperty('spilloverDb');
  });

  it('give each wanted direction as the document has it', () => {
    const beams = [{ thetaDeg: 25, phiDeg: 130 }, { thetaDeg: 30, phiDeg: 200 }];
    const found = figuresOf(planeWaveDesign({ requirement: { ...requirement, designFrequencyGHz: 10, beams } })).beams;
    expect(found.map(({ thetaDeg, phiDeg }) => ({ thetaDeg, phiDeg }))).toEqual(beams);
  });
});
