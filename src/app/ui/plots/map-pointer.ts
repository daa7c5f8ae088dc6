import { draggedBy, panelXMm, panelYMm, zoomedAbout } from './map-view';
import type { MapView, MapZoom } from './map-view';
import type { MapExtent } from './map-places';

/** What a pointer did to the map. */
export type MapPointerDeed =
  | { readonly kind: 'zoomed'; readonly zoom: MapZoom }
  | { readonly kind: 'selecting'; readonly area: MapExtent }
  | { readonly kind: 'hovered'; readonly xMm: number; readonly yMm: number }
  | { readonly kind: 'chosen'; readonly xMm: number; readonly yMm: number }
  | { readonly kind: 'none' };

export interface PointerAt {
  readonly id: number;
  readonly xPx: number;
  readonly yPx: number;
}

interface Press {
  readonly at: PointerAt;
  readonly view: MapView;
  readonly selects: boolean;
}

const NOTHING: MapPointerDeed = { kind: 'none' };
/** A press that moves less than this is a click. */
const CLICK_PX = 4;

/** Turns pointer events into deeds: one pointer drags or selects, two pinch, a still one chooses. */
export class MapPointer {
  private readonly down = new Map<number, PointerAt>();
  private press: Press | null = null;
  private moved = false;

  constructor(private readonly extent: () => MapExtent) {}

  pressed(at: PointerAt, view: MapView, selects: boolean): void {
    this.down.set(at.id, at);
    this.press = { at, view, selects };
    this.moved = this.down.size > 1;
  }

  movedTo(at: PointerAt, view: MapView): MapPointerDeed {
    const before = this.down.get(at.id);
    if (!before || !this.press) return this.hover(at, view);
    this.down.set(at.id, at);
    if (this.down.size > 1) return this.pinch(before, at, view);
    if (Math.hypot(at.xPx - this.press.at.xPx, at.yPx - this.press.at.yPx) >= CLICK_PX) this.moved = true;
    if (!this.moved) return NOTHING;
    if (this.press.selects) return { kind: 'selecting', area: areaBetween(view, this.press.at, at) };
    return { kind: 'zoomed', zoom: draggedBy(this.extent(), this.press.view, at.xPx - this.press.at.xPx, at.yPx - this.press.at.yPx) };
  }

  released(at: PointerAt, view: MapView): MapPointerDeed {
    const click = this.down.has(at.id) && !this.moved;
    this.forget(at.id);
    return click ? { kind: 'chosen', xMm: panelXMm(view, at.xPx), yMm: panelYMm(view, at.yPx) } : NOTHING;
  }

  /** A pointer that left or was taken over by the browser. */
  forget(id: number): void {
    this.down.delete(id);
    if (this.down.size === 0) this.press = null;
  }

  private hover(at: PointerAt, view: MapView): MapPointerDeed {
    return { kind: 'hovered', xMm: panelXMm(view, at.xPx), yMm: panelYMm(view, at.yPx) };
  }

  private pinch(before: PointerAt, now: PointerAt, view: MapView): MapPointerDeed {
    const other = [...this.down.values()].find(({ id }) => id !== now.id);
    if (!other) return NOTHING;
    const apart = (one: PointerAt): number => Math.max(1, Math.hypot(one.xPx - other.xPx, one.yPx - other.yPx));
    const middle = { xPx: (now.xPx + other.xPx) / 2, yPx: (now.yPx + other.yPx) / 2 };
    return { kind: 'zoomed', zoom: zoomedAbout(this.extent(), view, middle, apart(now) / apart(before)) };
  }
}

function areaBetween(view: MapView, one: PointerAt, other: PointerAt): MapExtent {
  const [x1, x2] = [panelXMm(view, one.xPx), panelXMm(view, other.xPx)];
  const [y1, y2] = [panelYMm(view, one.yPx), panelYMm(view, other.yPx)];
  return { fromXMm: Math.min(x1, x2), toXMm: Math.max(x1, x2), fromYMm: Math.min(y1, y2), toYMm: Math.max(y1, y2) };
}
