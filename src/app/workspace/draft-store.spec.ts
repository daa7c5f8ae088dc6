import { TestBed } from '@angular/core/testing';
import type { PanelDetail } from '../../../shared/contracts/projects';
import type { DesignDocument } from '../../../shared/model/design-document';
import { replacedAt } from '../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { DraftClient } from '../api/draft-client';
import type { SaveOutcome } from '../api/draft-client';
import { keepDraftCopy, readDraftCopy } from './draft-copy';
import { DraftStore } from './draft-store';

const PANEL_ID = '6f9619ff-8b86-4d01-b42d-00cf4fc964ff';
const panelOf = (design: DesignDocument, etag: string): PanelDetail => ({
  id: PANEL_ID,
  project: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fe', name: 'Merrow Point sea-rescue link', invented: true },
  name: 'Panel A',
  design,
  draftHash: 'b'.repeat(64),
  etag,
  changedAt: '2026-12-01T14:02:31Z',
  changedBy: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Second designer' },
  latestRevision: null,
  draftIsRevision: true,
});
const withGain = (design: DesignDocument, gain: number): DesignDocument => replacedAt(design, '/requirement/minGainDbi', gain);
const aimed = (design: DesignDocument, thetaDeg: number): DesignDocument => replacedAt(design, '/requirement/beams/0/thetaDeg', thetaDeg);

/** A draft on a server, guarded by its ETag like the real one. */
class ServerDraft {
  version = 1;
  reachable = true;
  constructor(public design: DesignDocument) {}

  get panel(): PanelDetail {
    return panelOf(this.design, `"v${this.version}"`);
  }

  async save(_panelId: string, design: DesignDocument, etag: string): Promise<SaveOutcome> {
    if (!this.reachable) return { kind: 'unreachable' };
    if (etag !== `"v${this.version}"`) return { kind: 'stale', current: this.panel };
    this.put(design);
    return { kind: 'saved', saved: { etag: `"v${this.version}"`, draftHash: 'c'.repeat(64), changedAt: '2026-12-01T14:03:00Z', draftIsRevision: false } };
  }

  put(design: DesignDocument): void {
    this.design = design;
    this.version += 1;
  }
}

describe('DraftStore', () => {
  let server: ServerDraft;
  let store: DraftStore;
  beforeEach(() => {
    jest.useFakeTimers({ now: 0 });
    sessionStorage.clear();
    server = new ServerDraft(STARTING_DESIGN);
    TestBed.configureTestingModule({ providers: [DraftStore, { provide: DraftClient, useValue: server }] });
    store = TestBed.inject(DraftStore);
  });
  afterEach(() => jest.useRealTimers());

  const settle = () => jest.advanceTimersByTimeAsync(2000);

  it('saves a change within two seconds and then keeps no copy', async () => {
    store.open(server.panel, true);
    store.change('Set least gain', (design) => withGain(design, 31));
    expect(readDraftCopy(sessionStorage, PANEL_ID)?.design.requirement.minGainDbi).toBe(31);
    await settle();
    expect(server.design.requirement.minGainDbi).toBe(31);
    expect(store.saveState().kind).toBe('saved');
    expect(store.panel()).toMatchObject({ etag: '"v2"', draftIsRevision: false });
    expect(readDraftCopy(sessionStorage, PANEL_ID)).toBeNull();
  });

  it('saves what was undone and names the steps', async () => {
    store.open(server.panel, true);
    store.change('Set least gain', (design) => withGain(design, 31));
    expect(store.undoName()).toBe('Set least gain');
    store.undo();
    expect([store.undoName(), store.redoName()]).toEqual([null, 'Set least gain']);
    await settle();
    expect(server.design.requirement.minGainDbi).toBe(34);
  });

  it('keeps what was drawn while the server was away and sends it afterwards', async () => {
    store.open(server.panel, true);
    server.reachable = false;
    store.change('Steer beam', (design) => aimed(design, 33));
    await settle();
    expect(store.saveState().kind).toBe('offline');
    server.reachable = true;
    await jest.advanceTimersByTimeAsync(15_000);
    expect(server.design.requirement.beams[0].thetaDeg).toBe(33);
    expect(store.saveState().kind).toBe('saved');
  });

  it('shows both versions of a field that two people changed, and joins them as chosen', async () => {
    store.open(server.panel, true);
    server.put(withGain(aimed(STARTING_DESIGN, 40), 30));
    store.change('Steer beam', (design) => aimed(design, 25));
    await settle();
    expect(store.saveState().kind).toBe('conflict');
    expect(store.conflict()?.fields.map(({ label, mine, theirs, changedBy }) => [label, mine, theirs, changedBy])).toEqual([
      ['Beam 1 θ', 25, 40, 'both'],
      ['Least gain', 34, 30, 'them'],
    ]);
    store.resolveConflict({ '/requirement/beams/0/thetaDeg': 'mine' });
    await settle();
    expect(server.design.requirement).toMatchObject({ beams: [{ thetaDeg: 25, phiDeg: 0 }], minGainDbi: 30 });
    expect([store.saveState().kind, store.conflict(), store.undoName()]).toEqual(['saved', null, 'Join changes of Second designer']);
  });

  it('brings work of this tab back that never reached the server, as a step that can be undone', async () => {
    keepDraftCopy(sessionStorage, PANEL_ID, { design: aimed(STARTING_DESIGN, 44), base: STARTING_DESIGN, etag: '"v1"' });
    store.open(server.panel, true);
    expect(store.design().requirement.beams[0].thetaDeg).toBe(44);
    expect(store.undoName()).toBe('Restore unsaved work');
    await settle();
    expect(server.design.requirement.beams[0].thetaDeg).toBe(44);
  });

  it('asks about such work when the draft went on meanwhile', async () => {
    keepDraftCopy(sessionStorage, PANEL_ID, { design: aimed(STARTING_DESIGN, 44), base: STARTING_DESIGN, etag: '"v1"' });
    server.put(withGain(STARTING_DESIGN, 30));
    store.open(server.panel, true);
    expect(store.conflict()?.fields.map(({ changedBy }) => changedBy)).toEqual(['me', 'them']);
    await settle();
    expect(server.version).toBe(2);
    store.resolveConflict({});
    await settle();
    expect(server.design.requirement).toMatchObject({ beams: [{ thetaDeg: 44, phiDeg: 0 }], minGainDbi: 30 });
  });

  it('changes nothing for somebody who may only look', async () => {
    store.open(server.panel, false);
    store.change('Steer beam', (design) => aimed(design, 25));
    store.undo();
    await settle();
    expect(store.design()).toBe(STARTING_DESIGN);
    expect(store.saveState()).toEqual({ kind: 'view-only' });
    expect(server.version).toBe(1);
  });
});
