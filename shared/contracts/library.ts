import '../model/zod-jitless';
import * as z from 'zod';
import { cellEntry, familyDescription, qualityReport, qualityVerdict } from '../model/cell-family';
import { id, isoTime, page, personName, sha256 } from './common';

/**
 * GET  /api/library/families                 familyList      ?text=&frequencyGHz=&periodMm=&thetaDeg=  (each optional)
 * GET  /api/library/families/:id             familyDetail
 * POST /api/library/inspections              multipart: `files` (one or many, a zip among them) and optional field `mapping`
 *                                            (JSON, importMapping) -> inspection. Nothing is stored.                    lab
 * POST /api/library/families                 multipart: `files`, field `import` (JSON, importRequest)
 *                                            -> 201 editionDetail (edition 1, state `accepted`); Idempotency-Key       lab
 * POST /api/library/families/:id/editions    the same for the next edition of a family                                lab
 * POST /api/library/editions/:id/publication publishRequest -> editionDetail (state `published`, immutable)             lab
 * DELETE /api/library/editions/:id           an accepted edition that was never published                             lab
 * GET  /api/library/editions/:id             editionDetail
 * GET  /api/library/editions/:id/responses   application/octet-stream, see binary-block.ts (editionResponsesHead)
 * GET  /api/library/editions/:id/uses        useList
 * GET  /api/library/editions/:id/files       fileList
 * GET  /api/library/files/:sha256            the original bytes, as an attachment
 */

const text = z.string();

/** How the columns and gaps of the files are to be read; every field optional, detection fills the rest. */
export const importMapping = z.strictObject({
  /** Cell parameters by file name when they cannot be read from the files. */
  parametersMm: z.record(text, z.array(z.number())).optional(),
  thetaDeg: z.record(text, z.number()).optional(),
  phiDeg: z.record(text, z.number()).optional(),
  parameterNames: z.array(text.max(40)).max(4).optional(),
  ports: z.enum(['either', 'x', 'y', 'x-and-y', 'te-and-tm']).optional(),
  timeConvention: z.enum(['exp(+jwt)', 'exp(-jwt)']).optional(),
  /** Keep the complete records of files that are cut off: an explicit, recorded choice. */
  keepCompleteRecords: z.boolean().optional(),
  /** Files of the upload to leave out, by name. */
  leaveOut: z.array(text).max(10_000).optional(),
  /** Columns of a CSV table by meaning. */
  columns: z.record(text, text).optional(),
});

export const fileMessage = z.strictObject({
  severity: z.enum(['note', 'warn', 'fault']),
  file: text,
  line: z.number().int().optional(),
  column: z.number().int().optional(),
  text,
  suggestion: text.optional(),
});

export const inspectedFile = z.strictObject({
  name: text,
  bytes: z.number().int(),
  sha256,
  kind: z.enum(['touchstone', 'table', 'index', 'description', 'ignored', 'refused']),
  cellId: text.optional(),
  parametersMm: z.array(z.number()).optional(),
  thetaDeg: z.number().optional(),
  phiDeg: z.number().optional(),
  portCount: z.number().int().optional(),
  pointCount: z.number().int().optional(),
  fromGHz: z.number().optional(),
  toGHz: z.number().optional(),
});

export const inspection = z.strictObject({
  files: z.array(inspectedFile),
  cells: z.array(cellEntry),
  detected: z.strictObject({
    portCount: z.number().int().nullable(),
    parameterNames: z.array(text),
    cellCount: z.number().int(),
    thetasDeg: z.array(z.number()),
    phisDeg: z.array(z.number()),
    fromGHz: z.number().nullable(),
    toGHz: z.number().nullable(),
    pointCount: z.number().int(),
  }),
  /** What the files say of the family, to fill the form. Fields they do not say are absent. */
  description: familyDescription.partial(),
  messages: z.array(fileMessage),
  /** Present once the files make a full table; judged with the description found or given. */
  quality: qualityReport.nullable(),
  /** The responses for preview, thinned: unwrapped phase and magnitude of each cell against frequency. */
  preview: z
    .strictObject({
      frequenciesGHz: z.array(z.number()),
      cells: z.array(z.strictObject({ cellId: text, phaseDeg: z.array(z.number()), magnitudeDb: z.array(z.number()) })),
    })
    .nullable(),
  /** True when nothing but the acceptance is missing. */
  acceptable: z.boolean(),
});

export const importRequest = z.strictObject({
  description: familyDescription,
  mapping: importMapping,
  /** Why this state is accepted, in the words of who accepts it. */
  note: z.string().trim().min(1).max(2000),
});

export const publishRequest = z.strictObject({ note: z.string().trim().min(1).max(2000) });

export const editionHeader = z.strictObject({
  id,
  familyId: id,
  familyName: text,
  /** Null until published; 1, 2, 3 ... within the family. */
  number: z.number().int().nullable(),
  state: z.enum(['accepted', 'published']),
  hash: sha256,
  cellCount: z.number().int(),
  fileCount: z.number().int(),
  fromGHz: z.number(),
  toGHz: z.number(),
  thetasDeg: z.array(z.number()),
  phisDeg: z.array(z.number()),
  verdict: qualityVerdict,
  note: text,
  acceptedBy: personName,
  acceptedAt: isoTime,
  publishedBy: personName.nullable(),
  publishedAt: isoTime.nullable(),
});

export const editionDetail = editionHeader.extend({
  description: familyDescription,
  cells: z.array(cellEntry),
  quality: qualityReport,
  mapping: importMapping,
  messages: z.array(fileMessage),
});

export const familySummary = z.strictObject({
  id,
  name: text,
  kind: text,
  operation: z.enum(['reflect', 'transmit']),
  periodXMm: z.number(),
  periodYMm: z.number(),
  designFrequencyGHz: z.number(),
  provenance: z.enum(['measured', 'simulated', 'analytic', 'invented']),
  /** Newest published edition first, then what is accepted only. */
  editions: z.array(editionHeader),
  useCount: z.number().int(),
});
export const familyList = z.strictObject({ items: z.array(familySummary) });
export const familyQuery = z.strictObject({
  text: z.string().max(200).optional(),
  frequencyGHz: z.coerce.number().min(0).max(1000).optional(),
  periodMm: z.coerce.number().min(0).max(1000).optional(),
  thetaDeg: z.coerce.number().min(0).max(90).optional(),
});
export const familyDetail = familySummary.extend({ description: familyDescription });

/** A revision or draft that stands on an edition. */
export const editionUse = z.strictObject({
  projectName: text,
  panelId: id,
  panelName: text,
  revisionId: id.nullable(),
  revisionNumber: z.number().int().nullable(),
});
export const useList = z.strictObject({ items: z.array(editionUse) });

export const keptFile = z.strictObject({ name: text, bytes: z.number().int(), sha256 });
export const fileList = page(keptFile);

/** Head of /responses; the arrays follow in the order named: frequenciesHz, thetasRad, phisRad, values, present. */
export const editionResponsesHead = z.strictObject({ editionId: id, cellCount: z.number().int() });

export type ImportMapping = z.infer<typeof importMapping>;
export type FileMessage = z.infer<typeof fileMessage>;
export type InspectedFile = z.infer<typeof inspectedFile>;
export type Inspection = z.infer<typeof inspection>;
export type ImportRequest = z.infer<typeof importRequest>;
export type EditionHeader = z.infer<typeof editionHeader>;
export type EditionDetail = z.infer<typeof editionDetail>;
export type FamilySummary = z.infer<typeof familySummary>;
export type FamilyDetail = z.infer<typeof familyDetail>;
export type EditionUse = z.infer<typeof editionUse>;
export type KeptFile = z.infer<typeof keptFile>;
