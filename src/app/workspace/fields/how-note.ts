import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { HowComputed } from '../how-computed';

/** How a figure of a sheet is computed, folded away below it. */
@Component({
  selector: 'slant-how-note',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let said = how();
    <details>
      <summary>How computed: {{ said.title.toLowerCase() }}</summary>
      <ul class="figure">
        @for (line of said.formula; track line) {
          <li>{{ line }}</li>
        }
      </ul>
      <p>{{ said.meaning }}</p>
      <p><b>Conventions.</b> {{ said.conventions }}</p>
      <p><b>Valid for.</b> {{ said.validity }}</p>
      <p><b>Source.</b> {{ said.source }}</p>
    </details>
  `,
  styles: `
    :host {
      display: block;
      min-width: 0;
      font-size: var(--size-small);
      line-height: var(--line-text);
      color: var(--muted);
    }
    summary {
      cursor: pointer;
    }
    ul {
      list-style: none;
      margin: var(--s2) 0;
      padding: 0;
      overflow-x: auto;
      color: var(--ink);
    }
    p {
      margin: 0 0 var(--s2);
      max-width: 62ch;
    }
  `,
})
export class HowNote {
  readonly how = input.required<HowComputed>();
}
