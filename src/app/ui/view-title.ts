import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Title of a view with a hairline to the right and its scale or unit at the end. */
@Component({
  selector: 'slant-view-title',
  template: `
    <h2 [id]="titleId()">{{ text() }}</h2>
    <span class="line"></span>
    @if (unit()) {
      <span class="unit figure">{{ unit() }}</span>
    }
    <ng-content />
  `,
  styles: `
    :host {
      display: flex;
      align-items: baseline;
      gap: 8px;
      min-width: 0;
    }
    h2 {
      font-size: var(--size-text);
      line-height: 20px;
      font-weight: 620;
      font-stretch: var(--stretch-heading);
      overflow-wrap: anywhere;
    }
    .line {
      flex: 1;
      min-width: 8px;
      height: 1px;
      background: var(--rule);
      align-self: center;
    }
    .unit {
      color: var(--muted);
      font-size: var(--size-label);
      overflow: hidden;
      text-overflow: ellipsis;
      white-space: nowrap;
    }
    /* On a phone what does not fit goes on below at the right, so that neither title nor unit is cut. */
    @media (max-width: 640px) {
      :host {
        flex-wrap: wrap;
        justify-content: flex-end;
        gap: 0 8px;
      }
      .unit {
        white-space: normal;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ViewTitle {
  readonly text = input.required<string>();
  readonly unit = input('');
  readonly titleId = input<string | null>(null);
}
