import type { MapExtent } from './map-places';

/** A window on the map: which point lies in its middle, and how many times larger than fitting it is drawn. */
export interface MapZoom {
  readonly centreXMm: number;
  readonly centreYMm: number;
  readonly factor: number;
}

export interface MapSize {
  readonly width: number;
  readonly height: number;
}

/** The window in pixels. y grows downwards on the screen and upwards on the panel. */
export interface MapView {
  readonly size: MapSize;
  readonly centreXMm: number;
  readonly centreYMm: number;
  readonly pxPerMm: number;
}

export const LARGEST_ZOOM = 200;

export function fittingZoom(extent: MapExtent): MapZoom {
  return { centreXMm: (extent.fromXMm + extent.toXMm) / 2, centreYMm: (extent.fromYMm + extent.toYMm) / 2, factor: 1 };
}

function fittingPxPerMm(extent: MapExtent, size: MapSize): number {
  const [width, height] = [extent.toXMm - extent.fromXMm, extent.toYMm - extent.fromYMm];
  return width > 0 && height > 0 ? Math.min(size.width / width, size.height / height) : 1;
}

/** The view of a zoom. At factor 1 the whole extent is shown whatever the centre says. */
export function viewOf(extent: MapExtent, size: MapSize, zoom: MapZoom | null): MapView {
  const { centreXMm, centreYMm, factor } = heldWithin(extent, size, zoom ?? fittingZoom(extent));
  return { size, centreXMm, centreYMm, pxPerMm: fittingPxPerMm(extent, size) * factor };
}

export function screenX(view: MapView, xMm: number): number {
  return view.size.width / 2 + (xMm - view.centreXMm) * view.pxPerMm;
}

export function screenY(view: MapView, yMm: number): number {
  return view.size.height / 2 - (yMm - view.centreYMm) * view.pxPerMm;
}

/** Inverse of {@link screenX}. */
export function panelXMm(view: MapView, xPx: number): number {
  return view.centreXMm + (xPx - view.size.width / 2) / view.pxPerMm;
}

/** Inverse of {@link screenY}. */
export function panelYMm(view: MapView, yPx: number): number {
  return view.centreYMm - (yPx - view.size.height / 2) / view.pxPerMm;
}

/** The part of the panel in the window. */
export function visibleExtent(view: MapView): MapExtent {
  return {
    fromXMm: panelXMm(view, 0),
    toXMm: panelXMm(view, view.size.width),
    fromYMm: panelYMm(view, view.size.height),
    toYMm: panelYMm(view, 0),
  };
}

/** Larger or smaller about a point of the window, which stays where it is. */
export function zoomedAbout(extent: MapExtent, view: MapView, at: { readonly xPx: number; readonly yPx: number }, times: number): MapZoom {
  const fit = fittingPxPerMm(extent, view.size);
  const factor = Math.max(1, Math.min(LARGEST_ZOOM, (view.pxPerMm * times) / fit));
  const scale = factor * fit;
  const zoom = {
    centreXMm: panelXMm(view, at.xPx) - (at.xPx - view.size.width / 2) / scale,
    centreYMm: panelYMm(view, at.yPx) + (at.yPx - view.size.height / 2) / scale,
    factor,
  };
  return heldWithin(extent, view.size, zoom);
}

/** The window moved by so many pixels of dragging. */
export function draggedBy(extent: MapExtent, view: MapView, dxPx: number, dyPx: number): MapZoom {
  const zoom = {
    centreXMm: view.centreXMm - dxPx / view.pxPerMm,
    centreYMm: view.centreYMm + dyPx / view.pxPerMm,
    factor: view.pxPerMm / fittingPxPerMm(extent, view.size),
  };
  return heldWithin(extent, view.size, zoom);
}

/** The nearest window of the same size that shows a point with some room around it. */
export function showing(extent: MapExtent, view: MapView, point: { readonly xMm: number; readonly yMm: number }): MapZoom {
  const room = 0.1;
  const halfX = ((0.5 - room) * view.size.width) / view.pxPerMm;
  const halfY = ((0.5 - room) * view.size.height) / view.pxPerMm;
  const zoom = {
    centreXMm: clamp(view.centreXMm, point.xMm - halfX, point.xMm + halfX),
    centreYMm: clamp(view.centreYMm, point.yMm - halfY, point.yMm + halfY),
    factor: view.pxPerMm / fittingPxPerMm(extent, view.size),
  };
  return heldWithin(extent, view.size, zoom);
}

/** Keeps the window on the map: where the map is larger than the window its edge stays outside, otherwise it is centred. */
function heldWithin(extent: MapExtent, size: MapSize, zoom: MapZoom): MapZoom {
  const factor = Math.max(1, Math.min(LARGEST_ZOOM, zoom.factor));
  const scale = fittingPxPerMm(extent, size) * factor;
  return {
    centreXMm: heldCentre(extent.fromXMm, extent.toXMm, size.width / scale, zoom.centreXMm),
    centreYMm: heldCentre(extent.fromYMm, extent.toYMm, size.height / scale, zoom.centreYMm),
    factor,
  };
}

function heldCentre(from: number, to: number, windowMm: number, centre: number): number {
  return windowMm >= to - from ? (from + to) / 2 : clamp(centre, from + windowMm / 2, to - windowMm / 2);
}

function clamp(value: number, low: number, high: number): number {
  return Math.max(low, Math.min(high, value));
}
