import { idParams, type Role } from '../../shared/contracts/common';
import { exportPreview } from '../../shared/contracts/projects';
import { BytesReply } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import type { ExportService } from './export-service';

/** A fabricator gets released revisions, and those by another way. */
const readers: readonly Role[] = ['designer', 'lab', 'reviewer', 'range', 'administrator'];
/** A million cells take half a minute to predict and as long to write, and exports wait for each other. */
const EXPORT_SECONDS = 300;
const read = { kind: 'signed-in', roles: readers, scope: 'read' } as const;

export const exportRoutes = ({ exports }: { exports: ExportService }): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/revisions/:id/export',
    summary: 'A revision as a zip of tables, design, manifest and checksums; the same bytes every time',
    policy: read,
    rate: 'export',
    timeLimitSeconds: EXPORT_SECONDS,
    params: idParams,
    bytes: ['application/zip'],
    handler: async ({ caller, params }) => {
      const { name, bytes, sha256 } = await exports.archive(caller, params.id);
      // RFC 9530: what came whole has this hash.
      const digest = `sha-256=:${Buffer.from(sha256, 'hex').toString('base64')}:`;
      return new BytesReply(bytes, 'application/zip', { fileName: `${name}.zip`, headers: { 'Repr-Digest': digest } });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/revisions/:id/export/preview',
    summary: 'What the archive of a revision holds: names, sizes, hashes, the first lines',
    policy: read,
    rate: 'export',
    timeLimitSeconds: EXPORT_SECONDS,
    params: idParams,
    reply: exportPreview,
    handler: ({ caller, params }) => exports.preview(caller.teamId, params.id),
  }),
];
