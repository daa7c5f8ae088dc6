import '../model/zod-jitless';
import * as z from 'zod';
import { designDocument } from '../model/design-document';
import { figure, figures, verdict, verdictWord, warning } from '../model/figures';
import { id, isoTime, personName, sha256 } from './common';

/**
 * A project holds panels; a panel has one draft and any number of revisions.
 *
 * GET   /api/projects                      projectList
 * POST  /api/projects                      newProject -> 201 project                                  designer
 * PATCH /api/projects/:id                  projectChange, If-Match -> project                         designer
 * POST  /api/projects/:id/panels           newPanel -> 201 panelDetail                                designer
 * GET   /api/panels/:id                    panelDetail, ETag of the draft
 * PATCH /api/panels/:id                    panelChange, If-Match -> panelDetail                        designer
 * PUT   /api/panels/:id/draft              draftChange, If-Match (428, 412 with panelDetail in `current`) -> draftSaved   designer
 * GET   /api/panels/:id/revisions          revisionList
 * POST  /api/panels/:id/revisions          newRevision, If-Match of the draft, Idempotency-Key -> 201 revisionDetail  designer
 * GET   /api/revisions/:id                 revisionDetail
 * POST  /api/revisions/:id/restoration     newRevision -> 201 revisionDetail: a new revision with the old content; the draft follows  designer
 * GET   /api/revisions/:id/export          application/zip
 * GET   /api/revisions/:id/export/preview  exportPreview
 * GET   /api/comparisons?before=&after=    comparison; each side `revision:<id>` or `draft:<panelId>`; JSON, or a binary block
 */

const text = z.string();
const name = z.string().trim().min(1).max(120);

export const revisionHeader = z.strictObject({
  id,
  panelId: id,
  number: z.number().int(),
  /** SHA-256 over the canonical JSON of the content. */
  hash: sha256,
  parentId: id.nullable(),
  parentNumber: z.number().int().nullable(),
  restoredFromNumber: z.number().int().nullable(),
  author: personName,
  message: text,
  createdAt: isoTime,
});

export const figuresSummary = z.strictObject({
  cellCount: z.number().int(),
  gainDbi: figure,
  verdicts: z.array(verdict),
  /** The worst verdict of the lines that have a limit; not-evaluated when there is none. */
  overall: verdictWord,
  /** Remarks on the design that are more than notes: where, and why. */
  remarks: z.array(warning.pick({ pointer: true, severity: true, message: true })).optional(),
});

/** Present while the figures are still being computed: the summary is null until then, and a later list has it. */
const summaryPending = z.literal(true).optional();

export const panelOverview = z.strictObject({
  id,
  projectId: id,
  name,
  design: designDocument,
  draftHash: sha256,
  /** Null when the design cannot be predicted; the workspace says why. */
  summary: figuresSummary.nullable(),
  summaryPending,
  latestRevision: revisionHeader.nullable(),
  /** True when the draft equals its latest revision. */
  draftIsRevision: z.boolean(),
  changedAt: isoTime,
  changedBy: personName,
});

export const project = z.strictObject({ id, name, version: z.number().int(), invented: z.boolean(), createdAt: isoTime, panels: z.array(panelOverview) });
export const projectList = z.strictObject({ items: z.array(project) });
export const newProject = z.strictObject({ name });
export const projectChange = z.strictObject({ name });

/** A new panel starts from a given design, from another panel's draft, or from the starting design. */
export const newPanel = z.strictObject({ name, design: designDocument.optional(), copyOfPanelId: id.optional() });
export const panelChange = z.strictObject({ name });

export const panelDetail = z.strictObject({
  id,
  project: z.strictObject({ id, name, invented: z.boolean() }),
  name,
  design: designDocument,
  draftHash: sha256,
  etag: text,
  changedAt: isoTime,
  changedBy: personName,
  latestRevision: revisionHeader.nullable(),
  draftIsRevision: z.boolean(),
});
export const draftChange = z.strictObject({ design: designDocument });
export const draftSaved = z.strictObject({ etag: text, draftHash: sha256, changedAt: isoTime, draftIsRevision: z.boolean() });

export const newRevision = z.strictObject({ message: z.string().trim().min(1).max(2000) });
export const revisionList = z.strictObject({ items: z.array(revisionHeader.extend({ summary: figuresSummary.nullable(), summaryPending })) });
export const revisionDetail = revisionHeader.extend({
  panelName: text,
  projectName: text,
  design: designDocument,
  figures,
  verdicts: z.array(verdict),
  warnings: z.array(warning),
  /** The edition the cells come from, if any. */
  edition: z.strictObject({ id, familyName: text, number: z.number().int() }).nullable(),
});

export const exportedFile = z.strictObject({ name: text, bytes: z.number().int(), sha256, function: text, head: text });
/** Nothing is packed for a preview: the hash of the archive comes with the archive, in the header Repr-Digest (RFC 9530). */
export const exportPreview = z.strictObject({
  archiveName: text,
  /** Of the files before they are packed. */
  contentBytes: z.number().int(),
  files: z.array(exportedFile),
});

export type RevisionHeader = z.infer<typeof revisionHeader>;
export type FiguresSummary = z.infer<typeof figuresSummary>;
export type PanelOverview = z.infer<typeof panelOverview>;
export type Project = z.infer<typeof project>;
export type PanelDetail = z.infer<typeof panelDetail>;
export type DraftSaved = z.infer<typeof draftSaved>;
export type RevisionListItem = z.infer<typeof revisionList>['items'][number];
export type RevisionDetail = z.infer<typeof revisionDetail>;
export type ExportPreview = z.infer<typeof exportPreview>;
