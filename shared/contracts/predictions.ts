import '../model/zod-jitless';
import * as z from 'zod';
import { designDocument } from '../model/design-document';
import { figures, verdict, warning } from '../model/figures';

/**
 * POST /api/predictions   predictionRequest -> predictionReply (JSON), or a binary block with Accept: application/octet-stream.
 * A request with the header `Slantwise-Preview: <name chosen by the client>` replaces an older one of the same session and
 * name that has not started; the older one is answered 409 `superseded`.
 *
 * In the binary form the head is predictionReply without the arrays, and the arrays are named
 * cells.xMm, cells.yMm, ... , cuts.0.angleDeg, cuts.0.thetaDeg, ... and uv.gainDbi. In the vector model there are also
 * cuts.0.crossGainDbi, ... and uv.crossGainDbi.
 */

const step = z.tuple([z.number().min(-180).max(180), z.number().min(-180).max(180), z.number().min(0.001).max(90)]);

export const cutRequest = z.union([
  z.strictObject({ phiDeg: z.number().min(-360).max(360), thetaDeg: step }),
  z.strictObject({ plane: z.enum(['along', 'across']), angleDeg: step }),
]);

export const predictionRequest = z.strictObject({
  design: designDocument,
  include: z.array(z.enum(['cells', 'cuts', 'uv'])).max(3).optional(),
  cuts: z.array(cutRequest).max(8).optional(),
  frequencyGHz: z.number().min(1).max(1000).optional(),
  /** The harmonic of time-modulated cells to look at; the steered one when absent. */
  harmonic: z.number().int().min(-50).max(50).optional(),
  /** Samples per side of the u-v map. */
  uvSize: z.number().int().min(16).max(1024).optional(),
});

const numbers = z.array(z.number());

export const cellArrays = z.strictObject({
  xMm: numbers,
  yMm: numbers,
  column: numbers,
  row: numbers,
  /** At another frequency than the design's: what the law needs there, with the reference phase that fits the cells best. */
  targetPhaseDeg: numbers,
  /** Index into the edition's cells, the inline table or the ideal levels; -1 for a continuous ideal phase. */
  cellIndex: numbers,
  phaseDeg: numbers,
  /** Achieved minus target, wrapped; figures.phaseErrorRmsDeg is the RMS of these over cells that return anything. */
  errorDeg: numbers,
  amplitude: numbers,
  responseDb: numbers,
  incidenceDeg: numbers,
  incidenceAzimuthDeg: numbers,
});

export const cutReply = z.strictObject({
  request: cutRequest,
  angleDeg: numbers,
  thetaDeg: numbers,
  phiDeg: numbers,
  directivityDbi: numbers,
  gainDbi: numbers,
  /** Cross-polar, in the vector model. */
  crossGainDbi: numbers.optional(),
});

/** Row by row from v = -1 to 1, within a row from u = -1 to 1; outside the visible circle the floor stands. */
export const uvReply = z.strictObject({ size: z.number().int(), floorDbi: z.number(), gainDbi: numbers, crossGainDbi: numbers.optional() });

export const predictionReply = z.strictObject({
  engineVersion: z.string(),
  figures,
  verdicts: z.array(verdict),
  warnings: z.array(warning),
  cells: cellArrays.optional(),
  cuts: z.array(cutReply).optional(),
  uv: uvReply.optional(),
});

export const CELL_ARRAY_NAMES = [
  'xMm', 'yMm', 'column', 'row', 'targetPhaseDeg', 'cellIndex', 'phaseDeg', 'errorDeg', 'amplitude', 'responseDb', 'incidenceDeg', 'incidenceAzimuthDeg',
] as const;
export const CUT_ARRAY_NAMES = ['angleDeg', 'thetaDeg', 'phiDeg', 'directivityDbi', 'gainDbi'] as const;

/** Head of the binary form. */
export const predictionHead = predictionReply.omit({ cells: true, cuts: true, uv: true }).extend({
  cellCount: z.number().int().optional(),
  cuts: z.array(z.strictObject({ request: cutRequest })).optional(),
  uv: z.strictObject({ size: z.number().int(), floorDbi: z.number() }).optional(),
});

export type CutRequest = z.infer<typeof cutRequest>;
export type PredictionRequest = z.infer<typeof predictionRequest>;
export type PredictionReply = z.infer<typeof predictionReply>;
export type PredictionHead = z.infer<typeof predictionHead>;
