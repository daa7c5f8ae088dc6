import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import type { LineFigure } from './line-figure';
import { LinePlot } from './line-plot';

const figure: LineFigure = {
  title: 'Library curve',
  x: { title: 'ring outer side L, mm', from: 1.5, to: 4.9, step: 0.5 },
  y: { title: 'unwrapped phase, °', from: -510, to: 30, step: 90 },
  lines: [{ label: 'phase', x: [1.6, 2.3, 4.8], y: [5, -112, -470], ink: 'ink', squares: true }],
  levels: [{ at: -121.9, label: 'target \u2212121.9°' }, { at: 238, label: 'outside' }],
  bars: { x: [1.6, 2.3, 4.8], counts: [10, 40, 20] },
  chosen: { at: 1, label: 'L 2.30, \u2212112.0°' },
};

describe('LinePlot', () => {
  let fixture: ComponentFixture<LinePlot>;
  let element: HTMLElement;
  let picked: number[];
  beforeEach(async () => {
    jest.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue({ width: 556, left: 0, top: 0 } as DOMRect);
    fixture = TestBed.createComponent(LinePlot);
    fixture.componentRef.setInput('figure', figure);
    picked = [];
    fixture.componentInstance.picked.subscribe((at) => picked.push(at));
    await fixture.whenStable();
    element = fixture.nativeElement as HTMLElement;
  });
  afterEach(() => jest.restoreAllMocks());

  it('names the chosen sample and the levels that lie on the axis', () => {
    expect(element.querySelector('.chosen-text')?.textContent).toBe('L 2.30, \u2212112.0°');
    expect([...element.querySelectorAll('.level-text')].map((text) => text.textContent)).toEqual(['target \u2212121.9°']);
  });
  it('writes the name of the chosen sample to the side where it stays inside', async () => {
    expect(element.querySelector('.chosen-text')?.classList).not.toContain('end');
    fixture.componentRef.setInput('figure', { ...figure, chosen: { at: 1, label: 'a name that would run out of the plot on the right of its sample' } });
    await fixture.whenStable();
    expect(element.querySelector('.chosen-text')?.classList).toContain('end');
  });
  it('marks the bar of the chosen sample, the tallest being the most used', () => {
    const heights = [...element.querySelectorAll('.bar')].map((bar) => Number(bar.getAttribute('height')));
    expect(Math.max(...heights)).toBe(heights[1]);
    expect(element.querySelector('.bar.marked title')?.textContent).toBe('2.3: used 40 times');
  });
  it('picks samples by arrow keys from the chosen one and reads them in full', async () => {
    const plot = element.querySelector('.plot') as HTMLElement;
    plot.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight' }));
    plot.dispatchEvent(new KeyboardEvent('keydown', { key: 'Home' }));
    await fixture.whenStable();
    expect(picked).toEqual([2, 0]);
    expect(element.querySelector('[role=status]')?.textContent).toBe('ring outer side L, mm 1.6; unwrapped phase, ° 5');
  });
  it('picks the sample nearest to a click', () => {
    jest.spyOn(SVGElement.prototype, 'getBoundingClientRect').mockReturnValue({ left: 0, top: 0 } as DOMRect);
    element.querySelector('.hit')?.dispatchEvent(new MouseEvent('click', { clientX: 430 }));
    expect(picked).toEqual([2]);
  });
  it('hands out its samples and how often each is used', () => {
    expect(fixture.componentInstance.exportTable().columns.map(({ head }) => head)).toEqual(['ring outer side L, mm', 'unwrapped phase, °', 'times used']);
  });
});
