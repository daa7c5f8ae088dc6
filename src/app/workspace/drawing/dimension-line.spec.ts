import { horizontalDimension, millimetreText, uprightDimension } from './dimension-line';

describe('dimension lines', () => {
  it('run between the measured ends, with the figure above the middle', () => {
    const dimension = horizontalDimension({ fromX: 10, toX: 110, edgeY: 50, lineY: 30, text: '100' });
    expect(dimension.line).toBe('M10 30H110');
    expect(dimension.textAt).toEqual({ x: 60, y: 26 });
    expect(dimension.textTurnDeg).toBe(0);
  });

  it('keep their extension lines off the edge and past the line, on either side', () => {
    expect(horizontalDimension({ fromX: 10, toX: 110, edgeY: 50, lineY: 30, text: '' }).extensions).toBe('M10 47V26M110 47V26');
    expect(horizontalDimension({ fromX: 10, toX: 110, edgeY: 50, lineY: 80, text: '' }).extensions).toBe('M10 53V84M110 53V84');
  });

  it('turn an upright figure so that it reads from the right', () => {
    const dimension = uprightDimension({ fromY: 0, toY: 80, edgeX: 100, lineX: 80, text: '80' });
    expect(dimension).toMatchObject({ line: 'M80 0V80', textAt: { x: 76, y: 40 }, textTurnDeg: -90 });
  });

  it('print millimetres with two decimals at most', () => {
    expect([millimetreText(200), millimetreText(4.33013), millimetreText(-60.5)]).toEqual(['200', '4.33', '−60.5']);
  });
});
