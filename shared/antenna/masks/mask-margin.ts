import type { Figures, NoFigure } from '../../model/figures';
import type { MaskFindings } from '../../model/mask-figures';
import { degFromRad } from '../../units/angles';
import { anglesOf, outwardDirection, type Direction } from '../../waves/conventions';
import { MOST_SAMPLES, sampleCount, sampleGrid } from '../hemisphere-peaks';
import { noFigure } from '../no-figure';
import type { RadiationPattern } from '../radiation-pattern';
import { maskFirstDeg, type MaskEnvelope } from './mask-envelope';
import { maskPeaks } from './mask-peaks';
import { maskReadings, type MaskReadings, type Place } from './mask-readings';
import { angleShareAbove, levelOfShare, maskStretches, sweepMask } from './mask-sweep';

export interface MaskQuery {
  readonly pattern: RadiationPattern;
  /** The envelope, or why there is none. */
  readonly envelope: MaskEnvelope | NoFigure;
  readonly beams: readonly Direction[];
  /** Gain less directivity. */
  readonly gainOffsetDb: number;
}

export interface MaskOutcome {
  readonly maskMargin: Figures['maskMargin'];
  /** Absent where nothing was judged. */
  readonly maskFindings?: MaskFindings;
}

/** Listed stretches above a mask, the worst ones. */
const LISTED = 20;

/**
 * Distance of the gain below a mask over the hemisphere, from the mask's first angle off the wanted beam outwards (off
 * the nearest of several), by the rule of the mask: positive where it is kept. With it every stretch of angles in which
 * the highest level of all directions at that angle stands above the mask.
 */
export function judgeMask(query: MaskQuery): MaskOutcome {
  const { pattern, envelope } = query;
  if ('reason' in envelope) return { maskMargin: envelope };
  const samples = sampleGrid(pattern);
  if (sampleCount(samples) > MOST_SAMPLES) return { maskMargin: noFigure('too-many-wavelengths', 'the panel is too many wavelengths across to search the hemisphere') };
  const readings = maskReadings({ ...query, envelope });
  const sweep = sweepMask(pattern, samples, readings);
  if (sweep.worst.length === 0) return { maskMargin: noFigure('mask-outside', 'no direction of the hemisphere lies at or beyond the first angle of the mask') };
  const stretches = maskStretches(sweep.rings, readings, samples);
  const { rule } = envelope;
  const peaks = rule.kind === 'share-of-peaks' ? maskPeaks(pattern, readings, rule.leastFraction) : null;
  if (peaks !== null && 'reason' in peaks) return { maskMargin: peaks };
  const least = peaks === null ? sweep.worst[0] : peaks.deciding;
  const shareMarginDb = rule.kind === 'allowance' ? -levelOfShare(sweep.rings, rule) : Infinity;
  return {
    maskMargin: { ...marginAt(least, readings), marginDb: Math.min(least.marginDb, shareMarginDb) },
    maskFindings: {
      judgedFromDeg: maskFirstDeg(envelope),
      violationCount: stretches.length,
      violations: [...stretches].sort((a, b) => b.excessDb - a.excessDb).slice(0, LISTED).sort((a, b) => a.fromDeg - b.fromDeg),
      ...(peaks === null ? {} : { peaksJudged: peaks.judged, peaksAbove: peaks.above }),
      ...(rule.kind === 'allowance' ? { angleFractionAbove: angleShareAbove(sweep.rings, rule, 0) } : {}),
    },
  };
}

function marginAt({ u, v, marginDb }: Place, { offAxisDeg, gainDbi, levelDb }: MaskReadings) {
  const { thetaRad, phiRad } = anglesOf(outwardDirection(u, v));
  const off = offAxisDeg(u, v);
  return { marginDb, thetaDeg: degFromRad(thetaRad), phiDeg: degFromRad(phiRad), offAxisDeg: off, levelDbi: gainDbi(u, v), allowedDbi: levelDb(off) };
}
