import { TestBed } from '@angular/core/testing';
import { CheckField } from './check-field';

async function shown(inputs: { checked: boolean; disabled?: boolean }): Promise<{ box: HTMLInputElement; text: string; changes: boolean[] }> {
  const fixture = TestBed.createComponent(CheckField);
  fixture.componentRef.setInput('label', 'Copper shapes');
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  const changes: boolean[] = [];
  fixture.componentInstance.changed.subscribe((value) => changes.push(value));
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const box = element.querySelector('input');
  if (box === null) throw new Error('no check box is shown');
  return { box, text: element.textContent?.trim() ?? '', changes };
}

describe('check field', () => {
  it('is a real check box with its words beside it', async () => {
    const { box, text } = await shown({ checked: true });
    expect(box.type).toBe('checkbox');
    expect(box.checked).toBe(true);
    expect(text).toBe('Copper shapes');
    expect(box.closest('label')).not.toBeNull();
  });

  it('tells the opposite of what it shows when it is clicked', async () => {
    const off = await shown({ checked: false });
    off.box.click();
    expect(off.changes).toEqual([true]);
    const on = await shown({ checked: true });
    on.box.click();
    expect(on.changes).toEqual([false]);
  });

  it('goes on showing what holds until its owner changes it', async () => {
    const { box } = await shown({ checked: false });
    box.click();
    expect(box.checked).toBe(false);
  });

  it('says nothing while it is disabled', async () => {
    const { box, changes } = await shown({ checked: false, disabled: true });
    box.click();
    expect(changes).toEqual([]);
  });
});
