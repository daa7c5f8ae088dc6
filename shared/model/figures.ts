import './zod-jitless';
import * as z from 'zod';
import { figure, noFigure } from './figure-value';
import { lawFigures } from './law-figures';
import { maskFindings, maskMargin } from './mask-figures';
import { transmissionFigures } from './transmission-figures';
import { vectorFigures } from './vector-figures';

export { figure, noFigure };

export const lobe = z.strictObject({ levelDb: z.number(), thetaDeg: z.number(), phiDeg: z.number() });

export const gratingLobe = z.strictObject({
  thetaDeg: z.number(),
  phiDeg: z.number(),
  orderX: z.number().int(),
  orderY: z.number().int(),
});

export const beamFigures = z.strictObject({
  thetaDeg: z.number(),
  phiDeg: z.number(),
  directivityDbi: figure,
  gainDbi: figure,
  /** The local maximum nearest to the wanted direction. */
  foundThetaDeg: figure,
  foundPhiDeg: figure,
  pointingErrorDeg: figure,
});

export const figures = z.strictObject({
  frequencyGHz: z.number(),
  wavelengthMm: z.number(),
  cellCount: z.number().int(),
  maxIncidenceDeg: figure,
  evanescentCells: z.number().int(),
  gratingLobes: z.array(gratingLobe),
  edgeTaperDb: figure,
  directivityDbi: figure,
  peakThetaDeg: figure,
  peakPhiDeg: figure,
  directivityAtBeamDbi: figure,
  gainDbi: figure,
  gainAtBeamDbi: figure,
  pointingErrorDeg: figure,
  halfPowerBeamwidthDeg: z.strictObject({ along: figure, across: figure }),
  sidelobeDb: z.strictObject({ along: figure, across: figure, hemisphere: z.union([lobe, noFigure]) }),
  spilloverDb: figure,
  taperDb: figure,
  phaseErrorRmsDeg: figure,
  phaseLossDb: figure,
  cellLossDb: figure,
  apertureEfficiency: figure,
  /** The reference phase in use: the number given, or the one the search found. */
  referencePhaseDeg: z.number(),
  /** Least margin to the mask over the hemisphere outside the beam's own allowance, and where. */
  maskMargin: z.union([maskMargin, noFigure]),
  /** Stretches above the mask and what its rule counts; absent where no mask was judged. */
  maskFindings: maskFindings.optional(),
  /** The highest lobes outside the wanted beam, strongest first, relative to it. */
  highestLobes: z.array(lobe),
  beams: z.array(beamFigures),
  /** Present where the vector model was used; the other figures are then of the co-polar field. */
  vector: vectorFigures.optional(),
  /** Numerical uncertainty by name of the figure. */
  uncertainty: z.record(z.string(), z.number()),
  ...lawFigures,
  ...transmissionFigures,
});

export const verdictWord = z.enum(['meets', 'falls-short', 'not-evaluated']);

/** One line of the requirement against what was computed. */
export const verdict = z.strictObject({
  line: z.enum(['gain', 'sidelobe', 'pointing', 'mask', 'cross-polar', 'cross-polar-mask', 'received-power', 'gain-over-temperature', 'eirp-density']),
  /** "at least" or "at most". */
  sense: z.enum(['at-least', 'at-most']),
  limit: z.number(),
  unit: z.string(),
  value: figure,
  /** Positive when met. */
  margin: figure,
  verdict: verdictWord,
  reason: z.string().optional(),
});

/** A remark on the design with its reason and its numbers. */
export const warning = z.strictObject({
  code: z.enum([
    'grating-lobe',
    'cell-period',
    'evanescent-beam',
    'incidence-not-covered',
    'frequency-not-covered',
    'azimuth-not-covered',
    'region-excluded',
    'image-lobe',
    'period-differs',
    'cross-response',
    'keep-out-power',
    'illumination-misses',
    'behind-panel',
    'unmodulated-lobe',
    'bounds-not-reached',
    'cross-terms',
    'polarisation',
    'provenance',
  ]),
  /** JSON pointer of the field it concerns. */
  pointer: z.string(),
  severity: z.enum(['note', 'warn', 'serious']),
  message: z.string(),
  numbers: z.record(z.string(), z.number()),
});

export type NoFigure = z.infer<typeof noFigure>;
export type Figure = z.infer<typeof figure>;
export type Lobe = z.infer<typeof lobe>;
export type GratingLobe = z.infer<typeof gratingLobe>;
export type BeamFigures = z.infer<typeof beamFigures>;
export type Figures = z.infer<typeof figures>;
export type VerdictWord = z.infer<typeof verdictWord>;
export type Verdict = z.infer<typeof verdict>;
export type Warning = z.infer<typeof warning>;
