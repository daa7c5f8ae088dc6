import { SPEED_OF_LIGHT_M_PER_S } from '../../units/constants';
import { powerRatioToDb } from '../../units/decibels';

/**
 * Free-space loss 20 log(4 pi d / lambda) between isotropic antennas, dB; 92.448 + 20 log(f/GHz) + 20 log(d/km).
 * Valid in the far field of both antennas. Source: H. T. Friis, A note on a simple transmission formula, Proc. IRE
 * 34(5), 254-256, 1946 (from memory). Check link-01.
 */
export function freeSpaceLossDb(frequencyHz: number, distanceM: number): number {
  return 2 * powerRatioToDb((4 * Math.PI * distanceM * frequencyHz) / SPEED_OF_LIGHT_M_PER_S);
}

/** The terms of one hop, each in its usual unit. */
export interface Hop {
  readonly powerW: number;
  readonly gainsDbi: readonly number[];
  readonly lossesDb: readonly number[];
}

const MILLIWATTS_PER_WATT = 1000;

/** Received power in dBm: 10 log P/mW plus gains less losses. */
export function receivedPowerDbm({ powerW, gainsDbi, lossesDb }: Hop): number {
  const sum = (terms: readonly number[]): number => terms.reduce((total, term) => total + term, 0);
  return powerRatioToDb(powerW * MILLIWATTS_PER_WATT) + sum(gainsDbi) - sum(lossesDb);
}

/** EIRP in dBW: transmitter power less line loss plus gain. */
export function eirpDbw(powerW: number, lossDb: number, gainDbi: number): number {
  return powerRatioToDb(powerW) - lossDb + gainDbi;
}

/**
 * What turns gain into EIRP density: 10 log P - L - 10 log(BW/B_ref), dBW in the reference bandwidth, for a spectrum
 * that is flat over the occupied bandwidth. Check link-22.
 */
export function eirpDensityOffsetDb(powerW: number, lossDb: number, occupiedHz: number, referenceHz: number): number {
  return powerRatioToDb(powerW) - lossDb - powerRatioToDb(occupiedHz / referenceHz);
}
