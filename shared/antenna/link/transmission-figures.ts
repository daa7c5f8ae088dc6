import type { Requirement } from '../../model/design-document';
import type { Figure, Figures } from '../../model/figures';
import type { Receiver, Transmitter } from '../../model/transmission';
import type { Direction } from '../../waves/conventions';
import { exposureEstimate } from '../exposure/exposure-estimate';
import { isReason } from '../exposure/exposure-readings';
import type { IlluminatedState } from '../illuminated-state';
import { maskEnvelope, maskFacts } from '../masks/mask-envelope';
import { judgeMask, type MaskQuery } from '../masks/mask-margin';
import { isNumber, noFigure, sumFigures } from '../no-figure';
import { largestDimensionM } from '../outline';
import type { RadiationPattern } from '../radiation-pattern';
import { eirpDbw, eirpDensityOffsetDb } from './free-space';
import { linkFigures } from './link-figures';
import { gainOverTemperatureDbPerK, REFERENCE_TEMPERATURE_K, systemTemperatureK } from './receiver-noise';

type TransmissionFigures = Pick<
  Figures,
  'eirpDbw' | 'eirpDensityDbw' | 'eirpDensityMargin' | 'exposure' | 'link' | 'systemTemperatureK' | 'gainOverTemperatureDbPerK' | 'crossPolarMaskMargin'
>;

/** Gain figures that the budgets start from. */
export interface GainFound {
  readonly gainDbi: Figure;
  readonly gainAtBeamDbi: Figure;
  /** The cross-polar pattern and its gain less directivity, where the model has one. */
  readonly cross?: { readonly pattern: RadiationPattern; readonly gainOffsetDb: Figure };
}

/** 4 kHz: the width in which densities are commonly told. */
const USUAL_REFERENCE_HZ = 4000;
const PLANE_WAVE = noFigure('plane-wave', 'the panel is lit by a plane wave and has no transmitter or receiver of its own');

/** What follows from transmitter, link, receiver and cross-polar mask of the requirement; nothing where it has none of them. */
export function transmissionFigures(state: IlluminatedState, found: GainFound): TransmissionFigures {
  const { requirement } = state.placed.design;
  const { transmitter, link, receiver } = requirement;
  return {
    ...(transmitter === undefined ? {} : transmitterFigures(state, transmitter, found)),
    ...(link === undefined ? {} : { link: linkFigures(state, found.gainAtBeamDbi) }),
    ...(receiver === undefined ? {} : receiverFigures(state, receiver, found.gainAtBeamDbi)),
    ...(requirement.crossPolarMask === undefined ? {} : { crossPolarMaskMargin: crossPolarMargin(state, requirement.crossPolarMask, found) }),
  };
}

function hasOwnFeed({ placed }: IlluminatedState): boolean {
  return placed.design.illumination.kind !== 'plane-wave';
}

function transmitterFigures(state: IlluminatedState, transmitter: Transmitter, found: GainFound): TransmissionFigures {
  if (!hasOwnFeed(state)) return { eirpDbw: PLANE_WAVE, exposure: PLANE_WAVE, ...(transmitter.densityMask === undefined ? {} : { eirpDensityMargin: PLANE_WAVE }) };
  const { powerW, lossDb = 0, occupiedBandwidthGHz, densityMask } = transmitter;
  const atBeam = isNumber(found.gainAtBeamDbi) ? eirpDbw(powerW, lossDb, found.gainAtBeamDbi) : found.gainAtBeamDbi;
  const density = occupiedBandwidthGHz === undefined ? {} : { eirpDensityDbw: sumFigures(found.gainDbi, densityOffsetDb(transmitter, occupiedBandwidthGHz)) };
  return {
    eirpDbw: atBeam,
    ...density,
    ...(densityMask === undefined ? {} : { eirpDensityMargin: densityMargin(state, transmitter, found.gainDbi) }),
    exposure: isNumber(found.gainDbi) ? exposureEstimate(state, transmitter, found.gainDbi) : found.gainDbi,
  };
}

function densityOffsetDb({ powerW, lossDb = 0, referenceBandwidthGHz }: Transmitter, occupiedBandwidthGHz: number): number {
  const referenceHz = referenceBandwidthGHz === undefined ? USUAL_REFERENCE_HZ : referenceBandwidthGHz * 1e9;
  return eirpDensityOffsetDb(powerW, lossDb, occupiedBandwidthGHz * 1e9, referenceHz);
}

function densityMargin(state: IlluminatedState, transmitter: Transmitter, gainDbi: Figure): NonNullable<Figures['eirpDensityMargin']> {
  const { densityMask, occupiedBandwidthGHz } = transmitter;
  if (densityMask === undefined || occupiedBandwidthGHz === undefined) return noFigure('no-bandwidth', 'an EIRP density needs the occupied bandwidth');
  return marginOf(state, densityMask, { pattern: state.pattern, gainOffsetDb: sumFigures(state.gainOffsetDb, densityOffsetDb(transmitter, occupiedBandwidthGHz)), gainDbi });
}

function crossPolarMargin(state: IlluminatedState, mask: NonNullable<Requirement['crossPolarMask']>, { cross, gainDbi }: GainFound): NonNullable<Figures['crossPolarMaskMargin']> {
  if (cross === undefined) return noFigure('scalar-model', 'the scalar prediction has no cross-polar field');
  const margin = marginOf(state, mask, { ...cross, gainDbi });
  return isReason(margin) ? margin : { marginDb: margin.marginDb, thetaDeg: margin.thetaDeg, phiDeg: margin.phiDeg };
}

interface Levels {
  readonly pattern: RadiationPattern;
  readonly gainOffsetDb: Figure;
  readonly gainDbi: Figure;
}

function marginOf(state: IlluminatedState, mask: Requirement['crossPolarMask'] & object, { pattern, gainOffsetDb, gainDbi }: Levels): NonNullable<Figures['eirpDensityMargin']> {
  if (!isNumber(gainOffsetDb)) return gainOffsetDb;
  if (!isNumber(gainDbi)) return gainDbi;
  const { si } = state.placed;
  const beams: readonly Direction[] = si.beams.map((beam) => beam.direction);
  const query: MaskQuery = { pattern, beams, gainOffsetDb, envelope: maskEnvelope(mask, maskFacts(largestDimensionM(si.panel.outline), state.wavenumber, gainDbi)) };
  const { maskMargin } = judgeMask(query);
  if (isReason(maskMargin)) return maskMargin;
  const { marginDb, thetaDeg, phiDeg, offAxisDeg = 0 } = maskMargin;
  return { marginDb, thetaDeg, phiDeg, offAxisDeg };
}

function receiverFigures(state: IlluminatedState, receiver: Receiver, gainAtBeamDbi: Figure): TransmissionFigures {
  const { antennaTemperatureK, lineLossDb, noiseFigureDb } = receiver;
  const chain = { antennaTemperatureK, lineLossDb, noiseFigureDb, lineTemperatureK: REFERENCE_TEMPERATURE_K };
  if (!hasOwnFeed(state)) return { systemTemperatureK: systemTemperatureK(chain), gainOverTemperatureDbPerK: PLANE_WAVE };
  return {
    systemTemperatureK: systemTemperatureK(chain),
    gainOverTemperatureDbPerK: isNumber(gainAtBeamDbi) ? gainOverTemperatureDbPerK(gainAtBeamDbi, chain) : gainAtBeamDbi,
  };
}
