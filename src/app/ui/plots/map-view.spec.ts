import { draggedBy, fittingZoom, panelXMm, panelYMm, screenX, screenY, showing, viewOf, visibleExtent, zoomedAbout } from './map-view';

const extent = { fromXMm: -100, toXMm: 100, fromYMm: -50, toYMm: 50 };
const size = { width: 400, height: 300 };

describe('map view', () => {
  const fitted = viewOf(extent, size, null);

  it('fits the whole panel into the window, y upwards', () => {
    expect(fitted.pxPerMm).toBe(2);
    expect([screenX(fitted, -100), screenX(fitted, 100), screenY(fitted, 50), screenY(fitted, -50)]).toEqual([0, 400, 50, 250]);
  });

  it('finds the point of the panel under a pixel', () => {
    const view = viewOf(extent, size, { centreXMm: 20, centreYMm: 5, factor: 3 });
    expect(panelXMm(view, screenX(view, 31.25))).toBeCloseTo(31.25, 10);
    expect(panelYMm(view, screenY(view, -7.5))).toBeCloseTo(-7.5, 10);
  });

  it('keeps the point under the pointer while zooming', () => {
    const at = { xPx: 300, yPx: 120 };
    const zoomed = viewOf(extent, size, zoomedAbout(extent, fitted, at, 4));
    expect(panelXMm(zoomed, at.xPx)).toBeCloseTo(panelXMm(fitted, at.xPx), 9);
    expect(panelYMm(zoomed, at.yPx)).toBeCloseTo(panelYMm(fitted, at.yPx), 9);
  });

  it('goes back to the fitting view when zoomed out too far', () => {
    expect(zoomedAbout(extent, fitted, { xPx: 10, yPx: 10 }, 0.1)).toEqual(fittingZoom(extent));
  });

  it('cannot be dragged off the panel', () => {
    const view = viewOf(extent, size, { centreXMm: 0, centreYMm: 0, factor: 2 });
    const dragged = viewOf(extent, size, draggedBy(extent, view, 10_000, 0));
    expect(visibleExtent(dragged).fromXMm).toBeCloseTo(-100, 9);
    expect(visibleExtent(dragged).toXMm).toBeCloseTo(0, 9);
  });

  it('moves just far enough to show a cell', () => {
    const view = viewOf(extent, size, { centreXMm: 0, centreYMm: 0, factor: 2 });
    expect(showing(extent, view, { xMm: 10, yMm: 0 })).toEqual({ centreXMm: 0, centreYMm: 0, factor: 2 });
    expect(showing(extent, view, { xMm: 60, yMm: 0 }).centreXMm).toBeCloseTo(20, 9);
  });
});
