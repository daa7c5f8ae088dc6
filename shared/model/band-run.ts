import './zod-jitless';
import * as z from 'zod';
import { figure, noFigure, verdict } from './figures';

/** What a run over a band is asked and what it gives. Angles in degrees, lengths in mm, frequencies in GHz. */

const frequencyGHz = z.number().min(1).max(1000);

export const bandParameters = z.strictObject({
  /** The band of the requirement when absent. */
  bandGHz: z.tuple([frequencyGHz, frequencyGHz]).optional(),
  /** Evenly spaced, edges included; the design frequency is added where it lies between two of them. */
  frequencyCount: z.number().int().min(3).max(401),
  /**
   * Where the horn's phase centre stands at each frequency: pairs of frequency (GHz, rising) and offset (mm) from the
   * position in the design, towards the aim. Linear between the pairs, held beyond them.
   */
  phaseCentre: z.array(z.tuple([frequencyGHz, z.number().min(-1000).max(1000)])).min(2).max(100).optional(),
  /** Compute besides what the same panel would do if every cell kept its ideal phase: the spatial part alone. */
  spatialPart: z.boolean().optional(),
});

/** What the frozen ideal phases do: all that is lost is lost to the paths. */
export const spatialPoint = z.strictObject({ gainAtBeamDbi: figure, gainDbi: figure, pointingErrorDeg: figure });

export const bandPoint = z.strictObject({
  frequencyGHz,
  /** At the wanted direction, which stays where it is. */
  gainAtBeamDbi: figure,
  /** Wherever the pattern is highest. */
  gainDbi: figure,
  directivityAtBeamDbi: figure,
  pointingErrorDeg: figure,
  /** Signed: away from the z axis along, towards rising phi across. */
  squintAlongDeg: figure,
  squintAcrossDeg: figure,
  sidelobeDb: figure,
  beamwidthAlongDeg: figure,
  beamwidthAcrossDeg: figure,
  cellLossDb: figure,
  phaseErrorRmsDeg: figure,
  verdicts: z.array(verdict),
  /** False where the cells' data do not reach this frequency, so that those of the nearest one stand in. */
  covered: z.boolean(),
  spatial: spatialPoint.optional(),
});

/** A band of gain, with its edges interpolated between the frequencies computed. */
export const gainBandwidth = z.strictObject({
  dropDb: z.number(),
  /** "Not reached within the band" is a value with its reason. */
  lowerGHz: figure,
  upperGHz: figure,
  widthGHz: figure,
  /** Of the design frequency. */
  widthPercent: figure,
});

/** One line of the requirement over the whole band. */
export const bandLine = verdict.extend({
  /** Where the value stands, or the first frequency at which the line was not evaluated. */
  frequencyGHz,
});

export const extreme = z.union([z.strictObject({ value: z.number(), frequencyGHz }), noFigure]);

export const bandResult = z.strictObject({
  bandGHz: z.tuple([frequencyGHz, frequencyGHz]),
  designFrequencyGHz: frequencyGHz,
  points: z.array(bandPoint),
  /** Of the gain at the wanted direction, 1 dB and 3 dB below its highest value in the band. */
  bandwidths: z.array(gainBandwidth),
  lines: z.array(bandLine),
  extremes: z.strictObject({ highestGainAtBeamDbi: extreme, lowestGainAtBeamDbi: extreme, largestPointingErrorDeg: extreme, highestSidelobeDb: extreme }),
});

export type BandParameters = z.infer<typeof bandParameters>;
export type SpatialPoint = z.infer<typeof spatialPoint>;
export type BandPoint = z.infer<typeof bandPoint>;
export type GainBandwidth = z.infer<typeof gainBandwidth>;
export type BandLine = z.infer<typeof bandLine>;
export type Extreme = z.infer<typeof extreme>;
export type BandResult = z.infer<typeof bandResult>;
