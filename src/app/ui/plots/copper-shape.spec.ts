import { copperPath, drawCopper } from './copper-shape';
import type { CopperShape } from './copper-shape';

const place = { xPx: 10, yPx: 20, pxPerMm: 2 };

it('writes a ring as two squares so that the even-odd rule leaves its strip', () => {
  expect(copperPath({ kind: 'ring', outerMm: 4, stripMm: 0.5 }, place)).toBe('M6 16h8v8h-8ZM7 17h6v6h-6Z');
});

it('writes a disc as a closed circle of its diameter', () => {
  expect(copperPath({ kind: 'disc', diameterMm: 3, hole: false }, place)).toBe('M7 20a3 3 0 1 0 6 0a3 3 0 1 0 -6 0Z');
});

it('draws copper in order, holes in the colour of the ground, strips never below what a screen shows', () => {
  const drawn: string[] = [];
  const context = {
    fillStyle: '',
    strokeStyle: '',
    lineWidth: 0,
    fillRect(...box: number[]) {
      drawn.push(`fill ${this.fillStyle} ${box.join(' ')}`);
    },
    strokeRect(...box: number[]) {
      drawn.push(`stroke ${this.strokeStyle} ${this.lineWidth} ${box.join(' ')}`);
    },
    beginPath: () => undefined,
    arc: (x: number, y: number, r: number) => drawn.push(`arc ${x} ${y} ${r}`),
    fill: () => undefined,
  };
  const shapes: readonly CopperShape[] = [
    { kind: 'ring', outerMm: 4, stripMm: 0.1 },
    { kind: 'rectangle', widthMm: 2, heightMm: 1, hole: false },
    { kind: 'disc', diameterMm: 1, hole: true },
  ];
  drawCopper(context as unknown as CanvasRenderingContext2D, shapes, place, { copper: 'red', ground: 'sand' });
  expect(drawn).toEqual(['stroke red 0.9 6.1 16.1 7.8 7.8', 'fill red 8 19 4 2', 'arc 10 20 1']);
  expect(context.fillStyle).toBe('sand');
});
