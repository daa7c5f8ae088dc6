import './zod-jitless';
import * as z from 'zod';
import { mask } from './mask';
import { link, receiver, transmitter } from './transmission';

export { mask };
export type { Mask } from './mask';

/**
 * The design document: what a draft holds and a revision freezes.
 * Angles in degrees, lengths in millimetres, frequencies in GHz: here alone. Unknown fields are refused.
 */

/** More cells than this are refused before any memory is taken. */
export const MAX_CELL_COUNT = 1_000_000;

const LARGEST_LENGTH_MM = 100_000;
const lengthMm = z.number().gt(0).max(LARGEST_LENGTH_MM);
const coordinateMm = z.number().min(-LARGEST_LENGTH_MM).max(LARGEST_LENGTH_MM);
const pointMm = z.tuple([coordinateMm, coordinateMm]);
const positionMm = z.tuple([coordinateMm, coordinateMm, coordinateMm]);
const frequencyGHz = z.number().min(1).max(1000);
const thetaDeg = z.number().min(0).max(89.9);
const phiDeg = z.number().min(-360).max(360);
const exponent = z.number().min(0).max(200);

export const linearPolarisation = z.enum(['x', 'y']);
export const polarisation = z.enum(['x', 'y', 'rhcp', 'lhcp']);

export const beam = z.strictObject({
  thetaDeg,
  phiDeg,
  levelDb: z.number().min(-60).max(60).optional(),
  phaseDeg: z.number().min(-360).max(360).optional(),
});

export const requirement = z.strictObject({
  designFrequencyGHz: frequencyGHz,
  bandGHz: z.tuple([frequencyGHz, frequencyGHz]).optional(),
  beams: z.array(beam).min(1).max(32),
  polarisation,
  minGainDbi: z.number().min(-100).max(120).optional(),
  minCrossPolarDiscriminationDb: z.number().min(0).max(100).optional(),
  pointingToleranceDeg: z.number().gt(0).max(90).optional(),
  maxSidelobeDb: z.number().min(-100).max(0).optional(),
  mask: mask.optional(),
  /** Highest cross-polar gain at each angle off the wanted beam. */
  crossPolarMask: mask.optional(),
  transmitter: transmitter.optional(),
  link: link.optional(),
  receiver: receiver.optional(),
});

const rectangle = z.strictObject({ kind: z.literal('rectangle'), widthMm: lengthMm, heightMm: lengthMm });
const ellipse = z.strictObject({ kind: z.literal('ellipse'), widthMm: lengthMm, heightMm: lengthMm });
const polygon = z.strictObject({ kind: z.literal('polygon'), pointsMm: z.array(pointMm).min(3).max(1000) });

export const outline = z.discriminatedUnion('kind', [rectangle, ellipse, polygon]);

export const keepOut = z.discriminatedUnion('kind', [
  rectangle.extend({ centreMm: pointMm }),
  ellipse.extend({ centreMm: pointMm }),
  polygon.extend({ centreMm: pointMm }),
]);

export const lattice = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('rectangular'), periodXMm: lengthMm, periodYMm: lengthMm }),
  z.strictObject({ kind: z.literal('triangular'), periodXMm: lengthMm, rowSpacingMm: lengthMm }),
]);

export const panel = z.strictObject({
  operation: z.enum(['reflect', 'transmit']),
  outline,
  lattice,
  keepOuts: z.array(keepOut).max(200),
});

export const illumination = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('horn'),
    positionMm,
    aimMm: positionMm,
    exponentE: exponent,
    exponentH: exponent,
    polarisation,
    /** Of the disc that horn and mount make in the way of the beam of a reflecting panel; without it nothing is blocked. */
    blockageRadiusMm: lengthMm.optional(),
  }),
  z.strictObject({ kind: z.literal('plane-wave'), thetaDeg, phiDeg, polarisation }),
  /** A wave that runs under the panel and leaks through the cells. */
  z.strictObject({
    kind: z.literal('guided-wave'),
    launch: z.discriminatedUnion('kind', [
      /** From the edge of the outline across the panel; the azimuth is that of its direction of travel. */
      z.strictObject({ kind: z.literal('plane'), directionDeg: phiDeg }),
      /** From a point outward; nothing is lit within the radius of the launch. */
      z.strictObject({ kind: z.literal('radial'), centreMm: pointMm, radiusMm: lengthMm }),
    ]),
    /** Wavenumber of the guided wave over that of free space, at every frequency. */
    effectiveIndex: z.number().min(0.05).max(20),
    /** Decay of the field along the way by leaking, 1/m. */
    leakageNpPerM: z.number().gt(0).max(1000),
    polarisation,
  }),
]);

const spanDeg = z.tuple([z.number().min(-89.9).max(89.9), z.number().min(-89.9).max(89.9)]);

/** What a pattern is to look like: flat over sectors, or beams under a mask. */
export const patternGoal = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('sectors'),
    /** Spans of azimuth atan2(x, z) and elevation asin(y), each rising. */
    sectors: z.array(z.strictObject({ azimuthDeg: spanDeg, elevationDeg: spanDeg })).min(1).max(8),
    rippleDb: z.number().min(0.05).max(10),
    transitionDeg: z.number().min(0).max(90),
    /** Highest level outside, relative to the flat one. */
    outsideDb: z.number().min(-80).max(-1),
  }),
  z.strictObject({
    kind: z.literal('mask'),
    /** Pairs of angle off the nearest wanted beam (rising) and highest level relative to the peak (dB). */
    points: z.array(z.tuple([z.number().min(0).max(180), z.number().min(-100).max(0)])).min(2).max(200),
    /** How far the peak may fall below all cells in step. */
    peakLossDb: z.number().min(0).max(20),
  }),
]);

export const synthesis = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('direct') }),
  z.strictObject({ kind: z.literal('focus'), pointMm: positionMm }),
  /** Every wanted beam turns its phase this many times about its axis, against the clock for positive orders. */
  z.strictObject({ kind: z.literal('vortex'), order: z.number().int().min(-50).max(50) }),
  /** Phases found by alternating projections between the amplitudes of the cells and bounds of the pattern. */
  z.strictObject({ kind: z.literal('projections'), goal: patternGoal, iterations: z.number().int().min(1).max(2000) }),
  /** Scatters instead of beaming: blocks of cells in a few states, chosen for the lowest peak. */
  z.strictObject({
    kind: z.literal('diffuse'),
    blockColumns: z.number().int().min(1).max(1000),
    blockRows: z.number().int().min(1).max(1000),
    states: z.number().int().min(2).max(16),
    seed: z.number().int().min(0).max(4_294_967_295),
  }),
]);

export const cells = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('ideal'), levels: z.number().int().min(2).max(4096).nullable() }),
  z.strictObject({
    kind: z.literal('edition'),
    editionId: z.uuid(),
    rule: z.enum(['nearest-phase', 'least-error', 'band-fit']),
    excludedCells: z.array(z.string().min(1).max(200)).max(10_000),
    /** Where a band fit is judged beside the design frequency; the edges of the band when absent. */
    fitFrequenciesGHz: z.array(frequencyGHz).min(1).max(8).optional(),
    /** Only so many cells are used: those nearest to as many phases evenly spaced round the circle. */
    levels: z.number().int().min(2).max(64).optional(),
    /** A change of the first parameter from a cell to its neighbour beyond this is counted. */
    neighbourStepMm: lengthMm.optional(),
  }),
  z.strictObject({
    kind: z.literal('inline'),
    cells: z
      .array(z.strictObject({ phaseDeg: z.number().min(-36_000).max(36_000), magnitude: z.number().min(0).max(1) }))
      .min(1)
      .max(10_000),
  }),
  /** Resonant cells on a guided wave: strength and phase lie on one circle. */
  z.strictObject({
    kind: z.literal('resonant'),
    rule: z.enum(['projection', 'nearest', 'phase-only']),
    /** States evenly spaced round the circle; null for a continuous tuning. */
    states: z.number().int().min(2).max(4096).nullable(),
  }),
  /** Cells that run through a sequence of states in every period, each with its own delay. */
  z.strictObject({
    kind: z.literal('modulated'),
    states: z.array(z.strictObject({ phaseDeg: z.number().min(-36_000).max(36_000), magnitude: z.number().min(0).max(1) })).min(2).max(64),
    /** Where the states change, in parts of the period: 0, rising, 1; even parts when absent. */
    edges: z.array(z.number().min(0).max(1)).min(3).max(65).optional(),
    modulationMHz: z.number().gt(0).max(10_000),
    /** The harmonic that the delays steer. */
    harmonic: z.number().int().min(-50).max(50),
  }),
]);

export const prediction = z.strictObject({
  receiveExponent: z.number().min(0).max(10),
  radiateExponent: z.number().min(0).max(10),
  /** Absent means scalar. The vector model takes the horn's whole field and the cells' 2x2 responses; it uses neither exponent. */
  model: z.enum(['scalar', 'vector']).optional(),
  /** Of the vector model: how a cell's leaving waves radiate. Absent means power waves. */
  reradiation: z.enum(['power-wave', 'aperture']).optional(),
  /** Of the vector model: the far-field factor of one cell. Absent means none. */
  cellFactor: z.enum(['none', 'normal', 'beam']).optional(),
});

export const designDocument = z.strictObject({
  schemaVersion: z.literal(1),
  requirement,
  panel,
  illumination,
  synthesis,
  cells,
  referencePhaseDeg: z.union([z.number().min(-360).max(360), z.literal('search')]),
  prediction,
});

export type DesignDocument = z.infer<typeof designDocument>;
export type Beam = z.infer<typeof beam>;
export type Requirement = z.infer<typeof requirement>;
export type Outline = z.infer<typeof outline>;
export type KeepOut = z.infer<typeof keepOut>;
export type Lattice = z.infer<typeof lattice>;
export type Panel = z.infer<typeof panel>;
export type Illumination = z.infer<typeof illumination>;
export type Synthesis = z.infer<typeof synthesis>;
export type PatternGoal = z.infer<typeof patternGoal>;
export type Cells = z.infer<typeof cells>;
export type PredictionModel = z.infer<typeof prediction>;
export type Polarisation = z.infer<typeof polarisation>;
