import './zod-jitless';
import * as z from 'zod';
import { figure, noFigure } from './figure-value';

/** One published limit and the distance on the axis from which the estimate stays at or below it. */
export const exposureLimit = z.strictObject({
  limitWPerM2: z.number(),
  averagingMin: z.number(),
  /** 0 where the near-field maximum is at or below the limit. */
  distanceM: figure,
});

export const exposureFigures = z.strictObject({
  averagePowerW: z.number(),
  /** 4 P / A, the most that can stand in front of the aperture itself. */
  surfaceWPerM2: z.number(),
  nearFieldWPerM2: z.number(),
  nearFieldEndM: z.number(),
  farFieldFromM: z.number(),
  /** P G / (4 pi r^2) of the horn at the point of the panel it is aimed at. */
  feedSpaceWPerM2: figure,
  /** At the focus of a panel that focuses. */
  focusWPerM2: figure.optional(),
  fccPublic: z.union([exposureLimit, noFigure]),
  fccOccupational: z.union([exposureLimit, noFigure]),
  icnirpPublic: z.union([exposureLimit, noFigure]),
  icnirpOccupational: z.union([exposureLimit, noFigure]),
  icnirpPublicLocal: z.union([exposureLimit, noFigure]),
  icnirpOccupationalLocal: z.union([exposureLimit, noFigure]),
});

export const linkFigures = z.strictObject({
  receivedDbm: figure,
  /** Of each hop. */
  freeSpaceLossDb: z.array(z.number()),
  /** Bistatic radar cross-section of a relaying panel, in dB over 1 m^2. */
  crossSectionDbsm: figure.optional(),
  /** Twice the square of the largest dimension over the wavelength. */
  farFieldFromM: z.number(),
});

/** What follows from transmitter, link and receiver; each absent where the requirement has none. */
export const transmissionFigures = {
  /** At the first wanted beam. */
  eirpDbw: figure.optional(),
  /** At the highest lobe, in the reference bandwidth. */
  eirpDensityDbw: figure.optional(),
  eirpDensityMargin: z.union([z.strictObject({ marginDb: z.number(), thetaDeg: z.number(), phiDeg: z.number(), offAxisDeg: z.number() }), noFigure]).optional(),
  exposure: z.union([exposureFigures, noFigure]).optional(),
  link: z.union([linkFigures, noFigure]).optional(),
  systemTemperatureK: figure.optional(),
  gainOverTemperatureDbPerK: figure.optional(),
  crossPolarMaskMargin: z.union([z.strictObject({ marginDb: z.number(), thetaDeg: z.number(), phiDeg: z.number() }), noFigure]).optional(),
};

export type ExposureLimit = z.infer<typeof exposureLimit>;
export type ExposureFigures = z.infer<typeof exposureFigures>;
export type LinkFigures = z.infer<typeof linkFigures>;
