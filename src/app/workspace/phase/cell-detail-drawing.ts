import { copperPath } from '../../ui/plots/copper-shape';
import type { CopperShape } from '../../ui/plots/copper-shape';
import type { PlaceIndex } from '../../ui/plots/map-places';
import { numberText } from '../../ui/plots/plot-text';

/** The chosen cell with its neighbours in a circle, to scale, in pixels of a box. */
export interface CellDetailDrawing {
  readonly width: number;
  readonly height: number;
  readonly centreX: number;
  readonly centreY: number;
  readonly radius: number;
  readonly pxPerMm: number;
  readonly outlines: readonly { readonly x: number; readonly y: number; readonly width: number; readonly height: number; readonly own: boolean }[];
  readonly copper: readonly { readonly path: string; readonly hole: boolean }[];
  readonly across: DetailDimension | null;
  readonly down: DetailDimension | null;
  /** The period in y. */
  readonly period: DetailDimension;
  readonly strip: { readonly x: number; readonly y: number; readonly text: string } | null;
}

/** From one edge to the other along its axis, in pixels. */
export interface DetailDimension {
  readonly from: number;
  readonly to: number;
  readonly text: string;
}

const WIDTH = 268;
const HEIGHT = 196;
const RADIUS = 78;
/** Share of a period that the radius of the circle shows. */
const SHOWN = 0.82;

export interface DetailSource {
  readonly index: PlaceIndex;
  readonly cell: number;
  readonly copperOf: (cell: number) => readonly CopperShape[];
}

export function cellDetailDrawing({ index, cell, copperOf }: DetailSource): CellDetailDrawing {
  const { xMm, yMm, pitchXMm, pitchYMm } = index.places;
  const pxPerMm = RADIUS / (SHOWN * Math.max(pitchXMm, pitchYMm));
  const [centreX, centreY] = [WIDTH / 2 - 6, HEIGHT / 2 + 8];
  const reach = RADIUS / pxPerMm;
  const shown = index.cellsWithin({
    fromXMm: xMm[cell] - reach - pitchXMm / 2,
    toXMm: xMm[cell] + reach + pitchXMm / 2,
    fromYMm: yMm[cell] - reach - pitchYMm / 2,
    toYMm: yMm[cell] + reach + pitchYMm / 2,
  });
  const placeOf = (one: number) => ({ xPx: centreX + (xMm[one] - xMm[cell]) * pxPerMm, yPx: centreY - (yMm[one] - yMm[cell]) * pxPerMm, pxPerMm });
  const [w, h] = [pitchXMm * pxPerMm, pitchYMm * pxPerMm];
  return {
    ...{ width: WIDTH, height: HEIGHT, centreX, centreY, radius: RADIUS, pxPerMm },
    outlines: Array.from(shown, (one) => ({ x: placeOf(one).xPx - w / 2, y: placeOf(one).yPx - h / 2, width: w, height: h, own: one === cell })),
    copper: Array.from(shown).flatMap((one) => copperOf(one).map((shape) => ({ path: copperPath(shape, placeOf(one)), hole: shape.kind !== 'ring' && shape.hole }))),
    period: { from: centreY - h / 2, to: centreY + h / 2, text: numberText(pitchYMm, 2) },
    ...shapeDimensions(copperOf(cell), { centreX, centreY, pxPerMm }),
  };
}

type ShapeDimensions = Pick<CellDetailDrawing, 'across' | 'down' | 'strip'>;

/** The outermost shape is measured across, the one inside it (or its height) down, the strip of a ring by a leader. */
function shapeDimensions(shapes: readonly CopperShape[], at: { readonly centreX: number; readonly centreY: number; readonly pxPerMm: number }): ShapeDimensions {
  const { centreX, centreY, pxPerMm } = at;
  if (shapes.length === 0) return { across: null, down: null, strip: null };
  const outer = shapes.reduce((widest, shape) => (widthMm(shape) > widthMm(widest) ? shape : widest));
  const others = shapes.filter((shape) => shape !== outer);
  const inner = others.length > 0 ? others.reduce((widest, shape) => (widthMm(shape) > widthMm(widest) ? shape : widest)) : null;
  const span = (centre: number, lengthMm: number) => ({ from: centre - (lengthMm * pxPerMm) / 2, to: centre + (lengthMm * pxPerMm) / 2 });
  const downMm = inner ? heightMm(inner) : heightMm(outer);
  const ring = shapes.find((shape) => shape.kind === 'ring');
  return {
    across: { ...span(centreX, widthMm(outer)), text: numberText(widthMm(outer), 2) },
    down: inner || outer.kind === 'rectangle' ? { ...span(centreY, downMm), text: numberText(downMm, 3) } : null,
    strip: ring ? { x: centreX + ((ring.outerMm - ring.stripMm) * pxPerMm) / 2, y: centreY + (ring.outerMm * pxPerMm) / 2 - Math.min(10, ring.outerMm * pxPerMm * 0.2), text: numberText(ring.stripMm, 2) } : null,
  };
}

function widthMm(shape: CopperShape): number {
  return shape.kind === 'rectangle' ? shape.widthMm : shape.kind === 'ring' ? shape.outerMm : shape.diameterMm;
}

function heightMm(shape: CopperShape): number {
  return shape.kind === 'rectangle' ? shape.heightMm : widthMm(shape);
}
