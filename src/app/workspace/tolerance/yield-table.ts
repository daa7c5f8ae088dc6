import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { YieldRow } from './tolerance-rows';

/** Each line of the requirement with how many panels meet it, and how sure that is. */
@Component({
  selector: 'slant-yield-table',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="scroll" tabindex="0" role="group" aria-label="Yield per line of the requirement">
      <table class="data-table">
        <thead>
          <tr>
            <th scope="col" class="text">Line</th>
            <th scope="col">Limit</th>
            <th scope="col">As drawn</th>
            <th scope="col">P5</th>
            <th scope="col">P50</th>
            <th scope="col">P95</th>
            <th scope="col" class="narrow">Panels that meet it</th>
            <th scope="col" class="narrow">95 % interval</th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.name) {
            <tr>
              <td class="text name">{{ row.name }}</td>
              <td class="plain">{{ row.limit }}</td>
              <td class="plain">{{ row.nominal }}</td>
              @if (row.reason; as reason) {
                <td class="text why" colspan="5">Not judged: {{ reason }}</td>
              } @else {
                <td class="plain">{{ row.p5 }}</td>
                <td class="plain">{{ row.p50 }}</td>
                <td class="plain">{{ row.p95 }}</td>
                <td class="narrow">{{ row.share }}</td>
                <td class="interval" [class.pass]="row.word === 'high'" [class.fail]="row.word === 'low'">{{ row.interval }}</td>
              }
            </tr>
          } @empty {
            <tr><td class="text" colspan="8">The requirement has no limit.</td></tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    .interval {
      white-space: normal;
      min-width: 9ch;
      text-wrap: balance;
    }
    :host {
      display: grid;
      min-width: 0;
    }
    .scroll {
      overflow-x: auto;
    }
    .plain {
      white-space: nowrap;
    }
    /* Rather two lines than an interval out of sight. */
    .name,
    .narrow {
      white-space: normal;
    }
    .name {
      min-width: 88px;
    }
    .why {
      font-size: var(--size-label);
      color: var(--muted);
      white-space: normal;
    }
  `,
})
export class YieldTable {
  readonly rows = input.required<readonly YieldRow[]>();
}
