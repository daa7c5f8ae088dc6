import { runProgress, type ProgressRow } from './run-progress';

const START = new Date('2026-11-24T09:00:00Z');
const row: ProgressRow = { state: 'running', chunkCount: 4, doneCount: 1, plannedSeconds: 8, doneSeconds: 2, startedAt: START, restartCount: 0 };
const around = { now: new Date(START.getTime() + 5000), queuePosition: null, threadCount: 2 };

describe('runProgress', () => {
  it('tells share and time left by the pace so far', () => {
    expect(runProgress(row, around)).toEqual({ state: 'running', stage: 'computing: 1 of 4 parts done', fraction: 0.25, secondsLeft: 15, queuePosition: null, restarts: 0 });
  });

  it('says nothing of the time left before the first part is done, or while it waits', () => {
    expect(runProgress({ ...row, doneCount: 0, doneSeconds: 0 }, around).secondsLeft).toBeNull();
    const waiting = runProgress({ ...row, state: 'queued', doneSeconds: 0, startedAt: null }, { ...around, queuePosition: 3 });
    expect(waiting).toMatchObject({ stage: 'waiting for its turn', secondsLeft: null, queuePosition: 3 });
  });

  it('says that nobody computes when no worker is there', () => {
    expect(runProgress({ ...row, state: 'queued', startedAt: null }, { ...around, threadCount: 0 }).stage).toBe('waiting: no worker is running');
    expect(runProgress(row, { ...around, threadCount: 0 }).stage).toBe('stopped: no worker is running');
  });

  it('tells of the merge and of a restart', () => {
    expect(runProgress({ ...row, doneCount: 4, doneSeconds: 8 }, around).stage).toBe('putting the parts together');
    expect(runProgress({ ...row, restartCount: 1 }, around)).toMatchObject({ stage: 'computing: 1 of 4 parts done; restarted (attempt 2)', restarts: 1 });
  });

  it('never exceeds the whole, and is whole when done', () => {
    expect(runProgress({ ...row, doneSeconds: 9 }, around).fraction).toBe(1);
    expect(runProgress({ ...row, state: 'done', plannedSeconds: 0, doneSeconds: 0 }, around)).toMatchObject({ fraction: 1, secondsLeft: 0 });
  });
});
