import { largestDimensionM, outlineAreaM2, outlineBounds, outlineTrace, rowIntervals, signedPolygonAreaM2 } from './outline';
import type { SiOutline } from './si-design';

const centre = { xM: 0.1, yM: -0.2 };
const rectangle: SiOutline = { kind: 'rectangle', centre, widthM: 2, heightM: 1 };
const ellipse: SiOutline = { kind: 'ellipse', centre, widthM: 2, heightM: 1 };
/** A square with a notch cut down from its top edge. */
const notched: SiOutline = {
  kind: 'polygon',
  points: [[0, 0], [4, 0], [4, 4], [3, 4], [3, 2], [1, 2], [1, 4], [0, 4]].map(([xM, yM]) => ({ xM, yM })),
};

describe('outlines', () => {
  it('measures area, bounds and largest dimension', () => {
    expect(outlineAreaM2(rectangle)).toBe(2);
    expect(outlineAreaM2(ellipse)).toBeCloseTo(Math.PI / 2, 12);
    expect(outlineAreaM2(notched)).toBe(12);
    expect(outlineBounds(rectangle)).toEqual({ leftM: -0.9, rightM: 1.1, bottomM: -0.7, topM: 0.3 });
    expect(largestDimensionM(rectangle)).toBeCloseTo(Math.sqrt(5), 12);
    expect(largestDimensionM(ellipse)).toBe(2);
    expect(largestDimensionM(notched)).toBeCloseTo(4 * Math.SQRT2, 12);
  });

  it('gives a clockwise polygon a negative signed area', () => {
    const points = notched.kind === 'polygon' ? [...notched.points].reverse() : [];
    expect(signedPolygonAreaM2(points)).toBe(-12);
  });

  it('cuts a row through the notch into two parts', () => {
    const parts = rowIntervals(notched, 3).sort((a, b) => a[0] - b[0]);
    expect(parts).toEqual([
      [expect.closeTo(0, 6), expect.closeTo(1, 6)],
      [expect.closeTo(3, 6), expect.closeTo(4, 6)],
    ]);
  });

  it.each([0, 2, 4])('counts the edge itself as inside on the row y = %d', (y) => {
    const holds = (x: number): boolean => rowIntervals(notched, y).some(([from, to]) => x >= from && x <= to);
    expect(holds(0)).toBe(true);
    expect(holds(4)).toBe(true);
    expect(holds(2)).toBe(y !== 4);
  });

  it('has nothing above or below', () => {
    expect(rowIntervals(ellipse, 0.31)).toEqual([]);
    expect(rowIntervals(notched, -0.01)).toEqual([]);
  });

  it('keeps the outermost point of an ellipse despite rounding', () => {
    const [[from, to]] = rowIntervals(ellipse, centre.yM + 0.5 * (1 - 1e-12));
    expect(from).toBeLessThanOrEqual(centre.xM);
    expect(to).toBeGreaterThanOrEqual(centre.xM);
  });

  it('traces points that lie on the outline', () => {
    for (const point of outlineTrace(ellipse, 40)) {
      expect(((point.xM - centre.xM) / 1) ** 2 + ((point.yM - centre.yM) / 0.5) ** 2).toBeCloseTo(1, 12);
    }
    expect(outlineTrace(rectangle, 40)).toHaveLength(40);
    for (const { xM, yM } of outlineTrace(rectangle, 8)) {
      expect(Math.max(Math.abs(xM - centre.xM), 2 * Math.abs(yM - centre.yM))).toBeCloseTo(1, 12);
    }
  });
});
