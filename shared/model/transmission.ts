import './zod-jitless';
import * as z from 'zod';
import { levelMask } from './mask';

/** What is sent, over which way, and what is received: optional parts of the requirement. Distances in metres, because hops are kilometres. */

const lossDb = z.number().min(0).max(200);
const gainDbi = z.number().min(-100).max(120);
const distanceM = z.number().gt(0).max(1e9);
const bandwidthGHz = z.number().min(1e-9).max(100);
const temperatureK = z.number().min(0).max(1e5);

export const transmitter = z.strictObject({
  powerW: z.number().gt(0).max(1e6),
  /** Between the transmitter and the horn; 0 when absent. */
  lossDb: lossDb.optional(),
  /** Share of the time that the transmitter sends, for the exposure estimate; 100 when absent. */
  dutyPercent: z.number().gt(0).max(100).optional(),
  /** The spectrum is taken as flat over this width. */
  occupiedBandwidthGHz: bandwidthGHz.optional(),
  /** The width in which a density is told; 4 kHz when absent. */
  referenceBandwidthGHz: bandwidthGHz.optional(),
  /** Highest EIRP density at each angle off the wanted beam, in dBW in the reference bandwidth. */
  densityMask: levelMask.optional(),
});

export const link = z.discriminatedUnion('kind', [
  /** From the panel with its horn to a far antenna. */
  z.strictObject({
    kind: z.literal('hop'),
    distanceM,
    farGainDbi: gainDbi,
    /** Air, rain, polarisation; 0 when absent. */
    excessLossDb: lossDb.optional(),
    minReceivedDbm: z.number().min(-250).max(100).optional(),
  }),
  /** From a source over a panel lit by its wave to a far antenna. */
  z.strictObject({
    kind: z.literal('relay'),
    incomingDistanceM: distanceM,
    outgoingDistanceM: distanceM,
    sourceGainDbi: gainDbi,
    farGainDbi: gainDbi,
    excessLossDb: lossDb.optional(),
    minReceivedDbm: z.number().min(-250).max(100).optional(),
  }),
]);

/** A receiver behind the panel and its horn. */
export const receiver = z.strictObject({
  antennaTemperatureK: temperatureK,
  lineLossDb: lossDb,
  noiseFigureDb: z.number().min(0).max(60),
  minGainOverTemperatureDbPerK: z.number().min(-150).max(100).optional(),
});

export type Transmitter = z.infer<typeof transmitter>;
export type Link = z.infer<typeof link>;
export type Receiver = z.infer<typeof receiver>;
