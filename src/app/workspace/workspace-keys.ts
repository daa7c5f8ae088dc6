import type { Shortcut } from '../ui/shortcut-list';
import { SHEETS } from './sheets';
import type { SheetId } from './sheets';

export type WorkspaceDeed = { readonly kind: 'undo' } | { readonly kind: 'redo' } | { readonly kind: 'close' } | { readonly kind: 'sheet'; readonly sheet: SheetId };

export interface PressedKey {
  readonly key: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly shiftKey: boolean;
  readonly altKey: boolean;
}

/** What a key does in the workspace outside of fields, or null. */
export function workspaceKey({ key, ctrlKey, metaKey, shiftKey, altKey }: PressedKey): WorkspaceDeed | null {
  if (altKey) return null;
  if (ctrlKey || metaKey) {
    if (key.toLowerCase() === 'z') return { kind: shiftKey ? 'redo' : 'undo' };
    return ctrlKey && key.toLowerCase() === 'y' ? { kind: 'redo' } : null;
  }
  if (key === 'Escape') return { kind: 'close' };
  const sheet = /^[1-9]$/.test(key) ? SHEETS[Number(key) - 1] : undefined;
  return sheet ? { kind: 'sheet', sheet: sheet.id } : null;
}

export const WORKSPACE_SHORTCUTS: readonly Shortcut[] = [
  { keys: `1 to ${SHEETS.length}`, does: 'opens the sheet of that number' },
  { keys: 'Ctrl Z', does: 'undoes the last step' },
  { keys: 'Ctrl Shift Z', does: 'makes it again' },
  { keys: 'Ctrl K', does: 'find or run' },
  { keys: 'Enter', does: 'takes what was typed into a field' },
  { keys: '↑ ↓', does: 'steps the number in a field, with Shift ten steps' },
  { keys: 'Escape', does: 'gives up an entry, closes what is open' },
  { keys: '?', does: 'this list' },
];
