import { EXAMPLE_DESIGN, exampleDesign, planeWaveDesign } from './example-design';
import { siDesign } from './si-design';

describe('a design in SI units', () => {
  it('is in metres, hertz and radians', () => {
    const si = siDesign(exampleDesign({ referencePhaseDeg: 90 }));
    expect(si.designFrequencyHz).toBe(10e9);
    expect(si.panel).toEqual({
      outline: { kind: 'rectangle', centre: { xM: 0, yM: 0 }, widthM: 0.3, heightM: 0.3 },
      lattice: { kind: 'rectangular', periodXM: 0.015, periodYM: 0.015 },
      keepOuts: [],
    });
    expect(si.referencePhaseRad).toBeCloseTo(Math.PI / 2, 12);
    expect(si.beams[0]).toEqual({ direction: { u: expect.closeTo(0.34202014, 8), v: 0, w: expect.closeTo(0.93969262, 8) }, amplitude: 1, phaseRad: 0 });
    expect(si.illumination).toMatchObject({ kind: 'horn', position: { xM: expect.closeTo(-0.082084, 12), yM: 0, zM: expect.closeTo(0.225526, 12) } });
  });

  it('gives beams their level as amplitude', () => {
    const beams = [{ thetaDeg: 0, phiDeg: 0, levelDb: -20, phaseDeg: 180 }];
    const [beam] = siDesign(exampleDesign({ requirement: { ...EXAMPLE_DESIGN.requirement, beams } })).beams;
    expect(beam.amplitude).toBeCloseTo(0.1, 12);
    expect(beam.phaseRad).toBeCloseTo(Math.PI, 12);
  });

  it('moves keep-outs to their centres', () => {
    const { panel } = EXAMPLE_DESIGN;
    const keepOuts = [{ kind: 'polygon' as const, centreMm: [10, 20] as [number, number], pointsMm: [[0, 0], [5, 0], [0, 5]] as [number, number][] }];
    expect(siDesign(exampleDesign({ panel: { ...panel, keepOuts } })).panel.keepOuts[0]).toEqual({
      kind: 'polygon',
      points: [{ xM: 0.01, yM: 0.02 }, { xM: 0.015, yM: 0.02 }, { xM: 0.01, yM: 0.025 }],
    });
  });

  it('keeps the direction that a plane wave comes from', () => {
    const { illumination, referencePhaseRad } = siDesign(planeWaveDesign({ illumination: { kind: 'plane-wave', thetaDeg: 30, phiDeg: 180, polarisation: 'y' }, referencePhaseDeg: 'search' }));
    expect(illumination).toMatchObject({ kind: 'plane-wave', source: { u: expect.closeTo(-0.5, 12) }, polarisation: 'y' });
    expect(referencePhaseRad).toBe('search');
  });
});
