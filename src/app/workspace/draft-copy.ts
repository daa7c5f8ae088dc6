import { designDocument } from '../../../shared/model/design-document';
import type { DesignDocument } from '../../../shared/model/design-document';

/** Work that has not reached the server, kept in this browser tab. It holds the design and nothing else of anybody. */
export interface DraftCopy {
  readonly design: DesignDocument;
  /** The state of the server that the work began from. */
  readonly base: DesignDocument;
  readonly etag: string;
}

const keyOf = (panelId: string): string => `slantwise.draft.${panelId}`;

/** Keeps the copy. Returns false when the browser has no room or forbids it; the draft then lives in memory alone. */
export function keepDraftCopy(storage: Storage, panelId: string, copy: DraftCopy): boolean {
  try {
    storage.setItem(keyOf(panelId), JSON.stringify(copy));
    return true;
  } catch (error) {
    if (error instanceof DOMException) return false;
    throw error;
  }
}

export function dropDraftCopy(storage: Storage, panelId: string): void {
  storage.removeItem(keyOf(panelId));
}

/** The copy kept for a panel; null when there is none or when it is not readable as a design any more. */
export function readDraftCopy(storage: Storage, panelId: string): DraftCopy | null {
  const text = storage.getItem(keyOf(panelId));
  if (text === null) return null;
  const kept = parsedObject(text);
  const design = designDocument.safeParse(kept['design']);
  const base = designDocument.safeParse(kept['base']);
  const etag = kept['etag'];
  return design.success && base.success && typeof etag === 'string' ? { design: design.data, base: base.data, etag } : null;
}

function parsedObject(text: string): Readonly<Record<string, unknown>> {
  try {
    const value: unknown = JSON.parse(text);
    return typeof value === 'object' && value !== null ? (value as Readonly<Record<string, unknown>>) : {};
  } catch (error) {
    if (error instanceof SyntaxError) return {};
    throw error;
  }
}
