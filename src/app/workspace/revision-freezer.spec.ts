import { TestBed } from '@angular/core/testing';
import { signal } from '@angular/core';
import type { RevisionOutcome } from '../api/draft-client';
import { DraftClient } from '../api/draft-client';
import { DraftStore } from './draft-store';
import { RevisionFreezer } from './revision-freezer';

const problem = (status: number, detail: string): RevisionOutcome => ({ kind: 'refused', problem: { type: 'about:blank', title: 'Refused', status, detail } });
const found = { kind: 'found', revision: { id: 'r4', number: 4 } } as RevisionOutcome;

function rig(outcome: RevisionOutcome, saved = true) {
  const calls: object[] = [];
  const accepted: unknown[] = [];
  const drafts = { panel: signal({ id: 'p', etag: '"v7"' }), flush: async () => saved, acceptRevision: (...given: unknown[]) => accepted.push(given) };
  const client = { freeze: async (request: object) => (calls.push(request), outcome) };
  TestBed.configureTestingModule({ providers: [RevisionFreezer, { provide: DraftStore, useValue: drafts }, { provide: DraftClient, useValue: client }] });
  return { freezer: TestBed.inject(RevisionFreezer), calls, accepted };
}

describe('RevisionFreezer', () => {
  it('freezes the saved state under its ETag and one key', async () => {
    const { freezer, calls, accepted } = rig(found);
    expect(await freezer.freeze('Fourth', 'key-1')).toBeNull();
    expect(calls).toEqual([{ panelId: 'p', message: 'Fourth', etag: '"v7"', idempotencyKey: 'key-1' }]);
    expect(accepted).toEqual([[{ id: 'r4', number: 4 }, '"v7"']]);
  });

  it('freezes nothing while the draft is not saved', async () => {
    const { freezer, calls } = rig(found, false);
    expect(await freezer.freeze('Fourth', 'key-1')).toBe('The draft could not be saved first; see what the bar says');
    expect(calls).toEqual([]);
  });

  it.each<[RevisionOutcome, string]>([
    [problem(412, 'changed'), 'Somebody else changed the draft meanwhile; read the panel again before freezing'],
    [problem(403, 'Only designers freeze revisions.'), 'Only designers freeze revisions'],
    [{ kind: 'unreachable' }, 'The server is out of reach; nothing was frozen, try again'],
  ])('says why nothing was frozen: %o', async (outcome, reason) => {
    const { freezer, accepted } = rig(outcome);
    expect(await freezer.freeze('Fourth', 'key-1')).toBe(reason);
    expect(accepted).toEqual([]);
  });
});
