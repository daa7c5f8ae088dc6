import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal } from '@angular/core';
import { CheckField } from '../../ui/check-field';
import { CopyTable } from '../../ui/copy-table';
import { editValue } from '../design-field-edit';
import { figureText } from '../strip-figures';
import { WORKSPACE_STATE } from '../workspace-state';
import type { EditionInUse } from '../workspace-state';

const ROWS_AT_ONCE = 8;

/** The cells of the edition in use: how often each stands on the panel, and which are not to be used. */
@Component({
  selector: 'slant-edition-cells',
  imports: [CheckField, CopyTable],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './edition-cells.html',
  styleUrls: ['../fields/sheet.scss'],
})
export class EditionCells {
  private readonly state = inject(WORKSPACE_STATE);
  readonly edition = input.required<EditionInUse>();
  readonly use = input.required<Int32Array>();
  readonly phaseDegOf = input.required<ReadonlyMap<number, number>>();

  protected readonly canEdit = this.state.canEdit;
  private readonly excluded = computed(() => {
    const { cells } = this.state.design();
    return new Set(cells.kind === 'edition' ? cells.excludedCells : []);
  });
  protected readonly parameters = computed(() => this.edition().description.parameters);
  protected readonly start = linkedSignal<string, number>({ source: () => this.edition().id, computation: () => 0 });
  protected readonly count = computed(() => this.edition().cells.length);
  protected readonly end = computed(() => Math.min(this.count(), this.start() + ROWS_AT_ONCE));
  protected readonly excludedCount = computed(() => this.excluded().size);
  protected readonly rows = computed(() => {
    const excluded = this.excluded();
    return this.edition()
      .cells.slice(this.start(), this.end())
      .map((cell, i) => {
        const place = this.start() + i;
        const phase = this.phaseDegOf().get(place);
        return {
          id: cell.id,
          parameters: cell.parametersMm.map((value) => figureText(value, 3)),
          phase: phase === undefined ? '–' : figureText(phase, 1),
          use: this.use()[place] ?? 0,
          excluded: excluded.has(cell.id),
        };
      });
  });

  protected turnPage(direction: 1 | -1): void {
    this.start.update((start) => start + direction * ROWS_AT_ONCE);
  }

  protected exclude(cellId: string, excluded: boolean): void {
    const rest = [...this.excluded()].filter((id) => id !== cellId);
    const edit = editValue(this.state.design(), '/cells/excludedCells', excluded ? [...rest, cellId] : rest);
    if (edit.kind === 'changed') this.state.change(excluded ? `Leave out cell ${cellId}` : `Use cell ${cellId} again`, () => edit.design);
  }
}
