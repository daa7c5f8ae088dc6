import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, computed, effect, inject, input, model, output, signal, viewChild } from '@angular/core';
import type { Config } from 'plotly.js-dist-min';
import { levelAt, nearestSample } from './cut-figure';
import type { CutFigure } from './cut-figure';
import { cutAxes, cutDrawing } from './cut-plot-drawing';
import type { CutWindow } from './cut-plot-drawing';
import { movedCut, wholeCut, windowOfRelayout, zoomedCut } from './cut-window';
import { hostWidth } from './element-width';
import { axisPx, axisValue } from './plot-axis';
import type { ExportablePlot, PlotPicture, PlotTable } from './plot-export';
import { PlotLibrary } from './plot-library';
import type { PlotLibraryModule } from './plot-library';
import { fullNumberText } from './plot-text';
import { PlotThemes } from './plot-theme';
import type { PlotTheme } from './plot-theme';

type DragMode = 'zoom' | 'pan' | false;

const CONFIG: Partial<Config> = { displayModeBar: false, responsive: false, doubleClick: false, showTips: false };
const ZOOM_STEP = 1.6;
const COARSE_SAMPLES = 10;

interface RelayoutSource {
  on(event: 'plotly_relayout', listener: (event: Readonly<Record<string, unknown>>) => void): void;
}

/** A rectangular cut in dB over angle, with mask, comparison and numbered markers; zoomed by box, wheel, buttons and keys. */
@Component({
  selector: 'slant-cut-plot',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './cut-plot.html',
  styleUrls: ['./plot-svg.scss', './cut-plot.scss'],
})
export class CutPlot implements ExportablePlot {
  readonly figure = input.required<CutFigure>();
  readonly height = input(300);
  /** The part shown; null for the whole cut. */
  readonly window = model<CutWindow | null>(null);
  /** Angle of the cursor, shared with other views of the cut. */
  readonly cursorDeg = model<number | null>(null);
  /** An angle at which a marker is wanted: Enter at the cursor, or a click. */
  readonly marked = output<number>();

  private readonly plot = viewChild.required<ElementRef<HTMLElement>>('plot');
  private readonly themes = inject(PlotThemes);
  private readonly library = inject(PlotLibrary);
  private readonly document = inject(DOCUMENT);
  private readonly loaded = signal<PlotLibraryModule | null>(null);
  private listening = false;
  protected readonly trouble = signal('');
  protected readonly width = hostWidth();
  /** A finger scrolls the page, so dragging is off where the pointer is coarse until it is asked for. */
  protected readonly dragMode = signal<DragMode>(this.document.defaultView?.matchMedia?.('(pointer: coarse)').matches ? false : 'zoom');
  protected readonly shown = computed(() => this.window() ?? wholeCut(this.figure()));
  protected readonly axes = computed(() => cutAxes(this.shown(), this.width(), this.height()));
  protected readonly cursor = computed(() => {
    const angle = this.cursorDeg();
    const { fromDeg, toDeg, floorDb } = this.shown();
    if (angle === null || angle < fromDeg || angle > toDeg) return null;
    const level = levelAt(this.figure().main, angle);
    const { x, y } = this.axes();
    return { x: axisPx(x, angle), top: y.endPx, bottom: y.startPx, y: level ? axisPx(y, Math.max(floorDb, level.levelDb)) : null };
  });
  protected readonly readOut = computed(() => {
    const angle = this.cursorDeg();
    if (angle === null) return '';
    const { main, cross, overlay, levelTitle } = this.figure();
    const level = levelAt(main, angle);
    if (!level) return '';
    const other = overlay && levelAt(overlay, angle);
    const unit = levelTitle.replace(/^.*, /, '');
    const parts = [`${fullNumberText(angle)}°: ${fullNumberText(level.levelDb)} ${unit}`];
    const crossLevel = cross && levelAt(cross, angle);
    if (cross && crossLevel) parts.push(`${cross.label} ${fullNumberText(crossLevel.levelDb)}`);
    if (overlay && other) parts.push(`${overlay.label.replace(/,.*$/, '')} ${fullNumberText(other.levelDb)}`);
    if (level.interpolated || other?.interpolated) parts.push('interpolated');
    return parts.join('; ');
  });

  constructor() {
    this.library.load().then(
      (module) => this.loaded.set(module),
      (error: unknown) => this.trouble.set(`The plot library could not be fetched: ${error instanceof Error ? error.message : String(error)}`),
    );
    effect(() => {
      const [module, width] = [this.loaded(), this.width()];
      const [figure, size, theme, dragmode] = [this.figure(), { window: this.shown(), width, height: this.height() }, this.themes.theme(), this.dragMode()];
      if (module && width > 0) void this.draw(module, figure, { size, theme, dragmode });
    });
    inject(DestroyRef).onDestroy(() => this.loaded()?.purge(this.plot().nativeElement));
  }

  private async draw(module: PlotLibraryModule, figure: CutFigure, how: { size: { window: CutWindow; width: number; height: number }; theme: PlotTheme; dragmode: DragMode }): Promise<void> {
    const element = this.plot().nativeElement;
    const { data, layout } = cutDrawing(figure, how.size, how.theme);
    await module.react(element, data, { ...layout, dragmode: how.dragmode }, CONFIG);
    if (this.listening) return;
    this.listening = true;
    (element as unknown as RelayoutSource).on('plotly_relayout', (event) => {
      const after = windowOfRelayout(event, this.shown());
      if (after !== undefined) this.window.set(after);
    });
  }

  protected zoomBy(times: number, aboutDeg?: number): void {
    const { fromDeg, toDeg } = this.shown();
    const cursor = this.cursorDeg();
    const about = aboutDeg ?? (cursor !== null && cursor > fromDeg && cursor < toDeg ? cursor : (fromDeg + toDeg) / 2);
    this.window.set(zoomedCut(this.figure(), this.shown(), about, times));
  }

  protected zoomIn(): void {
    this.zoomBy(ZOOM_STEP);
  }

  protected zoomOut(): void {
    this.zoomBy(1 / ZOOM_STEP);
  }

  protected moveWindow(part: number): void {
    this.window.set(movedCut(this.figure(), this.shown(), part));
  }

  protected reset(): void {
    this.window.set(null);
  }

  protected toggleDrag(mode: 'zoom' | 'pan'): void {
    this.dragMode.update((now) => (now === mode ? false : mode));
  }

  protected turnWheel(event: WheelEvent): void {
    const times = Math.exp(-event.deltaY * 0.002);
    // On the whole cut the wheel belongs to the page.
    if (times < 1 && this.window() === null) return;
    event.preventDefault();
    this.zoomBy(times, this.angleOf(event));
  }

  protected point(event: MouseEvent): void {
    const angle = this.angleOf(event);
    const { fromDeg, toDeg } = this.shown();
    this.cursorDeg.set(angle >= fromDeg && angle <= toDeg ? angle : null);
  }

  private angleOf(event: MouseEvent): number {
    const box = this.plot().nativeElement.getBoundingClientRect();
    return axisValue(this.axes().x, event.clientX - box.left);
  }

  protected pressKey(event: KeyboardEvent): void {
    const step = event.shiftKey ? COARSE_SAMPLES : 1;
    const count = this.figure().main.angleDeg.length;
    const walk = { ArrowLeft: -step, ArrowRight: step, Home: -count, End: count }[event.key];
    const cursor = this.cursorDeg();
    if (walk !== undefined) this.walk(walk);
    else if (event.key === '+' || event.key === '=') this.zoomIn();
    else if (event.key === '-') this.zoomOut();
    else if (event.key === '0') this.reset();
    else if (event.key === 'Enter' && cursor !== null) this.marked.emit(cursor);
    else return;
    event.preventDefault();
    event.stopPropagation();
  }

  /** Moves the cursor from sample to sample and the window with it. */
  private walk(by: number): void {
    const { main, marks } = this.figure();
    if (main.angleDeg.length === 0) return;
    const from = this.cursorDeg() ?? marks[0]?.angleDeg ?? 0;
    const at = Math.max(0, Math.min(main.angleDeg.length - 1, nearestSample(main, from) + by));
    const angle = main.angleDeg[at];
    this.cursorDeg.set(angle);
    const { fromDeg, toDeg } = this.shown();
    if (angle < fromDeg || angle > toDeg) this.window.set(movedCut(this.figure(), this.shown(), (angle - (fromDeg + toDeg) / 2) / (toDeg - fromDeg)));
  }

  async exportPicture(): Promise<PlotPicture> {
    const module = await this.library.load();
    const size = { window: this.shown(), width: this.width(), height: this.height() };
    const { data, layout } = cutDrawing(this.figure(), size, this.themes.printed());
    const svg = await module.toImage({ data, layout, config: CONFIG }, { format: 'svg', width: size.width, height: size.height, imageDataOnly: true });
    return { width: size.width, height: size.height, markup: svg.replace(/^[^<]*<\?xml[^>]*\?>/, '') };
  }

  exportTable(): PlotTable {
    const { angleTitle, levelTitle, main, cross, overlay } = this.figure();
    const columns = [{ head: angleTitle, values: main.angleDeg }, { head: `${levelTitle} (${main.label})`, values: main.levelDb }];
    if (cross) columns.push({ head: `${levelTitle} (${cross.label})`, values: cross.levelDb });
    if (overlay) columns.push({ head: `${angleTitle} (${overlay.label})`, values: overlay.angleDeg }, { head: `${levelTitle} (${overlay.label})`, values: overlay.levelDb });
    return { columns };
  }
}
