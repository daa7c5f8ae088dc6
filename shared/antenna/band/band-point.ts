import type { BandParameters, BandPoint, SpatialPoint } from '../../model/band-run';
import type { Figure, Figures } from '../../model/figures';
import { degFromRad, radFromDeg } from '../../units/angles';
import { directionOf } from '../../waves/conventions';
import { isNumber } from '../no-figure';
import type { PlacedDesign } from '../place-cells';
import { predictPlaced } from '../predict-design';
import { relitDesign } from './phase-centre';
import { spatialDesign } from './spatial-part';
import { squintOf } from './squint';

/** What the placed cells do at one frequency: gain where it is wanted and where it is highest, pointing, sidelobe, verdicts. */
export function bandPoint(placed: PlacedDesign, parameters: Pick<BandParameters, 'phaseCentre' | 'spatialPart'>, frequencyGHz: number): BandPoint {
  const lit = relitDesign(placed, parameters, frequencyGHz);
  const { figures, verdicts, warnings } = predictPlaced(lit, { frequencyGHz, include: {} });
  const { hemisphere } = figures.sidelobeDb;
  return {
    frequencyGHz,
    gainAtBeamDbi: figures.gainAtBeamDbi,
    gainDbi: figures.gainDbi,
    directivityAtBeamDbi: figures.directivityAtBeamDbi,
    pointingErrorDeg: figures.pointingErrorDeg,
    ...squintFigures(figures),
    sidelobeDb: levelOf(hemisphere),
    beamwidthAlongDeg: figures.halfPowerBeamwidthDeg.along,
    beamwidthAcrossDeg: figures.halfPowerBeamwidthDeg.across,
    cellLossDb: figures.cellLossDb,
    phaseErrorRmsDeg: figures.phaseErrorRmsDeg,
    verdicts,
    covered: !warnings.some(({ code }) => code === 'frequency-not-covered'),
    ...(parameters.spatialPart === true ? { spatial: spatialPoint(lit, frequencyGHz) } : {}),
  };
}

function spatialPoint(lit: PlacedDesign, frequencyGHz: number): SpatialPoint {
  const { gainAtBeamDbi, gainDbi, pointingErrorDeg } = predictPlaced(spatialDesign(lit), { frequencyGHz, include: {} }).figures;
  return { gainAtBeamDbi, gainDbi, pointingErrorDeg };
}

/** Of the first wanted beam. */
function squintFigures({ beams }: Figures): { squintAlongDeg: Figure; squintAcrossDeg: Figure } {
  const { thetaDeg, phiDeg, foundThetaDeg, foundPhiDeg } = beams[0];
  if (!isNumber(foundThetaDeg)) return { squintAlongDeg: foundThetaDeg, squintAcrossDeg: foundThetaDeg };
  if (!isNumber(foundPhiDeg)) return { squintAlongDeg: foundPhiDeg, squintAcrossDeg: foundPhiDeg };
  const wanted = directionOf(radFromDeg(thetaDeg), radFromDeg(phiDeg));
  const { alongRad, acrossRad } = squintOf(wanted, directionOf(radFromDeg(foundThetaDeg), radFromDeg(foundPhiDeg)));
  return { squintAlongDeg: degFromRad(alongRad), squintAcrossDeg: degFromRad(acrossRad) };
}

function levelOf(hemisphere: Figures['sidelobeDb']['hemisphere']): Figure {
  const level: unknown = 'levelDb' in hemisphere ? hemisphere.levelDb : undefined;
  if (typeof level === 'number') return level;
  return 'reason' in hemisphere ? { kind: hemisphere.kind, reason: hemisphere.reason } : { kind: 'no-figure', reason: 'no value' };
}
