import type { RunDetail, RunProgress } from '../../../shared/contracts/runs';
import type { BandResult } from '../../../shared/model/band-run';

export const SAMPLE_RUN_ID = '00000000-0000-4000-8000-0000000000a1';
const PERSON = { id: '00000000-0000-4000-8000-0000000000a2', name: 'Designer' };

/** A band run of an invented panel, for specs. */
export function sampleRun(progress: Partial<RunProgress>, more: Partial<RunDetail> & { readonly result?: BandResult } = {}): RunDetail {
  const { result = null, ...rest } = more;
  const state = progress.state ?? 'queued';
  const isOver = state !== 'queued' && state !== 'running';
  return {
    id: SAMPLE_RUN_ID,
    kind: 'band',
    panelId: '00000000-0000-4000-8000-0000000000a3',
    panelName: 'Panel A',
    source: { kind: 'draft', version: 3 },
    contentHash: 'd'.repeat(64),
    engineVersion: 'sample',
    createdAt: '2026-11-24T09:12:00.000Z',
    createdBy: PERSON,
    startedAt: state === 'queued' ? null : '2026-11-24T09:12:01.000Z',
    finishedAt: isOver ? '2026-11-24T09:12:04.000Z' : null,
    progress: { state, stage: state, fraction: state === 'done' ? 1 : 0, secondsLeft: null, queuePosition: state === 'queued' ? 1 : null, restarts: 0, ...progress },
    failure: null,
    reused: false,
    answer: { kind: 'band', parameters: { frequencyCount: 3 }, result },
    ...rest,
  };
}
