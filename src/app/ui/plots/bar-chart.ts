import type { ElementRef } from '@angular/core';
import { ChangeDetectionStrategy, Component, computed, inject, input, viewChild } from '@angular/core';
import { niceStep } from './axis-ticks';
import { hostWidth } from './element-width';
import { axisPx, axisTicks } from './plot-axis';
import type { LinearAxis } from './plot-axis';
import type { ExportablePlot, PlotPicture, PlotTable } from './plot-export';
import { PlotThemes } from './plot-theme';
import { svgSnapshot } from './svg-snapshot';

/** One bar with its name; null where there is no value, with the reason as its text. */
export interface NamedBar {
  readonly name: string;
  readonly value: number | null;
  /** The value in words, with its sign and unit, or why there is none. */
  readonly text: string;
}

const ROW_PX = 20;
const MARGIN = { top: 4, bottom: 32, right: 8 };
const LETTER_PX = 6.2;
const VALUE_ROOM = 76;
/** Of the mono face in which values and reasons stand. */
const FIGURE_LETTER_PX = 6.7;

/** Named bars from a common zero, one below the other, with their values at their ends. */
@Component({
  selector: 'slant-bar-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './bar-chart.html',
  styleUrls: ['./plot-svg.scss', './bar-chart.scss'],
})
export class BarChart implements ExportablePlot {
  readonly bars = input.required<readonly NamedBar[]>();
  /** Quantity and unit of the values. */
  readonly axisTitle = input.required<string>();
  readonly label = input.required<string>();

  private readonly drawing = viewChild.required<ElementRef<SVGSVGElement>>('drawing');
  private readonly themes = inject(PlotThemes);
  protected readonly width = hostWidth();
  protected readonly height = computed(() => MARGIN.top + MARGIN.bottom + ROW_PX * this.bars().length);
  private readonly nameRoom = computed(() => Math.min(this.width() * 0.45, 10 + LETTER_PX * Math.max(0, ...this.bars().map(({ name }) => name.length))));
  protected readonly x = computed<LinearAxis>(() => {
    const values = this.bars().map(({ value }) => value ?? 0);
    const [least, most] = [Math.min(0, ...values), Math.max(0, ...values)];
    const flat = least === most;
    const startPx = this.nameRoom() + (least < 0 ? VALUE_ROOM : 0);
    const endPx = Math.max(startPx + 40, this.width() - MARGIN.right - (most > 0 || flat ? VALUE_ROOM : 0));
    return { from: least, to: flat ? 1 : most, startPx, endPx };
  });
  protected readonly ticks = computed(() => axisTicks(this.x(), niceStep(this.x().to - this.x().from, Math.max(2, (this.x().endPx - this.x().startPx) / 56))));
  protected readonly zeroPx = computed(() => axisPx(this.x(), 0));
  protected readonly edges = computed(() => ({ top: MARGIN.top, bottom: this.height() - MARGIN.bottom }));
  protected readonly drawn = computed(() =>
    this.bars().map(({ name, value, text }, i) => {
      const y = MARGIN.top + i * ROW_PX;
      const [end, zero] = [axisPx(this.x(), value ?? 0), this.zeroPx()];
      if (value === null) return { name, missing: true, x: zero, width: 0, y: y + 4, baseline: y + 14, ...this.reasonBeside(text) };
      const leftward = value < 0;
      return { name, text, missing: false, x: Math.min(end, zero), width: Math.max(1, Math.abs(end - zero)), y: y + 4, baseline: y + 14, textX: leftward ? end - 5 : end + 5, leftward };
    }),
  );
  protected readonly summary = computed(() => `${this.label()}: ${this.bars().map(({ name, text }) => `${name} ${text}`).join('; ')}`);

  /** A reason stands where a bar would, on the roomier side of zero; what finds no room there is in the summary and the table. */
  private reasonBeside(reason: string): { readonly text: string; readonly textX: number; readonly leftward: boolean } {
    const zero = this.zeroPx();
    const [left, right] = [zero - this.nameRoom(), this.width() - zero];
    const letters = Math.floor((Math.max(left, right) - 10) / FIGURE_LETTER_PX);
    const text = reason.length <= letters ? reason : `${reason.slice(0, Math.max(0, letters - 1)).trimEnd()}…`;
    return left > right ? { text, textX: zero - 5, leftward: true } : { text, textX: zero + 5, leftward: false };
  }

  async exportPicture(): Promise<PlotPicture> {
    const drawing = this.drawing().nativeElement;
    const markup = this.themes.withPrinted((shelter) => svgSnapshot(drawing, shelter), drawing.parentElement ?? undefined);
    return { width: this.width(), height: this.height(), markup };
  }

  exportTable(): PlotTable {
    const bars = this.bars();
    return {
      columns: [
        { head: 'name', values: bars.map(({ name }) => name) },
        { head: this.axisTitle(), values: bars.map(({ value, text }) => value ?? text) },
      ],
    };
  }
}
