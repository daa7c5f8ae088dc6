import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

export interface ChoiceOption {
  readonly value: string;
  readonly label: string;
}

let nextRow = 0;

/** A few words in a row of which one is chosen: native radio buttons, so that keys and screen readers know them. */
@Component({
  selector: 'slant-choice-row',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset>
      <legend>{{ label() }}</legend>
      <span class="row">
        @for (option of options(); track option.value) {
          <label [class.chosen]="option.value === chosen()">
            <input
              type="radio"
              [name]="name"
              [value]="option.value"
              [checked]="option.value === chosen()"
              [disabled]="locked()"
              (change)="picked.emit(option.value)"
            />
            {{ option.label }}
          </label>
        }
      </span>
    </fieldset>
  `,
  styleUrl: './choice-row.scss',
})
export class ChoiceRow {
  readonly label = input.required<string>();
  readonly options = input.required<readonly ChoiceOption[]>();
  readonly chosen = input.required<string | null>();
  readonly locked = input(false);
  readonly picked = output<string>();
  protected readonly name = `slant-choice-row-${(nextRow += 1)}`;
}
