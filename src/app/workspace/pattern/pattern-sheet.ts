import { ChangeDetectionStrategy, Component, DestroyRef, computed, effect, inject, signal } from '@angular/core';
import { designMask } from '../../../../shared/antenna/masks/design-mask';
import { EmptyState } from '../../ui/empty-state';
import { ColourKey } from '../../ui/plots/colour-key';
import { CutPlot } from '../../ui/plots/cut-plot';
import type { CutWindow } from '../../ui/plots/cut-plot-drawing';
import { numberText } from '../../ui/plots/plot-text';
import { PlotTools } from '../../ui/plots/plot-tools';
import { PolarPlot } from '../../ui/plots/polar-plot';
import { UvMap } from '../../ui/plots/uv-map';
import { ViewTitle } from '../../ui/view-title';
import { SheetNotes } from '../fields/sheet-notes';
import type { LivePrediction } from '../live-prediction-data';
import { draftHeading, isSettled } from '../plot-heading';
import { queryLink } from '../query-link';
import { SheetHeader } from '../sheet-header';
import { sheetNumber } from '../sheets';
import { WORKSPACE_STATE } from '../workspace-state';
import { cutRequests, shownCut } from './beam-cut';
import type { CutWish, ShownCut } from './beam-cut';
import { CutLegend } from './cut-legend';
import { cutMarkers } from './cut-markers';
import { lobeRows, markedDirections } from './lobe-rows';
import { deltaText, markerRows, markersOf } from './marker-rows';
import { MarkerTable } from './marker-table';
import { patternCutFigure } from './pattern-cut-figure';
import { PatternControls } from './pattern-controls';
import { readPatternLink, writePatternLink } from './pattern-link';
import type { PatternLink } from './pattern-link';
import { patternNotes, patternSubtitle } from './pattern-notes';
import { VectorTables } from './vector-tables';

/** Three samples to a pixel of the map at its largest would be waste; this is one to two pixels. */
const UV_SIZE = 241;

/** The pattern of the panel: the hemisphere to steer in, one cut with its mask and markers, lobes. */
@Component({
  selector: 'slant-pattern-sheet',
  imports: [ColourKey, CutLegend, CutPlot, EmptyState, MarkerTable, PatternControls, PlotTools, PolarPlot, SheetNotes, UvMap, VectorTables, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './pattern-sheet.html',
  styleUrl: './pattern-sheet.scss',
})
export class PatternSheet {
  private readonly state = inject(WORKSPACE_STATE);
  protected readonly link = queryLink(readPatternLink, writePatternLink);
  protected readonly cursorDeg = signal<number | null>(null);
  protected readonly prediction = this.state.prediction;
  protected readonly failure = this.state.failure;
  protected readonly stale = this.state.stale;
  protected readonly canEdit = this.state.canEdit;

  private readonly design = this.state.design;
  protected readonly beamIndex = computed(() => Math.min(this.link().beam, this.design().requirement.beams.length - 1));
  /** The handle stands where the design wants the beam, at once; the pattern follows when it is predicted. */
  protected readonly beam = computed(() => this.design().requirement.beams[this.beamIndex()]);
  private readonly choice = computed(() => (this.beamIndex() > 0 && this.link().cut === 'across' ? 'along' : this.link().cut));
  private readonly planePhiDeg = computed(() => this.link().planePhiDeg);
  private readonly wish = computed((): CutWish => ({ choice: this.choice(), beam: this.beam(), planePhiDeg: this.planePhiDeg() }));
  /** What was predicted is drawn against the requirement it was predicted for, so a drag redraws once for each answer. */
  private readonly drawnDesign = computed(() => this.prediction()?.of ?? this.design());
  private readonly mask = computed(() => {
    const prediction = this.prediction();
    return prediction ? designMask(prediction.of, prediction.head.figures) : null;
  });
  protected readonly cut = computed(() => {
    const prediction = this.prediction();
    return prediction ? this.cutOf(prediction) : null;
  });
  /** The scalar model has a co-polar field alone. */
  protected readonly mapField = computed(() => (this.prediction()?.uv?.crossGainDbi ? this.link().field : 'co'));
  protected readonly uv = computed(() => {
    const uv = this.prediction()?.uv;
    if (!uv) return null;
    return { size: uv.size, levelDb: this.mapField() === 'cross' && uv.crossGainDbi ? uv.crossGainDbi : uv.gainDbi };
  });
  /** Level of the highest lobe of all: the top of the map. */
  protected readonly topDbi = computed(() => {
    const gain = this.prediction()?.head.figures.gainDbi;
    return typeof gain === 'number' ? gain : 0;
  });
  private readonly found = computed(() => {
    const cut = this.cut();
    return cut ? cutMarkers({ label: '', angleDeg: cut.angleDeg, levelDb: cut.gainDbi }, cut.beamDeg) : null;
  });
  private readonly markers = computed(() => {
    const [cut, found] = [this.cut(), this.found()];
    return cut && found ? markersOf({ cut, found, design: this.drawnDesign(), mask: this.mask(), ownDeg: this.link().marksDeg }) : [];
  });
  protected readonly rows = computed(() => markerRows(this.markers()));
  protected readonly delta = computed(() => deltaText(this.markers()));
  protected readonly figure = computed(() => {
    const [cut, found, link] = [this.cut(), this.found(), this.link()];
    if (!cut || !found) return null;
    const marks = this.markers().map(({ name, angleDeg, levelDbi }) => ({ name, angleDeg, levelDb: levelDbi }));
    const parent = link.show.parent ? this.parentCut() : null;
    return patternCutFigure({ title: this.cutTitle(), cut, design: this.drawnDesign(), peakDbi: found.peak.levelDb, form: link.form, showCross: link.show.cross, depthDb: link.depthDb, parent, mask: link.show.mask ? this.mask() : null, marks });
  });
  /** By itself, because every save brings a new panel and the plot must not be drawn again for that. */
  private readonly parentNumber = computed(() => this.state.panel()?.latestRevision?.number ?? null);
  private readonly parentCut = computed(() => {
    const parent = this.state.parentPrediction();
    const cut = parent && this.cutOf(parent);
    const number = this.parentNumber();
    if (!parent || !cut || number === null) return null;
    const beams = parent.of.requirement.beams;
    const own = beams[Math.min(this.beamIndex(), beams.length - 1)];
    const peak = cutMarkers({ label: '', angleDeg: cut.angleDeg, levelDb: cut.gainDbi }, cut.beamDeg);
    return peak ? { label: `revision ${number}, beam at ${numberText(own.thetaDeg, 1)}°`, cut, peakDbi: peak.peak.levelDb } : null;
  });
  protected readonly cutTitle = computed(() => {
    const [choice, planePhiDeg] = [this.choice(), this.planePhiDeg()];
    return choice === 'along' ? 'Cut along the beam' : choice === 'across' ? 'Cut across the beam' : `Cut in the plane φ = ${numberText(planePhiDeg, 1)}°`;
  });
  protected readonly cutLine = computed(() => {
    const cut = this.cut();
    if (!cut) return [];
    const seen = Array.from(cut.thetaDeg, (thetaDeg, i) => ({ thetaDeg, phiDeg: cut.phiDeg[i] }));
    return seen.filter(({ thetaDeg }, i) => thetaDeg <= 90 && (i % 15 === 0 || i === seen.length - 1));
  });
  /** Lobes are told against the lobe of the first wanted beam. */
  protected readonly lobes = computed(() => {
    const prediction = this.prediction();
    return prediction ? lobeRows(prediction.head.figures, prediction.of, this.beamPeakDbi(prediction)) : [];
  });
  protected readonly letteredLobes = computed(() => (this.link().show.lobes ? this.lobes() : []));
  protected readonly marked = computed(() => {
    const prediction = this.prediction();
    return prediction ? markedDirections(prediction.head.figures, prediction.of, { specular: this.link().show.specular, beam: this.beamIndex() }) : [];
  });
  protected readonly vectorFigures = computed(() => {
    const figures = this.prediction()?.head.figures;
    return figures?.vector ? figures : null;
  });
  protected readonly notes = computed(() => patternNotes(this.drawnDesign(), this.prediction()));
  protected readonly cutHeading = computed(() => this.headingOf(this.cutTitle()));
  protected readonly uvHeading = computed(() => this.headingOf(this.mapField() === 'cross' ? 'Cross-polar gain over the hemisphere' : 'Gain over the hemisphere'));
  protected readonly polarHeading = computed(() => this.headingOf(`${this.cutTitle()}, polar form`));

  constructor() {
    const header = inject(SheetHeader);
    this.state.requestUv(UV_SIZE);
    effect(() => this.state.requestCuts(cutRequests(this.wish())));
    effect(() => {
      header.show({ number: sheetNumber('pattern'), title: 'Pattern', subtitle: patternSubtitle(this.design()) });
    });
    inject(DestroyRef).onDestroy(() => {
      this.state.requestUv(0);
      this.state.requestCuts([]);
    });
  }

  protected change(part: Partial<PatternLink>): void {
    this.link.update((link) => ({ ...link, ...part }));
  }

  protected steer(to: { readonly thetaDeg: number; readonly phiDeg: number }): void {
    const index = this.beamIndex();
    this.state.change(
      `Steer beam ${index + 1} to θ ${numberText(to.thetaDeg, 1)}°, φ ${numberText(to.phiDeg, 1)}°`,
      (design) => {
        const beams = design.requirement.beams.map((beam, i) => (i === index ? { ...beam, thetaDeg: to.thetaDeg, phiDeg: to.phiDeg } : beam));
        return { ...design, requirement: { ...design.requirement, beams } };
      },
      { mergeKey: `steer-${index}` },
    );
  }

  protected show(window: CutWindow | null): void {
    this.change({ window });
  }

  protected setMark(angleDeg: number): void {
    const rounded = Number(angleDeg.toFixed(3));
    if (!this.link().marksDeg.includes(rounded)) this.change({ marksDeg: [...this.link().marksDeg, rounded] });
  }

  protected removeMark(angleDeg: number): void {
    this.change({ marksDeg: this.link().marksDeg.filter((mark) => mark !== angleDeg) });
  }

  private cutOf(prediction: LivePrediction): ShownCut | null {
    const { beams } = prediction.of.requirement;
    return shownCut(prediction, { choice: this.choice(), planePhiDeg: this.planePhiDeg(), beam: beams[Math.min(this.beamIndex(), beams.length - 1)] });
  }

  private beamPeakDbi(prediction: LivePrediction): number {
    const { figures } = prediction.head;
    const hemisphere = figures.sidelobeDb.hemisphere;
    // A stronger lobe than the beam's own is told as above 0 dB, and then the gain at the peak is its level.
    return 'kind' in hemisphere || hemisphere.levelDb <= 0 ? this.topDbi() : this.topDbi() - hemisphere.levelDb;
  }

  private headingOf(title: string) {
    return draftHeading(title, this.state.panel(), isSettled(this.state.saveState()), new Date());
  }
}
