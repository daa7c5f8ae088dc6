import type { NoFigure } from '../../model/figures';
import { powerRatioToDb } from '../../units/decibels';
import { hemispherePeaks } from '../hemisphere-peaks';
import { noFigure } from '../no-figure';
import type { RadiationPattern } from '../radiation-pattern';
import { refinePeak } from '../refine-peak';
import type { MaskReadings, Place } from './mask-readings';

/** More sidelobe peaks than this are not counted. */
const MOST_PEAKS = 60_000;
/** A sampled peak may stand this far below its true top, so those nearer to the deciding one are refined before they are ranked. */
const SAMPLED_SHORT_DB = 1;

export interface MaskPeaks {
  readonly judged: number;
  readonly above: number;
  /** The peak whose margin is that of the rule: as many as may pass the mask are worse. */
  readonly deciding: Place;
}

/** The margin of a rule that asks for a share of the sidelobe peaks: every local maximum beyond the first angle counts once. */
export function maskPeaks(pattern: RadiationPattern, readings: MaskReadings, leastFraction: number): MaskPeaks | NoFigure {
  const { peaks } = hemispherePeaks(pattern, MOST_PEAKS);
  if (peaks.length === MOST_PEAKS) return noFigure('too-many-lobes', `the pattern has ${MOST_PEAKS} sidelobe peaks or more, too many to count`);
  const scale = (4 * Math.PI) / pattern.radiatedPower;
  const marginOf = (u: number, v: number, ratio: number): number => {
    const off = readings.offAxisDeg(u, v);
    return off < readings.firstDeg ? Infinity : readings.levelDb(off) - powerRatioToDb(ratio) - readings.gainOffsetDb;
  };
  const judged = peaks
    .map(({ u, v, power }): Place => ({ u, v, marginDb: marginOf(u, v, power * scale) }))
    .filter(({ marginDb }) => marginDb < Infinity)
    .sort((a, b) => a.marginDb - b.marginDb);
  if (judged.length === 0) return noFigure('no-sidelobe', 'the pattern has no sidelobe peak at or beyond the first angle of the mask');
  // A count of peaks: nine tenths of ten are nine, so a product a rounding below the whole number still allows it.
  const mayPass = Math.floor((1 - leastFraction) * judged.length + 1e-9);
  const refineUpToDb = Math.max(0, judged[mayPass].marginDb) + SAMPLED_SHORT_DB;
  const refined = judged.map((place) => (place.marginDb < refineUpToDb ? refinedPlace(pattern, place, marginOf) : place)).sort((a, b) => a.marginDb - b.marginDb);
  return { judged: refined.length, above: refined.filter(({ marginDb }) => marginDb < 0).length, deciding: refined[mayPass] };
}

function refinedPlace(pattern: RadiationPattern, { u, v, marginDb }: Place, marginOf: (u: number, v: number, ratio: number) => number): Place {
  const top = refinePeak(pattern, u, v);
  const exactDb = marginOf(top.u, top.v, top.directivityRatio);
  // A climb that leaves for the wanted beam has left its lobe.
  return exactDb < Infinity ? { u: top.u, v: top.v, marginDb: exactDb } : { u, v, marginDb };
}
