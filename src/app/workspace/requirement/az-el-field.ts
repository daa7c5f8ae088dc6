import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { parseQuantity } from '../../../../shared/units/quantity';
import { editValue } from '../design-field-edit';
import { EntryBox } from '../fields/entry-box';
import type { EntryStep } from '../fields/entry-box';
import { fieldText, steppedValue } from '../fields/field-text';
import { PendingEntries } from '../fields/pending-entries';
import { WORKSPACE_STATE } from '../workspace-state';
import { azElOf, polarOf } from './beam-direction';

/** Azimuth or elevation of a beam: another view of its theta and phi, which the design keeps. */
@Component({
  selector: 'slant-az-el-field',
  imports: [EntryBox],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-entry-box
      [label]="label()"
      [bare]="true"
      [shown]="shown()"
      [refused]="refused()"
      [locked]="!canEdit()"
      (taken)="take($event)"
      (givenUp)="giveUp()"
      (stepped)="step($event)"
    />
  `,
})
export class AzElField {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  /** Place of the beam in the list. */
  readonly place = input.required<number>();
  readonly part = input.required<'azimuthDeg' | 'elevationDeg'>();

  protected readonly canEdit = this.state.canEdit;
  protected readonly label = computed(() => `Beam ${this.place() + 1} ${this.part() === 'azimuthDeg' ? 'azimuth' : 'elevation'}`);
  private readonly key = computed(() => `/requirement/beams/${this.place()}/${this.part()}`);
  private readonly direction = computed(() => azElOf(this.state.design().requirement.beams[this.place()] ?? { thetaDeg: 0, phiDeg: 0 }));
  protected readonly refused = computed(() => this.pending.of(this.key()));
  protected readonly shown = computed(() => this.refused()?.text ?? fieldText(this.direction()[this.part()]));

  protected take(text: string): void {
    const read = parseQuantity(text, 'angle', { shownUnit: '°' });
    if (read.kind === 'refused') this.refuse(text, read.reason, read.suggestion ?? null);
    else this.aim(read.value, text);
  }

  protected giveUp(): void {
    this.pending.drop(this.key());
  }

  protected step(step: EntryStep): void {
    const next = steppedValue(this.direction()[this.part()], step, 'angle');
    this.aim(next, String(next), `step ${this.key()}`);
  }

  private aim(valueDeg: number, text: string, mergeKey?: string): void {
    const polar = polarOf({ ...this.direction(), [this.part()]: valueDeg });
    if (Math.abs(valueDeg) >= 90) {
      this.refuse(text, `must stay within ±90°, in front of the panel; got ${valueDeg}`, null);
      return;
    }
    const beam = this.state.design().requirement.beams[this.place()];
    const edit = editValue(this.state.design(), `/requirement/beams/${this.place()}`, { ...beam, ...polar });
    if (edit.kind === 'refused') this.refuse(text, `θ would be ${polar.thetaDeg}°: ${edit.reason}`, null);
    else {
      this.pending.drop(this.key());
      if (edit.kind === 'changed') this.state.change(`Set ${this.label()}`, () => edit.design, mergeKey ? { mergeKey } : {});
    }
  }

  private refuse(text: string, reason: string, suggestion: string | null): void {
    this.pending.keep({ pointer: this.key(), label: this.label(), text, reason, suggestion });
  }
}
