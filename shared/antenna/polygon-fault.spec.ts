import { polygonFault } from './polygon-fault';

describe('faults of a polygon', () => {
  it('finds none in a triangle, in either direction of turn, or in a concave outline', () => {
    expect(polygonFault([[0, 0], [4, 0], [0, 3]])).toBeUndefined();
    expect(polygonFault([[0, 3], [4, 0], [0, 0]])).toBeUndefined();
    expect(polygonFault([[0, 0], [4, 0], [4, 4], [2, 1], [0, 4]])).toBeUndefined();
  });

  it('finds edges that cross', () => {
    expect(polygonFault([[0, 0], [4, 4], [4, 0], [0, 4]])).toBe('the outline crosses itself: the edges from points 0 and 2 meet');
  });

  it('finds an outline that touches itself at a corner', () => {
    expect(polygonFault([[0, 0], [4, 0], [4, 4], [2, 0], [0, 4]])).toContain('crosses itself');
  });

  it('finds an edge that runs back along the one before', () => {
    expect(polygonFault([[0, 0], [4, 0], [2, 0], [2, 3]])).toContain('crosses itself');
  });

  it('finds repeated points and points on one line', () => {
    expect(polygonFault([[0, 0], [4, 0], [4, 0], [0, 3]])).toBe('points 1 and 2 are the same');
    expect(polygonFault([[0, 0], [1, 1], [2, 2]])).toMatch(/crosses itself|one line/);
  });

  it('allows three points on one straight edge', () => {
    expect(polygonFault([[0, 0], [2, 0], [4, 0], [4, 3]])).toBeUndefined();
  });
});
