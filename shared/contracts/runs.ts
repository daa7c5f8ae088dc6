import '../model/zod-jitless';
import * as z from 'zod';
import { bandParameters, bandResult } from '../model/band-run';
import { toleranceParameters, toleranceResult } from '../model/tolerance-run';
import { id, isoTime, page, pageQuery, personName } from './common';

/**
 * Runs: computations that take longer than a request.
 *
 * POST /api/panels/:id/runs          runRequest -> 202 runDetail, Location /api/runs/:id
 * GET  /api/panels/:id/runs          runListQuery -> page of runSummary, newest first
 * GET  /api/runs                     the same over the whole team
 * GET  /api/runs/:id                 runDetail, with the result once it is there
 * GET  /api/runs/:id/events          server-sent events: `progress` with runProgress, until the run is over
 * POST /api/runs/:id/cancellation    -> runDetail
 */

/** One line for each kind of run: what it is asked and what it gives. */
export const runSchemas = {
  band: { parameters: bandParameters, result: bandResult },
  tolerance: { parameters: toleranceParameters, result: toleranceResult },
} as const;

export type RunKind = keyof typeof runSchemas;
export type RunParameters<Kind extends RunKind> = z.infer<(typeof runSchemas)[Kind]['parameters']>;
export type RunResult<Kind extends RunKind> = z.infer<(typeof runSchemas)[Kind]['result']>;

export const RUN_KINDS = Object.keys(runSchemas) as [RunKind, ...RunKind[]];
export const runKind = z.enum(RUN_KINDS);

const requestOf = <Kind extends RunKind>(kind: Kind) =>
  z.strictObject({
    kind: z.literal(kind),
    /** The revision to compute; the draft as it is saved when absent. */
    revisionId: id.optional(),
    parameters: runSchemas[kind].parameters,
  });

/** One line for each kind. */
export const runRequest = z.discriminatedUnion('kind', [requestOf('band'), requestOf('tolerance')]);

/** One line for each kind. */
const runAnswer = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('band'), parameters: bandParameters, result: bandResult.nullable() }),
  z.strictObject({ kind: z.literal('tolerance'), parameters: toleranceParameters, result: toleranceResult.nullable() }),
]);

export const runState = z.enum(['queued', 'running', 'done', 'failed', 'cancelled']);

export const runFailure = z.strictObject({
  /** What happened and what to do about it. */
  message: z.string(),
  /** To be found in the log. */
  id: z.uuid(),
});

export const runProgress = z.strictObject({
  state: runState,
  /** What is going on, in words. */
  stage: z.string(),
  /** Share of the work done, 0 to 1. */
  fraction: z.number().min(0).max(1),
  /** Null while nothing is known about it. */
  secondsLeft: z.number().nullable(),
  /** 1 for the run that begins next; null once it has begun. */
  queuePosition: z.number().int().nullable(),
  /** How often a part had to be begun again because whoever computed it fell silent. */
  restarts: z.number().int(),
});

export const runSource = z.union([
  z.strictObject({ kind: z.literal('draft'), version: z.number().int() }),
  z.strictObject({ kind: z.literal('revision'), revisionId: id, number: z.number().int() }),
]);

export const runSummary = z.strictObject({
  id,
  kind: runKind,
  panelId: id,
  panelName: z.string(),
  source: runSource,
  /** Hash of the design computed and its edition; equal to that of a draft or revision which has not changed since. */
  contentHash: z.string(),
  engineVersion: z.string(),
  createdAt: isoTime,
  createdBy: personName,
  startedAt: isoTime.nullable(),
  finishedAt: isoTime.nullable(),
  progress: runProgress,
  failure: runFailure.nullable(),
  /** True when the result was there already, computed from the same inputs by an earlier run. */
  reused: z.boolean(),
});

export const runDetail = runSummary.extend({
  /** Kind, parameters and, once it is done, the result. */
  answer: runAnswer,
});

export const runListQuery = pageQuery.extend({ kind: runKind.optional(), revisionId: id.optional() });
export const runPage = page(runSummary);

export type RunRequest = z.infer<typeof runRequest>;
export type RunState = z.infer<typeof runState>;
export type RunFailure = z.infer<typeof runFailure>;
export type RunProgress = z.infer<typeof runProgress>;
export type RunSource = z.infer<typeof runSource>;
export type RunSummary = z.infer<typeof runSummary>;
export type RunDetail = z.infer<typeof runDetail>;
export type RunListQuery = z.infer<typeof runListQuery>;
