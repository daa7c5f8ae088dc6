import type { MaskFindings } from '../../model/mask-figures';
import { degFromRad } from '../../units/angles';
import { powerRatioToDb } from '../../units/decibels';
import { anglesOf, outwardDirection } from '../../waves/conventions';
import { sampleLine, type SampleGrid } from '../hemisphere-peaks';
import type { RadiationPattern } from '../radiation-pattern';
import { descend, type MaskReadings, type Place } from './mask-readings';
import type { MaskRule } from './mask-segment';

type Allowance = Extract<MaskRule, { readonly kind: 'allowance' }>;

/** How many of the worst samples are followed to their true minimum. */
const FOLLOWED = 6;
const FINEST_RING_DEG = 0.02;
/** Samples lower than this below the lowest level of a mask count for nothing in a share of angles. */
const UNCOUNTED_DB = 15;

/** The highest excess over the envelope in each ring of angles off the beam; minus infinity where nothing was sampled. */
export interface MaskRings {
  readonly widthDeg: number;
  readonly excessDb: Float64Array;
  readonly u: Float64Array;
  readonly v: Float64Array;
  /** Rings in the declared spillover region count for no share. */
  readonly inSpillover: (ring: number) => boolean;
}

export interface MaskSweep {
  /** Least margins to what the rule allows anywhere, refined, worst first. */
  readonly worst: readonly Place[];
  readonly rings: MaskRings;
}

/** Goes once over the samples of the hemisphere. */
export function sweepMask(pattern: RadiationPattern, samples: SampleGrid, readings: MaskReadings): MaskSweep {
  const { lowestDb, firstDeg, envelope, gainOffsetDb } = readings;
  const countsShares = envelope.rule.kind === 'allowance';
  const rings = emptyRings(samples, readings);
  const line = new Float64Array(2 * samples.vReach + 1);
  const scale = (4 * Math.PI) / pattern.radiatedPower;
  const worst: Place[] = [];
  for (let m = -samples.uReach; m <= samples.uReach; m++) {
    sampleLine(pattern, samples, m, line);
    for (let i = 0; i < line.length; i++) {
      if (line[i] <= 0) continue;
      const gainDbi = powerRatioToDb(line[i] * scale) + gainOffsetDb;
      // No mask is lower than its lowest level, so most samples need no angle.
      const nearest = worst.length === FOLLOWED ? worst[FOLLOWED - 1].marginDb : Infinity;
      if (lowestDb - gainDbi >= Math.max(countsShares ? UNCOUNTED_DB : 0, nearest)) continue;
      const [u, v] = [m * samples.uStep, (i - samples.vReach) * samples.vStep];
      const off = readings.offAxisDeg(u, v);
      if (off < firstDeg) continue;
      const marginDb = readings.levelDb(off) - gainDbi;
      if (marginDb === Infinity) continue;
      markRing(rings, off, { u, v, marginDb });
      keepWorst(worst, { u, v, marginDb: marginDb + readings.allowanceDb(off) }, 2 * Math.max(samples.uStep, samples.vStep));
    }
  }
  const exact = (u: number, v: number): number => {
    const off = readings.offAxisDeg(u, v);
    return off < firstDeg ? Infinity : readings.levelDb(off) + readings.allowanceDb(off) - readings.gainDbi(u, v);
  };
  const followed = worst.map((place) => descend(place, exact, samples.uStep / 2)).sort((a, b) => a.marginDb - b.marginDb);
  return { worst: followed, rings };
}

function emptyRings(samples: SampleGrid, { envelope: { spilloverDeg } }: MaskReadings): MaskRings {
  const widthDeg = Math.max(FINEST_RING_DEG, 1.5 * degFromRad(Math.max(samples.uStep, samples.vStep)));
  const count = Math.ceil(180 / widthDeg) + 1;
  const inSpillover = (ring: number): boolean => spilloverDeg !== undefined && ring * widthDeg >= spilloverDeg[0] && ring * widthDeg <= spilloverDeg[1];
  return { widthDeg, excessDb: new Float64Array(count).fill(-Infinity), u: new Float64Array(count), v: new Float64Array(count), inSpillover };
}

function markRing(rings: MaskRings, offAxisDeg: number, { u, v, marginDb }: Place): void {
  const ring = Math.floor(offAxisDeg / rings.widthDeg);
  if (-marginDb <= rings.excessDb[ring]) return;
  [rings.excessDb[ring], rings.u[ring], rings.v[ring]] = [-marginDb, u, v];
}

/** Keeps the worst places, one for each neighbourhood. */
function keepWorst(worst: Place[], place: Place, apart: number): void {
  if (worst.length === FOLLOWED && place.marginDb >= worst[FOLLOWED - 1].marginDb) return;
  const near = worst.findIndex((other) => Math.hypot(other.u - place.u, other.v - place.v) < apart);
  if (near >= 0) {
    if (worst[near].marginDb <= place.marginDb) return;
    worst.splice(near, 1);
  }
  worst.push(place);
  worst.sort((a, b) => a.marginDb - b.marginDb);
  if (worst.length > FOLLOWED) worst.pop();
}

/** Stretches of neighbouring rings above the envelope, each with its worst direction. */
export function maskStretches(rings: MaskRings, readings: MaskReadings, samples: SampleGrid): MaskFindings['violations'] {
  const found: MaskFindings['violations'] = [];
  let first = -1;
  for (let ring = 0; ring <= rings.excessDb.length; ring++) {
    const above = rings.excessDb[ring] > 0;
    if (above && first < 0) first = ring;
    if (above || first < 0) continue;
    found.push(stretchOf(rings, [first, ring - 1], readings, samples));
    first = -1;
  }
  return found;
}

function stretchOf(rings: MaskRings, [first, last]: readonly [number, number], readings: MaskReadings, samples: SampleGrid): MaskFindings['violations'][number] {
  let worst = first;
  for (let ring = first; ring <= last; ring++) if (rings.excessDb[ring] > rings.excessDb[worst]) worst = ring;
  const [fromDeg, toDeg] = [Math.max(readings.firstDeg, first * rings.widthDeg), (last + 1) * rings.widthDeg];
  const exact = (u: number, v: number): number => {
    const off = readings.offAxisDeg(u, v);
    return off < fromDeg || off > toDeg ? Infinity : readings.levelDb(off) - readings.gainDbi(u, v);
  };
  const { u, v, marginDb } = descend({ u: rings.u[worst], v: rings.v[worst], marginDb: -rings.excessDb[worst] }, exact, samples.uStep / 2);
  const { thetaRad, phiRad } = anglesOf(outwardDirection(u, v));
  const off = readings.offAxisDeg(u, v);
  const allowed = readings.levelDb(off);
  return { fromDeg, toDeg, offAxisDeg: off, thetaDeg: degFromRad(thetaRad), phiDeg: degFromRad(phiRad), levelDbi: allowed - marginDb, allowedDbi: allowed, excessDb: -marginDb };
}

/** Share of the angles of the rule in which the highest level stands more than `excessDb` above the envelope. */
export function angleShareAbove(rings: MaskRings, { fromDeg, toDeg }: Allowance, excessDb: number): number {
  let count = 0;
  const [first, last] = [Math.ceil(fromDeg / rings.widthDeg), Math.floor(toDeg / rings.widthDeg)];
  for (let ring = first; ring < last; ring++) if (rings.excessDb[ring] > excessDb && !rings.inSpillover(ring)) count += 1;
  return (count * rings.widthDeg) / (toDeg - fromDeg);
}

/** The excess that is passed in no more than the allowed share of the angles. */
export function levelOfShare(rings: MaskRings, rule: Allowance): number {
  const [first, last] = [Math.ceil(rule.fromDeg / rings.widthDeg), Math.floor(rule.toDeg / rings.widthDeg)];
  const counted: number[] = [];
  for (let ring = first; ring < last; ring++) if (!rings.inSpillover(ring)) counted.push(rings.excessDb[ring]);
  counted.sort((a, b) => b - a);
  return counted[Math.floor((rule.angleFraction * (rule.toDeg - rule.fromDeg)) / rings.widthDeg)] ?? -Infinity;
}
