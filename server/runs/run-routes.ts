import { idParams, type Role } from '../../shared/contracts/common';
import * as contract from '../../shared/contracts/runs';
import { BytesReply, Reply } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import type { RunEvents } from './run-events';
import type { RunService } from './run-service';

interface Parts {
  readonly runs: RunService;
  readonly runEvents: RunEvents;
}

/** Everyone but a fabricator, who sees no drafts. */
const members: readonly Role[] = ['designer', 'lab', 'reviewer', 'range', 'administrator'];
const read = { kind: 'signed-in', roles: members, scope: 'read' } as const;
const compute = { kind: 'signed-in', roles: members, scope: 'predict' } as const;

const EVENTS = 'text/event-stream';

const panelRunRoutes = ({ runs }: Parts): Route[] => [
  defineRoute({
    method: 'post',
    path: '/api/panels/:id/runs',
    summary: 'Start a run on the draft or a revision of a panel; one that computes the same already is answered instead',
    policy: compute,
    rate: 'compute',
    params: idParams,
    body: contract.runRequest,
    reply: contract.runDetail,
    status: 202,
    idempotent: true,
    handler: async ({ caller, params, body }) => {
      const run = await runs.start(caller, params.id, body);
      return new Reply(run, { status: 202, location: `/api/runs/${run.id}` });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/panels/:id/runs',
    summary: 'Runs of a panel, newest first',
    policy: read,
    params: idParams,
    query: contract.runListQuery,
    reply: contract.runPage,
    handler: ({ caller, params, query }) => runs.list(caller.teamId, { ...query, panelId: params.id }),
  }),
];

const singleRunRoutes = ({ runs, runEvents }: Parts): Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/runs',
    summary: 'Runs of the team, newest first',
    policy: read,
    query: contract.runListQuery,
    reply: contract.runPage,
    handler: ({ caller, query }) => runs.list(caller.teamId, query),
  }),
  defineRoute({
    method: 'get',
    path: '/api/runs/:id',
    summary: 'A run with its progress and, once it is done, its result',
    policy: read,
    params: idParams,
    reply: contract.runDetail,
    handler: ({ caller, params }) => runs.detail(caller.teamId, params.id),
  }),
  defineRoute({
    method: 'get',
    path: '/api/runs/:id/events',
    summary: 'Progress of a run as server-sent events, until it is over',
    policy: read,
    params: idParams,
    bytes: [EVENTS],
    handler: async ({ caller, params }) => {
      const { progress } = await runs.detail(caller.teamId, params.id);
      return new BytesReply(runEvents.watch(caller.teamId, params.id, progress), EVENTS);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/runs/:id/cancellation',
    summary: 'Cancel a run that is not over',
    policy: compute,
    params: idParams,
    reply: contract.runDetail,
    handler: ({ caller, params }) => runs.cancel(caller, params.id),
  }),
];

export const runRoutes = (parts: Parts): readonly Route[] => [...panelRunRoutes(parts), ...singleRunRoutes(parts)];
