import { degFromRad } from '../../units/angles';
import { angleBetweenRad, outwardDirection, type Direction } from '../../waves/conventions';
import { flooredDbi } from '../pattern-cut';
import { directivityRatioAt, type RadiationPattern } from '../radiation-pattern';
import { maskFirstDeg, maskLevelDb, maskPoints, type MaskEnvelope } from './mask-envelope';

/** A direction of the hemisphere with its distance below the mask. */
export interface Place {
  readonly u: number;
  readonly v: number;
  readonly marginDb: number;
}

/** What is asked of a mask and a pattern at one direction. */
export interface MaskReadings {
  readonly envelope: MaskEnvelope;
  readonly beams: readonly Direction[];
  readonly gainOffsetDb: number;
  /** No level of the mask is lower. */
  readonly lowestDb: number;
  readonly firstDeg: number;
  offAxisDeg(u: number, v: number): number;
  gainDbi(u: number, v: number): number;
  /** The envelope; infinite where it is undefined, so that nothing there falls short. */
  levelDb(offAxisDeg: number): number;
  /** What the rule of the mask allows above the envelope at any angle. */
  allowanceDb(offAxisDeg: number): number;
}

interface ReadingQuery {
  readonly pattern: RadiationPattern;
  readonly envelope: MaskEnvelope;
  readonly beams: readonly Direction[];
  readonly gainOffsetDb: number;
}

export function maskReadings({ pattern, envelope, beams, gainOffsetDb }: ReadingQuery): MaskReadings {
  const { rule, spilloverDeg } = envelope;
  const inSpillover = (offAxisDeg: number): boolean => spilloverDeg !== undefined && offAxisDeg >= spilloverDeg[0] && offAxisDeg <= spilloverDeg[1];
  return {
    envelope,
    beams,
    gainOffsetDb,
    lowestDb: maskPoints(envelope).reduce((least, [, level]) => Math.min(least, level), Infinity),
    firstDeg: maskFirstDeg(envelope),
    offAxisDeg: (u, v) => {
      const direction = outwardDirection(u, v);
      let least = Infinity;
      for (const beam of beams) least = Math.min(least, angleBetweenRad(direction, beam));
      return degFromRad(least);
    },
    gainDbi: (u, v) => flooredDbi(directivityRatioAt(pattern, u, v)) + gainOffsetDb,
    levelDb: (offAxisDeg) => maskLevelDb(envelope, offAxisDeg) ?? Infinity,
    allowanceDb: (offAxisDeg) => {
      if (rule.kind !== 'allowance') return 0;
      if (inSpillover(offAxisDeg)) return rule.spilloverDb;
      return offAxisDeg >= rule.fromDeg && offAxisDeg <= rule.toDeg ? rule.excessDb : 0;
    },
  };
}

/** Compass search: steps to a lower neighbour, halves the step where there is none. Needs no slope, so kinks of the mask do no harm. */
export function descend(start: Place, marginAt: (u: number, v: number) => number, firstStep: number): Place {
  let best: Place = { ...start, marginDb: marginAt(start.u, start.v) };
  for (let step = firstStep; step > firstStep * 2e-3; ) {
    let moved = false;
    for (const [du, dv] of [[step, 0], [-step, 0], [0, step], [0, -step]]) {
      const [u, v] = [best.u + du, best.v + dv];
      if (u * u + v * v > 1) continue;
      const marginDb = marginAt(u, v);
      if (marginDb < best.marginDb) [best, moved] = [{ u, v, marginDb }, true];
    }
    if (!moved) step /= 2;
  }
  return best;
}
