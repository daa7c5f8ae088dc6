import { DOCUMENT, ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal, signal } from '@angular/core';
import { fieldLabel } from '../../../../shared/model/design-labels';
import { valueAt } from '../../../../shared/model/design-pointer';
import { editValue } from '../design-field-edit';
import { WORKSPACE_STATE } from '../workspace-state';
import { DesignField } from './design-field';
import { copiedTable } from './pasted-table';
import type { TableColumn } from './pasted-table';
import { PasteRows } from './paste-rows';
import { PendingEntries } from './pending-entries';
import { RemarkList } from './remark-list';

export interface DesignColumn extends TableColumn {
  /** Name of the field in a row, or its place in a tuple. */
  readonly key: string;
}

const ROWS_AT_ONCE = 50;

/** A list of the design whose rows are a few numbers each: edited in place, pasted and copied as a whole. */
@Component({
  selector: 'slant-design-table',
  imports: [DesignField, PasteRows, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './design-table.html',
  styleUrls: ['./sheet.scss', './design-table.scss'],
})
export class DesignTable {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  private readonly clipboard = inject(DOCUMENT).defaultView?.navigator.clipboard ?? null;

  readonly pointer = input.required<string>();
  readonly columns = input.required<readonly DesignColumn[]>();
  /** What one row is called: "point". */
  readonly rowName = input.required<string>();
  readonly least = input(1);
  /** The row that "Add" puts at the end. */
  readonly nextRow = input.required<(rows: readonly (readonly number[])[]) => readonly number[]>();

  protected readonly canEdit = this.state.canEdit;
  protected readonly remarkPointers = computed(() => [this.pointer()]);
  protected readonly pasting = signal(false);
  protected readonly refusal = linkedSignal<unknown, string | null>({ source: () => this.list(), computation: () => null });
  protected readonly said = signal('');

  private readonly list = computed(() => {
    const value = valueAt(this.state.design(), this.pointer());
    return Array.isArray(value) ? (value as readonly unknown[]) : [];
  });
  protected readonly rows = computed(() => this.list().map((row) => this.columns().map(({ key }) => Number(valueAt(row, `/${key}`)))));
  protected readonly pageStart = linkedSignal<number, number>({
    source: () => this.rows().length,
    computation: (count, previous) => Math.min(previous?.value ?? 0, Math.floor(Math.max(0, count - 1) / ROWS_AT_ONCE) * ROWS_AT_ONCE),
  });
  protected readonly pageEnd = computed(() => Math.min(this.rows().length, this.pageStart() + ROWS_AT_ONCE));
  protected readonly places = computed(() => Array.from({ length: this.pageEnd() - this.pageStart() }, (_, i) => this.pageStart() + i));

  protected turnPage(direction: 1 | -1): void {
    this.pageStart.update((start) => start + direction * ROWS_AT_ONCE);
  }

  protected add(): void {
    this.put([...this.rows(), this.nextRow()(this.rows())], `Add ${this.rowName()}`);
    this.pageStart.set(Math.floor((this.rows().length - 1) / ROWS_AT_ONCE) * ROWS_AT_ONCE);
  }

  protected remove(place: number): void {
    const name = `Remove ${this.rowName()} ${place + 1}`;
    this.put(this.rows().filter((_, i) => i !== place), name);
  }

  protected paste(rows: readonly (readonly number[])[]): void {
    if (this.put(rows, `Paste ${rows.length} rows`)) this.pasting.set(false);
  }

  protected async copy(): Promise<void> {
    if (!this.clipboard) return;
    await this.clipboard.writeText(copiedTable(this.rows(), this.columns()));
    this.said.set(`${this.rows().length} rows copied`);
  }

  private put(rows: readonly (readonly number[])[], name: string): boolean {
    const list = rows.map((row) => this.rowOf(row));
    const edit = editValue(this.state.design(), this.pointer(), list);
    if (edit.kind === 'refused') {
      this.refusal.set(edit.reason);
      return false;
    }
    // Places have moved, so entries that stand refused in them belong nowhere any more.
    this.pending.dropBelow(this.pointer());
    if (edit.kind === 'changed') this.state.change(`${name}: ${fieldLabel(this.pointer()).label}`, () => edit.design);
    return true;
  }

  /** Tuples where the columns are numbered, objects where they are named. */
  private rowOf(row: readonly number[]): unknown {
    const columns = this.columns();
    return /^\d+$/.test(columns[0].key) ? [...row] : Object.fromEntries(columns.map(({ key }, i) => [key, row[i]]));
  }
}
