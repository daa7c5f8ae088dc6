import { ChangeDetectionStrategy, Component, DOCUMENT, computed, inject, input, signal } from '@angular/core';
import type { BandResult } from '../../../../shared/model/band-run';
import type { Requirement } from '../../../../shared/model/design-document';
import type { LineFigure } from '../../ui/plots/line-figure';
import { LinePlot } from '../../ui/plots/line-plot';
import { plotCsv, plotFileName } from '../../ui/plots/plot-export';
import type { PlotHeading } from '../../ui/plots/plot-export';
import { PlotTools } from '../../ui/plots/plot-tools';
import { saveFile } from '../../ui/plots/save-file';
import { StateMark } from '../../ui/state-mark';
import { ViewTitle } from '../../ui/view-title';
import { HowNote } from '../fields/how-note';
import { gainFigure, sidelobeFigure, squintFigure } from './band-figures';
import type { Besides, OtherBand } from './band-figures';
import { POINT_HEADS, bandTable, bandwidthRows, extremeRows, lineRows, pointRows } from './band-rows';
import { HOW_BAND_COMPUTED } from './how-band-computed';

/** What a band run found: the worst case first, then the curves, then every frequency. */
@Component({
  selector: 'slant-band-outcome',
  imports: [HowNote, LinePlot, PlotTools, StateMark, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './band-outcome.html',
  styleUrls: ['../fields/sheet.scss', './band-outcome.scss'],
})
export class BandOutcome {
  private readonly document = inject(DOCUMENT);
  readonly result = input.required<BandResult>();
  readonly requirement = input.required<Requirement>();
  /** Of what was computed; the title is put in front of it. */
  readonly heading = input.required<Omit<PlotHeading, 'title'>>();

  /** Another run, laid over this one. */
  readonly against = input<OtherBand | null>(null);

  /** Place of the frequency that is marked in all plots and in the table. */
  protected readonly chosen = signal<number | null>(null);
  protected readonly how = HOW_BAND_COMPUTED;
  protected readonly heads = POINT_HEADS;
  private readonly besides = computed((): Besides => ({ limits: this.requirement(), chosen: this.chosen(), against: this.against() }));
  protected readonly lines = computed(() => lineRows(this.result()));
  protected readonly bandwidths = computed(() => bandwidthRows(this.result()));
  protected readonly extremes = computed(() => extremeRows(this.result()));
  protected readonly points = computed(() => pointRows(this.result()));
  protected readonly uncovered = computed(() => this.points().filter(({ covered }) => !covered).length);
  protected readonly gain = computed(() => gainFigure(this.result(), this.besides()));
  protected readonly squint = computed(() => squintFigure(this.result(), this.besides()));
  protected readonly sidelobe = computed(() => sidelobeFigure(this.result(), this.besides()));

  protected headed({ title }: LineFigure): PlotHeading {
    return { ...this.heading(), title };
  }

  /** The whole table as a file. */
  protected saveTable(): void {
    const heading = { ...this.heading(), title: 'Every frequency of the band' };
    const content = new Blob([plotCsv(bandTable(this.result()), heading)], { type: 'text/csv;charset=utf-8' });
    saveFile(this.document, plotFileName(heading, 'csv'), content);
  }

  /** A sample of the first line; frequencies without a value have none there. */
  protected choose(figure: LineFigure, sample: number): void {
    const frequencyGHz = figure.lines[0]?.x[sample];
    const at = this.result().points.findIndex((point) => point.frequencyGHz === frequencyGHz);
    this.chosen.set(at < 0 ? null : at);
  }
}
