import { idParams, type Role } from '../../shared/contracts/common';
import * as contract from '../../shared/contracts/projects';
import { Reply } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import type { RevisionService } from './revision-service';

/** A fabricator sees released revisions only. */
const readers: readonly Role[] = ['designer', 'lab', 'reviewer', 'range', 'administrator'];
const read = { kind: 'signed-in', roles: readers, scope: 'read' } as const;
const edit = { kind: 'signed-in', roles: ['designer'] as readonly Role[], scope: 'design' } as const;

const created = (revision: contract.RevisionDetail): Reply<contract.RevisionDetail> =>
  new Reply(revision, { status: 201, location: `/api/revisions/${revision.id}` });

export const revisionRoutes = ({ revisions }: { revisions: RevisionService }): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/panels/:id/revisions',
    summary: 'Revisions of a panel, newest first',
    policy: read,
    params: idParams,
    reply: contract.revisionList,
    handler: async ({ caller, params }) => ({ items: await revisions.list(caller.teamId, params.id) }),
  }),
  defineRoute({
    method: 'post',
    path: '/api/panels/:id/revisions',
    summary: 'Freeze the draft as the next revision; If-Match names the draft that was read',
    policy: edit,
    params: idParams,
    body: contract.newRevision,
    reply: contract.revisionDetail,
    status: 201,
    versioned: true,
    idempotent: true,
    handler: async ({ caller, params, body, ifMatch }) => created(await revisions.freeze(caller, params.id, { ...body, ifMatch })),
  }),
  defineRoute({
    method: 'get',
    path: '/api/revisions/:id',
    summary: 'A revision with its design, figures and verdicts',
    policy: read,
    params: idParams,
    reply: contract.revisionDetail,
    handler: ({ caller, params }) => revisions.detail(caller.teamId, params.id),
  }),
  defineRoute({
    method: 'post',
    path: '/api/revisions/:id/restoration',
    summary: 'Make a new revision with the content of this one; the draft follows',
    policy: edit,
    params: idParams,
    body: contract.newRevision,
    reply: contract.revisionDetail,
    status: 201,
    idempotent: true,
    handler: async ({ caller, params, body }) => created(await revisions.restore(caller, params.id, body.message)),
  }),
];
