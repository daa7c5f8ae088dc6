import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { fieldLabel } from '../../../../shared/model/design-labels';
import { valueAt } from '../../../../shared/model/design-pointer';
import { editValue } from '../design-field-edit';
import { WORKSPACE_STATE } from '../workspace-state';
import { ChoiceRow } from './choice-row';
import type { ChoiceOption } from './choice-row';
import { RemarkList } from './remark-list';

/** One of a few words of the design as a row of buttons, of which one is chosen. */
@Component({
  selector: 'slant-design-choice',
  imports: [ChoiceRow, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-choice-row [label]="shownLabel()" [options]="options()" [chosen]="chosen()" [locked]="!canEdit()" (picked)="choose($event)" />
    <slant-remark-list [pointers]="remarkPointers()" />
  `,
  styleUrl: './design-field.scss',
})
export class DesignChoice {
  private readonly state = inject(WORKSPACE_STATE);
  /** The field that holds the word, or the choice whose kind it is. */
  readonly pointer = input.required<string>();
  readonly options = input.required<readonly ChoiceOption[]>();
  readonly label = input<string | null>(null);
  /** With a choice that brings more than a word, the sheet does the change and shows the remarks. */
  readonly handled = input(false);
  readonly picked = output<string>();

  protected readonly canEdit = this.state.canEdit;
  protected readonly shownLabel = computed(() => this.label() ?? fieldLabel(this.pointer()).label);
  protected readonly remarkPointers = computed(() => (this.handled() ? [] : [this.pointer()]));
  protected readonly chosen = computed(() => {
    const value = valueAt(this.state.design(), this.pointer());
    const word = typeof value === 'string' ? value : valueAt(value, '/kind');
    return typeof word === 'string' ? word : null;
  });

  protected choose(value: string): void {
    this.picked.emit(value);
    const option = this.options().find((candidate) => candidate.value === value);
    if (this.handled() || !option) return;
    const edit = editValue(this.state.design(), this.pointer(), value);
    if (edit.kind === 'changed') this.state.change(`${this.shownLabel()}: ${option.label}`, () => edit.design);
  }
}
