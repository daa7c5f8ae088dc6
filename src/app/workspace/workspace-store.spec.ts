import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';
import type { CutRequest, PredictionRequest } from '../../../shared/contracts/predictions';
import type { PanelDetail, RevisionDetail, RevisionHeader } from '../../../shared/contracts/projects';
import type { DesignDocument } from '../../../shared/model/design-document';
import { replacedAt } from '../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { DraftClient } from '../api/draft-client';
import { LibraryClient } from '../api/library-client';
import { PredictionClient } from '../api/prediction-client';
import type { PredictionAnswer } from '../api/prediction-client';
import { DraftStore } from './draft-store';
import { SAMPLE_HEAD } from './sample-prediction';
import { WorkspaceStore } from './workspace-store';

const { cellCount: _count, ...head } = SAMPLE_HEAD;
const predicted: PredictionAnswer = { kind: 'predicted', block: { head, arrays: {} } };
const EDITION_ID = '6f9619ff-8b86-4d01-b42d-00cf4fc964aa';
const revision: RevisionHeader = {
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc964bb',
  panelId: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff',
  number: 3,
  hash: 'a'.repeat(64),
  parentId: null,
  parentNumber: null,
  restoredFromNumber: null,
  author: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Designer' },
  message: 'First cut',
  createdAt: '2026-12-01T14:02:31Z',
};
const panel: PanelDetail = {
  id: revision.panelId,
  project: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fe', name: 'Merrow Point sea-rescue link', invented: true },
  name: 'Panel A',
  design: STARTING_DESIGN,
  draftHash: 'b'.repeat(64),
  etag: '"v1"',
  changedAt: '2026-12-01T14:02:31Z',
  changedBy: revision.author,
  latestRevision: revision,
  draftIsRevision: true,
};
const aimed = (design: DesignDocument, thetaDeg: number): DesignDocument => replacedAt(design, '/requirement/beams/0/thetaDeg', thetaDeg);

function rig() {
  const requests: { request: PredictionRequest; preview: string; answer: Subject<PredictionAnswer> }[] = [];
  const editions: string[] = [];
  const drafts = {
    read: async () => ({ kind: 'found', panel }),
    save: async () => ({ kind: 'unreachable' }),
    readRevision: async () => ({ kind: 'found', revision: { ...revision, design: aimed(STARTING_DESIGN, 19.5) } as RevisionDetail }),
  };
  const predictions = {
    predict: (request: PredictionRequest, preview: string) => {
      const answer = new Subject<PredictionAnswer>();
      requests.push({ request, preview, answer });
      return answer;
    },
  };
  const library = { edition: async (id: string) => (editions.push(id), { kind: 'found', edition: { id } }) };
  TestBed.configureTestingModule({
    providers: [
      WorkspaceStore,
      DraftStore,
      { provide: DraftClient, useValue: drafts },
      { provide: PredictionClient, useValue: predictions },
      { provide: LibraryClient, useValue: library },
    ],
  });
  const store = TestBed.inject(WorkspaceStore);
  const settle = async (): Promise<void> => {
    TestBed.tick();
    await new Promise((resolve) => setTimeout(resolve, 0));
    TestBed.tick();
  };
  const answer = async (part: string, given: PredictionAnswer): Promise<void> => {
    const asked = requests.filter(({ preview }) => preview.startsWith(part)).at(-1);
    asked?.answer.next(given);
    asked?.answer.complete();
    await settle();
  };
  return { store, requests, editions, settle, answer };
}

describe('WorkspaceStore', () => {
  beforeEach(() => sessionStorage.clear());

  it('predicts the draft and its parent, under names that keep their queues apart', async () => {
    const { store, requests, settle, answer } = rig();
    await store.open(panel.id, null);
    await settle();
    await settle();
    expect(requests.map(({ preview, request }) => [preview, request.design.requirement.beams[0].thetaDeg])).toEqual([
      [`draft-${panel.id}`, 20],
      [`parent-${panel.id}`, 19.5],
    ]);
    await answer('draft', predicted);
    await answer('parent', predicted);
    expect(store.prediction()?.of).toBe(store.design());
    expect(store.parentPrediction()?.of.requirement.beams[0].thetaDeg).toBe(19.5);
    expect(store.stale()).toBe(false);
  });

  it('keeps the last good prediction with the mark of age while a design has none, and says why', async () => {
    const { store, settle, answer } = rig();
    await store.open(panel.id, null);
    await settle();
    await answer('draft', predicted);
    store.change('Steer beam', (design) => aimed(design, 30));
    await settle();
    expect(store.stale()).toBe(true);
    await answer('draft', { kind: 'failed', problem: { type: 'about:blank', title: 'Not valid', status: 422, detail: 'Too many cells' } });
    expect(store.prediction()?.of.requirement.beams[0].thetaDeg).toBe(20);
    expect(store.failure()?.detail).toBe('Too many cells');
    store.undo();
    await settle();
    expect(store.failure()).toBeNull();
    expect(store.stale()).toBe(false);
  });

  it('asks for the cuts and the map that a sheet wants', async () => {
    const { store, requests, settle, answer } = rig();
    await store.open(panel.id, null);
    store.requestUv(129);
    store.requestCuts([{ phiDeg: 45, thetaDeg: [-90, 90, 1] }]);
    await settle();
    await answer('draft', predicted);
    const asked = requests.filter(({ preview }) => preview.startsWith('draft')).at(-1);
    expect(asked?.request).toMatchObject({ uvSize: 129, include: ['cells', 'cuts', 'uv'] });
    expect(asked?.request.cuts?.at(-1)).toEqual({ phiDeg: 45, thetaDeg: [-90, 90, 1] });
  });

  it('asks once when a sheet names the same cuts again', async () => {
    const { store, requests, settle, answer } = rig();
    await store.open(panel.id, null);
    await settle();
    const cut = (): readonly CutRequest[] => [{ phiDeg: 30, thetaDeg: [-90, 90, 0.5] }];
    store.requestCuts(cut());
    await settle();
    await answer('draft', predicted);
    await answer('draft', predicted);
    const asked = requests.length;
    store.requestCuts(cut());
    await settle();
    expect(requests).toHaveLength(asked);
    store.requestCuts([]);
    await settle();
    expect(requests.length).toBeGreaterThan(asked);
  });

  it('fetches the edition that the design names, once', async () => {
    const { store, editions, settle } = rig();
    await store.open(panel.id, null);
    store.change('Choose edition', (design) => ({ ...design, cells: { kind: 'edition', editionId: EDITION_ID, rule: 'nearest-phase', excludedCells: [] } }));
    await settle();
    await settle();
    expect(store.edition()?.id).toBe(EDITION_ID);
    store.change('Choose rule', (design) => replacedAt(design, '/cells/rule', 'least-error'));
    await settle();
    expect(editions).toEqual([EDITION_ID]);
  });

  it('lets nobody change a panel who may only look at it', async () => {
    const { store, settle } = rig();
    await store.open(panel.id, 'Only designers change panels');
    await settle();
    store.change('Steer beam', (design) => aimed(design, 30));
    expect(store.canEdit()).toBe(false);
    expect(store.viewOnlyReason()).toBe('Only designers change panels');
    expect(store.design().requirement.beams[0].thetaDeg).toBe(20);
  });
});
