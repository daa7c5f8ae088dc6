import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { parseQuantity } from '../../../../shared/units/quantity';
import type { QuantityDimension } from '../../../../shared/units/quantity';
import { EntryBox } from '../fields/entry-box';
import type { EntryStep, RefusedEntry } from '../fields/entry-box';
import { fieldText, steppedValue } from '../fields/field-text';

/** A number of the view, not of the design: anyone may change it, and it is kept within its range. */
@Component({
  selector: 'slant-view-number',
  imports: [EntryBox],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<slant-entry-box [label]="label()" [bare]="bare()" [unit]="unit()" [shown]="shown()" [refused]="refused()" (taken)="take($event)" (givenUp)="refused.set(null)" (stepped)="step($event)" />`,
})
export class ViewNumber {
  readonly label = input.required<string>();
  readonly value = input.required<number>();
  readonly dimension = input.required<QuantityDimension>();
  readonly unit = input('');
  readonly least = input.required<number>();
  readonly most = input.required<number>();
  readonly bare = input(false);
  readonly changed = output<number>();

  protected readonly shown = computed(() => fieldText(this.value()));
  protected readonly refused = signal<RefusedEntry | null>(null);

  protected take(text: string): void {
    const parsed = parseQuantity(text, this.dimension());
    if (parsed.kind === 'refused') this.refused.set({ reason: parsed.reason, suggestion: parsed.suggestion ?? null });
    else if (parsed.value < this.least() || parsed.value > this.most()) this.refused.set({ reason: `from ${this.least()} to ${this.most()}${this.unit()}`, suggestion: null });
    else {
      this.refused.set(null);
      this.changed.emit(parsed.value);
    }
  }

  protected step(step: EntryStep): void {
    this.refused.set(null);
    this.changed.emit(Math.max(this.least(), Math.min(this.most(), steppedValue(this.value(), step, 1))));
  }
}
