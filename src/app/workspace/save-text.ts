import type { SaveProgress } from './save-progress';

export interface SaveLine {
  readonly text: string;
  /** Whether the text asks for something to be done. */
  readonly tone: 'calm' | 'warn' | 'fail';
}

/** What the bar says of the draft's way to the server. */
export function saveLine(progress: SaveProgress, pendingCount: number): SaveLine {
  const line = progressLine(progress);
  if (pendingCount === 0 || line.tone === 'fail') return line;
  const entries = pendingCount === 1 ? '1 entry not taken' : `${pendingCount} entries not taken`;
  return { text: `${line.text}, ${entries}`, tone: 'warn' };
}

function progressLine(progress: SaveProgress): SaveLine {
  switch (progress.kind) {
    case 'saved':
      return { text: `Saved ${clockUtc(progress.at)}`, tone: 'calm' };
    case 'saving':
      return { text: 'Saving…', tone: 'calm' };
    case 'offline':
      return { text: `Offline since ${clockUtc(progress.since)}, kept in this browser`, tone: 'warn' };
    case 'conflict':
      return { text: 'Changed by somebody else: decide field by field', tone: 'fail' };
    case 'not-valid':
      return { text: `Not saved: ${progress.faults[0]?.detail ?? progress.detail}`, tone: 'fail' };
    case 'view-only':
      return { text: 'View only', tone: 'calm' };
  }
}

export function clockUtc(at: number): string {
  return `${new Date(at).toISOString().slice(11, 19)} UTC`;
}
