import { replacedAt } from '../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { dropDraftCopy, keepDraftCopy, readDraftCopy } from './draft-copy';

const copy = { design: replacedAt(STARTING_DESIGN, '/requirement/minGainDbi', 31), base: STARTING_DESIGN, etag: '"7"' };

describe('the local copy of a draft', () => {
  beforeEach(() => sessionStorage.clear());

  it('comes back as it was kept, for its own panel only', () => {
    expect(keepDraftCopy(sessionStorage, 'a', copy)).toBe(true);
    expect(readDraftCopy(sessionStorage, 'a')).toEqual(copy);
    expect(readDraftCopy(sessionStorage, 'b')).toBeNull();
  });

  it('is gone once dropped', () => {
    keepDraftCopy(sessionStorage, 'a', copy);
    dropDraftCopy(sessionStorage, 'a');
    expect(readDraftCopy(sessionStorage, 'a')).toBeNull();
  });

  it.each(['{"design":', '"text"', '{"design":{"schemaVersion":99},"etag":"1"}'])('is not taken for a design when it reads %s', (text) => {
    sessionStorage.setItem('slantwise.draft.a', text);
    expect(readDraftCopy(sessionStorage, 'a')).toBeNull();
  });

  it('says so when the browser has no room', () => {
    const full = { setItem: () => { throw new DOMException('full', 'QuotaExceededError'); } } as unknown as Storage;
    expect(keepDraftCopy(full, 'a', copy)).toBe(false);
  });
});
