import type { CutFigure } from './cut-figure';
import type { CutWindow } from './cut-plot-drawing';

const SMALLEST_SPAN_DEG = 0.5;

export function wholeCut(figure: CutFigure): CutWindow {
  return { fromDeg: figure.fromDeg, toDeg: figure.toDeg, floorDb: figure.floorDb, topDb: figure.topDb };
}

/** Larger or smaller in angle about one angle; null when it would show the whole cut again. */
export function zoomedCut(figure: CutFigure, window: CutWindow, aboutDeg: number, times: number): CutWindow | null {
  const span = window.toDeg - window.fromDeg;
  const wanted = Math.max(SMALLEST_SPAN_DEG, span / times);
  if (wanted >= figure.toDeg - figure.fromDeg) return null;
  const from = aboutDeg - ((aboutDeg - window.fromDeg) / span) * wanted;
  return { ...window, ...heldWithin(figure, from, wanted) };
}

/** The window moved by a part of its own width. */
export function movedCut(figure: CutFigure, window: CutWindow, part: number): CutWindow {
  const span = window.toDeg - window.fromDeg;
  return { ...window, ...heldWithin(figure, window.fromDeg + part * span, span) };
}

function heldWithin(figure: CutFigure, fromDeg: number, spanDeg: number): Pick<CutWindow, 'fromDeg' | 'toDeg'> {
  const from = Math.max(figure.fromDeg, Math.min(figure.toDeg - spanDeg, fromDeg));
  return { fromDeg: from, toDeg: from + spanDeg };
}

/** What the plot library says after a box was drawn or the plot was dragged; undefined when it is of something else. */
export function windowOfRelayout(event: Readonly<Record<string, unknown>>, before: CutWindow): CutWindow | null | undefined {
  if (event['xaxis.autorange'] === true || event['yaxis.autorange'] === true) return null;
  const read = (key: string, otherwise: number): number => (typeof event[key] === 'number' ? event[key] : otherwise);
  const after = {
    fromDeg: read('xaxis.range[0]', before.fromDeg),
    toDeg: read('xaxis.range[1]', before.toDeg),
    floorDb: read('yaxis.range[0]', before.floorDb),
    topDb: read('yaxis.range[1]', before.topDb),
  };
  const same = after.fromDeg === before.fromDeg && after.toDeg === before.toDeg && after.floorDb === before.floorDb && after.topDb === before.topDb;
  return same ? undefined : after;
}
