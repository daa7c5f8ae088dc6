import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { ChoiceTabs } from './choice-tabs';

const choices = [
  { id: 'target', label: 'Target phase' },
  { id: 'error', label: 'Phase error' },
  { id: 'cell', label: 'Cell' },
];

describe('choice tabs', () => {
  let fixture: ComponentFixture<ChoiceTabs>;
  let chosen: string[];
  const radios = (): HTMLButtonElement[] => [...(fixture.nativeElement as HTMLElement).querySelectorAll<HTMLButtonElement>('[role="radio"]')];

  beforeEach(async () => {
    fixture = TestBed.createComponent(ChoiceTabs);
    fixture.componentRef.setInput('label', 'View');
    fixture.componentRef.setInput('choices', choices);
    fixture.componentRef.setInput('value', 'target');
    chosen = [];
    fixture.componentInstance.chosen.subscribe((id) => {
      chosen.push(id);
      fixture.componentRef.setInput('value', id);
    });
    await fixture.whenStable();
  });

  it('are one named group of which exactly one holds and takes the tab stop', () => {
    expect((fixture.nativeElement as HTMLElement).querySelector('[role="radiogroup"]')?.getAttribute('aria-label')).toBe('View');
    expect(radios().map((radio) => radio.getAttribute('aria-checked'))).toEqual(['true', 'false', 'false']);
    expect(radios().map((radio) => radio.tabIndex)).toEqual([0, -1, -1]);
  });

  it('are chosen by a click', async () => {
    radios()[2].click();
    await fixture.whenStable();
    expect(chosen).toEqual(['cell']);
    expect(radios()[2].getAttribute('aria-checked')).toBe('true');
  });

  it('move with the arrow keys, over the end back to the start', async () => {
    for (const key of ['ArrowLeft', 'ArrowRight', 'ArrowDown']) {
      const held = radios().findIndex((radio) => radio.getAttribute('aria-checked') === 'true');
      radios()[held].dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true }));
      await fixture.whenStable();
    }
    expect(chosen).toEqual(['cell', 'target', 'error']);
  });

  it('leave other keys to the page', () => {
    const event = new KeyboardEvent('keydown', { key: 'a', cancelable: true });
    radios()[0].dispatchEvent(event);
    expect(event.defaultPrevented).toBe(false);
    expect(chosen).toEqual([]);
  });
});
