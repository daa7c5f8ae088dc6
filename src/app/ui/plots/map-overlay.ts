import { niceStep, ticksBetween } from './axis-ticks';
import type { MapExtent, PlaceIndex } from './map-places';
import { screenX, screenY, visibleExtent } from './map-view';
import type { MapView } from './map-view';
import { digitsOfStep, numberText } from './plot-text';

/** Room around the window for rulers and dimension lines. */
export interface MapMargins {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export const RULED_MARGINS: MapMargins = { left: 34, top: 26, right: 34, bottom: 22 };
/** On a narrow screen the map takes the whole width. */
export const BARE_MARGINS: MapMargins = { left: 1, top: 1, right: 1, bottom: 1 };

export interface RulerTick {
  readonly at: number;
  readonly text: string;
}

export interface MapBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Millimetre ticks along the lower and right edge of the window, in pixels of the window. */
export function mapRulers(view: MapView): { readonly x: readonly RulerTick[]; readonly y: readonly RulerTick[] } {
  const seen = visibleExtent(view);
  // One step for both edges, so that a square looks square.
  const step = niceStep(Math.max(seen.toXMm - seen.fromXMm, seen.toYMm - seen.fromYMm), 5);
  const digits = digitsOfStep(step);
  return {
    x: ticksBetween(seen.fromXMm, seen.toXMm, step).map((mm) => ({ at: screenX(view, mm), text: numberText(mm, digits) })),
    y: ticksBetween(seen.fromYMm, seen.toYMm, step).map((mm) => ({ at: screenY(view, mm), text: numberText(mm, digits) })),
  };
}

/** The outline of a cell in the window, or null when it lies outside. */
export function cellBox(index: PlaceIndex, view: MapView, cell: number): MapBox | null {
  const { xMm, yMm, pitchXMm, pitchYMm } = index.places;
  if (cell < 0 || cell >= xMm.length) return null;
  const box = extentBox(view, {
    fromXMm: xMm[cell] - pitchXMm / 2,
    toXMm: xMm[cell] + pitchXMm / 2,
    fromYMm: yMm[cell] - pitchYMm / 2,
    toYMm: yMm[cell] + pitchYMm / 2,
  });
  const [midX, midY] = [box.x + box.width / 2, box.y + box.height / 2];
  return midX < 0 || midY < 0 || midX > view.size.width || midY > view.size.height ? null : widened(box);
}

/** A mark must be seen however small the cell. */
function widened(box: MapBox): MapBox {
  const smallest = 8;
  const [growX, growY] = [Math.max(0, smallest - box.width), Math.max(0, smallest - box.height)];
  return { x: box.x - growX / 2, y: box.y - growY / 2, width: box.width + growX, height: box.height + growY };
}

export function extentBox(view: MapView, extent: MapExtent): MapBox {
  const x = screenX(view, extent.fromXMm);
  const y = screenY(view, extent.toYMm);
  return { x, y, width: screenX(view, extent.toXMm) - x, height: screenY(view, extent.fromYMm) - y };
}

export interface ChosenLeader {
  readonly path: string;
  readonly balloonX: number;
  readonly balloonY: number;
  readonly outside: boolean;
}

/** A cell further to the left has its balloon beside it: a leader across the map would hide more than it shows. */
const OUTSIDE_FROM = 0.62;

/** A leader from the chosen cell to a balloon, outside the right edge of the window where that is near. */
export function chosenLeader(box: MapBox, view: MapView): ChosenLeader {
  const startX = Math.min(view.size.width, box.x + box.width + 2);
  const startY = box.y + box.height / 2;
  if (startX < OUTSIDE_FROM * view.size.width) {
    const up = box.y > 44 ? -1 : 1;
    const [balloonX, balloonY] = [startX + 26, startY + up * 30];
    return { path: `M${round(startX)} ${round(startY)}L${round(balloonX)} ${round(balloonY)}`, balloonX, balloonY, outside: false };
  }
  const balloonY = Math.max(12, Math.min(view.size.height - 12, startY > view.size.height * 0.2 ? Math.min(40, startY) : startY));
  const bendX = Math.max(startX, view.size.width - 26);
  return { path: `M${round(startX)} ${round(startY)}L${round(bendX)} ${round(balloonY)}H${round(view.size.width)}`, balloonX: view.size.width + 21, balloonY, outside: true };
}

/** Extent from one cell to another, both included to their edges. */
export function extentOfCells(index: PlaceIndex, one: number, other: number): MapExtent {
  const { xMm, yMm, pitchXMm, pitchYMm } = index.places;
  return {
    fromXMm: Math.min(xMm[one], xMm[other]) - pitchXMm / 2,
    toXMm: Math.max(xMm[one], xMm[other]) + pitchXMm / 2,
    fromYMm: Math.min(yMm[one], yMm[other]) - pitchYMm / 2,
    toYMm: Math.max(yMm[one], yMm[other]) + pitchYMm / 2,
  };
}

/** Scale of the drawing as drawings state it, 1 : n for paper of 96 pixels an inch. */
export function drawingScale(pxPerMm: number): string {
  const cssPxPerMm = 96 / 25.4;
  const ratio = cssPxPerMm / pxPerMm;
  return ratio >= 1 ? `1 : ${scaleDigits(ratio)}` : `${scaleDigits(1 / ratio)} : 1`;
}

function scaleDigits(ratio: number): string {
  return ratio >= 10 ? ratio.toFixed(0) : ratio >= 2 ? ratio.toFixed(1) : ratio.toFixed(2);
}

function round(value: number): number {
  return Math.round(value * 10) / 10;
}
