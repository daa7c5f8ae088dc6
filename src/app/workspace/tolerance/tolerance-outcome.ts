import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import type { ToleranceMeasure, ToleranceResult } from '../../../../shared/model/tolerance-run';
import { ChoiceTabs } from '../../ui/choice-tabs';
import { BarChart } from '../../ui/plots/bar-chart';
import { LinePlot } from '../../ui/plots/line-plot';
import type { PlotHeading } from '../../ui/plots/plot-export';
import { PlotTools } from '../../ui/plots/plot-tools';
import { ViewTitle } from '../../ui/view-title';
import { HowNote } from '../fields/how-note';
import { HOW_TOLERANCE_COMPUTED } from './how-tolerance-computed';
import { outcomeNotes } from './tolerance-notes';
import { envelopeFigure, MEASURE_NAMES, rankingBars, readMeasures, yieldRows, yieldSentence } from './tolerance-rows';
import { YieldTable } from './yield-table';

/** What a tolerance run found: yield, ranking, envelope. */
@Component({
  selector: 'slant-tolerance-outcome',
  imports: [BarChart, ChoiceTabs, LinePlot, PlotTools, HowNote, ViewTitle, YieldTable],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './tolerance-outcome.html',
  styleUrls: ['../fields/sheet.scss', './tolerance-outcome.scss'],
})
export class ToleranceOutcome {
  readonly result = input.required<ToleranceResult>();
  /** Of what was computed; the title is put in front of it. */
  readonly heading = input.required<Omit<PlotHeading, 'title'>>();
  readonly leastGainDbi = input<number | undefined>(undefined);

  protected readonly how = HOW_TOLERANCE_COMPUTED;
  protected readonly rows = computed(() => yieldRows(this.result()));
  protected readonly sentence = computed(() => yieldSentence(this.result()));
  protected readonly measures = computed(() => readMeasures(this.result().spreads).map((id) => ({ id, label: MEASURE_NAMES[id].name })));
  protected readonly measure = linkedSignal<ToleranceMeasure>(() => readMeasures(this.result().spreads)[0] ?? 'gainDbi');
  protected readonly bars = computed(() => rankingBars(this.result(), this.measure()));
  protected readonly axisTitle = computed(() => {
    const { name, unit } = MEASURE_NAMES[this.measure()];
    return `change of ${name.toLowerCase()} that 1 panel in 20 goes beyond, ${unit}`;
  });
  protected readonly planes = computed(() => this.result().cuts.map(({ plane }) => ({ id: plane, label: plane === 'along' ? 'Along the beam' : 'Across the beam' })));
  protected readonly plane = linkedSignal(() => this.result().cuts[0]?.plane ?? 'along');
  protected readonly figure = computed(() => {
    const cut = this.result().cuts.find(({ plane }) => plane === this.plane());
    return cut === undefined ? null : envelopeFigure(cut, this.leastGainDbi());
  });
  protected readonly notes = computed(() => outcomeNotes(this.result()));

  protected rank(id: string): void {
    const found = this.measures().find((measure) => measure.id === id);
    if (found) this.measure.set(found.id);
  }

  protected cutAlong(id: string): void {
    this.plane.set(id === 'across' ? 'across' : 'along');
  }

  protected headed(title: string): PlotHeading {
    return { ...this.heading(), title };
  }
}
