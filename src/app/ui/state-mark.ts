import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

export type MarkState = 'empty' | 'in-work' | 'meets' | 'falls-short' | 'objection' | 'stale' | 'not-evaluated';

const WORDS: Readonly<Record<MarkState, string>> = {
  empty: 'empty',
  'in-work': 'in work',
  meets: 'meets',
  'falls-short': 'falls short',
  objection: 'serious remark',
  stale: 'stale',
  'not-evaluated': 'not evaluated',
};

export const markWord = (state: MarkState): string => WORDS[state];

/** The square of the house in one of its states: shape first, then colour, and always a word. */
@Component({
  selector: 'slant-state-mark',
  templateUrl: './state-mark.html',
  styleUrl: './state-mark.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StateMark {
  readonly state = input.required<MarkState>();
  /** Shows the word beside the mark; otherwise it is there for screen readers and as a tooltip. */
  readonly showWord = input(false);
  /** Says more than the word, such as the reason. */
  readonly detail = input<string | null>(null);
  protected readonly word = computed(() => WORDS[this.state()]);
  protected readonly title = computed(() => (this.detail() === null ? this.word() : `${this.word()}: ${this.detail()}`));
}
