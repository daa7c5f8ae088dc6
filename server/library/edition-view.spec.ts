import fc from 'fast-check';
import { exampleEdition } from '../../shared/antenna/example-edition';
import { editionHeaderOf, familySummaryOf, inReadingOrder, peopleOf } from './edition-view';
import type { StoredEdition, StoredFamily } from './stored-edition';

const { description, cells } = exampleEdition();
const edition = (change: Partial<StoredEdition> = {}): StoredEdition => ({
  id: 'edition', familyId: 'family', number: null, hash: 'a'.repeat(64), description, cells: [...cells], mapping: {}, messages: [],
  quality: { verdict: 'pass', family: [], cells: [] }, verdict: 'pass', cellCount: 24, fileCount: 3, fromGHz: 9, toGHz: 11, thetasDeg: [0], phisDeg: [0],
  note: 'as measured', acceptedBy: 'ada', acceptedAt: new Date('2026-01-02T03:04:05Z'), publishNote: null, publishedBy: null, publishedAt: null, ...change,
}) as StoredEdition;
const published = (number: number): StoredEdition => edition({ id: `edition-${number}`, number, publishNote: 'for use', publishedBy: 'bea', publishedAt: new Date('2026-02-03T04:05:06Z') });

describe('what is shown of an edition', () => {
  it('names who accepted it and says that it is not published', () => {
    expect(editionHeaderOf(edition(), 'Rings', new Map([['ada', 'Ada']]))).toMatchObject({
      familyName: 'Rings', number: null, state: 'accepted', note: 'as measured', acceptedBy: { id: 'ada', name: 'Ada' }, acceptedAt: '2026-01-02T03:04:05.000Z', publishedBy: null, publishedAt: null,
    });
  });

  it('gives a published one its number, the note of its publication and both people; one who left is unknown', () => {
    expect(editionHeaderOf(published(2), 'Rings', new Map([['ada', 'Ada']]))).toMatchObject({ number: 2, state: 'published', note: 'for use', publishedBy: { id: 'bea', name: 'unknown' }, publishedAt: '2026-02-03T04:05:06.000Z' });
    expect([peopleOf(edition()), peopleOf(published(1))]).toEqual([['ada'], ['ada', 'bea']]);
  });

  it('lists published ones newest first, then the accepted, newest first, whatever the order they come in', () => {
    const late = edition({ id: 'late', acceptedAt: new Date('2026-05-01T00:00:00Z') });
    const wanted = [published(3), published(2), published(1), late, edition()];
    fc.assert(
      fc.property(fc.shuffledSubarray(wanted, { minLength: wanted.length }), (shuffled) => {
        expect(inReadingOrder(shuffled).map(({ id }) => id)).toEqual(wanted.map(({ id }) => id));
      }),
    );
  });

  it('describes a family by its newest published edition', () => {
    const newer = { ...published(2), description: { ...description, periodXMm: 7 } };
    const family = { id: 'family', name: 'Rings' } as StoredFamily;
    expect(familySummaryOf(family, [edition(), published(1), newer], { names: new Map(), useCount: 4 })).toMatchObject({ name: 'Rings', periodXMm: 7, useCount: 4, editions: [{ number: 2 }, { number: 1 }, { number: null }] });
    expect(() => familySummaryOf(family, [], { names: new Map(), useCount: 0 })).toThrow('the family family has no edition');
  });
});
