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
import { queryLink } from '../query-link';
import { RunDesk } from '../runs/run-desk';
import { RunHistory } from '../runs/run-history';
import { RunProgressBar } from '../runs/run-progress-bar';
import { sourceText } from '../runs/run-text';
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
  imports: [ChoiceTabs, ContributorsTable, EmptyState, EntryBox, HowNote, RunHistory, RunProgressBar, SheetNotes, ToleranceOutcome, ViewTitle],
  providers: [RunDesk],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './tolerance-sheet.html',
  styleUrls: ['../fields/sheet.scss', './tolerance-sheet.scss'],
})
export class ToleranceSheet {
  private readonly state = inject(WORKSPACE_STATE);
  protected readonly desk = inject(RunDesk);
  protected readonly link = queryLink<{ readonly run: string | null }>(
    (query) => ({ run: query.get('run') }),
    ({ run }) => ({ run }),
  );
  protected readonly parameters = signal<ToleranceParameters>(DEFAULT_TOLERANCE);
  protected readonly refused = signal<Partial<Record<ToleranceField, RefusedEntry & { readonly text: string }>>>({});
  /** "draft" or the id of the latest revision. */
  protected readonly subject = signal('draft');
  protected readonly how = HOW_TOLERANCE_COMPUTED;
  protected readonly notes = SHEET_NOTES;
  protected readonly design = this.state.design;
  protected readonly subjects = computed(() => {
    const latest = this.state.panel()?.latestRevision;
    return [{ id: 'draft', label: 'Draft' }, ...(latest ? [{ id: latest.id, label: `Revision ${latest.number}` }] : [])];
  });
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
    const [shown, answer] = [this.desk.shown(), this.answer()];
    if (shown === null || answer === null) return null;
    if (this.desk.stale()) return `Inputs changed: this is ${sourceText(shown)}, not the draft as it stands.`;
    return sameParameters(answer.parameters, this.parameters()) ? null : 'Spreads changed: this run had others. Show it again to see them, or start a new one.';
  });
  protected readonly draftHash = computed(() => this.state.panel()?.draftHash ?? null);
  protected readonly heading = computed(() => {
    const [panel, shown] = [this.state.panel(), this.desk.shown()];
    return {
      subject: panel ? `${panel.project.name}, ${panel.name}` : '',
      state: shown ? (shown.source.kind === 'revision' ? `Revision ${shown.source.number}` : `Draft, save ${shown.source.version}`) : '',
      hash: shown?.contentHash ?? '',
      date: (shown?.finishedAt ?? new Date().toISOString()).slice(0, 10),
    };
  });

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      header.show({ number: sheetNumber('tolerance'), title: 'Tolerance', subtitle: toleranceSubtitle(this.design().requirement.designFrequencyGHz, this.parameters().trials) });
    });
    const panelId = computed(() => this.state.panel()?.id ?? null);
    effect(() => {
      const id = panelId();
      if (id !== null) untracked(() => void this.desk.open(id, 'tolerance', this.link().run));
    });
    effect(() => {
      const [run, answer] = [this.desk.shown()?.id ?? null, this.answer()];
      if (run === null || answer === null) return;
      untracked(() => {
        this.link.set({ run });
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
    if (this.whyNot() !== null) return;
    const subject = this.subject();
    await this.desk.start({ kind: 'tolerance', ...(subject === 'draft' ? {} : { revisionId: subject }), parameters: this.parameters() });
  }
}
