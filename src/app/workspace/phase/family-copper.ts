import type { CellShape, FamilyDescription, ShapeLength } from '../../../../shared/model/cell-family';
import type { CopperShape } from '../../ui/plots/copper-shape';

/** The copper of one cell of a family: its shapes with the parameters of that cell put in. */
export function familyCopper(description: FamilyDescription, parametersMm: readonly number[]): readonly CopperShape[] {
  const length = (of: ShapeLength): number => lengthMm(of, description, parametersMm);
  return description.shapes.map((shape) => copperShape(shape, length));
}

function copperShape(shape: CellShape, length: (of: ShapeLength) => number): CopperShape {
  switch (shape.kind) {
    case 'rectangle':
      return { kind: 'rectangle', widthMm: length(shape.widthMm), heightMm: length(shape.heightMm), hole: shape.hole ?? false };
    case 'ring':
      return { kind: 'ring', outerMm: length(shape.outerMm), stripMm: length(shape.stripMm) };
    case 'disc':
      return { kind: 'disc', diameterMm: length(shape.diameterMm), hole: shape.hole ?? false };
  }
}

/** "0.62 L" of a cell; never below nothing. */
function lengthMm(length: ShapeLength, description: FamilyDescription, parametersMm: readonly number[]): number {
  if (typeof length === 'number') return length;
  const at = description.parameters.findIndex(({ id }) => id === length.parameter);
  const value = at < 0 ? 0 : (parametersMm[at] ?? 0);
  return Math.max(0, length.factor * value + (length.plusMm ?? 0));
}
