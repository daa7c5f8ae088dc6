import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { fieldLabel } from '../../../../shared/model/design-labels';
import { valueAt } from '../../../../shared/model/design-pointer';
import { editValue } from '../design-field-edit';
import { EntryBox } from '../fields/entry-box';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { WORKSPACE_STATE } from '../workspace-state';

/** A formula of the design as text: taken when it can be read, else kept in its box with the reason. */
@Component({
  selector: 'slant-formula-field',
  imports: [EntryBox, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-entry-box [label]="label()" [bare]="true" [shown]="shown()" [refused]="refused()" [locked]="!canEdit()" (taken)="take($event)" (givenUp)="giveUp()" />
    <slant-remark-list [pointers]="remarkPointers()" />
  `,
  styleUrl: '../fields/design-field.scss',
  host: { '[class.refused]': 'refused() !== null' },
})
export class FormulaField {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);

  readonly pointer = input.required<string>();
  protected readonly canEdit = this.state.canEdit;
  protected readonly label = computed(() => fieldLabel(this.pointer()).label);
  protected readonly remarkPointers = computed(() => [this.pointer()]);
  protected readonly refused = computed(() => this.pending.of(this.pointer()));
  protected readonly shown = computed(() => this.refused()?.text ?? String(valueAt(this.state.design(), this.pointer()) ?? ''));

  protected take(text: string): void {
    const edit = editValue(this.state.design(), this.pointer(), text.trim());
    if (edit.kind === 'refused') {
      this.pending.keep({ pointer: this.pointer(), label: this.label(), text, reason: edit.reason, suggestion: null });
      return;
    }
    this.pending.drop(this.pointer());
    if (edit.kind === 'changed') this.state.change(`Set ${this.label()}`, () => edit.design);
  }

  protected giveUp(): void {
    this.pending.drop(this.pointer());
  }
}
