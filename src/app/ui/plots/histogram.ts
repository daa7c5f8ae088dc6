import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, computed, inject, input, output, viewChild } from '@angular/core';
import { niceStep } from './axis-ticks';
import { colourIndex, colourMap, cssColour } from './colour-maps';
import type { ColourScale } from './colour-maps';
import { hostWidth } from './element-width';
import { binOf, symmetricBins } from './histogram-bins';
import { axisPx, axisTicks } from './plot-axis';
import type { LinearAxis } from './plot-axis';
import type { ExportablePlot, PlotPicture, PlotTable } from './plot-export';
import { fullNumberText, numberText } from './plot-text';
import { PlotThemes } from './plot-theme';
import { svgSnapshot } from './svg-snapshot';

const MARGIN = { left: 32, right: 8, top: 16, bottom: 30 };

/** How often values occur, in bins about zero coloured as on the map; marks the bin of one value and a band of ± one number. */
@Component({
  selector: 'slant-histogram',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './histogram.html',
  styleUrls: ['./plot-svg.scss', './histogram.scss'],
})
export class Histogram implements ExportablePlot {
  readonly values = input.required<ArrayLike<number>>();
  readonly scale = input.required<ColourScale>();
  readonly label = input.required<string>();
  /** Axis title without its unit, and the unit. */
  readonly quantity = input.required<string>();
  readonly unit = input.required<string>();
  /** Half width of the marked band, such as an RMS; null for none. */
  readonly band = input<number | null>(null);
  readonly bandLabel = input('RMS');
  /** The value whose bin is marked. */
  readonly marked = input<number | null>(null);
  /** Beyond this no bins are drawn; what lies there is counted into the end bins. */
  readonly limit = input(180);
  readonly counted = input('cells');
  readonly height = input(136);
  /** Values between the edges of a bin that was picked. */
  readonly picked = output<{ readonly from: number; readonly to: number }>();

  private readonly drawing = viewChild.required<ElementRef<SVGSVGElement>>('drawing');
  private readonly themes = inject(PlotThemes);
  protected readonly width = hostWidth();
  protected readonly bins = computed(() => symmetricBins(this.values(), this.limit()));
  protected readonly x = computed<LinearAxis>(() => {
    const { from, width, counts } = this.bins();
    return { from, to: from + width * counts.length, startPx: MARGIN.left, endPx: Math.max(MARGIN.left + 40, this.width() - MARGIN.right) };
  });
  protected readonly y = computed<LinearAxis>(() => {
    const step = this.countStep();
    const top = Math.max(step, Math.ceil(Math.max(...this.bins().counts) / step) * step);
    return { from: 0, to: top, startPx: this.height() - MARGIN.bottom, endPx: MARGIN.top };
  });
  private readonly countStep = computed(() => Math.max(1, niceStep(Math.max(1, ...this.bins().counts), 3)));
  protected readonly countTicks = computed(() => axisTicks(this.y(), this.countStep()));
  protected readonly valueTicks = computed(() => {
    const { from, to, endPx, startPx } = this.x();
    return axisTicks(this.x(), niceStep(to - from, Math.max(2, Math.floor((endPx - startPx) / 36))));
  });
  protected readonly bars = computed(() => {
    const { bins, x, y, scale } = { bins: this.bins(), x: this.x(), y: this.y(), scale: this.scale() };
    const map = colourMap(scale.map, this.themes.theme().name);
    const widthPx = axisPx(x, bins.from + bins.width) - axisPx(x, bins.from);
    return bins.counts.map((count, i) => {
      const from = bins.from + i * bins.width;
      const top = axisPx(y, count);
      return {
        ...{ from, to: from + bins.width, count, x: axisPx(x, from) + 0.5, y: top, width: Math.max(1, widthPx - 1), height: y.startPx - top },
        colour: cssColour(map, colourIndex(scale, from + bins.width / 2)),
        name: `${numberText(from, 2)} to ${numberText(from + bins.width, 2)} ${this.unit()}: ${count}`,
      };
    });
  });
  protected readonly markedBin = computed(() => {
    const marked = this.marked();
    return marked === null ? -1 : binOf(this.bins(), marked);
  });
  protected readonly markedPx = computed(() => {
    const { from, width } = this.bins();
    return axisPx(this.x(), from + (this.markedBin() + 0.5) * width);
  });
  protected readonly bandPx = computed(() => {
    const band = this.band();
    return band === null || band > this.x().to ? null : { low: axisPx(this.x(), -band), high: axisPx(this.x(), band), text: `${this.bandLabel()} ±${numberText(band, 2)}${this.unit()}` };
  });
  protected readonly axisTitle = computed(() => `${this.quantity()}, ${this.unit()} (bins of ${fullNumberText(this.bins().width)}${this.unit()})`);
  protected readonly summary = computed(() => {
    const beyond = this.bins().beyond;
    return `${this.label()}: ${this.values().length} values${beyond > 0 ? `, ${beyond} beyond the axis counted into its ends` : ''}`;
  });

  async exportPicture(): Promise<PlotPicture> {
    const drawing = this.drawing().nativeElement;
    const markup = this.themes.withPrinted((shelter) => svgSnapshot(drawing, shelter), drawing.parentElement ?? undefined);
    return { width: this.width(), height: this.height(), markup };
  }

  exportTable(): PlotTable {
    const bars = this.bars();
    const head = (end: string): string => `${this.quantity()} ${end}, ${this.unit()}`;
    return {
      columns: [
        { head: head('from'), values: bars.map(({ from }) => from) },
        { head: head('to'), values: bars.map(({ to }) => to) },
        { head: 'count', values: bars.map(({ count }) => count) },
      ],
    };
  }
}
