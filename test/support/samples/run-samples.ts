import type { RunDetail } from '../../../shared/contracts/runs';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import type { Api } from '../api';
import type { ApiClient } from '../api-client';
import { bodyOf, newPanel } from '../panels';
import type { RouteSample, RouteSamples } from '../route-samples';

const BAND = { kind: 'band', parameters: { frequencyCount: 3, bandGHz: [27, 29] } };
const owners = { owner: 'designer', teammate: { account: 'fabricator', status: 403 } } as const;

async function newRun(designer: ApiClient): Promise<RunDetail> {
  const panel = await newPanel(designer, STARTING_DESIGN);
  return bodyOf<RunDetail>(await designer.post(`/api/panels/${panel.id}/runs`, BAND), 202);
}

/** Nobody else waits for the runs of these tests: over or not, the team's cap is for others. */
async function endRuns(api: Api): Promise<void> {
  await api.query(`UPDATE run SET state = 'cancelled', finished_at = now() WHERE state IN ('queued', 'running')`);
}

const onRun = (path: (runId: string) => string, isOver: boolean): RouteSample => ({
  ...owners,
  okStatus: 200,
  prepare: async (api) => {
    await endRuns(api);
    const { id } = await newRun(await api.signedIn('designer'));
    if (isOver) await endRuns(api);
    return { path: path(id) };
  },
});

export const runSamples: RouteSamples = {
  'post /api/panels/:id/runs': {
    ...owners,
    okStatus: 202,
    prepare: async (api) => {
      await endRuns(api);
      return { path: `/api/panels/${(await newPanel(await api.signedIn('designer'), STARTING_DESIGN)).id}/runs`, body: BAND };
    },
  },
  'get /api/panels/:id/runs': {
    ...owners,
    okStatus: 200,
    prepare: async (api) => ({ path: `/api/panels/${(await newPanel(await api.signedIn('designer'), STARTING_DESIGN)).id}/runs` }),
  },
  'get /api/runs/:id': onRun((id) => `/api/runs/${id}`, false),
  'get /api/runs/:id/events': onRun((id) => `/api/runs/${id}/events`, true),
  'post /api/runs/:id/cancellation': onRun((id) => `/api/runs/${id}/cancellation`, false),
};
