import type { PanelDetail } from '../../../shared/contracts/projects';
import type { PlotHeading } from '../ui/plots/plot-export';
import type { SaveProgress } from './save-progress';

/** The server holds what the screen shows. */
export function isSettled({ kind }: SaveProgress): boolean {
  return kind === 'saved' || kind === 'view-only';
}

/** What an exported plot of the draft says of itself. A draft that is not saved yet has no hash of its own. */
export function draftHeading(title: string, panel: PanelDetail | null, saved: boolean, now: Date): PlotHeading {
  const date = now.toISOString().slice(0, 10);
  if (!panel) return { title, subject: '', state: 'Draft', hash: '', date };
  const { latestRevision: latest, draftIsRevision } = panel;
  const state = !latest ? 'Draft' : draftIsRevision && saved ? `Revision ${latest.number}` : `Draft after revision ${latest.number}`;
  return {
    title,
    subject: `${panel.project.name}, ${panel.name}`,
    state: saved ? state : `${state}, latest change not saved yet`,
    hash: saved ? panel.draftHash : '',
    date,
  };
}
