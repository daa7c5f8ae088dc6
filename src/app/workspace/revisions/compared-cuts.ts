import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import type { Comparison } from '../../../../shared/contracts/comparisons';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { ChoiceTabs } from '../../ui/choice-tabs';
import type { CutWindow } from '../../ui/plots/cut-plot-drawing';
import { CutPlot } from '../../ui/plots/cut-plot';
import { LinePlot } from '../../ui/plots/line-plot';
import type { PlotHeading } from '../../ui/plots/plot-export';
import { PlotTools } from '../../ui/plots/plot-tools';
import { ViewTitle } from '../../ui/view-title';
import { CutLegend } from '../pattern/cut-legend';
import { cutDifferenceFigure, cutName, overlaidCut, shiftText } from './comparison-plots';

/** The cuts of both sides in one plot with the mask, and their difference once the beams coincide. */
@Component({
  selector: 'slant-compared-cuts',
  imports: [ChoiceTabs, CutLegend, CutPlot, LinePlot, PlotTools, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './compared-cuts.html',
  styles: `
    :host {
      display: grid;
      gap: var(--s2);
      align-content: start;
      min-width: 0;
    }
    section {
      min-width: 0;
    }
    slant-plot-tools {
      align-self: center;
    }
  `,
})
export class ComparedCuts {
  readonly comparison = input.required<Comparison>();
  /** Of the later side: its mask is drawn. */
  readonly design = input.required<DesignDocument>();
  readonly heading = input.required<PlotHeading>();

  private readonly wanted = signal(0);
  protected readonly window = signal<CutWindow | null>(null);
  protected readonly at = computed(() => Math.min(this.wanted(), this.comparison().cuts.length - 1));
  protected readonly tabs = computed(() => this.comparison().cuts.map((cut, i) => ({ id: String(i), label: capital(cutName(cut)) })));
  private readonly cut = computed(() => (this.at() < 0 ? null : this.comparison().cuts[this.at()]));
  protected readonly overlaid = computed(() => {
    const cut = this.cut();
    return cut ? overlaidCut(this.comparison(), cut, this.design()) : null;
  });
  protected readonly difference = computed(() => {
    const cut = this.cut();
    return cut ? { figure: cutDifferenceFigure(this.comparison(), cut), shift: shiftText(this.comparison(), cut) } : null;
  });
  protected readonly differenceHeading = computed(() => ({ ...this.heading(), title: this.difference()?.figure.title ?? 'Difference of the cuts' }));
  protected readonly overlaidHeading = computed(() => ({ ...this.heading(), title: this.overlaid()?.title ?? 'Cuts' }));

  protected show(at: string): void {
    this.wanted.set(Number(at));
    this.window.set(null);
  }
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
