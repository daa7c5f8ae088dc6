import { ChangeDetectionStrategy, Component, computed, effect, inject, signal, untracked } from '@angular/core';
import type { BandResult } from '../../../../shared/model/band-run';
import type { QuantityDimension } from '../../../../shared/units/quantity';
import { parseQuantity } from '../../../../shared/units/quantity';
import { CheckField } from '../../ui/check-field';
import { ChoiceTabs } from '../../ui/choice-tabs';
import { EmptyState } from '../../ui/empty-state';
import { ViewTitle } from '../../ui/view-title';
import { EntryBox } from '../fields/entry-box';
import type { RefusedEntry } from '../fields/entry-box';
import { fieldText } from '../fields/field-text';
import { SheetNotes } from '../fields/sheet-notes';
import { RunDesk } from '../runs/run-desk';
import { RunRecords } from '../runs/run-records';
import { RunSheet } from '../runs/run-sheet';
import { RunStarter } from '../runs/run-starter';
import { sourceText } from '../runs/run-text';
import { SheetHeader } from '../sheet-header';
import { sheetNumber } from '../sheets';
import { WORKSPACE_STATE } from '../workspace-state';
import { FEWEST_FREQUENCIES, FIRST_FORM, MOST_FREQUENCIES, bandOf, bandParametersOf, formFault, formOf } from './band-form';
import type { BandForm } from './band-form';
import type { OtherBand } from './band-figures';
import { BandOutcome } from './band-outcome';

type NumberField = 'fromGHz' | 'toGHz' | 'frequencyCount' | 'lowerOffsetMm' | 'upperOffsetMm';

const DIMENSIONS: Readonly<Record<NumberField, QuantityDimension>> = { fromGHz: 'frequency', toGHz: 'frequency', frequencyCount: 'number', lowerOffsetMm: 'length', upperOffsetMm: 'length' };
const NOTES = [
  'Cells are chosen at the design frequency and frozen; the run shows what the same copper does over the band.',
  'A prediction is array theory, not a measurement.',
] as const;

/** The panel over its band: a run of its own, because every frequency is a prediction. */
@Component({
  selector: 'slant-band-sheet',
  imports: [BandOutcome, CheckField, ChoiceTabs, EmptyState, EntryBox, RunRecords, RunStarter, SheetNotes, ViewTitle],
  providers: [RunDesk, RunSheet],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './band-sheet.html',
  styleUrls: ['../fields/sheet.scss', './band-sheet.scss', '../runs/run-result.scss'],
})
export class BandSheet {
  private readonly state = inject(WORKSPACE_STATE);
  protected readonly desk = inject(RunDesk);
  protected readonly runs = inject(RunSheet);
  protected readonly form = signal<BandForm>(FIRST_FORM);
  protected readonly refused = signal<Partial<Record<NumberField, RefusedEntry>>>({});
  protected readonly notes = NOTES;
  protected readonly design = this.state.design;
  protected readonly hasHorn = computed(() => this.design().illumination.kind === 'horn');
  protected readonly placeholders = computed(() => {
    const band = this.design().requirement.bandGHz;
    return { fromGHz: band ? String(band[0]) : '', toGHz: band ? String(band[1]) : '' };
  });
  protected readonly whyNot = computed(() => {
    if (this.desk.busy()) return 'The run is being started';
    return Object.keys(this.refused()).length > 0 ? 'An entry was not taken' : formFault(this.form(), this.design());
  });
  protected readonly result = computed((): BandResult | null => {
    const answer = this.desk.shown()?.answer;
    return answer?.kind === 'band' ? answer.result : null;
  });
  /** The result laid over the shown one, by its name. */
  protected readonly against = computed((): OtherBand | null => {
    const other = this.desk.against();
    if (other === null || other.id === this.desk.shown()?.id || other.answer.kind !== 'band' || other.answer.result === null) return null;
    return { label: sourceText(other), result: other.answer.result };
  });

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      const band = bandOf(this.form(), this.design());
      const subtitle = band ? `${band.fromGHz} to ${band.toGHz} GHz, designed at ${this.design().requirement.designFrequencyGHz} GHz` : 'no band yet';
      header.show({ number: sheetNumber('band'), title: 'Band', subtitle });
    });
    this.runs.follow('band');
    effect(() => {
      const answer = this.desk.shown()?.answer;
      // What somebody has typed stays; untouched boxes show what the result was asked.
      if (answer?.kind === 'band') untracked(() => this.form.update((form) => (form === FIRST_FORM ? formOf(answer.parameters) : form)));
    });
  }

  protected textOf(field: NumberField): string {
    return fieldText(this.form()[field]);
  }

  protected take(field: NumberField, text: string): void {
    const typed = text.trim();
    if (typed === '' && field !== 'frequencyCount') {
      this.accept({ [field]: null }, field);
      return;
    }
    const read = parseQuantity(typed, DIMENSIONS[field]);
    const refusal = read.kind === 'refused' ? { reason: read.reason, suggestion: read.suggestion ?? null } : countFault(field, read.value);
    if (read.kind === 'refused' || refusal !== null) this.refused.update((all) => ({ ...all, ...(refusal ? { [field]: refusal } : {}) }));
    else this.accept({ [field]: read.value }, field);
  }

  protected giveUp(field: NumberField): void {
    this.accept({}, field);
  }

  protected setSpatialPart(spatialPart: boolean): void {
    this.form.update((form) => ({ ...form, spatialPart }));
  }

  protected async start(): Promise<void> {
    await this.desk.start({ kind: 'band', ...this.runs.source(), parameters: bandParametersOf(this.form(), this.design()) });
  }

  private accept(part: Partial<BandForm>, field: NumberField): void {
    this.form.update((form) => ({ ...form, ...part }));
    this.refused.update(({ [field]: _taken, ...others }) => others);
  }
}

function countFault(field: NumberField, value: number): RefusedEntry | null {
  if (field !== 'frequencyCount') return null;
  if (Number.isInteger(value) && value >= FEWEST_FREQUENCIES && value <= MOST_FREQUENCIES) return null;
  return { reason: `A whole number from ${FEWEST_FREQUENCIES} to ${MOST_FREQUENCIES}`, suggestion: String(FIRST_FORM.frequencyCount) };
}
