import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { EmptyState } from './empty-state';

@Component({
  imports: [EmptyState],
  template: `
    <slant-empty-state title="No panel yet" text="A panel is one aperture.">
      <svg sketch></svg>
      <button type="button">Make the first panel</button>
    </slant-empty-state>
  `,
})
class Host {}

describe('empty state', () => {
  it('draws its sketch first, then says what will stand here, then offers the first action', async () => {
    const fixture = TestBed.createComponent(Host);
    await fixture.whenStable();
    const children = [...((fixture.nativeElement as HTMLElement).querySelector('slant-empty-state')?.children ?? [])];
    expect(children.map(({ tagName }) => tagName.toLowerCase())).toEqual(['svg', 'h2', 'p', 'button']);
    expect(children[1].textContent).toBe('No panel yet');
  });
});
