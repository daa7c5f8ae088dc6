import { anglesOfUv, contourSegments, discPoint, levelAtUv, steeringStep, uvOf, uvOfPoint } from './uv-geometry';

describe('directions on the disc', () => {
  it('go from angles to cosines and back', () => {
    for (const angles of [{ thetaDeg: 20, phiDeg: 30 }, { thetaDeg: 89.9, phiDeg: -170 }, { thetaDeg: 45, phiDeg: 180 }]) {
      const back = anglesOfUv(uvOf(angles));
      expect(back.thetaDeg).toBeCloseTo(angles.thetaDeg, 9);
      expect(back.phiDeg).toBeCloseTo(angles.phiDeg, 9);
    }
  });
  it('stop short of the horizon and give broadside no azimuth', () => {
    expect(anglesOfUv({ u: 3, v: 0 })).toEqual({ thetaDeg: 89.9, phiDeg: 0 });
    expect(anglesOfUv({ u: 0, v: 0 })).toEqual({ thetaDeg: 0, phiDeg: 0 });
  });
  it('are steered in tenths of a degree', () => {
    expect(steeringStep({ thetaDeg: 20.04, phiDeg: -179.97 })).toEqual({ thetaDeg: 20, phiDeg: 180 });
    expect(steeringStep({ thetaDeg: 0.02, phiDeg: 77 })).toEqual({ thetaDeg: 0, phiDeg: 0 });
  });
  it('lie with v upwards', () => {
    const disc = { centre: 100, radius: 80 };
    expect(discPoint(disc, { u: 0.5, v: 1 })).toEqual({ x: 140, y: 20 });
    expect(uvOfPoint(disc, 140, 20)).toEqual({ u: 0.5, v: 1 });
  });
});

/** A round hill of 20 dB about (0.25, 0) that falls 200 dB per unit of distance squared. */
function hill(size: number): { size: number; levelDb: Float32Array } {
  const levelDb = new Float32Array(size * size);
  for (let i = 0; i < size * size; i++) {
    const u = (2 * (i % size)) / (size - 1) - 1;
    const v = (2 * Math.floor(i / size)) / (size - 1) - 1;
    levelDb[i] = 20 - 200 * ((u - 0.25) ** 2 + v ** 2);
  }
  return { size, levelDb };
}

describe('levels over the disc', () => {
  const map = hill(201);
  it('are read between samples', () => {
    expect(levelAtUv(map, { u: 0.25, v: 0 })).toBeCloseTo(20, 3);
    expect(levelAtUv(map, { u: -1, v: 1 })).toBeCloseTo(20 - 200 * (1.5625 + 1), 3);
  });
  it('have their -3 dB line where the hill is 3 dB lower', () => {
    const segments = contourSegments(map, 17);
    expect(segments.length).toBeGreaterThan(20);
    for (const [a] of segments) expect(Math.hypot(a.u - 0.25, a.v)).toBeCloseTo(Math.sqrt(3 / 200), 3);
  });
  it('have no line above their peak', () => {
    expect(contourSegments(map, 21)).toEqual([]);
  });
});
