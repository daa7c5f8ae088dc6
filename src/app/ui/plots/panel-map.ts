import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, DOCUMENT, computed, effect, inject, input, model, signal, viewChild } from '@angular/core';
import type { CopperShape } from './copper-shape';
import { hostWidth } from './element-width';
import { PlaceIndex } from './map-places';
import type { MapExtent, MapPlaces, MapStep } from './map-places';
import { BARE_MARGINS, RULED_MARGINS, cellBox, chosenLeader, extentBox, extentOfCells, mapRulers } from './map-overlay';
import { MapPointer } from './map-pointer';
import type { MapPointerDeed, PointerAt } from './map-pointer';
import { draggedBy, fittingZoom, screenX, screenY, showing, viewOf, zoomedAbout } from './map-view';
import type { MapView, MapZoom } from './map-view';
import { keyMarkup } from './colour-key-scale';
import { drawnId } from './drawn-id';
import { TileSheets, paintPanelMap } from './paint-panel-map';
import type { MapLayer, MapPicture } from './paint-panel-map';
import type { ExportablePlot, PlotPicture, PlotTable } from './plot-export';
import { numberText } from './plot-text';
import { PlotThemes } from './plot-theme';
import type { PlotTheme } from './plot-theme';
import { svgSnapshot } from './svg-snapshot';
import { tileRaster } from './tile-raster';

/** A place on the map that is marked with a cross in a circle. */
export interface MapMark {
  readonly xMm: number;
  readonly yMm: number;
  readonly label: string;
}

const NARROW_PX = 376;
const ZOOM_STEP = 1.5;
const PAN_PX = 40;
/** Pixels of an exported map per pixel on the screen. */
const EXPORT_SCALE = 3;

const STEPS: Readonly<Record<string, MapStep>> = {
  ArrowLeft: 'left', ArrowRight: 'right', ArrowUp: 'up', ArrowDown: 'down',
  Home: 'row-start', End: 'row-end', PageUp: 'page-up', PageDown: 'page-down',
};

/** A panel seen from the front, every cell in its place and colour; zoomed, chosen from and selected on by pointer and by keys. */
@Component({
  selector: 'slant-panel-map',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './panel-map.html',
  styleUrls: ['./plot-svg.scss', './panel-map.scss'],
})
export class PanelMap implements ExportablePlot {
  readonly places = input.required<MapPlaces>();
  readonly layer = input.required<MapLayer>();
  readonly label = input.required<string>();
  readonly copperOf = input<((cell: number) => readonly CopperShape[]) | null>(null);
  readonly marks = input<readonly MapMark[]>([]);
  /** Letter of the balloon at the chosen cell; none when empty. */
  readonly letter = input('');
  readonly maxHeight = input(560);
  /** Says one cell in words, for the read-out. */
  readonly describe = input<(cell: number) => string>((cell) => `Cell ${cell + 1}`);

  readonly chosen = model<number | null>(null);
  readonly hovered = model<number | null>(null);
  readonly selection = model<MapExtent | null>(null);
  readonly zoom = model<MapZoom | null>(null);

  private readonly canvas = viewChild.required<ElementRef<HTMLCanvasElement>>('canvas');
  private readonly overlay = viewChild.required<ElementRef<SVGSVGElement>>('overlay');
  private readonly themes = inject(PlotThemes);
  private readonly document = inject(DOCUMENT);
  private readonly width = hostWidth();
  private readonly sheets = new TileSheets(this.document);
  private readonly pointer = new MapPointer(() => this.index().extent);
  private anchor: number | null = null;
  private frame = 0;

  protected readonly clipId = drawnId('map-window');
  protected readonly selecting = signal(false);
  protected readonly index = computed(() => new PlaceIndex(this.places()));
  private readonly raster = computed(() => tileRaster(this.places(), this.index().extent));
  protected readonly margins = computed(() => (this.width() < NARROW_PX ? BARE_MARGINS : RULED_MARGINS));
  protected readonly ruled = computed(() => this.margins() === RULED_MARGINS);
  protected readonly window = computed(() => {
    const { left, right } = this.margins();
    const { fromXMm, toXMm, fromYMm, toYMm } = this.index().extent;
    const room = Math.max(60, this.width() - left - right);
    const ratio = toXMm > fromXMm ? (toYMm - fromYMm) / (toXMm - fromXMm) : 1;
    const height = Math.min(this.maxHeight(), room * ratio);
    return { width: Math.round(ratio > 0 ? Math.min(room, height / ratio) : room), height: Math.max(40, Math.round(height)) };
  });
  readonly view = computed(() => viewOf(this.index().extent, this.window(), this.zoom()));
  protected readonly zoomed = computed(() => (this.zoom()?.factor ?? 1) > 1);
  protected readonly rulers = computed(() => mapRulers(this.view()));
  protected readonly dimensions = computed(() => {
    const { fromXMm, toXMm, fromYMm, toYMm } = this.index().extent;
    return { x: numberText(toXMm - fromXMm, 2), y: numberText(toYMm - fromYMm, 2) };
  });
  protected readonly chosenBox = computed(() => this.boxOf(this.chosen()));
  protected readonly hoveredBox = computed(() => (this.hovered() === this.chosen() ? null : this.boxOf(this.hovered())));
  protected readonly selectionBox = computed(() => {
    const area = this.selection();
    return area ? extentBox(this.view(), area) : null;
  });
  protected readonly leader = computed(() => {
    const box = this.chosenBox();
    return box && this.letter() !== '' && this.ruled() ? chosenLeader(box, this.view()) : null;
  });
  protected readonly marksInView = computed(() => {
    const view = this.view();
    const placed = this.marks().map((mark) => ({ label: mark.label, x: screenX(view, mark.xMm), y: screenY(view, mark.yMm) }));
    return placed.filter(({ x, y }) => x >= 0 && y >= 0 && x <= view.size.width && y <= view.size.height);
  });
  protected readonly readOut = computed(() => {
    const cell = this.hovered() ?? this.chosen();
    return cell === null ? 'No cell chosen' : this.describe()(cell);
  });

  constructor() {
    effect((onCleanup) => {
      const [view, picture, theme] = [this.view(), this.picture(), this.themes.theme()];
      cancelAnimationFrame(this.frame);
      this.frame = requestAnimationFrame(() => this.paint(view, picture, theme));
      onCleanup(() => cancelAnimationFrame(this.frame));
    });
  }

  private readonly picture = computed<MapPicture>(() => ({ index: this.index(), raster: this.raster(), layer: this.layer(), copperOf: this.copperOf() }));

  private boxOf(cell: number | null): ReturnType<typeof cellBox> {
    return cell === null ? null : cellBox(this.index(), this.view(), cell);
  }

  private paint(view: MapView, picture: MapPicture, theme: PlotTheme): void {
    const canvas = this.canvas().nativeElement;
    const ratio = this.document.defaultView?.devicePixelRatio ?? 1;
    canvas.width = Math.round(view.size.width * ratio);
    canvas.height = Math.round(view.size.height * ratio);
    const context = canvas.getContext('2d');
    if (!context) return;
    context.scale(ratio, ratio);
    paintPanelMap(context, view, picture, { inks: { theme: theme.name, substrate: theme.substrate, rule: theme.rule }, sheets: this.sheets, devicePxRatio: ratio });
  }

  protected zoomBy(times: number): void {
    const { width, height } = this.window();
    this.zoom.set(zoomedAbout(this.index().extent, this.view(), { xPx: width / 2, yPx: height / 2 }, times));
  }

  protected zoomIn(): void {
    this.zoomBy(ZOOM_STEP);
  }

  protected zoomOut(): void {
    this.zoomBy(1 / ZOOM_STEP);
  }

  protected fit(): void {
    this.zoom.set(null);
  }

  protected turnWheel(event: WheelEvent): void {
    const times = Math.exp(-event.deltaY * 0.002);
    // At the smallest zoom the wheel belongs to the page.
    if (times < 1 && !this.zoomed()) return;
    event.preventDefault();
    const at = this.pointOf(event);
    this.zoom.set(zoomedAbout(this.index().extent, this.view(), at, times));
  }

  protected press(event: PointerEvent): void {
    if (event.button !== 0) return;
    (event.currentTarget as HTMLElement).setPointerCapture(event.pointerId);
    this.pointer.pressed(this.pointOf(event), this.view(), event.shiftKey || this.selecting());
  }

  protected move(event: PointerEvent): void {
    this.take(this.pointer.movedTo(this.pointOf(event), this.view()));
  }

  protected release(event: PointerEvent): void {
    this.take(this.pointer.released(this.pointOf(event), this.view()));
  }

  protected leave(event: PointerEvent): void {
    this.pointer.forget(event.pointerId);
    this.hovered.set(null);
  }

  private take(deed: MapPointerDeed): void {
    switch (deed.kind) {
      case 'zoomed':
        this.zoom.set(deed.zoom);
        break;
      case 'selecting':
        this.selection.set(deed.area);
        break;
      case 'hovered':
        this.hovered.set(this.cellOrNull(deed.xMm, deed.yMm));
        break;
      case 'chosen':
        this.choose(this.cellOrNull(deed.xMm, deed.yMm));
        break;
      case 'none':
    }
  }

  private cellOrNull(xMm: number, yMm: number): number | null {
    const cell = this.index().cellAt(xMm, yMm);
    return cell < 0 ? null : cell;
  }

  private choose(cell: number | null): void {
    if (cell === null) return;
    this.anchor = null;
    this.selection.set(null);
    this.chosen.set(cell);
  }

  private pointOf(event: MouseEvent & { readonly pointerId?: number }): PointerAt {
    const box = this.canvas().nativeElement.getBoundingClientRect();
    return { id: event.pointerId ?? 0, xPx: event.clientX - box.left, yPx: event.clientY - box.top };
  }

  protected pressKey(event: KeyboardEvent): void {
    if (event.ctrlKey && !event.key.startsWith('Arrow')) return;
    const step = STEPS[event.key];
    if (step && event.ctrlKey) this.pan(step);
    else if (step) this.walk(step, event.shiftKey);
    else if (event.key === '+' || event.key === '=') this.zoomIn();
    else if (event.key === '-') this.zoomOut();
    else if (event.key === '0') this.fit();
    else if (event.key === 'Escape' && this.selection()) this.selection.set(null);
    else return;
    event.preventDefault();
    event.stopPropagation();
  }

  private pan(step: MapStep): void {
    const dx = step === 'left' ? PAN_PX : step === 'right' ? -PAN_PX : 0;
    const dy = step === 'up' ? PAN_PX : step === 'down' ? -PAN_PX : 0;
    this.zoom.set(draggedBy(this.index().extent, this.view(), dx, dy));
  }

  /** Moves the cursor; with `extend` the cells from where it started are selected. */
  private walk(step: MapStep, extend: boolean): void {
    const index = this.index();
    if (index.places.xMm.length === 0) return;
    const from = this.chosen() ?? index.cellAt(fittingZoom(index.extent).centreXMm, fittingZoom(index.extent).centreYMm);
    const cell = this.chosen() === null ? Math.max(0, from) : index.step(from, step);
    this.anchor = extend ? (this.anchor ?? from) : null;
    this.selection.set(this.anchor === null ? null : extentOfCells(index, this.anchor, cell));
    this.hovered.set(null);
    this.chosen.set(cell);
    if (this.zoomed()) this.zoom.set(showing(index.extent, this.view(), { xMm: index.places.xMm[cell], yMm: index.places.yMm[cell] }));
  }

  async exportPicture(): Promise<PlotPicture> {
    const { width, height } = this.window();
    const { left, top, right, bottom } = this.margins();
    const printed = this.themes.printed();
    const canvas = this.document.createElement('canvas');
    canvas.width = width * EXPORT_SCALE;
    canvas.height = height * EXPORT_SCALE;
    const context = canvas.getContext('2d');
    if (!context) throw new Error('this browser gives no drawing surface');
    context.scale(EXPORT_SCALE, EXPORT_SCALE);
    const inks = { theme: printed.name, substrate: printed.substrate, rule: printed.rule };
    paintPanelMap(context, this.view(), this.picture(), { inks, sheets: new TileSheets(this.document), devicePxRatio: EXPORT_SCALE });
    const overlay = this.overlay().nativeElement;
    const lines = this.themes.withPrinted((shelter) => svgSnapshot(overlay, shelter), overlay.parentElement ?? undefined);
    const image = `<image x="${left}" y="${top}" width="${width}" height="${height}" href="${canvas.toDataURL('image/png')}"/>`;
    const key = keyMarkup(this.layer(), printed, Math.min(320, width));
    const below = `<g transform="translate(${left} ${height + top + bottom + 8})">${key.markup}</g>`;
    return { width: width + left + right, height: height + top + bottom + 8 + key.height, markup: image + lines + below };
  }

  exportTable(): PlotTable {
    const { xMm, yMm } = this.places();
    const { title, unit, values } = this.layer();
    return { columns: [{ head: 'x, mm', values: xMm }, { head: 'y, mm', values: yMm }, { head: unit === '' ? title : `${title}, ${unit}`, values }] };
  }
}
