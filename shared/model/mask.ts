import './zod-jitless';
import * as z from 'zod';

const angleDeg = z.number().min(0).max(180);
const level = z.number().min(-200).max(200);

const customMask = z.strictObject({
  kind: z.literal('custom'),
  /** Pairs of angle off the wanted beam (degrees, rising) and highest allowed level (dBi), joined by straight lines. */
  points: z.array(z.tuple([angleDeg, level])).min(2).max(500),
});

const formulaMask = z.strictObject({
  kind: z.literal('formula'),
  /** Stretches of angles off the wanted beam, rising; the expression gives the level from `theta` in degrees. Undefined between and outside them. */
  segments: z.array(z.strictObject({ fromDeg: angleDeg, toDeg: angleDeg, expression: z.string().min(1).max(200) })).min(1).max(12),
});

const publishedMask = z.strictObject({
  kind: z.literal('published'),
  id: z.string().min(1).max(64),
  /** Angles off the beam between which the main reflector spills over, for envelopes that allow more there. */
  spilloverDeg: z.tuple([angleDeg, angleDeg]).optional(),
});

/** Highest gain allowed at each angle off the wanted beam, in dBi. */
export const mask = z.discriminatedUnion('kind', [publishedMask, customMask, formulaMask]);

/** The same without published envelopes, for levels in another unit. */
export const levelMask = z.discriminatedUnion('kind', [customMask, formulaMask]);

export type Mask = z.infer<typeof mask>;
export type LevelMask = z.infer<typeof levelMask>;
