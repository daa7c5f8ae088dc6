import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** What will stand here, why nothing does yet, and the first thing to do. A sketch is projected with the attribute `sketch`. */
@Component({
  selector: 'slant-empty-state',
  template: `
    <ng-content select="[sketch]" />
    <h2>{{ title() }}</h2>
    <p>{{ text() }}</p>
    <ng-content />
  `,
  styles: `
    :host {
      display: grid;
      justify-items: center;
      gap: var(--s2);
      padding: var(--s8) var(--s4);
      text-align: center;
      color: var(--muted);
    }
    h2 {
      font-size: var(--size-title);
      line-height: var(--line-title);
      font-stretch: var(--stretch-heading);
      font-weight: 620;
      color: var(--ink);
    }
    p {
      max-width: 46ch;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EmptyState {
  readonly title = input.required<string>();
  readonly text = input.required<string>();
}
