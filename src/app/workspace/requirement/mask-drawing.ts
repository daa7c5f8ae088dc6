import { angleBetweenRad, directionOf } from '../../../../shared/waves/conventions';
import type { Beam } from '../../../../shared/model/design-document';
import type { PredictedCut } from '../live-prediction-data';

export interface AxisTick {
  readonly at: number;
  readonly text: string;
}

/** Level against the angle off the wanted beam: the mask as a forbidden area, the predicted gain below it. */
export interface MaskDrawing {
  readonly width: number;
  readonly height: number;
  readonly frame: { readonly left: number; readonly top: number; readonly right: number; readonly bottom: number };
  /** Closed area above the mask. */
  readonly forbidden: string;
  readonly edge: string;
  readonly points: readonly { readonly x: number; readonly y: number }[];
  readonly traces: readonly { readonly path: string; readonly dashed: boolean }[];
  readonly anglesDeg: readonly AxisTick[];
  readonly levelsDbi: readonly AxisTick[];
}

export interface OffAxisTrace {
  /** Drawn dashed: the cut across the beam. */
  readonly dashed: boolean;
  readonly offAxisDeg: readonly number[];
  readonly gainDbi: readonly number[];
}

type MaskPoint = readonly [offAxisDeg: number, levelDbi: number];

const MARGIN = { left: 40, right: 12, top: 12, bottom: 30 };
const n = (value: number): string => String(Math.round(value * 100) / 100);

export function maskDrawing(points: readonly MaskPoint[], traces: readonly OffAxisTrace[], space: { readonly width: number; readonly height: number }): MaskDrawing {
  const frame = { left: MARGIN.left, top: MARGIN.top, right: space.width - MARGIN.right, bottom: space.height - MARGIN.bottom };
  const lastDeg = points.at(-1)?.[0] ?? 90;
  const rightDeg = lastDeg > 90 ? 180 : 90;
  const peakDbi = Math.max(...traces.flatMap(({ gainDbi }) => [...gainDbi]), -Infinity);
  const levels = points.map(([, level]) => level);
  const topDbi = tens(Math.max(peakDbi, ...levels, 0) + 4, Math.ceil);
  const bottomDbi = Math.min(tens(Math.min(...levels, 0) - 8, Math.floor), topDbi - 40);
  const x = (deg: number): number => frame.left + (deg / rightDeg) * (frame.right - frame.left);
  const y = (dbi: number): number => {
    const share = (topDbi - Math.max(bottomDbi, Math.min(topDbi, dbi))) / (topDbi - bottomDbi);
    return frame.top + share * (frame.bottom - frame.top);
  };
  // Beyond the last point the last level holds.
  const shown: readonly MaskPoint[] = points.length > 0 && lastDeg < rightDeg ? [...points, [rightDeg, levels[levels.length - 1]]] : points;
  const edge = path(shown.map(([deg, level]) => ({ x: x(deg), y: y(level) })));
  return {
    ...space,
    frame,
    edge,
    forbidden: shown.length === 0 ? '' : `${edge}L${n(x(shown[shown.length - 1][0]))} ${n(frame.top)}L${n(x(shown[0][0]))} ${n(frame.top)}Z`,
    points: points.map(([deg, level]) => ({ x: x(deg), y: y(level) })),
    traces: traces.map(({ dashed, offAxisDeg, gainDbi }) => ({ dashed, path: brokenPath(offAxisDeg.map((deg, i) => ({ x: x(deg), y: gainDbi[i] < bottomDbi ? null : y(gainDbi[i]) }))) })),
    anglesDeg: range(0, rightDeg, rightDeg === 180 ? 30 : 15).map((deg) => ({ at: x(deg), text: String(deg) })),
    levelsDbi: range(bottomDbi, topDbi, topDbi - bottomDbi > 70 ? 20 : 10).map((dbi) => ({ at: y(dbi), text: String(dbi).replace('-', '\u2212') })),
  };
}

function tens(value: number, round: (ratio: number) => number): number {
  return round(value / 10) * 10;
}

function range(from: number, to: number, step: number): readonly number[] {
  return Array.from({ length: Math.floor((to - from) / step + 1e-9) + 1 }, (_, i) => from + i * step);
}

function path(points: readonly { readonly x: number; readonly y: number }[]): string {
  return points.length === 0 ? '' : `M${points.map((point) => `${n(point.x)} ${n(point.y)}`).join('L')}`;
}

/** Leaves a gap where a point lies below the floor. */
function brokenPath(points: readonly { readonly x: number; readonly y: number | null }[]): string {
  let drawn = '';
  let pen = 'M';
  for (const { x, y } of points) {
    if (y !== null) drawn += `${pen}${n(x)} ${n(y)}`;
    pen = y === null ? 'M' : 'L';
  }
  return drawn;
}

/** Both sides of a predicted cut against the angle off the nearest wanted beam. */
export function offAxisTraces(cut: PredictedCut, beams: readonly Beam[], dashed: boolean): readonly OffAxisTrace[] {
  const directions = beams.map(({ thetaDeg, phiDeg }) => directionOf(rad(thetaDeg), rad(phiDeg)));
  const offAxis = Array.from(cut.thetaDeg, (theta, i) => {
    const direction = directionOf(rad(theta), rad(cut.phiDeg[i]));
    return Math.min(...directions.map((beam) => angleBetweenRad(direction, beam))) * (180 / Math.PI);
  });
  const nearest = offAxis.indexOf(Math.min(...offAxis));
  const sides = [[...offAxis.keys()].slice(0, nearest + 1).reverse(), [...offAxis.keys()].slice(nearest)];
  return sides.map((places) => ({ dashed, offAxisDeg: places.map((i) => offAxis[i]), gainDbi: places.map((i) => cut.gainDbi[i]) }));
}

function rad(deg: number): number {
  return (deg * Math.PI) / 180;
}
