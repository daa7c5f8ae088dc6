import { durationText, queueText, sourceText, timeLeftText, tookText } from './run-text';

describe('texts of runs', () => {
  it('tell time left in seconds, then in minutes, and nothing where nothing is known', () => {
    expect([4.23, 42, 200].map(durationText)).toEqual(['4.2 s', '42 s', '3 min']);
    expect(timeLeftText({ state: 'running', secondsLeft: 12 })).toBe('about 12 s left');
    expect(timeLeftText({ state: 'running', secondsLeft: null })).toBe('');
    expect(timeLeftText({ state: 'done', secondsLeft: 0 })).toBe('');
  });

  it('tell the place in the queue until the run has begun', () => {
    expect([1, 3, null].map((queuePosition) => queueText({ queuePosition }))).toEqual(['next in the queue', 'place 3 in the queue', '']);
  });

  it('tell of what a run is and how long it took', () => {
    expect(sourceText({ source: { kind: 'draft', version: 7 } })).toBe('draft, save 7');
    expect(sourceText({ source: { kind: 'revision', revisionId: 'r', number: 2 } })).toBe('revision 2');
    const progress = { state: 'done', stage: 'done', fraction: 1, secondsLeft: 0, queuePosition: null, restarts: 0 } as const;
    expect(tookText({ startedAt: '2026-11-24T09:00:00.000Z', finishedAt: '2026-11-24T09:00:03.400Z', reused: false, progress })).toBe('3.4 s');
    expect(tookText({ startedAt: '2026-11-24T09:00:00.000Z', finishedAt: '2026-11-24T09:00:00.000Z', reused: true, progress })).toBe('known already');
    expect(tookText({ startedAt: '2026-11-24T09:00:00.000Z', finishedAt: null, reused: false, progress: { ...progress, state: 'running', fraction: 0.25 } })).toBe('25 %');
    expect(tookText({ startedAt: null, finishedAt: '2026-11-24T09:00:00.000Z', reused: false, progress: { ...progress, state: 'cancelled' } })).toBe('–');
  });
});
