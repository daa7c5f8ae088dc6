import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { PanelMap } from './panel-map';

const places = {
  xMm: Float64Array.from({ length: 9 }, (_, i) => 5 * ((i % 3) - 1)),
  yMm: Float64Array.from({ length: 9 }, (_, i) => 5 * (Math.floor(i / 3) - 1)),
  pitchXMm: 5,
  pitchYMm: 5,
};
const layer = { title: 'Phase error', unit: '°', digits: 2, values: Float64Array.from({ length: 9 }, (_, i) => i), scale: { map: 'diverging', from: -15, to: 15 } as const };

describe('PanelMap', () => {
  let fixture: ComponentFixture<PanelMap>;
  let element: HTMLElement;

  beforeEach(async () => {
    jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
    jest.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue({ width: 668, height: 600, left: 0, top: 0 } as DOMRect);
    fixture = TestBed.createComponent(PanelMap);
    fixture.componentRef.setInput('places', places);
    fixture.componentRef.setInput('layer', layer);
    fixture.componentRef.setInput('label', 'Phase error of panel A');
    fixture.componentRef.setInput('letter', 'A');
    fixture.componentRef.setInput('maxHeight', 600);
    fixture.componentRef.setInput('describe', (cell: number) => `cell ${cell}, error ${layer.values[cell]}°`);
    await fixture.whenStable();
    element = fixture.nativeElement as HTMLElement;
  });
  afterEach(() => jest.restoreAllMocks());

  const stage = (): HTMLElement => element.querySelector('.stage') as HTMLElement;
  const press = async (key: string, more: KeyboardEventInit = {}): Promise<void> => {
    stage().dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true, bubbles: true, ...more }));
    await fixture.whenStable();
  };
  const readOut = (): string => element.querySelector('.read-out')?.textContent ?? '';

  it('starts in the middle and walks by arrow keys, saying each cell', async () => {
    expect(readOut()).toBe('No cell chosen');
    await press('ArrowRight');
    expect(readOut()).toBe('cell 4, error 4°');
    await press('ArrowUp');
    await press('ArrowRight');
    expect(readOut()).toBe('cell 8, error 8°');
    expect(element.querySelector('.balloon-text')?.textContent).toBe('A');
  });

  it('selects by Shift and arrows, and lets go by Escape', async () => {
    fixture.componentInstance.chosen.set(0);
    await press('ArrowRight', { shiftKey: true });
    await press('ArrowUp', { shiftKey: true });
    expect(fixture.componentInstance.selection()).toEqual({ fromXMm: -7.5, toXMm: 2.5, fromYMm: -7.5, toYMm: 2.5 });
    await press('Escape');
    expect(fixture.componentInstance.selection()).toBeNull();
  });

  it('zooms by keys and buttons and shows dimension lines only while the whole panel shows', async () => {
    const dimensions = (): number => element.querySelectorAll('.dimension').length;
    expect([dimensions(), element.querySelector('svg')?.textContent]).toEqual([2, expect.stringContaining('15.00')]);
    await press('+');
    expect(fixture.componentInstance.zoom()?.factor).toBe(1.5);
    expect(dimensions()).toBe(0);
    element.querySelector<HTMLButtonElement>('button[aria-label="Show the whole panel"]')?.click();
    await fixture.whenStable();
    expect([fixture.componentInstance.zoom(), dimensions()]).toEqual([null, 2]);
  });

  it('keeps the cursor in the window while zoomed in', async () => {
    fixture.componentInstance.zoom.set({ centreXMm: -5, centreYMm: -5, factor: 3 });
    fixture.componentInstance.chosen.set(0);
    await press('ArrowRight');
    await press('ArrowRight');
    expect(fixture.componentInstance.zoom()?.centreXMm).toBeGreaterThan(2);
  });

  it('chooses the cell that is clicked', async () => {
    stage().setPointerCapture = () => undefined;
    const event = (kind: string) => Object.assign(new MouseEvent(kind, { clientX: 500, clientY: 100, bubbles: true }), { pointerId: 1 });
    stage().dispatchEvent(event('pointerdown'));
    stage().dispatchEvent(event('pointerup'));
    await fixture.whenStable();
    expect(fixture.componentInstance.chosen()).toBe(8);
  });

  it('marks places with a dark and a light line', async () => {
    fixture.componentRef.setInput('marks', [{ xMm: 0, yMm: 0, label: 'foot of the horn' }]);
    await fixture.whenStable();
    expect([element.querySelectorAll('.mark.light').length, element.querySelectorAll('.mark.dark').length]).toEqual([1, 1]);
  });

  it('hands out the values it shows with their unit', () => {
    const { columns } = fixture.componentInstance.exportTable();
    expect(columns.map(({ head, values }) => [head, values[8]])).toEqual([['x, mm', 5], ['y, mm', 5], ['Phase error, °', 8]]);
  });
});
