import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, DOCUMENT, computed, effect, inject, input, output, signal, viewChild } from '@angular/core';
import type { ColourScale } from './colour-maps';
import { keyMarkup } from './colour-key-scale';
import { drawnId } from './drawn-id';
import { hostWidth } from './element-width';
import { paintUvMap } from './paint-uv-map';
import { placeBalloons } from './place-balloons';
import type { ExportablePlot, PlotPicture, PlotTable } from './plot-export';
import { numberText } from './plot-text';
import { PlotThemes } from './plot-theme';
import { svgSnapshot } from './svg-snapshot';
import { STEEPEST_DEG, anglesOfUv, contourSegments, discPoint, levelAtUv, steeringStep, uvOf, uvOfPoint } from './uv-geometry';
import type { AnglesDeg, UvLevels, UvPoint } from './uv-geometry';
import { azimuthTicks, tagCorner, thetaRings } from './uv-overlay';

/** A lobe that is lettered on the map and in the table beside it. */
export interface LetteredLobe extends AnglesDeg {
  readonly letter: string;
}

/** A marked direction that is no lobe of the wanted beam. */
export interface MarkedDirection extends AnglesDeg {
  readonly kind: 'grating-lobe' | 'specular' | 'found-peak' | 'other-beam';
  readonly label: string;
}

const PAD = 28;
const HALF_POWER_DB = 10 * Math.log10(2);
const FINE_STEP = 0.005;
const COARSE_STEP = 0.05;
const EXPORT_SCALE = 3;

/** The whole hemisphere over the direction cosines u and v, with the wanted beam as a handle that steers. */
@Component({
  selector: 'slant-uv-map',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './uv-map.html',
  styleUrls: ['./plot-svg.scss', './uv-map.scss'],
})
export class UvMap implements ExportablePlot {
  readonly levels = input.required<UvLevels | null>();
  readonly peakDb = input.required<number>();
  /** Colours run from here to the peak. */
  readonly floorBelowPeakDb = input(50);
  readonly title = input('Gain over the hemisphere');
  readonly unit = input('dBi');
  /** A map of differences has its own scale. */
  readonly scale = input<ColourScale | null>(null);
  readonly beam = input<AnglesDeg | null>(null);
  readonly steerable = input(false);
  readonly lobes = input<readonly LetteredLobe[]>([]);
  readonly marked = input<readonly MarkedDirection[]>([]);
  /** Directions along the cut that is shown beside the map. */
  readonly cutLine = input<readonly AnglesDeg[]>([]);
  readonly maxSize = input(444);
  /** The wanted direction while it is steered; `settled` at the end of a drag. */
  readonly steered = output<AnglesDeg & { readonly settled: boolean }>();

  private readonly canvas = viewChild.required<ElementRef<HTMLCanvasElement>>('canvas');
  private readonly overlay = viewChild.required<ElementRef<SVGSVGElement>>('overlay');
  private readonly document = inject(DOCUMENT);
  private readonly themes = inject(PlotThemes);
  private readonly width = hostWidth();
  private frame = 0;
  private dragging = false;
  protected readonly pad = PAD;
  protected readonly steepest = STEEPEST_DEG;
  protected readonly clipId = drawnId('uv');
  protected readonly pointed = signal<UvPoint | null>(null);
  readonly size = computed(() => Math.max(160, Math.min(this.width(), this.maxSize())) - 2 * PAD);
  private readonly disc = computed(() => ({ centre: this.size() / 2 + PAD, radius: this.size() / 2 }));
  readonly colours = computed<ColourScale>(() => this.scale() ?? { map: 'sequential', from: this.peakDb() - this.floorBelowPeakDb(), to: this.peakDb() });
  protected readonly rings = computed(() => thetaRings(this.disc()));
  protected readonly azimuths = computed(() => azimuthTicks(this.disc()));
  protected readonly handle = computed(() => {
    const beam = this.beam();
    return beam ? discPoint(this.disc(), uvOf(beam)) : null;
  });
  protected readonly beamText = computed(() => {
    const beam = this.beam();
    return beam ? { theta: `θ ${numberText(beam.thetaDeg, 1)}°`, phi: `φ ${numberText(beam.phiDeg, 1)}°` } : null;
  });
  protected readonly tag = computed(() => {
    const handle = this.handle();
    return handle ? tagCorner(this.disc(), handle, PAD) : null;
  });
  protected readonly halfPower = computed(() => {
    const levels = this.levels();
    if (!levels || this.scale()) return '';
    const disc = this.disc();
    return contourSegments(levels, this.peakDb() - HALF_POWER_DB)
      .map(([a, b]) => [discPoint(disc, a), discPoint(disc, b)])
      .map(([a, b]) => `M${a.x.toFixed(1)} ${a.y.toFixed(1)}L${b.x.toFixed(1)} ${b.y.toFixed(1)}`)
      .join('');
  });
  protected readonly cutPath = computed(() =>
    this.cutLine()
      .map((angles) => discPoint(this.disc(), uvOf(angles)))
      .map(({ x, y }, i) => `${i === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`)
      .join(''),
  );
  protected readonly balloons = computed(() => {
    const disc = this.disc();
    const handle = this.handle();
    const side = this.size() + 2 * PAD;
    const anchors = this.lobes().map((lobe) => ({ name: lobe.letter, ...discPoint(disc, uvOf(lobe)) }));
    const obstacles = this.rings().map(({ labelX, labelY }) => ({ x: labelX, y: labelY, r: 9 }));
    return placeBalloons(anchors, { width: side, height: side, obstacles: handle ? [...obstacles, { ...handle, r: 26 }] : obstacles, awayFrom: handle ?? undefined });
  });
  protected readonly marks = computed(() => this.marked().map((mark) => ({ kind: mark.kind, label: mark.label, ...discPoint(this.disc(), uvOf(mark)) })));
  protected readonly readOut = computed(() => {
    const at = this.pointed();
    if (!at || Math.hypot(at.u, at.v) > 1) return '';
    const { thetaDeg, phiDeg } = anglesOfUv(at);
    const levels = this.levels();
    const place = `u ${numberText(at.u, 4)}, v ${numberText(at.v, 4)}, θ ${numberText(thetaDeg, 2)}°, φ ${numberText(phiDeg, 2)}°`;
    return levels ? `${place}: ${numberText(levelAtUv(levels, at), 2)} ${this.unit()}, interpolated` : place;
  });

  constructor() {
    effect((onCleanup) => {
      const [levels, colours, theme, size] = [this.levels(), this.colours(), this.themes.theme().name, this.size()];
      cancelAnimationFrame(this.frame);
      this.frame = requestAnimationFrame(() => this.paint(levels, colours, theme, size));
      onCleanup(() => cancelAnimationFrame(this.frame));
    });
  }

  private paint(levels: UvLevels | null, colours: ColourScale, theme: 'light' | 'dark', size: number): void {
    const ratio = Math.min(2, this.document.defaultView?.devicePixelRatio ?? 1);
    if (levels) paintUvMap(this.canvas().nativeElement, levels, colours, { theme, pixels: Math.round(size * ratio) });
  }

  protected point(event: PointerEvent): void {
    this.pointed.set(this.uvOfEvent(event));
    if (this.dragging) this.steerTo(this.uvOfEvent(event), false);
  }

  protected grab(event: PointerEvent): void {
    if (!this.steerable() || event.button !== 0) return;
    (event.target as Element).setPointerCapture(event.pointerId);
    this.dragging = true;
    event.preventDefault();
    (event.currentTarget as SVGElement).focus();
  }

  protected letGo(event: PointerEvent): void {
    if (!this.dragging) return;
    this.dragging = false;
    this.steerTo(this.uvOfEvent(event), true);
  }

  protected pressKey(event: KeyboardEvent): void {
    const beam = this.beam();
    const step = event.shiftKey ? COARSE_STEP : FINE_STEP;
    const by = { ArrowLeft: [-step, 0], ArrowRight: [step, 0], ArrowUp: [0, step], ArrowDown: [0, -step] }[event.key];
    if (!beam || !by || !this.steerable()) return;
    event.preventDefault();
    event.stopPropagation();
    const { u, v } = uvOf(beam);
    this.steerTo({ u: u + by[0], v: v + by[1] }, true);
  }

  private steerTo(at: UvPoint, settled: boolean): void {
    this.steered.emit({ ...steeringStep(anglesOfUv(at)), settled });
  }

  private uvOfEvent(event: MouseEvent): UvPoint {
    const box = this.overlay().nativeElement.getBoundingClientRect();
    return uvOfPoint(this.disc(), event.clientX - box.left, event.clientY - box.top);
  }

  async exportPicture(): Promise<PlotPicture> {
    const levels = this.levels();
    if (!levels) throw new Error('there is no prediction to save');
    const canvas = this.document.createElement('canvas');
    paintUvMap(canvas, levels, this.colours(), { theme: 'light', pixels: this.size() * EXPORT_SCALE });
    const overlay = this.overlay().nativeElement;
    const lines = this.themes.withPrinted((shelter) => svgSnapshot(overlay, shelter), overlay.parentElement ?? undefined);
    const image = `<image x="${PAD}" y="${PAD}" width="${this.size()}" height="${this.size()}" href="${canvas.toDataURL('image/png')}"/>`;
    const side = this.size() + 2 * PAD;
    const key = keyMarkup({ title: this.title(), unit: this.unit(), scale: this.colours() }, this.themes.printed(), this.size());
    return { width: side, height: side + key.height + 8, markup: `${image}${lines}<g transform="translate(${PAD} ${side + 8})">${key.markup}</g>` };
  }

  exportTable(): PlotTable {
    const levels = this.levels();
    if (!levels) throw new Error('there is no prediction to save');
    const { size, levelDb } = levels;
    const cosine = (i: number): number => (2 * i) / (size - 1) - 1;
    const seen = Array.from({ length: size * size }, (_, i) => i).filter((i) => Math.hypot(cosine(i % size), cosine(Math.floor(i / size))) <= 1);
    return {
      columns: [
        { head: 'u', values: seen.map((i) => cosine(i % size)) },
        { head: 'v', values: seen.map((i) => cosine(Math.floor(i / size))) },
        { head: `${this.title()}, ${this.unit()}`, values: seen.map((i) => levelDb[i]) },
      ],
    };
  }
}
