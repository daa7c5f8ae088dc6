import type { KeepOut, Lattice, Outline } from '../../../../shared/model/design-document';

/** The same size in another shape, so that changing the kind of an outline loses as little as it can. */
export function outlineOfKind(outline: Outline, kind: Outline['kind']): Outline {
  if (outline.kind === kind) return outline;
  const { widthMm, heightMm } = sizeMm(outline);
  if (kind !== 'polygon') return { kind, widthMm, heightMm };
  const [x, y] = [widthMm / 2, heightMm / 2];
  return {
    kind,
    pointsMm: [
      [-x, -y],
      [x, -y],
      [x, y],
      [-x, y],
    ],
  };
}

export function keepOutOfKind(keepOut: KeepOut, kind: KeepOut['kind']): KeepOut {
  return { ...outlineOfKind(keepOut, kind), centreMm: keepOut.centreMm };
}

/** Width and height of the upright rectangle around an outline. */
export function sizeMm(outline: Outline): { readonly widthMm: number; readonly heightMm: number } {
  if (outline.kind !== 'polygon') return outline;
  const spread = (axis: 0 | 1): number => {
    const values = outline.pointsMm.map((point) => point[axis]);
    return tidy(Math.max(...values) - Math.min(...values));
  };
  return { widthMm: spread(0), heightMm: spread(1) };
}

/** Rectangular to triangular keeps the area of a cell when the rows close up to an equilateral triangle. */
export function latticeOfKind(lattice: Lattice, kind: Lattice['kind']): Lattice {
  if (lattice.kind === kind) return lattice;
  const { periodXMm } = lattice;
  return lattice.kind === 'rectangular'
    ? { kind: 'triangular', periodXMm, rowSpacingMm: tidy((periodXMm * Math.sqrt(3)) / 2) }
    : { kind: 'rectangular', periodXMm, periodYMm: periodXMm };
}

function tidy(value: number): number {
  return Math.round(value * 1e4) / 1e4;
}
