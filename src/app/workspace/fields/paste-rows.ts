import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { readPastedTable } from './pasted-table';
import type { TableColumn } from './pasted-table';

const FAULTS_SHOWN = 8;
let nextPaste = 0;

/** Takes rows from a spreadsheet: shows what it reads and every entry it cannot, and hands over all or nothing. */
@Component({
  selector: 'slant-paste-rows',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './paste-rows.html',
  styleUrls: ['./sheet.scss', './paste-rows.scss'],
})
export class PasteRows {
  readonly columns = input.required<readonly TableColumn[]>();
  /** Why the table as a whole was refused, from whoever took it. */
  readonly refusal = input<string | null>(null);
  readonly taken = output<readonly (readonly number[])[]>();
  readonly closed = output();

  protected readonly id = `slant-paste-rows-${(nextPaste += 1)}`;
  protected readonly text = signal('');
  protected readonly read = computed(() => readPastedTable(this.text(), this.columns()));
  protected readonly shownFaults = computed(() => this.read().faults.slice(0, FAULTS_SHOWN));
  protected readonly moreFaults = computed(() => this.read().faults.length - this.shownFaults().length);
  protected readonly headings = computed(() => this.columns().map(({ label, unit }) => (unit ? `${label} (${unit})` : label)).join(', '));

  protected use(): void {
    this.taken.emit(this.read().rows);
  }
}
