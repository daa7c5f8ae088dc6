import { idParams, type Role } from '../../shared/contracts/common';
import { exportPreview } from '../../shared/contracts/projects';
import { BytesReply } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import type { ExportService } from './export-service';

/** A fabricator gets released revisions, and those by another way. */
const readers: readonly Role[] = ['designer', 'lab', 'reviewer', 'range', 'administrator'];
const read = { kind: 'signed-in', roles: readers, scope: 'read' } as const;

export const exportRoutes = ({ exports }: { exports: ExportService }): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/revisions/:id/export',
    summary: 'A revision as a zip of tables, design, manifest and checksums; the same bytes every time',
    policy: read,
    rate: 'export',
    params: idParams,
    bytes: ['application/zip'],
    handler: async ({ caller, params }) => {
      const { name, bytes } = await exports.archive(caller.teamId, params.id);
      return new BytesReply(bytes, 'application/zip', { fileName: `${name}.zip` });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/revisions/:id/export/preview',
    summary: 'What the archive of a revision holds: names, sizes, hashes, the first lines',
    policy: read,
    rate: 'export',
    params: idParams,
    reply: exportPreview,
    handler: ({ caller, params }) => exports.preview(caller.teamId, params.id),
  }),
];
