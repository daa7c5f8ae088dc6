import './zod-jitless';
import * as z from 'zod';

/** Least distance of the gain below the mask by the rule of the mask, and the direction that decides it. */
export const maskMargin = z.strictObject({
  marginDb: z.number(),
  thetaDeg: z.number(),
  phiDeg: z.number(),
  offAxisDeg: z.number().optional(),
  levelDbi: z.number().optional(),
  allowedDbi: z.number().optional(),
});

/** A stretch of angles off the wanted beam in which some direction stands above the mask, with the worst one. */
export const maskViolation = z.strictObject({
  fromDeg: z.number(),
  toDeg: z.number(),
  offAxisDeg: z.number(),
  thetaDeg: z.number(),
  phiDeg: z.number(),
  levelDbi: z.number(),
  allowedDbi: z.number(),
  excessDb: z.number(),
});

export const maskFindings = z.strictObject({
  /** The mask is undefined below this angle, and nothing is judged there. */
  judgedFromDeg: z.number(),
  violationCount: z.number().int(),
  /** The worst of them, in the order of their angles. */
  violations: z.array(maskViolation),
  /** For a rule that asks for a share of the sidelobe peaks. */
  peaksJudged: z.number().int().optional(),
  peaksAbove: z.number().int().optional(),
  /** For a rule that lets a share of the angles pass: the share that does. */
  angleFractionAbove: z.number().optional(),
});

export type MaskMargin = z.infer<typeof maskMargin>;
export type MaskFindings = z.infer<typeof maskFindings>;
