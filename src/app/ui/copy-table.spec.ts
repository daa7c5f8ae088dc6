import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { CopyTable } from './copy-table';

@Component({
  selector: 'slant-copy-table-host',
  imports: [CopyTable],
  template: `<slant-copy-table [table]="table" name="the worst cells" /><table #table><thead><tr><th>Error, °</th></tr></thead><tbody><tr><td>4.25</td></tr></tbody></table>`,
})
class Host {}

describe('button that copies a table', () => {
  afterEach(() => jest.useRealTimers());

  async function pressed(clipboard: unknown): Promise<string> {
    jest.useFakeTimers({ doNotFake: ['queueMicrotask', 'nextTick'] });
    Object.defineProperty(navigator, 'clipboard', { value: clipboard, configurable: true });
    const fixture = TestBed.createComponent(Host);
    fixture.detectChanges();
    const element = fixture.nativeElement as HTMLElement;
    element.querySelector('button')?.click();
    await Promise.resolve();
    await Promise.resolve();
    fixture.detectChanges();
    return element.querySelector('[role="status"]')?.textContent ?? '';
  }

  it('hands its text over and says how many rows', async () => {
    const taken: string[] = [];
    expect(await pressed({ writeText: async (text: string) => void taken.push(text) })).toBe('1 row copied');
    expect(taken).toEqual(['Error, °\n4.25']);
  });

  it('says why nothing was copied', async () => {
    expect(await pressed(undefined)).toBe('Not copied: this address has no access to the clipboard');
  });
});
