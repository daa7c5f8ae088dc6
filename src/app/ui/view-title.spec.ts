import { TestBed } from '@angular/core/testing';
import { Notes } from './notes';
import { ViewTitle } from './view-title';

describe('view title', () => {
  it('is a heading with its unit at the end of the line', async () => {
    const fixture = TestBed.createComponent(ViewTitle);
    fixture.componentRef.setInput('text', 'Library curve');
    fixture.componentRef.setInput('unit', '28 GHz');
    fixture.componentRef.setInput('titleId', 'curve');
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    expect(element.querySelector('h2')?.textContent).toBe('Library curve');
    expect(element.querySelector('h2')?.id).toBe('curve');
    expect(element.querySelector('.unit')?.textContent).toBe('28 GHz');
  });

  it('leaves the end of the line bare when there is no unit', async () => {
    const fixture = TestBed.createComponent(ViewTitle);
    fixture.componentRef.setInput('text', 'Notes');
    await fixture.whenStable();
    expect((fixture.nativeElement as HTMLElement).querySelector('.unit')).toBeNull();
  });
});

describe('notes', () => {
  it('are an ordered list in the order given', async () => {
    const fixture = TestBed.createComponent(Notes);
    fixture.componentRef.setInput('notes', ['Seen from the horn side.', 'A prediction is array theory, not a measurement.']);
    await fixture.whenStable();
    const items = [...(fixture.nativeElement as HTMLElement).querySelectorAll('ol > li')];
    expect(items.map(({ textContent }) => textContent)).toEqual(['Seen from the horn side.', 'A prediction is array theory, not a measurement.']);
  });
});
