import type { ToleranceReading } from '../../model/tolerance-run';
import { degFromRad } from '../../units/angles';
import { dbToPowerRatio, powerRatioToDb } from '../../units/decibels';
import type { Direction } from '../../waves/conventions';
import type { ApertureField } from '../aperture-field';
import { apertureSpectrum, type ApertureSpectrum } from '../aperture-spectrum';
import { farFieldOf } from '../far-field';
import type { IlluminatedState } from '../illuminated-state';
import { maskEnvelope, maskFacts } from '../masks/mask-envelope';
import { judgeMask } from '../masks/mask-margin';
import { isNumber } from '../no-figure';
import { largestDimensionM } from '../outline';
import { flooredDbi } from '../pattern-cut';
import type { PlacedDesign } from '../place-cells';
import { directivityRatio, elementPower, type RadiationPattern } from '../radiation-pattern';
import { interpolatedDirections } from '../interpolated-far-field';
import { pointingErrorRad, trialLobes } from './trial-lobes';

/** Two-dimensional transform of an aperture; a faster one may take the place of {@link apertureSpectrum}. */
export type SpectrumOf = (field: ApertureField) => ApertureSpectrum;

/** Reads the requirement's measures off the field of a panel made. */
export interface TrialGauge {
  /** Pattern whose directivity ratio is the absolute gain: the power that the feed radiates is the same in every trial. */
  patternOf(field: ApertureField): RadiationPattern;
  read(pattern: RadiationPattern): ToleranceReading;
  /** Reads gains in dBi at fixed directions in front of the panel, not below the floor. */
  gainsReader(directions: readonly Direction[]): (pattern: RadiationPattern) => Float64Array;
}

/**
 * `nominal` is the design as drawn, `drawn` its aperture field. Gain is absolute, |F|^2 over the power of the feed: a panel that
 * receives less radiates less. The constant is that of the nominal prediction, so that the undisturbed trial has its gain.
 */
export function trialGauge(nominal: IlluminatedState, drawn: ApertureField, spectrumOf: SpectrumOf = apertureSpectrum): TrialGauge {
  const { placed, wavenumber, pattern } = nominal;
  const { radiateExponent, beams } = placed.si;
  const directions = beams.map(({ direction }) => direction);
  const patternWith = (field: ApertureField, radiatedPower: number): RadiationPattern => {
    const spectrum = spectrumOf(field);
    return { wavenumber, radiateExponent, spectrum, farField: farFieldOf(field, spectrum, wavenumber), radiatedPower };
  };
  const gainPower = directivityRatio(patternWith(drawn, 1), directions[0]) / nominalGainRatio(nominal, directions[0]);
  const maskMarginOf = maskReader(placed, directions);
  return {
    patternOf: (field) => patternWith(field, gainPower),
    read: (trial) => readPattern(trial, directions, maskMarginOf),
    gainsReader: (places) => gainsReader(pattern, places),
  };
}

function nominalGainRatio({ pattern, gainOffsetDb }: IlluminatedState, beam: Direction): number {
  return isNumber(gainOffsetDb) ? directivityRatio(pattern, beam) * dbToPowerRatio(gainOffsetDb) : NaN;
}

/** False where the design radiates nothing towards its first beam, so that no trial could be read. */
export function isReadable({ gainOffsetDb, pattern, placed }: IlluminatedState): boolean {
  return isNumber(gainOffsetDb) && pattern.radiatedPower > 0 && directivityRatio(pattern, placed.si.beams[0].direction) > 0;
}

function gainsReader({ spectrum, wavenumber, radiateExponent }: RadiationPattern, directions: readonly Direction[]): (pattern: RadiationPattern) => Float64Array {
  const powersOf = interpolatedDirections(spectrum, wavenumber, directions);
  const element = directions.map(({ w }) => 4 * Math.PI * elementPower(Math.max(0, w), radiateExponent));
  return (pattern) => {
    const powers = new Float64Array(directions.length);
    powersOf(pattern.spectrum, powers);
    return powers.map((power, i) => flooredDbi((power * element[i]) / pattern.radiatedPower));
  };
}

type MaskReader = (pattern: RadiationPattern, highestRatio: number) => number | null;

/** Margin to the mask of the requirement; none where there is no mask or it cannot be judged. */
function maskReader({ design, si }: PlacedDesign, beams: readonly Direction[]): MaskReader {
  const { mask } = design.requirement;
  if (mask === undefined) return () => null;
  const dimensionM = largestDimensionM(si.panel.outline);
  return (pattern, highestRatio) => {
    const envelope = maskEnvelope(mask, maskFacts(dimensionM, pattern.wavenumber, flooredDbi(highestRatio)));
    const { maskMargin } = judgeMask({ pattern, envelope, beams, gainOffsetDb: 0 });
    return 'marginDb' in maskMargin && typeof maskMargin.marginDb === 'number' ? maskMargin.marginDb : null;
  };
}

function readPattern(pattern: RadiationPattern, beams: readonly Direction[], maskMarginOf: MaskReader): ToleranceReading {
  const { ofBeams, highestOther } = trialLobes(pattern, beams);
  const [first] = ofBeams;
  const highestRatio = Math.max(highestOther?.directivityRatio ?? 0, ...ofBeams.map((top) => top.directivityRatio));
  return {
    gainDbi: Math.min(...beams.map((beam) => flooredDbi(directivityRatio(pattern, beam)))),
    sidelobeDb: highestOther === null ? null : powerRatioToDb(highestOther.directivityRatio / first.directivityRatio),
    pointingDeg: degFromRad(Math.max(...ofBeams.map((top, i) => pointingErrorRad(beams[i], top)))),
    maskMarginDb: maskMarginOf(pattern, highestRatio),
  };
}
