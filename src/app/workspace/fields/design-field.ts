import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal } from '@angular/core';
import { fieldLabel } from '../../../../shared/model/design-labels';
import { valueAt } from '../../../../shared/model/design-pointer';
import type { QuantityDimension } from '../../../../shared/units/quantity';
import { editField } from '../design-field-edit';
import { WORKSPACE_STATE } from '../workspace-state';
import { PendingEntries } from './pending-entries';
import { RemarkList } from './remark-list';

/** What one press of an arrow key adds, in the document's unit. */
const ARROW_STEPS: Readonly<Record<QuantityDimension, number>> = { frequency: 0.1, length: 1, angle: 0.5, level: 0.5, power: 0.1, number: 0.5 };

let nextField = 0;

/**
 * One number of the design as a field: takes a quantity in any unit, keeps a refused entry with its reason, and shows
 * the remarks of its place. Enter or leaving the field takes the entry; Escape gives it up; arrow keys step.
 */
@Component({
  selector: 'slant-design-field',
  imports: [RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './design-field.html',
  styleUrl: './design-field.scss',
  host: { '[class.bare]': 'bare()' },
})
export class DesignField {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);

  readonly pointer = input.required<string>();
  readonly dimension = input.required<QuantityDimension>();
  readonly unit = input('');
  /** The name of the field where the document's own is too long for its place. */
  readonly label = input<string | null>(null);
  /** The label is for readers of the screen only: in tables a column head stands above. */
  readonly bare = input(false);
  readonly optional = input(false);
  readonly whole = input(false);
  readonly step = input<number | null>(null);
  /** Shown in an empty optional field. */
  readonly emptyText = input('not set');

  protected readonly id = `slant-design-field-${(nextField += 1)}`;
  protected readonly fullLabel = computed(() => this.label() ?? fieldLabel(this.pointer()).label);
  protected readonly accessibleLabel = computed(() => (this.bare() ? fieldLabel(this.pointer()).label : this.fullLabel()));
  protected readonly canEdit = this.state.canEdit;
  protected readonly remarkPointers = computed(() => [this.pointer()]);
  private readonly value = computed(() => valueAt(this.state.design(), this.pointer()));
  protected readonly refused = computed(() => this.pending.of(this.pointer()));
  private readonly shown = computed(() => this.refused()?.text ?? this.textOf(this.value()));
  /** What stands in the field; follows the design until somebody types. */
  protected readonly text = linkedSignal(() => this.shown());
  protected readonly note = linkedSignal<unknown, string | null>({ source: this.value, computation: () => null });

  /** The whole value, so that taking the entry back changes nothing. */
  private textOf(value: unknown): string {
    return typeof value === 'number' ? String(value).replace('-', '\u2212') : '';
  }

  protected type(text: string): void {
    this.text.set(text);
  }

  protected take(): void {
    const text = this.text();
    if (text === this.shown()) return;
    const entry = { pointer: this.pointer(), text, dimension: this.dimension(), shownUnit: this.unit(), optional: this.optional(), whole: this.whole() };
    const edit = editField(this.state.design(), entry);
    if (edit.kind === 'refused') {
      this.pending.keep({ pointer: this.pointer(), label: this.accessibleLabel(), text, reason: edit.reason, suggestion: edit.suggestion });
      return;
    }
    this.pending.drop(this.pointer());
    if (edit.kind === 'same') this.text.set(this.textOf(this.value()));
    else {
      this.state.change(`Set ${this.accessibleLabel()}`, () => edit.design);
      this.note.set(edit.note);
    }
  }

  protected takeSuggestion(suggestion: string): void {
    this.text.set(suggestion);
    this.take();
  }

  protected giveUp(): void {
    this.pending.drop(this.pointer());
    this.text.set(this.textOf(this.value()));
  }

  /** Steps from the value of the design; Shift makes ten steps at once. */
  protected stepBy(event: Event, direction: 1 | -1): void {
    const value = this.value();
    if (typeof value !== 'number' || !this.canEdit() || this.refused()) return;
    event.preventDefault();
    const step = (this.step() ?? ARROW_STEPS[this.dimension()]) * (event instanceof KeyboardEvent && event.shiftKey ? 10 : 1);
    // Whole steps are counted in decimals so that they do not gather rounding.
    const next = Number((value + direction * step).toPrecision(12));
    const entry = { pointer: this.pointer(), text: String(next), dimension: this.dimension(), shownUnit: this.unit(), optional: false, whole: this.whole() };
    const edit = editField(this.state.design(), entry);
    if (edit.kind === 'changed') this.state.change(`Set ${this.accessibleLabel()}`, () => edit.design, { mergeKey: `step ${this.pointer()}` });
  }
}
