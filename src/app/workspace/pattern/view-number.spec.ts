import { TestBed } from '@angular/core/testing';
import { ViewNumber } from './view-number';

async function shown() {
  const fixture = TestBed.createComponent(ViewNumber);
  for (const [name, value] of Object.entries({ label: 'Floor', value: -50, dimension: 'level', unit: 'dB', least: -100, most: -10 })) fixture.componentRef.setInput(name, value);
  const taken: number[] = [];
  fixture.componentInstance.changed.subscribe((value) => taken.push(value));
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const type = async (text: string): Promise<void> => {
    const box = element.querySelector('input') as HTMLInputElement;
    box.value = text;
    box.dispatchEvent(new Event('input'));
    box.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
    await fixture.whenStable();
  };
  return { element, taken, type };
}

describe('number of a view', () => {
  it('takes a quantity with its unit', async () => {
    const { taken, type } = await shown();
    await type('-40 dB');
    expect(taken).toEqual([-40]);
  });
  it('says the range instead of bending a number into it', async () => {
    const { element, taken, type } = await shown();
    await type('-300');
    expect(taken).toEqual([]);
    expect(element.textContent).toContain('from -100 to -10dB');
  });
  it('steps by arrow keys', async () => {
    const { element, taken } = await shown();
    element.querySelector('input')?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowUp', cancelable: true }));
    expect(taken).toEqual([-49]);
  });
});
