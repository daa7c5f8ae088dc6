import type { PredictedCut } from '../live-prediction-data';
import { maskDrawing, offAxisTraces } from './mask-drawing';

const space = { width: 452, height: 242 };
const points: [number, number][] = [
  [4, 20],
  [10, 10],
  [48, 0],
];

describe('maskDrawing', () => {
  it('forbids what lies above the mask and holds the last level to the edge', () => {
    const drawing = maskDrawing(points, [], space);
    const lastY = drawing.edge.split(' ').at(-1);
    expect(drawing.edge.split('L')).toHaveLength(4);
    expect(lastY).toBe(String(Math.round(drawing.points[2].y * 100) / 100));
    expect(drawing.forbidden.endsWith(`L${Math.round((40 + (4 / 90) * 400) * 100) / 100} 12Z`)).toBe(true);
  });

  it('stands angles evenly on the axis and levels upside up', () => {
    const drawing = maskDrawing(points, [], space);
    expect(drawing.anglesDeg.map(({ text }) => text)).toEqual(['0', '15', '30', '45', '60', '75', '90']);
    expect(drawing.anglesDeg.map(({ at }) => Math.round(at))).toEqual([40, 107, 173, 240, 307, 373, 440]);
    expect(drawing.points[0].y).toBeLessThan(drawing.points[1].y);
  });

  it('reaches to the back half only for a mask that does', () => {
    expect(maskDrawing([...points, [180, -10]], [], space).anglesDeg.at(-1)?.text).toBe('180');
  });

  it('makes room for the predicted gain', () => {
    const drawing = maskDrawing(points, [{ dashed: false, offAxisDeg: [0, 1, 2], gainDbi: [36, -60, 30] }], space);
    expect(drawing.levelsDbi.at(-1)?.text).toBe('40');
    // What lies below the floor leaves a gap.
    expect(drawing.traces[0].path).toMatch(/^M40 [\d.]+M48\.89 [\d.]+$/);
  });

  it('draws the axes of a mask without points', () => {
    expect(maskDrawing([], [], space)).toMatchObject({ forbidden: '', edge: '', points: [] });
  });
});

describe('offAxisTraces', () => {
  it('measures both sides of a cut from the beam', () => {
    const cut: PredictedCut = {
      request: { phiDeg: 0, thetaDeg: [0, 40, 10] },
      angleDeg: Float64Array.of(0, 10, 20, 30, 40),
      thetaDeg: Float64Array.of(0, 10, 20, 30, 40),
      phiDeg: new Float64Array(5),
      directivityDbi: new Float64Array(5),
      gainDbi: Float64Array.of(1, 2, 30, 4, 5),
    };
    const [below, above] = offAxisTraces(cut, [{ thetaDeg: 20, phiDeg: 0 }], true);
    expect(below.offAxisDeg.map(Math.round)).toEqual([0, 10, 20]);
    expect(below.gainDbi).toEqual([30, 2, 1]);
    expect(above.gainDbi).toEqual([30, 4, 5]);
  });
});
