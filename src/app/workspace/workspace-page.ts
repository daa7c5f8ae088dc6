import { ChangeDetectionStrategy, Component, DOCUMENT, computed, effect, inject, input, signal, untracked } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink, RouterOutlet } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { designDifferences } from '../../../shared/model/design-diff';
import { requestKey } from '../api/request-key';
import { SessionStore } from '../session/session-store';
import { CommandRegistry } from '../ui/command-registry';
import { EmptyState } from '../ui/empty-state';
import { FiguresStrip } from '../ui/figures-strip';
import { Rail } from '../ui/rail';
import { SheetFrame } from '../ui/sheet-frame';
import { ShortcutList, isTyping } from '../ui/shortcut-list';
import { StateMark } from '../ui/state-mark';
import { TitleBlock } from '../ui/title-block';
import { ConflictDialog } from './dialogs/conflict-dialog';
import type { ConflictChoices } from './dialogs/conflict-dialog';
import { FreezeDialog } from './dialogs/freeze-dialog';
import type { FreezeQuestion } from './dialogs/freeze-dialog';
import { HowComputedDialog } from './dialogs/how-computed-dialog';
import type { DraftConflict } from './draft-store';
import { DraftStore } from './draft-store';
import { PendingEntries } from './fields/pending-entries';
import { freezeHindrance, nextRevisionNumber } from './freeze-readiness';
import { RevisionFreezer } from './revision-freezer';
import { saveLine } from './save-text';
import { SheetHeader } from './sheet-header';
import { sheetStates } from './sheet-states';
import { SHEETS } from './sheets';
import type { SheetId } from './sheets';
import { stripFigures } from './strip-figures';
import type { StripFigure } from './strip-figures';
import { standingText, titleRows } from './title-rows';
import { workspaceKey } from './workspace-keys';
import { WORKSPACE_SHORTCUTS } from './workspace-keys';
import { WORKSPACE_STATE } from './workspace-state';
import { WorkspaceStore } from './workspace-store';

/** A panel at work: rail of sheets, bar, figures strip, and the open sheet in its frame. */
@Component({
  selector: 'slant-workspace-page',
  imports: [EmptyState, FiguresStrip, Rail, RouterLink, RouterOutlet, SheetFrame, ShortcutList, StateMark, TitleBlock],
  providers: [DraftStore, WorkspaceStore, RevisionFreezer, SheetHeader, PendingEntries, { provide: WORKSPACE_STATE, useExisting: WorkspaceStore }],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './workspace-page.html',
  styleUrls: ['./workspace-page.scss', './workspace-bar.scss'],
  host: {
    '(document:keydown)': 'pressKey($event)',
    '(document:visibilitychange)': 'sendWhenHidden()',
    '(window:online)': 'send()',
    '(window:beforeunload)': 'holdUnsaved($event)',
  },
})
export class WorkspacePage {
  readonly panelId = input.required<string>();

  private readonly document = inject(DOCUMENT);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly session = inject(SessionStore);
  private readonly registry = inject(CommandRegistry);
  private readonly drafts = inject(DraftStore);
  private readonly freezer = inject(RevisionFreezer);
  protected readonly store = inject(WorkspaceStore);
  protected readonly pending = inject(PendingEntries);
  protected readonly head = inject(SheetHeader).head;

  protected readonly sheetCount = SHEETS.length;
  protected readonly railOpen = signal(false);
  protected readonly shortcuts = WORKSPACE_SHORTCUTS;
  protected readonly person = computed(() => this.session.current()?.person.name ?? '');
  protected readonly undoName = this.drafts.undoName;
  protected readonly redoName = this.drafts.redoName;
  protected readonly saved = computed(() => saveLine(this.store.saveState(), this.pending.all().length));
  protected readonly saveTitle = computed(() => this.pending.all().map(({ label, text, reason }) => `${label}: "${text}" ${reason}`).join('\n'));
  protected readonly revision = computed(() => this.store.panel()?.latestRevision ?? null);
  protected readonly nextNumber = computed(() => nextRevisionNumber(this.store.panel()));
  protected readonly against = computed(() => {
    const revision = this.revision();
    return revision ? `vs ${revision.number}` : '';
  });
  protected readonly freezeHindrance = computed(() =>
    freezeHindrance({
      panel: this.store.panel(),
      viewOnlyReason: this.store.viewOnlyReason(),
      saveState: this.store.saveState(),
      pendingCount: this.pending.all().length,
      failureDetail: this.store.failure()?.detail ?? null,
    }),
  );
  private readonly states = computed(() => {
    const panel = this.store.panel();
    return sheetStates({
      design: this.store.design(),
      predicted: this.store.prediction()?.head ?? null,
      failure: this.store.failure(),
      revisionCount: panel?.latestRevision?.number ?? 0,
      draftIsRevision: (panel?.draftIsRevision ?? false) && this.store.saveState().kind !== 'saving',
    });
  });
  protected readonly railItems = computed(() =>
    this.states().map(({ id, word, reason }, place) => ({ id, number: place + 1, title: SHEETS[place].title, state: word, reason, link: ['/panels', this.panelId(), id] })),
  );
  protected readonly figures = computed<readonly StripFigure[]>(() => {
    const prediction = this.store.prediction();
    return prediction ? stripFigures(prediction.head, this.store.parentPrediction()?.head ?? null) : [];
  });
  protected readonly titleRows = computed(() => {
    const panel = this.store.panel();
    return panel ? titleRows(panel, this.head(), this.store.saveState()) : [];
  });
  protected readonly standing = computed(() => {
    const panel = this.store.panel();
    return panel ? standingText(panel, this.store.saveState()) : '';
  });
  protected readonly neighbours = computed(() => {
    const place = this.head().number - 1;
    return { earlier: SHEETS[place - 1] ?? null, later: SHEETS[place + 1] ?? null };
  });

  constructor() {
    effect(() => {
      const panelId = this.panelId();
      this.pending.clear();
      untracked(() => void this.store.open(panelId, this.viewOnlyReason()));
    });
    effect(() => {
      const conflict = this.drafts.conflict();
      if (conflict) untracked(() => void this.decide(conflict));
    });
    effect((onCleanup) => onCleanup(this.registry.set('workspace', this.commands())));
  }

  private viewOnlyReason(): string | null {
    if (this.session.hasRole('designer')) return null;
    return `Only a designer changes panels; your part here is ${this.session.roles().join(', ') || 'none'}`;
  }

  protected openSheet(id: SheetId): void {
    this.railOpen.set(false);
    void this.router.navigate(['/panels', this.panelId(), id]);
  }

  protected undo(): void {
    this.drafts.undo();
  }

  protected redo(): void {
    this.drafts.redo();
  }

  protected find(): void {
    this.registry.isOpen.set(true);
  }

  protected compare(): void {
    const revision = this.revision();
    if (!revision) return;
    const queryParams = { before: `revision:${revision.id}`, after: `draft:${this.panelId()}` };
    void this.router.navigate(['/panels', this.panelId(), 'revisions', 'compare'], { queryParams });
  }

  protected explain(id: string): void {
    const figure = this.figures().find((candidate) => candidate.id === id);
    if (figure) this.dialog.open(HowComputedDialog, { data: figure, width: '560px', ariaLabel: `How computed: ${figure.label}` });
  }

  protected freeze(): void {
    if (this.freezeHindrance() !== null) return;
    const key = requestKey();
    const parent = this.store.parentPrediction()?.of ?? null;
    const data: FreezeQuestion = {
      number: this.nextNumber(),
      parentNumber: parent ? (this.revision()?.number ?? null) : null,
      changes: parent ? designDifferences(parent, this.store.design()) : [],
      freeze: (message) => this.freezer.freeze(message, key),
    };
    this.dialog.open(FreezeDialog, { data, width: '520px', ariaLabel: `Freeze revision ${data.number}` });
  }

  protected reopen(): void {
    void this.store.open(this.panelId(), this.viewOnlyReason());
  }

  protected openConflict(): void {
    const conflict = this.drafts.conflict();
    if (conflict) void this.decide(conflict);
  }

  private async decide(conflict: DraftConflict): Promise<void> {
    const dialog = this.dialog.open<ConflictDialog, DraftConflict, ConflictChoices>(ConflictDialog, { data: conflict, width: '720px', ariaLabel: 'Two versions of the draft' });
    const choices = await firstValueFrom(dialog.afterClosed());
    if (choices) this.drafts.resolveConflict(choices);
  }

  protected pressKey(event: KeyboardEvent): void {
    // Dialogs keep their keys, and letters in fields are text.
    const target = event.target instanceof Element ? event.target : null;
    if (event.defaultPrevented || isTyping(event.target) || target?.closest('dialog, .cdk-overlay-container')) return;
    const deed = workspaceKey(event);
    if (!deed) return;
    event.preventDefault();
    if (deed.kind === 'undo') this.undo();
    else if (deed.kind === 'redo') this.redo();
    else if (deed.kind === 'close') this.railOpen.set(false);
    else this.openSheet(deed.sheet);
  }

  protected sendWhenHidden(): void {
    if (this.document.visibilityState === 'hidden') this.send();
  }

  protected send(): void {
    void this.drafts.flush();
  }

  /** Asks before the page is left with work that only this browser has. */
  protected holdUnsaved(event: BeforeUnloadEvent): void {
    if (this.drafts.hasUnsaved) event.preventDefault();
  }

  private commands() {
    const sheets = SHEETS.map(({ id, title }, place) => ({ id: `sheet-${id}`, label: title, kind: 'sheet', keys: String(place + 1), run: () => this.openSheet(id) }));
    return [
      ...sheets,
      { id: 'undo', label: 'Undo', kind: 'action', keys: 'Ctrl Z', run: () => this.undo() },
      { id: 'redo', label: 'Redo', kind: 'action', keys: 'Ctrl Shift Z', run: () => this.redo() },
      { id: 'freeze', label: 'Freeze revision', kind: 'action', words: 'save revision', run: () => this.freeze() },
      { id: 'compare', label: 'Compare with the latest revision', kind: 'action', words: 'difference', run: () => this.compare() },
    ];
  }
}
