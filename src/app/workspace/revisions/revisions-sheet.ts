import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { RevisionListItem } from '../../../../shared/contracts/projects';
import { requestKey } from '../../api/request-key';
import { RevisionClient } from '../../api/revision-client';
import { outcomeText } from '../../api/call-outcome';
import { Confirm } from '../../ui/confirm';
import { EmptyState } from '../../ui/empty-state';
import { StateMark } from '../../ui/state-mark';
import { ViewTitle } from '../../ui/view-title';
import { SheetNotes } from '../fields/sheet-notes';
import { SheetHeader } from '../sheet-header';
import { sheetNumber } from '../sheets';
import { WORKSPACE_STATE } from '../workspace-state';
import { PanelReopener } from './panel-reopener';
import { draftSide, revisionSide } from './compare-link';
import { ExportPanel } from './export-panel';
import { revisionRows } from './revision-rows';
import type { RevisionRow } from './revision-rows';

/** Every frozen state of the panel, newest first, under the draft: to compare, to restore, to hand over. */
@Component({
  selector: 'slant-revisions-sheet',
  imports: [EmptyState, ExportPanel, RouterLink, SheetNotes, StateMark, ViewTitle],
  providers: [PanelReopener],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './revisions-sheet.html',
  styleUrl: './revisions-sheet.scss',
})
export class RevisionsSheet {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly client = inject(RevisionClient);
  private readonly confirm = inject(Confirm);
  private readonly reopener = inject(PanelReopener);

  private readonly items = signal<readonly RevisionListItem[] | null>(null);
  protected readonly trouble = signal('');
  protected readonly told = signal('');
  protected readonly exported = signal<RevisionRow | null>(null);
  protected readonly panel = this.state.panel;
  protected readonly canEdit = this.state.canEdit;
  protected readonly viewOnlyReason = this.state.viewOnlyReason;
  protected readonly rows = computed(() => {
    const items = this.items();
    return items ? revisionRows(items) : null;
  });
  protected readonly draftText = computed(() => {
    const panel = this.panel();
    if (!panel?.latestRevision) return 'no revision yet';
    return panel.draftIsRevision ? `equals revision ${panel.latestRevision.number}` : `after revision ${panel.latestRevision.number}`;
  });
  protected readonly draftCompare = computed(() => {
    const panel = this.panel();
    return panel?.latestRevision ? { before: revisionSide(panel.latestRevision.id), after: draftSide(panel.id) } : null;
  });

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      const count = this.items()?.length;
      header.show({ number: sheetNumber('revisions'), title: 'Revisions', subtitle: count === undefined ? '' : count === 0 ? 'none yet' : `${count} frozen, ${this.draftText() === 'no revision yet' ? '' : `draft ${this.draftText()}`}` });
    });
    // A new revision changes the latest one, and so brings the list anew.
    effect(() => {
      const panel = this.panel();
      if (panel) void this.read(panel.id, panel.latestRevision?.id ?? null);
    });
  }

  private async read(panelId: string, _latestId: string | null): Promise<void> {
    const outcome = await this.client.list(panelId);
    if (outcome.kind === 'found') this.items.set(outcome.value);
    this.trouble.set(outcomeText(outcome) ?? '');
  }

  protected compareParams(row: RevisionRow): { readonly before: string; readonly after: string } | null {
    return row.parentId === null ? null : { before: revisionSide(row.parentId), after: revisionSide(row.id) };
  }

  protected async restore(row: RevisionRow): Promise<void> {
    const yes = await this.confirm.ask({
      title: `Restore revision ${row.number}`,
      text: `A new revision with the content of revision ${row.number} is frozen and the draft follows it. Nothing is lost: what the draft holds now is replaced only here, and every revision stays.`,
      deed: `Restore revision ${row.number}`,
    });
    if (!yes) return;
    const outcome = await this.client.restore(row.id, `Restore revision ${row.number}: ${row.message}`.slice(0, 2000), requestKey());
    this.trouble.set(outcomeText(outcome) ?? '');
    if (outcome.kind !== 'found') return;
    this.told.set(`Revision ${outcome.value.number} holds the content of revision ${row.number}`);
    await this.reopener.reopen();
  }
}
