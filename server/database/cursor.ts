import * as z from 'zod';
import { InvalidInput } from '../http/problems';

/** Where a page of a list ended: the sort value of its last row and, for ties, its id. */
export interface Cursor {
  readonly sort: string;
  readonly id: string;
}

const cursorShape = z.tuple([z.string().max(200), z.uuid()]);

export const writeCursor = (cursor: Cursor): string => Buffer.from(JSON.stringify([cursor.sort, cursor.id])).toString('base64url');

/** @throws InvalidInput for text that is no cursor of ours */
export function readCursor(after: string | undefined): Cursor | null {
  if (after === undefined) return null;
  try {
    const [sort, id] = cursorShape.parse(JSON.parse(Buffer.from(after, 'base64url').toString('utf8')));
    return { sort, id };
  } catch {
    throw new InvalidInput([{ pointer: 'after', detail: 'is not the "next" of a page of this list' }]);
  }
}

/**
 * Cuts the rows of a keyset query into a page. Ask the database for `limit + 1` rows sorted by (sort, id).
 * Rows inserted meanwhile are neither skipped nor repeated, because a page starts after a row and not at a count.
 */
export function cutPage<Row, Item>(
  rows: readonly Row[],
  limit: number,
  { cursorOf, itemOf }: { cursorOf: (row: Row) => Cursor; itemOf: (row: Row) => Item },
): { items: Item[]; next: string | null } {
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  return {
    items: shown.map(itemOf),
    next: rows.length > limit && last !== undefined ? writeCursor(cursorOf(last)) : null,
  };
}
