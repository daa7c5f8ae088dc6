import './zod-jitless';
import * as z from 'zod';
import { figure, noFigure } from './figure-value';

/** Figures that only some target phases have. */

/** The level along the line from the panel's centre through the focus. */
export const focusFigures = z.strictObject({
  /** Distance of the wanted focus from the panel's centre. */
  distanceMm: z.number(),
  /** Where the level on the line really is highest: nearer than the focus. */
  maximumMm: z.number(),
  /** Maximum less focus: negative towards the panel. */
  shiftMm: z.number(),
  /** Level at the maximum over the level at the focus. */
  riseDb: z.number(),
  /** Where the level falls to half of the maximum on either side. */
  halfPowerMm: z.strictObject({ from: figure, to: figure }),
  /** Level below the maximum at distances along the line, for drawing. */
  profile: z.strictObject({ distanceMm: z.array(z.number()), levelDb: z.array(z.number()) }),
});

/** A beam that turns its phase `order` times about its axis. */
export const vortexFigures = z.strictObject({
  order: z.number().int(),
  /** Angle off the axis at which the mean level about the axis is highest. */
  ringDeg: z.number(),
  /** Share of the power on that ring that has the wanted order. */
  purity: z.number(),
  /** Level on the axis relative to the ring. */
  axisDb: figure,
});

/** A wave that runs under the panel. */
export const guidedWaveFigures = z.strictObject({
  /** Way under the panel over which it leaks. */
  lengthMm: z.number(),
  /** 1 - exp(-2 alpha L): counts in the gain as the spillover of a horn does. */
  leakedShare: z.number(),
  /** Field in the beam against cells of free phase and full strength. */
  beamRelativeDb: figure,
  /** Share of what the cells couple that is in the beam; the rest is scattered by the unwanted part of their response. */
  modulationEfficiency: z.number(),
  /** Where the constant part of resonant cells sends a plane guided wave by itself. */
  unmodulatedLobes: z.array(z.strictObject({ thetaDeg: z.number(), phiDeg: z.number() })),
});

/** How alternating projections went, before cells are chosen. */
export const projectionFigures = z.strictObject({
  /** Within 0.05 dB of every bound; no longer moving; or ended while the cost was still falling. */
  outcome: z.enum(['reached', 'stalled', 'unfinished']),
  iterations: z.number().int(),
  /** Power that violates the bounds, as a share of the whole, before the iteration named. It cannot rise. */
  costs: z.array(z.strictObject({ iteration: z.number().int(), share: z.number() })),
  worstExcessDb: z.number(),
  worstShortfallDb: z.number(),
});

/** A board that scatters: array factor against a metal plate of the same size. */
export const diffuseFigures = z.strictObject({
  peakDb: z.number(),
  peakThetaDeg: z.number(),
  peakPhiDeg: z.number(),
  /** No board lies below: by Parseval over the reciprocal cell, or by the energy of the hemisphere on finer lattices. */
  boundDb: z.number(),
  boundBy: z.enum(['parseval', 'energy']),
  /** Peak over the whole reciprocal cell of the blocks on so many samples a side, which the search made low. */
  boardPeakDb: z.number(),
  samples: z.number().int(),
  method: z.enum(['exhaustive', 'descent']),
  /** Boards found with the same peak. */
  equals: z.number().int(),
});

/** Horn and mount in the way of the beam. */
export const blockageFigures = z.strictObject({
  /** Cells whose ray towards the beam meets the disc. */
  cells: z.number().int(),
  /** What the field at the beam loses; taper and directivity of the rest are part of it. */
  atBeamDb: figure,
  /** What the radiated power loses: counts in the gain beside the directivity, which is that of the open cells. */
  powerDb: figure,
});

/** Where the part of the response that all cells share sends the light. */
export const specularFigures = z.strictObject({
  /** Field against a metal plate: the mean response weighted by the power on the cells. */
  meanResponseDb: figure,
});

/** What the choice of cells leaves beyond the design frequency, and between neighbours. */
export const assignmentFigures = z.strictObject({
  /** Of a band fit, the design frequency first: phase errors left with the common phase of each frequency taken off. */
  band: z.array(z.strictObject({ frequencyGHz: z.number(), phaseErrorRmsDeg: z.number() })).optional(),
  /** Where a largest step is given. */
  neighbours: z.strictObject({ pairs: z.number().int(), violations: z.number().int(), largestMm: z.number() }).optional(),
});

/** How time-modulated cells spread the power over harmonics. */
export const modulationFigures = z.strictObject({
  /** The one that all other figures are of. */
  harmonic: z.number().int(),
  offsetMHz: z.number(),
  /** |a_m|^2 of that one. */
  shownShare: z.number(),
  harmonics: z.array(z.strictObject({ order: z.number().int(), share: z.number() })),
  /** Sum of |a_m|^2 over all harmonics: what the states re-radiate on the average over the period. */
  wholePower: z.number(),
});

export const lawFigures = {
  modulation: modulationFigures.optional(),
  assignment: assignmentFigures.optional(),
  blockage: blockageFigures.optional(),
  specular: specularFigures.optional(),
  projections: projectionFigures.optional(),
  diffuse: diffuseFigures.optional(),
  guidedWave: guidedWaveFigures.optional(),
  focus: z.union([focusFigures, noFigure]).optional(),
  vortex: z.union([vortexFigures, noFigure]).optional(),
};

export type FocusFigures = z.infer<typeof focusFigures>;
export type ProjectionFigures = z.infer<typeof projectionFigures>;
export type DiffuseFigures = z.infer<typeof diffuseFigures>;
export type BlockageFigures = z.infer<typeof blockageFigures>;
export type SpecularFigures = z.infer<typeof specularFigures>;
export type AssignmentFigures = z.infer<typeof assignmentFigures>;
export type ModulationFigures = z.infer<typeof modulationFigures>;
export type GuidedWaveFigures = z.infer<typeof guidedWaveFigures>;
export type VortexFigures = z.infer<typeof vortexFigures>;
