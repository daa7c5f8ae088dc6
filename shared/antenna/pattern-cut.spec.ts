import { radFromDeg } from '../units/angles';
import { directionOf } from '../waves/conventions';
import { exampleField } from './example-field';
import { FLOOR_DBI, flooredDbi, patternCut, sampleAngles } from './pattern-cut';
import { directivityRatio, radiationPattern } from './radiation-pattern';
import { uvMap } from './uv-map';

const pattern = radiationPattern(exampleField({ columnCount: 30, rowCount: 28 }), 210, 0.5);
const beam = directionOf(radFromDeg(20), radFromDeg(30));

describe('cuts', () => {
  it('take both ends where the step divides the span', () => {
    expect(Array.from(sampleAngles([-90, 90, 45]))).toEqual([-90, -45, 0, 45, 90]);
    expect(sampleAngles([-90, 90, 0.1])).toHaveLength(1801);
    expect(Array.from(sampleAngles([0, 10, 4]))).toEqual([0, 4, 8]);
    expect(Array.from(sampleAngles([5, 5, 1]))).toEqual([5]);
  });

  it('hold exact directivity in the direction of every sample, and gain a constant below', () => {
    for (const request of [{ phiDeg: 30, thetaDeg: [-90, 90, 7] }, { plane: 'across', angleDeg: [-80, 80, 9] }] as const) {
      const cut = patternCut(pattern, request, beam, -1.25);
      cut.angleDeg.forEach((_, i) => {
        const direction = directionOf(radFromDeg(cut.thetaDeg[i]), radFromDeg(cut.phiDeg[i]));
        expect(cut.directivityDbi[i]).toBeCloseTo(flooredDbi(directivityRatio(pattern, direction)), 6);
        expect(cut.gainDbi[i]).toBe(Math.max(FLOOR_DBI, cut.directivityDbi[i] - 1.25));
      });
    }
  });

  it('put negative theta on the far side of a cut of constant phi', () => {
    const { thetaDeg, phiDeg } = patternCut(pattern, { phiDeg: 30, thetaDeg: [-40, 40, 80] }, beam, 0);
    expect([thetaDeg[0], phiDeg[0], thetaDeg[1], phiDeg[1]]).toEqual([40, -150, 40, 30].map((deg) => expect.closeTo(deg, 9)));
  });

  it('stand on the floor behind the panel instead of at minus infinity', () => {
    const { directivityDbi } = patternCut(pattern, { plane: 'along', angleDeg: [100, 160, 20] }, beam, 0);
    expect(Array.from(directivityDbi)).toEqual([FLOOR_DBI, FLOOR_DBI, FLOOR_DBI, FLOOR_DBI]);
  });
});

describe('the u-v map', () => {
  it('holds the gain of its directions, rows rising with v, and the floor outside the circle', () => {
    const { size, gainDbi, floorDbi } = uvMap(pattern, 21, -0.5);
    expect(gainDbi).toHaveLength(441);
    expect(gainDbi[0]).toBe(floorDbi);
    for (const [column, row] of [[12, 3], [10, 10], [4, 15]]) {
      const [u, v] = [-1 + column / 10, -1 + row / 10];
      const expected = flooredDbi(directivityRatio(pattern, { u, v, w: Math.sqrt(1 - u * u - v * v) })) - 0.5;
      expect(gainDbi[row * size + column]).toBeCloseTo(expected, 4);
    }
  });

  it('holds at each place the gain of the direction that a shift brought there, and the floor where none did', () => {
    const shift = { u: 0.13, v: -0.07 };
    const { gainDbi, floorDbi } = uvMap(pattern, 21, -0.5, shift);
    for (const [column, row] of [[12, 3], [10, 10], [4, 15]]) {
      const [u, v] = [-1 + column / 10 - shift.u, -1 + row / 10 - shift.v];
      expect(gainDbi[row * 21 + column]).toBeCloseTo(flooredDbi(directivityRatio(pattern, { u, v, w: Math.sqrt(1 - u * u - v * v) })) - 0.5, 4);
    }
    // u = -0.9 comes from -1.03, where no direction is; u = 1 comes from 0.87.
    expect([gainDbi[10 * 21 + 1], gainDbi[10 * 21 + 20] > floorDbi]).toEqual([floorDbi, true]);
  });

  it('is that of single directions on a large staggered panel too', () => {
    const large = radiationPattern(exampleField({ columnCount: 90, rowCount: 70, stagger: 'odd' }), 210, 0.5);
    const fine = uvMap(large, 17, 0);
    const { size } = fine;
    for (const [column, row] of [[9, 8], [3, 8], [12, 11]]) {
      const [u, v] = [-1 + column / 8, -1 + row / 8];
      expect(fine.gainDbi[row * size + column]).toBeCloseTo(flooredDbi(directivityRatio(large, { u, v, w: Math.sqrt(1 - u * u - v * v) })), 3);
    }
  });
});
