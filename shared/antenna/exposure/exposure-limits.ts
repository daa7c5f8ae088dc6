import type { NoFigure } from '../../model/figures';
import { noFigure } from '../no-figure';

/*
 * Published limits of power density. They are shown as they were read; the limit of the place governs, and none of
 * this says that a place, a person or a transmission is safe.
 */

export interface ExposureLimit {
  readonly limitWPerM2: number;
  readonly averagingMin: number;
}

export interface ExposureLimits {
  readonly fccPublic: ExposureLimit | NoFigure;
  readonly fccOccupational: ExposureLimit | NoFigure;
  readonly icnirpPublic: ExposureLimit | NoFigure;
  readonly icnirpOccupational: ExposureLimit | NoFigure;
  readonly icnirpPublicLocal: ExposureLimit | NoFigure;
  readonly icnirpOccupationalLocal: ExposureLimit | NoFigure;
}

/** W/m^2 in 1 mW/cm^2. */
const PER_MW_CM2 = 10;

/**
 * FCC: 47 CFR 1.1310, table 1, 1.5 to 100 GHz: 1 mW/cm^2 over 30 min (general population), 5 mW/cm^2 over 6 min
 * (occupational); confirmed in public implementations.
 * ICNIRP: Guidelines for limiting exposure to electromagnetic fields, Health Physics 118(5), 483-524, 2020. Local, 6 min:
 * 55 f^-0.177 and 275 f^-0.177 W/m^2 above 6 GHz (f in GHz), 40 and 200 from 2 to 6 GHz, confirmed in a public text.
 * Whole body, 30 min: 10 and 50 W/m^2 above 2 GHz, from memory. Checks rf-01, rf-02.
 */
export function exposureLimits(frequencyHz: number): ExposureLimits {
  const ghz = frequencyHz / 1e9;
  const outside = noFigure('outside-table', `the table does not hold ${Number(ghz.toPrecision(6))} GHz`);
  const within = (low: number, high: number, limitWPerM2: number, averagingMin: number): ExposureLimit | NoFigure =>
    ghz > low && ghz <= high ? { limitWPerM2, averagingMin } : outside;
  const local = (base: number, below6GHz: number): ExposureLimit | NoFigure => within(2, 300, ghz > 6 ? base * Math.pow(ghz, -0.177) : below6GHz, 6);
  return {
    fccPublic: within(1.5, 100, 1 * PER_MW_CM2, 30),
    fccOccupational: within(1.5, 100, 5 * PER_MW_CM2, 6),
    icnirpPublic: within(2, 300, 10, 30),
    icnirpOccupational: within(2, 300, 50, 30),
    icnirpPublicLocal: local(55, 40),
    icnirpOccupationalLocal: local(275, 200),
  };
}
