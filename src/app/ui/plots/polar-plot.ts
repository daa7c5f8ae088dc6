import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, computed, inject, input, viewChild } from '@angular/core';
import type { CutFigure } from './cut-figure';
import { drawnId } from './drawn-id';
import { hostWidth } from './element-width';
import type { ExportablePlot, PlotPicture, PlotTable } from './plot-export';
import { PlotThemes } from './plot-theme';
import { placeBalloons } from './place-balloons';
import { polarFrame, polarGrid, polarPath, polarPoint } from './polar-drawing';
import { svgSnapshot } from './svg-snapshot';

/** Balloons need room; a small polar form goes without. */
const SMALLEST_WITH_MARKS_PX = 150;

/** A cut in its polar form. */
@Component({
  selector: 'slant-polar-plot',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './polar-plot.html',
  styleUrls: ['./plot-svg.scss', './polar-plot.scss'],
})
export class PolarPlot implements ExportablePlot {
  readonly figure = input.required<CutFigure>();
  readonly height = input(156);
  /** Angle of the common cursor. */
  readonly cursorDeg = input<number | null>(null);

  private readonly drawing = viewChild.required<ElementRef<SVGSVGElement>>('drawing');
  private readonly themes = inject(PlotThemes);
  protected readonly width = hostWidth();
  protected readonly clipId = drawnId('polar');
  protected readonly frame = computed(() => polarFrame(this.figure(), Math.max(120, this.width()), this.height()));
  protected readonly grid = computed(() => polarGrid(this.frame(), this.figure()));
  protected readonly half = computed(() => this.figure().fromDeg >= -90 && this.figure().toDeg <= 90);
  protected readonly mainPath = computed(() => polarPath(this.frame(), this.figure().main));
  protected readonly crossPath = computed(() => {
    const { cross } = this.figure();
    return cross ? polarPath(this.frame(), cross) : null;
  });
  protected readonly overlayPath = computed(() => {
    const overlay = this.figure().overlay;
    return overlay ? polarPath(this.frame(), overlay) : null;
  });
  protected readonly edgePaths = computed(() => this.figure().forbidden.map((edge) => polarPath(this.frame(), edge)));
  protected readonly marks = computed(() => {
    const frame = this.frame();
    if (frame.radius < SMALLEST_WITH_MARKS_PX) return [];
    const anchors = this.figure().marks.map((mark) => ({ name: mark.name, ...polarPoint(frame, mark.angleDeg, mark.levelDb) }));
    return placeBalloons(anchors, { width: this.width(), height: this.height(), obstacles: [], awayFrom: { x: frame.centreX, y: frame.centreY } });
  });
  protected readonly cursor = computed(() => {
    const angle = this.cursorDeg();
    return angle === null ? null : polarPoint(this.frame(), angle, this.figure().topDb);
  });

  async exportPicture(): Promise<PlotPicture> {
    const drawing = this.drawing().nativeElement;
    const markup = this.themes.withPrinted((shelter) => svgSnapshot(drawing, shelter), drawing.parentElement ?? undefined);
    return { width: this.width(), height: this.height(), markup };
  }

  exportTable(): PlotTable {
    const { angleTitle, levelTitle, main, cross, overlay } = this.figure();
    const columns = [{ head: angleTitle, values: main.angleDeg }, { head: `${levelTitle} (${main.label})`, values: main.levelDb }];
    if (cross) columns.push({ head: `${levelTitle} (${cross.label})`, values: cross.levelDb });
    if (overlay) columns.push({ head: `${angleTitle} (${overlay.label})`, values: overlay.angleDeg }, { head: `${levelTitle} (${overlay.label})`, values: overlay.levelDb });
    return { columns };
  }
}
