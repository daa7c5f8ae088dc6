import { Injectable, computed, effect, inject, signal, untracked } from '@angular/core';
import type { RunKind } from '../../../../shared/contracts/runs';
import { queryLink } from '../query-link';
import { WORKSPACE_STATE } from '../workspace-state';
import { RunDesk } from './run-desk';
import { sourceText } from './run-text';

const DRAFT = 'draft';

/**
 * What the sheets of runs share beside the desk: what is to be computed, how the shown result is named, and its place in
 * the address. A sheet provides it for itself, together with the desk.
 */
@Injectable()
export class RunSheet {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly desk = inject(RunDesk);
  private readonly link = queryLink<{ readonly run: string | null }>(
    (query) => ({ run: query.get('run') }),
    ({ run }) => ({ run }),
  );
  /** "draft" or the id of the latest revision. */
  readonly subject = signal(DRAFT);
  readonly subjects = computed(() => {
    const latest = this.state.panel()?.latestRevision;
    return [{ id: DRAFT, label: 'Draft' }, ...(latest ? [{ id: latest.id, label: `Revision ${latest.number}` }] : [])];
  });
  /** The part of a request that names what to compute. */
  readonly source = computed((): { readonly revisionId?: string } => (this.subject() === DRAFT ? {} : { revisionId: this.subject() }));
  readonly draftHash = computed(() => this.state.panel()?.draftHash ?? null);
  readonly staleText = computed(() => {
    const shown = this.desk.shown();
    return shown !== null && this.desk.stale() ? `Inputs changed: this is ${sourceText(shown)}, not the draft as it stands.` : null;
  });
  /** For the plots of the shown result. */
  readonly heading = computed(() => {
    const [panel, shown] = [this.state.panel(), this.desk.shown()];
    return {
      subject: panel ? `${panel.project.name}, ${panel.name}` : '',
      state: shown ? (shown.source.kind === 'revision' ? `Revision ${shown.source.number}` : `Draft, save ${shown.source.version}`) : '',
      hash: shown?.contentHash ?? '',
      date: (shown?.finishedAt ?? new Date().toISOString()).slice(0, 10),
    };
  });

  /** Reads the runs of a kind as soon as the panel is known, and keeps the shown one in the address. Call in a constructor. */
  follow(kind: RunKind): void {
    const panelId = computed(() => this.state.panel()?.id ?? null);
    effect(() => {
      const id = panelId();
      if (id !== null) untracked(() => void this.desk.open(id, kind, this.link().run));
    });
    effect(() => {
      const shown = this.desk.shown();
      if (shown?.answer.kind === kind) untracked(() => this.link.set({ run: shown.id }));
    });
  }
}
