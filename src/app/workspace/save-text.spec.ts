import { saveLine } from './save-text';

const at = Date.UTC(2026, 11, 1, 14, 2, 31);

describe('saveLine', () => {
  it('says when the draft was saved, with the zone', () => {
    expect(saveLine({ kind: 'saved', at }, 0)).toEqual({ text: 'Saved 14:02:31 UTC', tone: 'calm' });
  });

  it('says where the work is while the server is away', () => {
    expect(saveLine({ kind: 'offline', since: at }, 0)).toEqual({ text: 'Offline since 14:02:31 UTC, kept in this browser', tone: 'warn' });
  });

  it('does not call everything saved while entries stand refused in their fields', () => {
    expect(saveLine({ kind: 'saved', at }, 2)).toEqual({ text: 'Saved 14:02:31 UTC, 2 entries not taken', tone: 'warn' });
  });

  it('names the fault that keeps a draft from being saved', () => {
    const faults = [{ pointer: '/panel', detail: 'the panel would have 4000000 cells' }];
    expect(saveLine({ kind: 'not-valid', detail: '1 value is not valid.', faults }, 1).text).toBe('Not saved: the panel would have 4000000 cells');
  });

  it('asks for a decision in a conflict', () => {
    expect(saveLine({ kind: 'conflict' }, 0).tone).toBe('fail');
  });
});
