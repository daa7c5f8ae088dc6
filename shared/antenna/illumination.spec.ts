import { radFromDeg } from '../units/angles';
import { directionOf } from '../waves/conventions';
import { EXAMPLE_DESIGN } from './example-design';
import { illuminateCells } from './illumination';
import { panelLattice } from './panel-lattice';
import { siDesign } from './si-design';

const si = siDesign(EXAMPLE_DESIGN);
const lattice = panelLattice(si.panel);

describe('lighting the cells', () => {
  it('gives a horn cos^q / R times cos^a of the incidence', () => {
    const light = illuminateCells(si.illumination, lattice, 0.5);
    const bare = illuminateCells(si.illumination, lattice, 0);
    const n = 37;
    const [dx, dy, dz] = [lattice.xM[n] + 0.082084, lattice.yM[n], -0.225526];
    const distance = Math.hypot(dx, dy, dz);
    const cosine = (dx * 0.082084 + dz * -0.225526) / (distance * Math.hypot(0.082084, 0.225526));
    expect(light.pathM[n]).toBeCloseTo(distance, 12);
    expect(light.incidenceRad[n]).toBeCloseTo(Math.acos(0.225526 / distance), 12);
    expect(light.azimuthRad[n]).toBeCloseTo(Math.atan2(dy, dx), 12);
    expect(bare.amplitude[n]).toBeCloseTo(cosine ** 6.5 / distance, 10);
    expect(light.amplitude[n] / bare.amplitude[n]).toBeCloseTo(Math.sqrt(0.225526 / distance), 12);
  });

  it('gives a plane wave amplitude 1, its own angle everywhere and the azimuth it travels to', () => {
    const source = directionOf(radFromDeg(30), radFromDeg(40));
    const light = illuminateCells({ kind: 'plane-wave', source, polarisation: 'x' }, lattice, 0.5);
    expect(new Set(light.amplitude)).toEqual(new Set([1]));
    expect(light.incidenceRad[7]).toBeCloseTo(radFromDeg(30), 12);
    expect(light.azimuthRad[7]).toBeCloseTo(radFromDeg(-140), 12);
    // The wave from +x reaches +x first: its path is shorter there.
    expect(light.pathM[0]).toBeCloseTo(-(lattice.xM[0] * source.u + lattice.yM[0] * source.v), 15);
  });

  it('has no azimuth at normal incidence', () => {
    const light = illuminateCells({ kind: 'plane-wave', source: directionOf(0, 1), polarisation: 'x' }, lattice, 0.5);
    expect(light.azimuthRad[0]).toBe(0);
    expect(light.incidenceRad[0]).toBe(0);
  });
});
