import type { FiguresSummary, RevisionListItem } from '../../../../shared/contracts/projects';
import type { VerdictWord } from '../../../../shared/model/figures';
import { numberText } from '../../ui/plots/plot-text';

export const HASH_LETTERS = 12;

/** One line of the list of revisions, as text. */
export interface RevisionRow {
  readonly id: string;
  readonly number: number;
  readonly message: string;
  readonly author: string;
  readonly time: string;
  readonly hash: string;
  readonly fullHash: string;
  readonly lineage: string;
  readonly cells: string;
  readonly gain: string;
  readonly requirement: string;
  readonly overall: VerdictWord;
  readonly parentId: string | null;
}

/** "2026-11-24 09:12", always UTC, as drawings are dated. */
export function utcText(iso: string): string {
  return iso.slice(0, 16).replace('T', ' ');
}

export function revisionRows(items: readonly RevisionListItem[]): readonly RevisionRow[] {
  return items.map((item) => ({
    id: item.id,
    number: item.number,
    message: item.message,
    author: item.author.name,
    time: utcText(item.createdAt),
    hash: item.hash.slice(0, HASH_LETTERS),
    fullHash: item.hash,
    lineage: lineageText(item),
    cells: item.summary ? numberText(item.summary.cellCount, 0) : '–',
    gain: item.summary && typeof item.summary.gainDbi === 'number' ? numberText(item.summary.gainDbi, 2) : '–',
    requirement: item.summary ? requirementText(countVerdicts(item.summary)) : item.summaryPending ? 'being computed' : 'cannot be predicted',
    overall: item.summary?.overall ?? 'not-evaluated',
    parentId: item.parentId,
  }));
}

function lineageText({ parentNumber, restoredFromNumber }: RevisionListItem): string {
  const parent = parentNumber === null ? 'first' : `child of ${parentNumber}`;
  return restoredFromNumber === null ? parent : `${parent}, content of ${restoredFromNumber}`;
}

export interface VerdictCount {
  readonly met: number;
  readonly short: number;
  readonly open: number;
}

function countVerdicts({ verdicts }: FiguresSummary): VerdictCount {
  const count = (word: VerdictWord): number => verdicts.filter(({ verdict }) => verdict === word).length;
  return { met: count('meets'), short: count('falls-short'), open: count('not-evaluated') };
}

/** "1 falls short, 1 open" where something is wrong or open, else how many are met. */
export function requirementText({ met, short, open }: VerdictCount): string {
  if (met + short + open === 0) return 'no limit set';
  const parts = [short > 0 ? `${short} ${short === 1 ? 'falls' : 'fall'} short` : '', met > 0 ? `${met} met` : '', open > 0 ? `${open} open` : ''];
  return parts.filter((part) => part !== '').join(', ');
}

export function requirementWord({ met, short, open }: VerdictCount): VerdictWord {
  return short > 0 ? 'falls-short' : open > 0 || met === 0 ? 'not-evaluated' : 'meets';
}
