import { MapPointer } from './map-pointer';
import { viewOf } from './map-view';

const extent = { fromXMm: -100, toXMm: 100, fromYMm: -100, toYMm: 100 };
const size = { width: 400, height: 400 };
const zoomedView = viewOf(extent, size, { centreXMm: 0, centreYMm: 0, factor: 4 });
const whole = viewOf(extent, size, null);
const at = (xPx: number, yPx: number, id = 1) => ({ id, xPx, yPx });

describe('MapPointer', () => {
  it('hovers without a press', () => {
    expect(new MapPointer(() => extent).movedTo(at(300, 100), whole)).toEqual({ kind: 'hovered', xMm: 50, yMm: 50 });
  });

  it('chooses what a still press lets go of', () => {
    const pointer = new MapPointer(() => extent);
    pointer.pressed(at(200, 200), whole, false);
    expect(pointer.movedTo(at(202, 201), whole)).toEqual({ kind: 'none' });
    expect(pointer.released(at(202, 201), whole)).toEqual({ kind: 'chosen', xMm: 1, yMm: -0.5 });
  });

  it('drags the map with the pointer', () => {
    const pointer = new MapPointer(() => extent);
    pointer.pressed(at(200, 200), zoomedView, false);
    expect(pointer.movedTo(at(240, 200), zoomedView)).toEqual({ kind: 'zoomed', zoom: { centreXMm: -5, centreYMm: 0, factor: 4 } });
    expect(pointer.released(at(240, 200), zoomedView)).toEqual({ kind: 'none' });
  });

  it('spans a selection whichever way it is drawn', () => {
    const pointer = new MapPointer(() => extent);
    pointer.pressed(at(300, 300), whole, true);
    expect(pointer.movedTo(at(100, 200), whole)).toEqual({ kind: 'selecting', area: { fromXMm: -50, toXMm: 50, fromYMm: -50, toYMm: 0 } });
  });

  it('zooms by two fingers as they part, and chooses nothing afterwards', () => {
    const pointer = new MapPointer(() => extent);
    pointer.pressed(at(150, 200, 1), whole, false);
    pointer.pressed(at(250, 200, 2), whole, false);
    const deed = pointer.movedTo(at(350, 200, 2), whole);
    expect(deed).toMatchObject({ kind: 'zoomed', zoom: { factor: 2 } });
    pointer.forget(1);
    expect(pointer.released(at(350, 200, 2), whole)).toEqual({ kind: 'none' });
  });
});
