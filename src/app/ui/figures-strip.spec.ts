import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import type { StripCell } from './figure-cell';
import { FiguresStrip } from './figures-strip';

const gain: StripCell = {
  id: 'gain',
  label: 'Gain at the peak',
  value: '34.76',
  unit: 'dBi',
  trend: '+0.02',
  limit: '≥ 34.0',
  margin: '+0.76',
  verdict: 'meets',
  gauge: { limitAt: 0.3, valueAt: 0.5, forbidden: 'left' },
  reason: null,
};
const width: StripCell = { ...gain, id: 'width', label: 'Beamwidth', value: 'none', unit: '', trend: null, limit: 'no limit set', margin: null, verdict: null, gauge: null, reason: 'never falls 3 dB' };

describe('figures strip', () => {
  let fixture: ComponentFixture<FiguresStrip>;
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const buttons = (): HTMLButtonElement[] => [...element().querySelectorAll('button')];

  beforeEach(async () => {
    fixture = TestBed.createComponent(FiguresStrip);
    fixture.componentRef.setInput('figures', [gain, width]);
    fixture.componentRef.setInput('against', 'vs 3');
    await fixture.whenStable();
  });

  it('shows value, unit, trend, limit and margin of each figure', () => {
    const text = buttons()[0].textContent?.replace(/\s+/g, ' ') ?? '';
    for (const part of ['Gain at the peak', '34.76', 'dBi', '+0.02', 'vs 3', '≥ 34.0', '+0.76']) expect(text).toContain(part);
  });

  it('reads each figure out as one sentence with its verdict', () => {
    expect(buttons()[0].getAttribute('aria-label')).toBe('Gain at the peak 34.76 dBi, meets, limit ≥ 34.0, margin +0.76. How computed');
    expect(buttons()[1].getAttribute('aria-label')).toContain('never falls 3 dB');
  });

  it('colours a margin only by its verdict, and draws a gauge only where there is a limit', () => {
    expect(buttons()[0].querySelector('.pass')?.textContent).toBe('+0.76');
    expect(buttons()[0].querySelector('.limit')).not.toBeNull();
    expect(buttons()[1].querySelector('.pass, .fail, .limit')).toBeNull();
  });

  it('hides "vs" while there is no parent, and asks how a figure is computed by its id', async () => {
    fixture.componentRef.setInput('against', '');
    await fixture.whenStable();
    expect(element().textContent).not.toContain('vs');
    const asked: string[] = [];
    fixture.componentInstance.explain.subscribe((id) => asked.push(id));
    buttons()[1].click();
    expect(asked).toEqual(['width']);
  });

  it('greys itself while its figures are stale', async () => {
    fixture.componentRef.setInput('stale', true);
    await fixture.whenStable();
    expect(element().querySelector('section')?.classList).toContain('stale');
  });

  it('says that it is busy while a newer answer is under way', async () => {
    expect(element().querySelector('section')?.getAttribute('aria-busy')).toBe('false');
    fixture.componentRef.setInput('waiting', true);
    await fixture.whenStable();
    const section = element().querySelector('section');
    expect([section?.getAttribute('aria-busy'), section?.classList.contains('waiting')]).toEqual(['true', true]);
  });
});
