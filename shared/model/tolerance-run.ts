import './zod-jitless';
import * as z from 'zod';
import { figure, verdict } from './figures';

/** What a tolerance run is asked and what it gives. Lengths in mm, angles in degrees. */

export const contributorId = z.enum([
  'etch-random',
  'etch-common',
  'permittivity',
  'thickness',
  'temperature',
  'lift',
  'tilt-x',
  'tilt-y',
  'bow',
  'feed-axial',
  'feed-x',
  'feed-y',
  'phase-scatter',
  'dead-cells',
]);

/** How a deviation is drawn: `share` is for dead cells alone, each of which fails with the given probability. */
export const spreadKind = z.enum(['normal', 'uniform', 'share']);

export const toleranceContributor = z.strictObject({
  id: contributorId,
  /** Standard deviation of a normal spread, half the width of a uniform one, or the share; in the contributor's own unit. */
  spread: z.number().min(0).max(1000),
  distribution: spreadKind,
});

/** What the cells are made of, for temperature: parts per million and kelvin. */
export const materialDrift = z.strictObject({
  expansionPpmPerK: z.number().min(-200).max(500),
  permittivityPpmPerK: z.number().min(-2000).max(2000),
});

export const MOST_TRIALS = 5000;

export const toleranceParameters = z
  .strictObject({
    trials: z.number().int().min(10).max(MOST_TRIALS),
    seed: z.number().int().min(0).max(Number.MAX_SAFE_INTEGER),
    contributors: z.array(toleranceContributor).min(1).max(contributorId.options.length),
    material: materialDrift,
  })
  .superRefine(({ contributors }, context) => {
    contributors.forEach(({ id, spread, distribution }, i) => {
      const at = (message: string, field: string): void => context.addIssue({ code: 'custom', path: ['contributors', i, field], message });
      if (contributors.findIndex((other) => other.id === id) !== i) at(`${id} is given twice`, 'id');
      if ((id === 'dead-cells') !== (distribution === 'share')) at(id === 'dead-cells' ? 'dead cells are drawn as a share' : 'only dead cells are drawn as a share', 'distribution');
      if (id === 'dead-cells' && spread > 1) at('a share is at most 1', 'spread');
    });
  });

/** What is read off the pattern of every panel made; null where a pattern has no such thing. */
export const toleranceReading = z.strictObject({
  /** At the wanted direction; the worst of several beams. */
  gainDbi: z.number().nullable(),
  /** Highest lobe of the hemisphere beside the wanted beams, relative to the first. */
  sidelobeDb: z.number().nullable(),
  /** The worst of several beams. */
  pointingDeg: z.number().nullable(),
  maskMarginDb: z.number().nullable(),
});

export const toleranceMeasure = toleranceReading.keyof();

/** How a measure is spread over the trials: values that 5, 50 and 95 of 100 stay below. */
export const measureSpread = z.strictObject({ measure: toleranceMeasure, nominal: figure, mean: figure, p5: figure, p50: figure, p95: figure });

/** Share of trials that meet something, with the interval that holds the true share in 95 of 100 runs. */
export const shareMet = z.strictObject({ met: z.number().int(), of: z.number().int(), low: z.number(), high: z.number() });

export const toleranceLine = z.strictObject({
  line: verdict.shape.line,
  sense: verdict.shape.sense,
  limit: z.number(),
  unit: z.string(),
  /** As drawn. */
  nominal: figure,
  /** A reason where the run does not judge this line. */
  share: z.union([shareMet, z.strictObject({ reason: z.string() })]),
});

/** One contributor alone, all others as drawn. */
export const rankedContributor = z.strictObject({
  id: contributorId,
  /** The value on the bad side that 1 trial in 20 goes beyond, less the nominal one: a loss of gain is negative. */
  change: z.strictObject({ gainDbi: figure, sidelobeDb: figure, pointingDeg: figure, maskMarginDb: figure }),
  /** Why it does not act on this design. */
  notApplied: z.string().nullable(),
});

const numbers = z.array(z.number());

/** Gain along a great circle through the first beam: what 5, 50 and 95 of 100 panels stay below, angle by angle. */
export const cutEnvelope = z.strictObject({
  plane: z.enum(['along', 'across']),
  angleDeg: numbers,
  nominalDbi: numbers,
  p5Dbi: numbers,
  p50Dbi: numbers,
  p95Dbi: numbers,
});

export const toleranceResult = z.strictObject({
  trials: z.number().int(),
  rankingTrials: z.number().int(),
  envelopeTrials: z.number().int(),
  lines: z.array(toleranceLine),
  /** Trials that meet every line judged; null where none is. */
  allLines: shareMet.nullable(),
  spreads: z.array(measureSpread),
  ranking: z.array(rankedContributor),
  cuts: z.array(cutEnvelope),
  /** Cells whose edition has no neighbour of another size, so that etching does not change them. */
  cellsWithoutNeighbour: z.number().int(),
});

export type ContributorId = z.infer<typeof contributorId>;
export type SpreadKind = z.infer<typeof spreadKind>;
export type ToleranceContributor = z.infer<typeof toleranceContributor>;
export type MaterialDrift = z.infer<typeof materialDrift>;
export type ToleranceParameters = z.infer<typeof toleranceParameters>;
export type ToleranceReading = z.infer<typeof toleranceReading>;
export type ToleranceMeasure = z.infer<typeof toleranceMeasure>;
export type MeasureSpread = z.infer<typeof measureSpread>;
export type ShareMet = z.infer<typeof shareMet>;
export type ToleranceLine = z.infer<typeof toleranceLine>;
export type RankedContributor = z.infer<typeof rankedContributor>;
export type CutEnvelope = z.infer<typeof cutEnvelope>;
export type ToleranceResult = z.infer<typeof toleranceResult>;
