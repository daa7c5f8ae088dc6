import { TestBed } from '@angular/core/testing';
import { TitleBlock } from './title-block';

describe('title block', () => {
  it('is a list of named entries, so that a screen reader reads label and value together', async () => {
    const fixture = TestBed.createComponent(TitleBlock);
    fixture.componentRef.setInput('rows', [
      [{ label: 'Project', value: 'Merrow Point sea-rescue link' }],
      [
        { label: 'Hash', value: 'debfe0abb702', figure: true },
        { label: 'Sheet', value: '5 of 11', figure: true },
      ],
    ]);
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    const read = [...element.querySelectorAll('dt')].map((term) => `${term.textContent}: ${term.nextElementSibling?.textContent}`);
    expect(read).toEqual(['Project: Merrow Point sea-rescue link', 'Hash: debfe0abb702', 'Sheet: 5 of 11']);
    expect(element.textContent).toContain('Slantwise');
    expect([...element.querySelectorAll('dd.figure')].map(({ textContent }) => textContent)).toEqual(['debfe0abb702', '5 of 11']);
  });

  it('drops the mark where it is narrow', async () => {
    const fixture = TestBed.createComponent(TitleBlock);
    fixture.componentRef.setInput('rows', [[{ label: 'Sheet', value: '0' }]]);
    fixture.componentRef.setInput('showMark', false);
    await fixture.whenStable();
    expect((fixture.nativeElement as HTMLElement).textContent).not.toContain('Slantwise');
  });
});
