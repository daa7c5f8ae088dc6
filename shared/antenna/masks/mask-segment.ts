/*
 * What every mask is made of. Angles are degrees off the wanted beam and levels dB, because published envelopes are
 * written in them.
 */

/** What an envelope may depend on besides the angle. */
export interface MaskFacts {
  /** Largest dimension of the panel over the wavelength: the D of the published formulas. */
  readonly apertureOverWavelength: number;
  readonly frequencyHz: number;
  /** Gain at the highest lobe. */
  readonly peakGainDbi: number;
}

/** One stretch of an envelope. */
export interface MaskSegment {
  readonly fromDeg: number;
  /** Belongs to the next segment where that begins at the same angle. */
  readonly toDeg: number;
  readonly levelDb: (offAxisDeg: number) => number;
  /** Where a line bends, for segments made of straight lines. */
  readonly cornersDeg?: readonly number[];
}

/** When a pattern keeps an envelope. */
export type MaskRule =
  | { readonly kind: 'every-direction' }
  /** At least this share of the sidelobe peaks stands at or below the envelope. */
  | { readonly kind: 'share-of-peaks'; readonly leastFraction: number }
  /** Between the angles up to `excessDb` above it in this share of them, and up to `spilloverDb` in a declared spillover region. */
  | { readonly kind: 'allowance'; readonly excessDb: number; readonly angleFraction: number; readonly fromDeg: number; readonly toDeg: number; readonly spilloverDb: number };

export const EVERY_DIRECTION: MaskRule = { kind: 'every-direction' };
