import type { RevisionHeader } from '../../shared/contracts/projects';

/** A stored revision, as far as its header goes. */
export interface StoredRevision {
  readonly id: string;
  readonly panelId: string;
  readonly number: number;
  readonly hash: string;
  readonly parentId: string | null;
  readonly parentNumber: number | null;
  readonly restoredFromNumber: number | null;
  readonly authorId: string;
  readonly authorName: string;
  readonly message: string;
  readonly createdAt: Date;
}

export function revisionHeaderOf(row: StoredRevision): RevisionHeader {
  const { id, panelId, number, hash, parentId, parentNumber, restoredFromNumber, message } = row;
  const author = { id: row.authorId, name: row.authorName };
  return { id, panelId, number, hash, parentId, parentNumber, restoredFromNumber, author, message, createdAt: row.createdAt.toISOString() };
}
