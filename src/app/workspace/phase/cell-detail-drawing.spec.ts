import { PlaceIndex } from '../../ui/plots/map-places';
import { cellDetailDrawing } from './cell-detail-drawing';

const index = new PlaceIndex({
  xMm: Float64Array.from({ length: 25 }, (_, i) => 5 * ((i % 5) - 2)),
  yMm: Float64Array.from({ length: 25 }, (_, i) => 5 * (Math.floor(i / 5) - 2)),
  pitchXMm: 5,
  pitchYMm: 5,
});
const copperOf = () => [
  { kind: 'ring', outerMm: 2.3, stripMm: 0.15 } as const,
  { kind: 'rectangle', widthMm: 1.426, heightMm: 1.426, hole: false } as const,
];

describe('detail of a cell', () => {
  const drawing = cellDetailDrawing({ index, cell: 12, copperOf });
  it('shows the cell among its eight neighbours', () => {
    expect(drawing.outlines.filter(({ own }) => own)).toHaveLength(1);
    expect(drawing.outlines).toHaveLength(9);
    expect(drawing.copper).toHaveLength(18);
  });
  it('is to scale: what is dimensioned has its length in pixels', () => {
    expect((drawing.across?.to ?? 0) - (drawing.across?.from ?? 0)).toBeCloseTo(2.3 * drawing.pxPerMm, 9);
    expect(drawing.period.to - drawing.period.from).toBeCloseTo(5 * drawing.pxPerMm, 9);
  });
  it('names outer size, inner size, strip and period', () => {
    expect([drawing.across?.text, drawing.down?.text, drawing.strip?.text, drawing.period.text]).toEqual(['2.30', '1.426', '0.15', '5.00']);
  });
  it('has fewer neighbours in a corner and no dimensions without copper', () => {
    const bare = cellDetailDrawing({ index, cell: 0, copperOf: () => [] });
    expect([bare.outlines.length, bare.across, bare.down, bare.strip]).toEqual([4, null, null, null]);
  });
});
