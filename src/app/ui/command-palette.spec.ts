import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { CommandPalette } from './command-palette';
import { CommandRegistry } from './command-registry';

describe('command palette', () => {
  let fixture: ComponentFixture<CommandPalette>;
  let ran: string[];
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const options = (): string[] => [...element().querySelectorAll('[role="option"] > span:first-child')].map(({ textContent }) => textContent ?? '');

  const press = async (target: EventTarget, key: string, ctrlKey = false): Promise<void> => {
    target.dispatchEvent(new KeyboardEvent('keydown', { key, ctrlKey, bubbles: true, cancelable: true }));
    await fixture.whenStable();
  };
  const field = (): HTMLInputElement => {
    const found = element().querySelector('input');
    if (found === null) throw new Error('the palette has no field');
    return found;
  };
  const type = async (text: string): Promise<void> => {
    field().value = text;
    field().dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };

  beforeEach(async () => {
    // The dialog element of the test environment has no modal form; it opens as a plain one.
    HTMLDialogElement.prototype.showModal = function (this: HTMLDialogElement) {
      this.open = true;
    };
    HTMLDialogElement.prototype.close = function (this: HTMLDialogElement) {
      this.open = false;
    };
    ran = [];
    TestBed.inject(CommandRegistry).set('test', [
      { id: 'a', label: 'A, lighthouse relay', kind: 'panel', words: '28 GHz', run: () => ran.push('a') },
      { id: 'b', label: 'B, slipway wall', kind: 'panel', words: '28 GHz', run: () => ran.push('b') },
      { id: 'library', label: 'Library', kind: 'page', run: () => ran.push('library') },
    ]);
    fixture = TestBed.createComponent(CommandPalette);
    await fixture.whenStable();
    await press(document, 'k', true);
  });

  it('opens by Ctrl K from anywhere and lists what can be found', () => {
    expect(element().querySelector('dialog')?.open).toBe(true);
    expect(options()).toEqual(['A, lighthouse relay', 'B, slipway wall', 'Library']);
  });

  it('runs the line the arrow keys chose, and closes', async () => {
    await type('28 ghz');
    expect(options()).toEqual(['A, lighthouse relay', 'B, slipway wall']);
    await press(field(), 'ArrowDown');
    expect(field().getAttribute('aria-activedescendant')).toBe('command-1');
    await press(field(), 'Enter');
    expect(ran).toEqual(['b']);
    expect(element().querySelector('dialog')?.open).toBe(false);
  });

  it('opens again though the event of its last closing comes late, and follows a closing by the browser', async () => {
    const dialog = element().querySelector('dialog');
    await press(field(), 'Enter');
    document.dispatchEvent(new KeyboardEvent('keydown', { key: 'k', ctrlKey: true }));
    dialog?.dispatchEvent(new Event('close'));
    await fixture.whenStable();
    expect(dialog?.open).toBe(true);
    dialog?.close();
    dialog?.dispatchEvent(new Event('close'));
    await fixture.whenStable();
    expect(TestBed.inject(CommandRegistry).isOpen()).toBe(false);
  });

  it('says so when nothing is found, and Enter then does nothing', async () => {
    await type('nothing like it');
    expect(options()).toEqual([]);
    expect(element().textContent).toContain('Nothing is called that');
    await press(field(), 'Enter');
    expect(ran).toEqual([]);
  });
});
