import { cellBox, chosenLeader, drawingScale, extentOfCells, mapRulers } from './map-overlay';
import { PlaceIndex } from './map-places';
import { viewOf } from './map-view';

const side = 40;
const index = new PlaceIndex({
  xMm: Float64Array.from({ length: side * side }, (_, i) => 5 * ((i % side) - 19.5)),
  yMm: Float64Array.from({ length: side * side }, (_, i) => 5 * (Math.floor(i / side) - 19.5)),
  pitchXMm: 5,
  pitchYMm: 5,
});
const size = { width: 530, height: 530 };
const whole = viewOf(index.extent, size, null);

describe('rulers', () => {
  it('mark a 200 mm panel every 50 mm, the highest y on top', () => {
    const rulers = mapRulers(whole);
    expect(rulers.x.map(({ text }) => text)).toEqual(['\u2212100', '\u221250', '0', '50', '100']);
    expect([rulers.y[0].at, rulers.y[4].at]).toEqual([530, 0]);
  });
  it('follow a zoom with finer ticks', () => {
    const zoomed = mapRulers(viewOf(index.extent, size, { centreXMm: 1, centreYMm: 0, factor: 50 }));
    expect(zoomed.x.map(({ text }) => text)).toEqual(['\u22121', '0', '1', '2', '3']);
  });
});

describe('marks', () => {
  it('frame the cell itself while it is large enough to see', () => {
    expect(cellBox(index, whole, 0)).toEqual({ x: 0, y: 516.75, width: 13.25, height: 13.25 });
  });
  it('frame no less than eight pixels', () => {
    const small = viewOf(index.extent, { width: 200, height: 200 }, null);
    expect(cellBox(index, small, 0)).toMatchObject({ width: 8, height: 8 });
  });
  it('vanish with a cell outside the window', () => {
    expect(cellBox(index, viewOf(index.extent, size, { centreXMm: 80, centreYMm: 80, factor: 8 }), 0)).toBeNull();
    expect(cellBox(index, whole, -1)).toBeNull();
  });
  it('lead to a balloon beside the window, within its height', () => {
    const box = cellBox(index, whole, 1599);
    expect(box && chosenLeader(box, whole).balloonY).toBe(12);
    expect(box && chosenLeader(box, whole)).toMatchObject({ outside: true, balloonX: 551 });
  });
  it('keep the balloon beside a cell that is far from the edge', () => {
    const low = cellBox(index, whole, 5);
    const leader = low && chosenLeader(low, whole);
    expect(leader?.outside).toBe(false);
    expect(Math.hypot((leader?.balloonX ?? 0) - (low?.x ?? 0), (leader?.balloonY ?? 0) - (low?.y ?? 0))).toBeLessThan(60);
  });
});

it('spans from cell to cell whichever comes first', () => {
  expect(extentOfCells(index, 41, 0)).toEqual({ fromXMm: -100, toXMm: -90, fromYMm: -100, toYMm: -90 });
});

it('states the scale as drawings do', () => {
  expect(drawingScale(2.65)).toBe('1 : 1.43');
  expect(drawingScale(19)).toBe('5.0 : 1');
});
