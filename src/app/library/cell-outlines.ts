import type { CellEntry, CellShape, FamilyDescription, ShapeLength } from '../../../shared/model/cell-family';

export interface CellOutline {
  /** SVG path in pixels, even-odd. */
  readonly path: string;
  readonly hole: boolean;
}

export interface CellOutlines {
  readonly width: number;
  readonly height: number;
  readonly shapes: readonly CellOutline[];
}

/** The shapes of a family with the parameters of one cell put in, centred in its period, the longer side `side` pixels. */
export function cellOutlines(description: FamilyDescription, cell: CellEntry, side: number): CellOutlines {
  const scale = side / Math.max(description.periodXMm, description.periodYMm);
  const [width, height] = [description.periodXMm * scale, description.periodYMm * scale];
  const length = (value: ShapeLength): number => lengthMm(description, cell, value) * scale;
  const shapes = description.shapes.map((shape) => ({ path: pathOf(shape, { x: width / 2, y: height / 2 }, length), hole: 'hole' in shape && shape.hole === true }));
  return { width, height, shapes };
}

/** The value of a length of a shape: a number, or a parameter times a factor plus a constant. */
export function lengthMm({ parameters }: FamilyDescription, cell: CellEntry, value: ShapeLength): number {
  if (typeof value === 'number') return value;
  const index = parameters.findIndex(({ id }) => id === value.parameter);
  return (cell.parametersMm[index] ?? 0) * value.factor + (value.plusMm ?? 0);
}

function pathOf(shape: CellShape, centre: { x: number; y: number }, length: (value: ShapeLength) => number): string {
  if (shape.kind === 'rectangle') return rectangle(centre, length(shape.widthMm), length(shape.heightMm));
  if (shape.kind === 'ring') {
    const outer = length(shape.outerMm);
    const inner = outer - 2 * length(shape.stripMm);
    return rectangle(centre, outer, outer) + (inner > 0 ? rectangle(centre, inner, inner) : '');
  }
  const radius = length(shape.diameterMm) / 2;
  return `M${centre.x - radius} ${centre.y}a${radius} ${radius} 0 1 0 ${2 * radius} 0a${radius} ${radius} 0 1 0 ${-2 * radius} 0Z`;
}

const rectangle = ({ x, y }: { x: number; y: number }, width: number, height: number): string => `M${x - width / 2} ${y - height / 2}h${width}v${height}h${-width}Z`;
