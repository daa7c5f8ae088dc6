import '../model/zod-jitless';
import * as z from 'zod';
import { figure, noFigure, verdictWord } from '../model/figures';
import { cutRequest } from './predictions';
import { revisionHeader } from './projects';
import { id, sha256 } from './common';

/**
 * What two states of panels have different: parameters, cells, cuts, map, figures.
 *
 * GET /api/comparisons?before=&after=   comparison, or a binary block with Accept: application/octet-stream: the head is
 * comparisonHead, the arrays are named cells.xMm, ... , cuts.0.angleDeg, ... and uv.differenceDb. There NaN stands for a gap.
 */

const numbers = z.array(z.number());
const value = z.union([z.number(), z.string(), z.boolean(), z.null()]);

export const side = z.strictObject({
  reference: z.string(),
  panelId: id,
  panelName: z.string(),
  projectName: z.string(),
  hash: sha256,
  /** Absent for a draft. */
  revision: revisionHeader.optional(),
  editionName: z.string().nullable(),
  requirement: z.strictObject({ met: z.number().int(), short: z.number().int(), open: z.number().int() }),
});

export const parameterDifference = z.strictObject({
  pointer: z.string(),
  label: z.string(),
  unit: z.string(),
  before: value,
  after: value,
});

export const cellDifference = z.strictObject({
  kind: z.literal('compared'),
  total: z.number().int(),
  changed: z.number().int(),
  /** By the first parameter of the family, when both stand on one family; otherwise absent. */
  parameter: z
    .strictObject({ label: z.string(), larger: z.number().int(), smaller: z.number().int(), meanChangeMm: z.number() })
    .optional(),
  errorOver15Before: z.number().int(),
  errorOver15After: z.number().int(),
  rmsErrorBeforeDeg: z.number(),
  rmsErrorAfterDeg: z.number(),
  /** Arrays per cell of the common lattice, in its order. */
  arrays: z.strictObject({
    xMm: numbers,
    yMm: numbers,
    changed: numbers,
    parameterChangeMm: numbers,
    phaseChangeDeg: numbers,
    errorChangeDeg: numbers,
  }),
});

export const cutDifference = z.strictObject({
  request: cutRequest,
  angleDeg: numbers,
  beforeDbi: numbers,
  afterDbi: numbers,
  /**
   * After minus before once the beams coincide; null where either is below the floor. In a plane of constant phi `before`
   * is moved by shiftU along the plane; in planes through each side's own beam the angle from that beam is compared and
   * shiftU is 0.
   */
  differenceDb: z.array(z.number().nullable()),
  shiftU: z.number(),
  floorDbi: z.number(),
});

export const figureDifference = z.strictObject({
  id: z.string(),
  label: z.string(),
  unit: z.string(),
  before: figure,
  after: figure,
  change: figure,
  /** Text of the limit, e.g. ">= 34.0", or null. */
  limit: z.string().nullable(),
  verdictBefore: verdictWord.nullable(),
  verdictAfter: verdictWord.nullable(),
});

export const comparison = z.strictObject({
  before: side,
  after: side,
  parameterCount: z.number().int(),
  parameters: z.array(parameterDifference),
  cells: z.union([cellDifference, noFigure]),
  cuts: z.array(cutDifference),
  /**
   * After at (u, v) minus before at (u - shiftU, v - shiftV) in dB, row by row from v = -1, so that the first beams
   * coincide wherever they point; 0 where either side has no direction or lies below the floor.
   */
  uv: z.strictObject({ size: z.number().int(), shiftU: z.number(), shiftV: z.number(), differenceDb: numbers }),
  figures: z.array(figureDifference),
  /** Id of the figure that decides between the two, if one verdict changed. */
  deciding: z.string().nullable(),
});

/** Arrays of the binary form under `cells.`, and under `cuts.0.`, `cuts.1.` ...; besides these there is `uv.differenceDb`. */
export const COMPARED_CELL_ARRAY_NAMES = ['xMm', 'yMm', 'changed', 'parameterChangeMm', 'phaseChangeDeg', 'errorChangeDeg'] as const;
export const COMPARED_CUT_ARRAY_NAMES = ['angleDeg', 'beforeDbi', 'afterDbi', 'differenceDb'] as const;

/** Head of the binary form: the comparison without its arrays. A gap in a `differenceDb` is NaN there. */
export const comparisonHead = comparison.omit({ cells: true, cuts: true, uv: true }).extend({
  cells: z.union([cellDifference.omit({ arrays: true }), noFigure]),
  cuts: z.array(cutDifference.pick({ request: true, shiftU: true, floorDbi: true })),
  uv: z.strictObject({ size: z.number().int(), shiftU: z.number(), shiftV: z.number() }),
});

export const comparisonQuery = z.strictObject({ before: z.string().max(80), after: z.string().max(80) });

export type Side = z.infer<typeof side>;
export type ParameterDifference = z.infer<typeof parameterDifference>;
export type CellDifference = z.infer<typeof cellDifference>;
export type CutDifference = z.infer<typeof cutDifference>;
export type FigureDifference = z.infer<typeof figureDifference>;
export type Comparison = z.infer<typeof comparison>;
export type ComparisonHead = z.infer<typeof comparisonHead>;
