import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** What went wrong and what to do, read out at once; the id of the request below it, by which the log can be searched. */
@Component({
  selector: 'slant-fault-note',
  template: `
    <p role="alert">{{ text() }}</p>
    @if (requestId(); as id) {
      <p class="request">Request <span class="figure">{{ id }}</span></p>
    }
    <ng-content />
  `,
  styles: `
    :host {
      display: block;
      padding-left: var(--s3);
      border-left: 2px solid var(--fail);
      color: var(--fail);
      font-size: var(--size-small);
      line-height: var(--line-small);
    }
    .request {
      color: var(--muted);
      font-size: var(--size-label);
      line-height: var(--line-label);
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FaultNote {
  readonly text = input.required<string>();
  readonly requestId = input<string | undefined>();
}
