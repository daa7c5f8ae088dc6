import type { BeamFigures, Figure, Figures } from '../model/figures';
import type { Mask } from '../model/design-document';
import { degFromRad, radFromDeg } from '../units/angles';
import { powerRatioToDb } from '../units/decibels';
import { angleBetweenRad, anglesOf, outwardDirection, type Direction } from '../waves/conventions';
import { cutMetrics, type CutMetrics } from './cut-metrics';
import { greatCircle, visibleArcRad, type CutPlane } from './great-circle';
import { maskEnvelope, maskFacts } from './masks/mask-envelope';
import { judgeMask, type MaskOutcome } from './masks/mask-margin';
import { isNumber, noFigure, sumFigures } from './no-figure';
import { lobeRelativeTo, patternLobes, peakAnglesDeg, type PatternLobes } from './pattern-lobes';
import { directivityRatio, type RadiationPattern } from './radiation-pattern';

type FromPattern =
  | 'directivityDbi' | 'peakThetaDeg' | 'peakPhiDeg' | 'directivityAtBeamDbi' | 'gainDbi' | 'gainAtBeamDbi' | 'pointingErrorDeg'
  | 'halfPowerBeamwidthDeg' | 'sidelobeDb' | 'maskMargin' | 'maskFindings' | 'highestLobes' | 'beams';

export type PatternFigures = Pick<Figures, FromPattern> & { readonly peakUncertaintyDeg: number };

const LISTED_LOBES = 6;
const FEWEST_CUT_SAMPLES = 480;
const MOST_CUT_SAMPLES = 60_000;

export interface PatternQuery {
  readonly pattern: RadiationPattern;
  readonly beams: readonly Direction[];
  readonly mask: Mask | undefined;
  /** Gain less directivity: spillover and cell loss. */
  readonly gainOffsetDb: Figure;
  /** Of the panel: what published masks call D. */
  readonly largestDimensionM: number;
}

/** Every figure that is read off the pattern. */
export function patternFigures({ pattern, beams, mask, gainOffsetDb, largestDimensionM }: PatternQuery): PatternFigures {
  const lobes = patternLobes(pattern, beams);
  const directivityDbi = powerRatioToDb(lobes.highest.directivityRatio);
  const perBeam = beams.map((beam, i) => beamFigures(pattern, beam, lobes.ofBeams[i], gainOffsetDb));
  const [first] = perBeam;
  const [along, across] = (['along', 'across'] as const).map((plane) => planeMetrics(pattern, beams[0], plane));
  const { thetaDeg, phiDeg } = peakAnglesDeg(lobes.highest);
  return {
    directivityDbi,
    peakThetaDeg: thetaDeg,
    peakPhiDeg: phiDeg,
    directivityAtBeamDbi: first.directivityDbi,
    gainDbi: sumFigures(directivityDbi, gainOffsetDb),
    gainAtBeamDbi: first.gainDbi,
    pointingErrorDeg: first.pointingErrorDeg,
    halfPowerBeamwidthDeg: { along: along.halfPowerBeamwidthDeg, across: across.halfPowerBeamwidthDeg },
    sidelobeDb: { along: along.sidelobeDb, across: across.sidelobeDb, hemisphere: hemisphereSidelobe(lobes) },
    ...maskOutcome({ pattern, beams, mask, gainOffsetDb, largestDimensionM }, directivityDbi),
    highestLobes: lobes.others.slice(0, LISTED_LOBES).map((lobe) => lobeRelativeTo(lobe, lobes.ofBeams[0])),
    beams: perBeam,
    peakUncertaintyDeg: peakUncertaintyDeg(pattern, lobes.highest, thetaDeg),
  };
}

/** The mask is held against the gain; where that does not exist, neither does the margin. */
function maskOutcome({ pattern, beams, mask, gainOffsetDb, largestDimensionM }: PatternQuery, directivityDbi: number): MaskOutcome {
  if (mask === undefined) return { maskMargin: noFigure('no-mask', 'the requirement has no mask') };
  if (!isNumber(gainOffsetDb)) return { maskMargin: gainOffsetDb };
  const envelope = maskEnvelope(mask, maskFacts(largestDimensionM, pattern.wavenumber, directivityDbi + gainOffsetDb));
  return judgeMask({ pattern, envelope, beams, gainOffsetDb });
}

/** Share of lambda over the panel's side by which the interpolated field moves a peak: up to 256 cells a side, and beyond. */
const PEAK_SHARE = 1e-5;
const PEAK_SHARE_OF_LARGE = 1e-4;

/** How far the place of a peak may be off along theta: its last step, and what the interpolation of the field moves it. */
function peakUncertaintyDeg({ wavenumber, spectrum: { grid } }: RadiationPattern, peak: PatternLobes['highest'], thetaDeg: number): number {
  const { columnCount, rowCount, stepXM, stepYM } = grid;
  const share = Math.max(columnCount, rowCount) <= 256 ? PEAK_SHARE : PEAK_SHARE_OF_LARGE;
  const sideM = Math.min(columnCount * stepXM, rowCount * stepYM);
  const moved = (share * 2 * Math.PI) / (wavenumber * sideM);
  return Math.min(90, degFromRad((peak.lastStep + moved) / Math.max(1e-3, Math.cos(radFromDeg(thetaDeg)))));
}

function beamFigures(pattern: RadiationPattern, beam: Direction, found: PatternLobes['highest'], gainOffsetDb: Figure): BeamFigures {
  const { thetaRad, phiRad } = anglesOf(beam);
  const ratio = directivityRatio(pattern, beam);
  const directivityDbi: Figure = ratio > 0 ? powerRatioToDb(ratio) : noFigure('null', 'the pattern is zero in the wanted direction');
  const { thetaDeg, phiDeg } = peakAnglesDeg(found);
  return {
    thetaDeg: degFromRad(thetaRad),
    phiDeg: degFromRad(phiRad),
    directivityDbi,
    gainDbi: sumFigures(directivityDbi, gainOffsetDb),
    foundThetaDeg: thetaDeg,
    foundPhiDeg: phiDeg,
    pointingErrorDeg: degFromRad(angleBetweenRad(beam, outwardDirection(found.u, found.v))),
  };
}

/** Beamwidth and sidelobes on a great circle through the wanted direction; about nine samples to the narrowest lobe. */
function planeMetrics(pattern: RadiationPattern, beam: Direction, plane: CutPlane): CutMetrics {
  const { grid } = pattern.spectrum;
  const [fromRad, toRad] = visibleArcRad(beam, plane);
  const diagonalM = Math.hypot(grid.columnCount * grid.stepXM, grid.rowCount * grid.stepYM);
  const lobes = (pattern.wavenumber * diagonalM) / 2;
  if (lobes * 4 > MOST_CUT_SAMPLES) {
    const reason = noFigure('too-many-wavelengths', 'the panel is too many wavelengths across to follow every lobe of the cut');
    return { halfPowerBeamwidthDeg: reason, sidelobeDb: reason };
  }
  const at = greatCircle(beam, plane);
  const samples = Math.max(FEWEST_CUT_SAMPLES, Math.ceil(lobes * 6));
  return cutMetrics({ power: (angleRad) => directivityRatio(pattern, at(angleRad)), fromRad, toRad, samples });
}

function hemisphereSidelobe(lobes: PatternLobes): Figures['sidelobeDb']['hemisphere'] {
  if (!lobes.searched) return noFigure('too-many-wavelengths', 'the panel is too many wavelengths across to search the hemisphere');
  const [highest] = lobes.others;
  return highest ? lobeRelativeTo(highest, lobes.ofBeams[0]) : noFigure('no-sidelobe', 'the pattern has no lobe besides that of the wanted beam');
}
