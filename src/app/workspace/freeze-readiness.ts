import type { PanelDetail } from '../../../shared/contracts/projects';
import type { SaveProgress } from './save-progress';

export interface FreezeFacts {
  readonly panel: PanelDetail | null;
  readonly viewOnlyReason: string | null;
  readonly saveState: SaveProgress;
  readonly pendingCount: number;
  /** Why the design on the screen cannot be predicted. */
  readonly failureDetail: string | null;
}

/** Why the draft cannot be frozen as a revision now, or null when it can. */
export function freezeHindrance({ panel, viewOnlyReason, saveState, pendingCount, failureDetail }: FreezeFacts): string | null {
  if (!panel) return 'The panel is not open yet';
  if (viewOnlyReason) return viewOnlyReason;
  if (saveState.kind === 'conflict') return 'Decide first between your changes and those of somebody else';
  if (saveState.kind === 'offline') return 'The server is out of reach';
  if (saveState.kind === 'not-valid') return 'The draft is not valid as it stands';
  if (pendingCount > 0) return `Put right or undo the ${pendingCount === 1 ? 'entry' : `${pendingCount} entries`} that could not be taken`;
  if (failureDetail) return `The design cannot be predicted: ${failureDetail}`;
  if (panel.draftIsRevision && saveState.kind === 'saved') return `The draft equals revision ${panel.latestRevision?.number ?? ''}; nothing to freeze`.replace('  ', ' ');
  return null;
}

export function nextRevisionNumber(panel: PanelDetail | null): number {
  return (panel?.latestRevision?.number ?? 0) + 1;
}
