import { ChangeDetectionStrategy, Component, DOCUMENT, ElementRef, computed, effect, inject, signal, untracked } from '@angular/core';
import type { Comparison } from '../../../../shared/contracts/comparisons';
import type { RevisionListItem } from '../../../../shared/contracts/projects';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { outcomeText } from '../../api/call-outcome';
import { ComparisonClient } from '../../api/comparison-client';
import { RevisionClient } from '../../api/revision-client';
import { EmptyState } from '../../ui/empty-state';
import type { PlotHeading } from '../../ui/plots/plot-export';
import { StateMark } from '../../ui/state-mark';
import { ViewTitle } from '../../ui/view-title';
import { SheetNotes } from '../fields/sheet-notes';
import { queryLink } from '../query-link';
import { SheetHeader } from '../sheet-header';
import { sheetNumber } from '../sheets';
import { WORKSPACE_STATE } from '../workspace-state';
import { ChangeMap } from './change-map';
import { draftSide, firstSides, readCompareLink, revisionSide, writeCompareLink } from './compare-link';
import { ComparedCuts } from './compared-cuts';
import { comparisonNotes } from './comparison-plots';
import { cellRows, figureRows, parameterRows, sideHead, sideMark, sideName } from './comparison-rows';
import { SideHeads } from './side-heads';
import type { SideOption, SidePair } from './side-heads';

const LONGEST_OPTION = 48;

/** What is asked of the server. The draft counts by its hash, so that a saved change brings a new comparison. */
interface Question extends SidePair<string> {
  readonly draftHash: string;
}

/** Two states of a panel side by side: what differs in parameters, cells, figures and pattern. */
@Component({
  selector: 'slant-revision-compare',
  imports: [ChangeMap, ComparedCuts, EmptyState, SheetNotes, SideHeads, StateMark, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './revision-compare.html',
  styleUrl: './revision-compare.scss',
})
export class RevisionCompare {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly comparisons = inject(ComparisonClient);
  private readonly revisions = inject(RevisionClient);
  private readonly document = inject(DOCUMENT);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);

  private readonly link = queryLink(readCompareLink, writeCompareLink);
  private readonly items = signal<readonly RevisionListItem[]>([]);
  protected readonly trouble = signal('');
  protected readonly told = signal('');
  protected readonly comparison = signal<Comparison | null>(null);
  /** Of the later side: its mask and lattice are drawn. */
  protected readonly afterDesign = signal<DesignDocument | null>(null);

  private readonly named = computed(() => {
    const panel = this.state.panel();
    return panel ? firstSides(this.link(), panel) : null;
  });
  protected readonly sides = computed((): SidePair<string> | null => {
    const named = this.named();
    return named && !('reason' in named) ? named : null;
  });
  protected readonly hindrance = computed(() => {
    const named = this.named();
    return named && 'reason' in named ? named.reason : null;
  });
  private readonly question = computed(
    (): Question | null => {
      const [sides, panel] = [this.sides(), this.state.panel()];
      if (!sides || !panel) return null;
      const draft = draftSide(panel.id);
      return { ...sides, draftHash: sides.before === draft || sides.after === draft ? panel.draftHash : '' };
    },
    { equal: sameQuestion },
  );
  protected readonly options = computed((): readonly SideOption[] => {
    const [panel, sides] = [this.state.panel(), this.sides()];
    const listed = this.items().map(({ id, number, message }) => ({ value: revisionSide(id), label: shortened(`Revision ${number}: ${message}`) }));
    const known = panel ? [{ value: draftSide(panel.id), label: 'Draft' }, ...listed] : listed;
    // A side may belong to another panel; the comparison then names it.
    const foreign = sides ? [sides.before, sides.after].filter((side) => !known.some(({ value }) => value === side)) : [];
    return [...known, ...foreign.map((value) => ({ value, label: 'As linked' }))];
  });
  protected readonly heads = computed(() => {
    const found = this.comparison();
    return found ? { before: sideHead(found.before, found.after), after: sideHead(found.after, found.before) } : null;
  });
  protected readonly columns = computed(() => {
    const found = this.comparison();
    return found ? { before: sideMark(found.before), after: sideMark(found.after) } : { before: '', after: '' };
  });
  protected readonly parameters = computed(() => parameterRows(this.comparison()?.parameters ?? []));
  protected readonly cellFacts = computed(() => {
    const found = this.comparison();
    const facts = found ? cellRows(found) : [];
    return 'reason' in facts ? { reason: facts.reason, lines: [] } : { reason: '', lines: facts };
  });
  protected readonly figures = computed(() => {
    const found = this.comparison();
    return found ? figureRows(found) : [];
  });
  protected readonly decides = computed(() => {
    const row = this.figures().find(({ deciding }) => deciding);
    return row ? `${row.label.replace(/,.*$/, '').toLowerCase()} decides` : 'no verdict differs';
  });
  protected readonly notes = computed(() => {
    const found = this.comparison();
    return found ? comparisonNotes(found) : [];
  });
  protected readonly heading = computed((): PlotHeading => {
    const found = this.comparison();
    const date = new Date().toISOString().slice(0, 10);
    if (!found) return { title: 'What changed', subject: '', state: '', hash: '', date };
    const state = `${sideName(found.before)} (${found.before.hash.slice(0, 8)}) compared with ${sideName(found.after)}`;
    return { title: 'What changed', subject: `${found.after.projectName}, ${found.after.panelName}`, state, hash: found.after.hash, date };
  });

  constructor() {
    this.followHeader();
    effect(() => {
      const question = this.question();
      if (question) untracked(() => void this.compare(question));
    });
    const panelId = computed(() => this.state.panel()?.id ?? null);
    effect(() => {
      const id = panelId();
      if (id) untracked(() => void this.readList(id));
    });
  }

  private followHeader(): void {
    const header = inject(SheetHeader);
    effect(() => {
      const found = this.comparison();
      header.show({
        number: sheetNumber('revisions'),
        title: 'Revisions',
        subtitle: found ? `Compare ${sideName(found.before)} with ${sideName(found.after)}` : 'Compare',
        actions: [
          { label: 'Choose revisions', disabledReason: this.hindrance(), run: () => this.host.nativeElement.querySelector('select')?.focus() },
          { label: 'Copy link', disabledReason: this.hindrance(), run: () => void this.copyLink() },
        ],
      });
    });
  }

  private async compare(question: Question): Promise<void> {
    const [outcome, design] = await Promise.all([this.comparisons.compare(question.before, question.after), this.designOf(question.after)]);
    // Other sides may have been chosen meanwhile.
    const now = untracked(this.question);
    if (!now || !sameQuestion(now, question)) return;
    this.trouble.set(outcomeText(outcome) ?? '');
    if (outcome.kind !== 'found') return;
    this.afterDesign.set(design);
    this.comparison.set(outcome.value);
  }

  private async designOf(side: string): Promise<DesignDocument | null> {
    const [kind, id] = side.split(':');
    if (kind === 'draft') return this.state.design();
    const outcome = await this.revisions.read(id);
    return outcome.kind === 'found' ? outcome.value.design : null;
  }

  private async readList(panelId: string): Promise<void> {
    const outcome = await this.revisions.list(panelId);
    if (outcome.kind === 'found') this.items.set(outcome.value);
    else this.trouble.set(outcomeText(outcome) ?? '');
  }

  protected choose(sides: SidePair<string>): void {
    this.link.set({ before: sides.before, after: sides.after });
  }

  protected swap(): void {
    const sides = this.sides();
    if (sides) this.link.set({ before: sides.after, after: sides.before });
  }

  /** The copied address names both sides, also those that were taken because it named none. */
  private async copyLink(): Promise<void> {
    const sides = this.sides();
    if (!sides) return;
    const address = new URL(this.document.location.href);
    address.searchParams.set('before', sides.before);
    address.searchParams.set('after', sides.after);
    try {
      await navigator.clipboard.writeText(address.href);
      this.told.set('Link copied.');
    } catch (error) {
      this.told.set(`The browser did not let the link be copied (${error instanceof Error ? error.message : String(error)}): ${address.href}`);
    }
  }
}

function sameQuestion(one: Question | null, other: Question | null): boolean {
  return one?.before === other?.before && one?.after === other?.after && one?.draftHash === other?.draftHash;
}

function shortened(text: string): string {
  return text.length > LONGEST_OPTION ? `${text.slice(0, LONGEST_OPTION - 1)}…` : text;
}
