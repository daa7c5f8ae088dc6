import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { PatternGoal } from '../../../../shared/model/design-document';
import { editValue } from '../design-field-edit';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { DesignTable } from '../fields/design-table';
import type { DesignColumn } from '../fields/design-table';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { WORKSPACE_STATE } from '../workspace-state';

const GOALS = [
  { value: 'sectors', label: 'Flat sectors' },
  { value: 'mask', label: 'Beams under a mask' },
] as const;
const MASK_COLUMNS: readonly DesignColumn[] = [
  { key: '0', label: 'Off axis', dimension: 'angle', unit: '°' },
  { key: '1', label: 'Below the peak', dimension: 'level', unit: 'dB' },
];
const MOST_SECTORS = 8;

/** What a goal starts from. */
export function firstGoal(kind: PatternGoal['kind']): PatternGoal {
  return kind === 'mask'
    ? { kind, points: [[8, -18], [90, -25]], peakLossDb: 1 }
    : { kind, sectors: [{ azimuthDeg: [-15, 15], elevationDeg: [-15, 15] }], rippleDb: 1, transitionDeg: 6, outsideDb: -15 };
}

/** The pattern that alternating projections are to come near: sectors of a flat level, or beams under a relative mask. */
@Component({
  selector: 'slant-projections-fields',
  imports: [ChoiceRow, DesignField, DesignTable, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './projections-fields.html',
  styleUrls: ['../fields/sheet.scss', '../fields/field-rows.scss'],
  styles: '@media (max-width: 640px) { .sector { grid-template-columns: 1fr 1fr; } }',
})
export class ProjectionsFields {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  private readonly left = new Map<PatternGoal['kind'], PatternGoal>();
  protected readonly goals = GOALS;
  protected readonly maskColumns = MASK_COLUMNS;
  protected readonly canEdit = this.state.canEdit;
  protected readonly goal = computed(() => {
    const { synthesis } = this.state.design();
    return synthesis.kind === 'projections' ? synthesis.goal : null;
  });
  protected readonly sectors = computed(() => {
    const goal = this.goal();
    return goal?.kind === 'sectors' ? goal.sectors : [];
  });
  protected readonly sectorPointers = computed(() => this.sectors().map((_, i) => `/synthesis/goal/sectors/${i}`));
  protected readonly canAdd = computed(() => this.canEdit() && this.sectors().length < MOST_SECTORS);
  protected readonly nextPoint = (rows: readonly (readonly number[])[]): readonly number[] => [Math.min(180, (rows.at(-1)?.[0] ?? 0) + 10), rows.at(-1)?.[1] ?? -20];

  protected choose(kind: string): void {
    const goal = this.goal();
    const option = GOALS.find(({ value }) => value === kind);
    if (!goal || !option || option.value === goal.kind) return;
    this.left.set(goal.kind, goal);
    this.put('/synthesis/goal', this.left.get(option.value) ?? firstGoal(option.value), `Wanted pattern: ${option.label}`);
  }

  protected addSector(): void {
    const sectors = this.sectors();
    const last = sectors[sectors.length - 1];
    this.put('/synthesis/goal/sectors', [...sectors, { ...last }], 'Add sector');
  }

  protected removeSector(place: number): void {
    this.put('/synthesis/goal/sectors', this.sectors().filter((_, i) => i !== place), `Remove sector ${place + 1}`);
  }

  private put(pointer: string, value: unknown, name: string): void {
    const edit = editValue(this.state.design(), pointer, value);
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow(pointer);
    this.state.change(name, () => edit.design);
  }
}
