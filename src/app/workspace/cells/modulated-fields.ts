import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { editValue } from '../design-field-edit';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { DesignTable } from '../fields/design-table';
import type { DesignColumn } from '../fields/design-table';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { WORKSPACE_STATE } from '../workspace-state';

const STATE_COLUMNS: readonly DesignColumn[] = [
  { key: 'phaseDeg', label: 'Phase', dimension: 'angle', unit: '°' },
  { key: 'magnitude', label: 'Magnitude', dimension: 'number', unit: '' },
];
const PARTS = [
  { value: 'even', label: 'Equal parts' },
  { value: 'own', label: 'Given' },
] as const;

/** The switching sequence that all cells run through, each with its own delay. */
@Component({
  selector: 'slant-modulated-fields',
  imports: [ChoiceRow, DesignField, DesignTable, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-design-table pointer="/cells/states" rowName="state" [columns]="columns" [least]="2" [nextRow]="nextState" />
    <slant-choice-row label="Parts of the period" [options]="parts" [chosen]="edges() ? 'own' : 'even'" [locked]="!canEdit()" (picked)="chooseParts($event)" />
    @if (pointers().length > 0) {
      <div class="fields">
        @for (pointer of pointers(); track pointer; let place = $index) {
          <slant-design-field [pointer]="pointer" [label]="'State ' + (place + 1) + ' until'" dimension="number" />
        }
      </div>
    }
    <div class="fields">
      <slant-design-field pointer="/cells/harmonic" label="Harmonic steered" dimension="number" [whole]="true" [stepSize]="1" />
      <slant-design-field pointer="/cells/modulationMHz" label="Modulation, MHz" dimension="number" />
    </div>
    <p class="hint">Each cell starts its sequence later by what gives the steered harmonic its wanted phase. The other harmonics go elsewhere: the Pattern sheet shows them one by one.</p>
    <slant-remark-list [pointers]="['/cells/edges', '/cells/harmonic']" />
  `,
  styleUrls: ['../fields/sheet.scss', '../fields/field-rows.scss'],
})
export class ModulatedFields {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  protected readonly columns = STATE_COLUMNS;
  protected readonly parts = PARTS;
  protected readonly canEdit = this.state.canEdit;
  private readonly cells = computed(() => {
    const { cells } = this.state.design();
    return cells.kind === 'modulated' ? cells : null;
  });
  protected readonly edges = computed(() => this.cells()?.edges ?? null);
  /** The ends of all states but the last, which ends with the period. */
  protected readonly pointers = computed(() => (this.edges() ?? []).slice(1, -1).map((_, i) => `/cells/edges/${i + 1}`));
  protected readonly nextState = (rows: readonly (readonly number[])[]): readonly number[] => [((rows.at(-1)?.[0] ?? -90) + 90) % 360, 1];

  protected chooseParts(kind: string): void {
    const count = this.cells()?.states.length ?? 0;
    const edit = editValue(this.state.design(), '/cells/edges', kind === 'own' ? Array.from({ length: count + 1 }, (_, i) => i / count) : undefined);
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow('/cells/edges');
    this.state.change(kind === 'own' ? 'Give the parts of the period' : 'Equal parts of the period', () => edit.design);
  }
}
