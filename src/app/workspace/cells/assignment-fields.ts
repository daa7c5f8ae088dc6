import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { editValue } from '../design-field-edit';
import { ChoiceRow } from '../fields/choice-row';
import { DesignChoice } from '../fields/design-choice';
import { DesignField } from '../fields/design-field';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { WORKSPACE_STATE } from '../workspace-state';
import { RULE_OPTIONS } from './rule-options';

const FIT_OPTIONS = [
  { value: 'band', label: 'Edges of the band' },
  { value: 'own', label: 'Given' },
] as const;
const MOST_FREQUENCIES = 8;
const LIST = '/cells/fitFrequenciesGHz';

/** How cells of an edition are chosen: the rule, the frequencies it looks at, how many different cells, how far neighbours may differ. */
@Component({
  selector: 'slant-assignment-fields',
  imports: [ChoiceRow, DesignChoice, DesignField, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-design-choice pointer="/cells/rule" [options]="rules" />
    @if (fitsBand()) {
      <slant-choice-row label="Fitted besides the design frequency at" [options]="fitOptions" [chosen]="own().length > 0 ? 'own' : 'band'" [locked]="!canEdit()" (picked)="chooseFit($event)" />
      @if (own().length > 0) {
        <div class="fields">
          @for (pointer of pointers(); track pointer) {
            <slant-design-field [pointer]="pointer" dimension="frequency" unit="GHz" />
          }
        </div>
        <div class="actions">
          <button type="button" class="button quiet" [disabled]="!canEdit() || own().length >= most" (click)="add()">Add frequency</button>
          <button type="button" class="button quiet" [disabled]="!canEdit() || own().length < 2" (click)="removeLast()">Remove last frequency</button>
        </div>
      }
    }
    <div class="fields">
      <slant-design-field pointer="/cells/levels" label="Different cells, at most" dimension="number" [whole]="true" [optional]="true" [stepSize]="1" />
      <slant-design-field pointer="/cells/neighbourStepMm" label="Neighbour step, at most" dimension="length" unit="mm" [optional]="true" />
    </div>
    <p class="hint">
      Nearest phase takes the cell whose phase comes nearest; least complex error counts its loss as well; band fit counts both over all its frequencies, with a common phase of the panel free at each, which costs nothing. Fewer
      different cells are those nearest to as many even phases. Larger steps between neighbours are counted, not avoided.
    </p>
    <slant-remark-list [pointers]="['/cells/rule', '/cells/fitFrequenciesGHz']" />
  `,
  styleUrls: ['../fields/sheet.scss', '../fields/field-rows.scss'],
})
export class AssignmentFields {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  protected readonly rules = RULE_OPTIONS;
  protected readonly fitOptions = FIT_OPTIONS;
  protected readonly most = MOST_FREQUENCIES;
  protected readonly canEdit = this.state.canEdit;
  private readonly cells = computed(() => {
    const { cells } = this.state.design();
    return cells.kind === 'edition' ? cells : null;
  });
  protected readonly fitsBand = computed(() => this.cells()?.rule === 'band-fit');
  protected readonly own = computed(() => this.cells()?.fitFrequenciesGHz ?? []);
  protected readonly pointers = computed(() => this.own().map((_, i) => `${LIST}/${i}`));

  protected chooseFit(kind: string): void {
    const { bandGHz, designFrequencyGHz } = this.state.design().requirement;
    this.put(kind === 'own' ? (bandGHz ? [...bandGHz] : [designFrequencyGHz]) : undefined, kind === 'own' ? 'Fit at given frequencies' : 'Fit at the edges of the band');
  }

  protected add(): void {
    this.put([...this.own(), this.own()[this.own().length - 1]], 'Add fit frequency');
  }

  protected removeLast(): void {
    this.put(this.own().slice(0, -1), 'Remove fit frequency');
  }

  private put(frequencies: readonly number[] | undefined, name: string): void {
    const edit = editValue(this.state.design(), LIST, frequencies);
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow(LIST);
    this.state.change(name, () => edit.design);
  }
}
