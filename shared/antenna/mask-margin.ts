import type { Figures } from '../model/figures';
import type { Mask } from '../model/design-document';
import { linearThrough } from '../math/interpolate';
import { degFromRad } from '../units/angles';
import { powerRatioToDb } from '../units/decibels';
import { angleBetweenRad, anglesOf, outwardDirection, type Direction } from '../waves/conventions';
import { MOST_SAMPLES, sampleCount, sampleGrid, sampleLine } from './hemisphere-peaks';
import { noFigure } from './no-figure';
import { flooredDbi } from './pattern-cut';
import { directivityRatioAt, type RadiationPattern } from './radiation-pattern';

interface Place {
  readonly u: number;
  readonly v: number;
  readonly marginDb: number;
}

/** How many of the worst samples are followed to their true minimum. */
const FOLLOWED = 6;

/**
 * Least distance of the gain below a mask over the hemisphere, from the mask's first angle off the wanted beam
 * outwards (off the nearest of several). Levels between points lie on straight lines; beyond the last point the last level holds.
 */
export function maskMargin(pattern: RadiationPattern, mask: Mask | undefined, beams: readonly Direction[], gainOffsetDb: number): Figures['maskMargin'] {
  if (!mask) return noFigure('no-mask', 'the requirement has no mask');
  if (mask.kind === 'published') return noFigure('mask-not-built', `the published envelope "${mask.id}" is not built in`);
  const samples = sampleGrid(pattern);
  if (sampleCount(samples) > MOST_SAMPLES) return noFigure('too-many-wavelengths', 'the panel is too many wavelengths across to search the hemisphere');
  const angles = mask.points.map(([angle]) => angle);
  const levels = mask.points.map(([, level]) => level);
  const marginOf = (u: number, v: number, gainDbi: number): number => {
    const direction = outwardDirection(u, v);
    const offAxisDeg = degFromRad(Math.min(...beams.map((beam) => angleBetweenRad(direction, beam))));
    return offAxisDeg < angles[0] ? Infinity : linearThrough(angles, levels, offAxisDeg) - gainDbi;
  };
  const line = new Float64Array(2 * samples.vReach + 1);
  const scale = (4 * Math.PI) / pattern.radiatedPower;
  const worst: Place[] = [];
  for (let m = -samples.uReach; m <= samples.uReach; m++) {
    sampleLine(pattern, samples, m, line);
    for (let i = 0; i < line.length; i++) {
      if (line[i] <= 0) continue;
      const gainDbi = powerRatioToDb(line[i] * scale) + gainOffsetDb;
      // No mask is lower than its lowest level, so most samples need no angle.
      if (worst.length === FOLLOWED && Math.min(...levels) - gainDbi >= worst[FOLLOWED - 1].marginDb) continue;
      const u = m * samples.uStep;
      const v = (i - samples.vReach) * samples.vStep;
      keepWorst(worst, { u, v, marginDb: marginOf(u, v, gainDbi) }, 2 * Math.max(samples.uStep, samples.vStep));
    }
  }
  const exact = (u: number, v: number): number => marginOf(u, v, flooredDbi(directivityRatioAt(pattern, u, v)) + gainOffsetDb);
  const followed = worst.filter((place) => Number.isFinite(place.marginDb)).map((place) => descend(place, exact, samples.uStep / 2));
  if (followed.length === 0) return noFigure('mask-outside', 'no direction of the hemisphere lies at or beyond the first angle of the mask');
  const least = followed.reduce((a, b) => (b.marginDb < a.marginDb ? b : a));
  const { thetaRad, phiRad } = anglesOf(outwardDirection(least.u, least.v));
  return { marginDb: least.marginDb, thetaDeg: degFromRad(thetaRad), phiDeg: degFromRad(phiRad) };
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

/** Compass search: steps to a lower neighbour, halves the step where there is none. Needs no slope, so kinks of the mask do no harm. */
function descend(start: Place, marginAt: (u: number, v: number) => number, firstStep: number): Place {
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
