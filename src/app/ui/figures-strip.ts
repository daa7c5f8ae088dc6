import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { FigureCell } from './figure-cell';
import type { StripCell } from './figure-cell';

/** The always-visible row of headline figures. */
@Component({
  selector: 'slant-figures-strip',
  imports: [FigureCell],
  template: `
    <section aria-label="Headline figures" [class.stale]="stale()" [class.waiting]="waiting()" [attr.aria-busy]="waiting()">
      @for (figure of figures(); track figure.id) {
        <slant-figure-cell [figure]="figure" [against]="against()" (explain)="explain.emit(figure.id)" />
      }
    </section>
  `,
  styleUrl: './figures-strip.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FiguresStrip {
  readonly figures = input.required<readonly StripCell[]>();
  /** "vs 3" beside each trend; empty when there is no parent. */
  readonly against = input('');
  readonly stale = input(false);
  /** An answer for a newer design is under way; the figures are those of the one before. */
  readonly waiting = input(false);
  readonly explain = output<string>();
}
