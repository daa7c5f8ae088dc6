import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, input, viewChild } from '@angular/core';

export interface Shortcut {
  readonly keys: string;
  readonly does: string;
}

/** Lists the keys that work here; opened by "?" outside of fields. */
@Component({
  selector: 'slant-shortcut-list',
  template: `
    <dialog #dialog aria-label="Keys">
      <div class="dialog">
        <h2>Keys</h2>
        <dl>
          @for (shortcut of shortcuts(); track shortcut.keys) {
            <dt>
              <kbd class="key-cap">{{ shortcut.keys }}</kbd>
            </dt>
            <dd>{{ shortcut.does }}</dd>
          }
        </dl>
        <div class="dialog-actions"><button type="button" class="button" (click)="dialog.close()">Close</button></div>
      </div>
    </dialog>
  `,
  styles: `
    dialog {
      padding: 0;
      border: 1px solid var(--rule-strong);
      border-radius: var(--corner);
      background: var(--raised);
      color: var(--ink);
    }
    dl {
      display: grid;
      grid-template-columns: auto 1fr;
      gap: var(--s1) var(--s4);
    }
  `,
  host: { '(document:keydown)': 'openByKey($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShortcutList {
  readonly shortcuts = input.required<readonly Shortcut[]>();
  private readonly dialog = viewChild.required<ElementRef<HTMLDialogElement>>('dialog');

  protected openByKey(event: KeyboardEvent): void {
    if (event.key !== '?' || event.ctrlKey || event.metaKey || isTyping(event.target)) return;
    event.preventDefault();
    const dialog = this.dialog().nativeElement;
    if (!dialog.open) dialog.showModal();
  }
}

/** True in fields, where single keys are text and not shortcuts. Rounds and boxes to tick take no text. */
export function isTyping(target: EventTarget | null): boolean {
  if (target instanceof HTMLInputElement && /^(radio|checkbox)$/.test(target.type)) return false;
  return target instanceof HTMLElement && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName));
}
