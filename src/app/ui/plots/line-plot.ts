import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal, viewChild } from '@angular/core';
import { niceStep } from './axis-ticks';
import { drawnId } from './drawn-id';
import { hostWidth } from './element-width';
import type { LineFigure } from './line-figure';
import { axisPx, axisTicks, axisValue, linePath } from './plot-axis';
import type { LinearAxis } from './plot-axis';
import type { ExportablePlot, PlotPicture, PlotTable } from './plot-export';
import { fullNumberText } from './plot-text';
import { PlotThemes } from './plot-theme';
import { svgSnapshot } from './svg-snapshot';

const MARGIN = { left: 44, right: 10, top: 10, bottom: 32 };
/** Width of a letter of the mono face at the size of plots. */
const LETTER_PX = 6.8;
const LABEL_ROOM = 118;
const TALLEST_BAR = 0.28;

/** Curves over a common axis, with levels, bars of use and one chosen sample. Samples are picked by pointer or arrow keys. */
@Component({
  selector: 'slant-line-plot',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './line-plot.html',
  styleUrls: ['./plot-svg.scss', './line-plot.scss'],
})
export class LinePlot implements ExportablePlot {
  readonly figure = input.required<LineFigure>();
  readonly height = input(170);
  /** A sample of the first line that was picked. */
  readonly picked = output<number>();

  private readonly drawing = viewChild.required<ElementRef<SVGSVGElement>>('drawing');
  private readonly themes = inject(PlotThemes);
  protected readonly width = hostWidth();
  protected readonly clipId = drawnId('lines');
  protected readonly cursor = signal<number | null>(null);
  protected readonly x = computed<LinearAxis>(() => {
    const { figure, width } = { figure: this.figure(), width: this.width() };
    const room = figure.levels && figure.levels.length > 0 && width > 420 ? LABEL_ROOM : MARGIN.right;
    return { from: figure.x.from, to: figure.x.to, startPx: MARGIN.left, endPx: Math.max(MARGIN.left + 60, width - room) };
  });
  protected readonly y = computed<LinearAxis>(() => {
    const { y } = this.figure();
    return { from: y.from, to: y.to, startPx: this.height() - MARGIN.bottom, endPx: MARGIN.top };
  });
  protected readonly labelled = computed(() => this.x().endPx < this.width() - MARGIN.right);
  protected readonly xTicks = computed(() => axisTicks(this.x(), this.figure().x.step ?? niceStep(this.figure().x.to - this.figure().x.from, Math.max(2, (this.x().endPx - this.x().startPx) / 48))));
  protected readonly yTicks = computed(() => axisTicks(this.y(), this.figure().y.step ?? niceStep(Math.abs(this.figure().y.to - this.figure().y.from), Math.max(2, (this.height() - 42) / 22))));
  protected readonly paths = computed(() =>
    this.figure().lines.map((line) => {
      const xs = Array.from(line.x, (value) => axisPx(this.x(), value));
      const ys = Array.from(line.y, (value) => axisPx(this.y(), value));
      const squares = line.squares ? xs.map((x, i) => ({ x: x - 2, y: ys[i] - 2 })).filter(({ y }) => Number.isFinite(y)) : [];
      return { label: line.label, ink: line.ink, dashed: line.dashed ?? false, d: linePath(xs, ys), squares };
    }),
  );
  protected readonly levels = computed(() => {
    const { from, to } = this.figure().y;
    const inside = (this.figure().levels ?? []).filter(({ at }) => at >= Math.min(from, to) && at <= Math.max(from, to));
    return inside.map(({ at, label }) => ({ y: axisPx(this.y(), at), label }));
  });
  protected readonly bars = computed(() => {
    const bars = this.figure().bars;
    if (!bars) return [];
    const most = Math.max(1, ...Array.from(bars.counts));
    const tall = (this.y().startPx - this.y().endPx) * TALLEST_BAR;
    const room = bars.x.length > 1 ? Math.abs(axisPx(this.x(), bars.x[1]) - axisPx(this.x(), bars.x[0])) : 8;
    const width = Math.max(1.5, Math.min(6, room * 0.7));
    return Array.from(bars.counts, (count, i) => ({ x: axisPx(this.x(), bars.x[i]) - width / 2, width, height: (count / most) * tall, name: `${fullNumberText(bars.x[i])}: used ${count} times` }));
  });
  protected readonly chosen = computed(() => {
    const { chosen, lines } = this.figure();
    if (!chosen || chosen.at < 0 || chosen.at >= lines[0].x.length) return null;
    const x = axisPx(this.x(), lines[0].x[chosen.at]);
    const y = axisPx(this.y(), lines[0].y[chosen.at]);
    const flip = x + 20 + chosen.label.length * LETTER_PX > this.x().endPx;
    // The name stands near the upper edge, away from the curve's own squares.
    return { at: chosen.at, x, y, label: chosen.label, leader: `M${x} ${y}L${x + (flip ? -10 : 10)} ${MARGIN.top + 11}h${flip ? -6 : 6}`, textX: x + (flip ? -20 : 20), textY: MARGIN.top + 15, flip };
  });
  protected readonly readOut = computed(() => {
    const [line] = this.figure().lines;
    const at = this.cursor();
    return at === null || !line || at >= line.x.length ? '' : `${this.figure().x.title} ${fullNumberText(line.x[at])}; ${this.figure().y.title} ${fullNumberText(line.y[at])}`;
  });

  protected pick(event: MouseEvent): void {
    const box = this.drawing().nativeElement.getBoundingClientRect();
    const at = this.nearestSample(axisValue(this.x(), event.clientX - box.left));
    if (at >= 0) this.picked.emit(at);
  }

  protected pressKey(event: KeyboardEvent): void {
    const count = this.figure().lines[0]?.x.length ?? 0;
    const by = { ArrowLeft: -1, ArrowRight: 1, PageUp: 10, PageDown: -10, Home: -count, End: count }[event.key];
    if (by === undefined || count === 0) return;
    event.preventDefault();
    event.stopPropagation();
    const from = this.cursor() ?? this.figure().chosen?.at ?? 0;
    const at = Math.max(0, Math.min(count - 1, from + by));
    this.cursor.set(at);
    this.picked.emit(at);
  }

  private nearestSample(value: number): number {
    const [line] = this.figure().lines;
    let nearest = -1;
    for (let i = 0; line && i < line.x.length; i++) {
      if (nearest < 0 || Math.abs(line.x[i] - value) < Math.abs(line.x[nearest] - value)) nearest = i;
    }
    return nearest;
  }

  async exportPicture(): Promise<PlotPicture> {
    const drawing = this.drawing().nativeElement;
    const markup = this.themes.withPrinted((shelter) => svgSnapshot(drawing, shelter), drawing.parentElement ?? undefined);
    return { width: this.width(), height: this.height(), markup };
  }

  exportTable(): PlotTable {
    const { lines, x, y, bars } = this.figure();
    const columns = lines.flatMap((line, i) => [
      ...(i === 0 || line.x !== lines[0].x ? [{ head: lines.length > 1 ? `${x.title} (${line.label})` : x.title, values: line.x }] : []),
      { head: lines.length > 1 ? `${y.title} (${line.label})` : y.title, values: line.y },
    ]);
    return { columns: bars ? [...columns, { head: 'times used', values: bars.counts }] : columns };
  }
}
