import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { LinePlot } from '../../ui/plots/line-plot';
import { ViewTitle } from '../../ui/view-title';
import { HowNote } from '../fields/how-note';
import { HOW_LAWS_COMPUTED } from '../how-laws-computed';
import type { LawFigureId } from '../how-laws-computed';
import { WORKSPACE_STATE } from '../workspace-state';
import { axialFigure, costFigure, lawFacts } from './law-facts';

/** What the target phase does beyond the figures of every panel; nothing for plain beams. */
@Component({
  selector: 'slant-law-outcome',
  imports: [HowNote, LinePlot, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (facts().length > 0) {
      <section>
        <slant-view-title text="What the target phase does" unit="predicted" />
        @for (drawn of plots(); track drawn.title) {
          <slant-line-plot [figure]="drawn" [height]="200" />
        }
        <dl>
          @for (fact of facts(); track fact.name) {
            <dt>{{ fact.name }}</dt>
            <dd [class.muted]="stale()">{{ fact.value }}</dd>
          }
        </dl>
        @for (how of hows(); track how.title) {
          <slant-how-note [how]="how" />
        }
      </section>
    }
  `,
  styleUrl: '../fields/sheet.scss',
  styles: 'section { margin-top: var(--s5); }',
})
export class LawOutcome {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly figures = computed(() => this.state.prediction()?.head.figures ?? null);
  protected readonly stale = computed(() => this.state.failure() !== null);
  protected readonly facts = computed(() => {
    const figures = this.figures();
    return figures ? lawFacts(figures) : [];
  });
  protected readonly plots = computed(() => {
    const figures = this.figures();
    return figures ? [axialFigure(figures), costFigure(figures)].filter((drawn) => drawn !== null) : [];
  });
  protected readonly hows = computed(() => {
    const figures = this.figures();
    return figures ? LAW_FIGURES.filter((id) => figures[id] !== undefined).map((id) => HOW_LAWS_COMPUTED[id]) : [];
  });
}

const LAW_FIGURES = ['focus', 'vortex', 'projections', 'diffuse'] as const satisfies readonly LawFigureId[];
