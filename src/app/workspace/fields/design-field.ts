import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal } from '@angular/core';
import { fieldLabel } from '../../../../shared/model/design-labels';
import { valueAt } from '../../../../shared/model/design-pointer';
import type { QuantityDimension } from '../../../../shared/units/quantity';
import { editField } from '../design-field-edit';
import type { FieldEntry } from '../design-field-edit';
import { WORKSPACE_STATE } from '../workspace-state';
import { EntryBox } from './entry-box';
import type { EntryStep } from './entry-box';
import { fieldText, steppedValue } from './field-text';
import { PendingEntries } from './pending-entries';
import { RemarkList } from './remark-list';

/**
 * One number of the design as a field: takes a quantity in any unit, keeps a refused entry with its reason, and shows
 * the remarks of its place. Enter or leaving the field takes the entry; Escape gives it up; arrow keys step.
 */
@Component({
  selector: 'slant-design-field',
  imports: [EntryBox, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-entry-box
      [label]="bare() ? fullLabel() : shortLabel()"
      [bare]="bare()"
      [unit]="bare() ? '' : unit()"
      [shown]="shown()"
      [refused]="refused()"
      [note]="note()"
      [locked]="!canEdit()"
      [placeholder]="optional() ? emptyText() : ''"
      (taken)="take($event)"
      (givenUp)="giveUp()"
      (stepped)="step($event)"
    />
    <slant-remark-list [pointers]="remarkPointers()" />
  `,
  styleUrl: './design-field.scss',
  host: { '[class.refused]': 'refused() !== null' },
})
export class DesignField {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);

  readonly pointer = input.required<string>();
  readonly dimension = input.required<QuantityDimension>();
  readonly unit = input('');
  /** The name of the field where the document's own is too long for its place. */
  readonly label = input<string | null>(null);
  readonly bare = input(false);
  readonly optional = input(false);
  readonly whole = input(false);
  /** What one press of an arrow key adds; by the dimension when absent. */
  readonly stepSize = input<number | null>(null);
  /** Shown in an empty optional field. */
  readonly emptyText = input('not set');

  protected readonly canEdit = this.state.canEdit;
  protected readonly fullLabel = computed(() => fieldLabel(this.pointer()).label);
  protected readonly shortLabel = computed(() => this.label() ?? this.fullLabel());
  protected readonly remarkPointers = computed(() => [this.pointer()]);
  private readonly value = computed(() => valueAt(this.state.design(), this.pointer()));
  protected readonly refused = computed(() => this.pending.of(this.pointer()));
  protected readonly shown = computed(() => this.refused()?.text ?? fieldText(this.value()));
  protected readonly note = linkedSignal<unknown, string | null>({ source: this.value, computation: () => null });

  protected take(text: string): void {
    const edit = editField(this.state.design(), this.entryOf(text));
    if (edit.kind === 'refused') {
      this.pending.keep({ pointer: this.pointer(), label: this.fullLabel(), text, reason: edit.reason, suggestion: edit.suggestion });
      return;
    }
    this.pending.drop(this.pointer());
    if (edit.kind !== 'changed') return;
    this.state.change(`Set ${this.fullLabel()}`, () => edit.design);
    this.note.set(edit.note);
  }

  protected giveUp(): void {
    this.pending.drop(this.pointer());
  }

  protected step(step: EntryStep): void {
    const value = this.value();
    if (typeof value !== 'number' || this.refused()) return;
    const next = steppedValue(value, step, this.stepSize() ?? this.dimension());
    const edit = editField(this.state.design(), this.entryOf(String(next)));
    if (edit.kind === 'changed') this.state.change(`Set ${this.fullLabel()}`, () => edit.design, { mergeKey: `step ${this.pointer()}` });
  }

  private entryOf(text: string): FieldEntry {
    return { pointer: this.pointer(), text, dimension: this.dimension(), shownUnit: this.unit(), optional: this.optional(), whole: this.whole() };
  }
}
