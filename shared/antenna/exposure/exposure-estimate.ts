import type { Figure, NoFigure } from '../../model/figures';
import type { Transmitter } from '../../model/transmission';
import type { ExposureFigures, ExposureLimit as LimitFigures } from '../../model/transmission-figures';
import { dbToPowerRatio } from '../../units/decibels';
import { hornPower } from '../horn-field';
import type { IlluminatedState } from '../illuminated-state';
import { noFigure } from '../no-figure';
import { largestDimensionM } from '../outline';
import { distanceToLimitM, exposureZones, farFieldDensityWPerM2, type RadiatingAperture } from './aperture-exposure';
import { exposureLimits, type ExposureLimit } from './exposure-limits';
import { focusDensityWPerM2 } from './focus-exposure';

/**
 * Power densities in front of a transmitting panel and the distances at which published limits are met, by the aperture
 * model: the main beam alone, at the time average of the entered power. An estimate, not a survey.
 */
export function exposureEstimate(state: IlluminatedState, transmitter: Transmitter, gainDbi: number): ExposureFigures {
  const { placed, wavelengthM, frequencyHz } = state;
  const { powerW, lossDb = 0, dutyPercent = 100 } = transmitter;
  const averagePowerW = (powerW * dutyPercent) / 100 / dbToPowerRatio(lossDb);
  const aperture: RadiatingAperture = {
    powerW: averagePowerW,
    areaM2: placed.lattice.count * placed.lattice.cellAreaM2,
    largestDimensionM: largestDimensionM(placed.si.panel.outline),
    gainRatio: dbToPowerRatio(gainDbi),
    wavelengthM,
  };
  const focuses = placed.si.synthesis.kind === 'focus';
  const limits = exposureLimits(frequencyHz);
  const told = (limit: ExposureLimit | NoFigure): LimitFigures | NoFigure => ('reason' in limit ? limit : { ...limit, distanceM: focuses ? FOCUSED : distanceToLimitM(aperture, limit.limitWPerM2) });
  return {
    averagePowerW,
    ...exposureZones(aperture),
    feedSpaceWPerM2: feedSpaceWPerM2(state, averagePowerW),
    ...(focuses ? { focusWPerM2: focusDensityWPerM2(state, averagePowerW) } : {}),
    fccPublic: told(limits.fccPublic),
    fccOccupational: told(limits.fccOccupational),
    icnirpPublic: told(limits.icnirpPublic),
    icnirpOccupational: told(limits.icnirpOccupational),
    icnirpPublicLocal: told(limits.icnirpPublicLocal),
    icnirpOccupationalLocal: told(limits.icnirpOccupationalLocal),
  };
}

const FOCUSED = noFigure('focused', 'the panel focuses in its near field, where the aperture formula does not hold');

/** P G / (4 pi r^2) of the horn where its axis meets its aim. */
function feedSpaceWPerM2({ placed: { si } }: IlluminatedState, powerW: number): Figure {
  const { illumination } = si;
  if (illumination.kind !== 'horn') return noFigure('no-horn', 'the panel is not fed through open space');
  const { position, aim } = illumination;
  const distanceM = Math.hypot(position.xM - aim.xM, position.yM - aim.yM, position.zM - aim.zM);
  return farFieldDensityWPerM2(powerW, (4 * Math.PI) / hornPower(illumination), distanceM);
}
