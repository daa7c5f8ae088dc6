import type { Panel } from '../../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { latticeDetail } from './lattice-detail';
import { panelDrawing } from './panel-drawing';

const { panel } = STARTING_DESIGN;
const space = { width: 476, height: 456 };
const squares = (path: string | null): number => (path?.match(/z/g) ?? []).length;

describe('panelDrawing', () => {
  it('draws every cell of the starting panel, to one scale in both directions', () => {
    const drawing = panelDrawing(panel, space);
    expect(squares(drawing.cells)).toBe(1600);
    expect(drawing.pixelsPerMm).toBe(2);
    expect(drawing.outline).toBe('M56 36H456V436H56Z');
    expect(drawing.origin).toEqual({ x: 256, y: 236 });
  });

  it('writes the lengths of the fields at its dimension lines', () => {
    const wide: Panel = { ...panel, outline: { kind: 'ellipse', widthMm: 300.5, heightMm: 150 } };
    expect(panelDrawing(wide, space).dimensions.map(({ text }) => text)).toEqual(['300.5', '150']);
  });

  it('has as many pixels between the ends of a dimension as the scale says', () => {
    const { dimensions, pixelsPerMm } = panelDrawing({ ...panel, outline: { kind: 'rectangle', widthMm: 120, heightMm: 80 } }, space);
    const [from, to] = (dimensions[0].line.match(/M([\d.]+) [\d.]+H([\d.]+)/) ?? []).slice(1).map(Number);
    expect(to - from).toBeCloseTo(120 * pixelsPerMm, 1);
  });

  it('draws keep-outs where their centre says and leaves their cells out', () => {
    const holed: Panel = { ...panel, keepOuts: [{ kind: 'rectangle', widthMm: 20, heightMm: 20, centreMm: [50, 0] }] };
    const drawing = panelDrawing(holed, space);
    expect(drawing.keepOuts).toEqual(['M336 216H376V256H336Z']);
    expect(squares(drawing.cells)).toBe(1600 - 16);
  });

  it('draws a polygon through its corners, y upwards', () => {
    const triangle: Panel = { ...panel, outline: { kind: 'polygon', pointsMm: [[-100, -100], [100, -100], [0, 100]] } };
    expect(panelDrawing(triangle, space).outline).toBe('M56 436L456 436L256 36Z');
  });

  it('draws the outline alone where the cells would blur or are too many', () => {
    expect(panelDrawing({ ...panel, lattice: { kind: 'rectangular', periodXMm: 0.5, periodYMm: 0.5 } }, space).cells).toBeNull();
  });

  it('draws the outline alone of a polygon that crosses itself', () => {
    const bow: Panel = { ...panel, outline: { kind: 'polygon', pointsMm: [[-100, -100], [100, 100], [100, -100], [-100, 100]] } };
    expect(panelDrawing(bow, space).cells).toBeNull();
  });
});

describe('latticeDetail', () => {
  it('shows both periods of a rectangular lattice', () => {
    const detail = latticeDetail({ kind: 'rectangular', periodXMm: 5, periodYMm: 4.5 }, 160);
    expect(detail.dimensions.map(({ text }) => text)).toEqual(['5', '4.5']);
    expect(squares(detail.cells)).toBe(9);
  });

  it('staggers the second row of a triangular lattice by half a period', () => {
    const detail = latticeDetail({ kind: 'triangular', periodXMm: 5, rowSpacingMm: 4.33 }, 160);
    const starts = [...detail.cells.matchAll(/M([\d.]+) /g)].map(([, x]) => Number(x));
    const period = starts[1] - starts[0];
    expect(starts[3] - starts[0]).toBeCloseTo(period / 2, 1);
    expect(starts[6]).toBe(starts[0]);
  });

  it('tells its enlargement against life size', () => {
    const detail = latticeDetail({ kind: 'rectangular', periodXMm: 5, periodYMm: 5 }, 160);
    // 3 periods of 5 mm fill 106 pixels; 15 mm are 56.69 pixels at 96 to the inch.
    expect(detail.enlargement).toBeCloseTo(106 / 56.693, 2);
  });
});
