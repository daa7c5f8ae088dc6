import * as fc from 'fast-check';
import { radFromDeg, degFromRad } from '../units/angles';
import {
  angleBetweenRad,
  anglesOf,
  azimuthElevationRad,
  beamAperturePhaseRad,
  directionOf,
  incidentPlaneWavePhaseRad,
  outwardDirection,
  pathPhaseRad,
  wavenumberRadPerM,
} from './conventions';

const theta = fc.double({ min: 0.001, max: 1.57, noNaN: true });
const phi = fc.double({ min: -3.14, max: 3.14, noNaN: true });

describe('conventions', () => {
  it('has (30, 45) degrees at u = v = 0.353553, w = 0.866025', () => {
    const { u, v, w } = directionOf(radFromDeg(30), radFromDeg(45));
    expect([u, v, w]).toEqual([expect.closeTo(0.353553, 6), expect.closeTo(0.353553, 6), expect.closeTo(0.866025, 6)]);
  });

  it('counts phi from +x towards +y', () => {
    expect(directionOf(1, Math.PI / 2).v).toBeGreaterThan(0);
  });

  it('returns the angles it was given', () => {
    fc.assert(
      fc.property(theta, phi, (thetaRad, phiRad) => {
        const angles = anglesOf(directionOf(thetaRad, phiRad));
        expect(angles.thetaRad).toBeCloseTo(thetaRad, 9);
        expect(angles.phiRad).toBeCloseTo(phiRad, 9);
      }),
    );
  });

  it('delays by falling phase: a quarter wave of path is -90 degrees', () => {
    const wavenumber = wavenumberRadPerM(10e9);
    expect(degFromRad(pathPhaseRad(wavenumber, 299792458 / 10e9 / 4))).toBeCloseTo(-90, 9);
  });

  it('lets a wave from +x reach +x first, so its phase leads there', () => {
    expect(incidentPlaneWavePhaseRad(100, directionOf(0.5, 0), 0.01, 0)).toBeGreaterThan(0);
  });

  it('steers towards +x with a phase that falls along +x', () => {
    expect(beamAperturePhaseRad(100, directionOf(0.5, 0), 0.01, 0)).toBeLessThan(0);
  });

  it('needs no phase from the panel for the specular beam', () => {
    const source = directionOf(0.4, radFromDeg(200));
    const specular = directionOf(0.4, radFromDeg(20));
    for (const [x, y] of [[0, 0], [0.037, -0.011], [-0.088, 0.14]]) {
      const needed = beamAperturePhaseRad(210, specular, x, y) - incidentPlaneWavePhaseRad(210, source, x, y);
      expect(needed).toBeCloseTo(0, 12);
    }
  });

  it('measures small angles without losing them', () => {
    expect(degFromRad(angleBetweenRad(directionOf(0.3, 0), directionOf(0.3 + 1e-7, 0)))).toBeCloseTo(degFromRad(1e-7), 12);
  });

  it('has azimuth towards +x and elevation towards +y', () => {
    const { azimuthRad, elevationRad } = azimuthElevationRad(outwardDirection(0.5, 0.25));
    expect(azimuthRad).toBeCloseTo(Math.atan2(0.5, Math.sqrt(1 - 0.25 - 0.0625)), 12);
    expect(elevationRad).toBeCloseTo(Math.asin(0.25), 12);
  });

  it('puts a direction on the rim when rounding takes it past', () => {
    expect(outwardDirection(1, 1e-9).w).toBe(0);
  });
});
