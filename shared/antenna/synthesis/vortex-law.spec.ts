import { directionOf, wavenumberRadPerM } from '../../waves/conventions';
import { apertureLaw } from '../aperture-law';
import { exampleDesign, planeWaveDesign } from '../example-design';
import { predictDesign } from '../predict-design';
import { siDesign } from '../si-design';
import { beamFrame, directionAbout } from './beam-frame';

const wavenumber = wavenumberRadPerM(10e9);

describe('the frame of a beam', () => {
  it('is x and y at broadside and stays at right angles to any beam', () => {
    expect(beamFrame(directionOf(0, 0)).across).toEqual([1, expect.closeTo(0, 15), expect.closeTo(0, 15)]);
    const beam = directionOf(0.6, 2.1);
    const { u, v, w } = directionAbout(beamFrame(beam), 0.25, 1.3);
    expect(Math.hypot(u, v, w)).toBeCloseTo(1, 14);
    expect(u * beam.u + v * beam.v + w * beam.w).toBeCloseTo(Math.cos(0.25), 14);
  });
});

describe('the law of a vortex', () => {
  const broadside = { ...exampleDesign().requirement, beams: [{ thetaDeg: 0, phiDeg: 0 }] };

  it('adds order times the azimuth at broadside: a quarter turn further, order 3 adds 270 degrees', () => {
    const law = apertureLaw(siDesign(exampleDesign({ requirement: broadside, synthesis: { kind: 'vortex', order: 3 } })));
    expect(law.phaseRad(wavenumber, 0, 0.05) - law.phaseRad(wavenumber, 0.05, 0)).toBeCloseTo((3 * Math.PI) / 2, 12);
  });

  it('is the direct law where the order is 0', () => {
    const zero = apertureLaw(siDesign(exampleDesign({ synthesis: { kind: 'vortex', order: 0 } })));
    const direct = apertureLaw(siDesign(exampleDesign()));
    expect(zero.phaseRad(wavenumber, 0.03, -0.07)).toBe(direct.phaseRad(wavenumber, 0.03, -0.07));
  });

  it('gives a ring with the wanted order and nothing on the axis, for either sense', () => {
    for (const order of [1, -2]) {
      const { figures } = predictDesign(planeWaveDesign({ requirement: broadside, synthesis: { kind: 'vortex', order } }), { include: {} });
      const { vortex } = figures;
      if (vortex === undefined || 'kind' in vortex) throw new Error('no ring');
      expect(vortex).toMatchObject({ order, axisDb: { kind: 'null' } });
      // A square of 20 x 20 samples is no disc: orders four apart leak in.
      expect(vortex.purity).toBeGreaterThan(0.97);
      expect(vortex.purity).toBeLessThanOrEqual(1);
      expect(figures.pointingErrorDeg).toBeCloseTo(vortex.ringDeg, -0.5);
    }
  });

  it('turns about the axis of a steered beam, too', () => {
    const requirement = { ...broadside, beams: [{ thetaDeg: 25, phiDeg: 40 }] };
    const { vortex } = predictDesign(exampleDesign({ requirement, synthesis: { kind: 'vortex', order: 1 } }), { include: {} }).figures;
    if (vortex === undefined || 'kind' in vortex) throw new Error('no ring');
    expect(vortex.purity).toBeGreaterThan(0.9);
    expect(vortex.axisDb).toBeLessThan(-20);
  });

  it('says nothing of image lobes: the ring is wanted', () => {
    const { warnings } = predictDesign(exampleDesign({ synthesis: { kind: 'vortex', order: 1 } }), { include: {} });
    expect(warnings.map(({ code }) => code)).not.toContain('image-lobe');
  });
});
