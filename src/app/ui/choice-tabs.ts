import { ChangeDetectionStrategy, Component, ElementRef, inject, input, output } from '@angular/core';

export interface TabChoice {
  readonly id: string;
  readonly label: string;
}

/** A row of choices of which one holds: a radio group in the look of the house. Arrow keys move, as in any radio group. */
@Component({
  selector: 'slant-choice-tabs',
  template: `
    <div class="tabs" role="radiogroup" [attr.aria-label]="label()">
      @for (choice of choices(); track choice.id; let index = $index) {
        <button
          type="button"
          role="radio"
          [attr.aria-checked]="choice.id === value()"
          [attr.tabindex]="choice.id === value() ? 0 : -1"
          [class.on]="choice.id === value()"
          (click)="chosen.emit(choice.id)"
          (keydown)="moveTo($event, index)"
        >
          {{ choice.label }}
        </button>
      }
    </div>
  `,
  styleUrl: './choice-tabs.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChoiceTabs {
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  readonly label = input.required<string>();
  readonly choices = input.required<readonly TabChoice[]>();
  readonly value = input.required<string>();
  readonly chosen = output<string>();

  protected moveTo(event: KeyboardEvent, index: number): void {
    const step = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const choices = this.choices();
    const next = (index + step + choices.length) % choices.length;
    this.chosen.emit(choices[next].id);
    this.host.nativeElement.querySelectorAll<HTMLButtonElement>('button')[next]?.focus();
  }
}
