import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Figures } from '../../../../shared/model/figures';
import { ViewTitle } from '../../ui/view-title';
import { HowNote } from '../fields/how-note';
import { HOW_VECTOR_COMPUTED } from '../how-vector-computed';
import { budgetTable, crossPolarRows } from './vector-rows';

/** What only the vector model says: discrimination of the polarisations, and the gain item by item. */
@Component({
  selector: 'slant-vector-tables',
  imports: [HowNote, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './vector-tables.html',
  styleUrl: './vector-tables.scss',
})
export class VectorTables {
  readonly figures = input.required<Figures>();
  protected readonly how = HOW_VECTOR_COMPUTED;
  protected readonly crossRows = computed(() => crossPolarRows(this.figures()));
  private readonly budget = computed(() => budgetTable(this.figures()));
  protected readonly table = computed(() => {
    const budget = this.budget();
    return budget && 'items' in budget ? budget : null;
  });
  protected readonly missing = computed(() => {
    const budget = this.budget();
    return budget && 'reason' in budget ? budget.reason : null;
  });
}
