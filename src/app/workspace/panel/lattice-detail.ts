import type { Lattice } from '../../../../shared/model/design-document';
import { horizontalDimension, millimetreText, uprightDimension } from '../drawing/dimension-line';
import type { DimensionLine } from '../drawing/dimension-line';

/** A few cells of the lattice, enlarged, with the lengths that repeat. */
export interface LatticeDetail {
  readonly width: number;
  readonly height: number;
  readonly cells: string;
  readonly dimensions: readonly DimensionLine[];
  /** How many times larger than life, for a screen of 96 pixels per inch. */
  readonly enlargement: number;
}

const ROWS = 3;
const MARGIN = { left: 44, top: 34, right: 10, bottom: 10 };
const CELL_FILL = 0.72;
const PIXELS_PER_MM_AT_LIFE_SIZE = 96 / 25.4;

export function latticeDetail(lattice: Lattice, size: number): LatticeDetail {
  const stepX = lattice.periodXMm;
  const stepY = lattice.kind === 'rectangular' ? lattice.periodYMm : lattice.rowSpacingMm;
  const across = lattice.kind === 'triangular' ? ROWS + 0.5 : ROWS;
  const scale = Math.min((size - MARGIN.left - MARGIN.right) / (across * stepX), (size - MARGIN.top - MARGIN.bottom) / (ROWS * stepY));
  const side = CELL_FILL * Math.min(stepX, stepY) * scale;
  const shift = (row: number): number => (lattice.kind === 'triangular' && row % 2 === 1 ? 0.5 : 0);
  const x = (column: number, row: number): number => MARGIN.left + (column + 0.5 + shift(row)) * stepX * scale;
  const y = (row: number): number => MARGIN.top + (row + 0.5) * stepY * scale;
  let cells = '';
  for (let row = 0; row < ROWS; row += 1) {
    for (let column = 0; column < ROWS; column += 1) cells += square(x(column, row), y(row), side);
  }
  const topEdge = y(0) - side / 2;
  const leftEdge = x(0, 0) - side / 2;
  return {
    width: size,
    height: y(ROWS - 1) + side / 2 + MARGIN.bottom,
    cells,
    enlargement: scale / PIXELS_PER_MM_AT_LIFE_SIZE,
    dimensions: [
      horizontalDimension({ fromX: x(0, 0), toX: x(1, 0), edgeY: topEdge, lineY: MARGIN.top - 14, text: millimetreText(stepX) }),
      uprightDimension({ fromY: y(0), toY: y(1), edgeX: leftEdge, lineX: MARGIN.left - 18, text: millimetreText(stepY) }),
    ],
  };
}

function square(x: number, y: number, side: number): string {
  const n = (value: number): string => String(Math.round(value * 100) / 100);
  return `M${n(x - side / 2)} ${n(y - side / 2)}h${n(side)}v${n(side)}h${n(-side)}z`;
}
