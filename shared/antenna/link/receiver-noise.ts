import { dbToPowerRatio, powerRatioToDb } from '../../units/decibels';

/** Reference temperature of noise figures (IEEE, from memory), K. */
export const REFERENCE_TEMPERATURE_K = 290;

export interface NoiseChain {
  readonly antennaTemperatureK: number;
  readonly lineLossDb: number;
  /** Physical temperature of the line. */
  readonly lineTemperatureK: number;
  readonly noiseFigureDb: number;
}

/**
 * System noise temperature at the input of the amplifier: T = Ta/L + Tline (1 - 1/L) + 290 (F - 1), K.
 * Source: H. T. Friis, Noise figures of radio receivers, Proc. IRE 32(7), 1944 (from memory). Check link-02.
 */
export function systemTemperatureK({ antennaTemperatureK, lineLossDb, lineTemperatureK, noiseFigureDb }: NoiseChain): number {
  const loss = dbToPowerRatio(lineLossDb);
  return antennaTemperatureK / loss + lineTemperatureK * (1 - 1 / loss) + REFERENCE_TEMPERATURE_K * (dbToPowerRatio(noiseFigureDb) - 1);
}

/** G/T at the input of the amplifier: gain less line loss less 10 log T, dB/K. Check link-02. */
export function gainOverTemperatureDbPerK(gainDbi: number, chain: NoiseChain): number {
  return gainDbi - chain.lineLossDb - powerRatioToDb(systemTemperatureK(chain));
}

/** Noise power kTB in dBm. k is exact by definition of the kelvin (SI Brochure, 9th ed., 2019). */
export function noisePowerDbm(temperatureK: number, bandwidthHz: number): number {
  const boltzmannJPerK = 1.380649e-23;
  return powerRatioToDb(boltzmannJPerK * temperatureK * bandwidthHz * 1000);
}
