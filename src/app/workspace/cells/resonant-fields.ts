import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { ruleAverages } from '../../../../shared/antenna/guided-wave/resonant-cell';
import type { Cells } from '../../../../shared/model/design-document';
import { editValue } from '../design-field-edit';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { PendingEntries } from '../fields/pending-entries';
import { figureText } from '../strip-figures';
import { WORKSPACE_STATE } from '../workspace-state';

type ResonantCells = Extract<Cells, { kind: 'resonant' }>;

const RULES = [
  { value: 'projection', label: 'Projection' },
  { value: 'nearest', label: 'Nearest field' },
  { value: 'phase-only', label: 'Phase only' },
] as const;
const TUNINGS = [
  { value: 'continuous', label: 'Continuous' },
  { value: 'states', label: 'States' },
] as const;

/** How resonant cells on a guided wave are tuned, and what that gives on the average. */
@Component({
  selector: 'slant-resonant-fields',
  imports: [ChoiceRow, DesignField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-choice-row label="Rule" [options]="rules" [chosen]="cells()?.rule ?? null" [locked]="!canEdit()" (picked)="chooseRule($event)" />
    @if (cells()?.rule !== 'phase-only') {
      <slant-choice-row label="Tuning" [options]="tunings" [chosen]="cells()?.states === null ? 'continuous' : 'states'" [locked]="!canEdit()" (picked)="chooseTuning($event)" />
    }
    @if (cells()?.states !== null) {
      <div class="fields">
        <slant-design-field pointer="/cells/states" label="Number of states" dimension="number" [whole]="true" [stepSize]="1" />
      </div>
    }
    <p class="hint">{{ average() }}</p>
  `,
  styleUrls: ['../fields/sheet.scss', '../fields/field-rows.scss'],
})
export class ResonantFields {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  protected readonly rules = RULES;
  protected readonly tunings = TUNINGS;
  protected readonly canEdit = this.state.canEdit;
  protected readonly cells = computed((): ResonantCells | null => {
    const { cells } = this.state.design();
    return cells.kind === 'resonant' ? cells : null;
  });
  protected readonly average = computed(() => {
    const cells = this.cells();
    if (!cells) return '';
    const { meanInPhase, modulationEfficiency } = ruleAverages(cells.rule, cells.states);
    return `Strength and phase of a resonance lie on one circle. Over all target phases this choice puts ${figureText(meanInPhase, 3)} of the free field into the beam and ${figureText(modulationEfficiency * 100, 1)} % of what the cells couple; of the rest a part goes out as the unmodulated wave.`;
  });

  protected chooseRule(rule: string): void {
    const cells = this.cells();
    const option = RULES.find(({ value }) => value === rule);
    if (cells && option) this.put({ ...cells, rule: option.value, states: option.value === 'phase-only' ? null : cells.states }, `Rule: ${option.label}`);
  }

  protected chooseTuning(tuning: string): void {
    const cells = this.cells();
    if (cells) this.put({ ...cells, states: tuning === 'states' ? 4 : null }, tuning === 'states' ? 'Cells: states' : 'Cells: continuous tuning');
  }

  private put(cells: ResonantCells, name: string): void {
    const edit = editValue(this.state.design(), '/cells', cells);
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow('/cells');
    this.state.change(name, () => edit.design);
  }
}
