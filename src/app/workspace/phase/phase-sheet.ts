import { ChangeDetectionStrategy, Component, computed, effect, inject, signal, viewChild } from '@angular/core';
import { prepareEdition } from '../../../../shared/antenna/prepare-edition';
import { wrapDeg } from '../../../../shared/units/angles';
import { CheckField } from '../../ui/check-field';
import { ChoiceTabs } from '../../ui/choice-tabs';
import { CopyTable } from '../../ui/copy-table';
import { EmptyState } from '../../ui/empty-state';
import { ColourKey } from '../../ui/plots/colour-key';
import { Histogram } from '../../ui/plots/histogram';
import { LinePlot } from '../../ui/plots/line-plot';
import type { MapExtent } from '../../ui/plots/map-places';
import { PlaceIndex } from '../../ui/plots/map-places';
import { drawingScale } from '../../ui/plots/map-overlay';
import type { MapZoom } from '../../ui/plots/map-view';
import { PanelMap } from '../../ui/plots/panel-map';
import type { MapMark } from '../../ui/plots/panel-map';
import { PlotTools } from '../../ui/plots/plot-tools';
import { numberText, signedNumberText } from '../../ui/plots/plot-text';
import { ViewTitle } from '../../ui/view-title';
import { SheetNotes } from '../fields/sheet-notes';
import { cellPlaces } from '../illumination/illumination-layers';
import { draftHeading, isSettled } from '../plot-heading';
import { queryLink } from '../query-link';
import { SheetHeader } from '../sheet-header';
import { sheetNumber } from '../sheets';
import { WORKSPACE_STATE } from '../workspace-state';
import { bestCells } from './best-cells';
import { CellDetail } from './cell-detail';
import type { DetailSource } from './cell-detail-drawing';
import { cellName, editionOf } from './cell-name';
import { cellFacts, cellPlaceText, cellSentence } from './chosen-cell';
import { copperLookup } from './copper-lookup';
import { countEmpty } from './empty-places';
import { libraryCurve } from './library-curve';
import { cellOfPlace, readPhaseLink, writePhaseLink } from './phase-link';
import { phaseNotes, phaseSubtitle } from './phase-notes';
import { PHASE_VIEWS, errorLayer, isPhaseView, phaseLayer } from './phase-views';
import { selectionStatistics } from './selection-statistics';
import { brightestCell, worstCells } from './worst-cells';
import { worstRows } from './worst-rows';

const WORST_SHOWN = 6;

/** Target phase, cells and errors of the whole panel, and everything about one chosen cell. */
@Component({
  selector: 'slant-phase-sheet',
  imports: [CellDetail, CheckField, ChoiceTabs, ColourKey, CopyTable, EmptyState, Histogram, LinePlot, PanelMap, PlotTools, SheetNotes, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './phase-sheet.html',
  styleUrl: './phase-sheet.scss',
})
export class PhaseSheet {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly map = viewChild(PanelMap);
  protected readonly link = queryLink(readPhaseLink, writePhaseLink);
  protected readonly views = PHASE_VIEWS;
  protected readonly copperWanted = signal(true);
  protected readonly hovered = signal<number | null>(null);
  protected readonly selection = signal<MapExtent | null>(null);

  protected readonly prediction = this.state.prediction;
  protected readonly failure = this.state.failure;
  protected readonly stale = this.state.stale;
  private readonly edition = computed(() => {
    const prediction = this.prediction();
    return prediction ? editionOf(prediction.of, this.state.edition()) : null;
  });
  private readonly prepared = computed(() => {
    const edition = this.edition();
    return edition ? prepareEdition(edition) : null;
  });
  protected readonly parentNumber = computed(() => this.state.panel()?.latestRevision?.number ?? null);
  protected readonly places = computed(() => {
    const prediction = this.prediction();
    return prediction ? cellPlaces(prediction) : null;
  });
  private readonly index = computed(() => {
    const places = this.places();
    return places ? new PlaceIndex(places) : null;
  });
  protected readonly coloured = computed(() => {
    const prediction = this.prediction();
    return prediction ? phaseLayer(this.link().view, { prediction, parent: this.state.parentPrediction(), parentNumber: this.parentNumber(), edition: this.edition() }) : null;
  });
  /** Said beside the colours where places without a cell are hatched. */
  protected readonly emptyText = computed(() => {
    const [prediction, coloured] = [this.prediction(), this.coloured()];
    if (!prediction || coloured?.kind !== 'layer' || !coloured.layer.isHatched) return null;
    const count = countEmpty(prediction);
    return `${numberText(count, 0)} of ${numberText(prediction.cells.xMm.length, 0)} positions carry no cell: none of the edition may stand there`;
  });
  private readonly copper = computed(() => {
    const prediction = this.prediction();
    const edition = this.edition();
    return prediction && edition ? copperLookup(prediction, edition) : null;
  });
  protected readonly shownCopper = computed(() => (this.copperWanted() ? this.copper() : null));
  protected readonly hasCopper = computed(() => this.copper() !== null);
  private readonly worst = computed(() => {
    const prediction = this.prediction();
    return prediction ? worstCells(prediction, WORST_SHOWN) : [];
  });
  /** The cell of the address, else the worst one: that is where one looks first. */
  protected readonly chosen = computed(() => {
    const prediction = this.prediction();
    return prediction ? (cellOfPlace(prediction, this.link().cell) ?? this.worst()[0] ?? null) : null;
  });
  private readonly shown = computed(() => {
    const prediction = this.prediction();
    const cell = this.hovered() ?? this.chosen();
    return prediction && cell !== null && cell < prediction.cells.xMm.length ? { prediction, cell } : null;
  });
  protected readonly facts = computed(() => {
    const shown = this.shown();
    if (!shown) return [];
    const choices = bestCells(shown.prediction, shown.cell, this.prepared());
    return cellFacts({ ...shown, edition: this.edition(), choices, brightest: this.brightest() });
  });
  private readonly brightest = computed(() => {
    const prediction = this.prediction();
    if (!prediction) return 0;
    const at = brightestCell(prediction, () => true);
    return at < 0 ? 0 : prediction.cells.amplitude[at];
  });
  protected readonly detail = computed((): (DetailSource & { readonly label: string; readonly targetDeg: number; readonly achievedDeg: number }) | null => {
    const [shown, index, copper] = [this.shown(), this.index(), this.copper()];
    if (!shown || !index) return null;
    const { cells, of } = shown.prediction;
    const label = `Detail of the chosen cell: ${cellName(of, this.edition(), cells.cellIndex[shown.cell])}`;
    return { index, cell: shown.cell, copperOf: copper ?? (() => []), label, targetDeg: cells.targetPhaseDeg[shown.cell], achievedDeg: cells.phaseDeg[shown.cell] };
  });
  protected readonly curve = computed(() => {
    const shown = this.shown();
    return shown ? libraryCurve({ ...shown, edition: this.edition(), prepared: this.prepared() }) : null;
  });
  protected readonly errors = computed(() => {
    const prediction = this.prediction();
    return prediction ? errorLayer(prediction) : null;
  });
  protected readonly rmsDeg = computed(() => {
    const rms = this.prediction()?.head.figures.phaseErrorRmsDeg;
    return typeof rms === 'number' ? rms : null;
  });
  protected readonly lossText = computed(() => {
    const loss = this.prediction()?.head.figures.phaseLossDb;
    return typeof loss === 'number' ? `${numberText(loss, 3)} dB` : '';
  });
  protected readonly shownError = computed(() => {
    const shown = this.shown();
    return shown ? shown.prediction.cells.errorDeg[shown.cell] : null;
  });
  protected readonly rows = computed(() => {
    const prediction = this.prediction();
    return prediction ? worstRows({ prediction, edition: this.edition(), worst: this.worst(), chosen: this.chosen(), brightest: this.brightest() }) : null;
  });
  protected readonly selected = computed(() => {
    const [area, index] = [this.selection(), this.index()];
    return area && index ? index.cellsWithin(area) : null;
  });
  protected readonly statistics = computed(() => {
    const [prediction, selected] = [this.prediction(), this.selected()];
    const found = prediction && selected ? selectionStatistics(prediction, selected) : null;
    if (!prediction || !found) return null;
    return {
      count: `${numberText(found.count, 0)} of ${numberText(prediction.cells.xMm.length, 0)} cells`,
      rms: `${numberText(found.rmsDeg, 2)}°`,
      mean: `${signedNumberText(found.meanDeg, 2)}°`,
      largest: `${signedNumberText(found.largestDeg, 2)}° at ${cellPlaceText(prediction, found.largestAt)}`,
    };
  });
  protected readonly marks = computed((): readonly MapMark[] => {
    const light = this.prediction()?.of.illumination;
    return light?.kind === 'horn' ? [{ xMm: light.positionMm[0], yMm: light.positionMm[1], label: 'foot of the horn' }] : [];
  });
  protected readonly notes = computed(() => {
    const prediction = this.prediction();
    return prediction ? phaseNotes(prediction, this.edition()) : [];
  });
  protected readonly describe = computed(() => {
    const prediction = this.prediction();
    return (cell: number): string => (prediction && cell < prediction.cells.xMm.length ? cellSentence(prediction, cell) : '');
  });
  protected readonly heading = computed(() => {
    const coloured = this.coloured();
    const title = coloured?.kind === 'layer' ? coloured.layer.title : 'Phase';
    return draftHeading(title, this.state.panel(), isSettled(this.state.saveState()), new Date());
  });
  protected readonly curveHeading = computed(() => ({ ...this.heading(), title: this.curve()?.title ?? 'Library curve' }));
  protected readonly histogramHeading = computed(() => ({ ...this.heading(), title: 'Phase error, histogram' }));

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      const prediction = this.prediction();
      const view = this.map()?.view();
      header.show({
        number: sheetNumber('phase'),
        title: 'Phase',
        subtitle: prediction ? phaseSubtitle(prediction, this.edition()) : 'no prediction yet',
        ...(view ? { scale: drawingScale(view.pxPerMm) } : {}),
      });
    });
  }

  protected showView(view: string): void {
    if (isPhaseView(view)) this.link.update((link) => ({ ...link, view }));
  }

  protected choose(cell: number | null): void {
    const prediction = this.prediction();
    if (!prediction || cell === null || cell < 0) return;
    const { column, row } = prediction.cells;
    this.link.update((link) => ({ ...link, cell: { column: column[cell], row: row[cell] } }));
  }

  protected zoomTo(zoom: MapZoom | null): void {
    this.link.update((link) => ({ ...link, zoom }));
  }

  /** From a bin of the histogram to the brightest cell in it. */
  protected chooseByError(range: { readonly from: number; readonly to: number }): void {
    const prediction = this.prediction();
    const values = this.errors()?.values;
    if (prediction && values) this.choose(brightestCell(prediction, (cell) => values[cell] >= range.from && values[cell] < range.to));
  }

  /** From a sample of the library curve to the brightest cell that uses it. */
  protected chooseByStock(sample: number): void {
    const prediction = this.prediction();
    const wanted = this.curve()?.cellOfSample[sample];
    if (prediction && wanted !== undefined) this.choose(brightestCell(prediction, (cell) => prediction.cells.cellIndex[cell] === wanted));
  }

  protected readonly wrap = wrapDeg;
}
