import type { PanelDetail } from '../../../shared/contracts/projects';
import type { TitleBlockEntry } from '../ui/title-block';
import type { SaveProgress } from './save-progress';
import type { SheetHead } from './sheet-header';
import { SHEETS } from './sheets';

const HASH_LETTERS = 12;

/** The rows of the title block for a sheet of a draft. */
export function titleRows(panel: PanelDetail, head: SheetHead, progress: SaveProgress): readonly (readonly TitleBlockEntry[])[] {
  const revision = panel.latestRevision;
  const isRevision = panel.draftIsRevision && (progress.kind === 'saved' || progress.kind === 'view-only');
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
