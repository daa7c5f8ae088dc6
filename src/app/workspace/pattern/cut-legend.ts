import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { CutFigure } from '../../ui/plots/cut-figure';
import { drawnId } from '../../ui/plots/drawn-id';

/** What the lines of a cut are, under its title. */
@Component({
  selector: 'slant-cut-legend',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <span class="entry"><svg width="26" height="8" aria-hidden="true"><path class="ink" d="M0 4H26" /></svg>{{ figure().main.label }}</span>
    @if (figure().cross; as cross) {
      <span class="entry"><svg width="26" height="8" aria-hidden="true"><path class="copper" d="M0 4H26" /></svg>{{ cross.label }}</span>
    }
    @if (figure().overlay; as overlay) {
      <span class="entry"><svg width="26" height="8" aria-hidden="true"><path class="patina" d="M0 4H26" /></svg>{{ overlay.label }}</span>
    }
    @if (figure().forbidden.length > 0) {
      <span class="entry">
        <svg width="26" height="10" aria-hidden="true">
          <pattern [attr.id]="hatch" width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><path class="hatch" d="M0 0V6" /></pattern>
          <rect width="26" height="9" [attr.fill]="'url(#' + hatch + ')'" />
          <path class="fail" d="M0 9.5H26" />
        </svg>
        {{ figure().forbiddenLabel }}
      </span>
    }
    @if (figure().least; as least) {
      <span class="entry"><svg width="14" height="8" aria-hidden="true"><path class="least" d="M0 4H14" /></svg>{{ least.label }}</span>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 2px 16px;
      padding: 2px 0 4px;
      font-size: var(--size-label);
      line-height: var(--line-label);
      color: var(--muted);
    }
    .entry {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      white-space: nowrap;
    }
    path {
      fill: none;
    }
    .ink {
      stroke: var(--ink);
      stroke-width: 1.6;
    }
    .copper {
      stroke: var(--copper);
      stroke-width: 1.6;
      stroke-dasharray: 1.5 2.5;
    }
    .patina {
      stroke: var(--patina);
      stroke-width: 1.3;
      stroke-dasharray: 5 3;
    }
    .hatch {
      stroke: var(--hatch);
      stroke-width: 1.6;
    }
    .fail {
      stroke: var(--fail);
    }
    .least {
      stroke: var(--ink);
      stroke-width: 2.2;
    }
  `,
})
export class CutLegend {
  readonly figure = input.required<CutFigure>();
  protected readonly hatch = drawnId('legend-hatch');
}
