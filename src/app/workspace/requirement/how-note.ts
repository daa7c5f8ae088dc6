import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { REQUIREMENT_HOW } from './requirement-how';
import type { RequirementFigure } from './requirement-how';

/** A note that opens in its place: formula, conventions, limits and source of one figure. */
@Component({
  selector: 'slant-how-note',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let told = how();
    <details>
      <summary>How computed: {{ told.title }}</summary>
      <ul class="figure">
        @for (line of told.formula; track line) {
          <li>{{ line }}</li>
        }
      </ul>
      <p>{{ told.meaning }}</p>
      <p><b>Conventions:</b> {{ told.conventions }}.</p>
      <p><b>Valid for:</b> {{ told.validity }}</p>
      <p><b>Source:</b> {{ told.source }}.</p>
    </details>
  `,
  styleUrl: './how-note.scss',
})
export class HowNote {
  readonly figure = input.required<RequirementFigure>();
  protected readonly how = computed(() => REQUIREMENT_HOW[this.figure()]);
}
