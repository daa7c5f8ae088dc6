import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { Rail } from './rail';
import type { RailItem } from './rail';

const items: readonly RailItem[] = [
  { id: 'requirement', number: 1, title: 'Requirement', state: 'meets', reason: 'four lines', link: ['/panels', 'a', 'requirement'] },
  { id: 'pattern', number: 6, title: 'Pattern', state: 'falls-short', reason: 'mask', link: ['/panels', 'a', 'pattern'] },
];

describe('rail', () => {
  it('links every sheet with its number and says its state', async () => {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    const fixture = TestBed.createComponent(Rail);
    fixture.componentRef.setInput('project', 'Merrow Point');
    fixture.componentRef.setInput('panel', 'A, lighthouse relay');
    fixture.componentRef.setInput('items', items);
    await fixture.whenStable();
    const sheets = (fixture.nativeElement as HTMLElement).querySelector('nav[aria-label="Sheets of the panel"]');
    const links = [...(sheets?.querySelectorAll('a') ?? [])];
    expect(links.map((link) => link.getAttribute('href'))).toEqual(['/panels/a/requirement', '/panels/a/pattern']);
    expect([...links[1].children].map(({ textContent }) => textContent)).toEqual(['6', 'Pattern', 'falls short: mask']);
  });
});
