import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { BarChart } from './bar-chart';

describe('BarChart', () => {
  let fixture: ComponentFixture<BarChart>;
  let element: HTMLElement;
  beforeEach(async () => {
    jest.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue({ width: 400 } as DOMRect);
    fixture = TestBed.createComponent(BarChart);
    const bars = [
      { name: 'Bow', value: -0.4, text: '−0.40 dB' },
      { name: 'Etch', value: -0.1, text: '−0.10 dB' },
      { name: 'Feed', value: null, text: 'no horn' },
    ];
    for (const [name, value] of Object.entries({ bars, axisTitle: 'change of gain, dB', label: 'Ranking' })) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    element = fixture.nativeElement as HTMLElement;
  });
  afterEach(() => jest.restoreAllMocks());

  it('draws every value as long as it is, to its side of zero', () => {
    const bars = [...element.querySelectorAll('rect.bar')].map((bar) => ({ x: Number(bar.getAttribute('x')), width: Number(bar.getAttribute('width')) }));
    expect(bars).toHaveLength(2);
    expect(bars[0].width / bars[1].width).toBeCloseTo(4, 6);
    expect(bars[0].x + bars[0].width).toBeCloseTo(bars[1].x + bars[1].width, 6);
  });

  it('says in words what it shows, with the reason where there is no value', () => {
    expect(element.querySelector('svg')?.getAttribute('aria-label')).toBe('Ranking: Bow −0.40 dB; Etch −0.10 dB; Feed no horn');
    expect(element.textContent).toContain('no horn');
  });

  it('keeps a reason on the roomier side of zero, and what does not fit in words alone', async () => {
    const reason = 'only the cells of an edition have a geometry that an etch could change';
    fixture.componentRef.setInput('bars', [{ name: 'Bow', value: -0.4, text: '−0.40 dB' }, { name: 'Etch', value: null, text: reason }]);
    await fixture.whenStable();
    const shown = [...element.querySelectorAll('text.end:not(.words)')].at(-1);
    expect(shown?.textContent).toMatch(/^only the cells of an edition have .*…$/);
    // Zero stands 8 px from the right edge of 400 px.
    expect(Number(shown?.getAttribute('x'))).toBeCloseTo(387, 6);
    expect(element.querySelector('svg')?.getAttribute('aria-label')).toContain(reason);
  });

  it('gives its values as a table', () => {
    expect(fixture.componentInstance.exportTable().columns).toEqual([
      { head: 'name', values: ['Bow', 'Etch', 'Feed'] },
      { head: 'change of gain, dB', values: [-0.4, -0.1, 'no horn'] },
    ]);
  });
});
