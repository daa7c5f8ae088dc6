import { TestBed } from '@angular/core/testing';
import { ShortcutList, isTyping } from './shortcut-list';

/** The dialog element of the test environment has no modal form; it opens as a plain one. */
function standInForModal(): void {
  HTMLDialogElement.prototype.showModal = function (this: HTMLDialogElement) {
    this.open = true;
  };
}

describe('list of keys', () => {
  beforeEach(standInForModal);

  async function shown(): Promise<HTMLDialogElement> {
    const fixture = TestBed.createComponent(ShortcutList);
    fixture.componentRef.setInput('shortcuts', [{ keys: 'Ctrl K', does: 'find or run' }]);
    await fixture.whenStable();
    const dialog = (fixture.nativeElement as HTMLElement).querySelector('dialog');
    if (dialog === null) throw new Error('no dialog is there');
    return dialog;
  }

  it('opens by "?" and lists the keys that work here', async () => {
    const dialog = await shown();
    expect(dialog.open).toBe(false);
    document.dispatchEvent(new KeyboardEvent('keydown', { key: '?', bubbles: true }));
    expect(dialog.open).toBe(true);
    expect(dialog.textContent).toContain('Ctrl K');
    expect(dialog.textContent).toContain('find or run');
  });

  it('stays closed while someone types into a field', async () => {
    const dialog = await shown();
    const field = document.createElement('input');
    document.body.append(field);
    field.dispatchEvent(new KeyboardEvent('keydown', { key: '?', bubbles: true }));
    expect(dialog.open).toBe(false);
    field.remove();
  });

  it('knows fields from the page', () => {
    expect(['input', 'textarea', 'select', 'button', 'div'].map((name) => isTyping(document.createElement(name)))).toEqual([true, true, true, false, false]);
    expect(isTyping(null)).toBe(false);
  });

  it('takes a round or a box to tick for no field, so that single keys work on after a choice', () => {
    const ofType = (type: string): HTMLInputElement => Object.assign(document.createElement('input'), { type });
    expect(['text', 'number', 'radio', 'checkbox'].map((type) => isTyping(ofType(type)))).toEqual([true, true, false, false]);
  });
});
