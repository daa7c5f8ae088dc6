import type { Outline } from '../../../../shared/model/design-document';
import { keepOutOfKind, latticeOfKind, outlineOfKind, sizeMm } from './outline-choices';

const rectangle: Outline = { kind: 'rectangle', widthMm: 200, heightMm: 150 };

describe('outlineOfKind', () => {
  it('keeps the size through every change of kind', () => {
    const polygon = outlineOfKind(outlineOfKind(rectangle, 'ellipse'), 'polygon');
    expect(polygon).toMatchObject({ kind: 'polygon', pointsMm: [[-100, -75], [100, -75], [100, 75], [-100, 75]] });
    expect(outlineOfKind(polygon, 'rectangle')).toEqual(rectangle);
  });

  it('is the same outline where the kind is the same', () => {
    expect(outlineOfKind(rectangle, 'rectangle')).toBe(rectangle);
  });

  it('measures a polygon by the rectangle around it', () => {
    expect(sizeMm({ kind: 'polygon', pointsMm: [[-10, 0], [30, 5], [0, 20]] })).toEqual({ widthMm: 40, heightMm: 20 });
  });
});

describe('keepOutOfKind', () => {
  it('keeps its centre', () => {
    const keepOut = { kind: 'rectangle', widthMm: 20, heightMm: 10, centreMm: [5, 6] } as const;
    expect(keepOutOfKind({ ...keepOut, centreMm: [5, 6] }, 'ellipse')).toEqual({ kind: 'ellipse', widthMm: 20, heightMm: 10, centreMm: [5, 6] });
  });
});

describe('latticeOfKind', () => {
  it('makes an equilateral lattice of the same period along the rows', () => {
    const triangular = latticeOfKind({ kind: 'rectangular', periodXMm: 5, periodYMm: 5 }, 'triangular');
    expect(triangular).toEqual({ kind: 'triangular', periodXMm: 5, rowSpacingMm: 4.3301 });
    expect(latticeOfKind(triangular, 'rectangular')).toEqual({ kind: 'rectangular', periodXMm: 5, periodYMm: 5 });
  });
});
