import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { keyStops, keyTicks } from './colour-key-scale';
import type { ColourScale } from './colour-maps';
import { drawnId } from './drawn-id';
import { hostWidth } from './element-width';
import { PlotThemes } from './plot-theme';

const SIDE = 14;

/** What the colours of a map mean: a bar with ticks. */
@Component({
  selector: 'slant-colour-key',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="title" [id]="titleId">{{ label() }}</div>
    <svg role="img" [attr.aria-labelledby]="titleId" [attr.width]="bar() + 2 * side" height="32">
      <defs>
        <linearGradient [attr.id]="gradient">
          @for (stop of stops(); track stop.at) {
            <stop [attr.offset]="stop.at" [attr.stop-color]="stop.colour" />
          }
        </linearGradient>
      </defs>
      <g [attr.transform]="'translate(' + side + ' 0)'">
        <rect class="frame" x="0.5" y="2.5" [attr.width]="bar() - 1" height="11" [style.fill]="'url(#' + gradient + ')'" />
        @for (tick of ticks(); track tick.at) {
          <path class="line" [class.wrap]="tick.wrap" [attr.d]="'M' + tick.at * bar() + (tick.wrap ? ' 0V17' : ' 10V17')" />
          <text class="middle" [attr.x]="tick.at * bar()" y="29">{{ tick.text }}</text>
        }
      </g>
    </svg>
  `,
  styleUrls: ['./plot-svg.scss', './colour-key.scss'],
})
export class ColourKey {
  readonly scale = input.required<ColourScale>();
  readonly label = input.required<string>();
  readonly maxWidth = input(300);

  protected readonly gradient = drawnId('key');
  protected readonly titleId = drawnId('key-title');
  protected readonly side = SIDE;
  private readonly themes = inject(PlotThemes);
  private readonly width = hostWidth();
  protected readonly bar = computed(() => Math.max(80, Math.min(this.maxWidth(), this.width() - 2 * SIDE)));
  protected readonly stops = computed(() => keyStops(this.scale(), this.themes.theme().name));
  protected readonly ticks = computed(() => keyTicks(this.scale(), Math.max(2, Math.floor(this.bar() / 34))));
}
