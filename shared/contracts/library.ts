import '../model/zod-jitless';
import * as z from 'zod';
import { cellEntry, familyDescription, portMeaning, provenanceKind, qualityReport, qualityVerdict } from '../model/cell-family';
import { id, isoTime, page, personName, sha256 } from './common';

/**
 * GET  /api/library/families                 familyList      ?text=&frequencyGHz=&periodMm=&thetaDeg=  (each optional)
 * GET  /api/library/families/:id             familyDetail
 * POST /api/library/inspections              multipart: `files` (one or many, a zip among them) and optional field `inspection`
 *                                            (JSON, inspectionRequest) -> inspection. Nothing is stored.                lab
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

const parameterUnit = z.enum(['m', 'mm', 'um', 'in', 'mil']);
const angleUnit = z.enum(['deg', 'rad']);
const term = z.enum(['S11', 'S21', 'S12', 'S22']);

/** What one column of a CSV table of responses holds. */
export const tableColumnRole = z.union([
  z.strictObject({ role: z.literal('cell') }),
  z.strictObject({ role: z.literal('parameter'), name: text.min(1).max(40), unit: parameterUnit }),
  z.strictObject({ role: z.literal('frequency'), unit: z.enum(['Hz', 'kHz', 'MHz', 'GHz']) }),
  z.strictObject({ role: z.literal('theta'), unit: angleUnit }),
  z.strictObject({ role: z.literal('phi'), unit: angleUnit }),
  z.strictObject({ role: z.literal('response'), term, part: z.enum(['dB', 'magnitude', 'real', 'imaginary']) }),
  z.strictObject({ role: z.literal('response'), term, part: z.literal('phase'), unit: angleUnit }),
]);

const fileName = text.min(1).max(400);
const named = <T extends z.ZodRawShape>(shape: T) => z.array(z.strictObject({ file: fileName, ...shape })).max(10_000);

/** A person's decisions about an import; every part is optional, detection fills the rest. */
export const importMapping = z.strictObject({
  ignoredFiles: z.array(fileName).max(10_000).optional(),
  /** Files that measure cells again: they are compared with the first measurement (check `repeatability`), not put into the table. */
  repeatFiles: z.array(fileName).max(10_000).optional(),
  /** Option lines for files that have none, such as `# GHz S RI R 50`. */
  optionLines: named({ optionLine: text.max(200) }).optional(),
  /** Cut-off files of which only the first complete records are kept: a recorded choice. */
  keepFirstRecords: named({ records: z.number().int().min(1) }).optional(),
  corrections: named({
    cellId: text.min(1).max(200).optional(),
    parametersMm: z.array(z.strictObject({ name: text.min(1).max(40), value: z.number() })).max(4).optional(),
    thetaDeg: z.number().min(0).max(90).optional(),
    phiDeg: z.number().min(-360).max(360).optional(),
  }).optional(),
  tables: named({
    mapping: z.strictObject({
      columns: z.array(z.strictObject({ column: z.number().int().min(0), holds: tableColumnRole })).max(200),
      headerRow: z.number().int().min(0),
      blanks: z.enum(['refuse', 'missing']),
    }),
  }).optional(),
  parameterNames: z.array(text.min(1).max(40)).max(4).optional(),
  timeConvention: z.enum(['exp(+jwt)', 'exp(-jwt)']).optional(),
});

export const fileMessage = z.strictObject({
  severity: z.enum(['error', 'warning', 'notice']),
  file: text.optional(),
  line: z.number().int(),
  column: z.number().int().optional(),
  text,
  suggestion: text.optional(),
});

const detectedNumber = z.strictObject({ value: z.number(), from: z.enum(['mapping', 'comment', 'index', 'file-name', 'table']) });

export const inspectedFile = z.strictObject({
  name: text,
  kind: z.enum(['touchstone', 'table', 'index', 'family', 'other']),
  status: z.enum(['read', 'refused', 'ignored']),
  byteCount: z.number().int(),
  sha256: sha256.optional(),
  version: text.optional(),
  portCount: z.number().int().optional(),
  pointCount: z.number().int().optional(),
  fromGHz: z.number().optional(),
  toGHz: z.number().optional(),
  referenceOhm: z.array(z.number()).optional(),
  cellId: text.optional(),
  parameters: z.array(detectedNumber.extend({ name: text })),
  thetaDeg: detectedNumber.optional(),
  phiDeg: detectedNumber.optional(),
  polarisation: text.optional(),
  provenance: text.optional(),
  timeConvention: z.enum(['exp(+jwt)', 'exp(-jwt)']).optional(),
  /** A decision a refused file waits for; the answer goes into the mapping. */
  question: z
    .union([
      z.strictObject({ kind: z.literal('keep-complete-records'), completeRecords: z.number().int() }),
      z.strictObject({ kind: z.literal('option-line') }),
    ])
    .optional(),
  messages: z.array(fileMessage),
});

export const inspection = z.strictObject({
  files: z.array(inspectedFile),
  detected: z.strictObject({
    portCount: z.number().int(),
    parameterNames: z.array(text),
    thetasDeg: z.array(z.number()),
    phisDeg: z.array(z.number()),
    frequencyRangeGHz: z.strictObject({ from: z.number(), to: z.number() }).nullable(),
    frequencyCount: z.number().int(),
    cellCount: z.number().int(),
    portsHint: portMeaning.nullable(),
    provenanceHint: provenanceKind.nullable(),
    timeConventionHint: z.enum(['exp(+jwt)', 'exp(-jwt)']).nullable(),
    /** What the files say of the family, to fill the form. Fields they do not say are absent. */
    descriptionHint: familyDescription.partial(),
  }),
  /** Messages about the set as a whole; those about one file stand on that file. */
  messages: z.array(fileMessage),
  /** Present once the description is complete and the files make a table. */
  quality: qualityReport.nullable(),
  /** What keeps the table from being made, when a description was given. */
  refusals: z.array(fileMessage),
  /** The first response of each cell (smallest angles): unwrapped phase and magnitude against frequency. */
  preview: z
    .strictObject({
      frequenciesGHz: z.array(z.number()),
      cells: z.array(z.strictObject({ cellId: text, phaseDeg: z.array(z.number()), magnitudeDb: z.array(z.number()) })),
    })
    .nullable(),
  /** True when nothing but the acceptance is missing. */
  acceptable: z.boolean(),
});

/** Field `inspection` of the multipart form of an inspection. */
export const inspectionRequest = z.strictObject({ mapping: importMapping.optional(), description: familyDescription.optional() });

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
