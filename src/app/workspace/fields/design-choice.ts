import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { fieldLabel } from '../../../../shared/model/design-labels';
import { valueAt } from '../../../../shared/model/design-pointer';
import { editValue } from '../design-field-edit';
import { WORKSPACE_STATE } from '../workspace-state';
import { RemarkList } from './remark-list';

export interface ChoiceOption {
  readonly value: string;
  readonly label: string;
}

let nextChoice = 0;

/** One of a few words of the design as a row of buttons, of which one is chosen. */
@Component({
  selector: 'slant-design-choice',
  imports: [RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset>
      <legend>{{ shownLabel() }}</legend>
      <span class="row">
        @for (option of options(); track option.value) {
          <label [class.chosen]="option.value === chosen()">
            <input
              type="radio"
              [name]="name"
              [value]="option.value"
              [checked]="option.value === chosen()"
              [disabled]="!canEdit()"
              (change)="choose(option)"
            />
            {{ option.label }}
          </label>
        }
      </span>
    </fieldset>
    <slant-remark-list [pointers]="remarkPointers()" />
  `,
  styleUrl: './design-choice.scss',
})
export class DesignChoice {
  private readonly state = inject(WORKSPACE_STATE);
  /** The field that holds the word: the word itself, or the kind of what stands there. */
  readonly pointer = input.required<string>();
  readonly options = input.required<readonly ChoiceOption[]>();
  readonly label = input<string | null>(null);
  /** With a choice that brings more than a word, the sheet does the change. */
  readonly handled = input(false);
  readonly picked = output<string>();

  protected readonly name = `slant-design-choice-${(nextChoice += 1)}`;
  protected readonly canEdit = this.state.canEdit;
  protected readonly shownLabel = computed(() => this.label() ?? fieldLabel(this.pointer()).label);
  protected readonly remarkPointers = computed(() => [this.pointer()]);
  protected readonly chosen = computed(() => {
    const value = valueAt(this.state.design(), this.pointer());
    return typeof value === 'string' ? value : valueAt(this.state.design(), `${this.pointer()}/kind`);
  });

  protected choose({ value, label }: ChoiceOption): void {
    this.picked.emit(value);
    if (this.handled()) return;
    const edit = editValue(this.state.design(), this.pointer(), value);
    if (edit.kind === 'changed') this.state.change(`${this.shownLabel()}: ${label}`, () => edit.design);
  }
}
