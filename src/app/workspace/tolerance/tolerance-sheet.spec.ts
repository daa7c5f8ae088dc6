import { SAMPLE_TOLERANCE_PARAMETERS, sampleToleranceResult } from '../../../../shared/antenna/tolerance/sample-tolerance';
import type { RunDetail, RunRequest, RunState } from '../../../../shared/contracts/runs';
import type { PanelDetail } from '../../../../shared/contracts/projects';
import { DEFAULT_TOLERANCE } from '../../../../shared/model/tolerance-contributors';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { toleranceParameters } from '../../../../shared/model/tolerance-run';
import { RunClient } from '../../api/run-client';
import type { RunListener } from '../../api/run-client';
import { sheetRig } from '../fields/sheet-rig';
import { ToleranceSheet } from './tolerance-sheet';

const result = sampleToleranceResult();

/** A run of an invented panel. */
function runIn(state: RunState): RunDetail {
  return {
    id: '00000000-0000-4000-8000-0000000000a1',
    kind: 'tolerance',
    panelId: '00000000-0000-4000-8000-0000000000a3',
    panelName: 'Panel A',
    source: { kind: 'draft', version: 3 },
    contentHash: 'd'.repeat(64),
    engineVersion: 'sample',
    createdAt: '2026-11-24T09:12:00.000Z',
    createdBy: { id: '00000000-0000-4000-8000-0000000000a2', name: 'Designer' },
    startedAt: '2026-11-24T09:12:01.000Z',
    finishedAt: state === 'done' ? '2026-11-24T09:12:04.000Z' : null,
    progress: { state, stage: state, fraction: state === 'done' ? 1 : 0, secondsLeft: null, queuePosition: null, restarts: 0 },
    failure: null,
    reused: false,
    answer: { kind: 'tolerance', parameters: SAMPLE_TOLERANCE_PARAMETERS, result: state === 'done' ? result : null },
  };
}

const panel: PanelDetail = {
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff',
  project: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fe', name: 'Merrow Point sea-rescue link', invented: true },
  name: 'Panel A, lighthouse relay',
  design: STARTING_DESIGN,
  draftHash: 'b'.repeat(64),
  etag: '"v1"',
  changedAt: '2026-12-01T14:02:31Z',
  changedBy: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Designer' },
  latestRevision: null,
  draftIsRevision: false,
};

/** Runs without a server. */
class FakeRuns {
  readonly started: RunRequest[] = [];
  listener: RunListener | null = null;
  runs: RunDetail[] = [];

  list = async () => ({ kind: 'found' as const, value: this.runs });
  read = async (id: string) => ({ kind: 'found' as const, value: this.runs.find((run) => run.id === id) ?? runIn('done') });
  start = async (_panelId: string, request: RunRequest) => {
    this.started.push(request);
    this.runs = [runIn('queued')];
    return { kind: 'found' as const, value: this.runs[0] };
  };
  cancel = async () => ({ kind: 'found' as const, value: runIn('cancelled') });
  watch = (_id: string, listener: RunListener) => {
    this.listener = listener;
    return () => undefined;
  };
}

async function rig(runs = new FakeRuns()) {
  const sheet = await sheetRig(ToleranceSheet, undefined, [{ provide: RunClient, useValue: runs }]);
  sheet.workspace.panel.set(panel);
  await sheet.fixture.whenStable();
  return { ...sheet, runs };
}

describe('ToleranceSheet', () => {
  beforeEach(() => jest.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue({ width: 560, left: 0 } as DOMRect));
  afterEach(() => jest.restoreAllMocks());

  it('says what will stand here before there is a run', async () => {
    const { text, header } = await rig();
    expect(header.head()).toMatchObject({ title: 'Tolerance', subtitle: '28 GHz, scalar model, 500 panels made by chance' });
    expect(text()).toContain('No result yet');
    expect(text()).toContain('No run yet.');
  });

  it('starts a run of the spreads as typed, in any unit', async () => {
    const { enter, press, runs, text } = await rig();
    await enter('Panel bowed, spread in mm', '500 µm');
    await enter('Trials', '200');
    await press('Start run');
    const [request] = runs.started;
    const { trials, contributors } = toleranceParameters.parse(request.parameters);
    expect([request.kind, trials]).toEqual(['tolerance', 200]);
    expect(contributors.find(({ id }) => id === 'bow')).toEqual({ id: 'bow', spread: 0.5, distribution: 'normal' });
    expect(contributors).toHaveLength(DEFAULT_TOLERANCE.contributors.length);
    expect(text()).toContain('Cancel run');
  });

  it('keeps a refused entry with its reason and does not start meanwhile', async () => {
    const { enter, press, runs, text } = await rig();
    await enter('Trials', '3');
    expect(text()).toContain('Not taken: A whole number from 10 to 5000.');
    await press('Start run');
    expect([runs.started, text().includes('An entry was not taken')]).toEqual([[], true]);
  });

  it('does not start when nothing is varied', async () => {
    const { fixture, element, press, runs, text } = await rig();
    for (const label of [...element.querySelectorAll('label')].filter((one) => one.textContent?.includes(', spread'))) {
      const box = element.querySelector<HTMLInputElement>(`[id="${label.htmlFor}"]`);
      if (!box) throw new Error('no box');
      box.value = '0';
      box.dispatchEvent(new Event('input'));
      box.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
      await fixture.whenStable();
    }
    await press('Start run');
    expect(runs.started).toEqual([]);
    expect(text()).toContain('Give at least one contributor a spread above 0');
  });

  it('shows yield with its interval, ranking and envelope of the newest result, and takes its spreads', async () => {
    const runs = new FakeRuns();
    runs.runs = [runIn('done')];
    const { text, field, element } = await rig(runs);
    expect(text()).toContain(`${result.allLines?.met} of 20 panels meet every line judged`);
    expect(element.querySelectorAll('slant-yield-table tbody tr')).toHaveLength(4);
    expect(text()).toContain('Not judged: the trials are computed by the scalar model');
    expect(element.querySelector('slant-bar-chart svg')?.getAttribute('aria-label')).toContain('Phase scatter, cell by cell −');
    expect(element.querySelector('slant-line-plot')).not.toBeNull();
    expect(field('Phase scatter, cell by cell, spread in °').value).toBe('15');
  });

  it('marks a result whose spreads are no longer those on the sheet, and one of another draft', async () => {
    const runs = new FakeRuns();
    runs.runs = [runIn('done')];
    const { enter, text, workspace, fixture } = await rig(runs);
    workspace.panel.set({ ...panel, draftHash: runIn('done').contentHash });
    await fixture.whenStable();
    expect(text()).not.toContain('Spreads changed');
    await enter('Panel bowed, spread in mm', '2');
    expect(text()).toContain('Spreads changed: this run had others.');
    workspace.panel.set({ ...panel, draftHash: 'e'.repeat(64) });
    await fixture.whenStable();
    expect(text()).toContain('Inputs changed: this is draft, save 3, not the draft as it stands.');
  });

  it('ranks by another measure and shows the other cut when asked', async () => {
    const runs = new FakeRuns();
    runs.runs = [runIn('done')];
    const { press, element, text } = await rig(runs);
    await press('Sidelobe level');
    expect(text()).toContain('change of sidelobe level that 1 panel in 20 goes beyond, dB');
    await press('Across the beam');
    expect(element.querySelector('slant-line-plot [role="application"]')?.getAttribute('aria-label')).toContain('Envelope of the cut across the beam');
  });
});
