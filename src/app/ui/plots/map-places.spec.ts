import { PlaceIndex } from './map-places';
import type { MapPlaces } from './map-places';

/** Rows of five cells at 5 mm, the odd ones moved by half a cell, with one cell left out of the middle row. */
function triangular(): MapPlaces {
  const points = [-1, 0, 1].flatMap((row) =>
    [-2, -1, 0, 1, 2].map((column) => [5 * column + (row % 2 === 0 ? 0 : 2.5), 4 * row] as const).filter(([x, y]) => !(x === 5 && y === 0)),
  );
  return { xMm: points.map(([x]) => x), yMm: points.map(([, y]) => y), pitchXMm: 5, pitchYMm: 4 };
}

describe('PlaceIndex', () => {
  const index = new PlaceIndex(triangular());

  it('finds the cell under a point and none in a gap or outside', () => {
    expect(index.cellAt(-10.2, 0.3)).toBe(5);
    expect(index.cellAt(5, 0)).toBe(-1);
    expect(index.cellAt(2.4, -4.4)).toBe(2);
    expect(index.cellAt(2.4, 6.5)).toBe(-1);
    expect(index.cellAt(-30, 0)).toBe(-1);
  });

  it('spans the outer edges of the cells', () => {
    expect(index.extent).toEqual({ fromXMm: -12.5, toXMm: 15, fromYMm: -6, toYMm: 6 });
  });

  it('moves along a row over the gap and stops at its ends', () => {
    expect([index.step(7, 'right'), index.step(8, 'right'), index.step(5, 'left')]).toEqual([8, 8, 5]);
    expect([index.step(6, 'row-start'), index.step(6, 'row-end')]).toEqual([5, 8]);
  });

  it('moves to the nearest cell of the next row and stays at the edge of the panel', () => {
    expect(index.step(7, 'down')).toBe(1);
    expect(index.step(2, 'up')).toBe(7);
    expect(index.step(11, 'up')).toBe(11);
    expect(index.step(12, 'page-down')).toBe(3);
  });

  it('lists the cells whose centre lies in a rectangle', () => {
    expect([...index.cellsWithin({ fromXMm: -6, toXMm: 3, fromYMm: -5, toYMm: 1 })]).toEqual([1, 2, 6, 7]);
  });

  it('has no cell anywhere on an empty map', () => {
    const empty = new PlaceIndex({ xMm: [], yMm: [], pitchXMm: 5, pitchYMm: 5 });
    expect([empty.cellAt(0, 0), empty.cellsWithin({ fromXMm: -9, toXMm: 9, fromYMm: -9, toYMm: 9 }).length]).toEqual([-1, 0]);
  });
});
