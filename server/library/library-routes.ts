import * as z from 'zod';
import { id, idParams, pageQuery, sha256, type Role } from '../../shared/contracts/common';
import * as contract from '../../shared/contracts/library';
import { BytesReply, Reply } from '../http/reply';
import { defineRoute, type Route, type UploadedFile } from '../http/route';
import type { ImportService } from './import-service';
import type { LibraryService } from './library-service';
import { ARCHIVE_LIMITS, type NamedBytes } from './upload-archive';

interface Parts {
  readonly library: LibraryService;
  readonly imports: ImportService;
}

/** A fabricator sees released revisions only, and so not the library. */
const readers: readonly Role[] = ['designer', 'lab', 'reviewer', 'range', 'administrator'];
const read = { kind: 'signed-in', roles: readers, scope: 'read' } as const;
const edit = { kind: 'signed-in', roles: ['lab'] as readonly Role[], scope: 'library' } as const;

/** Twenty megabytes over a slow line, and 30 s to read them. */
const UPLOAD_SECONDS = 600;
const upload = { maxFileBytes: 20 * 1024 * 1024, maxFiles: ARCHIVE_LIMITS.entries } as const;

/** A text field of a form that holds JSON. */
const jsonField = <T extends z.ZodType>(schema: T) =>
  z
    .string()
    .max(1_000_000)
    .transform((text, context) => {
      try {
        return JSON.parse(text) as unknown;
      } catch {
        context.addIssue({ code: 'custom', message: 'is not JSON' });
        return z.NEVER;
      }
    })
    .pipe(schema);

const named = (files: readonly UploadedFile[]): NamedBytes[] => files.map((file) => ({ name: file.originalName, bytes: file.bytes }));

const inspectionForm = z.strictObject({ inspection: jsonField(contract.inspectionRequest).optional() });
const importForm = z.strictObject({ import: jsonField(contract.importRequest) });

function readingRoutes({ library }: Parts): Route[] {
  return [
    defineRoute({
      method: 'get',
      path: '/api/library/families',
      summary: 'Families of cells with their editions, filtered by name, band, period and angle',
      policy: read,
      query: contract.familyQuery,
      reply: contract.familyList,
      handler: async ({ caller, query }) => ({ items: await library.list(caller.teamId, query) }),
    }),
    defineRoute({
      method: 'get',
      path: '/api/library/families/:id',
      summary: 'One family with the description of its newest edition',
      policy: read,
      params: idParams,
      reply: contract.familyDetail,
      handler: ({ caller, params }) => library.family(caller.teamId, params.id),
    }),
    defineRoute({
      method: 'get',
      path: '/api/library/editions/:id',
      summary: 'One edition: description, cells, quality, how its files were read',
      policy: read,
      params: idParams,
      reply: contract.editionDetail,
      handler: ({ caller, params }) => library.edition(caller.teamId, params.id),
    }),
    defineRoute({
      method: 'get',
      path: '/api/library/editions/:id/responses',
      summary: 'The complex responses of an edition as a binary block',
      policy: read,
      params: idParams,
      bytes: ['application/octet-stream'],
      handler: async ({ caller, params }) => new BytesReply(await library.responseBlock(caller.teamId, params.id), 'application/octet-stream'),
    }),
    defineRoute({
      method: 'get',
      path: '/api/library/editions/:id/uses',
      summary: 'Drafts and revisions that stand on an edition',
      policy: read,
      params: idParams,
      reply: contract.useList,
      handler: async ({ caller, params }) => ({ items: await library.uses(caller.teamId, params.id) }),
    }),
    ...fileRoutes(library),
  ];
}

function fileRoutes(library: LibraryService): Route[] {
  return [
    defineRoute({
      method: 'get',
      path: '/api/library/editions/:id/files',
      summary: 'The original files of an edition with their hashes',
      policy: read,
      params: idParams,
      query: pageQuery,
      reply: contract.fileList,
      handler: ({ caller, params, query }) => library.fileList(caller.teamId, params.id, { after: query.after, limit: query.limit ?? 100 }),
    }),
    defineRoute({
      method: 'get',
      path: '/api/library/files/:sha256',
      summary: 'The original bytes of a file',
      policy: read,
      params: z.strictObject({ sha256 }),
      bytes: ['application/octet-stream'],
      handler: async ({ caller, params }) => {
        const file = await library.file(caller.teamId, params.sha256);
        return new BytesReply(file.body, 'application/octet-stream', { fileName: file.name });
      },
    }),
  ];
}

function importRoutes({ imports }: Parts): Route[] {
  return [
    defineRoute({
      method: 'post',
      path: '/api/library/inspections',
      summary: 'Read files and say what they hold; nothing is stored',
      policy: edit,
      upload,
      rate: 'upload',
      timeLimitSeconds: UPLOAD_SECONDS,
      body: inspectionForm,
      reply: contract.inspection,
      handler: ({ files, body }) => imports.inspect(named(files), body.inspection ?? {}),
    }),
    defineRoute({
      method: 'post',
      path: '/api/library/families',
      summary: 'Accept files as the first edition of a new family',
      policy: edit,
      upload,
      rate: 'upload',
      timeLimitSeconds: UPLOAD_SECONDS,
      idempotent: true,
      body: importForm,
      reply: contract.editionDetail,
      status: 201,
      handler: async ({ caller, files, body }) => {
        const edition = await imports.accept(caller, null, named(files), body.import);
        return new Reply(edition, { status: 201, location: `/api/library/editions/${edition.id}` });
      },
    }),
    defineRoute({
      method: 'post',
      path: '/api/library/families/:id/editions',
      summary: 'Accept files as the next edition of a family',
      policy: edit,
      params: z.strictObject({ id }),
      upload,
      rate: 'upload',
      timeLimitSeconds: UPLOAD_SECONDS,
      idempotent: true,
      body: importForm,
      reply: contract.editionDetail,
      status: 201,
      handler: async ({ caller, params, files, body }) => {
        const edition = await imports.accept(caller, params.id, named(files), body.import);
        return new Reply(edition, { status: 201, location: `/api/library/editions/${edition.id}` });
      },
    }),
  ];
}

function editionRoutes({ imports }: Parts): Route[] {
  return [
    defineRoute({
      method: 'post',
      path: '/api/library/editions/:id/publication',
      summary: 'Publish an accepted edition under the next number; it never changes again',
      policy: edit,
      idempotent: true,
      params: idParams,
      body: contract.publishRequest,
      reply: contract.editionDetail,
      handler: ({ caller, params, body }) => imports.publish(caller, params.id, body.note),
    }),
    defineRoute({
      method: 'delete',
      path: '/api/library/editions/:id',
      summary: 'Discard an accepted edition that was never published',
      policy: edit,
      params: idParams,
      handler: ({ caller, params }) => imports.discard(caller, params.id),
    }),
  ];
}

export const libraryRoutes = (parts: Parts): readonly Route[] => [...readingRoutes(parts), ...importRoutes(parts), ...editionRoutes(parts)];
