import fc from 'fast-check';
import { cutPage, readCursor, writeCursor } from './cursor';

const id = (index: number): string => `00000000-0000-4000-8000-${String(index).padStart(12, '0')}`;

describe('cursors', () => {
  it('read what they write', () => {
    fc.assert(fc.property(fc.string({ maxLength: 200 }), fc.uuid(), (sort, anyId) => expect(readCursor(writeCursor({ sort, id: anyId }))).toEqual({ sort, id: anyId })));
  });

  it.each(['x', '', 'e30', Buffer.from('["a"]').toString('base64url'), Buffer.from('["a","b"]').toString('base64url')])('refuse %j, which is none of ours', (after) => {
    expect(() => readCursor(after)).toThrow(expect.objectContaining({ faults: [{ pointer: 'after', detail: 'is not the "next" of a page of this list' }] }) as Error);
  });

  it('are absent on the first page', () => {
    expect(readCursor(undefined)).toBeNull();
  });
});

describe('cutPage', () => {
  const rows = [1, 2, 3].map((index) => ({ name: `row ${index}`, id: id(index) }));
  const parts = { cursorOf: (row: (typeof rows)[0]) => ({ sort: row.name, id: row.id }), itemOf: ({ name }: (typeof rows)[0]) => name };

  it('shows the limit and points behind the last row shown when there is more', () => {
    const page = cutPage(rows, 2, parts);
    expect(page.items).toEqual(['row 1', 'row 2']);
    expect(readCursor(page.next ?? '')).toEqual({ sort: 'row 2', id: id(2) });
  });

  it('ends when nothing is left', () => {
    expect(cutPage(rows, 3, parts)).toEqual({ items: ['row 1', 'row 2', 'row 3'], next: null });
    expect(cutPage([], 3, parts)).toEqual({ items: [], next: null });
  });
});
