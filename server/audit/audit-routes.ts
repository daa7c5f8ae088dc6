import { pageQuery } from '../../shared/contracts/common';
import { auditPage } from '../../shared/contracts/team';
import { defineRoute, type Route } from '../http/route';
import type { AuditService } from './audit-service';

const USUAL_LIMIT = 50;

export const auditRoutes = ({ audit }: { audit: AuditService }): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/audit',
    summary: 'Every change in the team, newest first, and whether the chain of hashes is whole',
    policy: { kind: 'signed-in', roles: ['administrator'], scope: 'team' },
    query: pageQuery,
    reply: auditPage,
    handler: ({ caller, query }) => audit.page(caller.teamId, query.after, query.limit ?? USUAL_LIMIT),
  }),
];
