import type { DraftSaved, PanelDetail } from '../../../shared/contracts/projects';
import type { DesignDocument } from '../../../shared/model/design-document';
import { replacedAt } from '../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import type { SaveOutcome } from '../api/draft-client';
import { DraftAutosave, LONGEST_WAIT_MS, SAVE_PAUSE_MS } from './draft-autosave';
import type { SaveProgress } from './save-progress';

const aimed = (thetaDeg: number): DesignDocument => replacedAt(STARTING_DESIGN, '/requirement/beams/0/thetaDeg', thetaDeg);
const savedAs = (etag: string): SaveOutcome => ({
  kind: 'saved',
  saved: { etag, draftHash: 'a'.repeat(64), changedAt: '2026-12-01T14:02:31Z', draftIsRevision: false },
});
const panelOf = (design: DesignDocument, etag: string): PanelDetail => ({
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff',
  project: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fe', name: 'Merrow Point sea-rescue link', invented: true },
  name: 'Panel A',
  design,
  draftHash: 'b'.repeat(64),
  etag,
  changedAt: '2026-12-01T14:02:31Z',
  changedBy: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Second designer' },
  latestRevision: null,
  draftIsRevision: false,
});

interface Sent {
  readonly theta: number;
  readonly etag: string;
  answer(outcome: SaveOutcome): Promise<void>;
}

/** A server whose answers the test gives one by one. */
function rig() {
  const sent: Sent[] = [];
  const progress: SaveProgress[] = [];
  const accepted: DraftSaved[] = [];
  const conflicts: PanelDetail[] = [];
  const autosave = new DraftAutosave(
    {
      send: (design, etag) =>
        new Promise((resolve) => {
          const theta = design.requirement.beams[0].thetaDeg;
          sent.push({ theta, etag, answer: async (outcome) => (resolve(outcome), await jest.advanceTimersByTimeAsync(0)) });
        }),
      showProgress: (state) => progress.push(state),
      acceptSaved: (saved) => accepted.push(saved),
      meetConflict: (current) => conflicts.push(current),
      now: () => Date.now(),
    },
    '"1"',
  );
  return { autosave, sent, progress, accepted, conflicts };
}

describe('DraftAutosave', () => {
  beforeEach(() => jest.useFakeTimers({ now: 0 }));
  afterEach(() => jest.useRealTimers());

  it('sends the last of several quick changes once, after a pause', async () => {
    const { autosave, sent, progress } = rig();
    autosave.queue(aimed(21));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS - 1);
    autosave.queue(aimed(22));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS - 1);
    expect(sent).toEqual([]);
    await jest.advanceTimersByTimeAsync(1);
    expect(sent.map(({ theta, etag }) => [theta, etag])).toEqual([[22, '"1"']]);
    await sent[0].answer(savedAs('"2"'));
    expect(progress.at(-1)).toEqual({ kind: 'saved', at: 2 * SAVE_PAUSE_MS - 1 });
    expect(autosave.hasUnsaved).toBe(false);
  });

  it('leaves no change of an endless drag unsent for longer than the longest wait', async () => {
    const { autosave, sent } = rig();
    for (let i = 0; i < 20; i += 1) {
      autosave.queue(aimed(20 + i));
      await jest.advanceTimersByTimeAsync(100);
    }
    // The state of 1.3 s goes out at 1.4 s, although a change came every 0.1 s.
    expect(sent[0].theta).toBe(20 + LONGEST_WAIT_MS / 100 - 1);
  });

  it('keeps requests in order: the next one waits for the ETag of the one before', async () => {
    const { autosave, sent, progress } = rig();
    autosave.queue(aimed(21));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    autosave.queue(aimed(22));
    await jest.advanceTimersByTimeAsync(5000);
    expect(sent).toHaveLength(1);
    await sent[0].answer(savedAs('"2"'));
    expect(progress.at(-1)).toEqual({ kind: 'saving' });
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    expect(sent.map(({ theta, etag }) => [theta, etag])).toEqual([
      [21, '"1"'],
      [22, '"2"'],
    ]);
  });

  it('keeps work while the server is out of reach and sends the newest state when it is back', async () => {
    const { autosave, sent, progress } = rig();
    autosave.queue(aimed(21));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    await sent[0].answer({ kind: 'unreachable' });
    expect(progress.at(-1)).toEqual({ kind: 'offline', since: SAVE_PAUSE_MS });
    autosave.queue(aimed(23));
    expect(progress.at(-1)?.kind).toBe('offline');
    void autosave.flush();
    await jest.advanceTimersByTimeAsync(0);
    expect(sent.at(-1)).toMatchObject({ theta: 23, etag: '"1"' });
    await sent[1].answer(savedAs('"2"'));
    expect(progress.at(-1)?.kind).toBe('saved');
  });

  it('tries again by itself, at growing distances', async () => {
    const { autosave, sent } = rig();
    autosave.queue(aimed(21));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    await sent[0].answer({ kind: 'unreachable' });
    await jest.advanceTimersByTimeAsync(1000);
    expect(sent).toHaveLength(2);
    await sent[1].answer({ kind: 'unreachable' });
    await jest.advanceTimersByTimeAsync(1999);
    expect(sent).toHaveLength(2);
    await jest.advanceTimersByTimeAsync(1);
    expect(sent).toHaveLength(3);
  });

  it('stops at a conflict, keeps the own design, and goes on from the state of the others', async () => {
    const { autosave, sent, progress, conflicts } = rig();
    autosave.queue(aimed(21));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    await sent[0].answer({ kind: 'stale', current: panelOf(aimed(40), '"9"') });
    expect(conflicts.map((panel) => panel.etag)).toEqual(['"9"']);
    expect(progress.at(-1)).toEqual({ kind: 'conflict' });
    autosave.queue(aimed(22));
    await jest.advanceTimersByTimeAsync(60_000);
    expect(sent).toHaveLength(1);
    autosave.resume('"9"');
    autosave.queue(aimed(22));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    expect(sent[1]).toMatchObject({ theta: 22, etag: '"9"' });
  });

  it('takes its own earlier save, whose reply was lost, for what it is', async () => {
    const { autosave, sent, progress, conflicts, accepted } = rig();
    autosave.queue(aimed(21));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    await sent[0].answer({ kind: 'stale', current: panelOf(aimed(21), '"2"') });
    expect(conflicts).toEqual([]);
    expect(accepted.map((saved) => saved.etag)).toEqual(['"2"']);
    expect(progress.at(-1)?.kind).toBe('saved');
  });

  it('shows the faults of a refused design and sends the next change', async () => {
    const { autosave, sent, progress } = rig();
    const faults = [{ pointer: '/panel/lattice/periodXMm', detail: 'leaves 4 000 000 cells; at most 1 000 000' }];
    autosave.queue(aimed(21));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    await sent[0].answer({ kind: 'refused', detail: 'The design cannot be kept', faults });
    expect(progress.at(-1)).toEqual({ kind: 'not-valid', detail: 'The design cannot be kept', faults });
    await jest.advanceTimersByTimeAsync(60_000);
    expect(sent).toHaveLength(1);
    autosave.queue(aimed(22));
    await jest.advanceTimersByTimeAsync(SAVE_PAUSE_MS);
    expect(sent[1]).toMatchObject({ theta: 22, etag: '"1"' });
  });
});
