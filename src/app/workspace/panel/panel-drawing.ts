import { outlineBounds } from '../../../../shared/antenna/outline';
import { panelLattice } from '../../../../shared/antenna/panel-lattice';
import { polygonFault } from '../../../../shared/antenna/polygon-fault';
import { cellCountUpperBound } from '../../../../shared/antenna/cell-count';
import { siPanel } from '../../../../shared/antenna/si-design';
import type { SiOutline } from '../../../../shared/antenna/si-design';
import type { Panel } from '../../../../shared/model/design-document';
import { horizontalDimension, millimetreText, uprightDimension } from '../drawing/dimension-line';
import type { DimensionLine, DrawnPoint } from '../drawing/dimension-line';

/** A panel seen from its outward side, to scale, in pixels. */
export interface PanelDrawing {
  readonly width: number;
  readonly height: number;
  readonly pixelsPerMm: number;
  readonly outline: string;
  readonly keepOuts: readonly string[];
  /** The cells as squares, or null where they are too many or too small to be drawn one by one. */
  readonly cells: string | null;
  readonly origin: DrawnPoint;
  readonly dimensions: readonly DimensionLine[];
}

const MARGIN = { left: 56, right: 20, top: 36, bottom: 20 };
/** More squares than this are no drawing but a grey tone. */
const MOST_CELLS_DRAWN = 12_000;
const SMALLEST_CELL_PX = 2.5;
/** Side of a drawn cell against its period. */
const CELL_FILL = 0.72;

export function panelDrawing(panel: Panel, space: { readonly width: number; readonly height: number }): PanelDrawing {
  const si = siPanel(panel);
  const bounds = outlineBounds(si.outline);
  const widthMm = (bounds.rightM - bounds.leftM) * 1000;
  const heightMm = (bounds.topM - bounds.bottomM) * 1000;
  const pixelsPerMm = Math.min((space.width - MARGIN.left - MARGIN.right) / widthMm, (space.height - MARGIN.top - MARGIN.bottom) / heightMm);
  const height = heightMm * pixelsPerMm + MARGIN.top + MARGIN.bottom;
  const left = MARGIN.left + (space.width - MARGIN.left - MARGIN.right - widthMm * pixelsPerMm) / 2;
  const toX = (xM: number): number => left + (xM - bounds.leftM) * 1000 * pixelsPerMm;
  const toY = (yM: number): number => MARGIN.top + (bounds.topM - yM) * 1000 * pixelsPerMm;
  const place: Placing = { toX, toY };
  return {
    width: space.width,
    height,
    pixelsPerMm,
    outline: outlinePath(si.outline, place),
    keepOuts: si.keepOuts.map((keepOut) => outlinePath(keepOut, place)),
    cells: cellSquares(panel, place, pixelsPerMm),
    origin: { x: toX(0), y: toY(0) },
    dimensions: [
      horizontalDimension({ fromX: toX(bounds.leftM), toX: toX(bounds.rightM), edgeY: MARGIN.top, lineY: MARGIN.top - 16, text: millimetreText(widthMm) }),
      uprightDimension({ fromY: toY(bounds.topM), toY: toY(bounds.bottomM), edgeX: left, lineX: left - 18, text: millimetreText(heightMm) }),
    ],
  };
}

interface Placing {
  toX(xM: number): number;
  toY(yM: number): number;
}

const n = (value: number): string => String(Math.round(value * 100) / 100);

function outlinePath(outline: SiOutline, { toX, toY }: Placing): string {
  if (outline.kind === 'polygon') {
    return `M${outline.points.map((point) => `${n(toX(point.xM))} ${n(toY(point.yM))}`).join('L')}Z`;
  }
  const { leftM, rightM, bottomM, topM } = outlineBounds(outline);
  if (outline.kind === 'rectangle') return `M${n(toX(leftM))} ${n(toY(topM))}H${n(toX(rightM))}V${n(toY(bottomM))}H${n(toX(leftM))}Z`;
  const radiusX = n((toX(rightM) - toX(leftM)) / 2);
  const radiusY = n((toY(bottomM) - toY(topM)) / 2);
  const arc = (x: number): string => `A${radiusX} ${radiusY} 0 0 1 ${n(x)} ${n(toY(outline.centre.yM))}`;
  return `M${n(toX(leftM))} ${n(toY(outline.centre.yM))}${arc(toX(rightM))}${arc(toX(leftM))}Z`;
}

function cellSquares(panel: Panel, { toX, toY }: Placing, pixelsPerMm: number): string | null {
  if (panel.outline.kind === 'polygon' && polygonFault(panel.outline.pointsMm)) return null;
  if (cellCountUpperBound(panel) > MOST_CELLS_DRAWN) return null;
  const lattice = panelLattice(siPanel(panel));
  const side = CELL_FILL * Math.min(lattice.grid.stepXM, lattice.grid.stepYM) * 1000 * pixelsPerMm;
  if (side < SMALLEST_CELL_PX * CELL_FILL) return null;
  let squares = '';
  for (let i = 0; i < lattice.count; i += 1) {
    squares += `M${n(toX(lattice.xM[i]) - side / 2)} ${n(toY(lattice.yM[i]) - side / 2)}h${n(side)}v${n(side)}h${n(-side)}z`;
  }
  return squares;
}
