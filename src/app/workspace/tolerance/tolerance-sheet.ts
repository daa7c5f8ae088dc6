import { ChangeDetectionStrategy, Component, computed, effect, inject, signal, untracked } from '@angular/core';
import { DEFAULT_TOLERANCE } from '../../../../shared/model/tolerance-contributors';
import type { ToleranceContributor, ToleranceParameters, ToleranceResult } from '../../../../shared/model/tolerance-run';
import { parseQuantity } from '../../../../shared/units/quantity';
import { ChoiceTabs } from '../../ui/choice-tabs';
import { EmptyState } from '../../ui/empty-state';
import { ViewTitle } from '../../ui/view-title';
import { EntryBox } from '../fields/entry-box';
import type { RefusedEntry } from '../fields/entry-box';
import { fieldText } from '../fields/field-text';
import { HowNote } from '../fields/how-note';
import { SheetNotes } from '../fields/sheet-notes';
import { RunDesk } from '../runs/run-desk';
import { RunRecords } from '../runs/run-records';
import { RunSheet } from '../runs/run-sheet';
import { RunStarter } from '../runs/run-starter';
import { SheetHeader } from '../sheet-header';
import { sheetNumber } from '../sheets';
import { WORKSPACE_STATE } from '../workspace-state';
import { ContributorsTable } from './contributors-table';
import { HOW_TOLERANCE_COMPUTED } from './how-tolerance-computed';
import { fieldValue, sameParameters, toleranceFormFault, withField } from './tolerance-form';
import type { ToleranceField } from './tolerance-form';
import { SHEET_NOTES, toleranceSubtitle } from './tolerance-notes';
import { ToleranceOutcome } from './tolerance-outcome';

/** The panel under manufacturing spread: many panels made by chance, each held against the requirement. */
@Component({
  selector: 'slant-tolerance-sheet',
  imports: [ChoiceTabs, ContributorsTable, EmptyState, EntryBox, HowNote, RunRecords, RunStarter, SheetNotes, ToleranceOutcome, ViewTitle],
  providers: [RunDesk, RunSheet],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './tolerance-sheet.html',
  styleUrls: ['../fields/sheet.scss', './tolerance-sheet.scss', '../runs/run-result.scss'],
})
export class ToleranceSheet {
  private readonly state = inject(WORKSPACE_STATE);
  protected readonly desk = inject(RunDesk);
  protected readonly runs = inject(RunSheet);
  protected readonly parameters = signal<ToleranceParameters>(DEFAULT_TOLERANCE);
  protected readonly refused = signal<Partial<Record<ToleranceField, RefusedEntry & { readonly text: string }>>>({});
  protected readonly how = HOW_TOLERANCE_COMPUTED;
  protected readonly notes = SHEET_NOTES;
  protected readonly design = this.state.design;
  protected readonly whyNot = computed(() => {
    if (this.desk.busy()) return 'The run is being started';
    return Object.keys(this.refused()).length > 0 ? 'An entry was not taken' : toleranceFormFault(this.parameters(), this.design());
  });
  private readonly answer = computed(() => {
    const answer = this.desk.shown()?.answer;
    return answer?.kind === 'tolerance' ? answer : null;
  });
  protected readonly result = computed((): ToleranceResult | null => this.answer()?.result ?? null);
  protected readonly staleText = computed(() => {
    const answer = this.answer();
    if (answer === null || this.runs.staleText() !== null) return this.runs.staleText();
    return sameParameters(answer.parameters, this.parameters()) ? null : 'Spreads changed: this run had others. Show it again to see them, or start a new one.';
  });

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      header.show({ number: sheetNumber('tolerance'), title: 'Tolerance', subtitle: toleranceSubtitle(this.design().requirement.designFrequencyGHz, this.parameters().trials) });
    });
    this.runs.follow('tolerance');
    effect(() => {
      const answer = this.answer();
      if (answer === null) return;
      untracked(() => {
        this.parameters.set(answer.parameters);
        this.refused.set({});
      });
    });
  }

  protected textOf(field: ToleranceField): string {
    return this.refused()[field]?.text ?? fieldText(fieldValue(this.parameters(), field));
  }

  protected take(field: ToleranceField, text: string): void {
    const read = parseQuantity(text, 'number');
    const next = read.kind === 'refused' ? { reason: read.reason } : withField(this.parameters(), field, read.value);
    if ('reason' in next) {
      this.refused.update((all) => ({ ...all, [field]: { text, reason: next.reason, suggestion: null } }));
      return;
    }
    this.giveUp(field);
    this.parameters.set(next.parameters);
  }

  protected giveUp(field: ToleranceField): void {
    this.refused.update(({ [field]: _given, ...others }) => others);
  }

  protected vary(contributors: ToleranceContributor[]): void {
    this.parameters.update((parameters) => ({ ...parameters, contributors }));
  }

  protected useDefaults(): void {
    this.parameters.update(({ trials, seed }) => ({ ...DEFAULT_TOLERANCE, trials, seed }));
    this.refused.set({});
  }

  protected async start(): Promise<void> {
    await this.desk.start({ kind: 'tolerance', ...this.runs.source(), parameters: this.parameters() });
  }
}
