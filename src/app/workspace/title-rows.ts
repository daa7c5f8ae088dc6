import type { PanelDetail } from '../../../shared/contracts/projects';
import type { TitleBlockEntry } from '../ui/title-block';
import type { SaveProgress } from './save-progress';
import type { SheetHead } from './sheet-header';
import { SHEETS } from './sheets';

const HASH_LETTERS = 12;

/** True when what the screen shows is the latest revision, and the server knows of nothing newer. */
export function standsAsRevision(panel: PanelDetail, progress: SaveProgress): boolean {
  return panel.draftIsRevision && panel.latestRevision !== null && (progress.kind === 'saved' || progress.kind === 'view-only');
}

/** "Revision 4", "Draft after 4" or "Draft", for places as narrow as the foot of a phone. */
export function standingText(panel: PanelDetail, progress: SaveProgress): string {
  const number = panel.latestRevision?.number;
  if (number === undefined) return 'Draft';
  return standsAsRevision(panel, progress) ? `Revision ${number}` : `Draft after ${number}`;
}

/** The rows of the title block for a sheet of a draft. */
export function titleRows(panel: PanelDetail, head: SheetHead, progress: SaveProgress): readonly (readonly TitleBlockEntry[])[] {
  const revision = panel.latestRevision;
  const isRevision = standsAsRevision(panel, progress);
  const settled = progress.kind === 'saved' || progress.kind === 'view-only';
  return [
    [
      { label: 'Project', value: panel.project.name },
      { label: 'Panel', value: panel.name },
    ],
    [
      { label: 'Drawn by', value: isRevision && revision ? revision.author.name : panel.changedBy.name },
      { label: 'Checked by', value: '—' },
      { label: 'State', value: isRevision ? 'Frozen' : 'Draft' },
      { label: 'Date', value: panel.changedAt.slice(0, 10), figure: true },
    ],
    [
      { label: 'Revision', value: isRevision && revision ? `Revision ${revision.number}` : revision ? `Draft after revision ${revision.number}` : 'Draft, no revision yet' },
      { label: 'Hash', value: settled ? panel.draftHash.slice(0, HASH_LETTERS) : 'not saved yet', figure: settled },
      { label: 'Scale', value: head.scale ?? 'none', figure: true },
      { label: 'Sheet', value: `${head.number} of ${SHEETS.length}`, figure: true },
    ],
  ];
}
