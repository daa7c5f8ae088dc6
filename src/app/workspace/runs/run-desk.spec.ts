import { TestBed } from '@angular/core/testing';
import type { PanelDetail } from '../../../../shared/contracts/projects';
import type { RunDetail, RunRequest } from '../../../../shared/contracts/runs';
import { RunClient } from '../../api/run-client';
import type { RunListener } from '../../api/run-client';
import { SAMPLE_RUN_ID, sampleRun } from '../../api/sample-run';
import { FakeWorkspace } from '../fields/fake-workspace';
import { WORKSPACE_STATE } from '../workspace-state';
import { RunDesk } from './run-desk';

const request: RunRequest = { kind: 'band', parameters: { frequencyCount: 3 } };

/** A server with one run that the spec moves on. */
class FakeRuns {
  run: RunDetail = sampleRun({});
  listener: RunListener | null = null;
  stopped = 0;
  readonly asked: string[] = [];
  readonly list = async () => ({ kind: 'found', value: this.asked.includes('start') ? [this.run] : [] });
  readonly read = async () => ({ kind: 'found', value: this.run });
  readonly start = async () => (this.asked.push('start'), { kind: 'found', value: this.run });
  readonly cancel = async () => ((this.run = sampleRun({ state: 'cancelled' })), { kind: 'found', value: this.run });
  readonly watch = (_id: string, listener: RunListener) => {
    this.listener = listener;
    return () => (this.stopped += 1);
  };
}

function desk() {
  const [workspace, runs] = [new FakeWorkspace(), new FakeRuns()];
  workspace.panel.set({ id: 'p', draftHash: 'd'.repeat(64) } as PanelDetail);
  TestBed.configureTestingModule({ providers: [RunDesk, { provide: WORKSPACE_STATE, useValue: workspace }, { provide: RunClient, useValue: runs }] });
  return { workspace, runs, desk: TestBed.inject(RunDesk) };
}

const settle = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));

describe('RunDesk', () => {
  it('follows a started run by its events and shows the result when it is there', async () => {
    const { runs, desk: opened } = desk();
    await opened.open('p', 'band', null);
    expect(opened.history()).toEqual([]);
    await opened.start(request);
    expect(opened.underWay()?.id).toBe(SAMPLE_RUN_ID);
    runs.listener?.told({ ...sampleRun({}).progress, state: 'running', fraction: 0.5 });
    expect(opened.underWay()?.progress.fraction).toBe(0.5);
    runs.run = sampleRun({ state: 'done' });
    runs.listener?.told(runs.run.progress);
    await settle();
    expect(opened.underWay()).toBeNull();
    expect(opened.shown()?.id).toBe(SAMPLE_RUN_ID);
    expect(runs.stopped).toBe(1);
  });

  it('cancels, and stops watching', async () => {
    const { runs, desk: opened } = desk();
    await opened.start(request);
    await opened.cancel(SAMPLE_RUN_ID);
    expect(opened.history()?.[0].progress.state).toBe('cancelled');
    expect([opened.underWay(), runs.stopped]).toEqual([null, 1]);
  });

  it('calls a result stale once the draft has another hash, or is not saved', async () => {
    const { workspace, runs, desk: opened } = desk();
    runs.run = sampleRun({ state: 'done' });
    await opened.start(request);
    expect(opened.stale()).toBe(false);
    workspace.saveState.set({ kind: 'saving' });
    expect(opened.stale()).toBe(true);
    workspace.saveState.set({ kind: 'saved', at: 1 });
    workspace.panel.set({ id: 'p', draftHash: 'e'.repeat(64) } as PanelDetail);
    expect(opened.stale()).toBe(true);
  });

  it('waits for the draft to be saved before it starts', async () => {
    const { workspace, runs, desk: opened } = desk();
    workspace.saveState.set({ kind: 'saving' });
    const started = opened.start(request);
    await settle();
    expect(runs.asked).toEqual([]);
    workspace.saveState.set({ kind: 'saved', at: 2 });
    TestBed.tick();
    await started;
    expect(runs.asked).toEqual(['start']);
  });
});
