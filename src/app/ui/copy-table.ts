import { ChangeDetectionStrategy, Component, DOCUMENT, inject, input, signal } from '@angular/core';
import { tableText } from './table-text';

const TOLD_MS = 3000;

/** Puts the rows of a table that are shown into the clipboard, for a spreadsheet. */
@Component({
  selector: 'slant-copy-table',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <button type="button" class="button quiet" [attr.aria-label]="'Copy ' + name() + ' for a spreadsheet'" (click)="copy()">Copy</button>
    <span class="label" role="status">{{ told() }}</span>
  `,
})
export class CopyTable {
  readonly table = input.required<HTMLTableElement>();
  /** What the table holds, in small letters. */
  readonly name = input.required<string>();
  protected readonly told = signal('');
  private readonly window = inject(DOCUMENT).defaultView;

  protected async copy(): Promise<void> {
    const text = tableText(this.table());
    try {
      if (!this.window?.navigator.clipboard) throw new Error('this address has no access to the clipboard');
      await this.window.navigator.clipboard.writeText(text);
      this.told.set(rowsText(text.split('\n').length - 1));
    } catch (error) {
      this.told.set(`Not copied: ${error instanceof Error ? error.message : String(error)}`);
    }
    setTimeout(() => this.told.set(''), TOLD_MS);
  }
}

const rowsText = (count: number): string => `${count} ${count === 1 ? 'row' : 'rows'} copied`;
