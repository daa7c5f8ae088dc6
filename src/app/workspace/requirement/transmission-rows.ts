import type { Figure, Figures, NoFigure } from '../../../../shared/model/figures';
import type { ExposureFigures, ExposureLimit } from '../../../../shared/model/transmission-figures';
import { figureText } from '../strip-figures';

export interface FactRow {
  readonly name: string;
  readonly value: string;
}

export interface LimitRow {
  readonly source: string;
  readonly audience: string;
  readonly limit: string;
  readonly averaging: string;
  readonly distance: string;
  /** Why there is no distance. */
  readonly note: string | null;
}

/** Unbroken space between number and unit. */
const UNBROKEN = '\u00a0';

/** A figure with its unit, or the reason why there is none. */
export function withUnit(value: Figure | undefined, digits: number, unit: string): string {
  if (value === undefined) return '–';
  return typeof value === 'number' ? `${figureText(value, digits)}${UNBROKEN}${unit}` : value.reason;
}

/** Three significant digits: an estimate claims no more. */
export function estimateText(value: number, unit: string): string {
  if (value === 0) return `0${UNBROKEN}${unit}`;
  const digits = Math.max(0, 2 - Math.floor(Math.log10(Math.abs(value))));
  return `${figureText(Number(value.toPrecision(3)), Math.min(6, digits))}${UNBROKEN}${unit}`;
}

const isReason = (value: object): value is NoFigure => 'reason' in value;

export function transmitterRows({ eirpDbw, eirpDensityDbw }: Figures): readonly FactRow[] {
  return [
    { name: 'EIRP in the beam', value: withUnit(eirpDbw, 2, 'dBW') },
    ...(eirpDensityDbw === undefined ? [] : [{ name: 'EIRP density at the peak', value: withUnit(eirpDensityDbw, 2, 'dBW') }]),
  ];
}

const LIMITS: readonly (readonly [key: 'fccPublic' | 'fccOccupational' | 'icnirpPublic' | 'icnirpOccupational' | 'icnirpPublicLocal' | 'icnirpOccupationalLocal', source: string, audience: string])[] = [
  ['fccPublic', 'FCC 47 CFR 1.1310', 'public'],
  ['fccOccupational', 'FCC 47 CFR 1.1310', 'occupational'],
  ['icnirpPublic', 'ICNIRP 2020, whole body', 'public'],
  ['icnirpOccupational', 'ICNIRP 2020, whole body', 'occupational'],
  ['icnirpPublicLocal', 'ICNIRP 2020, local', 'public'],
  ['icnirpOccupationalLocal', 'ICNIRP 2020, local', 'occupational'],
];

/** Every published limit with the distance on the axis from which the estimate stays at or below it. */
export function limitRows(exposure: ExposureFigures): readonly LimitRow[] {
  return LIMITS.map(([key, source, audience]) => limitRow(exposure[key], source, audience));
}

function limitRow(limit: ExposureLimit | NoFigure, source: string, audience: string): LimitRow {
  if (isReason(limit)) return { source, audience, limit: '–', averaging: '–', distance: '–', note: limit.reason };
  const { limitWPerM2, averagingMin, distanceM } = limit;
  const told = { source, audience, limit: estimateText(limitWPerM2, 'W/m²'), averaging: `${averagingMin}${UNBROKEN}min` };
  if (typeof distanceM !== 'number') return { ...told, distance: '–', note: distanceM.reason };
  return { ...told, distance: estimateText(distanceM, 'm'), note: null };
}

export function zoneRows(exposure: ExposureFigures): readonly FactRow[] {
  const { averagePowerW, surfaceWPerM2, nearFieldWPerM2, nearFieldEndM, farFieldFromM, feedSpaceWPerM2, focusWPerM2 } = exposure;
  const density = (figure: Figure): string => (typeof figure === 'number' ? estimateText(figure, 'W/m²') : figure.reason);
  return [
    { name: 'Mean power to the antenna', value: estimateText(averagePowerW, 'W') },
    { name: 'At the surface, 4P/A', value: estimateText(surfaceWPerM2, 'W/m²') },
    { name: `Near field, to ${estimateText(nearFieldEndM, 'm')}`, value: estimateText(nearFieldWPerM2, 'W/m²') },
    { name: 'Far field from', value: estimateText(farFieldFromM, 'm') },
    { name: 'Between horn and panel', value: density(feedSpaceWPerM2) },
    ...(focusWPerM2 === undefined ? [] : [{ name: 'At the focus', value: density(focusWPerM2) }]),
  ];
}

export function linkRows({ link }: Figures): readonly FactRow[] {
  if (link === undefined) return [];
  if (isReason(link)) return [{ name: 'Link', value: link.reason }];
  const { receivedDbm, freeSpaceLossDb, crossSectionDbsm, farFieldFromM } = link;
  return [
    ...freeSpaceLossDb.map((loss, i) => ({ name: freeSpaceLossDb.length > 1 ? `Free-space loss, hop ${i + 1}` : 'Free-space loss', value: withUnit(loss, 2, 'dB') })),
    ...(crossSectionDbsm === undefined ? [] : [{ name: 'Cross-section of the panel', value: withUnit(crossSectionDbsm, 2, 'dBsm') }]),
    { name: 'Far field of the panel from', value: estimateText(farFieldFromM, 'm') },
    { name: 'Received power', value: withUnit(receivedDbm, 2, 'dBm') },
  ];
}

export function receiverRows({ systemTemperatureK, gainOverTemperatureDbPerK }: Figures): readonly FactRow[] {
  return [
    { name: 'System temperature', value: withUnit(systemTemperatureK, 1, 'K') },
    { name: 'G/T at the amplifier', value: withUnit(gainOverTemperatureDbPerK, 2, 'dB/K') },
  ];
}
